package org.wintersill.io.table;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.wintersill.hardiness.MeasuredTolerance;
import org.wintersill.problem.Notices;
import org.wintersill.time.CfDate;

/**
 * Reads measured lethal temperatures: {@code cultivar}, {@code date}, {@code lt50}, and where they are known {@code lt10},
 * {@code lt90} and {@code n}, the number of organs in the sample.
 */
public final class FieldFile {
    private static final double COLDEST = -90;
    /** degC; no organ of a woody perennial is killed by cold above it, so such values are Fahrenheit or lack a sign (assumed). */
    private static final double TOO_WARM = 4;
    private static final String ACCEPTED = "degC from -90 to 4; Fahrenheit is converted by (degF - 32) / 1.8";

    private FieldFile() {
    }

    /**
     * The samples in the order of the table.
     *
     * @throws org.wintersill.problem.ProblemException with all problems of the table
     */
    public static List<MeasuredTolerance> read(Path file, Notices notices) {
        CsvTable table = new CsvTable(file, List.of("cultivar", "date", "lt50"), List.of("lt10", "lt90", "n"), notices);
        List<MeasuredTolerance> samples = new ArrayList<>();
        boolean anyCount = table.rows().stream().anyMatch(row -> !row.text("n").isEmpty());
        for (CsvTable.Row row : table.rows()) {
            String cultivar = row.text("cultivar");
            if (cultivar.isEmpty()) {
                row.problem("the cultivar is missing", "Write its name");
            }
            CfDate date = row.date();
            double lt10 = row.number("lt10", COLDEST, TOO_WARM, ACCEPTED);
            double lt50 = row.number("lt50", COLDEST, TOO_WARM, ACCEPTED);
            double lt90 = row.number("lt90", COLDEST, TOO_WARM, ACCEPTED);
            double count = row.number("n", 1, 1e6, "a whole number of organs from 1");
            if (Double.isNaN(lt50) && row.text("lt50").isEmpty()) {
                row.problem("lt50 is missing", "Leave the row out if it was not measured");
            }
            if (lt10 <= lt50 || lt50 <= lt90) {
                row.problem("the lethal temperatures are out of order: lt10 " + lt10 + ", lt50 " + lt50 + ", lt90 " + lt90,
                        "lt10 must be warmer than lt50, and lt50 warmer than lt90");
            }
            if (anyCount && Double.isNaN(count) && row.text("n").isEmpty()) {
                row.problem("n is missing here and given elsewhere", "Give it in every row, or in none");
            }
            samples.add(new MeasuredTolerance(cultivar, date, lt10, lt50, lt90, count));
        }
        table.throwIfAny();
        return List.copyOf(samples);
    }
}
