package org.wintersill.hardiness.model;

import java.util.List;
import java.util.Random;
import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OperationsPerInvocation;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Param;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.Warmup;
import org.wintersill.hardiness.HardinessTrajectory;
import org.wintersill.hardiness.NightTolerance;
import org.wintersill.hardiness.StateModel;
import org.wintersill.hardiness.model.RelaxationModel.Part;
import org.wintersill.hardiness.model.ResponseModel.Turn;
import org.wintersill.hardiness.model.ThermalTimeModel.Phase;
import org.wintersill.time.CfCalendar;
import org.wintersill.time.Season;
import org.wintersill.time.SeasonWindow;

/**
 * Every state model alone: cell-days a second on one thread, tolerance of the night and step of the day. How to run it stands in
 * DEVELOPERS.md, results in {@code src/test/bench/results}.
 */
@State(Scope.Thread)
@BenchmarkMode(Mode.Throughput)
@OutputTimeUnit(TimeUnit.SECONDS)
@Fork(1)
@Warmup(iterations = 3, time = 1)
@Measurement(iterations = 5, time = 1)
public class StateModelBenchmark {
    private static final int CELLS = 2048;
    private static final int DAYS = 260;
    private static final Season WINTER = SeasonWindow.north().beginningIn(2013, CfCalendar.STANDARD);
    private static final Stage BURST = new Stage("bud burst", -2.2, -3.9, -8.9);
    private static final Stage LEAF = new Stage("first leaf", -1.9, -2.8, -6.1);
    private static final Stage SECOND = new Stage("second leaf", -1.7, -2.2, -5.6);

    @Param({"response", "response-tau", "thermal-time", "thermal-time-stages", "relaxation", "relaxation-night-rows", "relaxation-night-cells",
        "stage"})
    private String model;

    private StateModel state;
    private final float[][] means = new float[DAYS][CELLS];
    private final double[] latitudes = new double[CELLS];
    private final NightTolerance night = NightTolerance.of(CELLS);

    @Setup
    public void make() {
        Random random = new Random(7);
        for (int day = 0; day < DAYS; day++) {
            for (int i = 0; i < CELLS; i++) {
                means[day][i] = (float) (8 - 14 * Math.sin(Math.PI * day / DAYS) + 4 * random.nextGaussian());
            }
        }
        boolean perCell = model.endsWith("cells");
        for (int i = 0; i < CELLS; i++) {
            latitudes[i] = 45 + (perCell ? i * 1e-4 : i / 512 * 0.05);
        }
        FourParameterLogistic autumn = new FourParameterLogistic(0.55, -3, -25, 6);
        FourParameterLogistic spring = new FourParameterLogistic(0.75, -3, -25, 2);
        Turn turn = new Turn(List.of(600.0, 900.0), null, null, null);
        ThermalTimeModel thermal = new ThermalTimeModel(null, -10, -2, -24, new Phase(12, 0.1, 0.06), new Phase(4, 0.05, 0.12), 5, -600, -2.2,
                2, 3);
        StageDegreeDays stages = new StageDegreeDays(5, null, List.of(BURST, LEAF, SECOND), List.of(0.0, 30.0, 60.0), true);
        state = switch (model) {
            case "response" -> new ResponseModel(autumn, spring, 10, 0, turn, 2, 3);
            case "response-tau" -> new ResponseModel(autumn, spring, 0, 5, turn, 2, 3);
            case "thermal-time" -> thermal;
            case "thermal-time-stages" -> new StageAfterBudbreak(thermal, stages);
            case "relaxation" -> new RelaxationModel(null, -8, -12, new Part(0.6, -10, 10), null, 3, 7, 2, 3);
            case "stage" -> stages;
            default -> new RelaxationModel(null, -8, 2, new Part(0.6, -10, 10), new Part(-1.2, 10, 15), 3, 7, 2, 3);
        };
    }

    @Benchmark
    @OperationsPerInvocation(CELLS * DAYS)
    public HardinessTrajectory winter() {
        HardinessTrajectory trajectory = state.begin(WINTER, latitudes);
        for (int day = 0; day < DAYS; day++) {
            trajectory.tolerance(day, night);
            trajectory.advance(day, means[day]);
        }
        return trajectory;
    }
}
