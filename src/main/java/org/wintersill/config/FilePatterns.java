package org.wintersill.config;

import java.io.File;
import java.io.IOException;
import java.nio.file.DirectoryIteratorException;
import java.nio.file.DirectoryStream;
import java.nio.file.Files;
import java.nio.file.InvalidPathException;
import java.nio.file.LinkOption;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Set;
import java.util.TreeSet;
import org.wintersill.io.yaml.Neighbours;
import org.wintersill.problem.NearestName;

/**
 * Finds the files that a path, folder or pattern stands for: the same ones in the same order on every system.
 *
 * <p>{@code *} stands for any letters of a name, {@code ?} for one letter, {@code **} for any folders, linked ones left out. Upper
 * and lower case differ. Hidden files (names that begin with a point) are found only by a pattern that begins with one. A file
 * that has exactly the given name is taken even if the name looks like a pattern. A folder stands for the files in it whose names
 * end as asked.
 */
final class FilePatterns {
    /** Entries looked at for one pattern, so that {@code /**} does not search a whole disk (assumed). */
    private static final int MOST_ENTRIES = 200_000;
    private static final int SHOWN = 4;

    private final Path base;
    private final Set<String> endings;
    private int looked;

    /**
     * @param base folder that relative paths start from
     * @param endings what the names of files taken from a whole folder end with, in lower case, such as {@code .nc}
     */
    FilePatterns(Path base, Set<String> endings) {
        this.base = base;
        this.endings = new TreeSet<>(endings);
    }

    /**
     * What was found.
     *
     * @param files sorted by name; empty if something is wrong
     * @param what what is wrong; empty if nothing is
     * @param remedy what to do about it
     */
    record Found(List<Path> files, String what, String remedy) {
        static Found nothing(String what, String remedy) {
            return new Found(List.of(), what, remedy);
        }
    }

    /** The files of one path, folder or pattern. */
    Found find(String given) {
        looked = 0;
        try {
            Path path = base.resolve(given);
            if (Files.isDirectory(path)) {
                return folder(path, given);
            }
            if (Files.exists(path)) {
                return new Found(List.of(path), "", "");
            }
        } catch (InvalidPathException e) {
            if (!hasWildcard(given)) {
                return Found.nothing("'" + given + "' cannot be a path: " + e.getReason(), "");
            }
        }
        return hasWildcard(given) ? pattern(given) : missing(base.resolve(given), given);
    }

    private Found folder(Path folder, String given) {
        List<Path> files = new ArrayList<>();
        for (Path entry : entries(folder)) {
            String name = name(entry);
            if (!name.startsWith(".") && endings.stream().anyMatch(name.toLowerCase(Locale.ROOT)::endsWith)
                    && Files.isRegularFile(entry)) {
                files.add(entry);
            }
        }
        return files.isEmpty() ? Found.nothing("the folder '" + given + "' has no file that ends in " + String.join(", ", endings),
                holds(folder)) : new Found(sorted(files), "", "");
    }

    private Found missing(Path path, String given) {
        Path parent = path.getParent() == null ? Path.of("") : path.getParent();
        if (!Files.isDirectory(parent)) {
            return Found.nothing("there is no file '" + given + "': " + shown(parent) + " does not exist", "Check the path");
        }
        String near = NearestName.of(name(path), Neighbours.names(parent)).map(name -> "Did you mean " + name + "?")
                .orElseGet(() -> holds(parent));
        return Found.nothing("there is no file '" + given + "' in " + shown(parent), near);
    }

