package org.wintersill.run;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.wintersill.climatology.Percentiles;
import org.wintersill.comparison.ChangeSignal;
import org.wintersill.comparison.ChangeVariance;
import org.wintersill.engine.Progress;
import org.wintersill.engine.Workers;
import org.wintersill.grid.Block;
import org.wintersill.grid.GridGeometry;
import org.wintersill.io.crs.GeoToolsCrs;
import org.wintersill.io.geotiff.read.PlainRaster;
import org.wintersill.layer.LayerDefinition;
import org.wintersill.layer.RasterWriter;

/** Summaries over the members of an ensemble, from the changes of each. Temperatures of members are never averaged. */
final class EnsemblePass {
    /** Folder of the summaries. */
    static final String FOLDER = "ensemble";

    private final ComparisonRun run;
    private final ChangeOutput output;
    private final GridGeometry grid;

    EnsemblePass(ComparisonRun run, ChangeOutput output) {
        this.run = run;
        this.output = output;
        this.grid = run.base().grid();
    }

    void write(Progress progress, Workers workers) {
        progress.begin("Members together", (long) grid.rows() * run.cultivars().size() * ChangeLayers.OF_MEMBERS.size());
        for (String cultivar : run.cultivars()) {
            for (LayerDefinition layer : ChangeLayers.OF_MEMBERS) {
                summarise(cultivar, layer, progress);
                workers.checkCancelled();
            }
        }
        progress.end();
        variance();
    }

    private List<PlainRaster> open(String cultivar, LayerDefinition layer) {
        List<PlainRaster> members = new ArrayList<>();
        for (ComparisonRun.Other other : run.others()) {
            members.add(PlainRaster.open(output.file(other.name() + "/" + cultivar, layer), new GeoToolsCrs()));
        }
        return members;
    }

    /** Winters of the base whose yearly spread says what chance alone does; only where the change is one of winters' values. */
    private Optional<PlainRaster> yearly(String cultivar, LayerDefinition layer) {
        return switch (layer.id()) {
            case "margin-change" -> Optional.of(run.base().winters(cultivar, "margin"));
            case "damage-change" -> Optional.of(run.base().winters(cultivar, "damage"));
            default -> Optional.empty();
        };
    }

    private void summarise(String cultivar, LayerDefinition layer, Progress progress) {
        String owner = FOLDER + "/" + cultivar;
        List<PlainRaster> members = open(cultivar, layer);
        Optional<PlainRaster> yearly = yearly(cultivar, layer);
        List<RasterWriter> writers = new ArrayList<>();
        try {
            writers.add(output.open(owner, ChangeLayers.ofMembers(layer, "median", "median")));
            writers.add(output.open(owner, ChangeLayers.ofMembers(layer, "low", "10th percentile")));
            writers.add(output.open(owner, ChangeLayers.ofMembers(layer, "high", "90th percentile")));
            writers.add(output.open(owner, ChangeLayers.agreement(layer)));
            if (yearly.isPresent()) {
                writers.add(output.open(owner, ChangeLayers.signal(layer)));
            }
            for (int row = 0; row < grid.rows(); row += output.rowsAtOnce()) {
                Block block = new Block(0, row, grid.columns(), Math.min(output.rowsAtOnce(), grid.rows() - row));
                float[][] out = summary(members, yearly, block);
                for (int i = 0; i < writers.size(); i++) {
                    writers.get(i).write(0, row, block.rows(), out[i]);
                }
                progress.advance(block.rows());
            }
            writers.forEach(RasterWriter::finish);
        } finally {
            writers.forEach(RasterWriter::close);
            members.forEach(PlainRaster::close);
            yearly.ifPresent(PlainRaster::close);
        }
    }

    private float[][] summary(List<PlainRaster> members, Optional<PlainRaster> yearly, Block block) {
        float[][] changes = read(members, block);
        double[] deviation = yearly.map(raster -> deviation(raster, block)).orElse(null);
        float[][] out = new float[5][block.cells()];
        double[] values = new double[members.size()];
        for (int cell = 0; cell < block.cells(); cell++) {
            boolean whole = true;
            for (int i = 0; i < values.length; i++) {
                values[i] = changes[i][cell];
                whole &= values[i] == values[i];
            }
            if (!whole) {
                for (float[] layer : out) {
                    layer[cell] = Float.NaN;
                }
                continue;
            }
            out[3][cell] = (float) ChangeSignal.shareAgreeing(values);
            if (deviation != null) {
                out[4][cell] = deviation[cell] != deviation[cell] ? Float.NaN
                        : ChangeSignal.of(values, ChangeSignal.gamma(deviation[cell])).ordinal() + 1;
            }
            Arrays.sort(values);
            out[0][cell] = (float) Percentiles.type7(values, values.length, 0.5);
            out[1][cell] = (float) Percentiles.type7(values, values.length, 0.1);
            out[2][cell] = (float) Percentiles.type7(values, values.length, 0.9);
        }
        return out;
    }

