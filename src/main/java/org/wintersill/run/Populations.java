package org.wintersill.run;

import java.util.List;
import java.util.Optional;
import org.wintersill.climatology.ClimatologyStatistic;
import org.wintersill.climatology.statistic.ClimatologyStatistics;
import org.wintersill.climatology.statistic.Population;
import org.wintersill.hardiness.Cultivar;
import org.wintersill.hardiness.Variants;

/** Cultivars that stand for several variants, as the statistics see them. */
final class Populations {
    private Populations() {
    }

    /** The variants of a cultivar; empty where it has none. */
    static Optional<Population> of(Cultivar cultivar) {
        Variants variants = cultivar.variants();
        return variants.isNone() ? Optional.empty() : Optional.of(new Population(variants.sd(),
                variants.members().stream().mapToDouble(Variants.Variant::offset).toArray()));
    }

    /** The statistics that a cultivar's variants add to those of every cultivar. */
    static List<ClimatologyStatistic> statistics(ClimatologyStatistics.Choices choices, Cultivar cultivar) {
        return of(cultivar).map(population -> ClimatologyStatistics.ofPopulation(choices, population)).orElse(List.of());
    }
}
