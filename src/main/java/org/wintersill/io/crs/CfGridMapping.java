package org.wintersill.io.crs;

import static org.wintersill.io.crs.ProjectionParameter.EASTING;
import static org.wintersill.io.crs.ProjectionParameter.LATITUDE;
import static org.wintersill.io.crs.ProjectionParameter.LONGITUDE;
import static org.wintersill.io.crs.ProjectionParameter.NORTHING;
import static org.wintersill.io.crs.ProjectionParameter.PARALLEL_1;
import static org.wintersill.io.crs.ProjectionParameter.PARALLEL_2;
import static org.wintersill.io.crs.ProjectionParameter.SCALE;

import java.util.EnumMap;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;
import org.wintersill.grid.Crs;

/**
 * CF grid mappings (CF 1.8 section 5.6 and appendix F) read into definitions and written from them.
 * False eastings and northings are in units of the coordinate axes, as appendix F says.
 */
final class CfGridMapping {
    static final String ACCEPTED = "latitude_longitude, rotated_latitude_longitude, lambert_conformal_conic, "
            + "lambert_azimuthal_equal_area, albers_conical_equal_area, polar_stereographic, stereographic, "
            + "transverse_mercator, mercator";

    private CfGridMapping() {
    }

    /** @throws IllegalArgumentException whose message says what the mapping lacks */
    static SystemDefinition read(GridMappingAttributes a, double metresPerUnit) {
        String mapping = a.text("grid_mapping_name");
        GeographicSystem base = base(a);
        if (mapping.equals("latitude_longitude")) {
            return SystemDefinition.geographic(base);
        }
        if (mapping.equals("rotated_latitude_longitude")) {
            Crs.RotatedPole pole = new Crs.RotatedPole(a.required("grid_north_pole_latitude"),
                    a.required("grid_north_pole_longitude"), a.number("north_pole_grid_longitude", 0));
            PoleRotation.check(pole);
            return SystemDefinition.rotated(base, pole);
        }
        Map<ProjectionParameter, Double> p = new EnumMap<>(ProjectionParameter.class);
        p.put(EASTING, a.number("false_easting", 0) * metresPerUnit);
        p.put(NORTHING, a.number("false_northing", 0) * metresPerUnit);
        ProjectionMethod method = switch (mapping) {
            case "lambert_conformal_conic" -> lambert(a, p);
            case "lambert_azimuthal_equal_area" -> {
                origin(a, p, "longitude_of_projection_origin");
                yield ProjectionMethod.LAMBERT_EQUAL_AREA;
            }
            case "albers_conical_equal_area" -> {
                origin(a, p, "longitude_of_central_meridian");
                parallels(a, p);
                yield ProjectionMethod.ALBERS;
            }
            case "polar_stereographic" -> polar(a, p);
            case "stereographic" -> {
                origin(a, p, "longitude_of_projection_origin");
                p.put(SCALE, a.number("scale_factor_at_projection_origin", 1));
                yield ProjectionMethod.STEREOGRAPHIC;
            }
            case "transverse_mercator" -> {
                origin(a, p, "longitude_of_central_meridian");
                p.put(SCALE, a.number("scale_factor_at_central_meridian", 1));
                yield ProjectionMethod.TRANSVERSE_MERCATOR;
            }
            case "mercator" -> mercator(a, p);
            default -> throw new IllegalArgumentException((mapping.isEmpty() ? "the attribute grid_mapping_name is missing"
                    : "grid_mapping_name '" + mapping + "' is not supported") + "; accepted are " + ACCEPTED);
        };
        String name = a.has("projected_crs_name") ? a.text("projected_crs_name") : method.wkt2();
        return SystemDefinition.projected(name, 0, base, method, p, metresPerUnit);
    }

    private static void origin(GridMappingAttributes a, Map<ProjectionParameter, Double> p, String longitudeName) {
        p.put(LATITUDE, a.required("latitude_of_projection_origin"));
        p.put(LONGITUDE, PoleRotation.wrap(a.required(longitudeName)));
    }

