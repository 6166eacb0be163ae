package org.wintersill.io.crs;

import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;

/**
 * Reads WKT 1 (OGC 01-009 as GDAL, GeoTools and ESRI write it) and WKT 2 (OGC 18-010) into a definition. Of compound
 * and bound systems the horizontal part is taken; axis order and vertical parts are left out, for coordinates are
 * always x, y here.
 *
 * <p>All methods throw IllegalArgumentException whose message ends the sentence "the text is refused: ...".
 */
final class WktReader {
    private static final double DEGREE = Math.PI / 180;
    private static final double RATIO_TOLERANCE = 1e-7;
    /** WKT 1 of some writers gives the Paris meridian in grads, of others in degrees: EPSG 8903, 2.5969213 grads. */
    private static final double PARIS = 2.5969213 * 0.9;

    private WktReader() {
    }

    static SystemDefinition read(String text) {
        return system(Wkt.parse(text));
    }

    private static SystemDefinition system(Wkt node) {
        return switch (node.keyword()) {
            case "GEOGCS", "GEOGCRS", "GEODCRS", "GEODETICCRS", "GEOGRAPHICCRS" -> geographic(node);
            case "PROJCS", "PROJCRS", "PROJECTEDCRS" -> projected(node);
            case "COMPD_CS", "COMPOUNDCRS" -> system(node.children().stream().filter(c -> isHorizontal(c.keyword()))
                    .findFirst().orElseThrow(() -> new IllegalArgumentException("no horizontal part")));
            case "BOUNDCRS" -> bound(node);
            default -> throw new IllegalArgumentException("it starts with " + node.keyword()
                    + "; a geographic or projected system is expected");
        };
    }

    private static boolean isHorizontal(String keyword) {
        return keyword.startsWith("GEO") || keyword.startsWith("PROJ") || keyword.equals("BOUNDCRS");
    }

    private static SystemDefinition bound(Wkt node) {
        Wkt source = node.child("SOURCECRS").flatMap(s -> s.children().stream().findFirst())
                .orElseThrow(() -> new IllegalArgumentException("BOUNDCRS without SOURCECRS"));
        SystemDefinition inner = system(source);
        List<Double> shift = node.child("ABRIDGEDTRANSFORMATION")
                .filter(t -> t.child("METHOD").map(m -> Wkt.plain(m.text(0))).orElse("").matches("positionvector.*|geocentrictranslations.*"))
                .map(t -> t.all("PARAMETER").stream().map(p -> shiftParameter(p)).toList()).orElse(List.of());
        if (shift.size() == 3) {
            shift = new ArrayList<>(shift);
            shift.addAll(List.of(0.0, 0.0, 0.0, 0.0));
        }
        if (shift.size() != 7) {
            return inner;
        }
        return inner.withShift(shift);
    }

    /** WKT 2 writes the scale difference of an abridged transformation as a factor near 1. */
    private static double shiftParameter(Wkt parameter) {
        double value = parameter.numberAt(1);
        return Wkt.plain(parameter.text(0)).startsWith("scale") && value > 0.5 ? (value - 1) * 1e6 : value;
    }

    private static SystemDefinition geographic(Wkt node) {
        var derived = node.child("DERIVINGCONVERSION");
        if (derived.isPresent()) {
            Wkt baseNode = node.child("BASEGEOGCRS", "BASEGEODCRS")
                    .orElseThrow(() -> new IllegalArgumentException("a derived system without its base"));
            return SystemDefinition.rotated(base(baseNode), PoleRotation.fromWkt(derived.get()));
        }
        double unit = angleUnit(node);
        if (Math.abs(unit / DEGREE - 1) > RATIO_TOLERANCE) {
            throw new IllegalArgumentException("its unit is not the degree");
        }
        return SystemDefinition.geographic(base(node));
    }

