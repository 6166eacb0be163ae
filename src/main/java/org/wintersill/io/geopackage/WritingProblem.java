package org.wintersill.io.geopackage;

import java.nio.file.Path;
import org.sqlite.SQLiteErrorCode;
import org.sqlite.SQLiteException;
import org.wintersill.problem.Problem;
import org.wintersill.problem.ProblemException;

/** Turns what the driver says into what the user can do. */
final class WritingProblem {

    private WritingProblem() {
    }

    static ProblemException of(Path file, Exception cause) {
        SQLiteErrorCode code = cause instanceof SQLiteException sqlite ? sqlite.getResultCode() : null;
        if (code == SQLiteErrorCode.SQLITE_FULL) {
            return Problem.output("The disk is full or the quota is used up", file.toString(),
                    "Free some space or choose another output folder").asException(cause);
        }
        if (code == SQLiteErrorCode.SQLITE_TOOBIG) {
            return Problem.limit("One geometry is larger than a GeoPackage row can be (1 GB)", file.toString(),
                    "Write the parts of each class as rows of their own (parts: true)").asException(cause);
        }
        return Problem.output("The GeoPackage cannot be written: " + cause.getMessage(), file.toString(),
                "Check that the folder exists, may be written to and has space").asException(cause);
    }
}
