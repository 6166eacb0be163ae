package org.wintersill.comparison;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNull;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.wintersill.grid.Crs;
import org.wintersill.grid.GridGeometry;

class ComparisonTest {
    private static final Crs PLANE = new Crs("EPSG:32630", "plane", "", Crs.Kind.PROJECTED, 1, null);

    /** scipy 1.10 {@code fisher_exact([[k1, n1 - k1], [k2, n2 - k2]])}. */
    @ParameterizedTest
    @CsvSource({"3, 12, 0, 12, 0.21739130434782605", "8, 12, 1, 12, 0.00942253331538565", "0, 20, 0, 20, 1.0",
        "5, 30, 14, 25, 0.0039425402250574067", "12, 12, 0, 12, 7.39602301050679e-07", "2, 7, 5, 9, 0.3575174825174825"})
    void frequenciesAreComparedExactly(int k1, int n1, int k2, int n2, double p) {
        assertEquals(p, new FrequencyTest(60).pValue(k1, n1, k2, n2), 1e-12);
        assertEquals(p, new FrequencyTest(60).pValue(k2, n2, k1, n1), 1e-12);
    }

    @Test
    void cellsAreKeptGainedLostOrNever() {
        assertEquals(RangeChange.KEPT, RangeChange.of(0.1f, 0.1f, 0.1));
        assertEquals(RangeChange.LOST, RangeChange.of(0, 0.2f, 0.1));
        assertEquals(RangeChange.GAINED, RangeChange.of(0.2f, 0.05f, 0.1));
        assertEquals(RangeChange.NEVER, RangeChange.of(0.2f, 0.3f, 0.1));
        assertNull(RangeChange.of(Float.NaN, 0, 0.1));
    }

    @Test
    void theCentroidOfTwoPlacesOnAMeridianLiesBetween() {
        RangeTotals sphere = new RangeTotals(true);
        sphere.add(170, 10, 1, 100);
        sphere.add(-170, 10, 1, 300);
        // On the great circle between the two, a little north of the parallel.
        assertEquals(180, Math.abs(sphere.centroid()[0]), 1e-9);
        assertEquals(Math.toDegrees(Math.atan2(Math.tan(Math.toRadians(10)), Math.cos(Math.toRadians(10)))), sphere.centroid()[1], 1e-9);
        RangeTotals plane = new RangeTotals(false);
        plane.add(0, 0, 1, 10);
        plane.add(30, 60, 2, 40);
        assertArrayEquals(new double[] {20, 40}, plane.centroid(), 1e-12);
        assertEquals(10, plane.height(0.1));
        assertEquals(40, plane.height(0.5));
        assertTrue(Double.isNaN(new RangeTotals(true).height(0.5)));
        assertTrue(Double.isNaN(new RangeTotals(true).centroid()[0]));
    }

    @Test
    void sharesOfTheVarianceOfAnAdditiveTable() {
        double[][][] changes = new double[2][3][2];
        for (int i = 0; i < 2; i++) {
            for (int j = 0; j < 3; j++) {
                for (int m = 0; m < 2; m++) {
                    changes[i][j][m] = 2 * i + 0.5 * j + 0.1 * m;
                }
            }
        }
        double total = 1 + 0.25 * 2.0 / 3 + 0.0025;
        assertArrayEquals(new double[] {1 / total, 0.25 * 2.0 / 3 / total, 0.0025 / total, 0}, ChangeVariance.shares(changes), 1e-12);
        assertTrue(Double.isNaN(ChangeVariance.shares(new double[2][2][1])[0]));
    }

    @Test
    void theLimitLineOfAPlaneIsStraight() {
        GridGeometry grid = new GridGeometry(30, 20, 0, 20, 1, 1, PLANE);
        List<double[]> pieces = new ArrayList<>();
        LimitLine line = new LimitLine(grid, 10.3, (x1, y1, x2, y2) -> pieces.add(new double[] {x1, y1, x2, y2}));
        for (int row = 0; row < 20; row++) {
            float[] values = new float[30];
            for (int column = 0; column < 30; column++) {
                values[column] = (float) (grid.centreX(column) + 0.25 * grid.centreY(row));
            }
            line.row(values, 0);
        }
        double length = 0;
        for (double[] piece : pieces) {
            assertEquals(10.3, piece[0] + 0.25 * piece[1], 1e-5);
            assertEquals(10.3, piece[2] + 0.25 * piece[3], 1e-5);
            length += Math.hypot(piece[2] - piece[0], piece[3] - piece[1]);
        }
        // From the lowest to the highest centre, 19 apart.
        assertEquals(19 * Math.hypot(1, 0.25), length, 1e-4);
    }

    @Test
    void everySideIsLeftAsOftenAsItIsReached() {
        GridGeometry grid = new GridGeometry(40, 40, 0, 40, 1, 1, PLANE);
        java.util.Random random = new java.util.Random(5);
        java.util.Map<String, Integer> ends = new java.util.HashMap<>();
        LimitLine line = new LimitLine(grid, 0.5, (x1, y1, x2, y2) -> {
            ends.merge(x1 + " " + y1, 1, Integer::sum);
            ends.merge(x2 + " " + y2, 1, Integer::sum);
        });
        for (int row = 0; row < 40; row++) {
            float[] values = new float[40];
            for (int column = 0; column < 40; column++) {
                boolean rim = row == 0 || column == 0 || row == 39 || column == 39;
                values[column] = rim ? 1 : random.nextFloat();
            }
            line.row(values, 0);
        }
        assertTrue(ends.size() > 500);
        ends.forEach((place, count) -> assertEquals(2, count, "rings are closed at " + place));
    }
}
