package org.wintersill.run;

import java.util.Optional;
import org.wintersill.climatology.statistic.PhaseShare;
import org.wintersill.climatology.statistic.PhaseShare.Phase;
import org.wintersill.season.DamageReckoning;
import org.wintersill.season.WinterValues;

/**
 * What a run keeps of the damage of one winter at one place besides the damage itself.
 *
 * @param expected expected fraction killed with uncertainty; empty where nothing is uncertain
 * @param shares {@code [phase]}, share of the damage that was done in autumn, midwinter and spring; NaN where the damage is below 0.001;
 *     empty where phases are not kept
 */
public record WinterDamage(Optional<Float> expected, float[] shares) {

    static WinterDamage none() {
        return new WinterDamage(Optional.empty(), new float[0]);
    }

    static WinterDamage of(WinterValues values, int cultivar, DamageReckoning reckoning) {
        Optional<Float> expected = reckoning.keepsExpected() ? Optional.of(values.expectedDamage(cultivar)[0]) : Optional.empty();
        float[] shares = new float[reckoning.phases() ? Phase.values().length : 0];
        for (int phase = 0; phase < shares.length; phase++) {
            float damage = values.damage(cultivar)[0];
            shares[phase] = damage >= PhaseShare.LEAST_DAMAGE ? (float) (PhaseShare.of(Phase.values()[phase],
                    values.damageAt(cultivar, 0)[0], values.damageAt(cultivar, 1)[0], damage) / damage) : Float.NaN;
        }
        return new WinterDamage(expected, shares);
    }
}