    private static void parallels(GridMappingAttributes a, Map<ProjectionParameter, Double> p) {
        double[] parallels = a.numbers("standard_parallel");
        if (parallels.length < 1 || parallels.length > 2) {
            throw new IllegalArgumentException("standard_parallel has " + parallels.length + " values; 1 or 2 are expected");
        }
        p.put(PARALLEL_1, parallels[0]);
        p.put(PARALLEL_2, parallels[parallels.length - 1]);
    }

    private static ProjectionMethod lambert(GridMappingAttributes a, Map<ProjectionParameter, Double> p) {
        origin(a, p, "longitude_of_central_meridian");
        parallels(a, p);
        boolean tangent = p.get(PARALLEL_1).equals(p.get(PARALLEL_2)) && p.get(PARALLEL_1).equals(p.get(LATITUDE));
        if (tangent) {
            p.put(SCALE, 1.0);
        }
        return tangent ? ProjectionMethod.LAMBERT_CONIC_1SP : ProjectionMethod.LAMBERT_CONIC_2SP;
    }

    private static ProjectionMethod polar(GridMappingAttributes a, Map<ProjectionParameter, Double> p) {
        String longitude = a.has("straight_vertical_longitude_from_pole") ? "straight_vertical_longitude_from_pole"
                : "longitude_of_projection_origin";
        p.put(LONGITUDE, PoleRotation.wrap(a.required(longitude)));
        double latitude = a.number("latitude_of_projection_origin", Math.copySign(90, a.number("standard_parallel", 90)));
        if (Math.abs(latitude) != 90) {
            throw new IllegalArgumentException("latitude_of_projection_origin of polar_stereographic is " + latitude
                    + "; 90 or -90 is expected");
        }
        if (a.has("standard_parallel") && Math.abs(a.required("standard_parallel")) < 90) {
            p.put(PARALLEL_1, Math.copySign(a.required("standard_parallel"), latitude));
            return ProjectionMethod.POLAR_B;
        }
        p.put(LATITUDE, latitude);
        p.put(SCALE, a.number("scale_factor_at_projection_origin", 1));
        return ProjectionMethod.POLAR_A;
    }

    private static ProjectionMethod mercator(GridMappingAttributes a, Map<ProjectionParameter, Double> p) {
        p.put(LONGITUDE, PoleRotation.wrap(a.required("longitude_of_projection_origin")));
        if (a.has("standard_parallel")) {
            p.put(PARALLEL_1, a.required("standard_parallel"));
            return ProjectionMethod.MERCATOR_2SP;
        }
        p.put(SCALE, a.number("scale_factor_at_projection_origin", 1));
        return ProjectionMethod.MERCATOR_1SP;
    }

    /** WGS 84 if the mapping gives no figure of the Earth. */
    private static GeographicSystem base(GridMappingAttributes a) {
        Ellipsoid figure;
        if (a.has("semi_major_axis")) {
            double major = a.required("semi_major_axis");
            double inverse = a.number("inverse_flattening", 0);
            if (!a.has("inverse_flattening") && a.has("semi_minor_axis")) {
                double minor = a.required("semi_minor_axis");
                inverse = minor == major ? 0 : major / (major - minor);
            }
            figure = WktReader.ellipsoid(a.has("reference_ellipsoid_name") ? a.text("reference_ellipsoid_name")
                    : inverse == 0 ? "sphere" : "ellipsoid", 0, major, inverse);
        } else if (a.has("earth_radius")) {
            figure = WktReader.ellipsoid("sphere", 0, a.required("earth_radius"), 0);
        } else {
            return GeographicSystem.WGS84;
        }
        double meridian = a.number("longitude_of_prime_meridian", 0);
        GeographicSystem base = GeographicSystem.on(figure);
        if (figure.sameFigure(Ellipsoid.GRS80) && !figure.sameFigure(Ellipsoid.WGS84)) {
            base = GeographicSystem.greenwich("GRS 1980", 0, "Unknown datum on GRS 1980", 0, Ellipsoid.GRS80);
        }
        return meridian == 0 ? base : new GeographicSystem(base.name(), 0, base.datum(), 0, base.ellipsoid(),
                a.has("prime_meridian_name") ? a.text("prime_meridian_name") : "meridian", meridian, base.toWgs84());
    }

