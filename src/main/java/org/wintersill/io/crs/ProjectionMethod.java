package org.wintersill.io.crs;

import static org.wintersill.io.crs.ProjectionParameter.AZIMUTH;
import static org.wintersill.io.crs.ProjectionParameter.EASTING;
import static org.wintersill.io.crs.ProjectionParameter.LATITUDE;
import static org.wintersill.io.crs.ProjectionParameter.LONGITUDE;
import static org.wintersill.io.crs.ProjectionParameter.NORTHING;
import static org.wintersill.io.crs.ProjectionParameter.PARALLEL_1;
import static org.wintersill.io.crs.ProjectionParameter.PARALLEL_2;
import static org.wintersill.io.crs.ProjectionParameter.RECTIFIED_ANGLE;
import static org.wintersill.io.crs.ProjectionParameter.SCALE;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/**
 * The map projections that can be read and written, with their names and numbers in each form: WKT 1 (GDAL flavour),
 * WKT 2 with EPSG method and parameter codes (EPSG dataset), GeoTIFF coordinate transformation (GeoTIFF 1.1, annex C)
 * and the spellings of other writers.
 */
enum ProjectionMethod {
    TRANSVERSE_MERCATOR("Transverse_Mercator", "Transverse Mercator", 9807, 1, List.of("gausskruger"),
            slot(LATITUDE, "latitude_of_origin", "Latitude of natural origin", 8801, 3081),
            slot(LONGITUDE, "central_meridian", "Longitude of natural origin", 8802, 3080),
            slot(SCALE, "scale_factor", "Scale factor at natural origin", 8805, 3092), easting(), northing()),
    MERCATOR_1SP("Mercator_1SP", "Mercator (variant A)", 9804, 7, List.of("mercatorvarianta"),
            slot(LATITUDE, "latitude_of_origin", "Latitude of natural origin", 8801, 3081),
            slot(LONGITUDE, "central_meridian", "Longitude of natural origin", 8802, 3080),
            slot(SCALE, "scale_factor", "Scale factor at natural origin", 8805, 3092), easting(), northing()),
    MERCATOR_2SP("Mercator_2SP", "Mercator (variant B)", 9805, 7, List.of("mercatorvariantb", "mercator"),
            slot(PARALLEL_1, "standard_parallel_1", "Latitude of 1st standard parallel", 8823, 3078),
            slot(LONGITUDE, "central_meridian", "Longitude of natural origin", 8802, 3080), easting(), northing()),
    PSEUDO_MERCATOR("Mercator_1SP", "Popular Visualisation Pseudo Mercator", 1024, 0,
            List.of("popularvisualisationpseudomercator", "mercatorauxiliarysphere"),
            slot(LATITUDE, "latitude_of_origin", "Latitude of natural origin", 8801, 0),
            slot(LONGITUDE, "central_meridian", "Longitude of natural origin", 8802, 0), easting(), northing()),
    LAMBERT_CONIC_1SP("Lambert_Conformal_Conic_1SP", "Lambert Conic Conformal (1SP)", 9801, 9,
            List.of("lambertconicconformal1sp"),
            slot(LATITUDE, "latitude_of_origin", "Latitude of natural origin", 8801, 3081),
            slot(LONGITUDE, "central_meridian", "Longitude of natural origin", 8802, 3080),
            slot(SCALE, "scale_factor", "Scale factor at natural origin", 8805, 3092), easting(), northing()),
    LAMBERT_CONIC_2SP("Lambert_Conformal_Conic_2SP", "Lambert Conic Conformal (2SP)", 9802, 8,
            List.of("lambertconicconformal2sp", "lambertconformalconic"),
            slot(LATITUDE, "latitude_of_origin", "Latitude of false origin", 8821, 3085),
            slot(LONGITUDE, "central_meridian", "Longitude of false origin", 8822, 3084),
            slot(PARALLEL_1, "standard_parallel_1", "Latitude of 1st standard parallel", 8823, 3078),
            slot(PARALLEL_2, "standard_parallel_2", "Latitude of 2nd standard parallel", 8824, 3079),
            slot(EASTING, "false_easting", "Easting at false origin", 8826, 3086),
            slot(NORTHING, "false_northing", "Northing at false origin", 8827, 3087)),
    LAMBERT_EQUAL_AREA("Lambert_Azimuthal_Equal_Area", "Lambert Azimuthal Equal Area", 9820, 10,
            List.of("lambertazimuthalequalareaspherical"),
            slot(LATITUDE, "latitude_of_center", "Latitude of natural origin", 8801, 3089),
            slot(LONGITUDE, "longitude_of_center", "Longitude of natural origin", 8802, 3088), easting(), northing()),
    ALBERS("Albers_Conic_Equal_Area", "Albers Equal Area", 9822, 11, List.of("albersequalarea", "albers"),
            slot(LATITUDE, "latitude_of_center", "Latitude of false origin", 8821, 3081),
            slot(LONGITUDE, "longitude_of_center", "Longitude of false origin", 8822, 3080),
            slot(PARALLEL_1, "standard_parallel_1", "Latitude of 1st standard parallel", 8823, 3078),
            slot(PARALLEL_2, "standard_parallel_2", "Latitude of 2nd standard parallel", 8824, 3079),
            slot(EASTING, "false_easting", "Easting at false origin", 8826, 3082),
            slot(NORTHING, "false_northing", "Northing at false origin", 8827, 3083)),
    POLAR_A("Polar_Stereographic", "Polar Stereographic (variant A)", 9810, 15,
            List.of("polarstereographicvarianta"),
            slot(LATITUDE, "latitude_of_origin", "Latitude of natural origin", 8801, 3081),
            slot(LONGITUDE, "central_meridian", "Longitude of natural origin", 8802, 3095),
            slot(SCALE, "scale_factor", "Scale factor at natural origin", 8805, 3092), easting(), northing()),
    POLAR_B("Polar_Stereographic", "Polar Stereographic (variant B)", 9829, 15,
            List.of("polarstereographicvariantb", "stereographicnorthpole", "stereographicsouthpole"),
            slot(PARALLEL_1, "latitude_of_origin", "Latitude of standard parallel", 8832, 3081),
            slot(LONGITUDE, "central_meridian", "Longitude of origin", 8833, 3095), easting(), northing()),
    DOUBLE_STEREOGRAPHIC("Oblique_Stereographic", "Oblique Stereographic", 9809, 16, List.of("doublestereographic"),
            slot(LATITUDE, "latitude_of_origin", "Latitude of natural origin", 8801, 3089),
            slot(LONGITUDE, "central_meridian", "Longitude of natural origin", 8802, 3088),
            slot(SCALE, "scale_factor", "Scale factor at natural origin", 8805, 3092), easting(), northing()),
    STEREOGRAPHIC("Stereographic", "Stereographic", 0, 14, List.of(),
            slot(LATITUDE, "latitude_of_origin", "Latitude of natural origin", 8801, 3089),
            slot(LONGITUDE, "central_meridian", "Longitude of natural origin", 8802, 3088),
            slot(SCALE, "scale_factor", "Scale factor at natural origin", 8805, 3092), easting(), northing()),
    OBLIQUE_MERCATOR_A("Hotine_Oblique_Mercator", "Hotine Oblique Mercator (variant A)", 9812, 0,
            List.of("hotineobliquemercatorvarianta"),
            slot(LATITUDE, "latitude_of_center", "Latitude of projection centre", 8811, 0),
            slot(LONGITUDE, "longitude_of_center", "Longitude of projection centre", 8812, 0),
            slot(AZIMUTH, "azimuth", "Azimuth of initial line", 8813, 0),
            slot(RECTIFIED_ANGLE, "rectified_grid_angle", "Angle from Rectified to Skew Grid", 8814, 0),
            slot(SCALE, "scale_factor", "Scale factor on initial line", 8815, 0), easting(), northing()),
    OBLIQUE_MERCATOR_B("Hotine_Oblique_Mercator_Azimuth_Center", "Hotine Oblique Mercator (variant B)", 9815, 0,
            List.of("hotineobliquemercatorvariantb", "obliquemercator"),
            slot(LATITUDE, "latitude_of_center", "Latitude of projection centre", 8811, 0),
            slot(LONGITUDE, "longitude_of_center", "Longitude of projection centre", 8812, 0),
            slot(AZIMUTH, "azimuth", "Azimuth of initial line", 8813, 0),
            slot(RECTIFIED_ANGLE, "rectified_grid_angle", "Angle from Rectified to Skew Grid", 8814, 0),
            slot(SCALE, "scale_factor", "Scale factor on initial line", 8815, 0),
            slot(EASTING, "false_easting", "Easting at projection centre", 8816, 0),
            slot(NORTHING, "false_northing", "Northing at projection centre", 8817, 0));

