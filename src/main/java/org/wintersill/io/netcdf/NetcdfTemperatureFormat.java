package org.wintersill.io.netcdf;

import java.nio.file.Path;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.wintersill.grid.Block;
import org.wintersill.grid.CrsParser;
import org.wintersill.grid.GridGeometry;
import org.wintersill.problem.Notices;
import org.wintersill.problem.Problem;
import org.wintersill.problem.ProblemException;
import org.wintersill.temperature.DailyTemperatureSource;
import org.wintersill.temperature.SourceFile;
import org.wintersill.temperature.StorageLayout;
import org.wintersill.temperature.TemperatureFormat;
import org.wintersill.temperature.TemperatureRequest;
import org.wintersill.temperature.TemperatureUnit;

/**
 * Daily temperatures in netCDF files: classic, 64-bit offset, CDF-5 and netCDF-4, as CF conventions 1.8 describe them.
 *
 * <p>Opening reads the header, the axes and a sample of values to see whether they fit their unit; everything else is
 * left to readers. Thread-safe.
 */
public final class NetcdfTemperatureFormat implements TemperatureFormat {
    /** Places along time and across the map that are tried until the sample has a value. */
    private static final double[] SAMPLE_PLACES = {0.5, 0.25, 0.75, 0.05};
    private static final int SAMPLE_CELLS = 1 << 20;

    private final CrsParser crsParser;

    /** @param crs understands reference systems */
    public NetcdfTemperatureFormat(CrsParser crs) {
        this.crsParser = crs;
    }

    @Override
    public String name() {
        return "netCDF";
    }

    @Override
    public boolean recognises(Path file, byte[] head) {
        return CdfFiles.recognises(head);
    }

    @Override
    public DailyTemperatureSource open(Path file, TemperatureRequest request, Notices notices) {
        CdfHeader header = CdfFiles.header(file);
        try (RawReader reader = new RawReader(header)) {
            return describe(header, reader, request, notices);
        } catch (ProblemException e) {
            throw e;
        } catch (RuntimeException e) {
            throw CdfProblems.damaged(file, "its header contradicts itself", e);
        }
    }

    private NetcdfTemperatureSource describe(CdfHeader header, RawReader reader, TemperatureRequest request,
                                             Notices notices) {
        CdfVariable variable = new VariableChoice(header, request.forcing()).choose(request.variable(), notices);
        Horizontal horizontal = Horizontal.find(header, variable);
        if (variable.storage() instanceof Storage.Unreadable unreadable) {
            throw CdfLimits.unreadable(header.path(), variable, unreadable);
        }
        int time = timeDimension(header, variable);
        int[] fixed = FixedIndices.of(header, reader, variable,
                List.of(time, horizontal.yDimension(), horizontal.xDimension()), request.member());
        Slabs.Order order = new Slabs.Order(time, horizontal.yDimension(), horizontal.xDimension(), fixed);
        RecordDays days = RecordDays.read(header, reader, timeCoordinate(header, variable, time),
                time < 0 ? 1 : variable.shape()[time]);
        TemperatureUnit unit = UnitChoice.unit(header.path(), variable, request, notices);
        Packing packing = UnitChoice.packing(header.path(), variable, request);
        GridPlacement placement = horizontal.place(header, reader, variable, new CrsReading(crsParser, request.crs()), notices);
        sample(header, variable, order, packing, unit, placement, days);
        StorageLayout layout = placement.layout(variable, order, days.inOrder());
        SourceFile description = description(header, variable, days, packing, unit, placement, request);
        return new NetcdfTemperatureSource(header, variable, order, packing, unit, placement, days, layout, request.forcing(),
                description);
    }

    private static int timeDimension(CdfHeader header, CdfVariable variable) {
        for (int i = 0; i < variable.rank(); i++) {
            if (AxisRole.of(header, variable.dimensions().get(i)) == AxisRole.TIME) {
                return i;
            }
        }
        return -1;
    }

