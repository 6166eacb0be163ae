package org.wintersill.scenario;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/** How a model's change is laid on the observations (science 8). */
public enum ScenarioMethod {
    /**
     * Additive quantile delta mapping (Cannon, Sobie and Murdock 2015, J. Climate 28:6938): the model's future days, each moved
     * from the model's quantile to the observed one, keeping the model's change of that quantile.
     */
    QUANTILE_DELTA("quantile-delta"),
    /** Plain quantile mapping of the future days, for comparison: the change of the extremes is not kept. */
    QUANTILE_MAPPING("quantile-mapping"),
    /** The observed days plus the change of the model's mean: the observed variability is kept. */
    MONTHLY_DELTA("monthly-delta");

    private final String key;

    ScenarioMethod(String key) {
        this.key = key;
    }

    /** Word of the run file. */
    public String key() {
        return key;
    }

    /** Whether the days of the result are those of the model's future; otherwise they are the observed ones. */
    public boolean hasFutureDays() {
        return this != MONTHLY_DELTA;
    }

    public static Optional<ScenarioMethod> named(String key) {
        return Arrays.stream(values()).filter(method -> method.key.equals(key)).findFirst();
    }

    public static List<String> keys() {
        return Arrays.stream(values()).map(ScenarioMethod::key).toList();
    }
}
