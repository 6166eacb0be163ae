package org.wintersill.parcel;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;

import java.util.List;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import net.jqwik.api.constraints.IntRange;
import net.jqwik.api.constraints.Size;
import org.locationtech.jts.algorithm.locate.IndexedPointInAreaLocator;
import org.locationtech.jts.geom.Coordinate;
import org.locationtech.jts.geom.Location;

/** The mask of cell centres against JTS, point by point. */
class CentreMaskLaws {
    private static final int COLUMNS = 23;
    private static final int ROWS = 17;

    @Property(tries = 200)
    void theMaskHoldsTheCentresThatLieInside(@ForAll long seed, @ForAll @IntRange(min = 3, max = 40) int corners,
                                             @ForAll @DoubleRange(min = 0.2, max = 25) double radius) {
        RandomOutlines random = new RandomOutlines(seed);
        double[] ring = random.star(random.between(-5, COLUMNS + 5), random.between(-5, ROWS + 5), radius, corners);
        CentreMask mask = new CentreMask(COLUMNS, ROWS);
        mask.add(List.of(ring));
        IndexedPointInAreaLocator locator = new IndexedPointInAreaLocator(RandomOutlines.polygon(ring));
        for (int row = 0; row < ROWS; row++) {
            for (int column = 0; column < COLUMNS; column++) {
                int location = locator.locate(new Coordinate(column + 0.5, row + 0.5));
                if (location != Location.BOUNDARY) {
                    assertEquals(location == Location.INTERIOR, mask.inside().get(row * COLUMNS + column), column + ", " + row);
                }
            }
        }
    }

    @Property(tries = 100)
    void neighboursShareNoCellAndLeaveNoneOut(@ForAll @Size(min = 1, max = 6) List<@IntRange(min = 1, max = 45) Integer> halves) {
        CentreMask all = new CentreMask(COLUMNS, ROWS);
        CentreMask one;
        double west = 0;
        for (int half : halves) {
            double east = west + half / 2.0;
            one = new CentreMask(COLUMNS, ROWS);
            one.add(List.of(new double[] {west, 0, east, 0, east, ROWS, west, ROWS, west, 0}));
            assertFalse(one.inside().intersects(all.inside()));
            all.inside().or(one.inside());
            west = east;
        }
        int columns = (int) Math.min(COLUMNS, Math.ceil(west - 0.5));
        assertEquals(columns * ROWS, all.inside().cardinality());
    }
}
