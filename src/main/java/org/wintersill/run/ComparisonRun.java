package org.wintersill.run;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.wintersill.climatology.extreme.FalseDiscovery;
import org.wintersill.comparison.FrequencyTest;
import org.wintersill.comparison.RangeChange;
import org.wintersill.comparison.RangeTotals;
import org.wintersill.engine.Progress;
import org.wintersill.engine.Workers;
import org.wintersill.grid.Block;
import org.wintersill.grid.CoordinateOperations;
import org.wintersill.grid.GridGeometry;
import org.wintersill.io.crs.CellAreas;
import org.wintersill.io.json.JsonText;
import org.wintersill.layer.LayerDefinition;
import org.wintersill.layer.RasterWriter;
import org.wintersill.problem.Problem;

/** Compares finished outputs with those of a base period or scenario, layer by layer, and summarises the members of an ensemble. */
public final class ComparisonRun {
    /** Accepted share of false discoveries over the map. */
    static final double FALSE_DISCOVERIES = 0.10;

    private final FinishedFolder base;
    private final List<Other> others;
    private final List<String> cultivars;
    private final double target;
    private final int killing;
    private final double[] rowAreasKm2;
    private final GridGeometry grid;

    /**
     * One of the others.
     *
     * @param name folder name in the outputs: the scenario's member, or the name of the folder
     */
    record Other(String name, FinishedFolder folder) {
        /** How the scenario was downscaled; empty for a run without one. */
        String method() {
            return folder.configuration().get("scenario").get("method").text().orElse("");
        }
    }

    private ComparisonRun(FinishedFolder base, List<Other> others, List<String> cultivars) {
        this.base = base;
        this.others = others;
        this.cultivars = cultivars;
        grid = base.grid();
        rowAreasKm2 = CellAreas.rowAreasKm2(grid);
        target = base.configuration().get("statistics").get("target").number().orElse(0.10);
        killing = base.configuration().get("damage").get("killing").number().orElse(50.0).intValue();
    }

    /**
     * Checks that the folders can be compared.
     *
     * @param ids cultivars to compare; all that every folder has where there are none
     * @throws org.wintersill.problem.ProblemException where grids, killing shares or cultivars differ
     */
    public static ComparisonRun of(FinishedFolder base, List<FinishedFolder> folders, List<String> ids) {
        List<Other> others = new ArrayList<>();
        for (FinishedFolder folder : folders) {
            if (!folder.grid().sameAs(base.grid())) {
                throw Problem.input("the grids differ: " + base.path() + " has " + base.grid().describe() + ", " + folder.path() + " has "
                        + folder.grid().describe(), folder.path().toString(), "Run both on one grid: give the same elevation.dem and area, "
                        + "or temperatures of the same grid").asException();
            }
            for (String key : List.of("killing", "levels")) {
                String was = json(base, key);
                if (!was.equals(json(folder, key))) {
                    throw Problem.input("damage." + key + " differs: " + was + " in " + base.path() + ", " + json(folder, key) + " in "
                            + folder.path(), folder.path().toString(), "Run both with the same damage." + key).asException();
                }
            }
            others.add(new Other(name(folder, others), folder));
        }
        List<String> common = base.chosen(ids).stream().filter(id -> folders.stream().allMatch(folder -> folder.cultivars().contains(id)))
                .toList();
        List<String> lost = base.chosen(ids).stream().filter(id -> !common.contains(id)).toList();
        if (common.isEmpty() || !ids.isEmpty() && !lost.isEmpty()) {
            throw Problem.input("not every folder has the cultivar" + (lost.size() == 1 ? " " : "s ") + String.join(", ", lost),
                    base.path().toString(), "Run all of them with the same cultivars").asException();
        }
        return new ComparisonRun(base, others, common);
    }

    private static String json(FinishedFolder folder, String key) {
        return folder.configuration().get("damage").get(key).text()
                .orElseGet(() -> folder.configuration().get("damage").get(key).items().stream().map(item -> item.text().orElse("")).toList()
                        .toString());
    }

