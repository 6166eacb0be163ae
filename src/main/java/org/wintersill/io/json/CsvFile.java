package org.wintersill.io.json;

import java.io.BufferedWriter;
import java.io.IOException;
import java.math.BigDecimal;
import java.nio.file.Files;
import java.nio.file.Path;
import org.apache.commons.csv.CSVPrinter;
import org.wintersill.problem.Problem;

/** Writes a table of any length row by row, in the form of {@link CsvText}. */
public final class CsvFile implements AutoCloseable {
    private final Path file;
    private final CSVPrinter printer;

    public CsvFile(Path file, String... header) {
        this.file = file;
        try {
            BufferedWriter out = Files.newBufferedWriter(file);
            printer = new CSVPrinter(out, CsvText.FORMAT);
            printer.printRecord((Object[]) header);
        } catch (IOException e) {
            throw problem(e);
        }
    }

    /** Adds a row; see {@link CsvText#row}. */
    public void row(Object... values) {
        try {
            for (Object value : values) {
                printer.print(value instanceof Double number && Double.isFinite(number) ? plain(number) : CsvText.cell(value));
            }
            printer.println();
        } catch (IOException e) {
            throw problem(e);
        }
    }

    /** A number without exponent, which spreadsheets would show as they like. */
    private static String plain(double value) {
        return value == 0 ? "0" : BigDecimal.valueOf(value).stripTrailingZeros().toPlainString();
    }

    @Override
    public void close() {
        try {
            printer.close(true);
        } catch (IOException e) {
            throw problem(e);
        }
    }

    private RuntimeException problem(IOException e) {
        return Problem.output("the file cannot be written: " + e.getMessage(), file.toString(),
                "Check the permissions of the folder and the free space of the disk").asException(e);
    }
}
