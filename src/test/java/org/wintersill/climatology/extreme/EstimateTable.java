package org.wintersill.climatology.extreme;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;

/**
 * Writes random samples and what our estimators make of them, for programs that are not ours to look at: {@code EstimateTable FILE.csv},
 * compared by {@code src/test/python/check_estimators.py} (scipy) and {@code src/test/python/check_estimators.R} (R evd).
 */
public final class EstimateTable {
    private static final int SAMPLES = 40;

    private EstimateTable() {
    }

    public static void main(String[] arguments) throws IOException {
        List<String> lines = new ArrayList<>();
        lines.add("sample,n,l1,l2,t3,lm_loc,lm_scale,lm_xi,ml_loc,ml_scale,ml_xi,ml_loglik,se_loc,se_scale,se_xi,level50,low50,high50,ad,cvm,"
                + "trend_slope,trend_loglik,trend_p,sen,mk_s,mk_var,mk_z,mk_p,bh_called,values");
        double[] pValues = new double[SAMPLES];
        List<String> rows = new ArrayList<>();
        for (int sample = 0; sample < SAMPLES; sample++) {
            RandomStream random = RandomStream.of(2024, sample, 0);
            int n = 20 + random.nextInt(61);
            Gev gev = new Gev(-10 + 40 * random.nextUniform(), 0.5 + 5 * random.nextUniform(), -0.3 + 0.5 * random.nextUniform());
            double[] values = new double[n];
            double[] times = new double[n];
            double rise = sample % 3 == 0 ? 0.04 * gev.scale() : 0;
            for (int i = 0; i < n; i++) {
                times[i] = 1960 + i;
                double value = gev.ofExponential(-Math.log(random.nextUniform())) + rise * i;
                values[i] = sample % 4 == 0 ? Math.rint(value * 2) / 2 : value;
            }
            rows.add(row(sample, times, values, n, pValues));
        }
        double threshold = FalseDiscovery.threshold(bound -> Arrays.stream(pValues).filter(p -> p <= bound).count(), SAMPLES, 0.1);
        for (int sample = 0; sample < SAMPLES; sample++) {
            lines.add(rows.get(sample).replace("CALLED", pValues[sample] <= threshold ? "1" : "0"));
        }
        Files.write(Path.of(arguments[0]), lines);
    }

    private static String row(int sample, double[] times, double[] values, int n, double[] pValues) {
        double[] sorted = values.clone();
        Arrays.sort(sorted);
        LMoments moments = LMoments.of(sorted, n);
        Gev byMoments = moments.gev();
        Gev likely = MaximumLikelihood.fit(values, n);
        double[][] covariance = MaximumLikelihood.covariance(values, n, likely);
        double[] profile = new ProfileLikelihood(values, n, likely).returnLevel(50, 0.90);
        LocationTrend trend = LocationTrend.of(times, values, n, likely);
        RankTrend ranks = RankTrend.of(times, values, n);
        pValues[sample] = ranks.pValue();
        double[] numbers = {moments.first(), moments.second(), moments.skewness(), byMoments.location(), byMoments.scale(), byMoments.shape(),
            likely.location(), likely.scale(), likely.shape(), likely.logLikelihood(values, n), Math.sqrt(covariance[0][0]),
            Math.sqrt(covariance[1][1]), Math.sqrt(covariance[2][2]), likely.returnLevel(50), profile[0], profile[1],
            FitQuality.andersonDarling(sorted, n, likely), FitQuality.cramerVonMises(sorted, n, likely), trend.slope(),
            trend.logLikelihood(), trend.pValue(), ranks.slope(), ranks.s(), ranks.variance(), ranks.z(), ranks.pValue()};
        StringBuilder line = new StringBuilder(sample + "," + n);
        for (double number : numbers) {
            line.append(String.format(Locale.ROOT, ",%.12g", number));
        }
        line.append(",CALLED,");
        for (int i = 0; i < n; i++) {
            line.append(i == 0 ? "" : " ").append(values[i]);
        }
        return line.toString();
    }
}
