package org.wintersill.run;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import org.wintersill.climatology.ClimatologyStatistic;
import org.wintersill.climatology.statistic.ClimatologyStatistics;
import org.wintersill.problem.NearestName;
import org.wintersill.problem.Problem;
import org.wintersill.problem.Problems;

/** Which layers a run writes: all, or those named under {@code outputs.layers}. */
final class LayerSelection {
    private final Optional<Set<String>> wanted;

    /** @param wanted layer ids; empty for all */
    LayerSelection(List<String> wanted) {
        this.wanted = wanted.isEmpty() ? Optional.empty() : Optional.of(Set.copyOf(wanted));
    }

    boolean contains(String id) {
        return wanted.isEmpty() || wanted.get().contains(id);
    }

    /**
     * Refuses ids that no run makes.
     *
     * @throws org.wintersill.problem.ProblemException naming the nearest known id of each
     */
    static void check(List<String> wanted, ClimatologyStatistics.Choices choices) {
        Set<String> known = known(choices);
        Problems problems = new Problems();
        for (String id : wanted) {
            if (!known.contains(id)) {
                problems.add(Problem.usage("there is no layer " + id, "outputs.layers",
                        NearestName.of(id, known).map(name -> "Did you mean " + name + "? ").orElse("")
                                + "Known are " + String.join(", ", known)));
            }
        }
        problems.throwIfAny();
    }

    private static Set<String> known(ClimatologyStatistics.Choices choices) {
        List<ClimatologyStatistic> statistics = new ArrayList<>(ClimatologyStatistics.ofCultivar(choices));
        statistics.addAll(ClimatologyStatistics.shared(choices));
        Set<String> ids = new TreeSet<>();
        statistics.forEach(statistic -> ids.add(statistic.layer().id()));
        ids.addAll(WinterLayers.ids());
        ids.addAll(List.of(SharedLayers.CHOICE, SharedLayers.HEIGHT_CHANGE));
        return ids;
    }
}
