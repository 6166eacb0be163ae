package org.wintersill.run;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeMap;
import java.util.function.Supplier;
import org.wintersill.elevation.terrain.ColdAirClass;
import org.wintersill.elevation.terrain.PoolGround;
import org.wintersill.grid.CoordinateOperation;
import org.wintersill.grid.CoordinateOperations;
import org.wintersill.io.station.StationTable;
import org.wintersill.problem.Problem;
import org.wintersill.time.CfDate;
import org.wintersill.time.DayAxis;

/**
 * Minima of a run against those of stations, step by step of the adjustment: how far off is the source, and what does each step make of
 * it? A station is compared with the cell that holds it, at the cell's own height; its own height is only reported.
 *
 * @param groups {@code all}, months and cold-air classes, in this order
 * @param leftOut readings that were not compared, by reason; all reasons stand here, with 0 too
 * @param readings all lines of the table
 * @param stations number of stations compared
 * @param heightDifference mean of cell height minus station height over the stations compared that have one, m; NaN for none
 * @param farInHeight stations compared whose height differs from the cell's by more than {@link #FAR}
 */
public record StationComparison(List<Group> groups, Map<String, Integer> leftOut, int readings, int stations, double heightDifference,
                                int farInHeight) {
    /** Difference of heights that is pointed out, m (project choice). */
    public static final double FAR = 50;
    /** Steps in their order; each holds all before it. */
    static final List<String> STEPS = List.of("source", "interpolated", "height", "pool", "water", "offset");

    private static final String OUTSIDE = "station outside of the grid";
    private static final String NO_CELL = "cell without height or beyond the temperatures";
    private static final String NO_READING = "no tmin in the table";
    private static final String NO_DAY = "day not in the temperature record";
    private static final String TWICE = "second reading of a station and day";
    private static final String NO_VALUE = "no temperature in the cell that night";
    private static final String[] MONTHS = {"01", "02", "03", "04", "05", "06", "07", "08", "09", "10", "11", "12"};

    /**
     * @param kind {@code all}, {@code month} or {@code terrain-class}
     * @param name month {@code 01} to {@code 12}, or the word of a class
     * @param bias mean of run minus station after each step, K
     * @param rmse root of the mean square of the same, K
     */
    public record Group(String kind, String name, int count, double[] bias, double[] rmse) {
    }

    /** A reading with the place of its cell. */
    private record Placed(StationTable.Reading reading, int row, int column) {
    }

    /** Running sums of one group. */
    private static final class Sums {
        private int count;
        private final double[] sum = new double[STEPS.size()];
        private final double[] squares = new double[STEPS.size()];

        void add(double[] differences) {
            count++;
            for (int step = 0; step < differences.length; step++) {
                sum[step] += differences[step];
                squares[step] += differences[step] * differences[step];
            }
        }

        Group group(String kind, String name) {
            double[] bias = new double[sum.length];
            double[] rmse = new double[sum.length];
            for (int step = 0; step < sum.length; step++) {
                bias[step] = sum[step] / count;
                rmse[step] = Math.sqrt(squares[step] / count);
            }
            return new Group(kind, name, count, bias, rmse);
        }
    }

    /**
     * Compares.
     *
     * @param file table of the stations, read before anything is planned
     * @param run the plan
     * @param systems asked for after the plan
     * @throws org.wintersill.problem.ProblemException when no reading can be compared
     */
    public static StationComparison of(Path file, Supplier<RunPlan> run, Supplier<CoordinateOperations> systems) {
        StationTable table = StationTable.read(file);
        RunPlan plan = run.get();
        CoordinateOperations operations = systems.get();
        Map<String, Integer> leftOut = new LinkedHashMap<>();
        List.of(OUTSIDE, NO_CELL, NO_READING, NO_DAY, TWICE, NO_VALUE).forEach(reason -> leftOut.put(reason, 0));
        Map<Integer, List<Placed>> byDay = byDay(plan, table, operations, leftOut);
        Map<String, Sums> sums = new TreeMap<>();
        Map<String, Double> heights = new TreeMap<>();
        Set<String> compared = new HashSet<>();
        int first = byDay.values().stream().flatMap(List::stream).mapToInt(Placed::row).min().orElse(0);
        int last = byDay.values().stream().flatMap(List::stream).mapToInt(Placed::row).max().orElse(0);
        if (!byDay.isEmpty()) {
            try (NightReader reader = new NightReader(plan, first, last + 1)) {
                for (Map.Entry<Integer, List<Placed>> day : byDay.entrySet()) {
                    CfDate date = plan.job().source().days().date(day.getKey());
                    reader.read(day.getKey(), date);
                    for (Placed placed : day.getValue()) {
                        CellExplanation.Steps steps = reader.at(placed.row(), placed.column());
                        if (Float.isNaN(steps.tmin())) {
                            leftOut.merge(NO_VALUE, 1, Integer::sum);
                            continue;
                        }
                        compared.add(placed.reading().id());
                        double cell = plan.adjustment().targetHeight(placed.row() * plan.target().columns() + placed.column());
                        heights.put(placed.reading().id(), cell - placed.reading().elevation());
                        double[] differences = differences(steps, placed.reading().tmin());
                        sums.computeIfAbsent("0 all", key -> new Sums()).add(differences);
                        sums.computeIfAbsent("1 " + MONTHS[date.month() - 1], key -> new Sums()).add(differences);
                        groundClass(plan, placed).ifPresent(word -> sums.computeIfAbsent("2 " + word, key -> new Sums()).add(differences));
                    }
                }
            }
        }
        if (compared.isEmpty()) {
            throw Problem.input("no reading of the stations can be compared: " + reasons(leftOut), "--stations",
                    "Give places in the reference system of the outputs, " + plan.target().crs().label() + " (or columns lon and lat), and days from "
                            + plan.source().days().date(0) + " to " + plan.source().days().date(plan.source().days().size() - 1)).asException();
        }
        List<Group> groups = new ArrayList<>();
        String[] kinds = {"all", "month", "terrain-class"};
        sums.forEach((key, group) -> groups.add(group.group(kinds[key.charAt(0) - '0'], key.substring(2))));
        List<Double> known = heights.values().stream().filter(metres -> !metres.isNaN()).toList();
        return new StationComparison(groups, leftOut, table.readings().size(), compared.size(),
                known.stream().mapToDouble(Double::doubleValue).average().orElse(Double.NaN),
                (int) known.stream().filter(metres -> Math.abs(metres) > FAR).count());
    }

    static String reasons(Map<String, Integer> leftOut) {
        return String.join("; ", leftOut.entrySet().stream().filter(entry -> entry.getValue() > 0)
                .map(entry -> entry.getKey() + ": " + entry.getValue()).toList());
    }

    private static Map<Integer, List<Placed>> byDay(RunPlan plan, StationTable table, CoordinateOperations operations,
                                                    Map<String, Integer> leftOut) {
        DayAxis axis = plan.job().source().days();
        Map<String, Integer> positions = new LinkedHashMap<>();
        for (int position = 0; position < axis.size(); position++) {
            positions.put(axis.date(position).toString(), position);
        }
        CoordinateOperation toTarget = table.lonLat() ? operations.between(operations.wgs84(), plan.target().crs()) : CoordinateOperation.identity();
        Map<Integer, List<Placed>> byDay = new TreeMap<>();
        Set<String> seen = new HashSet<>();
        for (StationTable.Reading reading : table.readings()) {
            double[] place = {reading.x(), reading.y()};
            toTarget.transform(place, 1);
            int row = plan.target().rowAt(place[1]);
            int column = plan.target().columnAt(place[0]);
            String reason = row < 0 || column < 0 ? OUTSIDE
                    : plan.adjustment().positions().containing(row, column) < 0 || !plan.adjustment().covers(row, column) ? NO_CELL
                    : Double.isNaN(reading.tmin()) ? NO_READING
                    : !positions.containsKey(reading.date()) ? NO_DAY
                    : !seen.add(reading.id() + "\n" + reading.date()) ? TWICE : null;
            if (reason != null) {
                leftOut.merge(reason, 1, Integer::sum);
            } else {
                byDay.computeIfAbsent(positions.get(reading.date()), key -> new ArrayList<>()).add(new Placed(reading, row, column));
            }
        }
        return byDay;
    }

    private static double[] differences(CellExplanation.Steps steps, double tmin) {
        double height = steps.interpolated() + steps.height();
        double pool = height + steps.pool();
        double water = pool + steps.water();
        return new double[] {steps.source() - tmin, steps.interpolated() - tmin, height - tmin, pool - tmin, water - tmin, steps.tmin() - tmin};
    }

    /** Class of a station's cell, where the run has pools by the form of the ground. */
    private static Optional<String> groundClass(RunPlan plan, Placed placed) {
        if (!(plan.adjustment().terms().pools() instanceof PoolGround ground)) {
            return Optional.empty();
        }
        int code = ground.classRow(placed.row())[placed.column()];
        return Optional.of(ColdAirClass.ofCode(code).map(ColdAirClass::word).orElse("unknown"));
    }
}
