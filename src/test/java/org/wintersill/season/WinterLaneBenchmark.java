package org.wintersill.season;

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
import org.wintersill.damage.ToleranceCurve;
import org.wintersill.hardiness.LethalTemperatures;

/**
 * The day loop of a lane: cell-nights times cultivars a second on one thread, five cultivars, levels 50, 10 and 90. How to run it
 * stands in DEVELOPERS.md, results in {@code src/test/bench/results}.
 */
@State(Scope.Thread)
@BenchmarkMode(Mode.Throughput)
@OutputTimeUnit(TimeUnit.SECONDS)
@Fork(1)
@Warmup(iterations = 3, time = 1)
@Measurement(iterations = 5, time = 1)
public class WinterLaneBenchmark {
    private static final int CELLS = 2000;
    private static final int NIGHTS = 272;
    private static final int CULTIVARS = 5;

    private final float[][] nights = new float[NIGHTS][CELLS];
    private final NightCurve[] curves = new NightCurve[CULTIVARS];
    private final WinterLane lane = new WinterLane(CULTIVARS, 3, DamageReckoning.PLAIN, CELLS);
    private final float[][] stretch = new float[WinterLane.STRETCH][];
    private final int[] positions = new int[WinterLane.STRETCH];

    public WinterLaneBenchmark() {
        Random random = new Random(7);
        for (int night = 0; night < NIGHTS; night++) {
            double season = -8 * Math.sin(Math.PI * night / NIGHTS);
            for (int i = 0; i < CELLS; i++) {
                nights[night][i] = (float) (season + 4 * random.nextGaussian());
            }
        }
        for (int c = 0; c < CULTIVARS; c++) {
            double[][] lt = new double[3][NIGHTS];
            for (int night = 0; night < NIGHTS; night++) {
                lt[1][night] = -5 - c - 15 * Math.sin(Math.PI * night / NIGHTS);
                lt[0][night] = lt[1][night] + 2;
                lt[2][night] = lt[1][night] - 2.5;
            }
            curves[c] = NightCurve.of(new LethalTemperatures(lt[0], lt[1], lt[2]), ToleranceCurve.SPLIT_LOGISTIC, new double[] {10, 90}, new Phases(91, 181));
        }
    }

    @Benchmark
    @OperationsPerInvocation(CELLS * NIGHTS * CULTIVARS)
    public WinterLane wholeWinter() {
        lane.begin();
        for (int night = 0; night < NIGHTS; night += WinterLane.STRETCH) {
            int count = Math.min(WinterLane.STRETCH, NIGHTS - night);
            System.arraycopy(nights, night, stretch, 0, count);
            for (int n = 0; n < count; n++) {
                positions[n] = night + n;
            }
            lane.accept(curves, stretch, count, positions);
        }
        return lane;
    }
}
