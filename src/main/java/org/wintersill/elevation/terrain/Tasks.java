package org.wintersill.elevation.terrain;

import java.util.function.IntConsumer;

/** Port: works through numbered tasks that do not depend on each other, perhaps on several threads. */
public interface Tasks {

    /** Runs the tasks 0..count-1 and returns when all are done. */
    void forEach(int count, IntConsumer task);

    /** One after the other on the caller's thread. */
    static Tasks inOrder() {
        return (count, task) -> {
            for (int number = 0; number < count; number++) {
                task.accept(number);
            }
        };
    }
}
