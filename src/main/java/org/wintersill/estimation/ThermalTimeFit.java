package org.wintersill.estimation;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.wintersill.hardiness.HardinessModel;
import org.wintersill.hardiness.MeasuredTolerance;
import org.wintersill.hardiness.model.ThermalTimeModel;
import org.wintersill.hardiness.model.ThermalTimeModel.Phase;

/**
 * Thresholds and rates of the thermal-time model. Its chilling is searched among evenly spaced values, since predictions jump from one
 * day to the next with it; the state on the start date, the tender limit, the power and budbreak are kept, since samples
 * between autumn and spring hardly tell them.
 */
final class ThermalTimeFit implements FitModel {
    private static final int INITIAL = 0;
    private static final int TENDER = 1;
    private static final int HARDY = 2;
    private static final int ENDO = 3;
    private static final int ECO = 6;
    private static final int POWER = 9;
    private static final int CHILLING = 10;
    private static final int BUDBREAK = 11;
    /** How far beyond the samples the hardy limit is looked for, K (project choice). */
    private static final double BEYOND = 15;

    private final List<Setting> settings;

    ThermalTimeFit(List<MeasuredTolerance> samples) {
        double hardiest = FitModel.range(samples)[0];
        settings = List.of(
                new Setting(new Parameter("initial", "degC", -40, 0), -10, Role.KEPT),
                new Setting(new Parameter("tender-limit", "degC", -15, 0), -1.5, Role.KEPT),
                new Setting(new Parameter("hardy-limit", "degC", Math.max(-89, hardiest - BEYOND), Math.min(-5, hardiest + 3)),
                        hardiest - 1, Role.ESTIMATED),
                new Setting(new Parameter("endodormancy.threshold", "degC", 0, 25), 12, Role.ESTIMATED),
                new Setting(new Parameter("endodormancy.acclimation", "K/degree-day", 0, 0.6), 0.1, Role.ESTIMATED),
                new Setting(new Parameter("endodormancy.deacclimation", "K/degree-day", 0, 0.6), 0.08, Role.ESTIMATED),
                new Setting(new Parameter("ecodormancy.threshold", "degC", -5, 20), 4, Role.ESTIMATED),
                new Setting(new Parameter("ecodormancy.acclimation", "K/degree-day", 0, 0.6), 0.05, Role.ESTIMATED),
                new Setting(new Parameter("ecodormancy.deacclimation", "K/degree-day", 0, 0.6), 0.1, Role.ESTIMATED),
                new Setting(new Parameter("ecodormancy.power", "1", 0.5, 20), 5, Role.KEPT),
                new Setting(new Parameter("chilling", "degree-days", -1000, -100), -600, Role.SEARCHED),
                new Setting(new Parameter("budbreak", "degC", -15, 0), -2.2, Role.KEPT));
    }

    @Override
    public String word() {
        return "thermal-time";
    }

    @Override
    public List<Setting> settings() {
        return settings;
    }

    @Override
    public boolean needsSeries() {
        return true;
    }

    @Override
    public HardinessModel model(double[] values, double toLt10, double toLt90) {
        return new ThermalTimeModel(null, initial(values), values[TENDER], hardy(values), phase(values, ENDO), phase(values, ECO), values[POWER],
                values[CHILLING], budbreak(values), toLt10, toLt90);
    }

    private static double hardy(double[] values) {
        return Math.min(values[HARDY], values[TENDER] - 1);
    }

    private static double initial(double[] values) {
        return Math.max(hardy(values), Math.min(values[TENDER], values[INITIAL]));
    }

    /** Not above the tender limit. */
    private static double budbreak(double[] values) {
        return Math.min(values[TENDER], values[BUDBREAK]);
    }

    private static Phase phase(double[] values, int first) {
        return new Phase(values[first], values[first + 1], values[first + 2]);
    }

    @Override
    public Map<String, Object> entry(double[] values, double toLt10, double toLt90) {
        Map<String, Object> entry = new LinkedHashMap<>();
        entry.put("initial", FitModel.rounded(initial(values)));
        entry.put("tender-limit", FitModel.rounded(values[TENDER]));
        entry.put("hardy-limit", FitModel.rounded(hardy(values)));
        entry.put("endodormancy", part(values, ENDO));
        Map<String, Object> eco = part(values, ECO);
        eco.put("power", FitModel.rounded(values[POWER]));
        entry.put("ecodormancy", eco);
        entry.put("chilling", FitModel.rounded(values[CHILLING]));
        entry.put("budbreak", FitModel.rounded(budbreak(values)));
        entry.put("lt10-above", FitModel.rounded(toLt10));
        entry.put("lt90-below", FitModel.rounded(toLt90));
        return entry;
    }

    private static Map<String, Object> part(double[] values, int first) {
        Map<String, Object> part = new LinkedHashMap<>();
        part.put("threshold", FitModel.rounded(values[first]));
        part.put("acclimation", FitModel.rounded(values[first + 1]));
        part.put("deacclimation", FitModel.rounded(values[first + 2]));
        return part;
    }
}
