package org.wintersill.hardiness;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/** How far the numbers of a cultivar can be relied on; stands in every output that shows the cultivar. */
public enum Status {
    /** Read in a publication that the source names. */
    PUBLISHED("published"),
    /** Somebody remembers them; nobody has looked them up. */
    FROM_MEMORY("from memory"),
    /** Made up, to show how the program works. */
    INVENTED("invented"),
    /** Measured by whoever uses them. */
    OWN_DATA("own data");

    private final String word;

    Status(String word) {
        this.word = word;
    }

    /** The words of the cultivar file and of every output. */
    public String word() {
        return word;
    }

    /** Whether a plan may be built on the numbers: published or own data. */
    public boolean dependable() {
        return this == PUBLISHED || this == OWN_DATA;
    }

    public static Optional<Status> named(String word) {
        return Arrays.stream(values()).filter(status -> status.word.equals(word)).findFirst();
    }

    public static List<String> words() {
        return Arrays.stream(values()).map(Status::word).toList();
    }
}
