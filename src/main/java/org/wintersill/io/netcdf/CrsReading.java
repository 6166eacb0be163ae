package org.wintersill.io.netcdf;

import java.nio.file.Path;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;
import org.wintersill.grid.Crs;
import org.wintersill.grid.CrsParser;
import org.wintersill.problem.Notices;
import org.wintersill.problem.Problem;
import org.wintersill.problem.ProblemException;

/**
 * Finds the reference system of a variable: the WKT of its grid mapping, else the mapping's parameters, else what the run
 * file says, else WGS 84 for plain longitudes and latitudes.
 *
 * @param parser understands definitions
 * @param requested code that the run file gives
 */
record CrsReading(CrsParser parser, Optional<String> requested) {
    private static final String WGS84 = "EPSG:4326";

    /**
     * @param rows role of the axis of rows, which tells what sort of coordinates there are
     * @param metres metres per unit of the axes; 1 for angles
     */
    Crs of(CdfHeader header, CdfVariable variable, AxisRole rows, double metres, Notices notices) {
        String where = CdfProblems.at(header.path(), variable.name());
        Optional<CdfVariable> mapping = mapping(header, variable);
        Optional<Crs> wanted = requested.map(parser::fromCode);
        Crs crs;
        if (mapping.isPresent()) {
            crs = fromMapping(header.path(), mapping.get(), metres);
            if (wanted.isPresent() && !wanted.get().sameAs(crs)) {
                throw Problem.input("The run file gives the reference system " + wanted.get().label() + ", the file's '"
                        + mapping.get().name() + "' gives " + crs.label(), where, "Leave out crs, or correct the file")
                        .asException();
            }
        } else if (wanted.isPresent()) {
            crs = wanted.get();
        } else if (rows == AxisRole.LATITUDE) {
            notices.add("No reference system is given with longitudes and latitudes: assumed WGS 84");
            crs = parser.fromCode(WGS84);
        } else if (rows == AxisRole.ROTATED_LATITUDE) {
            throw Problem.input("The axes are those of a rotated pole, but there is no grid mapping that says where the pole is",
                    where, "Add a grid mapping variable (rotated_latitude_longitude)").asException();
        } else {
            throw Problem.input("The axes are projected, but nothing says in which reference system: there is no grid mapping",
                    where, "Give crs for these files in the run file, such as EPSG:2056, or add a grid mapping").asException();
        }
        Crs.Kind expected = rows == AxisRole.LATITUDE ? Crs.Kind.GEOGRAPHIC
                : rows == AxisRole.NORTHING ? Crs.Kind.PROJECTED : Crs.Kind.ROTATED_POLE;
        if (crs.kind() != expected) {
            throw Problem.input("The axes are those of a " + words(expected) + " system, but " + crs.label() + " is "
                    + words(crs.kind()), where, "Correct the grid mapping, or crs in the run file").asException();
        }
        return crs;
    }

    private static String words(Crs.Kind kind) {
        return switch (kind) {
            case GEOGRAPHIC -> "geographic";
            case PROJECTED -> "projected";
            case ROTATED_POLE -> "rotated-pole";
        };
    }

    private Crs fromMapping(Path path, CdfVariable mapping, double metres) {
        String name = mapping.word("grid_mapping_name");
        Optional<String> wkt = mapping.text("crs_wkt").or(() -> mapping.text("spatial_ref"));
        // the WKT of a rotated pole is a derived system that few programs understand; its three numbers say the same
        boolean rotated = name.equals("rotated_latitude_longitude");
        try {
            if (wkt.isPresent() && !rotated) {
                try {
                    return parser.fromWkt(wkt.get());
                } catch (ProblemException e) {
                    if (name.isEmpty()) {
                        throw e;
                    }
                }
            }
            return parser.fromGridMapping(plain(mapping), metres);
        } catch (ProblemException e) {
            Problem first = e.problems().get(0);
            throw new Problem(first.kind(), first.what(), CdfProblems.at(path, mapping.name()), first.remedy()).asException(e);
        }
    }

    private static Optional<CdfVariable> mapping(CdfHeader header, CdfVariable variable) {
        Optional<String> named = variable.text("grid_mapping");
        if (named.isPresent()) {
            // the extended form "crs: x y" names the axes after a colon
            String first = named.get().split("[:\\s]")[0];
            return header.variable(first).filter(CrsReading::isMapping);
        }
        return header.all().stream().filter(v -> v.text("grid_mapping_name").isPresent()).findFirst();
    }

    private static boolean isMapping(CdfVariable v) {
        return v.text("grid_mapping_name").isPresent() || v.text("crs_wkt").isPresent() || v.text("spatial_ref").isPresent();
    }

    private static Map<String, Object> plain(CdfVariable mapping) {
        Map<String, Object> plain = new LinkedHashMap<>();
        mapping.attributes().forEach((key, value) -> {
            if (value instanceof CdfVariable.Numbers numbers) {
                plain.put(key, numbers.values().length == 1 ? (Object) numbers.values()[0] : numbers.values().clone());
            } else {
                plain.put(key, value);
            }
        });
        return plain;
    }
}
