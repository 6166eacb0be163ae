package org.wintersill.comparison;

/**
 * What the changes of several members say together: the classes of the advanced approach of IPCC AR6 (science 8).
 *
 * <p>gamma = sqrt(2 / 20) 1.645 sd, the change that natural variability alone exceeds in one of ten twenty-year means; sd is the standard
 * deviation of the annual values of the reference period. Shares count members beyond gamma strictly; a member without change agrees
 * with neither sign.
 */
public enum ChangeSignal {
    /** At least 66 % of the members beyond gamma and at least 80 % of one sign. */
    ROBUST("robust signal"),
    /** Fewer than 66 % beyond gamma. */
    NONE("no change or no robust signal"),
    /** At least 66 % beyond gamma, fewer than 80 % of one sign. */
    CONFLICTING("conflicting signals");

    private static final double GAMMA = Math.sqrt(2.0 / 20) * 1.645;
    private static final double MOST_BEYOND = 0.66;
    private static final double AGREEING = 0.80;

    private final String words;

    ChangeSignal(String words) {
        this.words = words;
    }

    /** As tables and legends say it. */
    public String words() {
        return words;
    }

    /** The change that natural variability alone seldom exceeds, in the unit of sd. */
    public static double gamma(double sd) {
        return GAMMA * sd;
    }

    /** Share of the members whose change lies beyond gamma, 0..1. */
    public static double shareBeyond(double[] changes, double gamma) {
        int beyond = 0;
        for (double change : changes) {
            beyond += Math.abs(change) > gamma ? 1 : 0;
        }
        return (double) beyond / changes.length;
    }

    /** Share of the members that have the commoner sign, 0..1. */
    public static double shareAgreeing(double[] changes) {
        int up = 0;
        int down = 0;
        for (double change : changes) {
            up += change > 0 ? 1 : 0;
            down += change < 0 ? 1 : 0;
        }
        return (double) Math.max(up, down) / changes.length;
    }

    /** The class; changes must not be empty or NaN. */
    public static ChangeSignal of(double[] changes, double gamma) {
        if (shareBeyond(changes, gamma) < MOST_BEYOND) {
            return NONE;
        }
        return shareAgreeing(changes) >= AGREEING ? ROBUST : CONFLICTING;
    }
}
