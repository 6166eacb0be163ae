package org.wintersill.io.file;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import org.wintersill.problem.Problem;

/** Writes one file under a temporary name beside its own and moves it when it is whole. */
public final class NewFile {
    private NewFile() {
    }

    /**
     * Says whether the file may be written, without touching anything.
     *
     * @param overwrite whether a file of that name may be replaced
     * @throws org.wintersill.problem.ProblemException when it may not
     */
    public static void check(Path file, boolean overwrite) {
        if (Files.isDirectory(file)) {
            throw Problem.output("a folder of this name exists", file.toString(), "Choose another name").asException();
        }
        Path folder = file.toAbsolutePath().getParent();
        if (folder == null || !Files.isDirectory(folder)) {
            throw Problem.output("the folder of this file does not exist", file.toString(), "Make it, or choose another name")
                    .asException();
        }
        if (!overwrite && Files.exists(file)) {
            throw Problem.output("the file exists", file.toString(), "Choose another name, or replace it with --overwrite").asException();
        }
    }

    /** Writes the bytes; an existing file is replaced only where that is allowed. */
    public static void write(Path file, byte[] bytes, boolean overwrite) {
        check(file, overwrite);
        Path begun = null;
        try {
            begun = Files.createTempFile(file.toAbsolutePath().getParent(), ".unfinished-", "");
            Files.write(begun, bytes);
            begun.toFile().setReadable(true, false);
            Files.move(begun, file, StandardCopyOption.ATOMIC_MOVE);
        } catch (IOException e) {
            remove(begun);
            throw Problem.output("the file cannot be written: " + e.getMessage(), file.toString(),
                    "Check the permissions of its folder and the free space of the disk").asException(e);
        }
    }

    private static void remove(Path begun) {
        try {
            if (begun != null) {
                Files.deleteIfExists(begun);
            }
        } catch (IOException e) {
            // the failure that led here is told; a left-over hidden file harms nobody
        }
    }
}
