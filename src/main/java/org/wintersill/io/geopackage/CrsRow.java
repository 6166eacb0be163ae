package org.wintersill.io.geopackage;

import java.util.Objects;
import org.wintersill.grid.Crs;

/**
 * A row of {@code gpkg_spatial_ref_sys}.
 *
 * @param srsId number that tables and geometries refer to
 * @param organization {@code EPSG}, or {@code NONE} for a system without a code
 * @param organizationId code of the organization
 * @param name readable name
 * @param definitionWkt1 definition as WKT 1; empty where the system has none
 * @param definitionWkt2 definition as WKT 2; empty where unknown
 * @param description a few words, may be empty
 */
public record CrsRow(int srsId, String organization, int organizationId, String name, String definitionWkt1,
                     String definitionWkt2, String description) {

    /** Numbers from here on are free for systems without a code: EPSG codes have at most five digits. */
    public static final int FIRST_OWN_ID = 100_000;

    /** Longitude and latitude of WGS 84, which every GeoPackage must list (EPSG 4326). */
    public static final CrsRow WGS84 = new CrsRow(4326, "EPSG", 4326, "WGS 84",
            "GEOGCS[\"WGS 84\",DATUM[\"WGS_1984\",SPHEROID[\"WGS 84\",6378137,298.257223563,"
                    + "AUTHORITY[\"EPSG\",\"7030\"]],AUTHORITY[\"EPSG\",\"6326\"]],"
                    + "PRIMEM[\"Greenwich\",0,AUTHORITY[\"EPSG\",\"8901\"]],"
                    + "UNIT[\"degree\",0.0174532925199433,AUTHORITY[\"EPSG\",\"9122\"]],AUTHORITY[\"EPSG\",\"4326\"]]",
            "GEODCRS[\"WGS 84\",DATUM[\"World Geodetic System 1984\",ELLIPSOID[\"WGS 84\",6378137,298.257223563,"
                    + "LENGTHUNIT[\"metre\",1]]],PRIMEM[\"Greenwich\",0,ANGLEUNIT[\"degree\",0.0174532925199433]],"
                    + "CS[ellipsoidal,2],AXIS[\"geodetic latitude (Lat)\",north,ORDER[1],"
                    + "ANGLEUNIT[\"degree\",0.0174532925199433]],AXIS[\"geodetic longitude (Lon)\",east,ORDER[2],"
                    + "ANGLEUNIT[\"degree\",0.0174532925199433]],ID[\"EPSG\",4326]]",
            "longitude and latitude in degrees");

    static final CrsRow UNDEFINED_CARTESIAN = new CrsRow(-1, "NONE", -1, "Undefined Cartesian SRS", "", "",
            "undefined Cartesian coordinate reference system");
    static final CrsRow UNDEFINED_GEOGRAPHIC = new CrsRow(0, "NONE", 0, "Undefined geographic SRS", "", "",
            "undefined geographic coordinate reference system");

    public CrsRow {
        Objects.requireNonNull(organization);
        Objects.requireNonNull(name);
        Objects.requireNonNull(definitionWkt1);
        Objects.requireNonNull(definitionWkt2);
        if (srsId > 0 && definitionWkt1.isEmpty() && definitionWkt2.isEmpty()) {
            throw new IllegalArgumentException("reference system " + srsId + " has no definition");
        }
    }

    /**
     * The row of a reference system: under its EPSG code if it has one, otherwise under {@code ownId}.
     *
     * @param wkt2 definition as WKT 2; empty where unknown. A rotated pole can be told in WKT 2 only, so its WKT 1, which
     *             is that of the unrotated system, is left out where {@code wkt2} is given
     * @param ownId number for a system without EPSG code, from {@link #FIRST_OWN_ID}
     */
    public static CrsRow of(Crs crs, String wkt2, int ownId) {
        String wkt1 = crs.kind() == Crs.Kind.ROTATED_POLE && !wkt2.isEmpty() ? "" : crs.wkt();
        if (crs.code().matches("EPSG:[0-9]{1,5}")) {
            int code = Integer.parseInt(crs.code().substring(5));
            return new CrsRow(code, "EPSG", code, crs.name(), wkt1, wkt2, "");
        }
        if (ownId < FIRST_OWN_ID) {
            throw new IllegalArgumentException("own reference systems are numbered from " + FIRST_OWN_ID + ": " + ownId);
        }
        return new CrsRow(ownId, "NONE", ownId, crs.name(), wkt1, wkt2, "defined by the input");
    }
}
