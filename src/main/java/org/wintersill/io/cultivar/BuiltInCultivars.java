package org.wintersill.io.cultivar;

import java.io.IOException;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import org.apache.commons.csv.CSVFormat;
import org.wintersill.io.yaml.YamlReader;
import org.wintersill.io.yaml.YamlValue;
import org.wintersill.problem.NearestName;
import org.wintersill.problem.Problem;

/**
 * The cultivars that come with the program, each with its source and status, and published values that make no curve.
 *
 * <p>A run uses one by {@code use: [built-in:ID]}, a cultivar file by an entry with {@code built-in: ID}, which may add to it: dates of
 * bud stages, another id, variants. The entries are YAML resources in the form of any cultivar file.
 */
public final class BuiltInCultivars {
    /** Goes before an id where cultivars of files and built-in ones stand side by side. */
    public static final String PREFIX = "built-in:";
    private static final String FOLDER = "/cultivars/";
    private static final List<String> FILES = List.of("bud-stages.yaml", "sampled-buds.yaml", "thermal-time.yaml");
    private static final String REFERENCES = "reference-values.csv";

    private BuiltInCultivars() {
    }

    /**
     * One cultivar of the list.
     *
     * @param id without prefix
     * @param model word of the model
     * @param source where the numbers come from
     * @param status word of the status
     * @param complete whether a run can use it as it is; bud stages need dates or degree-days first
     */
    public record Entry(String id, String name, String species, String organ, String model, String source, String status,
                        boolean complete) {
    }

    /**
     * A published lethal temperature without a course through the winter: to compare with, not to run.
     *
     * @param when date or state of the sample
     * @param lt10 degC as printed in the table; empty where it is not known
     * @param lt50 likewise
     * @param lt90 likewise
     */
    public record Reference(String species, String cultivar, String tissue, String when, String lt10, String lt50, String lt90,
                            String source) {
    }

    /** All cultivars, in the order of the files. */
    public static List<Entry> list() {
        return mappings().values().stream().map(mapping -> new Entry(text(mapping, "id"), text(mapping, "name"), text(mapping, "species"),
                text(mapping, "organ"), text(mapping, "model"), text(mapping, "source"), text(mapping, "status"),
                !text(mapping, "model").equals("stage"))).toList();
    }

    /** Published values beside the cultivars. */
    public static List<Reference> references() {
        try (InputStreamReader reader = new InputStreamReader(open(REFERENCES), StandardCharsets.UTF_8)) {
            return CSVFormat.RFC4180.builder().setHeader().setSkipHeaderRecord(true).get().parse(reader).getRecords().stream()
                    .map(row -> new Reference(row.get("species"), row.get("cultivar"), row.get("tissue"), row.get("when"), row.get("LT10_C"),
                            row.get("LT50_C"), row.get("LT90_C"), row.get("source"))).toList();
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    /** Read once, when first asked for. */
    private static final class Loaded {
        private static final Map<String, YamlValue.Mapping> ENTRIES = Collections.unmodifiableMap(read());
    }

    /** The entries as they stand in the files, by id, in their order. */
    static Map<String, YamlValue.Mapping> mappings() {
        return Loaded.ENTRIES;
    }

    private static Map<String, YamlValue.Mapping> read() {
        Map<String, YamlValue.Mapping> mappings = new LinkedHashMap<>();
        for (String file : FILES) {
            YamlValue.Mapping top = (YamlValue.Mapping) new YamlReader(Problem.Kind.INPUT).parse(content(file), "built-in " + file);
            for (YamlValue item : ((YamlValue.Sequence) top.entries().get("cultivars")).items()) {
                YamlValue.Mapping mapping = (YamlValue.Mapping) item;
                mappings.put(text(mapping, "id"), mapping);
            }
        }
        return mappings;
    }

    /** What to do about an id that there is not. */
    public static String remedy(String id) {
        return NearestName.of(id, mappings().keySet()).map(near -> "Did you mean " + near + "?")
                .orElse("wintersill curves --built-in lists them");
    }

    static String text(YamlValue.Mapping mapping, String key) {
        return mapping.entries().get(key) instanceof YamlValue.Text text ? text.text() : "";
    }

    private static String content(String file) {
        try (InputStream in = open(file)) {
            return new String(in.readAllBytes(), StandardCharsets.UTF_8);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    private static InputStream open(String file) {
        return Objects.requireNonNull(BuiltInCultivars.class.getResourceAsStream(FOLDER + file), file);
    }
}
