package org.wintersill.estimation;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import org.wintersill.hardiness.HardinessModel;
import org.wintersill.hardiness.MeasuredTolerance;
import org.wintersill.hardiness.model.DatedHardinessCurve;
import org.wintersill.time.CfDate;
import org.wintersill.time.MonthDay;
import org.wintersill.time.Season;

/**
 * Rows of a dated curve: LT50 at some days of the year, linear in between, one curve for all winters. The rows stand at evenly spaced
 * quantiles of the sampling days, half as many as there are days and at most eight, the first and the last day included (project
 * choice).
 */
final class DatedFit implements FitModel {
    private static final int MOST_ROWS = 8;
    private static final double HARDIEST = -80;
    private static final double TENDEREST = 4;

    private final List<MonthDay> dates = new ArrayList<>();
    private final List<Setting> settings = new ArrayList<>();

    /** @param winters the winter of each sample */
    DatedFit(List<MeasuredTolerance> samples, List<Season> winters) {
        TreeMap<Integer, MonthDay> days = new TreeMap<>();
        TreeMap<Integer, List<Double>> values = new TreeMap<>();
        for (int i = 0; i < samples.size(); i++) {
            CfDate date = samples.get(i).date();
            int position = winters.get(i).position(date);
            days.putIfAbsent(position, new MonthDay(date.month(), date.day()));
            values.computeIfAbsent(position, key -> new ArrayList<>()).add(samples.get(i).lt50());
        }
        List<Integer> positions = List.copyOf(days.keySet());
        int rows = Math.max(2, Math.min(Math.min(MOST_ROWS, samples.size() - 2), positions.size() / 2 + 1));
        for (int row = 0; row < rows && positions.size() > 1; row++) {
            int position = positions.get((int) Math.round((double) row * (positions.size() - 1) / (rows - 1)));
            if (!dates.contains(days.get(position))) {
                dates.add(days.get(position));
                settings.add(new Setting(new Parameter("lt50 on " + days.get(position), "degC", HARDIEST, TENDEREST),
                        values.get(position).stream().mapToDouble(Double::doubleValue).average().orElseThrow(), Role.ESTIMATED));
            }
        }
    }

    @Override
    public String word() {
        return "dated";
    }

    @Override
    public List<Setting> settings() {
        return settings;
    }

    @Override
    public boolean needsSeries() {
        return false;
    }

    @Override
    public HardinessModel model(double[] values, double toLt10, double toLt90) {
        List<DatedHardinessCurve.Row> rows = new ArrayList<>();
        for (int i = 0; i < values.length; i++) {
            rows.add(new DatedHardinessCurve.Row(dates.get(i), values[i] + toLt10, values[i], values[i] - toLt90));
        }
        return new DatedHardinessCurve(rows, true);
    }

    @Override
    public Map<String, Object> entry(double[] values, double toLt10, double toLt90) {
        List<Map<String, Object>> rows = new ArrayList<>();
        for (int i = 0; i < values.length; i++) {
            Map<String, Object> row = new LinkedHashMap<>();
            row.put("date", dates.get(i).toString());
            row.put("lt10", FitModel.rounded(values[i] + toLt10));
            row.put("lt50", FitModel.rounded(values[i]));
            row.put("lt90", FitModel.rounded(values[i] - toLt90));
            rows.add(row);
        }
        Map<String, Object> entry = new LinkedHashMap<>();
        entry.put("outside", "hold");
        entry.put("curve", rows);
        return entry;
    }
}
