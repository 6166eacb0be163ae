package org.wintersill.problem;

import java.util.List;
import java.util.stream.Collectors;

/** Carries one or more {@link Problem}s up to the command line, which prints them and chooses the exit code. */
public final class ProblemException extends RuntimeException {
    private static final long serialVersionUID = 1L;

    private final transient List<Problem> problems;

    public ProblemException(Problem problem) {
        this(List.of(problem), null);
    }

    public ProblemException(Problem problem, Throwable cause) {
        this(List.of(problem), cause);
    }

    public ProblemException(List<Problem> problems) {
        this(problems, null);
    }

    private ProblemException(List<Problem> problems, Throwable cause) {
        super(problems.stream().map(Problem::toString).collect(Collectors.joining("\n")), cause);
        this.problems = List.copyOf(problems);
    }

    /** At least one problem, in the order in which they were found. */
    public List<Problem> problems() {
        return problems;
    }

    /** Exit code of the gravest kind found first in the order usage, input, output, limit. */
    public int exitCode() {
        return problems.stream().mapToInt(p -> p.kind().exitCode()).min().orElse(1);
    }
}
