package org.wintersill.hardiness.model;

import org.wintersill.time.CfCalendar;
import org.wintersill.time.CfDate;

/**
 * Length of the night: {@code N = 24 - (24 / pi) arccos(-tan phi tan delta)} hours, the product kept within -1 .. 1, with latitude phi and
 * solar declination {@code delta = 0.409 sin(2 pi J / 365 - 1.39)} rad on day J of the year.
 *
 * <p>Source: FAO Irrigation and Drainage Paper 56 (declination and sunset hour angle; from memory). J of a 360-day year is stretched to 365
 * days, a project choice. Beyond the polar circles the night lasts 0 or 24 hours.
 */
final class NightLength {
    private static final double YEAR = 365;
    private static final double SHORT_YEAR = 360;

    private NightLength() {
    }

    /** Solar declination on a date, rad. */
    static double declination(CfDate date, CfCalendar calendar) {
        int day = calendar.dayOfYear(date);
        return declination(calendar == CfCalendar.DAYS_360 ? day * YEAR / SHORT_YEAR : day);
    }

    /** Solar declination on day J of the year, rad. */
    static double declination(double dayOfYear) {
        return 0.409 * Math.sin(2 * Math.PI * dayOfYear / YEAR - 1.39);
    }

    /** Hours of night; latitude in degrees north, declination in rad. */
    static double hours(double latitude, double declination) {
        return ofTangents(Math.tan(Math.toRadians(latitude)), Math.tan(declination));
    }

    private static double ofTangents(double latitude, double declination) {
        return 24 - 24 / Math.PI * Math.acos(Math.min(1, Math.max(-1, -latitude * declination)));
    }

    /**
     * The same for a run of cells; neighbours of one latitude share one calculation.
     *
     * @param tangents {@code [cell]}, tangents of the latitudes
     */
    static void hours(double[] tangents, double declination, double[] hours, int cells) {
        double tangent = Math.tan(declination);
        double latitude = Double.NaN;
        double value = Double.NaN;
        for (int i = 0; i < cells; i++) {
            if (tangents[i] != latitude) {
                latitude = tangents[i];
                value = ofTangents(latitude, tangent);
            }
            hours[i] = value;
        }
    }
}
