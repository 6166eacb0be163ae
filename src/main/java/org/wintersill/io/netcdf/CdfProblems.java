package org.wintersill.io.netcdf;

import java.nio.file.Path;
import org.wintersill.problem.Problem;
import org.wintersill.problem.ProblemException;

/** Sentences about files that cannot be read, worded once. */
final class CdfProblems {
    private CdfProblems() {
    }

    static ProblemException truncated(Path file, long needed, long found) {
        return Problem.input("The file is cut short: its header needs " + needed + " bytes but it has " + found,
                file.toString(), "Fetch the file again").asException();
    }

    static ProblemException damaged(Path file, String how, Throwable cause) {
        return Problem.input("The file is damaged; " + how, file.toString(), "Fetch the file again or repair it with the"
                + " program that made it").asException(cause);
    }

    static ProblemException unreadable(Path file, Exception cause) {
        String reason = cause instanceof java.nio.file.NoSuchFileException ? "there is no such file"
                : cause instanceof java.nio.file.AccessDeniedException ? "permission is denied"
                : String.valueOf(cause.getMessage());
        return Problem.input("The file cannot be read: " + reason, file.toString(), "Check the path and its permissions")
                .asException(cause);
    }

    static ProblemException changed(Path file) {
        return Problem.input("The file was changed while it was in use", file.toString(), "Start the run again when the"
                + " file is complete").asException();
    }

    /** Place of a variable in a message. */
    static String at(Path file, String variable) {
        return file + ", variable '" + variable + "'";
    }
}
