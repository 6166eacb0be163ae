package org.wintersill.hardiness.model;

import java.io.Serializable;
import java.util.Optional;
import org.wintersill.hardiness.StateModel;
import org.wintersill.time.MonthDay;
import org.wintersill.time.Season;
import org.wintersill.time.SeasonWindow;

/**
 * Daily acclimation and deacclimation of grapevine buds in two phases of dormancy, with budbreak.
 *
 * <p>H is LT50, degC. It is {@code initial} on the start date; then each day, with mean temperature Tm and the threshold T, rates
 * ka and kd of the current phase, and p = 1 in endodormancy, p = {@code power} in ecodormancy:
 * <pre>
 *   DDh = max(0, Tm - T)                          DDc = min(0, Tm - T)
 *   dD  = kd DDh (1 - ((H - hardy) / (tender - hardy))^p)      loss, K; 0 before the first day with DDc below 0
 *   dA  = ka DDc (1 - (tender - H) / (tender - hardy))         gain, K
 *   H   = min(tender, max(hardy, H + dD + dA))
 *   chill = chill + min(0, Tm - 10)
 * </pre>
 * Ecodormancy begins the day after chill came down to {@code chilling}. Budbreak is the first day on which H rises from
 * below {@code budbreak} to it or above; from the night after it LT50 is {@code tender}.
 *
 * <p>Source: the structure of Ferguson, Tarara, Mills, Grove and Keller 2011, Ann. Bot. 107:389 (abstract read), and Ferguson,
 * Moyer, Mills, Hoogenboom and Keller 2014, AJEV 65:59; the equations are from memory and are the project's definition (science
 * 3.1). LT10 and LT90 keep constant distances from LT50, a project choice. Hardiness that is lost is not regained below a floor,
 * and no temperature is outside the model's range.
 *
 * @param start day on which the state begins; null for {@link #NORTHERN_START} or {@link #SOUTHERN_START}
 * @param initial H on that day, degC, from hardy to tender
 * @param tender least hardy H, degC
 * @param hardy hardiest H, degC
 * @param endodormancy thresholds and rates until the chilling is done
 * @param ecodormancy the same afterwards
 * @param power p of ecodormancy, positive
 * @param chilling degree-days below 10 degC that end endodormancy, negative
 * @param budbreak H at budbreak, degC
 * @param toLt10 LT10 - LT50, K
 * @param toLt90 LT50 - LT90, K
 */
public record ThermalTimeModel(MonthDay start, double initial, double tender, double hardy, Phase endodormancy, Phase ecodormancy,
                               double power, double chilling, double budbreak, double toLt10, double toLt90)
        implements StateModel {

    /** Start of the state in the north; from memory, after Ferguson et al. 2014. */
    public static final MonthDay NORTHERN_START = new MonthDay(9, 7);
    /** Start of the state in the south, half a year later; project choice. */
    public static final MonthDay SOUTHERN_START = new MonthDay(3, 7);

    /**
     * Response to temperature in one phase of dormancy.
     *
     * @param threshold daily mean that neither hardens nor dehardens, degC
     * @param gain ka, K of hardiness a degree-day below it, not negative
     * @param loss kd, K a degree-day above it, not negative
     */
    public record Phase(double threshold, double gain, double loss) implements Serializable {

        public Phase {
            if (!Double.isFinite(threshold) || !(gain >= 0 && gain < 100) || !(loss >= 0 && loss < 100)) {
                throw new IllegalArgumentException("not a phase: threshold " + threshold + ", gain " + gain + ", loss " + loss);
            }
        }

        private String describe() {
            return "threshold " + threshold + " gain " + gain + " loss " + loss;
        }
    }

    public ThermalTimeModel {
        if (!(hardy < tender && hardy <= initial && initial <= tender && hardy >= -90 && tender <= 90)) {
            throw new IllegalArgumentException("hardy <= initial <= tender: " + hardy + ", " + initial + ", " + tender);
        }
        if (!(power > 0 && power <= 1000 && chilling < 0 && Double.isFinite(chilling) && Double.isFinite(budbreak))) {
            throw new IllegalArgumentException("power " + power + ", chilling " + chilling + ", budbreak " + budbreak);
        }
        if (!(toLt10 > 0 && toLt90 > 0 && toLt10 < 90 && toLt90 < 90)) {
            throw new IllegalArgumentException("distances of LT10 and LT90 from LT50: " + toLt10 + ", " + toLt90);
        }
    }

    @Override
    public String id() {
        return "thermal-time";
    }

    @Override
    public String describe() {
        return "thermal time from " + (start == null ? NORTHERN_START + " north, " + SOUTHERN_START + " south" : start)
                + ", initial " + initial + ", tender " + tender + ", hardy " + hardy + ", endodormancy " + endodormancy.describe()
                + ", ecodormancy " + ecodormancy.describe() + " power " + power + ", chilling " + chilling + ", budbreak " + budbreak
                + ", LT10 " + toLt10 + " K above and LT90 " + toLt90 + " K below LT50";
    }

    /** A state can follow any window; whether the record begins early enough is seen from {@link #firstDay}. */
    @Override
    public Optional<String> notCovering(SeasonWindow window) {
        return Optional.empty();
    }

    @Override
    public int firstDay(Season season) {
        return StartDay.position(season, start, NORTHERN_START, SOUTHERN_START);
    }

    @Override
    public ThermalTimeTrajectory begin(Season season, double[] latitudes) {
        return new ThermalTimeTrajectory(this, latitudes.length);
    }

    @Override
    public int bytesPerCell() {
        return ThermalTimeTrajectory.BYTES_PER_CELL;
    }
}
