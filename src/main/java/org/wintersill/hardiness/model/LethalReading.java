package org.wintersill.hardiness.model;

import java.util.Locale;
import java.util.Optional;
import org.wintersill.damage.ToleranceCurve;
import org.wintersill.hardiness.ModelParameters;
import org.wintersill.hardiness.Quantity;

/**
 * What the models share in reading lethal temperatures: the checks of science 1.3 (|LT| at most 90, order, spread at least 0.05 K),
 * and the spread that stands in where only LT50 is known.
 */
final class LethalReading {
    /** Any lethal temperature. */
    static final Quantity LETHAL = Quantity.of("degC", -90, 90);
    /** Scale of a tolerance curve where only LT50 is known, K; project choice (science 1.3). */
    static final double DEFAULT_SPREAD = 1.2;
    static final Quantity SPREAD = Quantity.of("K", ToleranceCurve.NARROWEST_SPREAD, 30);
    private static final Quantity DISTANCE = new Quantity(ToleranceCurve.NARROWEST_SPREAD * ToleranceCurve.LN_9, 60,
            "K from 0.11 to 60");
    /** degC; no organ of a woody perennial is killed by cold above it, so such values are Fahrenheit or lack a sign (assumed). */
    private static final double TOO_WARM = 4;

    private LethalReading() {
    }

    /**
     * LT10 and LT90 as distances from LT50.
     *
     * @param toLt10 LT10 - LT50, K
     * @param toLt90 LT50 - LT90, K
     */
    record Distances(double toLt10, double toLt90) {

        /** The distances that belong to one scale of a curve. */
        static Distances ofSpread(ToleranceCurve curve, double spread) {
            return new Distances(spread * curve.spreadsToTenth(), spread * curve.spreadsToTenth());
        }
    }

    /** A lethal temperature that may be left out. */
    static Optional<Double> lethal(ModelParameters parameters, String key) {
        Optional<Double> value = parameters.number(key, LETHAL);
        value.ifPresent(degrees -> doubtWarmth(parameters, key, degrees));
        return value;
    }

    /** A lethal temperature that must be there. */
    static Optional<Double> requiredLethal(ModelParameters parameters, String key) {
        Optional<Double> value = parameters.required(key, LETHAL);
        value.ifPresent(degrees -> doubtWarmth(parameters, key, degrees));
        return value;
    }

    private static void doubtWarmth(ModelParameters parameters, String key, double value) {
        if (value <= TOO_WARM) {
            return;
        }
        String celsius = String.format(Locale.ROOT, "%.1f", (value - 32) / 1.8);
        parameters.problem(key, value + " degC is too warm to be a lethal temperature; it looks like Fahrenheit or lacks its minus sign",
                "If it is Fahrenheit, write " + celsius + " and convert all others: degC = (degF - 32) / 1.8");
    }

    /**
     * Whether three lethal temperatures stand in order and are far enough apart; a problem if not.
     *
     * @param what the row in words, such as {@code 10-10}
     */
    static boolean ordered(ModelParameters parameters, String what, double lt10, double lt50, double lt90) {
        String found = "lt10 " + lt10 + ", lt50 " + lt50 + ", lt90 " + lt90;
        if (!(lt10 > lt50 && lt50 > lt90)) {
            boolean turned = lt10 < lt50 && lt50 < lt90;
            parameters.problem("", "the lethal temperatures of " + what + " are out of order: " + found,
                    turned ? "Exchange lt10 and lt90: it takes less cold to kill 10 percent than 90"
                            : "lt10 must be warmer than lt50, and lt50 warmer than lt90");
            return false;
        }
        double narrowest = ToleranceCurve.NARROWEST_SPREAD * ToleranceCurve.LN_9;
        if (lt10 - lt50 < narrowest || lt50 - lt90 < narrowest) {
            parameters.problem("", "the lethal temperatures of " + what + " are too close together: " + found,
                    "They must be at least 0.11 K apart, a spread of 0.05 K");
            return false;
        }
        return true;
    }

    /** Reports a hardy limit that is not colder than the tender one. */
    static void hardyBelowTender(ModelParameters parameters, Optional<Double> hardy, Optional<Double> tender) {
        if (hardy.isPresent() && tender.isPresent() && hardy.get() >= tender.get()) {
            parameters.problem("hardy-limit", "hardy-limit " + hardy.get() + " is not colder than tender-limit " + tender.get(),
                    "hardy-limit (Hmax of the papers) is the hardiest, most negative LT50, tender-limit (Hmin) the least hardy one");
        }
    }

    /** Distances of a state model: {@code spread}, or {@code lt10-above} and {@code lt90-below}, or the default with a notice. */
    static Optional<Distances> distances(ModelParameters parameters) {
        boolean above = parameters.has("lt10-above");
        boolean below = parameters.has("lt90-below");
        if (parameters.has("spread")) {
            if (above || below) {
                parameters.problem("spread", "spread and lt10-above or lt90-below are both given",
                        "Keep either spread or both lt10-above and lt90-below");
            }
            return parameters.number("spread", SPREAD).map(spread -> Distances.ofSpread(parameters.tolerance(), spread));
        }
        if (!above && !below) {
            parameters.notice(defaultSpread(parameters.label()));
            return Optional.of(Distances.ofSpread(parameters.tolerance(), DEFAULT_SPREAD));
        }
        Optional<Double> warm = parameters.required("lt10-above", DISTANCE);
        Optional<Double> cold = parameters.required("lt90-below", DISTANCE);
        if (parameters.tolerance().isSymmetric() && warm.isPresent() && cold.isPresent() && !warm.equals(cold)) {
            parameters.problem("lt10-above", "the tolerance curve " + parameters.tolerance().key() + " is symmetric, but lt10-above is "
                    + warm.get() + " and lt90-below " + cold.get(), "Give both the same value, or leave tolerance out");
            return Optional.empty();
        }
        return warm.flatMap(toLt10 -> cold.map(toLt90 -> new Distances(toLt10, toLt90)));
    }

    /** The notice that goes with {@link #DEFAULT_SPREAD}. */
    static String defaultSpread(String label) {
        return "cultivar " + label + " gives LT50 only: LT10 and LT90 are set by a spread of " + DEFAULT_SPREAD
                + " K, an assumption of this program";
    }
}
