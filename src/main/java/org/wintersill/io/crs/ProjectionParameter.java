package org.wintersill.io.crs;

import java.util.Arrays;
import java.util.Optional;

/** What the numbers of a map projection mean, with every spelling under which WKT names them (letters and digits only). */
enum ProjectionParameter {
    LATITUDE(Measure.ANGLE, 0, "latitudeoforigin", "latitudeofcenter", "latitudeofcentre", "latitudeofnaturalorigin",
            "latitudeoffalseorigin", "latitudeofprojectioncentre", "latitudeofprojectioncenter", "centralparallel"),
    LONGITUDE(Measure.ANGLE, 0, "centralmeridian", "longitudeofcenter", "longitudeofcentre", "longitudeoforigin",
            "longitudeofnaturalorigin", "longitudeoffalseorigin", "longitudeofprojectioncentre",
            "longitudeofprojectioncenter", "straightverticallongitudefrompole"),
    PARALLEL_1(Measure.ANGLE, Double.NaN, "standardparallel1", "standardparallel", "latitudeof1ststandardparallel",
            "latitudeofstandardparallel"),
    PARALLEL_2(Measure.ANGLE, Double.NaN, "standardparallel2", "latitudeof2ndstandardparallel"),
    SCALE(Measure.RATIO, 1, "scalefactor", "scalefactoratnaturalorigin", "scalefactoroninitialline",
            "scalefactoratprojectioncentre"),
    AZIMUTH(Measure.ANGLE, Double.NaN, "azimuth", "azimuthofinitialline", "azimuthatprojectioncentre"),
    RECTIFIED_ANGLE(Measure.ANGLE, 90, "rectifiedgridangle", "anglefromrectifiedtoskewgrid"),
    EASTING(Measure.LENGTH, 0, "falseeasting", "eastingatfalseorigin", "eastingatprojectioncentre"),
    NORTHING(Measure.LENGTH, 0, "falsenorthing", "northingatfalseorigin", "northingatprojectioncentre");

    /** Kind of quantity; decides the unit in texts. */
    enum Measure { ANGLE, LENGTH, RATIO }

    private final Measure measure;
    private final double usual;
    private final String[] spellings;

    ProjectionParameter(Measure measure, double usual, String... spellings) {
        this.measure = measure;
        this.usual = usual;
        this.spellings = spellings;
    }

    Measure measure() {
        return measure;
    }

    /** Value where a text leaves the parameter out; NaN if it must be given. */
    double usual() {
        return usual;
    }

    static Optional<ProjectionParameter> named(String text) {
        String plain = Wkt.plain(text);
        return Arrays.stream(values()).filter(p -> Arrays.asList(p.spellings).contains(plain)).findFirst();
    }
}
