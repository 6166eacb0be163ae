package org.wintersill.io.netcdf;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;
import org.wintersill.elevation.ElevationField;
import org.wintersill.elevation.ElevationFormat;
import org.wintersill.grid.CrsParser;
import org.wintersill.grid.GridGeometry;
import org.wintersill.problem.Notices;
import org.wintersill.problem.Problem;
import org.wintersill.problem.ProblemException;

/**
 * Ground heights in netCDF files: the variable with standard name {@code surface_altitude}, else one of a usual name.
 * Thread-safe.
 */
public final class NetcdfElevationFormat implements ElevationFormat {
    private static final Set<String> NAMES = Set.of("orog", "z", "elevation", "height", "topo", "hgt", "altitude", "dem");
    /** Standard names of heights of the ground (CF standard name table). */
    private static final List<String> STANDARD_NAMES = List.of("surface_altitude", "ground_level_altitude",
            "height_above_mean_sea_level");
    /** Heights outside are voids that nobody declared: deepest sea to highest mountain, m, with room. */
    private static final double LOWEST = -11_500;
    private static final double HIGHEST = 9_000;
    /** A void that many files use without saying so, m; no ground lies there. */
    private static final double UNDECLARED_VOID = -9999;
    /** Most cells of a field of heights: 2 GiB as floats. */
    private static final long LARGEST = 1L << 29;

    private final CrsParser crsParser;

    /** @param crs understands reference systems */
    public NetcdfElevationFormat(CrsParser crs) {
        this.crsParser = crs;
    }

    @Override
    public boolean recognises(Path file, byte[] head) {
        return CdfFiles.recognises(head);
    }

    /** A variable of heights, found and placed. */
    private record Found(CdfVariable variable, Slabs.Order order, GridPlacement placement) {
    }

    @Override
    public GridGeometry grid(Path file, Optional<String> crs, Notices notices) {
        CdfHeader header = CdfFiles.header(file);
        return find(header, crs, notices).placement().grid();
    }

    @Override
    public ElevationField read(Path file, Optional<String> crs, Optional<String> unit, Notices notices) {
        CdfHeader header = CdfFiles.header(file);
        Found found = find(header, crs, notices);
        GridGeometry grid = found.placement().grid();
        String where = CdfProblems.at(file, found.variable().name());
        if (grid.cells() > LARGEST) {
            throw Problem.limit("The heights have " + grid.cells() + " cells; at most " + LARGEST + " are read", where,
                    "Cut the file to the area of interest").asException();
        }
        double metres = metresPerUnit(found.variable(), unit, where);
        Packing packing = Packing.of(found.variable(), Optional.empty(), Optional.empty()).withFill(UNDECLARED_VOID);
        Unpacker unpacker = new Unpacker(packing, found.variable().littleEndian(), metres, 0, LOWEST, HIGHEST);
        float[] heights = new float[(int) grid.cells()];
        try (Slabs slabs = Slabs.open(header, found.variable(), found.order(), unpacker)) {
            long voids = found.placement().copy(slabs, 0, 1, grid.whole(), heights, 0, 0);
            if (voids > 0) {
                notices.add(voids + " heights outside " + LOWEST + ".." + HIGHEST + " m were taken as voids");
            }
        } catch (ProblemException e) {
            throw e;
        } catch (RuntimeException e) {
            throw CdfProblems.damaged(file, "its heights cannot be decoded", e);
        }
        refuseNothing(heights, where);
        return new ElevationField(grid, heights, file + ", variable " + found.variable().name());
    }

    private static void refuseNothing(float[] heights, String where) {
        for (float height : heights) {
            if (!Float.isNaN(height)) {
                return;
            }
        }
        throw Problem.input("No cell has a height", where, "Check the file and its fill value").asException();
    }

    private Found find(CdfHeader header, Optional<String> crs, Notices notices) {
        try (RawReader reader = new RawReader(header)) {
            CdfVariable variable = choose(header);
            if (variable.storage() instanceof Storage.Unreadable unreadable) {
                throw CdfLimits.unreadable(header.path(), variable, unreadable);
            }
            Horizontal horizontal = Horizontal.find(header, variable);
            int[] fixed = FixedIndices.of(header, reader, variable,
                    List.of(horizontal.yDimension(), horizontal.xDimension()), Optional.empty());
            GridPlacement placement = horizontal.place(header, reader, variable, new CrsReading(crsParser, crs), notices);
            return new Found(variable, new Slabs.Order(-1, horizontal.yDimension(), horizontal.xDimension(), fixed), placement);
        } catch (ProblemException e) {
            throw e;
        } catch (RuntimeException e) {
            throw CdfProblems.damaged(header.path(), "its header contradicts itself", e);
        }
    }

    private static CdfVariable choose(CdfHeader header) {
        List<CdfVariable> gridded = header.all().stream()
                .filter(v -> v.rank() >= 2 && v.type().isNumeric() && !Horizontal.isTwoDimensionalCoordinate(v)).toList();
        List<CdfVariable> found = new ArrayList<>();
        for (String name : STANDARD_NAMES) {
            gridded.stream().filter(v -> v.word("standard_name").equals(name)).forEach(found::add);
            if (!found.isEmpty()) {
                break;
            }
        }
        if (found.isEmpty()) {
            gridded.stream().filter(v -> NAMES.contains(v.name().toLowerCase(Locale.ROOT))).forEach(found::add);
        }
        if (found.size() != 1) {
            String list = gridded.stream().limit(12).map(CdfVariable::name).collect(Collectors.joining(", "));
            throw Problem.input((found.isEmpty() ? "No variable is a height of the ground" : "Several variables are heights of"
                    + " the ground") + "; the file has: " + list, header.path().toString(),
                    "Give the right one the standard_name surface_altitude").asException();
        }
        return found.get(0);
    }

    private static double metresPerUnit(CdfVariable variable, Optional<String> requested, String where) {
        Optional<String> text = variable.text("units");
        Optional<Double> own = text.flatMap(AxisUnit::metresPer);
        Optional<Double> wanted = requested.map(r -> AxisUnit.metresPer(r).orElseThrow(() ->
                Problem.usage("The unit of heights '" + r + "' is unknown; m, ft and us-ft are read", where, "Correct it")
                        .asException()));
        if (text.isPresent() && own.isEmpty() && wanted.isEmpty()) {
            throw Problem.input("The heights have units '" + text.get() + "'; m, ft and us-ft are read", where,
                    "Correct the units attribute").asException();
        }
        if (own.isPresent() && wanted.isPresent() && !own.get().equals(wanted.get())) {
            throw Problem.input("The heights have units '" + text.get() + "', the run file says " + requested.get(), where,
                    "Leave out the unit, or correct the file").asException();
        }
        return own.or(() -> wanted).orElseThrow(() -> Problem.input("The heights have no units; m, ft and us-ft are read", where,
                "Give the unit in the run file").asException());
    }
}
