package org.wintersill.climatology.extreme;

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

/**
 * Time a cell on one thread for a record of 30 winters: sorting and fitting, 200 replicates with bounds of three return levels, maximum
 * likelihood, expected damage. How to run it stands in DEVELOPERS.md, results in {@code src/test/bench/results}.
 */
@State(Scope.Thread)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MICROSECONDS)
@Fork(1)
@Warmup(iterations = 3, time = 1)
@Measurement(iterations = 5, time = 1)
public class ExtremeFitBenchmark {
    private static final int WINTERS = 30;
    private static final int CELLS = 1000;

    private final double[][] lows = new double[CELLS][WINTERS];
    private final double[] room = new double[WINTERS];
    private final ParametricBootstrap bootstrap = new ParametricBootstrap(200, 1, WINTERS);
    private int cell;

    public ExtremeFitBenchmark() {
        Gev gev = new Gev(15, 3, -0.15);
        for (int c = 0; c < CELLS; c++) {
            RandomStream random = RandomStream.of(3, c, 0);
            for (int i = 0; i < WINTERS; i++) {
                lows[c][i] = -gev.quantile(random.nextUniform() * 0.999999);
            }
        }
    }

    private ExtremeFit fit(int c) {
        System.arraycopy(lows[c], 0, room, 0, WINTERS);
        LowExtreme.toSortedMaxima(room, WINTERS);
        return ExtremeFit.of(room, WINTERS, ExtremeFit.Method.L_MOMENTS);
    }

    @Benchmark
    @OperationsPerInvocation(CELLS)
    public double moments() {
        double sum = 0;
        for (int c = 0; c < CELLS; c++) {
            sum += fit(c).gev().shape();
        }
        return sum;
    }

    private int next() {
        cell = (cell + 1) % CELLS;
        return cell;
    }

    @Benchmark
    public double replicates() {
        int c = next();
        ParametricBootstrap.Replicates replicates = bootstrap.of(fit(c), WINTERS, c, false);
        double sum = 0;
        for (int winters : new int[] {10, 50, 100}) {
            sum += replicates.bounds(gev -> gev.returnLevel(winters), 0.9)[0];
        }
        return sum;
    }

    @Benchmark
    public double likelihood() {
        fit(next());
        return MaximumLikelihood.fit(room, WINTERS).shape();
    }

    @Benchmark
    public double expectedDamage() {
        return FittedDamage.expected(fit(next()).gev(), org.wintersill.damage.ToleranceCurve.SPLIT_LOGISTIC, 1.2, 1.5);
    }
}
