package org.wintersill.io.netcdf;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.wintersill.problem.ProblemException;

/** Tells the containers apart by their first bytes and reads their headers. */
final class CdfFiles {
    private static final byte[] HDF5 = {(byte) 0x89, 'H', 'D', 'F', '\r', '\n', 0x1a, '\n'};

    private CdfFiles() {
    }

    /** Version of a classic file (1, 2 or 5); 0 if it is none. */
    private static int classicVersion(byte[] head) {
        boolean classic = head.length >= 4 && head[0] == 'C' && head[1] == 'D' && head[2] == 'F';
        return classic && (head[3] == 1 || head[3] == 2 || head[3] == 5) ? head[3] : 0;
    }

    private static boolean isHdf5(byte[] head) {
        return head.length >= HDF5.length && java.util.Arrays.equals(head, 0, HDF5.length, HDF5, 0, HDF5.length);
    }

    /** Whether the first bytes are those of a container that is read here. */
    static boolean recognises(byte[] head) {
        return classicVersion(head) != 0 || isHdf5(head);
    }

    /**
     * Reads the header.
     *
     * @throws ProblemException one problem that says what the file is, if it is not readable
     */
    static CdfHeader header(Path path) {
        try {
            long size = Files.size(path);
            byte[] head = head(path);
            int version = classicVersion(head);
            if (version != 0) {
                return ClassicHeader.read(path, version);
            }
            if (isHdf5(head)) {
                return HdfHeader.read(path, size);
            }
            throw UnknownContent.describe(path, head).asException();
        } catch (IOException e) {
            throw CdfProblems.unreadable(path, e);
        } catch (ProblemException e) {
            throw e;
        } catch (RuntimeException | StackOverflowError | OutOfMemoryError e) {
            // jHDF allocates and recurses by what a damaged header says; the attempt is over and its memory free again
            throw CdfProblems.damaged(path, "its header cannot be decoded", e);
        }
    }

    private static byte[] head(Path path) throws IOException {
        try (java.io.InputStream in = Files.newInputStream(path)) {
            return in.readNBytes(64);
        }
    }
}
