package org.wintersill.run;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.wintersill.engine.WinterStore;
import org.wintersill.io.json.JsonText;
import org.wintersill.io.json.JsonValue;
import org.wintersill.problem.Problem;

/**
 * The winters of a finished run, kept in its folder so that everything after the fold can be made anew: the bytes of the store, and in
 * the record a fingerprint of all that decided them. Taken by a run whose fingerprint is the same; statistics, classes, the killing
 * level, title and outputs may differ.
 */
final class KeptWinters {
    /** Name in the output folder. */
    static final String FILE = "winters.planes";
    /** Key of the fingerprint in the record. */
    static final String KEY = "kept-winters";
    private static final List<String> AFTER_THE_FOLD = List.of("title", "statistics", "classes", "outputs", "parcels");
    private static final long LONGEST_RECORD = 1L << 28;

    private KeptWinters() {
    }

    /**
     * Fingerprint of inputs and of those keys that the values of winters depend on.
     *
     * @param digests of all input files
     */
    static String fingerprint(RunPlan plan, Map<Path, String> digests) {
        Map<String, Object> tree = RecordedConfiguration.of(plan.config().effective());
        AFTER_THE_FOLD.forEach(tree::remove);
        if (tree.get("damage") instanceof Map<?, ?> damage) {
            damage.remove("killing");
        }
        List<String> inputs = new ArrayList<>();
        RunRecord.inputFiles(plan).forEach(file -> inputs.add(digests.get(file)));
        Map<String, Object> all = new LinkedHashMap<>();
        all.put("program", RunVersion.program());
        all.put("configuration", tree);
        all.put("inputs", inputs);
        all.put("grid", plan.target().describe());
        all.put("winters", plan.seasons().stream().map(season -> season.label()).toList());
        all.put("planes", plan.job().planes());
        all.put("cold-night", plan.job().reckoning().coldNight().map(threshold -> (double) threshold).orElse(null));
        return Digests.ofText(JsonText.of(all));
    }

    /**
     * Fills the store.
     *
     * @throws org.wintersill.problem.ProblemException when the folder keeps no winters, others than this run would make, or damaged ones
     */
    static void take(Path folder, RunPlan plan, Map<Path, String> digests, WinterStore store) {
        Path file = folder.resolve(FILE);
        Path recordFile = folder.resolve(OutputFolder.RECORD);
        if (!Files.isRegularFile(file) || !Files.isRegularFile(recordFile)) {
            throw Problem.input("the folder keeps no winters", folder.toString(),
                    "Name the output folder of a finished run with outputs.keep-winters: true").asException();
        }
        JsonValue record = JsonValue.read(recordFile, LONGEST_RECORD);
        if (!record.get(KEY).text().orElse("").equals(fingerprint(plan, digests))) {
            throw Problem.input("the winters kept there are not those of this run: its inputs, its program or a key that decides winters "
                    + "differ", folder.toString(), "Only statistics, classes, damage.killing, title and outputs may be changed, the latter so that "
                    + "shares of the phases are wanted as before; else run map without --winters-from").asException();
        }
        String digest = record.get("outputs").items().stream().filter(output -> output.get("path").text().orElse("").equals(FILE))
                .findFirst().flatMap(output -> output.get("sha256").text()).orElse("");
        if (!digest.equals(Digests.ofFile(file)) || !store.fill(file)) {
            throw Problem.input("the file is not the one that the run wrote", file.toString(), "Run map without --winters-from").asException();
        }
    }
}
