package org.wintersill.layer;

import java.util.ArrayList;
import java.util.List;
import java.util.function.DoubleFunction;

/**
 * The looks of all layers: the only place where breaks, colours and class names are written down.
 *
 * <p>The colours are our own. Each sequence runs through lightness in about even steps, and the two sides of a diverging
 * one differ along the blue to yellow axis, which red-green blindness leaves alone; a test holds neighbours apart under
 * simulated protanopia and deuteranopia. What is dangerous is warm and dark, what is safe is blue.
 */
public final class LayerStyles {
    private static final String[] DANGER_TO_SAFETY = {
        "#4f1710", "#96381a", "#cc6a2a", "#edb27c", "#ebe4cb", "#acd0dd", "#5b9fc4", "#2a659f", "#152f5c"};
    private static final String[] DAMAGE = {
        "#f5f0da", "#f1d290", "#e5ad63", "#d9874b", "#c6623b", "#a5443e", "#84263f", "#581936", "#2e0d2c"};
    private static final String[] COLD_TO_MILD = {
        "#1d1238", "#292358", "#353579", "#3e4c91", "#41669c", "#3f81a7", "#5b99ab", "#73b2ad", "#98c9b2", "#c6dcba",
        "#f3f0c2"};
    private static final String[] EARLY_TO_LATE = {
        "#f5efd0", "#d7d5a0", "#adbd8c", "#74a68e", "#538b8d", "#3d6e89", "#2f527c", "#2b3765", "#241c4f"};
    private static final String[] OLD_TO_RECENT = {
        "#2b1a3d", "#4c3469", "#6c538f", "#8b77af", "#af9dc4", "#d2c4d6", "#efe3d6"};
    private static final String[] FEW_TO_MANY = {
        "#f3f1e2", "#c0d3aa", "#8eb392", "#619382", "#3f7077", "#274f62", "#14304a"};
    private static final String[] SHARE = {
        "#ece6da", "#d4cad9", "#b3a5c5", "#9081b2", "#6c5f9f", "#4a4082", "#2a2363"};
    private static final String[] NOTHING_TO_MUCH = {
        "#f4f0df", "#bdd6d6", "#8dbac9", "#5e9bb8", "#3a799e", "#22557d", "#102d50"};
    private static final String[] LOWER_TO_HIGHER = {
        "#3a2566", "#6a54a0", "#a597c9", "#e6e4dc", "#cdbf6e", "#8f7f22", "#544503"};
    private static final String[] OFTEN_TO_SELDOM = {
        "#3d1020", "#732d2e", "#a3553b", "#cb844a", "#dcbc7e", "#eef0dc"};
    private static final String NO_CULTIVAR = "#5f5550";
    private static final String[] CHOICE = {
        "#efe8c8", "#aeccab", "#77aba0", "#3f89a0", "#32648e", "#20407c"};

    private static final double[] MARGINS = {-10, -6, -3, -1, 0, 1, 3, 6, 10};
    private static final double[] PROBABILITIES = {0, 0.02, 0.05, 0.1, 0.2, 0.35, 0.5, 0.75, 1};

    private LayerStyles() {
    }

    /** Margin in K: negative, where the cold goes below what the plant bears, is warm; positive is blue. */
    public static LayerStyle.Ramp margin() {
        return ramp("margin", "Margin above the lethal temperature (K)", MARGINS, DANGER_TO_SAFETY,
                v -> signed(v) + " K");
    }

    /** Hardiness that is lacking in K: the mirror of {@link #margin}, positive is warm. */
    public static LayerStyle.Ramp requiredHardiness() {
        return ramp("required-hardiness", "Hardiness lacking (K)", MARGINS, reversed(DANGER_TO_SAFETY),
                v -> signed(v) + " K");
    }

    /** Probability from 0 to 1, with narrow steps where decisions are made. */
    public static LayerStyle.Ramp probability() {
        return ramp("probability", "Probability", PROBABILITIES, DAMAGE, LayerStyles::percent);
    }

    /** Fraction of buds killed, in the colours of {@link #probability}. */
    public static LayerStyle.Ramp damage() {
        return ramp("damage", "Buds killed", PROBABILITIES, DAMAGE, LayerStyles::percent);
    }

    /** A part of a whole from 0 to 1 that is neither good nor bad: phases, sources of variance, cold-air pools. */
    public static LayerStyle.Ramp share() {
        return ramp("share", "Share", new double[] {0, 0.1, 0.2, 0.4, 0.6, 0.8, 1}, SHARE, LayerStyles::percent);
    }

