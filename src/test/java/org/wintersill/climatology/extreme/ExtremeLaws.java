package org.wintersill.climatology.extreme;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.SplittableRandom;
import net.jqwik.api.Example;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import net.jqwik.api.constraints.IntRange;
import net.jqwik.api.constraints.Size;
import org.apache.commons.math3.analysis.integration.SimpsonIntegrator;
import org.apache.commons.math3.distribution.ExponentialDistribution;
import org.apache.commons.math3.stat.inference.KolmogorovSmirnovTest;
import org.wintersill.damage.ToleranceCurve;

class ExtremeLaws {

    /** An ascending sample of a distribution. */
    private static double[] sample(Gev gev, int n, long seed) {
        double[] exponentials = new double[n];
        RandomStream.of(seed, 1, 2).descendingExponentials(exponentials, n);
        return Arrays.stream(exponentials).map(gev::ofExponential).toArray();
    }

    @Property
    void quantilesAndProbabilitiesUndoEachOther(@ForAll @DoubleRange(min = -0.5, max = 0.5) double shape,
            @ForAll @DoubleRange(min = 0.01, max = 0.99) double p, @ForAll @DoubleRange(min = 0.1, max = 20) double scale) {
        Gev gev = new Gev(-18, scale, shape);
        double x = gev.quantile(p);
        assertEquals(p, gev.probability(x), 1e-9);
        assertEquals(1 - p, gev.exceedance(x), 1e-9);
        assertEquals(x, gev.returnLevel(1 / (1 - p)), 1e-7 * scale);
        assertTrue(x <= gev.upperEnd());
    }

    @Property(tries = 50)
    void theDensityIsTheSlopeOfTheProbability(@ForAll @DoubleRange(min = -0.5, max = 0.5) double shape,
            @ForAll @DoubleRange(min = 0.02, max = 0.98) double p) {
        Gev gev = new Gev(3, 2, shape);
        double x = gev.quantile(p);
        double step = 1e-5;
        double slope = (gev.probability(x + step) - gev.probability(x - step)) / (2 * step);
        assertEquals(slope, Math.exp(gev.logDensity(x)), 1e-6);
    }

    @Example
    void shapesNearZeroPassIntoTheGumbelDistribution() {
        Gev gumbel = new Gev(0, 1, 0);
        for (double shape : new double[] {1e-3, 1e-6, 1e-9, 1e-12, 1e-300, -1e-3, -1e-9}) {
            assertEquals(gumbel.probability(1.7), new Gev(0, 1, shape).probability(1.7), Math.abs(shape) + 1e-15);
            assertEquals(gumbel.quantile(0.99), new Gev(0, 1, shape).quantile(0.99), 11 * Math.abs(shape) + 1e-14);
        }
    }

    @Property(tries = 100)
    void fitsMoveAndStretchWithTheValues(@ForAll @IntRange(min = 20, max = 60) int n, @ForAll long seed,
            @ForAll @DoubleRange(min = -50, max = 50) double shift, @ForAll @DoubleRange(min = 0.1, max = 10) double stretch) {
        double[] values = sample(new Gev(0, 1, -0.1), n, seed);
        Gev plain = LMoments.of(values, n).gev();
        Gev moved = LMoments.of(Arrays.stream(values).map(v -> shift + stretch * v).toArray(), n).gev();
        assertEquals(shift + stretch * plain.location(), moved.location(), 1e-8 * (1 + stretch + Math.abs(shift)));
        assertEquals(stretch * plain.scale(), moved.scale(), 1e-8 * stretch * (1 + Math.abs(shift)));
        assertEquals(plain.shape(), moved.shape(), 1e-7 * (1 + Math.abs(shift) / stretch));
    }

