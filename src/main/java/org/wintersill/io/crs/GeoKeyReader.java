package org.wintersill.io.crs;

import java.util.Arrays;
import java.util.EnumMap;
import java.util.Map;
import org.wintersill.grid.Crs;
import org.wintersill.grid.CrsParser;
import org.wintersill.problem.Problem;

/** Reads GeoTIFF keys into a system: codes through the parser, user-defined ones from their numbers. */
final class GeoKeyReader {
    private static final String REMEDY = "Name the system with crs:, or write the file anew with gdal_translate -a_srs";

    private GeoKeyReader() {
    }

    static Crs read(GeoKeys keys, CrsParser parser) {
        try {
            int projected = keys.number(GeoKeys.PROJECTED_TYPE, 0);
            int geographic = keys.number(GeoKeys.GEOGRAPHIC_TYPE, 0);
            int model = keys.number(GeoKeys.MODEL_TYPE, projected != 0 ? 1 : geographic != 0 ? 2 : 0);
            if (model == 3) {
                throw new IllegalArgumentException("they name a geocentric system");
            }
            if (model == 2) {
                return isCode(geographic) ? parser.fromCode("EPSG:" + geographic)
                        : parser.fromWkt(Wkt1Writer.write(SystemDefinition.geographic(base(keys, parser))));
            }
            if (model == 1) {
                return isCode(projected) ? parser.fromCode("EPSG:" + projected)
                        : parser.fromWkt(Wkt1Writer.write(projected(keys, parser)));
            }
            throw new IllegalArgumentException("they name no system");
        } catch (IllegalArgumentException e) {
            throw Problem.input("The GeoTIFF keys are refused: " + e.getMessage(), "", REMEDY).asException(e);
        }
    }

    private static boolean isCode(int value) {
        return value > 0 && value < GeoKeys.USER_DEFINED;
    }

    private static GeographicSystem base(GeoKeys keys, CrsParser parser) {
        int code = keys.number(GeoKeys.GEOGRAPHIC_TYPE, 0);
        if (isCode(code)) {
            return SystemDefinition.of(parser.fromCode("EPSG:" + code)).base();
        }
        int unit = keys.number(GeoKeys.ANGULAR_UNITS, GeoKeys.DEGREE);
        if (unit != GeoKeys.DEGREE) {
            throw new IllegalArgumentException("the angular unit has code " + unit + "; degrees (9102) are expected");
        }
        int datum = keys.number(GeoKeys.DATUM, 0);
        for (GeographicSystem known : new GeographicSystem[] {GeographicSystem.WGS84, GeographicSystem.ETRS89, GeographicSystem.NAD83}) {
            if (datum == known.datumCode()) {
                return known;
            }
        }
        double major = keys.real(GeoKeys.SEMI_MAJOR, Double.NaN);
        double minor = keys.real(GeoKeys.SEMI_MINOR, Double.NaN);
        double inverse = keys.real(GeoKeys.INVERSE_FLATTENING, minor == major ? 0 : major / (major - minor));
        int ellipsoid = keys.number(GeoKeys.ELLIPSOID, 0);
        String citation = keys.text(GeoKeys.GEOGRAPHIC_CITATION);
        if (Double.isNaN(major) && (ellipsoid == 7030 || ellipsoid == 7019)) {
            Ellipsoid known = ellipsoid == 7030 ? Ellipsoid.WGS84 : Ellipsoid.GRS80;
            return GeographicSystem.greenwich(name(citation, "GCS Name", "unnamed"), 0, name(citation, "Datum", "unnamed"), 0, known);
        }
        if (!Double.isFinite(major) || !Double.isFinite(inverse)) {
            throw new IllegalArgumentException("a user-defined system without its ellipsoid's axes");
        }
        Ellipsoid figure = WktReader.ellipsoid(name(citation, "Ellipsoid", inverse == 0 ? "sphere" : "ellipsoid"),
                isCode(ellipsoid) ? ellipsoid : 0, major, inverse);
        double meridian = keys.real(GeoKeys.MERIDIAN_LONGITUDE, 0);
        return new GeographicSystem(name(citation, "GCS Name", "unnamed"), 0, name(citation, "Datum", "unnamed").replace('_', ' '),
                isCode(datum) ? datum : 0, figure, meridian == 0 ? "Greenwich" : name(citation, "Primem", "meridian"), meridian,
                java.util.List.of());
    }

