package org.wintersill.run;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.TreeMap;
import org.wintersill.config.CultivarConfig;
import org.wintersill.hardiness.Cultivar;
import org.wintersill.io.cultivar.BuiltInCultivars;
import org.wintersill.io.cultivar.CultivarFile;
import org.wintersill.problem.NearestName;
import org.wintersill.problem.Notices;
import org.wintersill.problem.Problem;
import org.wintersill.problem.Problems;

/** Reads the cultivar files of a run and picks the ones that are used, beside those that come with the program. */
record CultivarSelection(CultivarConfig config) {

    List<Cultivar> read(Notices notices) {
        List<Cultivar> all = CultivarFile.readAll(config.files(), notices);
        if (config.use().isEmpty()) {
            return all;
        }
        Map<String, Cultivar> known = new TreeMap<>();
        all.forEach(cultivar -> known.put(cultivar.id(), cultivar));
        Problems problems = new Problems();
        List<Cultivar> used = new ArrayList<>();
        for (String id : config.use()) {
            if (id.startsWith(BuiltInCultivars.PREFIX)) {
                String name = id.substring(BuiltInCultivars.PREFIX.length());
                problems.attempt(() -> used.add(CultivarFile.builtIn(name, "cultivars.use", notices)));
                if (known.containsKey(name)) {
                    problems.add(Problem.usage("the cultivar id " + name + " is used by a cultivar file too", "cultivars.use",
                            "Give the cultivar of the file another id"));
                }
                continue;
            }
            Cultivar cultivar = known.get(id.toLowerCase(Locale.ROOT));
            if (cultivar == null) {
                String nearest = NearestName.of(id, known.keySet()).map(name -> "did you mean " + name + "? ").orElse("");
                problems.add(Problem.usage("there is no cultivar " + id + " in the cultivar files", "cultivars.use",
                        nearest + "Known are " + String.join(", ", known.keySet())));
            } else {
                used.add(cultivar);
            }
        }
        problems.throwIfAny();
        return used;
    }
}
