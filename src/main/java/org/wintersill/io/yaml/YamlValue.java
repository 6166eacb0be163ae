package org.wintersill.io.yaml;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/** A value of a YAML file and the place where it stands, such as {@code run.yaml:12} or {@code --set title}. */
public sealed interface YamlValue {

    /** File and line, or the flag that gave the value. */
    String place();

    /** What the value is, for messages. */
    String describe();

    /**
     * One piece of text.
     *
     * @param quoted whether it stood in quotation marks, so that it cannot mean "nothing"
     */
    record Text(String text, boolean quoted, String place) implements YamlValue {
        private static final int LONGEST_SHOWN = 80;

        /** Whether it stands for "nothing": empty, {@code null} or {@code ~}, without quotation marks. */
        public boolean absent() {
            return !quoted && (text.isEmpty() || text.equals("~") || text.equals("null") || text.equals("Null")
                    || text.equals("NULL"));
        }

        @Override
        public String describe() {
            return "'" + (text.length() <= LONGEST_SHOWN ? text : text.substring(0, LONGEST_SHOWN) + "...") + "'";
        }
    }

    /** Values in order. */
    record Sequence(List<YamlValue> items, String place) implements YamlValue {
        public Sequence {
            items = List.copyOf(items);
        }

        @Override
        public String describe() {
            return "a list";
        }
    }

    /** Keys and values in the order of the file. */
    record Mapping(Map<String, YamlValue> entries, Map<String, String> keyPlaces, String place) implements YamlValue {
        public Mapping {
            entries = Collections.unmodifiableMap(new LinkedHashMap<>(entries));
            keyPlaces = Collections.unmodifiableMap(new LinkedHashMap<>(keyPlaces));
        }

        /** A mapping without keys. */
        public static Mapping empty(String place) {
            return new Mapping(Map.of(), Map.of(), place);
        }

        /** The same mapping with one key set; a key that is there already keeps its position. */
        public Mapping with(String key, YamlValue value, String keyPlace) {
            Map<String, YamlValue> newEntries = new LinkedHashMap<>(entries);
            Map<String, String> newPlaces = new LinkedHashMap<>(keyPlaces);
            newEntries.put(key, value);
            newPlaces.put(key, keyPlace);
            return new Mapping(newEntries, newPlaces, place);
        }

        @Override
        public String describe() {
            return "a map";
        }
    }
}
