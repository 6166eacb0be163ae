package org.wintersill.config;

import java.nio.file.Path;
import java.util.Optional;

/**
 * A file of ground heights.
 *
 * @param file where it is
 * @param crs reference system, for a file that carries none
 * @param unit {@code m}, {@code ft} or {@code us-ft}, for a file that does not say
 */
public record FileEntry(Path file, Optional<String> crs, Optional<String> unit) {
}
