package org.wintersill.run;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.InvalidPathException;
import java.nio.file.LinkOption;
import java.nio.file.Path;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.stream.Stream;
import org.wintersill.io.json.JsonNames;

/**
 * Takes away what an earlier run wrote and the new one does not, so that no layer of a cultivar that was dropped lies beside a
 * record that does not know it. Only files that the earlier record names are touched, and only inside of the folder.
 */
final class ReplacedOutputs {
    private ReplacedOutputs() {
    }

    /**
     * Removes them, and the folders that this empties.
     *
     * @param folder output folder, with the earlier record if there was one
     * @param kept names that the new run writes
     */
    static void remove(Path folder, List<String> kept) throws IOException {
        Set<String> stay = new HashSet<>(kept);
        Path real = folder.toRealPath();
        for (String name : JsonNames.of(folder.resolve(OutputFolder.RECORD), "outputs", "path")) {
            Path file = inside(real, name);
            if (file != null && !stay.contains(name) && Files.isRegularFile(file, LinkOption.NOFOLLOW_LINKS)
                    && file.getParent().toRealPath().startsWith(real)) {
                Files.delete(file);
                removeEmpty(file.getParent(), real);
            }
        }
    }

    private static Path inside(Path folder, String name) {
        try {
            Path path = folder.resolve(name).normalize();
            return path.startsWith(folder) && !path.equals(folder) ? path : null;
        } catch (InvalidPathException e) {
            return null;
        }
    }

    private static void removeEmpty(Path start, Path end) throws IOException {
        for (Path folder = start; !folder.equals(end); folder = folder.getParent()) {
            try (Stream<Path> entries = Files.list(folder)) {
                if (entries.findAny().isPresent()) {
                    return;
                }
            }
            Files.delete(folder);
        }
    }
}
