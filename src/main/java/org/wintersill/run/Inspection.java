package org.wintersill.run;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.wintersill.grid.Block;
import org.wintersill.problem.Notices;
import org.wintersill.temperature.DailyTemperatureReader;
import org.wintersill.temperature.DailyTemperatureSource;
import org.wintersill.temperature.SourceFile;

/**
 * How an input file is understood.
 *
 * @param file what the file says of itself
 * @param gaps ranges of absent days, at most a dozen
 * @param missingDays number of absent days between the first and the last
 * @param sampleDays number of days in the sample
 * @param lowest lowest value of the sample, degC; NaN if it has none
 * @param mean mean of the sample
 * @param highest highest value of the sample
 * @param missingShare share of the sample's cells without value
 * @param notices assumptions made
 */
public record Inspection(SourceFile file, List<String> gaps, long missingDays, int sampleDays, float lowest, double mean,
                         float highest, double missingShare, List<String> notices) {
    private static final int MOST_GAPS = 12;
    private static final int SAMPLE_DAYS = 5;
    private static final int SAMPLE_CELLS = 1 << 20;

    /** Looks at an opened file and reads a few days of it, spread over the record. */
    public static Inspection of(DailyTemperatureSource source, Notices notices) {
        int days = source.days().size();
        int count = Math.min(days, SAMPLE_DAYS);
        int rows = Math.max(1, Math.min(source.grid().rows(), SAMPLE_CELLS / source.grid().columns()));
        Block block = new Block(0, (source.grid().rows() - rows) / 2, source.grid().columns(), rows);
        float[] values = new float[block.cells()];
        float lowest = Float.NaN;
        float highest = Float.NaN;
        double sum = 0;
        long valid = 0;
        try (DailyTemperatureReader reader = source.open()) {
            for (int i = 0; i < count; i++) {
                reader.read((int) ((long) i * (days - 1) / Math.max(1, count - 1)), 1, block, values, 0, block.cells());
                for (float value : values) {
                    if (value == value) {
                        lowest = lowest <= value ? lowest : value;
                        highest = highest >= value ? highest : value;
                        sum += value;
                        valid++;
                    }
                }
            }
        }
        return new Inspection(source.files().get(0), source.days().gaps(MOST_GAPS), source.days().missingCount(), count, lowest,
                valid == 0 ? Double.NaN : sum / valid, highest, 1 - (double) valid / ((double) count * block.cells()),
                new ArrayList<>(notices.counts().keySet()));
    }

    /** The inspection as an ordered document for JSON. */
    public Map<String, Object> document() {
        Map<String, Object> document = new LinkedHashMap<>();
        document.put("file", file.path());
        document.put("format", file.format());
        document.put("variable", file.variable());
        document.put("unit", file.unit());
        document.put("calendar", file.calendar());
        document.put("first-day", file.firstDate());
        document.put("last-day", file.lastDate());
        document.put("days", file.dayCount());
        document.put("missing-days", missingDays);
        document.put("gaps", gaps);
        document.put("grid", file.grid());
        document.put("storage", file.storage());
        file.details().forEach(document::putIfAbsent);
        Map<String, Object> sample = new LinkedHashMap<>();
        sample.put("days", sampleDays);
        sample.put("lowest-degc", Float.isNaN(lowest) ? null : Double.valueOf(Float.toString(lowest)));
        sample.put("mean-degc", Double.isNaN(mean) ? null : Math.rint(mean * 1000) / 1000);
        sample.put("highest-degc", Float.isNaN(highest) ? null : Double.valueOf(Float.toString(highest)));
        sample.put("missing-share", Math.rint(missingShare * 10000) / 10000);
        document.put("sample", sample);
        document.put("notices", notices);
        return document;
    }
}