    /** Radians a unit, from the element itself or its coordinate system; degrees if it says nothing. */
    private static double angleUnit(Wkt node) {
        return node.child("UNIT", "ANGLEUNIT").or(() -> node.child("CS").flatMap(c -> c.child("ANGLEUNIT", "UNIT")))
                .or(() -> node.child("AXIS").flatMap(c -> c.child("ANGLEUNIT", "UNIT")))
                .map(u -> u.numberAt(1)).orElse(DEGREE);
    }

    private static GeographicSystem base(Wkt node) {
        Wkt datum = node.child("DATUM", "GEODETICDATUM", "TRF", "ENSEMBLE")
                .orElseThrow(() -> new IllegalArgumentException("no DATUM"));
        Wkt figure = datum.child("SPHEROID", "ELLIPSOID")
                .orElseThrow(() -> new IllegalArgumentException("no ellipsoid"));
        double metres = figure.child("LENGTHUNIT", "UNIT").map(u -> u.numberAt(1)).orElse(1.0);
        Ellipsoid ellipsoid = ellipsoid(figure.text(0), figure.epsg(), figure.numberAt(1) * metres, figure.numberAt(2));
        List<Double> shift = datum.child("TOWGS84").map(t -> t.values().stream().map(Double::valueOf)
                .collect(Collectors.toCollection(ArrayList::new))).orElseGet(ArrayList::new);
        while (shift.size() < 7) {
            shift.add(0.0);
        }
        String meridianName = node.child("PRIMEM").map(m -> m.text(0)).orElse("Greenwich");
        double meridian = node.child("PRIMEM").map(m -> m.numberAt(1) * m.child("ANGLEUNIT", "UNIT")
                .map(u -> u.numberAt(1) / DEGREE).orElse(1.0)).orElse(0.0);
        if (meridianName.equalsIgnoreCase("Paris")) {
            meridian = PARIS;
        }
        GeographicSystem read = new GeographicSystem(node.text(0), node.epsg(), datumName(datum.text(0)), datum.epsg(), ellipsoid,
                meridianName, meridian, shift.subList(0, 7));
        return settled(read);
    }

    static Ellipsoid ellipsoid(String name, int code, double semiMajor, double inverseFlattening) {
        if (!(semiMajor > 1e5 && semiMajor < 1e9) || inverseFlattening < 0
                || inverseFlattening > 0 && inverseFlattening < 2) {
            throw new IllegalArgumentException("an ellipsoid of " + semiMajor + " m and inverse flattening "
                    + inverseFlattening);
        }
        return new Ellipsoid(name, code, semiMajor, inverseFlattening > 1e9 ? 0 : inverseFlattening);
    }

    /** The spellings of widespread systems all mean the same one; it is given its code. */
    private static GeographicSystem settled(GeographicSystem read) {
        if (read.code() != 0 && read.code() != 4326 || !read.toWgs84().isEmpty() || read.meridian() != 0) {
            return read;
        }
        for (GeographicSystem known : List.of(GeographicSystem.WGS84, GeographicSystem.ETRS89, GeographicSystem.NAD83)) {
            boolean named = switch (Wkt.plain(read.datum())) {
                case "worldgeodeticsystem1984", "wgs1984", "wgs84", "worldgeodeticsystem1984ensemble" ->
                        known == GeographicSystem.WGS84;
                case "europeanterrestrialreferencesystem1989", "etrs1989", "europeanterrestrialreferencesystem1989ensemble" ->
                        known == GeographicSystem.ETRS89;
                case "northamericandatum1983", "northamerican1983" -> known == GeographicSystem.NAD83;
                default -> false;
            };
            if (named && known.ellipsoid().sameFigure(read.ellipsoid())) {
                return known;
            }
        }
        return read;
    }

    private static String datumName(String text) {
        String name = text.startsWith("D_") ? text.substring(2) : text;
        return name.equals("WGS_1984") ? GeographicSystem.WGS84.datum() : name.replace('_', ' ').trim();
    }

