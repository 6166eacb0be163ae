package org.wintersill.hardiness.model;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import org.wintersill.hardiness.HardinessModel;
import org.wintersill.hardiness.ModelParameters;
import org.wintersill.hardiness.Quantity;
import org.wintersill.hardiness.model.DatedHardinessCurve.Row;
import org.wintersill.hardiness.model.LethalReading.Distances;
import org.wintersill.problem.NearestName;
import org.wintersill.time.MonthDay;

/**
 * Reads bud stages: {@code stages} with {@code stage}, {@code lt10}, {@code lt90}, {@code lt50} where it is known, and when each stage
 * comes: {@code date} or {@code at} (degree-days) in the row, or under {@code dates} or {@code degree-days.at} by name. A stage without a
 * time is left out.
 *
 * <p>Science 1.5: a stage without LT50 has it midway between LT10 and LT90; one without LT90 takes the spread of the next stage that has
 * one. Where no later stage has it, that of the one before is taken (project choice).
 */
final class StageReader {
    static final String WORD = "stage";
    private static final Quantity BASE = Quantity.of("degC", -10, 20);
    private static final Quantity AT = Quantity.of("degree-days", 0, 10_000);

    private final ModelParameters entry;
    private final boolean afterBudbreak;
    private final List<ModelParameters> rows;
    private final List<String> names = new ArrayList<>();

    private StageReader(ModelParameters entry, boolean afterBudbreak) {
        this.entry = entry;
        this.afterBudbreak = afterBudbreak;
        rows = entry.requiredRows("stages", "List the stages of " + entry.label()
                + ", for example - {stage: full bloom, date: 04-12, lt10: -2.8, lt90: -4.4}");
    }

    /** A cultivar of bud stages alone. */
    static Optional<HardinessModel> read(ModelParameters entry) {
        return new StageReader(entry, false).model();
    }

    /** The stages that follow budbreak of another model: dates, or degree-days that are counted from budbreak on. */
    static Optional<HardinessModel> afterBudbreak(ModelParameters part) {
        return new StageReader(part, true).model();
    }

    private Optional<HardinessModel> model() {
        int before = entry.problems();
        boolean hold = afterBudbreak || entry.word("before-first", List.of("none", "hold")).orElse("none").equals("hold");
        List<Stage> stages = stages();
        Optional<ModelParameters> dates = entry.section("dates");
        Optional<ModelParameters> growth = entry.section("degree-days");
        List<Optional<MonthDay>> days = new ArrayList<>();
        List<Optional<Double>> sums = new ArrayList<>();
        Optional<ModelParameters> at = growth.flatMap(part -> part.section("at"));
        for (int i = 0; i < names.size(); i++) {
            String name = names.get(i);
            days.add(rows.get(i).date("date").or(() -> dates.flatMap(part -> part.date(name))));
            sums.add(rows.get(i).number("at", AT).or(() -> at.flatMap(part -> part.number(name, AT))));
        }
        dates.ifPresent(this::checkNames);
        at.ifPresent(this::checkNames);
        boolean dated = days.stream().anyMatch(Optional::isPresent);
        boolean timed = sums.stream().anyMatch(Optional::isPresent);
        if (entry.problems() == before && dated == timed) {
            entry.problem(dated ? "stages" : "", dated ? "some stages have dates, others degree-days"
                    : "no stage of " + entry.label() + " has a date or degree-days", "Give dates: {full bloom: 04-12, ...}, or degree-days: {base: 5, "
                    + (afterBudbreak ? "" : "from: 01-01, ") + "at: {full bloom: 250, ...}}");
        }
        if (entry.problems() > before) {
            return Optional.empty();
        }
        return dated ? dated(stages, days, hold) : timed(stages, sums, growth, hold);
    }

    private void checkNames(ModelParameters part) {
        for (String name : part.names()) {
            if (!names.contains(name) && !name.equals("base") && !name.equals("from")) {
                part.problem(name, "there is no stage " + name, NearestName.of(name, names).map(near -> "Did you mean " + near + "?")
                        .orElse("The stages are " + String.join(", ", names)));
            }
        }
    }

    private Optional<HardinessModel> dated(List<Stage> stages, List<Optional<MonthDay>> days, boolean hold) {
        List<Row> curve = new ArrayList<>();
        List<ModelParameters> places = new ArrayList<>();
        for (int i = 0; i < stages.size(); i++) {
            Stage stage = stages.get(i);
            int row = i;
            days.get(i).ifPresent(day -> {
                curve.add(new Row(day, stage.lt10(), stage.lt50(), stage.lt90()));
                places.add(rows.get(row));
            });
        }
        int before = entry.problems();
        DatedCurveReader.checkOrder(curve, places);
        if (entry.problems() > before) {
            return Optional.empty();
        }
        if (!hold) {
            entry.notice("cultivar " + entry.label() + " is judged from " + curve.get(0).date() + " on, its first bud stage: winter cold "
                    + "before it does it no harm in this run");
        }
        return Optional.of(new StageDates(new DatedHardinessCurve(curve, false), hold));
    }

