package org.wintersill.cli;

import java.io.PrintStream;
import java.util.List;
import java.util.function.ToIntFunction;
import org.wintersill.problem.Problem;

/**
 * One call of the program.
 *
 * @param commands the work
 * @param arguments as typed
 * @param terminal whether standard error ends in a terminal
 */
record Session(Commands commands, List<String> arguments, PrintStream out, PrintStream err, boolean terminal,
               Cancellation cancellation) {

    Console console(Manners manners) {
        return new Console(out, err, manners.level(), terminal, cancellation, System::nanoTime);
    }

    /** Does the work of a command and settles the exit code. */
    int call(Manners manners, ToIntFunction<Console> work) {
        if (manners.quiet && manners.verbose) {
            throw Problem.usage("--quiet and --verbose are both given", "", "Keep one of the two").asException();
        }
        Console console = console(manners);
        int code;
        try {
            code = work.applyAsInt(console);
        } finally {
            console.stop();
        }
        int notes = console.notices().counts().size();
        if (code == ExitCode.DONE && manners.strict && notes > 0) {
            console.error("there " + (notes == 1 ? "was 1 note" : "were " + notes + " notes") + ", and --strict does not accept any");
            return ExitCode.INPUT;
        }
        return code;
    }
}
