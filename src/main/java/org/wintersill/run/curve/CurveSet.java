package org.wintersill.run.curve;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.wintersill.hardiness.Cultivar;
import org.wintersill.io.chart.Chart;
import org.wintersill.io.cultivar.CultivarFile;
import org.wintersill.problem.NearestName;
import org.wintersill.problem.Notices;
import org.wintersill.problem.Problem;
import org.wintersill.time.SeasonWindow;

/**
 * The cultivars of some files, and the winter that they are looked at in.
 *
 * @param cultivars in the order of the files
 * @param window of the winter
 */
public record CurveSet(List<Cultivar> cultivars, SeasonWindow window) {

    public CurveSet {
        cultivars = List.copyOf(cultivars);
    }

    /**
     * Reads and checks.
     *
     * @param ids of the cultivars that are wanted; empty for all
     * @throws org.wintersill.problem.ProblemException with all problems of all files, or for an id that none has
     */
    public static CurveSet read(List<Path> files, List<String> ids, SeasonWindow window, Notices notices) {
        List<Cultivar> all = CultivarFile.readAll(files, notices);
        List<Cultivar> wanted = new ArrayList<>(all);
        if (!ids.isEmpty()) {
            List<String> known = all.stream().map(Cultivar::id).toList();
            for (String id : ids) {
                if (known.stream().noneMatch(id::equalsIgnoreCase)) {
                    throw Problem.usage("the files have no cultivar " + id, "--cultivar", NearestName.of(id, known)
                            .map(name -> "Did you mean " + name + "? ").orElse("") + "Known are " + String.join(", ", known)).asException();
                }
            }
            wanted.removeIf(cultivar -> ids.stream().noneMatch(cultivar.id()::equalsIgnoreCase));
        }
        for (Cultivar cultivar : wanted) {
            cultivar.model().notCovering(window).ifPresent(reason -> notices.add("cultivar " + cultivar.id()
                    + " does not cover the winter " + window.from() + " to " + window.to() + ": " + reason + "; map refuses it there"));
        }
        return new CurveSet(wanted, window);
    }

    private List<CultivarCurve> curves() {
        return cultivars.stream().map(cultivar -> CultivarCurve.of(cultivar, window)).toList();
    }

    public String table() {
        return CurveText.table(curves());
    }

    public String csv() {
        return CurveText.csv(curves());
    }

    public String json() {
        return CurveText.json(curves());
    }

    public Chart chart() {
        return CurveChart.throughWinter(curves(), window);
    }
}
