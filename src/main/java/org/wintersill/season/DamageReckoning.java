package org.wintersill.season;

import java.util.Optional;
import org.wintersill.damage.NightJoining;
import org.wintersill.damage.Uncertainty;

/**
 * How the damage of a winter is reckoned, and what is kept of a winter besides margins, damage and worst night.
 *
 * @param nights how the nights are joined
 * @param uncertainty of the winter's worst margin; none unless one night decides
 * @param phases whether the damage at the end of autumn and of midwinter is kept
 * @param south whether the phases are those of the southern hemisphere
 * @param coldNight threshold of a cold night, degrees Celsius, where such nights are counted; empty where not
 */
public record DamageReckoning(NightJoining nights, Uncertainty uncertainty, boolean phases, boolean south, Optional<Float> coldNight) {
    /** The worst night decides, nothing is uncertain, and nothing but the winter's damage is kept. */
    public static final DamageReckoning PLAIN = new DamageReckoning(NightJoining.WORST_NIGHT, Uncertainty.none(), false, false);

    /** A reckoning that counts no cold nights. */
    public DamageReckoning(NightJoining nights, Uncertainty uncertainty, boolean phases, boolean south) {
        this(nights, uncertainty, phases, south, Optional.empty());
    }

    public DamageReckoning {
        if (!nights.isWorst() && !uncertainty.isNone()) {
            throw new IllegalArgumentException("uncertainty is for the worst night alone");
        }
    }

    /** Whether the expected damage with uncertainty is kept beside the damage without. */
    public boolean keepsExpected() {
        return !uncertainty.isNone();
    }

    /** Whether nights must be taken one by one, since lowest values over them do not suffice. */
    boolean nightByNight() {
        return !nights.isWorst() || keepsExpected();
    }

    /** Planes of values a winter and cultivar besides margins, damage and worst night. */
    public int extraPlanes() {
        return (keepsExpected() ? 1 : 0) + (phases ? 2 : 0);
    }

    /** Bytes that a lane takes for each cell and cultivar, besides margins and worst night. */
    long bytesPerCell() {
        long joined = nights.isWorst() ? 0 : Double.BYTES * (long) JoinedNights.points(nights);
        return joined + (keepsExpected() ? 4L * Float.BYTES : 0) + (phases ? 2L * Float.BYTES : 0);
    }
}