    /**
     * One number of a projection.
     *
     * @param wkt1 name in WKT 1
     * @param wkt2 name in the EPSG dataset
     * @param epsg EPSG code of the parameter
     * @param geoKey GeoTIFF key, 0 where there is none
     */
    record Slot(ProjectionParameter parameter, String wkt1, String wkt2, int epsg, int geoKey) {
    }

    private final String wkt1;
    private final String wkt2;
    private final int epsg;
    private final int geoTiff;
    private final List<String> spellings;
    private final List<Slot> slots;

    ProjectionMethod(String wkt1, String wkt2, int epsg, int geoTiff, List<String> spellings, Slot... slots) {
        this.wkt1 = wkt1;
        this.wkt2 = wkt2;
        this.epsg = epsg;
        this.geoTiff = geoTiff;
        this.spellings = spellings;
        this.slots = List.of(slots);
    }

    private static Slot slot(ProjectionParameter parameter, String wkt1, String wkt2, int epsg, int geoKey) {
        return new Slot(parameter, wkt1, wkt2, epsg, geoKey);
    }

    private static Slot easting() {
        return slot(EASTING, "false_easting", "False easting", 8806, 3082);
    }

    private static Slot northing() {
        return slot(NORTHING, "false_northing", "False northing", 8807, 3083);
    }

    String wkt1() {
        return wkt1;
    }

    String wkt2() {
        return wkt2;
    }

    /** EPSG code of the method; 0 for none. */
    int epsg() {
        return epsg;
    }

    /** Value of ProjCoordTransGeoKey; 0 where GeoTIFF has none that is read everywhere. */
    int geoTiff() {
        return geoTiff;
    }

    List<Slot> slots() {
        return slots;
    }

    /** The method of a name in WKT of any writer; polar stereographic comes out as variant A. */
    static Optional<ProjectionMethod> named(String text) {
        String plain = Wkt.plain(text);
        Optional<ProjectionMethod> byName = Arrays.stream(values())
                .filter(m -> Wkt.plain(m.wkt1).equals(plain) || Wkt.plain(m.wkt2).equals(plain)).findFirst();
        return byName.isPresent() ? byName
                : Arrays.stream(values()).filter(m -> m.spellings.contains(plain)).findFirst();
    }
}
