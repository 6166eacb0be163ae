package org.wintersill.comparison;

/**
 * Whether two frequencies of killing winters differ beyond chance. Whole winters are dealt anew to the two periods: with k killing
 * ones among all, the number that falls to the first period is hypergeometric, so the p-value of dealing without end is known
 * exactly (Fisher's exact test, two-sided: all outcomes that are no more likely than the one seen).
 */
public final class FrequencyTest {
    /** Outcomes as likely as the one seen must count in spite of round-off. */
    private static final double SLACK = 1 + 1e-7;

    private final double[] logFactorials;

    /** @param mostWinters largest sum of winters of both periods */
    public FrequencyTest(int mostWinters) {
        logFactorials = new double[mostWinters + 1];
        for (int i = 2; i <= mostWinters; i++) {
            logFactorials[i] = logFactorials[i - 1] + Math.log(i);
        }
    }

    /**
     * The p-value.
     *
     * @param killing1 killing winters of the first period, of {@code winters1}
     * @param killing2 of the second, of {@code winters2}
     * @return 0..1; 1 where one period is empty
     */
    public double pValue(int killing1, int winters1, int killing2, int winters2) {
        int all = winters1 + winters2;
        int killing = killing1 + killing2;
        double seen = logProbability(killing1, killing, winters1, all);
        double p = 0;
        for (int k = Math.max(0, killing - winters2); k <= Math.min(killing, winters1); k++) {
            double probability = logProbability(k, killing, winters1, all);
            if (Math.exp(probability - seen) <= SLACK) {
                p += Math.exp(probability);
            }
        }
        return Math.min(1, p);
    }

    private double logProbability(int k, int killing, int winters1, int all) {
        return logChoose(killing, k) + logChoose(all - killing, winters1 - k) - logChoose(all, winters1);
    }

    private double logChoose(int n, int k) {
        return logFactorials[n] - logFactorials[k] - logFactorials[n - k];
    }
}
