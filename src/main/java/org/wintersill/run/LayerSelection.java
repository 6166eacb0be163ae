package org.wintersill.run;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import org.wintersill.climatology.ClimatologyStatistic;
import org.wintersill.climatology.LayerGroup;
import org.wintersill.climatology.statistic.ClimatologyStatistics;
import org.wintersill.climatology.statistic.Population;
import org.wintersill.problem.NearestName;
import org.wintersill.problem.Problem;
import org.wintersill.problem.Problems;

/** Which layers a run writes: the default ones, or those named under {@code outputs.layers}, by id or by the word of a group. */
final class LayerSelection {
    private static final String ALL = "all";

    private final Optional<Set<String>> wanted;

    /** @param wanted layer ids and words of groups; empty for the default layers */
    LayerSelection(List<String> wanted) {
        this.wanted = wanted.isEmpty() ? Optional.empty() : Optional.of(Set.copyOf(wanted));
    }

    /** Whether a layer is written that is one of the default layers. */
    boolean contains(String id) {
        return wanted.isEmpty() || wanted.get().contains(id) || wanted.get().contains(ALL)
                || wanted.get().contains(LayerGroup.DEFAULT.word());
    }

    /** Whether a layer is asked for by its own name, or with all there are. */
    boolean names(String id) {
        return wanted.isPresent() && (wanted.get().contains(id) || wanted.get().contains(ALL));
    }

    boolean contains(ClimatologyStatistic statistic) {
        return wanted.map(words -> words.contains(statistic.layer().id()) || words.contains(ALL)
                || words.contains(statistic.group().word())).orElse(statistic.group() == LayerGroup.DEFAULT);
    }

    /** Whether cold nights are to be counted: layers of theirs are named. */
    boolean countsColdNights() {
        return wanted.filter(words -> words.contains(ALL) || words.contains(LayerGroup.SEVERITY.word())
                || words.stream().anyMatch(word -> word.startsWith(WinterLayers.COLD_NIGHTS) || word.startsWith(WinterLayers.COLD_SPELL)))
                .isPresent();
    }

    /** Whether a winter layer of the severity group is written. */
    boolean containsSeverity(String id) {
        return wanted.filter(words -> words.contains(id) || words.contains(ALL) || words.contains(LayerGroup.SEVERITY.word())).isPresent();
    }

    /** Those statistics that are written, and the default ones, which later steps rely on. */
    List<ClimatologyStatistic> made(List<ClimatologyStatistic> statistics) {
        return statistics.stream().filter(statistic -> statistic.group() == LayerGroup.DEFAULT || contains(statistic)).toList();
    }

    /** Whether layers are named that need a fitted distribution. */
    static boolean asksForFits(List<String> wanted) {
        return wanted.stream().anyMatch(word -> word.equals(ALL) || word.equals(LayerGroup.EXTREMES.word())
                || word.matches("(return-level|lowest-possible|extreme|fit)-.*|return-period-killing.*|damage-mean-fitted"));
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
        statistics.addAll(ClimatologyStatistics.ofPopulation(choices, new Population(1, new double[0])));
        Set<String> ids = new TreeSet<>();
        statistics.forEach(statistic -> ids.add(statistic.layer().id()));
        for (LayerGroup group : LayerGroup.values()) {
            ids.add(group.word());
        }
        ids.add(ALL);
        ids.addAll(WinterLayers.ids());
        ids.addAll(List.of(SharedLayers.CHOICE, SharedLayers.ELEVATION, SharedLayers.HEIGHT_CHANGE, MilderSite.ID));
        ids.addAll(AdjustmentLayers.ids());
        return ids;
    }
}
