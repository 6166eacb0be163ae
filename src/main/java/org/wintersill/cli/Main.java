package org.wintersill.cli;

import java.io.FileDescriptor;
import java.io.FileOutputStream;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.util.List;

/** Where the program begins. */
public final class Main {
    private Main() {
    }

    public static void main(String[] arguments) {
        System.exit(process(arguments, commands()));
    }

    /** The program as a process: with its own streams, and stopping when it is asked to end. */
    static int process(String[] arguments, Commands commands) {
        Cancellation cancellation = new Cancellation();
        Interruption interruption = new Interruption(cancellation);
        interruption.watch();
        try {
            return run(arguments, stream(FileDescriptor.out), stream(FileDescriptor.err), Terminal.onStandardError(), cancellation,
                    commands);
        } finally {
            interruption.workEnded();
        }
    }

    /** UTF-8 in every locale, so that results are the same bytes everywhere. */
    private static PrintStream stream(FileDescriptor descriptor) {
        return new PrintStream(new FileOutputStream(descriptor), true, StandardCharsets.UTF_8);
    }

    /** Does what the arguments say and returns the exit code; for callers within Java. */
    public static int run(String[] arguments, PrintStream out, PrintStream err) {
        return run(arguments, out, err, commands());
    }

    /** The same with other work behind the commands. */
    static int run(String[] arguments, PrintStream out, PrintStream err, Commands commands) {
        return run(arguments, out, err, false, new Cancellation(), commands);
    }

    static int run(String[] arguments, PrintStream out, PrintStream err, boolean terminal, Cancellation cancellation,
                   Commands commands) {
        return new Shell(new Session(commands, List.of(arguments), out, err, terminal, cancellation)).execute();
    }

    private static Commands commands() {
        return new RunCommands();
    }
}
