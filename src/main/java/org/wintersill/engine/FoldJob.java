package org.wintersill.engine;

import java.util.List;
import java.util.Optional;
import org.wintersill.elevation.ElevationAdjustment;
import org.wintersill.elevation.StableNights;
import org.wintersill.grid.Block;
import org.wintersill.season.DamageReckoning;
import org.wintersill.season.MissingDayPolicy;
import org.wintersill.season.NightCurve;
import org.wintersill.season.WinterValues;
import org.wintersill.temperature.DailyTemperatureSource;
import org.wintersill.time.Season;

/**
 * What is to be folded: definition of the work, without a word on how it is cut up.
 *
 * @param source daily minima
 * @param window the part of the source's grid that the target needs; the adjustment's source grid is that part
 * @param adjustment from the window to the target grid
 * @param seasons winters in order
 * @param policy when a winter counts
 * @param curves {@code [season][cultivar]}; null for a cultivar with a state model
 * @param levels number of levels of damage that margins are kept for; the first is LT50
 * @param reckoning how damage is reckoned and what of it is kept
 * @param states cultivars with state models, and what they need beside the minima
 * @param poolMaxima daily maxima that tell nights with pools of cold air, on the grid and the days of the minima; empty where they are not
 *                   needed
 */
public record FoldJob(DailyTemperatureSource source, Block window, ElevationAdjustment adjustment, List<Season> seasons,
                      MissingDayPolicy policy, List<NightCurve[]> curves, int levels, DamageReckoning reckoning,
                      StateForcing states, Optional<DailyTemperatureSource> poolMaxima) {

    public FoldJob {
        seasons = List.copyOf(seasons);
        curves = List.copyOf(curves);
    }

    /** A job without maxima for pools. */
    public FoldJob(DailyTemperatureSource source, Block window, ElevationAdjustment adjustment, List<Season> seasons,
                   MissingDayPolicy policy, List<NightCurve[]> curves, int levels, DamageReckoning reckoning, StateForcing states) {
        this(source, window, adjustment, seasons, policy, curves, levels, reckoning, states, Optional.empty());
    }

    /** A job whose curves all depend on the date alone. */
    public FoldJob(DailyTemperatureSource source, Block window, ElevationAdjustment adjustment, List<Season> seasons,
                   MissingDayPolicy policy, List<NightCurve[]> curves, int levels, DamageReckoning reckoning) {
        this(source, window, adjustment, seasons, policy, curves, levels, reckoning, StateForcing.none());
    }

    /** Whether pools of cold air count differently from night to night. */
    public boolean weighsNights() {
        return adjustment.terms().hasPools() && !(adjustment.terms().nights() instanceof StableNights.All);
    }

    public int cultivars() {
        return curves.isEmpty() ? 0 : curves.get(0).length;
    }

    /** Values that are kept of every cell and winter. */
    public int planes() {
        return WinterValues.planes(cultivars(), levels, reckoning);
    }

    /** Number of rows of the target grid. */
    public int targetRows() {
        return adjustment.positions().target().rows();
    }

    public int targetColumns() {
        return adjustment.positions().target().columns();
    }
}
