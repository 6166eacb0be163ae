package org.wintersill.io.yaml;

import java.util.Map;
import org.snakeyaml.engine.v2.api.Dump;
import org.snakeyaml.engine.v2.api.DumpSettings;
import org.snakeyaml.engine.v2.common.FlowStyle;
import org.snakeyaml.engine.v2.schema.CoreSchema;

/** Writes maps, lists, texts, numbers and truth values as YAML: the same bytes for the same values everywhere. */
public final class YamlText {
    private YamlText() {
    }

    /** One document, keys in the order of the map, lists and maps of single values on one line. */
    public static String of(Map<String, Object> values) {
        DumpSettings settings = DumpSettings.builder().setDefaultFlowStyle(FlowStyle.AUTO).setWidth(10_000).setSplitLines(false)
                .setBestLineBreak("\n").setSchema(new CoreSchema()).setDereferenceAliases(true).build();
        return new Dump(settings).dumpToString(values);
    }
}
