package org.wintersill.io.table;

import java.io.IOException;
import java.io.InputStream;
import java.nio.ByteBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.CodingErrorAction;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.NoSuchFileException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Set;
import org.apache.commons.csv.CSVFormat;
import org.apache.commons.csv.CSVParser;
import org.apache.commons.csv.CSVRecord;
import org.wintersill.problem.NearestName;
import org.wintersill.problem.Notices;
import org.wintersill.problem.Problem;
import org.wintersill.problem.Problems;
import org.wintersill.time.CfCalendar;
import org.wintersill.time.CfDate;

/** A table whose cells are asked for by column, and whose mistakes are collected with their lines. */
final class CsvTable {
    /** A century of days and more (assumed). */
    private static final int LARGEST_FILE = 64 * 1024 * 1024;
    /** After so many problems of one table the rest are counted only. */
    private static final int MOST_PROBLEMS = 25;
    private static final Set<String> MISSING = Set.of("", "na", "nan", "null");

    private final String file;
    private final Map<String, Integer> columns = new HashMap<>();
    private final List<Row> rows = new ArrayList<>();
    private final Problems problems = new Problems();
    private int untold;

    /** One line of the table. */
    final class Row {
        private final CSVRecord record;
        private final long line;

        private Row(CSVRecord record, long line) {
            this.record = record;
            this.line = line;
        }

        String text(String column) {
            Integer position = columns.get(column);
            return position == null || position >= record.size() ? "" : record.get(position).strip();
        }

        private boolean isMissing(String column) {
            return MISSING.contains(text(column).toLowerCase(Locale.ROOT));
        }

        /** A number in a range; NaN where it is missing, and after a problem. */
        double number(String column, double lowest, double highest, String accepted) {
            if (isMissing(column)) {
                return Double.NaN;
            }
            String text = text(column);
            double value;
            try {
                value = Double.parseDouble(text);
            } catch (NumberFormatException e) {
                problem(column + " '" + shown(text) + "' is not a number", text.contains(",") ? "Write a decimal point" : "Leave it empty "
                        + "where it is missing");
                return Double.NaN;
            }
            if (!(value >= lowest && value <= highest)) {
                problem(column + " " + text + " is not possible; accepted: " + accepted, "");
                return Double.NaN;
            }
            return value;
        }

        /** A day of the standard calendar; null after a problem. */
        CfDate date() {
            String text = text("date");
            if (text.matches("\\d{4}-\\d{2}-\\d{2}")) {
                CfDate date = new CfDate(Integer.parseInt(text.substring(0, 4)), Integer.parseInt(text.substring(5, 7)),
                        Integer.parseInt(text.substring(8)));
                if (CfCalendar.STANDARD.isValid(date)) {
                    return date;
                }
            }
            problem("date '" + shown(text) + "' is not a day; accepted: days such as 2021-01-31", "");
            return null;
        }

        void problem(String what, String remedy) {
            if (problems.all().size() < MOST_PROBLEMS) {
                problems.add(Problem.input(what, file + ":" + line, remedy));
            } else {
                untold++;
            }
        }
    }

    /**
     * Reads a table.
     *
     * @param required columns that must be there
     * @param optional columns that may be there; others are told of and left alone
     * @throws org.wintersill.problem.ProblemException when the file is no such table
     */
    CsvTable(Path path, List<String> required, List<String> optional, Notices notices) {
        file = path.toString();
        String text = text(path);
        try (CSVParser parser = CSVParser.parse(text, CSVFormat.RFC4180.builder().setIgnoreEmptyLines(true).get())) {
            boolean first = true;
            long line = 1;
            for (CSVRecord record : parser) {
                if (first) {
                    header(record, required, optional, notices);
                    first = false;
                } else {
                    rows.add(new Row(record, line));
                }
                line = parser.getCurrentLineNumber() + 1;
            }
        } catch (IOException | java.io.UncheckedIOException | IllegalArgumentException | IllegalStateException e) {
            throw Problem.input("this is not a table of comma-separated values", file, "Check the quotation marks").asException(e);
        }
        problems.throwIfAny();
        if (rows.isEmpty()) {
            throw Problem.input("the table has no rows", file, "It needs a header and a line a day or sample").asException();
        }
    }

    private void header(CSVRecord record, List<String> required, List<String> optional, Notices notices) {
        List<String> known = new ArrayList<>(required);
        known.addAll(optional);
        List<String> others = new ArrayList<>();
        for (int i = 0; i < record.size(); i++) {
            String name = record.get(i).strip().toLowerCase(Locale.ROOT);
            if (!known.contains(name)) {
                others.add(record.get(i).strip());
            } else if (columns.putIfAbsent(name, i) != null) {
                problems.add(Problem.input("the column " + name + " is there twice", file + ":1", "Keep one of the two"));
            }
        }
        for (String name : required) {
            if (!columns.containsKey(name)) {
                String near = NearestName.of(name, others).map(other -> "Is '" + shown(other) + "' meant? ").orElse("");
                boolean semicolons = record.size() == 1 && record.get(0).contains(";");
                problems.add(Problem.input("the column " + name + " is missing", file + ":1", semicolons
                        ? "The table is cut by semicolons; write commas and decimal points" : near + "The header needs "
                        + String.join(", ", required) + " and may have " + String.join(", ", optional)));
            }
        }
        problems.throwIfAny();
        if (!others.isEmpty()) {
            notices.add("columns of " + file + " that are not read: " + String.join(", ", others.stream().map(CsvTable::shown).toList()));
        }
    }

    boolean has(String column) {
        return columns.containsKey(column);
    }

    List<Row> rows() {
        return rows;
    }

    void throwIfAny() {
        if (untold > 0) {
            problems.add(Problem.input(untold + " more problems of the same table are not listed", file, ""));
        }
        problems.throwIfAny();
    }

    private static String shown(String text) {
        return text.length() <= 40 ? text : text.substring(0, 40) + "...";
    }

    private String text(Path path) {
        byte[] bytes;
        try (InputStream in = Files.newInputStream(path)) {
            bytes = in.readNBytes(LARGEST_FILE + 1);
        } catch (NoSuchFileException e) {
            throw Problem.input("there is no such file", file, "").asException(e);
        } catch (IOException e) {
            throw Problem.input(Files.isDirectory(path) ? "this is a folder, not a file" : "the file cannot be read", file,
                    "Name a file of comma-separated values").asException(e);
        }
        if (bytes.length > LARGEST_FILE) {
            throw Problem.input("the file is larger than " + LARGEST_FILE / 1024 / 1024 + " MiB, far more than such a table needs", file,
                    "Check that it is the right file").asException();
        }
        try {
            String text = StandardCharsets.UTF_8.newDecoder().onMalformedInput(CodingErrorAction.REPORT).decode(ByteBuffer.wrap(bytes))
                    .toString();
            return text.startsWith("\ufeff") ? text.substring(1) : text;
        } catch (CharacterCodingException e) {
            throw Problem.input("this is not a text in UTF-8", file, "Save the table as UTF-8 text").asException(e);
        }
    }
}
