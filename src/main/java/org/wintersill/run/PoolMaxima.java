package org.wintersill.run;

import java.util.Optional;
import org.wintersill.config.ColdPoolConfig;
import org.wintersill.config.ElevationConfig;
import org.wintersill.config.RunConfig;
import org.wintersill.problem.Notices;
import org.wintersill.problem.Problem;
import org.wintersill.temperature.AlignedTemperatureSource;
import org.wintersill.temperature.DailyTemperatureSource;
import org.wintersill.temperature.ForcingVariable;

/** The daily maxima of a run that tells nights with pools of cold air by their range. */
final class PoolMaxima {
    private PoolMaxima() {
    }

    /**
     * Opens the maxima where they are needed.
     *
     * @param means of the same run; its maxima are taken where it has some
     * @return on the days of the job's minima
     * @throws org.wintersill.problem.ProblemException when they do not go with the minima
     */
    static Optional<DailyTemperatureSource> of(RunConfig config, DailyMeans means, InputFormats formats, Notices notices) {
        if (!areNeeded(config)) {
            return Optional.empty();
        }
        if (config.scenario().isPresent()) {
            throw Problem.usage("the range of a night cannot be told under a scenario: it changes the minima and not the maxima",
                    "elevation.cold-pool.nights", "Set elevation.lapse-rate: {method: daily-local}, or say nights: all").asException();
        }
        if (means.second() != null && means.second().variable() == ForcingVariable.MAXIMUM) {
            return Optional.of(means.second());
        }
        DailyTemperatureSource maxima = formats.open(config.temperature().maximum().orElseThrow(), notices);
        DailyMeans.refuseDifference(means.minima(), maxima);
        return Optional.of(AlignedTemperatureSource.matching(means.minima().days(), maxima));
    }

    /** Whether nothing but the maxima tells stable nights. */
    static boolean areNeeded(RunConfig config) {
        Optional<ElevationConfig> elevation = config.elevation();
        Optional<ColdPoolConfig> pool = elevation.flatMap(ElevationConfig::coldPool);
        return pool.isPresent() && !pool.get().everyNight() && elevation.get().localLapse().isEmpty()
                && config.temperature().maximum().isPresent();
    }
}
