package org.wintersill.elevation;

import java.util.Random;
import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OperationsPerInvocation;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.Warmup;
import org.wintersill.grid.CoordinateOperation;
import org.wintersill.grid.Crs;
import org.wintersill.grid.GridGeometry;

/** Cell-nights a second and thread that are brought to a terrain model ten times finer than the temperatures. */
@State(Scope.Thread)
@BenchmarkMode(Mode.Throughput)
@OutputTimeUnit(TimeUnit.SECONDS)
@Fork(1)
@Warmup(iterations = 3, time = 1)
@Measurement(iterations = 5, time = 1)
public class LaneAdjusterBenchmark {
    private static final int COLUMNS = 2000;
    private static final Crs CRS = new Crs("EPSG:4326", "WGS 84", "", Crs.Kind.GEOGRAPHIC, 1, null);

    private final float[] night = new float[200 * 40];
    private final float[] out = new float[COLUMNS];
    private final LaneAdjuster adjuster;
    private int row;

    public LaneAdjusterBenchmark() {
        Random random = new Random(7);
        GridGeometry source = new GridGeometry(200, 40, 0, 2, 0.05, 0.05, CRS);
        GridGeometry target = new GridGeometry(COLUMNS, 400, 0, 2, 0.005, 0.005, CRS);
        float[] sourceHeights = new float[night.length];
        for (int i = 0; i < night.length; i++) {
            night[i] = i % 200 < 10 ? Float.NaN : (float) random.nextGaussian();
            sourceHeights[i] = 500 * random.nextFloat();
        }
        float[] heights = new float[COLUMNS * 400];
        for (int i = 0; i < heights.length; i++) {
            heights[i] = 500 * random.nextFloat();
        }
        adjuster = new LaneAdjuster(ElevationAdjustment.toHeights(new SourcePositions(source, target, CoordinateOperation.identity()),
                sourceHeights, new ElevationField(target, heights, ""), LapseRates.constant(4.5)));
    }

    @Benchmark
    @OperationsPerInvocation(COLUMNS)
    public float[] row() {
        row = (row + 1) % 400;
        adjuster.adjust(night, 0, 4.5, row, 1, out);
        return out;
    }
}
