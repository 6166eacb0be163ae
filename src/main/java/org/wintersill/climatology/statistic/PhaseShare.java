package org.wintersill.climatology.statistic;

import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import org.wintersill.climatology.ClimatologyStatistic;
import org.wintersill.climatology.WinterRecord;
import org.wintersill.layer.LayerDefinition;
import org.wintersill.layer.LayerStyles;
import org.wintersill.layer.SampleType;

/**
 * Share of the damage done in a phase of the winter, 0..1 (science 10 and 16.12). A night adds what it raises the running damage, so a
 * phase of one winter adds the difference between the damage reached at its two ends.
 *
 * <p>Over winters it is the sum of what the phase added divided by the sum of the damage, not the mean of the shares: what a planner
 * loses in a phase is counted in buds, and winters that hardly do any damage must not weigh as much as killing ones. Winters with damage
 * below 0.001 are left out, where a share is an accident of the last digits; missing where none is left.
 */
public final class PhaseShare implements ClimatologyStatistic {
    /** Least damage of a winter that has shares. */
    public static final double LEAST_DAMAGE = 0.001;
    /** Ids of all three layers. */
    public static final List<String> IDS = Arrays.stream(Phase.values()).map(Phase::id).toList();

    /** Part of the winter; boundaries are those of {@code season.Phases}, or of the hardiness model. */
    public enum Phase {
        AUTUMN, MIDWINTER, SPRING;

        /** Id of the layer. */
        public String id() {
            return word() + "-share";
        }

        private String word() {
            return name().toLowerCase(Locale.ROOT);
        }
    }

    private final Phase phase;

    public PhaseShare(Phase phase) {
        this.phase = phase;
    }

    @Override
    public LayerDefinition layer() {
        String word = phase.word();
        return new LayerDefinition(phase.id(), "Share of the damage done in " + word,
                "Share of the damage of all winters that was done in " + word + ", each night counting for what it adds to the damage "
                        + "before it; winters with damage below " + LEAST_DAMAGE + " are left out", "1", SampleType.FLOAT32, "",
                LayerStyles.share());
    }

    @Override
    public void summarise(WinterRecord record, float[] out, int from, int to) {
        for (int cell = from; cell < to; cell++) {
            double added = 0;
            double damage = 0;
            for (int winter = 0; winter < record.winters(); winter++) {
                float all = record.damage()[winter][cell];
                if (all >= LEAST_DAMAGE) {
                    added += of(phase, record.damageAt(0)[winter][cell], record.damageAt(1)[winter][cell], all);
                    damage += all;
                }
            }
            out[cell] = damage == 0 ? Float.NaN : (float) (added / damage);
        }
    }

    /**
     * What a phase adds to the damage of one winter.
     *
     * @param autumn damage when autumn ended
     * @param midwinter damage when midwinter ended
     * @param winter damage of the whole winter
     */
    public static double of(Phase phase, double autumn, double midwinter, double winter) {
        return switch (phase) {
            case AUTUMN -> autumn;
            case MIDWINTER -> midwinter - autumn;
            case SPRING -> winter - midwinter;
        };
    }
}