    /** Minimum temperatures in degC. */
    public static LayerStyle.Ramp temperature() {
        return ramp("temperature", "Minimum temperature (\u00b0C)",
                new double[] {-40, -35, -30, -25, -20, -15, -10, -5, 0, 5, 10}, COLD_TO_MILD,
                v -> whole(v) + " \u00b0C");
    }

    /** Day of the winter's window, 0 is its first, for windows of about eight months. */
    public static LayerStyle.Ramp night() {
        return ramp("night", "Days since the first day of the window",
                new double[] {0, 30, 60, 90, 120, 150, 180, 210, 240}, EARLY_TO_LATE, v -> "day " + whole(v));
    }

    /** Year in which a winter ends, for a record of unknown length. */
    public static LayerStyle.Ramp year() {
        return year(1960, 2020);
    }

    /** Year in which a winter ends, for a record from the first to the last year. */
    public static LayerStyle.Ramp year(int first, int last) {
        return wholeNumbers("year", "Winter, by the year in which it ends", first, last, OLD_TO_RECENT);
    }

    /** Margin gained in K, from nothing upwards: by a hardier variant or a milder site. */
    public static LayerStyle.Ramp gain() {
        return ramp("gain", "Margin gained (K)", new double[] {0, 0.5, 1, 2, 3, 4, 6}, NOTHING_TO_MUCH,
                v -> v == Math.rint(v) ? whole(v) + " K" : v + " K");
    }

    /** Number of winters or nights, for up to some thirty. */
    public static LayerStyle.Ramp count() {
        return count(30);
    }

    /** Number of winters or nights up to the given most. */
    public static LayerStyle.Ramp count(int most) {
        return wholeNumbers("count", "Count", 0, most, FEW_TO_MANY);
    }

    /** Return period in years: short ones are dark. */
    public static LayerStyle.Ramp returnPeriod() {
        return ramp("return-period", "Return period (years)", new double[] {1, 2, 5, 10, 20, 50}, OFTEN_TO_SELDOM,
                v -> v == 1 ? "1 year" : whole(v) + " years");
    }

    /** Ground height in m, from low ground to mountains. */
    public static LayerStyle.Ramp elevation() {
        return ramp("elevation", "Ground height (m)", new double[] {0, 200, 500, 1000, 1500, 2200, 3000}, FEW_TO_MANY,
                v -> whole(v) + " m");
    }

    /** Target elevation minus source elevation in m. */
    public static LayerStyle.Ramp heightChange() {
        return ramp("height-change", "Target minus source elevation (m)",
                new double[] {-600, -300, -100, 0, 100, 300, 600}, LOWER_TO_HIGHER, v -> signed(v) + " m");
    }

    /** Change of a temperature or margin over ten years: colder is warm, as danger is everywhere. */
    public static LayerStyle.Ramp trend() {
        return ramp("trend", "Trend (K in ten years)", new double[] {-3, -2, -1, -0.5, 0, 0.5, 1, 2, 3}, DANGER_TO_SAFETY,
                v -> (v > 0 ? "+" : "") + (v == Math.rint(v) ? whole(v) : Double.toString(v)) + " K");
    }

    /** Change of a margin between two periods in K: smaller margins are warm, as danger is everywhere. */
    public static LayerStyle.Ramp marginChange() {
        return ramp("margin-change", "Change of the margin (K)", new double[] {-6, -4, -2, -1, 0, 1, 2, 4, 6}, DANGER_TO_SAFETY,
                v -> signed(v) + " K");
    }

    /** Change of a frequency or of a killed fraction between two periods: more is warm. */
    public static LayerStyle.Ramp shareChange() {
        return ramp("share-change", "Change of the share", new double[] {-0.6, -0.3, -0.15, -0.05, 0, 0.05, 0.15, 0.3, 0.6},
                reversed(DANGER_TO_SAFETY), v -> (v > 0 ? "+" : "") + Math.round(100 * v) + " %");
    }

    /** What became of a range: 1 {@code kept}, 2 {@code gained}, 3 {@code lost}, 4 {@code never-suitable}. */
    public static LayerStyle.Classes rangeChange() {
        return new LayerStyle.Classes("range-change", "Range", List.of(
                new LayerStyle.Entry(1, "kept", "kept", Colour.hex("#7fb6d6")),
                new LayerStyle.Entry(2, "gained", "gained", Colour.hex("#1d4e89")),
                new LayerStyle.Entry(3, "lost", "lost", Colour.hex("#7a2018")),
                new LayerStyle.Entry(4, "never-suitable", "never suitable", Colour.hex("#e6dfc8"))));
    }

