package org.wintersill.io.cultivar;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.wintersill.damage.ToleranceCurve;
import org.wintersill.hardiness.HardinessModel;
import org.wintersill.hardiness.model.DatedHardinessCurve;
import org.wintersill.hardiness.model.DatedHardinessCurve.Row;
import org.wintersill.io.yaml.YamlChecks;
import org.wintersill.io.yaml.YamlSection;
import org.wintersill.io.yaml.YamlValue;
import org.wintersill.problem.Notices;
import org.wintersill.time.MonthDay;

/**
 * Reads {@code curve} and {@code outside} of a dated cultivar.
 *
 * <p>A row has {@code date}, {@code lt50} and either {@code lt10} and {@code lt90} or {@code spread}, the scale (K) of the
 * tolerance curve: LT10 and LT90 = LT50 +- s ln 9 for a logistic, +- 1.2815516 sigma for a probit. A symmetric curve takes LT50
 * midway between LT10 and LT90. Refused are |LT| above 90, LTs out of order and s below 0.05 on either
 * side (science section 1.3).
 */
final class DatedCurveReader {
    private static final double FARTHEST = 90;
    private static final String LT_ACCEPTED = "degC from -90 to 90";
    private static final double LEAST_SPREAD = ToleranceCurve.NARROWEST_SPREAD;
    private static final double LARGEST_SPREAD = 30;
    /** degC; no organ of a woody perennial in winter dies above it, so such values are probably Fahrenheit (assumed). */
    private static final double IMPLAUSIBLY_WARM = 4;
    private static final double ROUND_OFF = 1e-9;
    private static final int MONTH_STRIDE = 31;
    private static final int YEAR_STRIDE = 12 * MONTH_STRIDE;
    private static final MonthDay NO_DAY = new MonthDay(2, 30);

    private final YamlSection entry;
    private final YamlChecks checks;
    private final String label;
    private final ToleranceCurve tolerance;
    private final Notices notices;
    private int moved;

    /**
     * @param label name of the cultivar in notices
     * @param tolerance form of the curve, for what a spread means and for LT50 of a symmetric one
     */
    DatedCurveReader(YamlSection entry, String label, ToleranceCurve tolerance, Notices notices) {
        this.entry = entry;
        this.checks = entry.checks();
        this.label = label;
        this.tolerance = tolerance;
        this.notices = notices;
    }

    Optional<HardinessModel> read() {
        int before = checks.problems().all().size();
        boolean hold = entry.word("outside", List.of("hold", "refuse"), List.of()).orElse("refuse").equals("hold");
        Optional<YamlValue> curve = entry.required("curve",
                "List the curve of " + label + ", for example - {date: 10-10, lt10: -7.5, lt50: -9, lt90: -11}");
        List<Row> rows = new ArrayList<>();
        List<YamlValue> items = curve.filter(value -> value instanceof YamlValue.Sequence || notAList(value))
                .map(value -> ((YamlValue.Sequence) value).items()).orElse(List.of());
        List<String> rowPlaces = new ArrayList<>();
        for (YamlValue item : items) {
            row(YamlSection.of(item, "curve", checks)).ifPresent(row -> {
                rows.add(row);
                rowPlaces.add(item.place());
            });
        }
        if (curve.isPresent() && curve.get() instanceof YamlValue.Sequence && items.size() < 2) {
            entry.problem("curve", "a curve needs at least 2 rows, found " + items.size(), "List more dates");
        }
        checkOrder(rows, rowPlaces);
        if (checks.problems().all().size() > before) {
            return Optional.empty();
        }
        tellIfFahrenheit(rows);
        if (moved > 0) {
            notices.add("the tolerance curve of cultivar " + label + " is symmetric (" + tolerance.key() + "): in " + moved + " of "
                    + rows.size() + " rows lt50 is not midway between lt10 and lt90 and is put there");
        }
        return Optional.of(new DatedHardinessCurve(rows, hold));
    }

    /** Adds the problem; always false. */
    private boolean notAList(YamlValue value) {
        checks.problem(value, "curve", "a list of rows is needed, found " + YamlChecks.found(value),
                "Begin each row with '- {date:'");
        return false;
    }

    private Optional<Row> row(YamlSection section) {
        Optional<MonthDay> date = section.required("date", "Write for example date: 10-10")
                .flatMap(value -> date(value, section));
        Optional<Double> lt50 = section.required("lt50", "Give the temperature that kills half of the organs, in degC")
                .flatMap(value -> checks.number(value, section.path("lt50"), -FARTHEST, FARTHEST, LT_ACCEPTED));
        Optional<YamlValue> spreadGiven = section.value("spread");
        Optional<YamlValue> lt10Given = section.value("lt10");
        Optional<YamlValue> lt90Given = section.value("lt90");
        section.finish();
        if (spreadGiven.isPresent()) {
            if (lt10Given.isPresent() || lt90Given.isPresent()) {
                section.problem("spread", "spread and lt10 or lt90 are both given", "Keep either spread or both lt10 and lt90");
                return Optional.empty();
            }
            Optional<Double> spread = checks.number(spreadGiven.get(), section.path("spread"), LEAST_SPREAD, LARGEST_SPREAD,
                    "K from 0.05 to 30, the scale of the tolerance curve");
            return date.flatMap(day -> lt50.flatMap(middle -> spread.flatMap(s -> ofSpread(section, day, middle, s))));
        }
        Optional<Double> lt10 = lt10Given.flatMap(value ->
                checks.number(value, section.path("lt10"), -FARTHEST, FARTHEST, LT_ACCEPTED));
        Optional<Double> lt90 = lt90Given.flatMap(value ->
                checks.number(value, section.path("lt90"), -FARTHEST, FARTHEST, LT_ACCEPTED));
        if (lt10Given.isEmpty() || lt90Given.isEmpty()) {
            String missing = lt10Given.isEmpty() ? lt90Given.isEmpty() ? "lt10 and lt90 are" : "lt10 is" : "lt90 is";
            checks.problem(section.place(), "curve", missing + " missing",
                    "Give lt10 and lt90 in degC, or spread in K (the scale of the tolerance curve)");
            return Optional.empty();
        }
        return date.flatMap(day -> lt10.flatMap(warm -> lt50.flatMap(middle -> lt90.flatMap(cold ->
                ordered(section, new Row(day, warm, middle, cold))))));
    }

