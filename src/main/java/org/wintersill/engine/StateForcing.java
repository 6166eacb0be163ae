package org.wintersill.engine;

import java.util.Arrays;
import java.util.List;
import org.wintersill.elevation.AdjustedTemperature;
import org.wintersill.grid.CoordinateOperation;
import org.wintersill.grid.GridGeometry;
import org.wintersill.season.StateCultivar;
import org.wintersill.temperature.DailyTemperatureSource;
import org.wintersill.temperature.ForcingVariable;

/**
 * What the cultivars with state models need beside the daily minima: the daily mean.
 *
 * <p>Tm = (Tmin + Tmax) / 2 where maxima are given, both at the height of the cell; Tm itself where means are given; Tm = Tmin + range
 * / 2 where neither is.
 *
 * @param cultivars those with a state model; none where the job has none
 * @param firstDays {@code [season][cultivar]}: first day whose mean the model is told, as a position in the winter's window; negative
 *     before it
 * @param second daily maxima or means on the grid and the days of the job's minima; null where there are none
 * @param dailyRange Tmax - Tmin, K; not used where there is a second record
 * @param toGeographic from the target's system to degrees of longitude and latitude
 */
public record StateForcing(List<StateCultivar> cultivars, List<int[]> firstDays, DailyTemperatureSource second, double dailyRange,
                           CoordinateOperation toGeographic) {

    public StateForcing {
        cultivars = List.copyOf(cultivars);
        firstDays = List.copyOf(firstDays);
    }

    /** For a job whose curves all depend on the date alone. */
    public static StateForcing none() {
        return new StateForcing(List.of(), List.of(), null, 0, CoordinateOperation.identity());
    }

    public boolean isNone() {
        return cultivars.isEmpty();
    }

    /** Whether a second record is decoded. */
    public boolean hasSecond() {
        return second != null;
    }

    /** How the second record is brought to the cells. */
    public AdjustedTemperature kindOfSecond() {
        return hasMaxima() ? AdjustedTemperature.MAXIMUM : AdjustedTemperature.MEAN;
    }

    boolean hasMaxima() {
        return second != null && second.variable() == ForcingVariable.MAXIMUM;
    }

    /** How the daily mean comes about, in a few words. */
    public String describe() {
        return second == null ? "minimum + " + dailyRange / 2 + " K" : hasMaxima() ? "of minimum and maximum" : "given";
    }

    /** First day of a winter that any of the cultivars takes, as a position in its window; not positive, since the nights begin there. */
    public int firstDay(int season) {
        return isNone() ? 0 : Math.min(0, Arrays.stream(firstDays.get(season)).min().orElse(0));
    }

    /** Latitudes of the centres of a block of target cells, row by row, degrees north. */
    public double[] latitudes(GridGeometry target, int firstRow, int firstColumn, int rows, int columns) {
        double[] places = new double[2 * rows * columns];
        for (int i = 0; i < rows * columns; i++) {
            places[2 * i] = target.centreX(firstColumn + i % columns);
            places[2 * i + 1] = target.centreY(firstRow + i / columns);
        }
        toGeographic.transform(places, rows * columns);
        double[] latitudes = new double[rows * columns];
        for (int i = 0; i < latitudes.length; i++) {
            latitudes[i] = places[2 * i + 1];
        }
        return latitudes;
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
