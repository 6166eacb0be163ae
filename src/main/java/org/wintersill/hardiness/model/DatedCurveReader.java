package org.wintersill.hardiness.model;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.wintersill.hardiness.HardinessModel;
import org.wintersill.hardiness.ModelParameters;
import org.wintersill.hardiness.model.DatedHardinessCurve.Row;
import org.wintersill.hardiness.model.LethalReading.Distances;
import org.wintersill.time.MonthDay;

/**
 * Reads {@code curve} and {@code outside} of a dated cultivar.
 *
 * <p>A row has {@code date}, {@code lt50}, and {@code lt10} and {@code lt90}, or {@code spread}, the scale of the tolerance curve in K;
 * a {@code spread} of the entry serves the rows that give LT50 alone, and where there is none either, the default of science 1.3
 * with a notice. A symmetric tolerance curve takes LT50 midway between LT10 and LT90.
 */
final class DatedCurveReader {
    private static final double ROUND_OFF = 1e-9;
    private static final int MONTH_STRIDE = 31;
    private static final int YEAR_STRIDE = 12 * MONTH_STRIDE;

    private final ModelParameters entry;
    private final Optional<Double> entrySpread;
    private int moved;
    private boolean bare;

    private DatedCurveReader(ModelParameters entry) {
        this.entry = entry;
        this.entrySpread = entry.number("spread", LethalReading.SPREAD);
    }

    static Optional<HardinessModel> read(ModelParameters entry) {
        return new DatedCurveReader(entry).curve();
    }

    private Optional<HardinessModel> curve() {
        int before = entry.problems();
        boolean hold = entry.word("outside", List.of("hold", "refuse")).orElse("refuse").equals("hold");
        List<ModelParameters> items = entry.requiredRows("curve",
                "List the curve of " + entry.label() + ", for example - {date: 10-10, lt10: -7.5, lt50: -9, lt90: -11}");
        List<Row> rows = new ArrayList<>();
        List<ModelParameters> places = new ArrayList<>();
        for (ModelParameters item : items) {
            row(item).ifPresent(row -> {
                rows.add(row);
                places.add(item);
            });
        }
        if (items.size() == 1 && !hold) {
            entry.problem("curve", "a curve needs at least 2 rows, found 1",
                    "List more dates, or say outside: hold to use the one date all winter");
        }
        checkOrder(rows, places);
        if (entry.problems() > before) {
            return Optional.empty();
        }
        if (bare) {
            entry.notice(LethalReading.defaultSpread(entry.label()));
        }
        if (moved > 0) {
            entry.notice("the tolerance curve of cultivar " + entry.label() + " is symmetric (" + entry.tolerance().key() + "): in "
                    + moved + " of " + rows.size() + " rows lt50 is not midway between lt10 and lt90 and is put there");
        }
        return Optional.of(new DatedHardinessCurve(rows, hold));
    }

    private Optional<Row> row(ModelParameters item) {
        Optional<MonthDay> date = item.date("date");
        if (!item.has("date")) {
            item.problem("", "the key curve.date is missing", "Write for example date: 10-10");
        }
        Optional<Double> lt50 = LethalReading.requiredLethal(item, "lt50");
        boolean warmGiven = item.has("lt10");
        boolean coldGiven = item.has("lt90");
        if (!warmGiven && !coldGiven) {
            Optional<Double> spread = item.number("spread", LethalReading.SPREAD);
            if (spread.isEmpty() && item.has("spread")) {
                return Optional.empty();
            }
            bare |= spread.isEmpty() && entrySpread.isEmpty() && !entry.has("spread");
            double scale = spread.or(() -> entrySpread).orElse(LethalReading.DEFAULT_SPREAD);
            return date.flatMap(day -> lt50.flatMap(middle -> ofSpread(item, day, middle, scale)));
        }
        if (item.has("spread")) {
            item.problem("spread", "spread and lt10 or lt90 are both given", "Keep either spread or both lt10 and lt90");
            return Optional.empty();
        }
        if (!warmGiven || !coldGiven) {
            item.problem("", (warmGiven ? "lt90 is" : "lt10 is") + " missing",
                    "Give both lt10 and lt90 in degC, or spread in K (the scale of the tolerance curve)");
        }
        Optional<Double> lt10 = LethalReading.lethal(item, "lt10");
        Optional<Double> lt90 = LethalReading.lethal(item, "lt90");
        return date.flatMap(day -> lt10.flatMap(warm -> lt50.flatMap(middle -> lt90.flatMap(cold ->
                LethalReading.ordered(item, day.toString(), warm, middle, cold)
                        ? Optional.of(symmetric(new Row(day, warm, middle, cold))) : Optional.empty()))));
    }

    private Optional<Row> ofSpread(ModelParameters item, MonthDay day, double lt50, double spread) {
        Distances distances = Distances.ofSpread(entry.tolerance(), spread);
        if (Math.abs(lt50) + distances.toLt10() > LethalReading.LETHAL.highest()) {
            item.problem("spread", "lt50 " + lt50 + " with spread " + spread + " puts lt10 or lt90 beyond 90 degC", "");
            return Optional.empty();
        }
        return Optional.of(new Row(day, lt50 + distances.toLt10(), lt50, lt50 - distances.toLt90()));
    }

    /** The row with LT50 midway between LT10 and LT90, which a symmetric curve is made from (science 1.3). */
    private Row symmetric(Row row) {
        if (!entry.tolerance().isSymmetric()) {
            return row;
        }
        double middle = (row.lt10() + row.lt90()) / 2;
        moved += Math.abs(middle - row.lt50()) > ROUND_OFF ? 1 : 0;
        return new Row(row.date(), row.lt10(), middle, row.lt90());
    }

    /** Dates ascend around the year: in the order of the list they pass the new year at most once and end before the first date. */
    static void checkOrder(List<Row> rows, List<ModelParameters> places) {
        for (int i = 1; i < rows.size(); i++) {
            MonthDay date = rows.get(i).date();
            for (int j = 0; j < i; j++) {
                if (rows.get(j).date().equals(date)) {
                    places.get(i).problem("", "the date " + date + " is given twice, here and at " + places.get(j).place(),
                            "Keep one of the two rows");
                    return;
                }
            }
            if (sinceFirst(rows, i) < sinceFirst(rows, i - 1)) {
                places.get(i).problem("", "the date " + date + " does not follow " + rows.get(i - 1).date()
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
}
