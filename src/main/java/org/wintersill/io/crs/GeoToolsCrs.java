package org.wintersill.io.crs;

import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.concurrent.ConcurrentHashMap;
import org.wintersill.grid.CoordinateOperation;
import org.wintersill.grid.CoordinateOperations;
import org.wintersill.grid.Crs;
import org.wintersill.grid.CrsParser;
import org.wintersill.problem.Problem;
import org.wintersill.problem.ProblemException;

/**
 * Coordinate reference systems on top of GeoTools: its EPSG dataset for codes and its map projections for coordinates.
 * Longitude or easting always comes first. Thread-safe; nothing is loaded before it is needed.
 */
public final class GeoToolsCrs implements CrsParser, CoordinateOperations {
    private static final String OTHER_SYSTEM = "Bring the data to another system first, for example with gdalwarp -t_srs EPSG:4326";
    private static final Crs WGS84 = SystemDefinition.geographic(GeographicSystem.WGS84).toCrs();

    private final Map<Integer, Crs> byCode = new ConcurrentHashMap<>();

    @Override
    public Crs wgs84() {
        return WGS84;
    }

    @Override
    public Crs fromCode(String code) {
        String plain = code.trim().toUpperCase(Locale.ROOT);
        if (plain.equals("OGC:CRS84") || plain.equals("CRS:84")) {
            return WGS84;
        }
        if (!plain.matches("EPSG:[0-9]{1,9}")) {
            throw Problem.input("'" + code + "' does not name a coordinate reference system", "",
                    "Write it as EPSG: and a number, such as EPSG:4326 or EPSG:2056").asException();
        }
        int number = Integer.parseInt(plain.substring(5));
        Crs known = byCode.get(number);
        if (known == null) {
            known = EpsgDatabase.definition(number).toCrs();
            byCode.put(number, known);
        }
        return known;
    }

    @Override
    public Crs fromWkt(String wkt) {
        try {
            return WktReader.read(wkt).toCrs();
        } catch (IllegalArgumentException e) {
            throw Problem.input("The coordinate reference system is refused: " + e.getMessage() + " (text: '"
                    + excerpt(wkt) + "')", "", OTHER_SYSTEM + ", or name it with crs:").asException(e);
        }
    }

    private static String excerpt(String text) {
        String line = text.replaceAll("\\s+", " ").trim();
        return line.length() <= 80 ? line : line.substring(0, 77) + "...";
    }

    /**
     * {@inheritDoc}
     *
     * <p>A {@code crs_wkt} that can be read comes before the single parameters, save for a rotated pole. WGS 84 is assumed
     * where the mapping gives no figure of the Earth.
     */
    @Override
    public Crs fromGridMapping(Map<String, Object> attributes, double metresPerAxisUnit) {
        GridMappingAttributes a = new GridMappingAttributes(attributes);
        String name = a.text("grid_mapping_name");
        String wkt = a.has("crs_wkt") ? a.text("crs_wkt") : a.text("spatial_ref");
        try {
            if (!wkt.isEmpty() && !name.equals("rotated_latitude_longitude")) {
                SystemDefinition read = definition(wkt, !name.isEmpty());
                if (read != null) {
                    return (read.method() == null ? read : read.withUnit(metresPerAxisUnit)).toCrs();
                }
            }
            return CfGridMapping.read(a, metresPerAxisUnit).toCrs();
        } catch (IllegalArgumentException e) {
            throw Problem.input("The grid mapping is refused: " + e.getMessage(), "",
                    "Mend the attributes of the grid mapping variable, or name the system with crs:").asException(e);
        }
    }

    /** Null where the text cannot be read and something else can take its place. */
    private static SystemDefinition definition(String wkt, boolean replaceable) {
        try {
            return WktReader.read(wkt);
        } catch (IllegalArgumentException e) {
            if (replaceable) {
                return null;
            }
            throw new IllegalArgumentException("crs_wkt: " + e.getMessage(), e);
        }
    }

    @Override
    public CoordinateOperation between(Crs from, Crs to) {
        if (from.sameAs(to)) {
            return CoordinateOperation.identity();
        }
        try {
            SystemDefinition source = SystemDefinition.of(from);
            SystemDefinition target = SystemDefinition.of(to);
            if (source.samePlaces(target)) {
                return CoordinateOperation.identity();
            }
            DatumShift shift = source.base().samePlaces(target.base())
                    ? new DatumShift(source.base(), List.of(), target.base(), List.of())
                    : new DatumShift(source.base(), shift(source.base()), target.base(), shift(target.base()));
            return new SystemOperation(source, target, shift);
        } catch (IllegalArgumentException e) {
            throw Problem.input("There is no way from " + from.label() + " to " + to.label() + ": " + e.getMessage(), "",
                    OTHER_SYSTEM).asException(e);
        }
    }

    /** Parameters to WGS 84: those of the text; else, for a datum known by code, those of the EPSG dataset. */
    private static List<Double> shift(GeographicSystem base) {
        if (!base.toWgs84().isEmpty() || base.code() == 0 || base.ellipsoid().sameFigure(Ellipsoid.WGS84)
                || base.ellipsoid().sameFigure(Ellipsoid.GRS80)) {
            return base.toWgs84();
        }
        try {
            return EpsgDatabase.definition(base.code()).base().toWgs84();
        } catch (ProblemException e) {
            return List.of();
        }
    }
}
