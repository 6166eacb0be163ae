package org.wintersill.io.yaml;

import java.io.IOException;
import java.nio.file.DirectoryStream;
import java.nio.file.DirectoryIteratorException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;

/** The names in a folder, for the question "did you mean ...?". */
public final class Neighbours {
    /** Enough to find a slip of the finger; a folder of daily files may hold far more. */
    private static final int MOST_NAMES = 20_000;

    private Neighbours() {
    }

    /** Names that are not hidden, sorted; empty if the folder cannot be read. */
    public static List<String> names(Path folder) {
        List<String> names = new ArrayList<>();
        try (DirectoryStream<Path> entries = Files.newDirectoryStream(folder)) {
            for (Path entry : entries) {
                String name = String.valueOf(entry.getFileName());
                if (!name.startsWith(".")) {
                    names.add(name);
                }
                if (names.size() == MOST_NAMES) {
                    break;
                }
            }
        } catch (IOException | DirectoryIteratorException e) {
            return List.of();
        }
        names.sort(null);
        return names;
    }
}
