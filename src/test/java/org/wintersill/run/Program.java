package org.wintersill.run;

import java.io.ByteArrayOutputStream;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import org.wintersill.cli.Main;

/** The program as a user starts it, within this process. */
final class Program {
    private Program() {
    }

    /** How it ended. */
    record Ended(int code, String out, String err) {
        Ended expect(int wanted) {
            if (code != wanted) {
                throw new AssertionError("ended with " + code + " instead of " + wanted + ":\n" + err + out);
            }
            return this;
        }
    }

    static Ended run(String... arguments) {
        ByteArrayOutputStream out = new ByteArrayOutputStream();
        ByteArrayOutputStream err = new ByteArrayOutputStream();
        int code = Main.run(arguments, new PrintStream(out, true, StandardCharsets.UTF_8),
                new PrintStream(err, true, StandardCharsets.UTF_8));
        return new Ended(code, out.toString(StandardCharsets.UTF_8), err.toString(StandardCharsets.UTF_8));
    }
}
