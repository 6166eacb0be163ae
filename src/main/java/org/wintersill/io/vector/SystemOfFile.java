package org.wintersill.io.vector;

import java.nio.file.Path;
import java.util.Optional;
import org.wintersill.grid.Crs;
import org.wintersill.grid.CrsParser;
import org.wintersill.io.crs.CrsDefinitions;
import org.wintersill.problem.Problem;
import org.wintersill.problem.ProblemException;

/** Settles the reference system of a file from what it says and what the run says. */
final class SystemOfFile {
    private final Path file;
    private final CrsParser parser;

    SystemOfFile(Path file, CrsParser parser) {
        this.file = file;
        this.parser = parser;
    }

    /**
     * The system.
     *
     * @param own code or WKT that the file gives; empty if it gives none
     * @param given code that the run gives
     * @throws ProblemException when neither says, both say different things, or the system is not known
     */
    Crs settle(Optional<String> own, Optional<String> given) {
        Optional<Crs> named = given.map(this::parse);
        if (own.isEmpty()) {
            return named.orElseThrow(() -> Problem.input("the file does not say in which reference system its polygons are",
                    file.toString(), "Give its code with crs, such as EPSG:4326").asException());
        }
        Crs found = parse(own.get());
        if (named.isPresent() && !CrsDefinitions.sameSystem(named.get(), found)) {
            throw Problem.input("the file is in " + found.label() + ", the run says crs " + given.get(), file.toString(),
                    "Take crs out, or mend the file with ogr2ogr -a_srs").asException();
        }
        return found;
    }

    private Crs parse(String text) {
        try {
            return text.contains("[") ? parser.fromWkt(text) : parser.fromCode(text);
        } catch (ProblemException e) {
            Problem first = e.problems().get(0);
            throw new Problem(first.kind(), first.what(), first.where().isEmpty() ? file.toString() : first.where(), first.remedy())
                    .asException(e);
        }
    }
}
