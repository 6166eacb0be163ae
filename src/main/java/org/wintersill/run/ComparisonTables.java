package org.wintersill.run;

import java.math.BigDecimal;
import java.math.RoundingMode;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.wintersill.comparison.RangeChange;
import org.wintersill.comparison.RangeTotals;
import org.wintersill.grid.CoordinateOperations;
import org.wintersill.io.crs.GeodesicLine;
import org.wintersill.io.json.CsvText;
import org.wintersill.io.json.JsonText;

/** {@code changes.csv} and {@code changes.json}: area by class, shift of the range, mean changes, by cultivar and member. */
final class ComparisonTables {
    private static final double[] HEIGHT_SHARES = {0.1, 0.5, 0.9};

    /**
     * One cultivar in one of the others.
     *
     * @param ranges of the base and of the other
     * @param classAreas km2 by class, then all
     * @param sums of the changes of margin, damage, frequency and required hardiness, weighted by area
     */
    record Row(ComparisonRun.Other other, String cultivar, RangeTotals[] ranges, double[] classAreas, double[] sums) {
    }

    private final ComparisonRun run;
    private final List<Row> rows;
    private final CoordinateOperations operations;

    ComparisonTables(ComparisonRun run, List<Row> rows, CoordinateOperations operations) {
        this.run = run;
        this.rows = rows;
        this.operations = operations;
    }

    Map<String, Object> document() {
        Map<String, Object> document = new LinkedHashMap<>();
        document.put("version", 1);
        document.put("target", run.target());
        document.put("changes", rows.stream().map(this::entry).toList());
        document.put("caution", Caution.SHORT);
        return document;
    }

    private Map<String, Object> entry(Row row) {
        Map<String, Object> entry = new LinkedHashMap<>();
        entry.put("run", row.other().name());
        entry.put("cultivar", row.cultivar());
        entry.put("curve-status", run.base().cultivar(row.cultivar()).get("status").text().orElse(""));
        for (RangeChange change : RangeChange.values()) {
            entry.put(change.key() + "-km2", row.classAreas()[change.ordinal()]);
        }
        double all = row.classAreas()[RangeChange.values().length];
        String[] names = {"margin-change-mean", "damage-change-mean", "killing-frequency-change-mean", "tolerance-shift-mean"};
        for (int i = 0; i < names.length; i++) {
            entry.put(names[i], JsonText.number(row.sums()[i] / all));
        }
        double[] before = centroid(row.ranges()[0]);
        double[] after = centroid(row.ranges()[1]);
        entry.put("centroid-base", place(before));
        entry.put("centroid-other", place(after));
        boolean both = !Double.isNaN(before[0]) && !Double.isNaN(after[0]);
        GeodesicLine line = both ? GeodesicLine.between(before[0], before[1], after[0], after[1]) : null;
        entry.put("shift-km", both ? Double.valueOf(line.km()) : null);
        entry.put("shift-bearing", both && line.km() > 0 ? Double.valueOf(line.bearing()) : null);
        for (double share : HEIGHT_SHARES) {
            String key = "elevation-" + Math.round(100 * share);
            entry.put(key + "-base", JsonText.number(row.ranges()[0].height(share)));
            entry.put(key + "-other", JsonText.number(row.ranges()[1].height(share)));
        }
        return entry;
    }

    /** Longitude and latitude in WGS 84; NaN for an empty range. */
    private double[] centroid(RangeTotals range) {
        double[] place = range.centroid();
        if (!Double.isNaN(place[0])) {
            operations.between(run.base().grid().crs(), operations.wgs84()).transform(place, 1);
        }
        return place;
    }

    private static List<Double> place(double[] lonLat) {
        return Double.isNaN(lonLat[0]) ? null : List.of(rounded(lonLat[0], 5), rounded(lonLat[1], 5));
    }

    private static double rounded(double value, int places) {
        return BigDecimal.valueOf(value).setScale(places, RoundingMode.HALF_EVEN).doubleValue();
    }

    String csv() {
        List<String> header = new ArrayList<>();
        List<List<Object>> lines = new ArrayList<>();
        for (Row row : rows) {
            Map<String, Object> entry = entry(row);
            List<Object> line = new ArrayList<>();
            entry.forEach((key, value) -> {
                if (key.startsWith("centroid-")) {
                    List<?> place = (List<?>) value;
                    line.add(place == null ? "" : place.get(0));
                    line.add(place == null ? "" : place.get(1));
                } else {
                    int places = key.endsWith("-km2") || key.endsWith("-km") ? 3 : key.startsWith("elevation") || key.endsWith("bearing") ? 1 : 6;
                    line.add(value instanceof Double number ? BigDecimal.valueOf(number).setScale(places, RoundingMode.HALF_EVEN)
                            : value == null ? "" : value);
                }
                if (lines.isEmpty()) {
                    String column = key.replace('-', '_');
                    header.addAll(key.startsWith("centroid-") ? List.of(column + "_lon", column + "_lat") : List.of(column));
                }
            });
            line.add(Caution.SHORT);
            lines.add(line);
        }
        header.add("caution");
        CsvText csv = new CsvText(header.toArray(String[]::new));
        lines.forEach(line -> csv.row(line.toArray()));
        return csv.toString();
    }
}
