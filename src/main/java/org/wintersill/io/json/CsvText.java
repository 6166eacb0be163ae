package org.wintersill.io.json;

import java.io.IOException;
import java.util.ArrayList;
import java.util.List;
import org.apache.commons.csv.CSVFormat;
import org.apache.commons.csv.CSVPrinter;

/** Builds a CSV text (RFC 4180 quoting, line feeds): UTF-8, comma, decimal point in every locale. */
public final class CsvText {
    static final CSVFormat FORMAT = CSVFormat.RFC4180.builder().setRecordSeparator('\n').get();
    private static final String FORMULA_STARTS = "=+-@\t\r";

    private final StringBuilder text = new StringBuilder();
    private final CSVPrinter printer;

    public CsvText(String... header) {
        try {
            printer = new CSVPrinter(text, FORMAT);
            printer.printRecord((Object[]) header);
        } catch (IOException e) {
            throw new IllegalStateException(e);
        }
    }

    /** Adds a row: texts, whole numbers, doubles and floats; null, NaN and infinities are empty cells. */
    public CsvText row(Object... values) {
        List<Object> cells = new ArrayList<>();
        for (Object value : values) {
            cells.add(cell(value));
        }
        try {
            printer.printRecord(cells);
        } catch (IOException e) {
            throw new IllegalStateException(e);
        }
        return this;
    }

    static Object cell(Object value) {
        if (value == null || value instanceof Double d && !Double.isFinite(d) || value instanceof Float f && !Float.isFinite(f)) {
            return "";
        }
        if (value instanceof CharSequence words && words.length() > 0 && FORMULA_STARTS.indexOf(words.charAt(0)) >= 0) {
            return "'" + words;
        }
        return value;
    }

    @Override
    public String toString() {
        return text.toString();
    }
}
