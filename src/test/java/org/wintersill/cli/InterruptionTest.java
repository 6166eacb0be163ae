package org.wintersill.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.Assumptions;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class InterruptionTest {
    private static final Path KILL = Path.of("/bin/kill");

    @TempDir
    Path folder;

    @ParameterizedTest
    @CsvSource({"INT, 130", "TERM, 143"})
    void aSignalEndsTheWorkCleanlyWithItsOwnCode(String signal, int code) throws Exception {
        Assumptions.assumeTrue(Files.isExecutable(KILL), "signals are sent with /bin/kill, which is not here");
        Assumptions.assumeTrue(code == ExitCode.TERMINATED || !ignoresInterrupts(),
                "the tests run in the background of a shell that ignores SIGINT");
        Files.createFile(folder.resolve("t.nc"));
        Files.createFile(folder.resolve("c.yaml"));
        Path run = Files.writeString(folder.resolve("run.yaml"), "temperature: {minimum: t.nc}\ncultivars: c.yaml\n");
        Path unfinished = folder.resolve("unfinished");
        Path errors = folder.resolve("errors.txt");
        Process process = new ProcessBuilder(Path.of(System.getProperty("java.home"), "bin", "java").toString(), "-cp",
                System.getProperty("java.class.path"), PatientProgram.class.getName(), unfinished.toString(), run.toString())
                .redirectErrorStream(true).redirectOutput(errors.toFile()).start();
        try {
            long end = System.nanoTime() + TimeUnit.SECONDS.toNanos(60);
            while (!Files.exists(unfinished) && process.isAlive() && System.nanoTime() < end) {
                Thread.sleep(20);
            }
            new ProcessBuilder(KILL.toString(), "-" + signal, Long.toString(process.pid())).start().waitFor();
            assertTrue(process.waitFor(60, TimeUnit.SECONDS), "it ends soon");
            assertEquals(code, process.exitValue(), Files.readString(errors));
            assertFalse(Files.exists(unfinished), "the work put its file away");
            assertTrue(Files.readString(errors).contains("interrupted"), Files.readString(errors));
        } finally {
            process.destroyForcibly();
        }
    }

    /** Bit 1 of SigIgn; a process inherits what its parent ignores. */
    private static boolean ignoresInterrupts() throws Exception {
        Path status = Path.of("/proc/self/status");
        if (!Files.exists(status)) {
            return false;
        }
        return Files.readAllLines(status).stream().filter(line -> line.startsWith("SigIgn:"))
                .anyMatch(line -> (Long.parseUnsignedLong(line.substring(7).trim(), 16) & 2) != 0);
    }

    @Test
    void askedOnceItStaysCancelled() {
        Cancellation cancellation = new Cancellation();
        assertFalse(cancellation.getAsBoolean());
        cancellation.cancel();
        cancellation.cancel();
        assertTrue(cancellation.getAsBoolean());
    }
}