    /** Attributes of appendix F; empty for a projection that CF has no name for. */
    static Optional<Map<String, Object>> write(SystemDefinition system) {
        Map<String, Object> out = new LinkedHashMap<>();
        if (system.pole() != null) {
            out.put("grid_mapping_name", "rotated_latitude_longitude");
            out.put("grid_north_pole_latitude", system.pole().latitude());
            out.put("grid_north_pole_longitude", system.pole().longitude());
            out.put("north_pole_grid_longitude", system.pole().gridLongitude());
        } else if (system.method() == null) {
            out.put("grid_mapping_name", "latitude_longitude");
        } else if (!projection(system, out)) {
            return Optional.empty();
        }
        Ellipsoid figure = system.base().ellipsoid();
        if (figure.inverseFlattening() == 0) {
            out.put("earth_radius", figure.semiMajor());
        } else {
            out.put("semi_major_axis", figure.semiMajor());
            out.put("inverse_flattening", figure.inverseFlattening());
        }
        out.put("longitude_of_prime_meridian", system.base().meridian());
        return Optional.of(out);
    }

    private static boolean projection(SystemDefinition s, Map<String, Object> out) {
        String longitude = "longitude_of_projection_origin";
        switch (s.method()) {
            case LAMBERT_CONIC_2SP, ALBERS -> {
                out.put("grid_mapping_name", s.method() == ProjectionMethod.ALBERS ? "albers_conical_equal_area" : "lambert_conformal_conic");
                out.put("standard_parallel", new double[] {s.value(PARALLEL_1), s.value(PARALLEL_2)});
                longitude = "longitude_of_central_meridian";
            }
            case LAMBERT_CONIC_1SP -> {
                if (s.value(SCALE) != 1) {
                    return false;
                }
                out.put("grid_mapping_name", "lambert_conformal_conic");
                out.put("standard_parallel", s.value(LATITUDE));
                longitude = "longitude_of_central_meridian";
            }
            case LAMBERT_EQUAL_AREA -> out.put("grid_mapping_name", "lambert_azimuthal_equal_area");
            case TRANSVERSE_MERCATOR -> {
                out.put("grid_mapping_name", "transverse_mercator");
                out.put("scale_factor_at_central_meridian", s.value(SCALE));
                longitude = "longitude_of_central_meridian";
            }
            case STEREOGRAPHIC -> {
                out.put("grid_mapping_name", "stereographic");
                out.put("scale_factor_at_projection_origin", s.value(SCALE));
            }
            case POLAR_A, POLAR_B -> {
                out.put("grid_mapping_name", "polar_stereographic");
                if (s.method() == ProjectionMethod.POLAR_A) {
                    out.put("scale_factor_at_projection_origin", s.value(SCALE));
                } else {
                    out.put("standard_parallel", s.value(PARALLEL_1));
                    out.put("latitude_of_projection_origin", Math.copySign(90, s.value(PARALLEL_1)));
                }
                longitude = "straight_vertical_longitude_from_pole";
            }
            case MERCATOR_1SP, MERCATOR_2SP -> {
                if (s.method() == ProjectionMethod.MERCATOR_1SP && s.value(LATITUDE) != 0) {
                    return false;
                }
                out.put("grid_mapping_name", "mercator");
                if (s.method() == ProjectionMethod.MERCATOR_1SP) {
                    out.put("scale_factor_at_projection_origin", s.value(SCALE));
                } else {
                    out.put("standard_parallel", s.value(PARALLEL_1));
                }
            }
            default -> {
                return false;
            }
        }
        boolean mercator = s.method() == ProjectionMethod.MERCATOR_1SP;
        if (s.parameters().containsKey(LATITUDE) && !mercator) {
            out.put("latitude_of_projection_origin", s.value(LATITUDE));
        }
        out.put(longitude, s.value(LONGITUDE));
        out.put("false_easting", s.value(EASTING) / s.metresPerUnit());
        out.put("false_northing", s.value(NORTHING) / s.metresPerUnit());
        return true;
    }
}