    private static SystemDefinition projected(Wkt node) {
        Wkt baseNode = node.child("GEOGCS", "BASEGEOGCRS", "BASEGEODCRS", "GEOGCRS")
                .orElseThrow(() -> new IllegalArgumentException("a projected system without its geographic one"));
        GeographicSystem base = base(baseNode);
        Wkt conversion = node.child("CONVERSION").orElse(node);
        String name = conversion.child("PROJECTION", "METHOD").map(m -> m.text(0))
                .orElseThrow(() -> new IllegalArgumentException("no PROJECTION"));
        ProjectionMethod method = ProjectionMethod.named(name).orElseThrow(() -> new IllegalArgumentException(
                "the projection '" + name + "' is not known; known are " + knownProjections()));
        double metres = node.child("UNIT", "LENGTHUNIT").or(() -> node.child("CS").flatMap(c -> c.child("LENGTHUNIT", "UNIT")))
                .or(() -> node.child("AXIS").flatMap(c -> c.child("LENGTHUNIT", "UNIT")))
                .map(u -> u.numberAt(1)).orElse(1.0);
        if (!(metres > 0)) {
            throw new IllegalArgumentException("a unit of " + metres + " m");
        }
        Map<ProjectionParameter, Double> parameters = new EnumMap<>(ProjectionParameter.class);
        double angle = angleUnit(baseNode);
        for (Wkt p : conversion.all("PARAMETER")) {
            ProjectionParameter.named(p.text(0)).ifPresent(known -> parameters.put(known, switch (known.measure()) {
                case ANGLE -> degrees(p.numberAt(1), p.child("ANGLEUNIT", "UNIT").map(u -> u.numberAt(1)).orElse(angle));
                case LENGTH -> p.numberAt(1) * p.child("LENGTHUNIT", "UNIT").map(u -> u.numberAt(1)).orElse(metres);
                case RATIO -> p.numberAt(1);
            }));
        }
        boolean web = node.child("EXTENSION").map(e -> e.text(1)).orElse("").matches(".*\\+proj=merc .*\\+b=6378137(\\.0*)? .*");
        method = refined(web ? ProjectionMethod.PSEUDO_MERCATOR : method, name, parameters);
        return SystemDefinition.projected(node.text(0), node.epsg(), base, method, parameters, metres);
    }

    private static double degrees(double value, double radiansPerUnit) {
        return Math.abs(radiansPerUnit / DEGREE - 1) < RATIO_TOLERANCE ? value : value * radiansPerUnit / DEGREE;
    }

    /** Settles the names that stand for two methods each. */
    private static ProjectionMethod refined(ProjectionMethod method, String name, Map<ProjectionParameter, Double> parameters) {
        Double parallel = parameters.get(ProjectionParameter.PARALLEL_1);
        Double latitude = parameters.get(ProjectionParameter.LATITUDE);
        if (method == ProjectionMethod.POLAR_A && parallel == null && latitude != null && Math.abs(latitude) < 90) {
            parameters.put(ProjectionParameter.PARALLEL_1, latitude);
            return ProjectionMethod.POLAR_B;
        }
        if (method == ProjectionMethod.LAMBERT_CONIC_2SP && Wkt.plain(name).equals("lambertconformalconic") && parallel == null) {
            return ProjectionMethod.LAMBERT_CONIC_1SP;
        }
        if (method == ProjectionMethod.LAMBERT_CONIC_2SP && parallel != null) {
            parameters.putIfAbsent(ProjectionParameter.PARALLEL_2, parallel);
        }
        if (method == ProjectionMethod.OBLIQUE_MERCATOR_A || method == ProjectionMethod.OBLIQUE_MERCATOR_B) {
            parameters.computeIfAbsent(ProjectionParameter.RECTIFIED_ANGLE, p -> parameters.get(ProjectionParameter.AZIMUTH));
        }
        return method;
    }

    static String knownProjections() {
        return java.util.Arrays.stream(ProjectionMethod.values()).map(ProjectionMethod::wkt2)
                .collect(Collectors.joining(", "));
    }
}
