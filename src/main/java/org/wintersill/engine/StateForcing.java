package org.wintersill.engine;

import java.util.List;
import org.wintersill.grid.CoordinateOperation;
import org.wintersill.season.StateCultivar;
import org.wintersill.season.StateLane;
import org.wintersill.temperature.DailyTemperatureSource;
import org.wintersill.temperature.ForcingVariable;
import org.wintersill.time.Season;

/**
 * What the cultivars with state models need beside the daily minima: the daily mean.
 *
 * <p>Tm = (Tmin + Tmax) / 2 where maxima are given, both at the height of the cell; Tm itself where means are given; Tm = Tmin + range
 * / 2 where neither is.
 *
 * @param cultivars those with a state model; none where the job has none
 * @param second daily maxima or means on the grid and the days of the job's minima; null where there are none
 * @param dailyRange Tmax - Tmin, K; not used where there is a second record
 * @param toGeographic from the target's system to degrees of longitude and latitude
 */
public record StateForcing(List<StateCultivar> cultivars, DailyTemperatureSource second, double dailyRange,
                           CoordinateOperation toGeographic) {

    public StateForcing {
        cultivars = List.copyOf(cultivars);
    }

    /** For a job whose curves all depend on the date alone. */
    public static StateForcing none() {
        return new StateForcing(List.of(), null, 0, CoordinateOperation.identity());
    }

    public boolean isNone() {
        return cultivars.isEmpty();
    }

    /** Whether a second record is decoded. */
    public boolean hasSecond() {
        return second != null;
    }

    boolean hasMaxima() {
        return second != null && second.variable() == ForcingVariable.MAXIMUM;
    }

    /** First day whose mean is wanted, as a position in the winter's window; not positive. */
    public int firstDay(Season season) {
        return StateLane.firstDay(cultivars, season);
    }

    /**
     * Turns a second temperature into the daily mean, in place.
     *
     * @param minima {@code [cell]}, degrees Celsius, positive infinity for missing
     * @param means the second temperature, replaced; not looked at where there is no second record
     */
    public void toMeans(float[] minima, float[] means, int cells) {
        if (hasMaxima()) {
            middle(minima, means, cells);
        } else if (second == null) {
            raise(minima, (float) (dailyRange / 2), means, cells);
        }
    }

    private static void middle(float[] minima, float[] means, int cells) {
        for (int i = 0; i < cells; i++) {
            means[i] = (minima[i] + means[i]) / 2;
        }
    }

    private static void raise(float[] minima, float half, float[] means, int cells) {
        for (int i = 0; i < cells; i++) {
            means[i] = minima[i] + half;
        }
    }
}
