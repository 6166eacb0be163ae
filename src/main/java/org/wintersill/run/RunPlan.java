package org.wintersill.run;

import java.util.List;
import org.wintersill.climatology.statistic.ClimatologyStatistics;
import org.wintersill.config.RunConfig;
import org.wintersill.elevation.ElevationAdjustment;
import org.wintersill.engine.FoldJob;
import org.wintersill.engine.FoldPlan;
import org.wintersill.grid.GridGeometry;
import org.wintersill.hardiness.Cultivar;
import org.wintersill.temperature.DailyTemperatureSource;
import org.wintersill.time.Season;
import org.wintersill.time.SeasonWindow;

/**
 * Everything that was checked and decided before the first night is folded.
 *
 * @param config what was asked
 * @param source the minima
 * @param target the grid of the outputs
 * @param adjustment from the used part of the source's grid to the target
 * @param window what a winter is
 * @param dropped winters that were found and are not used, with the reason
 * @param cultivars in the order of the run
 * @param choices levels, bounds, target and classes
 * @param job the fold
 * @param foldPlan how it is cut up
 * @param estimate what it will take
 */
public record RunPlan(RunConfig config, DailyTemperatureSource source, GridGeometry target, ElevationAdjustment adjustment,
                      SeasonWindow window, List<DroppedWinter> dropped, List<Cultivar> cultivars,
                      ClimatologyStatistics.Choices choices, FoldJob job, FoldPlan foldPlan, Estimate estimate) {

    /** A winter that is not used, and why. */
    public record DroppedWinter(String label, String reason) {
    }

    /**
     * What a run will take; rough, see the documentation.
     *
     * @param memoryBytes at the most
     * @param workingDiskBytes while it runs, beside the outputs
     * @param outputDiskBytes outputs, before compression
     * @param seconds from start to end
     */
    public record Estimate(long memoryBytes, long workingDiskBytes, long outputDiskBytes, double seconds) {
    }

    public List<Season> seasons() {
        return job.seasons();
    }
}
