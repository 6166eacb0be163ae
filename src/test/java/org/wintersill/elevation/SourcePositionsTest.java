package org.wintersill.elevation;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import org.wintersill.grid.Block;
import org.wintersill.grid.CoordinateOperation;
import org.wintersill.grid.Crs;
import org.wintersill.grid.GridGeometry;

/** Where target cells lie in the source: a longitude is the same place one turn further, and a part keeps its positions. */
class SourcePositionsTest {
    private static final Crs CRS = new Crs("EPSG:4326", "WGS 84", "", Crs.Kind.GEOGRAPHIC, 1, null);

    @Test
    void aSourceBeyondTheDateLineIsFoundFromEitherSide() {
        GridGeometry source = new GridGeometry(20, 4, 170, 2, 1, 1, CRS);
        GridGeometry target = new GridGeometry(4, 2, -179, 1, 0.5, 0.5, CRS);
        SourcePositions positions = new SourcePositions(source, target, CoordinateOperation.identity());
        // Centre -178.75 is 181.25: cell 11 of the source, a quarter of a cell west of its centre 181.5.
        assertEquals(1 * 20 + 11, positions.containing(0, 0));
        assertEquals(10, positions.west(0, 0));
        assertEquals(0.75, positions.eastWeight(0, 0), 1e-6);
        assertFalse(positions.isSeparable());
    }

    @Test
    void aWholeGlobeHasNoSeamForATargetAcrossIt() {
        GridGeometry source = new GridGeometry(72, 4, -182.5, 10, 5, 5, CRS);
        GridGeometry target = new GridGeometry(8, 2, 176, 4, 0.5, 0.5, CRS);
        SourcePositions positions = new SourcePositions(source, target, CoordinateOperation.identity());
        for (int column = 0; column < 8; column++) {
            assertTrue(positions.containing(0, column) >= 0, "column " + column);
        }
    }

    @Test
    void aPartOfTheSourceKeepsThePositions() {
        GridGeometry source = new GridGeometry(30, 20, 0, 20, 1, 1, CRS);
        GridGeometry target = new GridGeometry(10, 8, 11.3, 9.4, 0.25, 0.25, CRS);
        for (boolean same : new boolean[] {true, false}) {
            CoordinateOperation operation = same ? CoordinateOperation.identity() : (xy, points) -> { };
            SourcePositions whole = new SourcePositions(source, target, operation);
            Block window = whole.window().orElseThrow();
            SourcePositions part = whole.within(window);
            for (int row = 0; row < 8; row++) {
                for (int column = 0; column < 10; column++) {
                    assertEquals(whole.west(row, column) - window.column(), part.west(row, column));
                    assertEquals(whole.north(row, column) - window.row(), part.north(row, column));
                    int cell = whole.containing(row, column);
                    assertEquals((cell / 30 - window.row()) * window.columns() + cell % 30 - window.column(),
                            part.containing(row, column));
                }
            }
        }
    }

    @Test
    void aTargetElsewhereNeedsNoPart() {
        GridGeometry source = new GridGeometry(3, 3, 0, 3, 1, 1, CRS);
        GridGeometry target = new GridGeometry(2, 2, 50, 3, 1, 1, CRS);
        assertTrue(new SourcePositions(source, target, CoordinateOperation.identity()).window().isEmpty());
    }
}
