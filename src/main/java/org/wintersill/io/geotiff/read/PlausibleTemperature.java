package org.wintersill.io.geotiff.read;

import java.util.Arrays;
import org.wintersill.temperature.TemperatureUnit;

/**
 * Whether values can be air temperatures in the unit that is claimed for them. The limits are wider than any place on Earth
 * (records -89.2 and 56.7 degC, WMO archive of weather and climate extremes).
 */
final class PlausibleTemperature {
    static final double LOWEST = -90;
    static final double HIGHEST = 60;
    /** No large area has a median outside these on any day. */
    private static final double LOWEST_MEDIAN = -80;
    private static final double HIGHEST_MEDIAN = 50;
    private static final double MOST_OUTSIDE = 0.25;

    private PlausibleTemperature() {
    }

    static boolean is(double celsius) {
        return celsius >= LOWEST && celsius <= HIGHEST;
    }

    /**
     * @param stored stored values, no missing ones
     * @throws org.wintersill.problem.ProblemException when they do not fit the unit
     */
    static void check(TiffFile file, double[] stored, Packing packing, int band) {
        if (stored.length == 0) {
            return;
        }
        double[] celsius = Arrays.stream(stored).map(v -> packing.celsius(band, v)).sorted().toArray();
        double median = celsius[celsius.length / 2];
        long outside = Arrays.stream(celsius).filter(v -> !is(v)).count();
        if (median >= LOWEST_MEDIAN && median <= HIGHEST_MEDIAN && outside <= MOST_OUTSIDE * celsius.length) {
            return;
        }
        double[] raw = stored.clone();
        Arrays.sort(raw);
        double value = raw[raw.length / 2] * packing.scale()[band] + packing.offset()[band];
        throw file.refuse("The values do not fit the unit " + packing.unit().symbol() + ": their median is " + shown(value)
                + ", that is " + shown(median) + " degC", remedy(value, packing));
    }

    private static String shown(double value) {
        return Numbers.plain(Math.rint(value * 100) / 100);
    }

    private static String remedy(double value, Packing packing) {
        if (packing.unit() != TemperatureUnit.KELVIN && value > 180 && value < 335) {
            return "If the values are kelvin, set unit: K (or mend the unit of the file)";
        }
        if (packing.unit() == TemperatureUnit.KELVIN && value > -80 && value < 60) {
            return "If the values are degrees Celsius, set unit: degC (or mend the unit of the file)";
        }
        return packing.packed() ? "Check scale:, offset: and unit:"
                : "If the values are tenths of a degree, set scale: 0.1; otherwise check unit:";
    }
}
