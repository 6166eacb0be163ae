package org.wintersill.config;

import java.util.List;
import org.wintersill.problem.Problem;

/**
 * A value from the command line that goes before the run file's.
 *
 * @param flag the flag as typed, such as {@code --set} or {@code --dem}
 * @param key dotted key of the run file
 * @param values one value, or several for a key that takes a list
 * @param kind how the values are to be read
 */
public record Setting(String flag, String key, List<String> values, Kind kind) {

    /** How the values are to be read. */
    public enum Kind {
        /** As they would stand in the run file; paths are relative to it. */
        AS_IN_FILE,
        /** As plain text. */
        TEXT,
        /** As paths or patterns relative to the current folder. */
        PATHS
    }

    public Setting {
        values = List.copyOf(values);
    }

    /**
     * {@code KEY=VALUE}, the argument of {@code --set}.
     *
     * @throws org.wintersill.problem.ProblemException if it has another form
     */
    public static Setting assignment(String text) {
        int equals = text.indexOf('=');
        String key = equals < 0 ? "" : text.substring(0, equals).trim();
        if (!key.matches("[^.\\s]+(\\.[^.\\s]+)*")) {
            throw Problem.usage("'" + text + "' does not have the form KEY=VALUE", "--set",
                    "Write for example --set elevation.lapse-rate=5.5").asException();
        }
        return inFile(key, text.substring(equals + 1));
    }

    /** A key with a value as it would stand in the run file. */
    public static Setting inFile(String key, String value) {
        return new Setting("--set", key, List.of(value), Kind.AS_IN_FILE);
    }

    public static Setting text(String flag, String key, String value) {
        return new Setting(flag, key, List.of(value), Kind.TEXT);
    }

    public static Setting paths(String flag, String key, List<String> values) {
        return new Setting(flag, key, values, Kind.PATHS);
    }
}
