package org.wintersill.config;

import java.nio.file.Path;
import java.util.List;
import org.wintersill.temperature.TemperatureRequest;

/**
 * Files of one daily quantity, and what the run file says about them.
 *
 * @param given files, folders and patterns as they were given, joined by commas
 * @param files the files found, each once, sorted by name; at least one
 * @param request what the files may not say themselves
 */
public record TemperatureEntry(String given, List<Path> files, TemperatureRequest request) {
    public TemperatureEntry {
        files = List.copyOf(files);
    }
}
