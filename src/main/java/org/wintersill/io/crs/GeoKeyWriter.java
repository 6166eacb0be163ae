package org.wintersill.io.crs;

import org.wintersill.problem.Problem;

/** Writes a definition as GeoTIFF keys: by code where there is one, otherwise with all its numbers. */
final class GeoKeyWriter {
    private static final int PROJECTED = 1;
    private static final int GEOGRAPHIC = 2;
    private static final int GREENWICH = 8901;
    private static final int LARGEST_CODE = 32766;

    private GeoKeyWriter() {
    }

    static GeoKeys write(SystemDefinition system) {
        GeoKeys.Builder keys = new GeoKeys.Builder().put(GeoKeys.RASTER_TYPE, 1);
        if (system.method() == null) {
            keys.put(GeoKeys.MODEL_TYPE, GEOGRAPHIC);
            base(keys, system.base());
            return keys.build();
        }
        keys.put(GeoKeys.MODEL_TYPE, PROJECTED);
        if (hasKeyCode(system.code())) {
            keys.put(GeoKeys.PROJECTED_TYPE, system.code()).put(GeoKeys.PROJECTED_CITATION, system.name());
            int unit = Units.code(system.metresPerUnit());
            if (unit != 0) {
                keys.put(GeoKeys.LINEAR_UNITS, unit);
            }
            return keys.build();
        }
        projection(keys, system);
        base(keys, system.base());
        return keys.build();
    }

    /** Keys are 16-bit numbers below the one for "user-defined". */
    private static boolean hasKeyCode(int code) {
        return code >= 1024 && code <= LARGEST_CODE;
    }

    private static void projection(GeoKeys.Builder keys, SystemDefinition system) {
        ProjectionMethod method = system.method();
        if (method.geoTiff() == 0) {
            throw Problem.output("A GeoTIFF file cannot hold the projection " + method.wkt2() + " of '" + system.name()
                    + "' without an EPSG code", "", "Name the system of the input by its code with crs:, or write NetCDF").asException();
        }
        keys.put(GeoKeys.PROJECTED_TYPE, GeoKeys.USER_DEFINED).put(GeoKeys.PROJECTED_CITATION, system.name())
                .put(GeoKeys.PROJECTION, GeoKeys.USER_DEFINED).put(GeoKeys.TRANSFORMATION, method.geoTiff());
        int unit = Units.code(system.metresPerUnit());
        keys.put(GeoKeys.LINEAR_UNITS, unit == 0 ? GeoKeys.USER_DEFINED : unit);
        if (unit == 0) {
            keys.put(GeoKeys.LINEAR_UNIT_SIZE, system.metresPerUnit());
        }
        for (ProjectionMethod.Slot slot : method.slots()) {
            double value = system.value(slot.parameter());
            keys.put(slot.geoKey(), slot.parameter().measure() == ProjectionParameter.Measure.LENGTH
                    ? value / system.metresPerUnit() : value);
        }
        if (method == ProjectionMethod.POLAR_B) {
            keys.put(3092, 1.0);
        }
    }

    private static void base(GeoKeys.Builder keys, GeographicSystem base) {
        keys.put(GeoKeys.ANGULAR_UNITS, GeoKeys.DEGREE);
        if (hasKeyCode(base.code())) {
            keys.put(GeoKeys.GEOGRAPHIC_TYPE, base.code());
            return;
        }
        Ellipsoid figure = base.ellipsoid();
        keys.put(GeoKeys.GEOGRAPHIC_TYPE, GeoKeys.USER_DEFINED).putParts(GeoKeys.GEOGRAPHIC_CITATION, "GCS Name = " + base.name(),
                "Datum = " + base.datum().replace(' ', '_'), "Ellipsoid = " + figure.name(), "Primem = " + base.meridianName());
        keys.put(GeoKeys.DATUM, hasKeyCode(base.datumCode()) ? base.datumCode() : GeoKeys.USER_DEFINED);
        keys.put(GeoKeys.ELLIPSOID, hasKeyCode(figure.code()) ? figure.code() : GeoKeys.USER_DEFINED)
                .put(GeoKeys.SEMI_MAJOR, figure.semiMajor());
        if (figure.inverseFlattening() == 0) {
            keys.put(GeoKeys.SEMI_MINOR, figure.semiMajor());
        } else {
            keys.put(GeoKeys.INVERSE_FLATTENING, figure.inverseFlattening());
        }
        keys.put(GeoKeys.PRIME_MERIDIAN, base.meridian() == 0 ? GREENWICH : GeoKeys.USER_DEFINED);
        if (base.meridian() != 0) {
            keys.put(GeoKeys.MERIDIAN_LONGITUDE, base.meridian());
        }
    }
}
