package org.wintersill.io.crs;

/**
 * Units of length of projected axes, with their names and EPSG codes.
 * Exact by definition: 1 ft = 0.3048 m; 1 US survey foot = 1200/3937 m.
 */
enum Units {
    METRE("metre", 9001, 1), FOOT("foot", 9002, 0.3048), US_FOOT("US survey foot", 9003, 1200.0 / 3937),
    KILOMETRE("kilometre", 9036, 1000);

    private final String word;
    private final int code;
    private final double metres;

    Units(String word, int code, double metres) {
        this.word = word;
        this.code = code;
        this.metres = metres;
    }

    double metres() {
        return metres;
    }

    /** EPSG code of the unit of that length; 0 if there is none here. */
    static int code(double metres) {
        for (Units unit : values()) {
            if (Math.abs(unit.metres / metres - 1) < 1e-9) {
                return unit.code;
            }
        }
        return 0;
    }

    /** Name of the unit of that length. */
    static String name(double metres) {
        for (Units unit : values()) {
            if (Math.abs(unit.metres / metres - 1) < 1e-9) {
                return unit.word;
            }
        }
        return "unit of " + Wkt.number(metres) + " m";
    }

    /** Metres of an EPSG unit code; NaN for one that is not known here. */
    static double metres(int code) {
        for (Units unit : values()) {
            if (unit.code == code) {
                return unit.metres;
            }
        }
        return Double.NaN;
    }
}
