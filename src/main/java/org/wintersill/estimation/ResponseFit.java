package org.wintersill.estimation;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.wintersill.hardiness.HardinessModel;
import org.wintersill.hardiness.MeasuredTolerance;
import org.wintersill.hardiness.model.FourParameterLogistic;
import org.wintersill.hardiness.model.ResponseModel;

/**
 * A response to the trailing mean: both limbs share their limits, each has its steepness and midpoint. The chilling sums of the turn
 * and the length of the mean are kept, since samples from some dates do not tell them.
 */
final class ResponseFit implements FitModel {
    private static final int TENDER = 0;
    private static final int HARDY = 1;
    private static final int AUTUMN_STEEPNESS = 2;
    private static final int AUTUMN_MIDPOINT = 3;
    private static final int SPRING_STEEPNESS = 4;
    private static final int SPRING_MIDPOINT = 5;
    private static final int TURN_BEGINS = 6;
    private static final int TURN_ENDS = 7;
    private static final int DAYS = 8;
    /** How far beyond the samples the limits are looked for, K (project choice). */
    private static final double BEYOND = 15;
    /** Least distance of the limits, K (project choice). */
    private static final double LEAST_SPAN = 0.5;

    private final List<Setting> settings;

    ResponseFit(List<MeasuredTolerance> samples) {
        double[] range = FitModel.range(samples);
        double middle = (range[0] + range[1]) / 2;
        settings = List.of(
                new Setting(new Parameter("tender-limit", "degC", middle, Math.min(4, range[1] + BEYOND)), Math.min(3, range[1] + 1),
                        Role.ESTIMATED),
                new Setting(new Parameter("hardy-limit", "degC", Math.max(-89, range[0] - BEYOND), middle - LEAST_SPAN), range[0] - 1,
                        Role.ESTIMATED),
                new Setting(new Parameter("autumn.steepness", "1/K", 0.02, 3), 0.4, Role.ESTIMATED),
                new Setting(new Parameter("autumn.midpoint", "degC", -20, 20), 5, Role.ESTIMATED),
                new Setting(new Parameter("spring.steepness", "1/K", 0.02, 3), 0.4, Role.ESTIMATED),
                new Setting(new Parameter("spring.midpoint", "degC", -20, 20), 3, Role.ESTIMATED),
                new Setting(new Parameter("spring-from.begin", "degree-days", 1, 9999), 600, Role.KEPT),
                new Setting(new Parameter("spring-from.end", "degree-days", 2, 10000), 900, Role.KEPT),
                new Setting(new Parameter("mean-days", "days", 3, 30), 10, Role.KEPT));
    }

    @Override
    public String word() {
        return "response";
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
        return new ResponseModel(limb(values, AUTUMN_STEEPNESS, AUTUMN_MIDPOINT), limb(values, SPRING_STEEPNESS, SPRING_MIDPOINT),
                (int) Math.round(values[DAYS]), 0, new ResponseModel.Turn(List.of(values[TURN_BEGINS], ends(values)), null, null, null),
                toLt10, toLt90);
    }

    private static double ends(double[] values) {
        return Math.max(values[TURN_ENDS], values[TURN_BEGINS] + 1);
    }

    private static FourParameterLogistic limb(double[] values, int steepness, int midpoint) {
        return new FourParameterLogistic(values[steepness], values[TENDER], values[HARDY], values[midpoint]);
    }

    @Override
    public Map<String, Object> entry(double[] values, double toLt10, double toLt90) {
        Map<String, Object> entry = new LinkedHashMap<>();
        entry.put("mean-days", (int) Math.round(values[DAYS]));
        entry.put("autumn", part(values, AUTUMN_STEEPNESS, AUTUMN_MIDPOINT));
        entry.put("spring", part(values, SPRING_STEEPNESS, SPRING_MIDPOINT));
        entry.put("spring-from", Map.of("chilling", List.of(FitModel.rounded(values[TURN_BEGINS]), FitModel.rounded(ends(values)))));
        entry.put("lt10-above", FitModel.rounded(toLt10));
        entry.put("lt90-below", FitModel.rounded(toLt90));
        return entry;
    }

    private static Map<String, Object> part(double[] values, int steepness, int midpoint) {
        Map<String, Object> part = new LinkedHashMap<>();
        part.put("tender-limit", FitModel.rounded(values[TENDER]));
        part.put("hardy-limit", FitModel.rounded(values[HARDY]));
        part.put("steepness", FitModel.rounded(values[steepness]));
        part.put("midpoint", FitModel.rounded(values[midpoint]));
        return part;
    }
}
