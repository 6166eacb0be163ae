package org.wintersill.io.crs;

import java.util.stream.Collectors;

/**
 * Writes a definition as WKT 1 in the flavour that GDAL writes and GeoPackage files hold (OGC 01-009). Axes are left
 * out: the text then means x, y.
 */
final class Wkt1Writer {
    private Wkt1Writer() {
    }

    static String write(SystemDefinition system) {
        if (system.method() == null) {
            return geographic(system.base());
        }
        StringBuilder out = new StringBuilder(600);
        out.append("PROJCS[").append(quote(system.name())).append(',').append(geographic(system.base()));
        out.append(",PROJECTION[").append(quote(system.method().wkt1())).append(']');
        for (ProjectionMethod.Slot slot : system.method().slots()) {
            double value = system.value(slot.parameter());
            if (slot.parameter().measure() == ProjectionParameter.Measure.LENGTH) {
                value /= system.metresPerUnit();
            }
            parameter(out, slot.wkt1(), value);
            if (system.method() == ProjectionMethod.POLAR_B && slot.parameter() == ProjectionParameter.LONGITUDE
                    || system.method() == ProjectionMethod.PSEUDO_MERCATOR && slot.parameter() == ProjectionParameter.LONGITUDE) {
                parameter(out, "scale_factor", 1);
            }
        }
        out.append(",UNIT[").append(quote(Units.name(system.metresPerUnit()))).append(',')
                .append(Wkt.number(system.metresPerUnit())).append(authority(Units.code(system.metresPerUnit()))).append(']');
        if (system.method() == ProjectionMethod.PSEUDO_MERCATOR) {
            out.append(",EXTENSION[\"PROJ4\",").append(quote(webMercator(system))).append(']');
        }
        return out.append(authority(system.code())).append(']').toString();
    }

    /** The only way in which WKT 1 can say that the sphere of the axis is used on the ellipsoid's latitudes. */
    private static String webMercator(SystemDefinition system) {
        return "+proj=merc +a=6378137 +b=6378137 +lat_ts=0 +lon_0=" + Wkt.number(system.value(ProjectionParameter.LONGITUDE))
                + " +x_0=" + Wkt.number(system.value(ProjectionParameter.EASTING))
                + " +y_0=" + Wkt.number(system.value(ProjectionParameter.NORTHING))
                + " +k=1 +units=m +nadgrids=@null +wktext +no_defs";
    }

    private static void parameter(StringBuilder out, String name, double value) {
        out.append(",PARAMETER[").append(quote(name)).append(',').append(Wkt.number(value)).append(']');
    }

    private static String geographic(GeographicSystem base) {
        Ellipsoid figure = base.ellipsoid();
        String shift = base.toWgs84().isEmpty() ? ""
                : base.toWgs84().stream().map(Wkt::number).collect(Collectors.joining(",", ",TOWGS84[", "]"));
        return "GEOGCS[" + quote(base.name()) + ",DATUM[" + quote(datum(base.datum())) + ",SPHEROID[" + quote(figure.name()) + ','
                + Wkt.number(figure.semiMajor()) + ',' + Wkt.number(figure.inverseFlattening()) + authority(figure.code()) + ']'
                + shift + authority(base.datumCode()) + "],PRIMEM[" + quote(base.meridianName()) + ','
                + Wkt.number(base.meridian()) + (base.meridian() == 0 ? authority(8901) : "")
                + "],UNIT[\"degree\",0.0174532925199433" + authority(9122) + ']' + authority(base.code()) + ']';
    }

    private static String datum(String name) {
        return name.equals(GeographicSystem.WGS84.datum()) ? "WGS_1984" : name.replaceAll("[^A-Za-z0-9+-]+", "_");
    }

    private static String authority(int code) {
        return code == 0 ? "" : ",AUTHORITY[\"EPSG\",\"" + code + "\"]";
    }

    private static String quote(String text) {
        return '"' + text.replace("\"", "\"\"") + '"';
    }
}
