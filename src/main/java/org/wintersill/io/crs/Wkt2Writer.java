package org.wintersill.io.crs;

import org.wintersill.grid.Crs;

/**
 * Writes a definition as WKT 2:2019 (OGC 18-010). The axes of a system with an EPSG code are those of the code only where
 * they are x, y or latitude, longitude; elsewhere the text keeps x, y, as most readers of rasters do.
 */
final class Wkt2Writer {
    private static final String DEGREE = "ANGLEUNIT[\"degree\",0.0174532925199433]";

    private Wkt2Writer() {
    }

    static String write(SystemDefinition system) {
        if (system.pole() != null) {
            return rotated(system);
        }
        if (system.method() == null) {
            return "GEOGCRS[" + quote(system.name()) + ',' + datum(system.base()) + ',' + latLon() + id(system.code()) + ']';
        }
        String unit = lengthUnit(system.metresPerUnit());
        StringBuilder out = new StringBuilder(900);
        out.append("PROJCRS[").append(quote(system.name())).append(",BASEGEOGCRS[").append(quote(system.base().name())).append(',')
                .append(datum(system.base())).append(id(system.base().code())).append("],CONVERSION[").append(quote(system.method().wkt2()))
                .append(",METHOD[").append(quote(system.method().wkt2())).append(id(system.method().epsg())).append(']');
        for (ProjectionMethod.Slot slot : system.method().slots()) {
            double value = system.value(slot.parameter());
            String unitText = switch (slot.parameter().measure()) {
                case ANGLE -> DEGREE;
                case LENGTH -> unit;
                case RATIO -> "SCALEUNIT[\"unity\",1]";
            };
            if (slot.parameter().measure() == ProjectionParameter.Measure.LENGTH) {
                value /= system.metresPerUnit();
            }
            out.append(",PARAMETER[").append(quote(slot.wkt2())).append(',').append(Wkt.number(value)).append(',').append(unitText)
                    .append(id(slot.epsg())).append(']');
        }
        String[] directions = directions(system);
        return out.append("],CS[Cartesian,2],AXIS[\"easting (E)\",").append(directions[0]).append(",ORDER[1],").append(unit)
                .append("],AXIS[\"northing (N)\",").append(directions[1]).append(",ORDER[2],").append(unit).append(']')
                .append(id(system.code())).append(']').toString();
    }

    /** East and north; on a pole both run south (or north) along meridians, which GDAL counts from 0 where there is no code. */
    private static String[] directions(SystemDefinition system) {
        if (system.method() != ProjectionMethod.POLAR_A && system.method() != ProjectionMethod.POLAR_B) {
            return new String[] {"east", "north"};
        }
        boolean north = system.value(system.method() == ProjectionMethod.POLAR_A ? ProjectionParameter.LATITUDE : ProjectionParameter.PARALLEL_1) > 0;
        double from = system.code() == 0 ? 0 : system.value(ProjectionParameter.LONGITUDE);
        return new String[] {(north ? "south" : "north") + meridian(from + 90), (north ? "south" : "north") + meridian(north ? from + 180 : from)};
    }

    private static String meridian(double longitude) {
        double wrapped = longitude == 180 ? 180 : PoleRotation.wrap(longitude);
        return ",MERIDIAN[" + Wkt.number(wrapped) + ',' + DEGREE + ']';
    }

    private static String rotated(SystemDefinition system) {
        Crs.RotatedPole pole = system.pole();
        String suffix = " (netCDF CF convention)\",";
        return "GEOGCRS[" + quote(system.name()) + ",BASEGEOGCRS[" + quote(system.base().name()) + ',' + datum(system.base())
                + "],DERIVINGCONVERSION[\"Pole rotation (netCDF CF convention)\",METHOD[\"Pole rotation (netCDF CF convention)\"]"
                + ",PARAMETER[\"Grid north pole latitude" + suffix + Wkt.number(pole.latitude()) + ',' + DEGREE
                + "],PARAMETER[\"Grid north pole longitude" + suffix + Wkt.number(pole.longitude()) + ',' + DEGREE
                + "],PARAMETER[\"North pole grid longitude" + suffix + Wkt.number(pole.gridLongitude()) + ',' + DEGREE
                + "]]," + latLon() + ']';
    }

    private static String latLon() {
        return "CS[ellipsoidal,2],AXIS[\"latitude\",north,ORDER[1]," + DEGREE + "],AXIS[\"longitude\",east,ORDER[2]," + DEGREE + ']';
    }

    private static String datum(GeographicSystem base) {
        Ellipsoid figure = base.ellipsoid();
        return "DATUM[" + quote(base.datum()) + ",ELLIPSOID[" + quote(figure.name()) + ',' + Wkt.number(figure.semiMajor()) + ','
                + Wkt.number(figure.inverseFlattening()) + ",LENGTHUNIT[\"metre\",1]]],PRIMEM[" + quote(base.meridianName()) + ','
                + Wkt.number(base.meridian()) + ',' + DEGREE + ']';
    }

    private static String lengthUnit(double metres) {
        return "LENGTHUNIT[" + quote(Units.name(metres)) + ',' + Wkt.number(metres) + ']';
    }

    private static String id(int code) {
        return code == 0 ? "" : ",ID[\"EPSG\"," + code + ']';
    }

    private static String quote(String text) {
        return '"' + text.replace("\"", "\"\"") + '"';
    }
}
