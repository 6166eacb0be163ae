package org.wintersill.io.crs;

import static org.junit.jupiter.api.Assertions.assertEquals;

import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import org.wintersill.grid.Crs;

class PoleRotationLaws {

    @Property(tries = 500)
    void turningForthAndBackChangesNothing(@ForAll @DoubleRange(min = -89, max = 89) double poleLatitude,
                                           @ForAll @DoubleRange(min = -180, max = 180) double poleLongitude,
                                           @ForAll @DoubleRange(min = -180, max = 180) double gridLongitude,
                                           @ForAll @DoubleRange(min = -179.9, max = 179.9) double longitude,
                                           @ForAll @DoubleRange(min = -89.9, max = 89.9) double latitude) {
        PoleRotation rotation = new PoleRotation(new Crs.RotatedPole(poleLatitude, poleLongitude, gridLongitude));
        double[] xy = {longitude, latitude};
        rotation.toRotated(xy, 0);
        rotation.toTrue(xy, 0);
        assertEquals(0, Math.IEEEremainder(longitude - xy[0], 360) * Math.cos(Math.toRadians(latitude)), 1e-7);
        assertEquals(latitude, xy[1], 1e-7);
    }
}
