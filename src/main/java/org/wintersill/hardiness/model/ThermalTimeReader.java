package org.wintersill.hardiness.model;

import java.util.Map;
import java.util.Optional;
import org.wintersill.hardiness.HardinessModel;
import org.wintersill.hardiness.ModelParameters;
import org.wintersill.hardiness.Quantity;
import org.wintersill.hardiness.model.LethalReading.Distances;
import org.wintersill.hardiness.model.ThermalTimeModel.Phase;
import org.wintersill.time.MonthDay;

/**
 * Reads a thermal-time cultivar: {@code start}, {@code initial}, {@code hardy-limit}, {@code tender-limit}, {@code endodormancy} and
 * {@code ecodormancy} with {@code threshold}, {@code acclimation} and {@code deacclimation}, {@code power} in ecodormancy,
 * {@code chilling}, {@code budbreak}, the distances of LT10 and LT90, and bud stages that may follow under {@code after-budbreak}.
 */
final class ThermalTimeReader {
    private static final Quantity RATE = Quantity.of("K a degree-day", -10, 10);
    private static final Quantity THRESHOLD = Quantity.of("degC", -30, 40);
    private static final Quantity POWER = Quantity.of("a number", 0.01, 100);
    private static final Quantity CHILLING = Quantity.of("degree-days below 10 degC, negative,", -10_000, 10_000);

    private ThermalTimeReader() {
    }

    static Optional<HardinessModel> read(ModelParameters entry) {
        int before = entry.problems();
        entry.symbols(Map.ofEntries(Map.entry("Hmax", "hardy-limit"), Map.entry("H_max", "hardy-limit"), Map.entry("Hmin", "tender-limit"),
                Map.entry("H_min", "tender-limit"), Map.entry("H_initial", "initial"), Map.entry("hmax", "hardy-limit"),
                Map.entry("hmin", "tender-limit"), Map.entry("ka", "acclimation"), Map.entry("kd", "deacclimation"),
                Map.entry("theta", "power, in ecodormancy"), Map.entry("EDB", "chilling"), Map.entry("Hbb", "budbreak"),
                Map.entry("Tth", "threshold"), Map.entry("T_endo", "threshold, in endodormancy"),
                Map.entry("T_eco", "threshold, in ecodormancy")));
        Optional<MonthDay> start = entry.date("start");
        Optional<Double> initial = LethalReading.requiredLethal(entry, "initial");
        Optional<Double> hardy = LethalReading.requiredLethal(entry, "hardy-limit");
        Optional<Double> tender = LethalReading.requiredLethal(entry, "tender-limit");
        Optional<Phase> endo = phase(entry, "endodormancy");
        Optional<Phase> eco = phase(entry, "ecodormancy");
        Optional<Double> power = entry.section("ecodormancy").flatMap(part -> part.required("power", POWER));
        Optional<Double> chilling = entry.required("chilling", CHILLING);
        Optional<Double> budbreak = LethalReading.requiredLethal(entry, "budbreak");
        Optional<Distances> distances = LethalReading.distances(entry);
        Optional<ModelParameters> after = entry.section("after-budbreak");
        Optional<HardinessModel> stages = after.flatMap(StageReader::afterBudbreak);
        checkOrder(entry, initial, hardy, tender, budbreak);
        if (chilling.isPresent() && chilling.get() >= 0) {
            entry.problem("chilling", "chilling " + chilling.get() + " is not below zero: it is the sum of min(0, mean - 10) that ends "
                    + "endodormancy (EDB of the papers)", chilling.get() > 0 ? "Write " + -chilling.get() : "Write for example -600");
        }
        if (entry.problems() > before) {
            return Optional.empty();
        }
        ThermalTimeModel model = new ThermalTimeModel(start.orElse(null), initial.orElseThrow(), tender.orElseThrow(), hardy.orElseThrow(),
                endo.orElseThrow(), eco.orElseThrow(), power.orElseThrow(), chilling.orElseThrow(), budbreak.orElseThrow(),
                distances.orElseThrow().toLt10(), distances.orElseThrow().toLt90());
        return Optional.of(stages.isPresent() ? new StageAfterBudbreak(model, stages.get()) : model);
    }

    private static void checkOrder(ModelParameters entry, Optional<Double> initial, Optional<Double> hardy, Optional<Double> tender,
                                   Optional<Double> budbreak) {
        LethalReading.hardyBelowTender(entry, hardy, tender);
        if (hardy.isEmpty() || tender.isEmpty() || hardy.get() >= tender.get()) {
            return;
        }
        String limits = "hardy-limit " + hardy.get() + " and tender-limit " + tender.get();
        if (initial.isPresent() && (initial.get() < hardy.get() || initial.get() > tender.get())) {
            entry.problem("initial", "initial " + initial.get() + " does not lie between " + limits, "Give LT50 on the start date");
        }
        if (budbreak.isPresent() && (budbreak.get() <= hardy.get() || budbreak.get() > tender.get())) {
            entry.problem("budbreak", "budbreak " + budbreak.get() + " does not lie between " + limits, "Give LT50 at budbreak, which is "
                    + "hardier than tender-limit or the same");
        }
    }

    private static Optional<Phase> phase(ModelParameters entry, String key) {
        Optional<ModelParameters> part = entry.requiredSection(key, "Write " + key + ": {threshold: 13, acclimation: 0.1, deacclimation: "
                + "0.08" + (key.equals("ecodormancy") ? ", power: 7}" : "}"));
        Optional<Double> threshold = part.flatMap(phase -> phase.required("threshold", THRESHOLD));
        Optional<Double> gain = part.flatMap(phase -> rate(phase, "acclimation"));
        Optional<Double> loss = part.flatMap(phase -> rate(phase, "deacclimation"));
        return threshold.flatMap(t -> gain.flatMap(ka -> loss.map(kd -> new Phase(t, ka, kd))));
    }

    private static Optional<Double> rate(ModelParameters phase, String key) {
        return phase.required(key, RATE).filter(rate -> {
            if (rate < 0) {
                phase.problem(key, "the rate of " + key + " " + rate + " has the wrong sign: both rates are written without minus, "
                        + "their direction is in the model", "Write " + -rate);
            }
            return rate >= 0;
        });
    }
}
