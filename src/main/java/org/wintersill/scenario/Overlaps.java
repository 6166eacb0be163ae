package org.wintersill.scenario;

import java.util.stream.IntStream;
import org.wintersill.grid.GridGeometry;

/**
 * Which intervals of one axis each interval of another covers, and by what share of its own length. Rows of longitude-latitude grids
 * are measured by the sine of latitude, so that products of shares are shares of area on the sphere.
 *
 * @param firstOf first interval that is met, by interval of the target
 * @param endOf the one after the last
 * @param shares {@code [target][met]}, 0..1; they sum to the covered part
 */
record Overlaps(int[] firstOf, int[] endOf, double[][] shares) {

    static Overlaps ofColumns(GridGeometry target, GridGeometry source) {
        return of(edges(target.columns(), target.west(), target.cellWidth(), false),
                edges(source.columns(), source.west(), source.cellWidth(), false));
    }

    /** Counted from the north. */
    static Overlaps ofRows(GridGeometry target, GridGeometry source) {
        boolean sphere = target.crs().angular();
        return of(edges(target.rows(), -target.north(), target.cellHeight(), sphere),
                edges(source.rows(), -source.north(), source.cellHeight(), sphere));
    }

    private static double[] edges(int count, double first, double step, boolean sine) {
        return IntStream.rangeClosed(0, count).mapToDouble(i -> first + i * step)
                .map(edge -> sine ? Math.sin(Math.toRadians(Math.max(-90, Math.min(90, edge)))) : edge).toArray();
    }

    private static Overlaps of(double[] target, double[] source) {
        int count = target.length - 1;
        int[] first = new int[count];
        int[] end = new int[count];
        double[][] shares = new double[count][];
        for (int t = 0; t < count; t++) {
            double low = target[t];
            double high = target[t + 1];
            while (first[t] < source.length - 1 && source[first[t] + 1] <= low) {
                first[t]++;
            }
            end[t] = first[t];
            while (end[t] < source.length - 1 && source[end[t]] < high) {
                end[t]++;
            }
            shares[t] = new double[end[t] - first[t]];
            for (int s = first[t]; s < end[t]; s++) {
                shares[t][s - first[t]] = Math.max(0, Math.min(high, source[s + 1]) - Math.max(low, source[s])) / (high - low);
            }
        }
        return new Overlaps(first, end, shares);
    }

    int firstOf(int target) {
        return firstOf[target];
    }

    int endOf(int target) {
        return endOf[target];
    }

    double share(int target, int source) {
        return shares[target][source - firstOf[target]];
    }

    int first() {
        return range(0, firstOf.length)[0];
    }

    int end() {
        return range(0, firstOf.length)[1];
    }

    /** First interval that the targets from..to-1 meet and the one after the last; 0, 0 where they meet none. */
    int[] range(int from, int to) {
        int first = Integer.MAX_VALUE;
        int end = 0;
        for (int t = from; t < to; t++) {
            if (endOf[t] > firstOf[t]) {
                first = Math.min(first, firstOf[t]);
                end = Math.max(end, endOf[t]);
            }
        }
        return end == 0 ? new int[] {0, 0} : new int[] {first, end};
    }
}