    private static float[][] read(List<PlainRaster> rasters, Block block) {
        float[][] values = new float[rasters.size()][block.cells()];
        for (int i = 0; i < values.length; i++) {
            rasters.get(i).read(0, block, values[i]);
        }
        return values;
    }

    /** Standard deviation of the winters' values; NaN with fewer than two winters. */
    private static double[] deviation(PlainRaster winters, Block block) {
        int[] counts = new int[block.cells()];
        double[] means = new double[block.cells()];
        double[] squares = new double[block.cells()];
        float[] winter = new float[block.cells()];
        for (int band = 0; band < winters.bands(); band++) {
            winters.read(band, block, winter);
            for (int cell = 0; cell < winter.length; cell++) {
                if (winter[cell] == winter[cell]) {
                    double distance = winter[cell] - means[cell];
                    means[cell] += distance / ++counts[cell];
                    squares[cell] += distance * (winter[cell] - means[cell]);
                }
            }
        }
        for (int cell = 0; cell < squares.length; cell++) {
            squares[cell] = counts[cell] < 2 ? Double.NaN : Math.sqrt(squares[cell] / (counts[cell] - 1));
        }
        return squares;
    }

    /** Where the changes of the mean margin come from: model, cultivar, way of downscaling, or what they do together. */
    private void variance() {
        List<String> methods = run.others().stream().map(ComparisonRun.Other::method).distinct().toList();
        List<List<ComparisonRun.Other>> table = ScenarioTable.of(run.others(), methods);
        boolean byMethod = !table.isEmpty() && methods.size() > 1;
        List<List<ComparisonRun.Other>> models = byMethod ? table : run.others().stream().map(List::of).toList();
        String[] parts = byMethod ? new String[] {"model", "cultivar", "method", "interaction"} : new String[] {"model", "cultivar", "interaction"};
        String[] words = byMethod ? new String[] {"the climate model", "the cultivar", "the way of downscaling", "what these do together"}
                : new String[] {"the climate model", "the cultivar", "what these do together"};
        List<List<PlainRaster>> rasters = new ArrayList<>();
        List<RasterWriter> writers = new ArrayList<>();
        try {
            run.cultivars().forEach(cultivar -> rasters.add(open(cultivar, ChangeLayers.marginChange())));
            for (int i = 0; i < parts.length; i++) {
                writers.add(output.open(FOLDER + "/" + FinishedFolder.SHARED, ChangeLayers.variance(parts[i], words[i])));
            }
            for (int row = 0; row < grid.rows(); row += output.rowsAtOnce()) {
                Block block = new Block(0, row, grid.columns(), Math.min(output.rowsAtOnce(), grid.rows() - row));
                float[][] out = variance(models, rasters, block, byMethod);
                for (int i = 0; i < parts.length; i++) {
                    writers.get(i).write(0, row, block.rows(), out[i]);
                }
            }
            writers.forEach(RasterWriter::finish);
        } finally {
            writers.forEach(RasterWriter::close);
            rasters.forEach(list -> list.forEach(PlainRaster::close));
        }
    }

    private float[][] variance(List<List<ComparisonRun.Other>> models, List<List<PlainRaster>> rasters, Block block, boolean byMethod) {
        float[][][] changes = new float[rasters.size()][][];
        for (int c = 0; c < changes.length; c++) {
            changes[c] = read(rasters.get(c), block);
        }
        float[][] out = new float[byMethod ? 4 : 3][block.cells()];
        double[][][] values = new double[models.size()][rasters.size()][models.get(0).size()];
        for (int cell = 0; cell < block.cells(); cell++) {
            double sum = 0;
            for (int i = 0; i < values.length; i++) {
                for (int c = 0; c < rasters.size(); c++) {
                    for (int m = 0; m < values[i][c].length; m++) {
                        values[i][c][m] = changes[c][run.others().indexOf(models.get(i).get(m))][cell];
                        sum += values[i][c][m];
                    }
                }
            }
            double[] shares = sum != sum ? null : ChangeVariance.shares(values);
            for (int part = 0; part < out.length; part++) {
                int share = byMethod || part < 2 ? part : 3;
                out[part][cell] = shares == null ? Float.NaN : (float) shares[share];
            }
        }
        return out;
    }
}