    private static CdfVariable timeCoordinate(CdfHeader header, CdfVariable variable, int time) {
        Optional<CdfVariable> found = time < 0 ? RecordDays.scalarTime(header)
                : AxisRole.coordinate(header, variable.dimensions().get(time));
        return found.orElseThrow(() -> Problem.input("The variable has no time: none of its dimensions ("
                + String.join(", ", variable.dimensions()) + ") has a coordinate with units such as 'days since 1950-01-01'",
                CdfProblems.at(header.path(), variable.name()), "Add a time coordinate").asException());
    }

    /** Looks at a piece of the middle of the record, at others if that is all missing. */
    private static void sample(CdfHeader header, CdfVariable variable, Slabs.Order order, Packing packing,
                               TemperatureUnit unit, GridPlacement placement, RecordDays days) {
        Unpacker plain = new Unpacker(packing, variable.littleEndian(), 1, 0, -Float.MAX_VALUE, Float.MAX_VALUE);
        GridGeometry grid = placement.grid();
        StorageLayout layout = placement.layout(variable, order, true);
        int columns = Math.min(grid.columns(), layout.columns());
        int rows = Math.min(grid.rows(), Math.max(layout.rows(), Math.max(1, SAMPLE_CELLS / 8 / columns)));
        rows = Math.max(1, Math.min(rows, SAMPLE_CELLS / columns));
        try (Slabs slabs = Slabs.open(header, variable, order, plain)) {
            for (double place : SAMPLE_PLACES) {
                int record = (int) (place * days.records().length);
                int row = aligned(place, grid.rows(), rows, layout.rows());
                int column = aligned(place, grid.columns(), columns, layout.columns());
                float[] values = new float[rows * columns];
                placement.copy(slabs, record, 1, new Block(column, row, columns, rows), values, 0, 0);
                for (float value : values) {
                    if (!Float.isNaN(value)) {
                        UnitChoice.refuseImplausible(header.path(), variable, unit, values);
                        return;
                    }
                }
            }
        }
    }

    private static int aligned(double place, int length, int count, int piece) {
        int start = (int) (place * length) / piece * piece;
        return Math.max(0, Math.min(start, length - count));
    }

    private static SourceFile description(CdfHeader header, CdfVariable variable, RecordDays days, Packing packing,
                                          TemperatureUnit unit, GridPlacement placement, TemperatureRequest request) {
        Map<String, String> details = new LinkedHashMap<>();
        variable.text("long_name").ifPresent(text -> details.put("long name", text));
        variable.text("cell_methods").ifPresent(text -> details.put("cell methods", text));
        details.put("stored as", packing.describe());
        details.put("missing values", Arrays.toString(Arrays.stream(packing.fills()).distinct().toArray()));
        details.put("time", days.unit() + (days.fromBounds() ? ", days from bounds" : ", days from stamps")
                + (days.inOrder() ? "" : ", records sorted"));
        if (days.axis().missingCount() > 0) {
            details.put("missing days", days.axis().missingCount() + ": " + String.join(", ", days.axis().gaps(10)));
        }
        if (!placement.remarks().isEmpty()) {
            details.put("turned", String.join("; ", placement.remarks()));
        }
        request.member().ifPresent(member -> details.put("member", member));
        String units = variable.text("units").orElse(unit.symbol() + " (run file)");
        return new SourceFile(header.path().toString(), header.format(), variable.name(), units,
                days.axis().calendar().cfName(), days.axis().date(0).toString(),
                days.axis().date(days.axis().size() - 1).toString(), days.axis().size(), placement.grid().describe(),
                storage(variable), details);
    }

    private static String storage(CdfVariable variable) {
        String dimensions = "(" + String.join(", ", variable.dimensions()) + ")";
        if (variable.storage() instanceof Storage.Chunked chunked) {
            return dimensions + " in chunks of " + Arrays.toString(chunked.chunk()) + chunked.filterNames();
        }
        return dimensions + (variable.storage() instanceof Storage.Contiguous ? " uncompressed" : "");
    }
}
