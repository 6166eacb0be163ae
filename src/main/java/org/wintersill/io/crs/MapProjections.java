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

import org.geotools.api.parameter.ParameterValueGroup;
import org.geotools.api.referencing.FactoryException;
import org.geotools.api.referencing.operation.MathTransform;
import org.geotools.api.referencing.operation.NoninvertibleTransformException;
import org.geotools.api.referencing.operation.TransformException;
import org.geotools.referencing.operation.DefaultMathTransformFactory;

/** The map projections of GeoTools, set up from a definition, and transverse Mercator, which reaches farther here. */
final class MapProjections {
    private static final DefaultMathTransformFactory FACTORY = new DefaultMathTransformFactory();

    private MapProjections() {
    }

    /** @throws IllegalArgumentException when the numbers do not make a projection */
    static PlaneProjection of(SystemDefinition system) {
        if (system.method() == ProjectionMethod.TRANSVERSE_MERCATOR) {
            return new TransverseMercator(system);
        }
        MathTransform forward = geoTools(system);
        try {
            MathTransform inverse = forward.inverse();
            return new PlaneProjection() {
                @Override
                public boolean forward(double[] xy, int at) {
                    return apply(forward, xy, at);
                }

                @Override
                public boolean inverse(double[] xy, int at) {
                    return apply(inverse, xy, at);
                }
            };
        } catch (NoninvertibleTransformException e) {
            throw new IllegalArgumentException("the projection of " + system.name() + " has no inverse", e);
        }
    }

    private static boolean apply(MathTransform transform, double[] xy, int at) {
        try {
            transform.transform(xy, at, xy, at, 1);
            return true;
        } catch (TransformException | IllegalArgumentException | ArithmeticException e) {
            return false;
        }
    }

    private static MathTransform geoTools(SystemDefinition system) {
        try {
            return switch (system.method()) {
                case TRANSVERSE_MERCATOR -> throw new IllegalStateException("made by its own class");
                case MERCATOR_1SP, PSEUDO_MERCATOR -> make(system, "Mercator_1SP", "latitude_of_origin", "central_meridian");
                case MERCATOR_2SP -> make(system, "Mercator_2SP", "latitude_of_origin", "central_meridian");
                case LAMBERT_CONIC_1SP -> make(system, "Lambert_Conformal_Conic_1SP", "latitude_of_origin", "central_meridian");
                case LAMBERT_CONIC_2SP -> make(system, "Lambert_Conformal_Conic_2SP", "latitude_of_origin", "central_meridian");
                case LAMBERT_EQUAL_AREA -> make(system, "Lambert_Azimuthal_Equal_Area", "latitude_of_center", "longitude_of_center");
                case ALBERS -> make(system, "Albers_Conic_Equal_Area", "latitude_of_origin", "central_meridian");
                case POLAR_A -> make(system, "Polar_Stereographic", "latitude_of_origin", "central_meridian");
                case POLAR_B -> make(system, "Polar Stereographic (variant B)", "latitude_of_origin", "central_meridian");
                case DOUBLE_STEREOGRAPHIC -> make(system, "Oblique_Stereographic", "latitude_of_origin", "central_meridian");
                case STEREOGRAPHIC -> make(system, "Stereographic", "latitude_of_origin", "central_meridian");
                case OBLIQUE_MERCATOR_A -> make(system, "Hotine_Oblique_Mercator", "latitude_of_center", "longitude_of_center");
                case OBLIQUE_MERCATOR_B -> make(system, "Oblique_Mercator", "latitude_of_center", "longitude_of_center");
            };
        } catch (FactoryException e) {
            throw new IllegalArgumentException("the projection " + system.method().wkt2() + " cannot be set up: "
                    + e.getMessage(), e);
        }
    }

    private static MathTransform make(SystemDefinition s, String name, String latitude, String longitude) throws FactoryException {
        ParameterValueGroup group = FACTORY.getDefaultParameters(name);
        group.parameter("semi_major").setValue(s.base().ellipsoid().semiMajor());
        group.parameter("semi_minor").setValue(s.method() == ProjectionMethod.PSEUDO_MERCATOR
                ? s.base().ellipsoid().semiMajor() : s.base().ellipsoid().semiMinor());
        set(group, s, LATITUDE, latitude);
        set(group, s, LONGITUDE, longitude);
        set(group, s, PARALLEL_1, "standard_parallel_1");
        set(group, s, PARALLEL_2, "standard_parallel_2");
        set(group, s, SCALE, "scale_factor");
        set(group, s, AZIMUTH, "azimuth");
        set(group, s, RECTIFIED_ANGLE, "rectified_grid_angle");
        set(group, s, EASTING, "false_easting");
        set(group, s, NORTHING, "false_northing");
        return FACTORY.createParameterizedTransform(group);
    }

    private static void set(ParameterValueGroup group, SystemDefinition system, ProjectionParameter parameter, String name) {
        if (system.parameters().containsKey(parameter)) {
            group.parameter(name).setValue(system.value(parameter));
        }
    }
}
