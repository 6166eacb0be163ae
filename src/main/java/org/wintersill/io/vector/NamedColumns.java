package org.wintersill.io.vector;

import java.math.BigDecimal;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.wintersill.parcel.PolygonRequest;
import org.wintersill.problem.NearestName;
import org.wintersill.problem.Problem;

/**
 * Which columns identify and name the rows: those that were asked for, else the usual ones where the file has them.
 *
 * @param id column of the file; empty for the rows' numbers
 * @param name column of the file; empty for none
 */
record NamedColumns(Optional<String> id, Optional<String> name) {
    private static final List<String> USUAL_IDS = List.of("parcel_id", "id");
    private static final List<String> USUAL_NAMES = List.of("name");
    private static final int LONGEST_TEXT = 1000;

    /** @throws org.wintersill.problem.ProblemException when a column that was asked for is not there */
    static NamedColumns of(Path file, List<String> columns, PolygonRequest request) {
        return new NamedColumns(find(file, columns, request.id(), USUAL_IDS, "id"), find(file, columns, request.name(), USUAL_NAMES, "name"));
    }

    private static Optional<String> find(Path file, List<String> columns, Optional<String> asked, List<String> usual, String purpose) {
        if (asked.isPresent()) {
            return Optional.of(columns.stream().filter(asked.get()::equals).findFirst()
                    .or(() -> columns.stream().filter(asked.get()::equalsIgnoreCase).findFirst())
                    .orElseThrow(() -> Problem.usage("there is no column '" + asked.get() + "' for the " + purpose + " of a polygon; "
                                    + (columns.isEmpty() ? "the file has none" : "columns are " + String.join(", ", columns)), file.toString(),
                            NearestName.of(asked.get(), columns).map(near -> "Did you mean " + near + "?").orElse("")).asException()));
        }
        return usual.stream().flatMap(word -> columns.stream().filter(word::equalsIgnoreCase)).findFirst();
    }

    /** A value as text on one line; a number without needless decimals; empty for none. */
    static String text(Object value) {
        if (value == null) {
            return "";
        }
        String text = value instanceof Double number && Double.isFinite(number)
                ? new BigDecimal(number.toString()).stripTrailingZeros().toPlainString() : value.toString();
        String line = text.replaceAll("[\\p{Cntrl}\\u2028\\u2029]+", " ").strip();
        return line.length() <= LONGEST_TEXT ? line : line.substring(0, LONGEST_TEXT);
    }
}