    private Found pattern(String given) {
        String text = File.separatorChar == '\\' ? given.replace('\\', '/') : given;
        int wildcard = 0;
        while (text.charAt(wildcard) != '*' && text.charAt(wildcard) != '?') {
            wildcard++;
        }
        int cut = text.lastIndexOf('/', wildcard) + 1;
        Path start;
        try {
            start = base.resolve(text.substring(0, cut));
        } catch (InvalidPathException e) {
            return Found.nothing("'" + given + "' cannot be a path: " + e.getReason(), "");
        }
        if (!Files.isDirectory(start)) {
            return Found.nothing("no file matches '" + given + "': " + shown(start) + " does not exist", "Check the path");
        }
        List<Path> files = new ArrayList<>();
        descend(start, List.of(text.substring(cut).split("/+")), 0, files);
        if (looked > MOST_ENTRIES) {
            return Found.nothing("the pattern '" + given + "' leads through more than " + MOST_ENTRIES + " files",
                    "Begin the pattern with the folder that holds the files");
        }
        return files.isEmpty() ? Found.nothing("no file matches '" + given + "' in " + shown(start), holds(start))
                : new Found(sorted(files), "", "");
    }

    private void descend(Path folder, List<String> segments, int index, List<Path> files) {
        String segment = segments.get(index);
        boolean last = index == segments.size() - 1;
        if (segment.equals("**") && !last) {
            descend(folder, segments, index + 1, files);
        }
        if (segment.equals("..") || segment.equals(".")) {
            if (!last) {
                descend(folder.resolve(segment), segments, index + 1, files);
            }
            return;
        }
        for (Path entry : entries(folder)) {
            String name = name(entry);
            if (looked > MOST_ENTRIES || name.startsWith(".") && !segment.startsWith(".")) {
                continue;
            }
            if (segment.equals("**")) {
                if (Files.isDirectory(entry, LinkOption.NOFOLLOW_LINKS)) {
                    descend(entry, segments, index, files);
                } else if (last && Files.isRegularFile(entry)) {
                    files.add(entry);
                }
            } else if (matches(segment, name)) {
                if (!last && Files.isDirectory(entry)) {
                    descend(entry, segments, index + 1, files);
                } else if (last && Files.isRegularFile(entry)) {
                    files.add(entry);
                }
            }
        }
    }

    private List<Path> entries(Path folder) {
        List<Path> entries = new ArrayList<>();
        try (DirectoryStream<Path> stream = Files.newDirectoryStream(folder)) {
            for (Path entry : stream) {
                entries.add(folder.resolve(String.valueOf(entry.getFileName())));
                if (++looked > MOST_ENTRIES) {
                    break;
                }
            }
        } catch (IOException | DirectoryIteratorException e) {
            return List.of();
        }
        return entries;
    }

    /** Whether a name matches a segment; the last star is the only one that is ever tried again, so the time stays bounded. */
    static boolean matches(String segment, String name) {
        int s = 0;
        int n = 0;
        int star = -1;
        int resume = 0;
        while (n < name.length()) {
            if (s < segment.length() && segment.charAt(s) == '*') {
                star = s++;
                resume = n;
            } else if (s < segment.length() && (segment.charAt(s) == '?' || segment.charAt(s) == name.charAt(n))) {
                s++;
                n++;
            } else if (star >= 0) {
                s = star + 1;
                n = ++resume;
            } else {
                return false;
            }
        }
        while (s < segment.length() && segment.charAt(s) == '*') {
            s++;
        }
        return s == segment.length();
    }

    static boolean hasWildcard(String text) {
        return text.indexOf('*') >= 0 || text.indexOf('?') >= 0;
    }

    /** Each file once, in the order of names. */
    static List<Path> sorted(List<Path> files) {
        Map<Path, Path> once = new LinkedHashMap<>();
        files.forEach(file -> once.putIfAbsent(file.toAbsolutePath().normalize(), file));
        return once.values().stream().sorted(Comparator.comparing(path -> path.toString().replace('\\', '/'))).toList();
    }

    private static String holds(Path folder) {
        List<String> names = Neighbours.names(folder);
        if (names.isEmpty()) {
            return "The folder is empty";
        }
        String more = names.size() > SHOWN ? " and " + (names.size() - SHOWN) + " more" : "";
        return "The folder holds " + String.join(", ", names.subList(0, Math.min(SHOWN, names.size()))) + more;
    }

    private static String shown(Path folder) {
        String text = folder.toString();
        return text.isEmpty() ? "the current folder" : "the folder " + text;
    }

    private static String name(Path path) {
        return String.valueOf(path.getFileName());
    }
}
