package org.wintersill.io.netcdf;

import java.nio.file.Path;
import org.wintersill.problem.Problem;
import org.wintersill.problem.ProblemException;

/** Sizes that are believed, so that a damaged number in a header never becomes an allocation. */
final class CdfLimits {
    /** Most numbers in a coordinate or its bounds; an hourly record of 500 years has 4.4 million. */
    private static final long COORDINATE_LIMIT = 20_000_000;

    private CdfLimits() {
    }

    static int smallSize(Path path, CdfVariable variable) {
        long size = variable.size();
        if (size > COORDINATE_LIMIT) {
            throw Problem.limit("The variable has " + size + " values; at most " + COORDINATE_LIMIT + " are read here",
                    CdfProblems.at(path, variable.name()), "Check that the file is not damaged").asException();
        }
        return (int) size;
    }

    static ProblemException unreadable(Path path, CdfVariable variable, Storage.Unreadable storage) {
        return Problem.input("The variable cannot be read: " + storage.reason(), CdfProblems.at(path, variable.name()),
                "Rewrite the file, for example with 'nccopy -d 1 -s in.nc out.nc'").asException();
    }
}