    /** A part such as {@code GCS Name = ...} of a citation, as GDAL writes it. */
    private static String name(String citation, String key, String otherwise) {
        for (String part : citation.split("[|]")) {
            int at = part.indexOf('=');
            if (at > 0 && part.substring(0, at).trim().equals(key)) {
                return part.substring(at + 1).trim();
            }
        }
        return otherwise;
    }

    private static SystemDefinition projected(GeoKeys keys, CrsParser parser) {
        GeographicSystem base = base(keys, parser);
        int unit = keys.number(GeoKeys.LINEAR_UNITS, 9001);
        double metres = unit == GeoKeys.USER_DEFINED ? keys.real(GeoKeys.LINEAR_UNIT_SIZE, Double.NaN) : Units.metres(unit);
        if (!(metres > 0)) {
            throw new IllegalArgumentException("the linear unit with code " + unit + " is not known; metre, kilometre, foot and US survey foot are");
        }
        String name = keys.text(GeoKeys.PROJECTED_CITATION).isEmpty() ? keys.text(1026) : keys.text(GeoKeys.PROJECTED_CITATION);
        name = name.isEmpty() ? "unnamed" : name;
        int projection = keys.number(GeoKeys.PROJECTION, GeoKeys.USER_DEFINED);
        int zone = projection % 100;
        if ((projection / 100 == 160 || projection / 100 == 161) && zone >= 1 && zone <= 60) {
            return SystemDefinition.projected(name, 0, base, ProjectionMethod.TRANSVERSE_MERCATOR,
                    KnownSystems.utmParameters(zone, projection / 100 == 160), metres);
        }
        int transformation = keys.number(GeoKeys.TRANSFORMATION, 0);
        ProjectionMethod method = method(keys, transformation);
        Map<ProjectionParameter, Double> parameters = new EnumMap<>(ProjectionParameter.class);
        for (ProjectionMethod.Slot slot : method.slots()) {
            double value = first(keys, slot);
            if (Double.isFinite(value)) {
                parameters.put(slot.parameter(), slot.parameter().measure() == ProjectionParameter.Measure.LENGTH ? value * metres : value);
            }
        }
        if (method == ProjectionMethod.LAMBERT_CONIC_2SP && parameters.containsKey(ProjectionParameter.PARALLEL_1)) {
            parameters.putIfAbsent(ProjectionParameter.PARALLEL_2, parameters.get(ProjectionParameter.PARALLEL_1));
        }
        return SystemDefinition.projected(name, 0, base, method, parameters, metres);
    }

    private static ProjectionMethod method(GeoKeys keys, int transformation) {
        if (transformation == 15 && Math.abs(keys.real(3081, 90)) < 90) {
            return ProjectionMethod.POLAR_B;
        }
        if (transformation == 7 && keys.entryExists(3078)) {
            return ProjectionMethod.MERCATOR_2SP;
        }
        return Arrays.stream(ProjectionMethod.values()).filter(m -> m.geoTiff() != 0 && m.geoTiff() == transformation)
                .findFirst().orElseThrow(() -> new IllegalArgumentException("the coordinate transformation with code "
                        + transformation + " is not known"));
    }

    /** The slot's own key, or one of those that other writers use for the same quantity. */
    private static double first(GeoKeys keys, ProjectionMethod.Slot slot) {
        int[] also = switch (slot.parameter()) {
            case LATITUDE -> new int[] {3081, 3089, 3085};
            case LONGITUDE -> new int[] {3080, 3088, 3084, 3095};
            case SCALE -> new int[] {3092, 3093};
            case EASTING -> new int[] {3082, 3086, 3090};
            case NORTHING -> new int[] {3083, 3087, 3091};
            default -> new int[0];
        };
        double value = keys.real(slot.geoKey(), Double.NaN);
        for (int i = 0; i < also.length && Double.isNaN(value); i++) {
            value = keys.real(also[i], Double.NaN);
        }
        return value;
    }
}