    @Property(tries = 20)
    void noOtherParametersAreLikelier(@ForAll @IntRange(min = 40, max = 80) int n, @ForAll long seed,
            @ForAll @DoubleRange(min = -0.3, max = 0.2) double shape) {
        double[] values = sample(new Gev(15, 3, shape), n, seed);
        Gev best = MaximumLikelihood.fit(values, n);
        double highest = best.logLikelihood(values, n);
        for (double factor : new double[] {-0.01, 0.01}) {
            Gev[] others = {new Gev(best.location() + factor * best.scale(), best.scale(), best.shape()),
                new Gev(best.location(), best.scale() * (1 + factor), best.shape()),
                new Gev(best.location(), best.scale(), best.shape() + factor)};
            for (Gev other : others) {
                assertTrue(Math.abs(other.shape()) > MaximumLikelihood.LARGEST_SHAPE
                        || other.logLikelihood(values, n) <= highest + 1e-8, best + " is not better than " + other);
            }
        }
    }

    @Property(tries = 50)
    void shortRecordsFollowTheirRules(@ForAll @IntRange(min = 3, max = 60) int n, @ForAll long seed,
            @ForAll @DoubleRange(min = -0.45, max = 0.45) double shape) {
        double[] values = sample(new Gev(0, 1, shape), n, seed);
        for (ExtremeFit.Method method : ExtremeFit.Method.values()) {
            ExtremeFit fit = ExtremeFit.of(values, n, method);
            boolean likelihood = n >= 40 && method == ExtremeFit.Method.MAXIMUM_LIKELIHOOD;
            assertEquals(n < 20, fit.kind() == ExtremeFit.Kind.NONE);
            assertEquals(likelihood, fit.kind() == ExtremeFit.Kind.MAXIMUM_LIKELIHOOD);
            if (n >= 20 && n < 40) {
                boolean believed = Math.abs(LMoments.of(values, n).gev().shape()) <= 0.4;
                assertEquals(believed ? ExtremeFit.Kind.L_MOMENTS : ExtremeFit.Kind.GUMBEL_FALLBACK, fit.kind());
                assertTrue(believed || fit.gev().shape() == 0);
            }
        }
    }

    @Example
    void equalValuesHaveNoFit() {
        double[] values = new double[30];
        Arrays.fill(values, 4.2);
        assertEquals(ExtremeFit.Kind.NONE, ExtremeFit.of(values, 30, ExtremeFit.Method.L_MOMENTS).kind());
        assertTrue(Double.isNaN(Gev.NONE.returnLevel(10)));
        assertTrue(Double.isNaN(Gev.NONE.upperEnd()));
        assertTrue(Double.isNaN(Gev.NONE.exceedance(1)));
    }

    @Property
    void theFourTermShapeIsNearTheExactRoot(@ForAll @DoubleRange(min = -0.1, max = 0.5) double t3) {
        double k = LMoments.fourTermShape(t3);
        double low = -0.9;
        double high = 2;
        for (int i = 0; i < 80; i++) {
            double middle = (low + high) / 2;
            double value = 2 * (1 - Math.pow(3, -middle)) / (1 - Math.pow(2, -middle)) - 3;
            if (value > t3) {
                low = middle;
            } else {
                high = middle;
            }
        }
        assertEquals(low, k, 1e-5);
        assertEquals(low, LMoments.twoTermShape(t3), 1e-3);
    }

    @Property(tries = 50)
    void randomNumbersAreThoseOfTheJdk(@ForAll long seed) {
        RandomStream ours = new RandomStream(seed);
        SplittableRandom theirs = new SplittableRandom(seed);
        for (int i = 0; i < 20; i++) {
            assertEquals(theirs.nextLong(), ours.nextLong());
        }
    }

    @Example
    void descendingExponentialsAreASortedSample() {
        double[] pooled = new double[30 * 200];
        double[] one = new double[30];
        for (int replicate = 0; replicate < 200; replicate++) {
            RandomStream.of(11, 5, replicate).descendingExponentials(one, 30);
            for (int i = 1; i < 30; i++) {
                assertTrue(one[i] < one[i - 1]);
            }
            System.arraycopy(one, 0, pooled, 30 * replicate, 30);
        }
        double p = new KolmogorovSmirnovTest().kolmogorovSmirnovTest(new ExponentialDistribution(null, 1), pooled);
        assertTrue(p > 0.001, "the pooled values are exponential: p = " + p);
    }