    private Optional<MonthDay> date(YamlValue value, YamlSection section) {
        return checks.monthDay(value, section.path("date")).filter(day -> {
            if (day.equals(NO_DAY)) {
                checks.problem(value, section.path("date"), "there is no 30 February", "Write 02-28 or 02-29");
                return false;
            }
            return true;
        });
    }

    private Optional<Row> ofSpread(YamlSection section, MonthDay day, double lt50, double spread) {
        double half = spread * tolerance.spreadsToTenth();
        if (Math.abs(lt50) + half > FARTHEST) {
            section.problem("spread", "lt50 " + lt50 + " with spread " + spread + " puts lt10 or lt90 beyond 90 degC", "");
            return Optional.empty();
        }
        return Optional.of(new Row(day, lt50 + half, lt50, lt50 - half));
    }

    private Optional<Row> ordered(YamlSection section, Row row) {
        String found = "lt10 " + row.lt10() + ", lt50 " + row.lt50() + ", lt90 " + row.lt90();
        if (!(row.lt10() > row.lt50() && row.lt50() > row.lt90())) {
            boolean turned = row.lt10() < row.lt50() && row.lt50() < row.lt90();
            checks.problem(section.place(), "curve", "the lethal temperatures of " + row.date() + " are out of order: " + found,
                    turned ? "Exchange lt10 and lt90: it takes less cold to kill 10 percent than 90"
                            : "lt10 must be warmer than lt50, and lt50 warmer than lt90");
            return Optional.empty();
        }
        if ((row.lt10() - row.lt50()) / ToleranceCurve.LN_9 < LEAST_SPREAD
                || (row.lt50() - row.lt90()) / ToleranceCurve.LN_9 < LEAST_SPREAD) {
            checks.problem(section.place(), "curve", "the lethal temperatures of " + row.date() + " are too close together: " + found,
                    "They must be at least 0.11 K apart, a spread of 0.05 K");
            return Optional.empty();
        }
        return Optional.of(tolerance.isSymmetric() ? symmetric(row) : row);
    }

    /** The row with LT50 midway between LT10 and LT90, which a symmetric curve is made from (science 1.3). */
    private Row symmetric(Row row) {
        double middle = (row.lt10() + row.lt90()) / 2;
        moved += Math.abs(middle - row.lt50()) > ROUND_OFF ? 1 : 0;
        return new Row(row.date(), row.lt10(), middle, row.lt90());
    }

    /** Dates ascend around the year: in the order of the list they pass the new year at most once and end before the first date. */
    private void checkOrder(List<Row> rows, List<String> rowPlaces) {
        for (int i = 1; i < rows.size(); i++) {
            MonthDay date = rows.get(i).date();
            for (int j = 0; j < i; j++) {
                if (rows.get(j).date().equals(date)) {
                    checks.problem(rowPlaces.get(i), "curve", "the date " + date + " is given twice, here and at " + rowPlaces.get(j),
                            "Keep one of the two rows");
                    return;
                }
            }
            if (sinceFirst(rows, i) < sinceFirst(rows, i - 1)) {
                checks.problem(rowPlaces.get(i), "curve", "the date " + date + " does not follow " + rows.get(i - 1).date()
                        + " in a list that begins on " + rows.get(0).date(), "List the dates in the order of the winter, from autumn "
                        + "over the new year to spring");
                return;
            }
        }
    }

    private static int sinceFirst(List<Row> rows, int index) {
        return Math.floorMod(ordinal(rows.get(index).date()) - ordinal(rows.get(0).date()), YEAR_STRIDE);
    }

    private static int ordinal(MonthDay date) {
        return date.month() * MONTH_STRIDE + date.day();
    }

    private void tellIfFahrenheit(List<Row> rows) {
        double hardiest = rows.stream().mapToDouble(Row::lt50).min().orElseThrow();
        double tenderest = rows.stream().mapToDouble(Row::lt50).max().orElseThrow();
        if (hardiest > 0 || tenderest > IMPLAUSIBLY_WARM) {
            notices.add("the lethal temperatures of cultivar " + label + " look like Fahrenheit (lt50 from " + tenderest + " to "
                    + hardiest + "); they are read as degC. If they are Fahrenheit, convert them: degC = (degF - 32) / 1.8");
        }
    }
}