    /** A name for the folder of a member: never a path, and none twice. */
    private static String name(FinishedFolder folder, List<Other> others) {
        String given = folder.configuration().get("scenario").get("member").text()
                .orElseGet(() -> folder.path().toAbsolutePath().normalize().getFileName().toString());
        String plain = given.toLowerCase(java.util.Locale.ROOT).replaceAll("[^a-z0-9]+", "-").replaceAll("^-|-$", "");
        String name = plain.isEmpty() || plain.equals(EnsemblePass.FOLDER) ? "other" : plain;
        for (int number = 2; ; number++) {
            String free = name;
            if (others.stream().noneMatch(other -> other.name().equals(free))) {
                return name;
            }
            name = (plain.isEmpty() ? "other" : plain) + "-" + number;
        }
    }

    List<Other> others() {
        return others;
    }

    List<String> cultivars() {
        return cultivars;
    }

    FinishedFolder base() {
        return base;
    }

    int killing() {
        return killing;
    }

    double target() {
        return target;
    }

    /**
     * Writes all layers, tables and the record.
     *
     * @return number of files
     */
    public int execute(Path out, boolean overwrite, CoordinateOperations operations, Workers workers, Progress progress) {
        try (OutputFolder folder = OutputFolder.open(out, overwrite)) {
            ChangeOutput output = new ChangeOutput(folder, grid, period(base) + " against " + String.join(", ", others.stream()
                    .map(other -> other.name() + " " + period(other.folder())).toList()), lastYear(), workers.executor());
            progress.begin("Changes", (long) grid.rows() * cultivars.size() * others.size());
            List<ComparisonTables.Row> rows = new ArrayList<>();
            for (Other other : others) {
                for (String cultivar : cultivars) {
                    rows.add(pair(other, cultivar, output, progress));
                    workers.checkCancelled();
                }
            }
            progress.end();
            if (others.size() > 1) {
                new EnsemblePass(this, output).write(progress, workers);
            }
            Map<String, Object> record = record();
            LimitLines.write(this, folder.unfinished("changes.gpkg"), output.lastChange(), JsonText.of(record));
            ComparisonTables tables = new ComparisonTables(this, rows, operations);
            LayerOutput.write(folder.unfinished("changes.csv"), tables.csv());
            LayerOutput.write(folder.unfinished("changes.json"), JsonText.of(tables.document()));
            RunRecord.complete(record, folder, new org.wintersill.problem.Notices(), workers);
            LayerOutput.write(folder.unfinished(OutputFolder.RECORD), JsonText.of(record));
            int files = folder.names().size() + 1;
            folder.publish();
            return files;
        }
    }

    private static String period(FinishedFolder folder) {
        List<String> winters = folder.winters();
        return winters.get(0) + " to " + winters.get(winters.size() - 1);
    }

    private int lastYear() {
        int last = year(base);
        for (Other other : others) {
            last = Math.max(last, year(other.folder()));
        }
        return last;
    }

    /** Year in which the last winter ends: {@code 2003-04} is 2004. */
    private static int year(FinishedFolder folder) {
        String label = folder.winters().get(folder.winters().size() - 1);
        int begin = Integer.parseInt(label.substring(0, 4));
        return label.length() > 4 ? begin + 1 : begin;
    }

    private Map<String, Object> record() {
        Map<String, Object> record = new LinkedHashMap<>();
        record.put("version", 1);
        record.put("program", RunVersion.program());
        record.put("caution", Caution.SHORT);
        record.put("base", side(base));
        Map<String, Object> sides = new LinkedHashMap<>();
        others.forEach(other -> sides.put(other.name(), side(other.folder())));
        record.put("others", sides);
        record.put("compared", cultivars);
        record.put("target", target);
        record.put("killing", killing);
        record.put("false-discoveries", FALSE_DISCOVERIES);
        return record;
    }

    private static Map<String, Object> side(FinishedFolder folder) {
        Map<String, Object> side = new LinkedHashMap<>();
        side.put("title", folder.record().get("title").text().orElse(""));
        side.put("winters", folder.winters());
        side.put("record-sha256", Digests.ofFile(folder.path().resolve(OutputFolder.RECORD)));
        return side;
    }