    @Property(tries = 20)
    void replicatesDependOnSeedCellAndNumberAlone(@ForAll long seed, @ForAll @IntRange(min = 0, max = 1000) int cell) {
        ExtremeFit fit = new ExtremeFit(new Gev(15, 3, -0.2), ExtremeFit.Kind.L_MOMENTS, new Gev(15, 3, -0.2));
        ParametricBootstrap.Quantity level = gev -> gev.returnLevel(50);
        ParametricBootstrap one = new ParametricBootstrap(20, seed, 40);
        double[] first = one.of(fit, 30, cell, false).bounds(level, 0.9);
        one.of(fit, 40, cell + 1L, true);
        assertArrayEquals(first, one.of(fit, 30, cell, false).bounds(level, 0.9));
        assertArrayEquals(first, new ParametricBootstrap(20, seed, 30).of(fit, 30, cell, false).bounds(level, 0.9));
        assertTrue(first[0] < first[1]);
    }

    @Property(tries = 50)
    void ranksDoNotMindStretchingAndTurnWithTheSign(@ForAll @Size(min = 5, max = 30) double[] raw,
            @ForAll @DoubleRange(min = 0.5, max = 4) double stretch) {
        int n = raw.length;
        double[] times = new double[n];
        double[] values = new double[n];
        double[] turned = new double[n];
        for (int i = 0; i < n; i++) {
            times[i] = 1990 + i;
            values[i] = raw[i] % 20;
            turned[i] = -stretch * values[i];
        }
        RankTrend trend = RankTrend.of(times, values, n);
        RankTrend other = RankTrend.of(times, turned, n);
        assertEquals(-trend.s(), other.s());
        assertEquals(trend.pValue(), other.pValue(), 1e-12);
        assertEquals(-stretch * trend.slope(), other.slope(), 1e-9 * (1 + Math.abs(trend.slope())));
        assertTrue(trend.pValue() >= 0 && trend.pValue() <= 1);
    }

    @Property
    void falseDiscoveryCallsWhatSortingWould(@ForAll @Size(min = 1, max = 60) double[] raw,
            @ForAll @DoubleRange(min = 0.01, max = 0.5) double share) {
        double[] p = Arrays.stream(raw).map(v -> Math.pow(Math.abs(v % 1), 3)).toArray();
        double[] sorted = p.clone();
        Arrays.sort(sorted);
        long called = 0;
        for (int i = 1; i <= sorted.length; i++) {
            if (sorted[i - 1] <= share * i / sorted.length) {
                called = i;
            }
        }
        double threshold = FalseDiscovery.threshold(t -> Arrays.stream(p).filter(v -> v <= t).count(), p.length, share);
        assertEquals(called, Arrays.stream(p).filter(v -> v <= threshold && threshold > 0).count());
    }

    @Property(tries = 60)
    void expectedDamageIsTheIntegralOfTheCurveOverTheQuantiles(@ForAll @DoubleRange(min = -0.4, max = 0.3) double shape,
            @ForAll @DoubleRange(min = 0.3, max = 8) double scale, @ForAll @DoubleRange(min = -15, max = 10) double location,
            @ForAll @DoubleRange(min = 0.2, max = 4) double warm, @ForAll @DoubleRange(min = 0.2, max = 4) double cold) {
        Gev gev = new Gev(location, scale, shape);
        for (ToleranceCurve curve : new ToleranceCurve[] {ToleranceCurve.SPLIT_LOGISTIC, ToleranceCurve.SPLIT_PROBIT}) {
            double expected = new SimpsonIntegrator(1e-9, 1e-9, 6, 24).integrate(20_000_000, w -> {
                double margin = -(gev.shape() == 0 ? location + scale * w : location + scale * Math.expm1(gev.shape() * w) / gev.shape());
                return curve.fractionOfDeficit(-margin / (margin > 0 ? warm : cold)) * Math.exp(-w - Math.exp(-w));
            }, -4, 30);
            assertEquals(expected, FittedDamage.expected(gev, curve, warm, cold), 3e-7);
        }
    }
}
