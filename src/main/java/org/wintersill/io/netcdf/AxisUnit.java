package org.wintersill.io.netcdf;

import java.util.Locale;
import java.util.Optional;

/** Units of length that projected axes and heights come in. */
final class AxisUnit {
    /** International foot (1959), exact. */
    static final double FOOT = 0.3048;
    /** US survey foot, 1200/3937 m by definition. */
    static final double US_SURVEY_FOOT = 1200.0 / 3937.0;

    private AxisUnit() {
    }

    /** Metres per unit; empty for anything that is no unit of length. */
    static Optional<Double> metresPer(String unit) {
        return switch (unit.trim().toLowerCase(Locale.ROOT)) {
            case "m", "meter", "meters", "metre", "metres" -> Optional.of(1.0);
            case "km", "kilometer", "kilometers", "kilometre", "kilometres" -> Optional.of(1000.0);
            case "ft", "foot", "feet", "international_foot", "international_feet" -> Optional.of(FOOT);
            case "us-ft", "us_ft", "us_survey_foot", "us_survey_feet", "us survey foot", "us survey feet", "ftus" ->
                    Optional.of(US_SURVEY_FOOT);
            default -> Optional.empty();
        };
    }
}