    /** Layers of one cultivar in one of the others. */
    private ComparisonTables.Row pair(Other other, String cultivar, ChangeOutput output, Progress progress) {
        String owner = other.name() + "/" + cultivar;
        boolean sphere = grid.crs().angular();
        RangeTotals[] ranges = {new RangeTotals(sphere), new RangeTotals(sphere)};
        double[] classAreas = new double[RangeChange.values().length + 1];
        double[] sums = new double[4];
        float[] signedP = new float[Math.toIntExact(grid.cells())];
        LayerDefinition[] changes = {ChangeLayers.marginChange(), ChangeLayers.damageChange(), ChangeLayers.frequencyChange(),
            ChangeLayers.toleranceShift()};
        RasterWriter[] writers = new RasterWriter[changes.length];
        try (ChangeReader reader = new ChangeReader(base, other.folder(), cultivar, killing);
                RasterWriter required = output.open(owner, ChangeLayers.requiredHardiness(), "base", other.name());
                RasterWriter classes = output.open(owner, ChangeLayers.rangeChange(target))) {
            for (int i = 0; i < changes.length; i++) {
                writers[i] = output.open(owner, changes[i]);
            }
            FrequencyTest test = new FrequencyTest(base.winters().size() + other.folder().winters().size());
            for (int row = 0; row < grid.rows(); row += output.rowsAtOnce()) {
                int count = Math.min(output.rowsAtOnce(), grid.rows() - row);
                reader.read(new Block(0, row, grid.columns(), count));
                required.write(0, row, count, reader.side(0).required());
                required.write(1, row, count, reader.side(1).required());
                float[][] differences = {reader.marginChange(), reader.damageChange(), reader.frequencyChange(), reader.requiredChange()};
                for (int i = 0; i < changes.length; i++) {
                    writers[i].write(0, row, count, differences[i]);
                    sum(differences[i], row, sums, i);
                }
                classes.write(0, row, count, classes(reader, row, ranges, classAreas));
                reader.signedP(test, signedP, row * grid.columns());
                progress.advance(count);
            }
            required.finish();
            classes.finish();
            for (RasterWriter writer : writers) {
                writer.finish();
            }
        } finally {
            for (RasterWriter writer : writers) {
                if (writer != null) {
                    writer.close();
                }
            }
        }
        significance(owner, signedP, output);
        return new ComparisonTables.Row(other, cultivar, ranges, classAreas, sums);
    }

    /** Area-weighted sums; the weights stand in the last element of the class areas. */
    private void sum(float[] values, int firstRow, double[] sums, int layer) {
        for (int i = 0; i < values.length; i++) {
            if (values[i] == values[i]) {
                sums[layer] += values[i] * rowAreasKm2[firstRow + i / grid.columns()];
            }
        }
    }

    private float[] classes(ChangeReader reader, int firstRow, RangeTotals[] ranges, double[] classAreas) {
        float[] before = reader.side(0).frequency();
        float[] after = reader.side(1).frequency();
        float[] out = new float[before.length];
        for (int i = 0; i < out.length; i++) {
            RangeChange change = RangeChange.of(before[i], after[i], target);
            out[i] = change == null ? Float.NaN : change.code();
            if (change == null) {
                continue;
            }
            int row = firstRow + i / grid.columns();
            double area = rowAreasKm2[row];
            classAreas[change.ordinal()] += area;
            classAreas[classAreas.length - 1] += area;
            double x = grid.centreX(i % grid.columns());
            double y = grid.centreY(row);
            if (change == RangeChange.KEPT || change == RangeChange.LOST) {
                ranges[0].add(x, y, area, reader.elevation()[i]);
            }
            if (change == RangeChange.KEPT || change == RangeChange.GAINED) {
                ranges[1].add(x, y, area, reader.elevation()[i]);
            }
        }
        return out;
    }

    private void significance(String owner, float[] signedP, ChangeOutput output) {
        double threshold = FalseDiscovery.threshold(bound -> count(signedP, bound), count(signedP, 1), FALSE_DISCOVERIES);
        try (RasterWriter writer = output.open(owner, ChangeLayers.significance(FALSE_DISCOVERIES))) {
            for (int row = 0; row < grid.rows(); row += output.rowsAtOnce()) {
                int count = Math.min(output.rowsAtOnce(), grid.rows() - row);
                float[] values = new float[count * grid.columns()];
                for (int i = 0; i < values.length; i++) {
                    float p = signedP[row * grid.columns() + i];
                    values[i] = p != p ? Float.NaN : Math.abs(p) > threshold ? 2 : p < 0 ? 1 : 3;
                }
                writer.write(0, row, count, values);
            }
            writer.finish();
        }
    }

    private static long count(float[] signedP, double bound) {
        long count = 0;
        for (float p : signedP) {
            count += Math.abs(p) <= bound ? 1 : 0;
        }
        return count;
    }
}