    /** Changes of a frequency beyond chance: 1 {@code fewer}, 2 {@code unclear}, 3 {@code more} killing winters. */
    public static LayerStyle.Classes frequencySignificance() {
        return new LayerStyle.Classes("frequency-significance", "Killing winters beyond chance", List.of(
                new LayerStyle.Entry(1, "fewer", "fewer", Colour.hex("#1d4e89")),
                new LayerStyle.Entry(2, "unclear", "no clear change", Colour.hex("#e6dfc8")),
                new LayerStyle.Entry(3, "more", "more", Colour.hex("#7a2018"))));
    }

    /** What the members of an ensemble say together: 1 {@code robust}, 2 {@code none}, 3 {@code conflicting}. */
    public static LayerStyle.Classes changeSignal() {
        return new LayerStyle.Classes("change-signal", "Signal of the members", List.of(
                new LayerStyle.Entry(1, "robust", "robust signal", Colour.hex("#1d4e89")),
                new LayerStyle.Entry(2, "none", "no change or no robust signal", Colour.hex("#e6dfc8")),
                new LayerStyle.Entry(3, "conflicting", "conflicting signals", Colour.hex("#f0a94a"))));
    }

    /** Limit lines of a comparison: 1 {@code base}, 2 {@code other}. */
    public static LayerStyle.Classes limitLines() {
        return new LayerStyle.Classes("limit-lines", "Limit of the range", List.of(
                new LayerStyle.Entry(1, "base", "base", Colour.hex("#1d4e89")),
                new LayerStyle.Entry(2, "other", "other", Colour.hex("#7a2018"))));
    }

    /** Shape of an extreme value distribution: negative is bounded, positive has a heavy tail. */
    public static LayerStyle.Ramp shape() {
        return ramp("shape", "Shape of the extremes", new double[] {-0.5, -0.3, -0.15, 0, 0.15, 0.3, 0.5}, LOWER_TO_HIGHER,
                Double::toString);
    }

    /** Scale of a distribution in K. */
    public static LayerStyle.Ramp spread() {
        return ramp("spread", "Scale (K)", new double[] {0, 1, 2, 3, 4, 6, 8}, FEW_TO_MANY, v -> whole(v) + " K");
    }

    /** Correlation of a probability plot, with narrow steps where decisions are made. */
    public static LayerStyle.Ramp fitCorrelation() {
        return ramp("fit-correlation", "Correlation of the probability plot", new double[] {0.9, 0.93, 0.95, 0.965, 0.98, 0.99, 1}, SHARE,
                Double::toString);
    }

    /** Where a fit should not be trusted, from 1 {@code sound} to 4 {@code poor}. */
    public static LayerStyle.Classes fitFlag() {
        return new LayerStyle.Classes("fit-flag", "Trust in the fit", List.of(
                new LayerStyle.Entry(1, "sound", "no objection", Colour.hex("#1d4e89")),
                new LayerStyle.Entry(2, "gumbel", "shape not believed, Gumbel instead", Colour.hex("#7fb6d6")),
                new LayerStyle.Entry(3, "beyond-end", "beyond the lowest possible value", Colour.hex("#f0a94a")),
                new LayerStyle.Entry(4, "poor", "poor fit", Colour.hex("#7a2018"))));
    }

    /** Trends beyond chance: 1 {@code colder}, 2 {@code unclear}, 3 {@code milder}. */
    public static LayerStyle.Classes trendSignificance() {
        return new LayerStyle.Classes("trend-significance", "Trend beyond chance", List.of(
                new LayerStyle.Entry(1, "colder", "colder", Colour.hex("#7a2018")),
                new LayerStyle.Entry(2, "unclear", "no clear trend", Colour.hex("#e6dfc8")),
                new LayerStyle.Entry(3, "milder", "milder", Colour.hex("#1d4e89"))));
    }

    /** Change of a temperature in K: colder, where it is dangerous, is warm in colour. */
    public static LayerStyle.Ramp temperatureChange() {
        return ramp("temperature-change", "Change of the minimum temperature (K)", new double[] {-8, -4, -2, -1, 0, 1, 2, 4, 8},
                DANGER_TO_SAFETY, v -> signed(v) + " K");
    }

    /** Lapse rate in K per km; negative is an inversion. */
    public static LayerStyle.Ramp lapseRate() {
        return ramp("lapse-rate", "Lapse rate (K/km)", new double[] {-8, -5, -2, 0, 3, 6, 9}, LOWER_TO_HIGHER, v -> signed(v) + " K/km");
    }

    /** Standard deviation of lapse rates in K per km. */
    public static LayerStyle.Ramp lapseRateSpread() {
        return ramp("lapse-rate-spread", "Spread of lapse rates (K/km)", new double[] {0, 1, 2, 3, 4, 5, 6}, FEW_TO_MANY,
                v -> whole(v) + " K/km");
    }

