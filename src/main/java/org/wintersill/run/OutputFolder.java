package org.wintersill.run;

import java.io.IOException;
import java.nio.channels.FileChannel;
import java.nio.file.FileVisitResult;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.SimpleFileVisitor;
import java.nio.file.StandardCopyOption;
import java.nio.file.StandardOpenOption;
import java.nio.file.attribute.BasicFileAttributes;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.Stream;
import org.wintersill.problem.Problem;

/**
 * The folder that a run fills. Everything is first written under a hidden folder inside it; at the end the files move to their
 * names, the record last, so the record's presence means that the folder is complete. Closing before
 * {@link #publish} leaves nothing of the run behind.
 */
public final class OutputFolder implements AutoCloseable {
    /** Name of the record; its presence means the folder is complete. */
    public static final String RECORD = "record.json";
    private static final String HIDDEN = ".unfinished";

    private final Path folder;
    private final Path hidden;
    private final boolean madeFolder;
    private boolean published;

    private OutputFolder(Path folder, boolean madeFolder) {
        this.folder = folder.normalize();
        this.madeFolder = madeFolder;
        hidden = this.folder.resolve(HIDDEN);
    }

    /**
     * Says whether a run may write there, without touching anything.
     *
     * @param overwrite whether finished outputs may be replaced
     * @throws org.wintersill.problem.ProblemException when the folder holds something, or cannot be a folder
     */
    public static void check(Path folder, boolean overwrite) {
        if (Files.exists(folder) && !Files.isDirectory(folder)) {
            throw Problem.output("the output folder is a file", folder.toString(), "Choose another name for outputs.folder").asException();
        }
        boolean interrupted = Files.isDirectory(folder.resolve(HIDDEN)) && !Files.exists(folder.resolve(RECORD));
        if (overwrite || !Files.isDirectory(folder) || interrupted) {
            return;
        }
        try (Stream<Path> entries = Files.list(folder)) {
            if (entries.findAny().isPresent()) {
                throw Problem.output("the output folder exists and is not empty", folder.toString(),
                        "Choose another folder with --out, or replace its outputs with --overwrite").asException();
            }
        } catch (IOException e) {
            throw Problem.output("the output folder cannot be read", folder.toString(), "Check its permissions").asException(e);
        }
    }

    /** Makes the folder ready; what an interrupted run left behind is removed. */
    public static OutputFolder open(Path folder, boolean overwrite) {
        check(folder, overwrite);
        boolean made = !Files.exists(folder);
        OutputFolder output = new OutputFolder(folder, made);
        try {
            Files.createDirectories(folder);
            if (Files.exists(output.hidden)) {
                removeTree(output.hidden);
            }
            Files.createDirectory(output.hidden);
        } catch (IOException e) {
            throw Problem.output("the output folder cannot be written: " + e.getMessage(), folder.toString(),
                    "Check its permissions and the free space of the disk").asException(e);
        }
        return output;
    }

    /**
     * Where to write a file for now. Its folder is made.
     *
     * @param name name inside the output folder, parts separated by {@code /}
     */
    public Path unfinished(String name) {
        Path path = hidden.resolve(name).normalize();
        if (!path.startsWith(hidden)) {
            throw new IllegalArgumentException("outside of the output folder: " + name);
        }
        try {
            Files.createDirectories(path.getParent());
        } catch (IOException e) {
            throw cannotWrite(path, e);
        }
        return path;
    }

    private static RuntimeException cannotWrite(Path path, IOException e) {
        return Problem.output("the file cannot be written: " + e.getMessage(), path.toString(),
                "Check the permissions of the folder and the free space of the disk").asException(e);
    }

    /** Names of all files written so far but the record, sorted. */
    public List<String> names() {
        try (Stream<Path> files = Files.walk(hidden)) {
            return files.filter(Files::isRegularFile).map(file -> hidden.relativize(file).toString().replace('\\', '/'))
                    .filter(name -> !name.equals(RECORD)).sorted().toList();
        } catch (IOException e) {
            throw cannotWrite(hidden, e);
        }
    }

    /** Moves every file to its name, the record last, and forces each to disk; what an earlier run alone had written goes. */
    public void publish() {
        try {
            List<String> order = new ArrayList<>(names());
            ReplacedOutputs.remove(folder, order);
            Files.deleteIfExists(folder.resolve(RECORD));
            order.add(RECORD);
            for (String name : order) {
                Path from = hidden.resolve(name);
                Path to = folder.resolve(name);
                Files.createDirectories(to.getParent());
                try (FileChannel channel = FileChannel.open(from, StandardOpenOption.WRITE)) {
                    channel.force(true);
                }
                Files.move(from, to, StandardCopyOption.ATOMIC_MOVE, StandardCopyOption.REPLACE_EXISTING);
            }
            published = true;
            removeTree(hidden);
        } catch (IOException e) {
            throw cannotWrite(folder, e);
        }
    }

    @Override
    public void close() {
        if (published) {
            return;
        }
        try {
            if (Files.exists(hidden)) {
                removeTree(hidden);
            }
            if (madeFolder) {
                Files.deleteIfExists(folder);
            }
        } catch (IOException e) {
            throw cannotWrite(hidden, e);
        }
    }

    private static void removeTree(Path root) throws IOException {
        Files.walkFileTree(root, new SimpleFileVisitor<>() {
            @Override
            public FileVisitResult visitFile(Path file, BasicFileAttributes attributes) throws IOException {
                Files.delete(file);
                return FileVisitResult.CONTINUE;
            }

            @Override
            public FileVisitResult postVisitDirectory(Path directory, IOException failure) throws IOException {
                Files.delete(directory);
                return FileVisitResult.CONTINUE;
            }
        });
    }
}
