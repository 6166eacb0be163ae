package org.wintersill.run.curve;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.wintersill.hardiness.Cultivar;
import org.wintersill.io.chart.Chart;
import org.wintersill.io.cultivar.BuiltInCultivars;
import org.wintersill.io.cultivar.CultivarFile;
import org.wintersill.problem.NearestName;
import org.wintersill.problem.Notices;
import org.wintersill.problem.Problem;
import org.wintersill.problem.Problems;
import org.wintersill.temperature.DailySeries;
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
     * @param names cultivar files, and built-in cultivars with their prefix
     * @param ids of the cultivars that are wanted; empty for all
     * @throws org.wintersill.problem.ProblemException with all problems of all files, or for an id that none has
     */
    public static CurveSet read(List<String> names, List<String> ids, SeasonWindow window, Notices notices) {
        Problems problems = new Problems();
        List<Cultivar> all = new ArrayList<>();
        List<Path> files = names.stream().filter(name -> !name.startsWith(BuiltInCultivars.PREFIX)).map(Path::of).toList();
        problems.attempt(() -> all.addAll(CultivarFile.readAll(files, notices)));
        names.stream().filter(name -> name.startsWith(BuiltInCultivars.PREFIX)).forEach(name -> problems.attempt(() ->
                all.add(CultivarFile.builtIn(name.substring(BuiltInCultivars.PREFIX.length()), name, notices))));
        problems.throwIfAny();
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

    /** The cultivars driven by temperatures; {@code winter} is the label of one, or empty for all. */
    public SeriesCourse over(DailySeries series, double latitude, Optional<String> winter) {
        return SeriesCourse.of(cultivars, window, series, latitude, winter);
    }

    public Chart chart() {
        return CurveChart.of(curves(), window);
    }
}
