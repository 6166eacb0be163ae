package org.wintersill.elevation.terrain;

import java.util.Arrays;
import java.util.Random;
import java.util.concurrent.TimeUnit;
import java.util.stream.IntStream;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Param;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.Warmup;

/**
 * Seconds for each index over a relief of {@code side} x {@code side} cells of 30 m with a radius of 1 km, on all processors. Hills,
 * gentle noise of float heights (every height another: the hard case for ranks). How to run it stands in DEVELOPERS.md.
 */
@State(Scope.Benchmark)
@BenchmarkMode(Mode.SingleShotTime)
@OutputTimeUnit(TimeUnit.SECONDS)
@Fork(1)
@Warmup(iterations = 1)
@Measurement(iterations = 3)
public class TerrainBenchmark {
    private static final Tasks THREADS = (count, task) -> IntStream.range(0, count).parallel().forEach(task);

    @Param({"5000"})
    private int side;
    private Relief relief;
    private final Window window = new Window(Window.Shape.DISC, 1000);

    @Setup
    public void make() {
        Random random = new Random(7);
        float[] metres = new float[side * side];
        for (int i = 0; i < metres.length; i++) {
            double x = i % side;
            double y = i / side;
            metres[i] = (float) (900 + 400 * Math.sin(x / 90) * Math.cos(y / 120) + 80 * Math.sin(x / 17 + y / 23) + random.nextDouble());
        }
        double[] sizes = new double[side];
        Arrays.fill(sizes, 30);
        relief = new Relief(side, side, metres, sizes, sizes);
    }

    @Benchmark
    public Object percentileAndHeightAboveLowest() {
        return LocalHeights.of(relief, window, relief.whole(), THREADS);
    }

    @Benchmark
    public Object positionIndex() {
        return PositionIndex.of(relief, window, relief.whole(), THREADS);
    }

    @Benchmark
    public Object slope() {
        return SurfaceForm.slope(relief, relief.whole(), THREADS);
    }

    @Benchmark
    public Object coldPools() {
        return new ColdPools(4, 60, window, false).over(relief, relief.whole(), THREADS);
    }
}
