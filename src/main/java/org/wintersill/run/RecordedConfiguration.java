package org.wintersill.run;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * The part of a configuration that outputs may show: what decides their values. Where they were written and how much of the
 * machine was used change no value, and absolute paths say more of a computer than of a map: the former stay out, of the
 * latter the last name stays. So the same inputs give the same bytes in any folder.
 */
final class RecordedConfiguration {
    private RecordedConfiguration() {
    }

    /** @param effective the configuration with defaults filled in */
    static Map<String, Object> of(Map<String, Object> effective) {
        Map<String, Object> tree = map(effective);
        tree.remove("limits");
        if (tree.get("outputs") instanceof Map<?, ?> outputs) {
            outputs.remove("folder");
        }
        return tree;
    }

    private static Map<String, Object> map(Map<?, ?> given) {
        Map<String, Object> tree = new LinkedHashMap<>();
        given.forEach((key, value) -> tree.put(key.toString(), key.equals("title") ? value : shown(value)));
        return tree;
    }

    private static Object shown(Object value) {
        if (value instanceof Map<?, ?> map) {
            return map(map);
        }
        if (value instanceof List<?> list) {
            return list.stream().map(RecordedConfiguration::shown).toList();
        }
        boolean absolute = value instanceof String text && (text.startsWith("/") || text.startsWith("\\\\")
                || text.matches("[A-Za-z]:[/\\\\].*"));
        return absolute ? ((String) value).replaceFirst(".*[/\\\\](?=.)", "") : value;
    }
}
