package org.wintersill.io.netcdf;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import org.junit.jupiter.api.Test;
import org.wintersill.problem.ProblemException;

class EvenAxisTest {

    @Test
    void singlePrecisionAxesOfFineGridsAreEven() {
        // 30 seconds of arc around the globe: one unit in the last place of float32 is a five-hundredth of a cell
        double[] values = new double[43200];
        for (int i = 0; i < values.length; i++) {
            values[i] = (float) (-180 + (i + 0.5) / 120);
        }
        EvenAxis axis = EvenAxis.of(values, true, true, "lon");
        assertEquals(1.0 / 120, axis.step(), 1e-9);
    }

    @Test
    void gaussianLatitudesAreUneven() {
        // Source: Gaussian latitudes of N16 (roots of the Legendre polynomial of degree 32), first four
        double[] values = {85.7606, 80.2688, 74.7445, 69.2130};
        assertThrows(ProblemException.class, () -> EvenAxis.of(values, false, false, "lat"));
    }

    @Test
    void longitudesMayJumpOnce() {
        EvenAxis axis = EvenAxis.of(new double[] {358, 359, 0, 1}, false, true, "lon");
        assertEquals(361, axis.largest(), 1e-12);
        EvenAxis west = EvenAxis.of(new double[] {-179, 180, 179}, false, true, "lon");
        assertEquals(-1, west.step(), 1e-12);
    }

    @Test
    void repeatedCoordinateIsRefused() {
        assertThrows(ProblemException.class, () -> EvenAxis.of(new double[] {1, 2, 2, 3}, false, false, "lat"));
        assertThrows(ProblemException.class, () -> EvenAxis.of(new double[] {1, Double.NaN}, false, false, "lat"));
    }
}