    private Optional<HardinessModel> timed(List<Stage> stages, List<Optional<Double>> sums, Optional<ModelParameters> growth, boolean hold) {
        int before = entry.problems();
        Optional<ModelParameters> part = growth.or(() -> entry.requiredSection("degree-days", "Write degree-days: {base: 5"
                + (afterBudbreak ? "}" : ", from: 01-01}")));
        Optional<Double> base = part.flatMap(section -> section.required("base", BASE));
        Optional<MonthDay> from = part.flatMap(section -> section.date("from"));
        if (afterBudbreak && from.isPresent()) {
            part.get().problem("from", "degree-days after budbreak are counted from budbreak on", "Remove from");
        }
        List<Stage> placed = new ArrayList<>();
        List<Double> at = new ArrayList<>();
        for (int i = 0; i < stages.size(); i++) {
            if (sums.get(i).isEmpty()) {
                continue;
            }
            if (!at.isEmpty() && sums.get(i).get() <= at.get(at.size() - 1)) {
                rows.get(i).problem("", "the stage " + stages.get(i).name() + " comes at " + sums.get(i).get() + " degree-days, not after "
                        + placed.get(placed.size() - 1).name() + " at " + at.get(at.size() - 1), "List the stages in the order of spring");
            }
            placed.add(stages.get(i));
            at.add(sums.get(i).get());
        }
        if (entry.problems() > before) {
            return Optional.empty();
        }
        if (!hold) {
            entry.notice("cultivar " + entry.label() + " is judged from " + at.get(0) + " degree-days on, its first bud stage: winter "
                    + "cold before it does it no harm in this run");
        }
        return Optional.of(new StageDegreeDays(base.orElseThrow(), from.orElse(null), placed, at, hold));
    }

    /** All stages of the list, in its order; fewer after problems. */
    private List<Stage> stages() {
        List<Optional<Double>> lt10 = new ArrayList<>();
        List<Optional<Double>> lt50 = new ArrayList<>();
        List<Optional<Double>> lt90 = new ArrayList<>();
        Set<String> seen = new HashSet<>();
        for (ModelParameters row : rows) {
            Optional<String> name = row.requiredText("stage", "Name the stage");
            name.filter(text -> !seen.add(text)).ifPresent(text -> row.problem("stage", "the stage " + text + " is listed twice",
                    "Keep one of the two"));
            names.add(name.orElse(""));
            lt10.add(LethalReading.requiredLethal(row, "lt10"));
            lt50.add(LethalReading.lethal(row, "lt50"));
            lt90.add(LethalReading.lethal(row, "lt90"));
        }
        List<Stage> stages = new ArrayList<>();
        for (int i = 0; i < rows.size(); i++) {
            if (lt10.get(i).isEmpty() || rows.get(i).has("lt50") && lt50.get(i).isEmpty() || rows.get(i).has("lt90") && lt90.get(i).isEmpty()) {
                continue;
            }
            double warm = lt10.get(i).get();
            Optional<Distances> borrowed = lt90.get(i).isPresent() ? Optional.empty() : neighbour(i, lt10, lt50, lt90);
            if (lt90.get(i).isEmpty() && borrowed.isEmpty()) {
                rows.get(i).problem("", "lt90 is missing, and no other stage has one whose spread could serve", "Give lt90 in degC");
                continue;
            }
            double middle = middle(warm, lt50.get(i), lt90.get(i), borrowed);
            double cold = lt90.get(i).orElseGet(() -> middle - borrowed.get().toLt90());
            if (LethalReading.ordered(rows.get(i), names.get(i), warm, middle, cold)) {
                stages.add(new Stage(names.get(i), warm, entry.tolerance().isSymmetric() ? (warm + cold) / 2 : middle, cold));
            }
        }
        return stages;
    }

    private static double middle(double lt10, Optional<Double> lt50, Optional<Double> lt90, Optional<Distances> borrowed) {
        return lt50.orElseGet(() -> lt90.map(cold -> (lt10 + cold) / 2).orElseGet(() -> lt10 - borrowed.get().toLt10()));
    }

    /** The distances of the next stage with LT10 and LT90, else of the one before. */
    private static Optional<Distances> neighbour(int stage, List<Optional<Double>> lt10, List<Optional<Double>> lt50,
                                                 List<Optional<Double>> lt90) {
        List<Integer> order = new ArrayList<>();
        for (int i = stage + 1; i < lt10.size(); i++) {
            order.add(i);
        }
        for (int i = stage - 1; i >= 0; i--) {
            order.add(i);
        }
        return order.stream().filter(i -> lt10.get(i).isPresent() && lt90.get(i).isPresent()).findFirst().map(i -> {
            double middle = middle(lt10.get(i).get(), lt50.get(i), lt90.get(i), Optional.empty());
            return new Distances(lt10.get(i).get() - middle, middle - lt90.get(i).get());
        });
    }
}
