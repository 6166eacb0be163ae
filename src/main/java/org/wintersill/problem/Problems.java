package org.wintersill.problem;

import java.util.ArrayList;
import java.util.List;

/** Collects problems so that all of them can be reported at once. Not thread-safe. */
public final class Problems {
    private final List<Problem> found = new ArrayList<>();

    public void add(Problem problem) {
        found.add(problem);
    }

    public void addAll(ProblemException exception) {
        found.addAll(exception.problems());
    }

    /** Runs a step; whatever problems it throws are collected instead. */
    public void attempt(Runnable step) {
        try {
            step.run();
        } catch (ProblemException e) {
            addAll(e);
        }
    }

    public boolean isEmpty() {
        return found.isEmpty();
    }

    public List<Problem> all() {
        return List.copyOf(found);
    }

    /** Throws everything collected so far, if anything was. */
    public void throwIfAny() {
        if (!found.isEmpty()) {
            throw new ProblemException(found);
        }
    }
}
