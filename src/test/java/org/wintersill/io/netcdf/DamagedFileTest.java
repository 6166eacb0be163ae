package org.wintersill.io.netcdf;

import static org.junit.jupiter.api.Assertions.assertTimeoutPreemptively;
import static org.junit.jupiter.api.Assertions.fail;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.util.Arrays;
import java.util.Random;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.wintersill.grid.Block;
import org.wintersill.problem.Notices;
import org.wintersill.problem.ProblemException;
import org.wintersill.temperature.DailyTemperatureReader;
import org.wintersill.temperature.DailyTemperatureSource;

/** Whatever happens to a file, it is read or refused with a problem: nothing else is thrown and nothing hangs. */
class DamagedFileTest {
    /** Damaged copies of each file; {@code -Dwintersill.damage=5000} for a long search. */
    private static final int COPIES = Integer.getInteger("wintersill.damage", 120);

    @ParameterizedTest
    @ValueSource(strings = {"classic.nc", "cdf5.nc", "pencil-chunks.nc", "day-chunks.nc", "superblock3.nc", "members-nc4.nc",
        "unwritten-chunks.nc"})
    void damageIsRefusedOrHarmless(String name, @TempDir Path folder) throws IOException {
        byte[] whole = Files.readAllBytes(Fixtures.path(name));
        Random random = new Random(name.hashCode());
        for (int i = 0; i < COPIES; i++) {
            byte[] copy = damaged(whole, random);
            Path file = folder.resolve(i + "-" + name);
            Files.write(file, copy);
            int number = i;
            assertTimeoutPreemptively(Duration.ofSeconds(20), () -> tryToRead(file, number));
            Files.delete(file);
        }
    }

    private static byte[] damaged(byte[] whole, Random random) {
        if (random.nextInt(6) == 0) {
            return Arrays.copyOf(whole, random.nextInt(whole.length));
        }
        byte[] copy = whole.clone();
        int flips = 1 + random.nextInt(4);
        for (int k = 0; k < flips; k++) {
            // most of the interesting bytes are in the headers
            int at = random.nextInt(random.nextBoolean() ? copy.length : Math.min(copy.length, 2048));
            copy[at] = (byte) (random.nextInt(3) == 0 ? 0xff : random.nextInt(256));
        }
        return copy;
    }

    private static void tryToRead(Path file, int number) {
        try {
            DailyTemperatureSource source = new NetcdfTemperatureFormat(new StubCrsParser()).open(file,
                    Fixtures.request(null, null, null, file.toString().contains("members") ? "1" : null, null), new Notices());
            int columns = Math.min(source.grid().columns(), 50);
            int rows = Math.min(source.grid().rows(), 50);
            int days = Math.min(source.days().size(), 50);
            try (DailyTemperatureReader reader = source.open()) {
                reader.read(0, days, new Block(0, 0, columns, rows), new float[columns * rows * days], 0, columns * rows);
            }
        } catch (ProblemException e) {
            // refused, as it should be
        } catch (RuntimeException | Error e) {
            fail("copy " + number + " of " + file.getFileName(), e);
        }
    }
}
