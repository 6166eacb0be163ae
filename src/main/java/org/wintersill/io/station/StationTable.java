package org.wintersill.io.station;

import java.io.IOException;
import java.io.Reader;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import org.apache.commons.csv.CSVFormat;
import org.apache.commons.csv.CSVParser;
import org.apache.commons.csv.CSVRecord;
import org.wintersill.problem.Problem;
import org.wintersill.problem.Problems;

/**
 * A table of station minima with a header that names, in any order, {@code id}, {@code x} and {@code y} (or {@code lon} and {@code lat}),
 * {@code elevation}, {@code date} and {@code tmin}; further columns are left alone.
 *
 * @param readings in the order of the file
 * @param lonLat whether places are WGS 84 longitude and latitude
 */
public record StationTable(List<Reading> readings, boolean lonLat) {
    private static final int MOST_PROBLEMS = 20;
    private static final double COLDEST = -90;
    private static final double WARMEST = 60;

    /**
     * One line.
     *
     * @param elevation m, NaN if not given
     * @param date {@code YYYY-MM-DD}
     * @param tmin degC, NaN if not given
     */
    public record Reading(String id, double x, double y, double elevation, String date, double tmin) {
    }

    /**
     * Reads the file.
     *
     * @throws org.wintersill.problem.ProblemException with the first lines that cannot be understood
     */
    public static StationTable read(Path file) {
        CSVFormat format = CSVFormat.RFC4180.builder().setHeader().setSkipHeaderRecord(true).setIgnoreHeaderCase(true).setTrim(true)
                .setIgnoreEmptyLines(true).get();
        try (Reader in = Files.newBufferedReader(file, StandardCharsets.UTF_8); CSVParser parser = format.parse(in)) {
            Set<String> names = new TreeSet<>();
            parser.getHeaderNames().forEach(name -> names.add(name.toLowerCase(Locale.ROOT)));
            boolean lonLat = !names.contains("x") && names.contains("lon") && names.contains("lat");
            List<String> needed = lonLat ? List.of("id", "lon", "lat", "elevation", "date", "tmin")
                    : List.of("id", "x", "y", "elevation", "date", "tmin");
            List<String> absent = needed.stream().filter(name -> !names.contains(name)).toList();
            if (!absent.isEmpty()) {
                throw Problem.input("the table has no column " + String.join(", ", absent) + "; found " + String.join(", ", parser.getHeaderNames()),
                        file + ":1", "Name the columns id, x, y (or lon, lat), elevation, date, tmin in the first line").asException();
            }
            Problems problems = new Problems();
            List<Reading> readings = new ArrayList<>();
            for (CSVRecord record : parser) {
                reading(record, needed, file + ":" + (parser.getCurrentLineNumber()), problems).ifPresent(readings::add);
                if (problems.all().size() >= MOST_PROBLEMS) {
                    break;
                }
            }
            problems.throwIfAny();
            return new StationTable(readings, lonLat);
        } catch (java.nio.file.NoSuchFileException e) {
            throw Problem.input("there is no such file", file.toString(), "Check the path").asException(e);
        } catch (IOException | java.io.UncheckedIOException | IllegalArgumentException e) {
            throw Problem.input("the table cannot be read: " + e.getMessage(), file.toString(), "Give a table of comma-separated values in UTF-8")
                    .asException(e);
        }
    }

    private static Optional<Reading> reading(CSVRecord record, List<String> names, String place, Problems problems) {
        if (!record.isConsistent()) {
            problems.add(Problem.input("the line has " + record.size() + " values, the header names " + record.getParser().getHeaderNames().size(),
                    place, "Give one value a column, and quote texts that hold commas"));
            return Optional.empty();
        }
        int before = problems.all().size();
        double x = number(record, names.get(1), place, problems, false);
        double y = number(record, names.get(2), place, problems, false);
        double elevation = number(record, "elevation", place, problems, true);
        double tmin = number(record, "tmin", place, problems, true);
        String date = record.get("date");
        if (!date.matches("\\d{4}-\\d{2}-\\d{2}")) {
            problems.add(Problem.input("'" + date + "' is not a date", place + ", date", "Write dates as 2010-01-14"));
        }
        if (tmin < COLDEST || tmin > WARMEST) {
            problems.add(Problem.input(record.get("tmin") + " is no air temperature in degC", place + ", tmin", "Give degrees Celsius, and leave the "
                    + "cell empty where there is no reading"));
        }
        return problems.all().size() > before ? Optional.empty() : Optional.of(new Reading(record.get("id"), x, y, elevation, date, tmin));
    }

    private static double number(CSVRecord record, String name, String place, Problems problems, boolean mayBeEmpty) {
        String text = record.get(name);
        if (mayBeEmpty && (text.isEmpty() || text.equalsIgnoreCase("NA") || text.equalsIgnoreCase("NaN"))) {
            return Double.NaN;
        }
        if (!text.matches("[-+]?([0-9]+(\\.[0-9]*)?|\\.[0-9]+)([eE][-+]?[0-9]{1,3})?")) {
            problems.add(Problem.input("'" + text + "' is not a number", place + ", " + name, "Write numbers with a decimal point"));
            return Double.NaN;
        }
        return Double.parseDouble(text);
    }
}
