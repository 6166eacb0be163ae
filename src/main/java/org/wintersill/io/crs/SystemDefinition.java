package org.wintersill.io.crs;

import java.util.Collections;
import java.util.EnumMap;
import java.util.Map;
import org.wintersill.grid.Crs;

/**
 * A coordinate reference system with all its numbers: the one form between all others.
 *
 * @param name readable name
 * @param code EPSG code, 0 for none
 * @param base longitude and latitude that the system stands on
 * @param method map projection; null for longitude and latitude
 * @param parameters numbers of the projection, degrees and metres; every parameter of the method
 * @param metresPerUnit length of one unit of the axes, metres; 1 for longitude and latitude
 * @param pole rotated pole or null
 */
record SystemDefinition(String name, int code, GeographicSystem base, ProjectionMethod method,
                        Map<ProjectionParameter, Double> parameters, double metresPerUnit, Crs.RotatedPole pole) {

    private static final double SAME = 1e-9;

    SystemDefinition {
        EnumMap<ProjectionParameter, Double> complete = new EnumMap<>(ProjectionParameter.class);
        if (method != null) {
            for (ProjectionMethod.Slot slot : method.slots()) {
                double value = parameters.getOrDefault(slot.parameter(), slot.parameter().usual());
                if (!Double.isFinite(value)) {
                    throw new IllegalArgumentException("the projection " + method.wkt2() + " lacks " + slot.wkt1());
                }
                complete.put(slot.parameter(), value);
            }
        }
        parameters = Collections.unmodifiableMap(complete);
    }

    static SystemDefinition geographic(GeographicSystem base) {
        return new SystemDefinition(base.name(), base.code(), base, null, Map.of(), 1, null);
    }

    static SystemDefinition projected(String name, int code, GeographicSystem base, ProjectionMethod method,
                                      Map<ProjectionParameter, Double> parameters, double metresPerUnit) {
        return new SystemDefinition(name, code, base, method, parameters, metresPerUnit, null);
    }

    static SystemDefinition rotated(GeographicSystem base, Crs.RotatedPole pole) {
        return new SystemDefinition("Rotated pole at " + Wkt.number(pole.latitude()) + ", "
                + Wkt.number(pole.longitude()), 0, base, null, Map.of(), 1, pole);
    }

    double value(ProjectionParameter parameter) {
        return parameters.get(parameter);
    }

    /** The same system with axes in another unit; it loses its code, which stands for one unit only. */
    SystemDefinition withUnit(double metres) {
        return Math.abs(metres / metresPerUnit - 1) < SAME ? this
                : new SystemDefinition(name, 0, base, method, parameters, metres, pole);
    }

    /** The same system with other parameters to WGS 84. */
    SystemDefinition withShift(java.util.List<Double> toWgs84) {
        GeographicSystem shifted = new GeographicSystem(base.name(), base.code(), base.datum(), base.datumCode(), base.ellipsoid(),
                base.meridianName(), base.meridian(), toWgs84);
        return new SystemDefinition(name, code, shifted, method, parameters, metresPerUnit, pole);
    }

    /** Same place for the same coordinates, whatever the names. */
    boolean samePlaces(SystemDefinition other) {
        if (code != 0 && code == other.code) {
            return true;
        }
        if (method != other.method || !base.samePlaces(other.base) || Math.abs(metresPerUnit / other.metresPerUnit - 1) > SAME
                || (pole == null ? other.pole != null : !pole.equals(other.pole))) {
            return false;
        }
        return parameters.keySet().stream().allMatch(p -> Math.abs(value(p) - other.value(p)) < SAME * Math.max(1, Math.abs(value(p))));
    }

    /** The value that travels through the program. */
    Crs toCrs() {
        Crs.Kind kind = pole != null ? Crs.Kind.ROTATED_POLE : method != null ? Crs.Kind.PROJECTED : Crs.Kind.GEOGRAPHIC;
        return new Crs(code == 0 ? "" : "EPSG:" + code, name, Wkt1Writer.write(this), kind, metresPerUnit, pole);
    }

    /** The numbers behind a value that travelled. */
    static SystemDefinition of(Crs crs) {
        SystemDefinition read = WktReader.read(crs.wkt());
        return crs.pole() == null ? read : rotated(read.base(), crs.pole());
    }
}
