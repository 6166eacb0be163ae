package org.wintersill.problem;

import java.util.Objects;

/**
 * One thing that stops a run, in the user's words.
 *
 * @param kind what sort of mistake it is; decides the exit code
 * @param what what is wrong, with the value found and the values accepted; a sentence without final stop
 * @param where file, variable, line or key; empty if the sentence already says it
 * @param remedy what to do next; a sentence without final stop, may be empty
 */
public record Problem(Kind kind, String what, String where, String remedy) {

    /** Kinds of problem with the exit code of the command line. */
    public enum Kind {
        /** Wrong command line or run file. */
        USAGE(2),
        /** An input file is refused. */
        INPUT(3),
        /** An output cannot be written. */
        OUTPUT(4),
        /** Memory, disk or size limits are exceeded. */
        LIMIT(5);

        private final int exitCode;

        Kind(int exitCode) {
            this.exitCode = exitCode;
        }

        public int exitCode() {
            return exitCode;
        }
    }

    public Problem {
        Objects.requireNonNull(kind);
        Objects.requireNonNull(what);
        where = where == null ? "" : where;
        remedy = remedy == null ? "" : remedy;
    }

    public static Problem usage(String what, String where, String remedy) {
        return new Problem(Kind.USAGE, what, where, remedy);
    }

    public static Problem input(String what, String where, String remedy) {
        return new Problem(Kind.INPUT, what, where, remedy);
    }

    public static Problem output(String what, String where, String remedy) {
        return new Problem(Kind.OUTPUT, what, where, remedy);
    }

    public static Problem limit(String what, String where, String remedy) {
        return new Problem(Kind.LIMIT, what, where, remedy);
    }

    /** The problem as an exception, for the places where going on makes no sense. */
    public ProblemException asException() {
        return new ProblemException(this);
    }

    /** The problem as an exception that keeps its technical cause for {@code --debug}. */
    public ProblemException asException(Throwable cause) {
        return new ProblemException(this, cause);
    }

    /** One line: place, what, remedy. */
    @Override
    public String toString() {
        StringBuilder text = new StringBuilder();
        if (!where.isEmpty()) {
            text.append(where).append(": ");
        }
        text.append(what).append('.');
        if (!remedy.isEmpty()) {
            text.append(' ').append(remedy).append('.');
        }
        return text.toString();
    }
}
