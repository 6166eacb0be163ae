package org.wintersill.climatology.statistic;

import java.util.Arrays;
import java.util.Locale;
import java.util.Map;
import java.util.TreeMap;
import org.wintersill.climatology.FrequencyInterval;
import org.wintersill.climatology.extreme.ExtremeFit;
import org.wintersill.climatology.extreme.Gev;
import org.wintersill.climatology.extreme.LowExtreme;
import org.wintersill.climatology.extreme.MaximumLikelihood;
import org.wintersill.climatology.extreme.ParametricBootstrap;
import org.wintersill.climatology.extreme.ProfileLikelihood;
import org.wintersill.climatology.extreme.RandomStream;

/**
 * How often nominal 90 % intervals enclose a known truth: simulated records of 30 winters whose lowest margins follow a known
 * distribution. {@code CoverageStudy RECORDS SEED} prints the table of DEVELOPERS.md; a test runs a smaller one.
 */
public final class CoverageStudy {
    private static final int WINTERS = 30;
    private static final double CONFIDENCE = 0.90;
    private static final double[] SHAPES = {-0.3, -0.15, 0, 0.1};
    private static final double[] FREQUENCIES = {0.05, 0.10, 0.20, 0.30};
    private static final int[] PERIODS = {10, 50, 100};

    private final int records;
    private final long seed;

    CoverageStudy(int records, long seed) {
        this.records = records;
        this.seed = seed;
    }

    public static void main(String[] arguments) {
        CoverageStudy study = new CoverageStudy(Integer.parseInt(arguments[0]), Long.parseLong(arguments[1]));
        study.bootstrapAndCounts().forEach((name, share) -> System.out.printf(Locale.ROOT, "%-58s %.3f%n", name, share));
        study.profiles().forEach((name, share) -> System.out.printf(Locale.ROOT, "%-58s %.3f%n", name, share));
    }

    /** Ascending maxima of the negated margins of a record. */
    private double[] record(Gev gev, int number) {
        RandomStream random = RandomStream.of(seed, number, -1);
        double[] maxima = new double[WINTERS];
        for (int i = 0; i < WINTERS; i++) {
            maxima[i] = gev.quantile(Math.min(random.nextUniform(), 1 - 1e-16));
        }
        Arrays.sort(maxima);
        return maxima;
    }

    /** Negated margins with scale 3 K whose probability of reaching zero is given. */
    private static Gev truth(double shape, double frequency) {
        return new Gev(-new Gev(0, 3, shape).quantile(1 - frequency), 3, shape);
    }

    /** Coverage of frequencies, required hardiness, return levels and fitted return periods, by name. */
    Map<String, Double> bootstrapAndCounts() {
        Map<String, Double> covered = new TreeMap<>();
        ParametricBootstrap bootstrap = new ParametricBootstrap(200, seed, WINTERS);
        for (double shape : SHAPES) {
            for (double frequency : FREQUENCIES) {
                Gev truth = truth(shape, frequency);
                RequiredHardinessBound hardiness = new RequiredHardinessBound(0, frequency, FrequencyInterval.JEFFREYS, CONFIDENCE, false);
                for (int number = 0; number < records; number++) {
                    double[] maxima = record(truth, number);
                    int killing = (int) Arrays.stream(maxima).filter(value -> value >= 0).count();
                    if (shape == 0) {
                        add(covered, "frequency, Jeffreys, truth " + frequency, FrequencyInterval.JEFFREYS.bounds(killing, WINTERS, CONFIDENCE),
                                frequency);
                        add(covered, "frequency, Wilson, truth " + frequency, FrequencyInterval.WILSON.bounds(killing, WINTERS, CONFIDENCE),
                                frequency);
                        double[] bounds = hardiness.of(Arrays.stream(maxima).map(value -> -value).toArray(), WINTERS);
                        add(covered, "required hardiness, target " + frequency, new double[] {
                            Double.isNaN(bounds[0]) ? Double.NEGATIVE_INFINITY : bounds[0],
                            Double.isNaN(bounds[1]) ? Double.POSITIVE_INFINITY : bounds[1]}, 0);
                    }
                    if (frequency == 0.10) {
                        ExtremeFit fit = ExtremeFit.of(maxima, WINTERS, ExtremeFit.Method.L_MOMENTS);
                        ParametricBootstrap.Replicates replicates = bootstrap.of(fit, WINTERS, number, false);
                        for (int period : PERIODS) {
                            add(covered, "return level " + period + ", bootstrap, xi " + shape,
                                    replicates.bounds(gev -> LowExtreme.returnLevel(gev, period), CONFIDENCE),
                                    LowExtreme.returnLevel(truth, period));
                        }
                        add(covered, "return period of a killing winter, bootstrap, xi " + shape,
                                replicates.bounds(gev -> 1 / LowExtreme.probabilityAtOrBelow(gev, 0), CONFIDENCE), 10);
                    }
                }
            }
        }
        return covered;
    }

    /** Coverage of the profile intervals of return levels; a quarter of the records, since each takes long. */
    Map<String, Double> profiles() {
        Map<String, Double> covered = new TreeMap<>();
        int fewer = Math.max(1, records / 4);
        for (double shape : SHAPES) {
            Gev truth = truth(shape, 0.10);
            for (int number = 0; number < fewer; number++) {
                double[] maxima = record(truth, number);
                ProfileLikelihood profile = new ProfileLikelihood(maxima, WINTERS, MaximumLikelihood.fit(maxima, WINTERS));
                for (int period : new int[] {10, 100}) {
                    add(covered, "return level " + period + ", profile, xi " + shape, profile.returnLevel(period, CONFIDENCE),
                            truth.returnLevel(period), fewer);
                }
            }
        }
        return covered;
    }

    private void add(Map<String, Double> covered, String name, double[] bounds, double truth) {
        add(covered, name, bounds, truth, records);
    }

    private static void add(Map<String, Double> covered, String name, double[] bounds, double truth, int of) {
        covered.merge(name, bounds[0] <= truth && truth <= bounds[1] ? 1.0 / of : 0, Double::sum);
    }
}
