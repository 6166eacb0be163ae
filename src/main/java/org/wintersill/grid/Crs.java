package org.wintersill.grid;

import java.io.Serializable;
import java.util.Objects;

/**
 * Name and definition of a coordinate reference system, as a value that may travel.
 *
 * @param code authority and code such as {@code EPSG:4326}; empty for a definition without one
 * @param name readable name
 * @param wkt definition as WKT 1 (GeoTIFF and GeoPackage flavour); for a rotated pole that of its unrotated geographic system
 * @param kind what the coordinates are
 * @param metresPerUnit length of one unit of a projected axis in metres; 1 for angles
 * @param pole the rotated pole; null unless {@code kind} is {@link Kind#ROTATED_POLE}
 */
public record Crs(String code, String name, String wkt, Kind kind, double metresPerUnit, RotatedPole pole)
        implements Serializable {

    /** What the two coordinates are. */
    public enum Kind {
        /** Longitude and latitude in degrees. */
        GEOGRAPHIC,
        /** Easting and northing in units of length. */
        PROJECTED,
        /** Longitude and latitude in degrees of a sphere whose pole was moved. */
        ROTATED_POLE
    }

    /**
     * Position of the rotated pole (CF appendix F, {@code rotated_latitude_longitude}).
     *
     * @param latitude grid_north_pole_latitude, degrees
     * @param longitude grid_north_pole_longitude, degrees
     * @param gridLongitude north_pole_grid_longitude, degrees; usually 0
     */
    public record RotatedPole(double latitude, double longitude, double gridLongitude) implements Serializable {
    }

    public Crs {
        Objects.requireNonNull(code);
        Objects.requireNonNull(name);
        Objects.requireNonNull(wkt);
        if ((kind == Kind.ROTATED_POLE) != (pole != null)) {
            throw new IllegalArgumentException("a rotated pole goes with its kind and with no other");
        }
    }

    /** Whether coordinates are degrees on the globe, rotated or not. */
    public boolean angular() {
        return kind != Kind.PROJECTED;
    }

    /** Same system: the same code where both have one, otherwise the same definition. */
    public boolean sameAs(Crs other) {
        if (kind != other.kind || !Objects.equals(pole, other.pole)) {
            return false;
        }
        if (!code.isEmpty() && !other.code.isEmpty()) {
            return code.equals(other.code);
        }
        return wkt.equals(other.wkt);
    }

    /** Code if there is one, otherwise the name. */
    public String label() {
        return code.isEmpty() ? name : code;
    }
}
