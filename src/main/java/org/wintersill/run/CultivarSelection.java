package org.wintersill.run;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.TreeMap;
import org.wintersill.config.CultivarConfig;
import org.wintersill.hardiness.Cultivar;
import org.wintersill.io.cultivar.CultivarFile;
import org.wintersill.problem.NearestName;
import org.wintersill.problem.Notices;
import org.wintersill.problem.Problem;
import org.wintersill.problem.Problems;

/** Reads the cultivar files of a run and picks the ones that are used. */
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
