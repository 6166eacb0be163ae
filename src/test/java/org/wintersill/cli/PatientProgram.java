package org.wintersill.cli;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.concurrent.locks.LockSupport;
import org.wintersill.engine.CancelledException;

/** A program whose work holds an unfinished file until it is asked to stop; for {@link InterruptionTest}. */
final class PatientProgram {
    private PatientProgram() {
    }

    public static void main(String[] arguments) {
        Path unfinished = Path.of(arguments[0]);
        FakeCommands commands = new FakeCommands();
        commands.work = console -> {
            try {
                Files.createFile(unfinished);
                console.message("working");
                while (!console.cancellation().getAsBoolean()) {
                    LockSupport.parkNanos(1_000_000);
                }
                Files.delete(unfinished);
            } catch (IOException e) {
                throw new UncheckedIOException(e);
            }
            throw new CancelledException();
        };
        System.exit(Main.process(new String[] {"map", arguments[1]}, commands));
    }
}