    /** Cold-air class from 1 {@code prone} to 3 {@code not-prone}. */
    public static LayerStyle.Classes coldAir() {
        return new LayerStyle.Classes("cold-air", "Cold air", List.of(
                new LayerStyle.Entry(1, "prone", "prone to cold air", Colour.hex("#3b3f8f")),
                new LayerStyle.Entry(2, "neutral", "neutral", Colour.hex("#a9b7a6")),
                new LayerStyle.Entry(3, "not-prone", "not prone", Colour.hex("#e9c46a"))));
    }

    /** Suitability from 1 {@code secure} to 4 {@code unfit}. */
    public static LayerStyle.Classes suitability() {
        return new LayerStyle.Classes("suitability", "Suitability", List.of(
                new LayerStyle.Entry(1, "secure", "secure", Colour.hex("#1d4e89")),
                new LayerStyle.Entry(2, "workable", "workable", Colour.hex("#7fb6d6")),
                new LayerStyle.Entry(3, "marginal", "marginal", Colour.hex("#f0a94a")),
                new LayerStyle.Entry(4, "unfit", "unfit", Colour.hex("#7a2018"))));
    }

    /**
     * How many cultivars meet the target; the number of a class is the count itself, from 0, since the layer is stored as
     * floats. With more than six, neighbouring counts share a colour.
     *
     * @param cultivars number of cultivars that were compared, 1 to 254
     */
    public static LayerStyle.Classes choice(int cultivars) {
        if (cultivars < 1 || cultivars > 254) {
            throw new IllegalArgumentException("a class layer holds up to 254 cultivars, not " + cultivars);
        }
        List<LayerStyle.Entry> entries = new ArrayList<>();
        entries.add(new LayerStyle.Entry(0, "none", "no cultivar", Colour.hex(NO_CULTIVAR)));
        for (int count = 1; count <= cultivars; count++) {
            String colour = CHOICE[spread(count - 1, cultivars, CHOICE.length)];
            entries.add(new LayerStyle.Entry(count, Integer.toString(count),
                    count == 1 ? "1 cultivar" : count + " cultivars", Colour.hex(colour)));
        }
        return new LayerStyle.Classes("choice", "Cultivars that meet the target", entries);
    }

    /** One style of each kind, in a fixed order; styles made to measure stand here in their usual size. */
    public static List<LayerStyle> all() {
        return List.of(margin(), requiredHardiness(), probability(), damage(), share(), gain(), temperature(), night(), year(),
                count(), returnPeriod(), elevation(), heightChange(), trend(), shape(), spread(), fitCorrelation(), fitFlag(), trendSignificance(), marginChange(),
                shareChange(), rangeChange(), frequencySignificance(), changeSignal(),
                temperatureChange(), lapseRate(), lapseRateSpread(), coldAir(),
                suitability(), choice(6));
    }

    private static LayerStyle.Ramp ramp(String id, String title, double[] values, String[] colours,
                                        DoubleFunction<String> label) {
        List<LayerStyle.Stop> stops = new ArrayList<>();
        for (int i = 0; i < values.length; i++) {
            stops.add(new LayerStyle.Stop(values[i], Colour.hex(colours[i]), label.apply(values[i])));
        }
        return new LayerStyle.Ramp(id, title, stops);
    }

    /** A ramp over whole numbers, with at most one stop a number. */
    private static LayerStyle.Ramp wholeNumbers(String id, String title, int first, int last, String[] colours) {
        int end = Math.max(last, first + 1);
        int stops = Math.min(colours.length, end - first + 1);
        double[] values = new double[stops];
        String[] used = new String[stops];
        for (int i = 0; i < stops; i++) {
            values[i] = first + Math.round((double) (end - first) * i / (stops - 1));
            used[i] = colours[spread(i, stops, colours.length)];
        }
        return ramp(id, title, values, used, LayerStyles::whole);
    }

    /** Position of item i of n in a palette, the ends at the ends; a single item stands at the end. */
    private static int spread(int i, int n, int colours) {
        return n == 1 ? colours - 1 : (int) Math.round((double) i * (colours - 1) / (n - 1));
    }

    private static String[] reversed(String[] colours) {
        String[] turned = new String[colours.length];
        for (int i = 0; i < colours.length; i++) {
            turned[i] = colours[colours.length - 1 - i];
        }
        return turned;
    }

    private static String whole(double value) {
        return Long.toString(Math.round(value));
    }

    private static String signed(double value) {
        return (value > 0 ? "+" : "") + whole(value);
    }

    private static String percent(double value) {
        return whole(100 * value) + " %";
    }
}
