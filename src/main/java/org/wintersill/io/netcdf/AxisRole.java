package org.wintersill.io.netcdf;

import java.util.Locale;
import java.util.Optional;

/**
 * What a dimension stands for, told from its coordinate variable: standard name first, then unit, then the axis attribute,
 * then the name (CF conventions 1.8, chapter 4).
 */
enum AxisRole {
    TIME, MEMBER, LATITUDE, LONGITUDE, ROTATED_LATITUDE, ROTATED_LONGITUDE, NORTHING, EASTING, OTHER;

    boolean isY() {
        return this == LATITUDE || this == ROTATED_LATITUDE || this == NORTHING;
    }

    boolean isX() {
        return this == LONGITUDE || this == ROTATED_LONGITUDE || this == EASTING;
    }

    /** The coordinate variable of a dimension: the one of its name, else the only one that makes a horizontal or time axis. */
    static Optional<CdfVariable> coordinate(CdfHeader header, String dimension) {
        Optional<CdfVariable> named = header.coordinate(dimension);
        if (named.isPresent()) {
            return named;
        }
        return header.all().stream()
                .filter(v -> v.rank() == 1 && v.dimensions().get(0).equals(dimension) && v.type().isNumeric())
                .filter(v -> of(v) != OTHER).findFirst();
    }

    static AxisRole of(CdfHeader header, String dimension) {
        return coordinate(header, dimension).map(AxisRole::of).orElseGet(() ->
                isMemberName(dimension.toLowerCase(Locale.ROOT)) ? MEMBER : OTHER);
    }

    static AxisRole of(CdfVariable coordinate) {
        String unit = coordinate.word("units");
        AxisRole byName = byStandardName(coordinate.word("standard_name"));
        if (byName != OTHER) {
            return byName;
        }
        String name = coordinate.name().toLowerCase(Locale.ROOT);
        if (unit.contains(" since ")) {
            return TIME;
        }
        if (name.equals("rlat") || name.equals("rlon")) {
            return name.equals("rlat") ? ROTATED_LATITUDE : ROTATED_LONGITUDE;
        }
        if (unit.matches("degrees?_?n(orth)?")) {
            return LATITUDE;
        }
        if (unit.matches("degrees?_?e(ast)?")) {
            return LONGITUDE;
        }
        if (isMemberName(name)) {
            return MEMBER;
        }
        boolean length = AxisUnit.metresPer(unit).isPresent();
        boolean degrees = unit.isEmpty() || unit.startsWith("deg");
        return switch (coordinate.word("axis")) {
            case "t" -> TIME;
            case "e" -> MEMBER;
            case "y" -> length ? NORTHING : degrees && isLatitudeName(name) ? LATITUDE : OTHER;
            case "x" -> length ? EASTING : degrees && isLongitudeName(name) ? LONGITUDE : OTHER;
            case "z" -> OTHER;
            default -> byPlainName(name, length, degrees);
        };
    }

    private static AxisRole byStandardName(String standardName) {
        return switch (standardName) {
            case "time" -> TIME;
            case "realization" -> MEMBER;
            case "latitude" -> LATITUDE;
            case "longitude" -> LONGITUDE;
            case "grid_latitude" -> ROTATED_LATITUDE;
            case "grid_longitude" -> ROTATED_LONGITUDE;
            case "projection_y_coordinate" -> NORTHING;
            case "projection_x_coordinate" -> EASTING;
            default -> OTHER;
        };
    }

    private static AxisRole byPlainName(String name, boolean length, boolean degrees) {
        if (degrees && isLatitudeName(name)) {
            return LATITUDE;
        }
        if (degrees && isLongitudeName(name)) {
            return LONGITUDE;
        }
        return switch (name) {
            case "y", "yc", "northing", "north" -> length ? NORTHING : OTHER;
            case "x", "xc", "easting", "east" -> length ? EASTING : OTHER;
            default -> OTHER;
        };
    }

    private static boolean isLatitudeName(String name) {
        return name.equals("lat") || name.equals("latitude");
    }

    private static boolean isLongitudeName(String name) {
        return name.equals("lon") || name.equals("longitude") || name.equals("long");
    }

    private static boolean isMemberName(String name) {
        return switch (name) {
            case "member", "members", "realization", "ensemble", "ensemble_member", "ens", "number" -> true;
            default -> false;
        };
    }
}
