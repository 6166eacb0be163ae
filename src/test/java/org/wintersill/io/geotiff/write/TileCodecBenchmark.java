package org.wintersill.io.geotiff.write;

import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Level;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Param;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.TearDown;
import org.openjdk.jmh.annotations.Warmup;
import org.openjdk.jmh.runner.Runner;
import org.openjdk.jmh.runner.RunnerException;
import org.openjdk.jmh.runner.options.OptionsBuilder;
import org.wintersill.layer.SampleType;

/**
 * Time to compress and to read one tile of 256 x 256 values. MB/s = 65536 x bytes a value / time. Run it with
 * {@code mvn test-compile exec:exec -Dexec.classpathScope=test -Dexec.executable=java
 * -Dexec.args="-cp %classpath org.wintersill.io.geotiff.write.TileCodecBenchmark"}.
 */
@State(Scope.Thread)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MICROSECONDS)
@Warmup(iterations = 2, time = 1)
@Measurement(iterations = 3, time = 1)
@Fork(1)
public class TileCodecBenchmark {
    @Param({"FLOAT32", "INT16", "BYTE"})
    private SampleType type;

    /** 1 is fast, 9 is small. */
    @Param({"1", "3", "6"})
    private int effort;

    private float[] values;
    private TileCodec codec;

    @Setup(Level.Trial)
    public void fill() {
        values = SyntheticLayer.of(type, PyramidLevel.TILE, PyramidLevel.TILE, 1, SyntheticLayer.LAEA, null).bands()[0];
        codec = new TileCodec(type, effort);
        codec.pack(values);
    }

    @TearDown(Level.Trial)
    public void free() {
        System.out.println("compressed to " + codec.length() + " of "
                + PyramidLevel.TILE * PyramidLevel.TILE * type.bytes() + " bytes");
        codec.close();
    }

    @Benchmark
    public int pack() {
        codec.pack(values);
        return codec.length();
    }

    /** Runs all of the above. */
    public static void main(String[] arguments) throws RunnerException {
        new Runner(new OptionsBuilder().include(TileCodecBenchmark.class.getName()).build()).run();
    }
}
