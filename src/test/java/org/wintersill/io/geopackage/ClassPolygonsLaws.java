package org.wintersill.io.geopackage;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Random;
import net.jqwik.api.Arbitraries;
import net.jqwik.api.Arbitrary;
import net.jqwik.api.Combinators;
import net.jqwik.api.Example;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.Provide;
import org.locationtech.jts.algorithm.Orientation;
import org.locationtech.jts.algorithm.locate.IndexedPointInAreaLocator;
import org.locationtech.jts.geom.Coordinate;
import org.locationtech.jts.geom.Location;
import org.locationtech.jts.geom.MultiPolygon;
import org.locationtech.jts.geom.Polygon;
import org.locationtech.jts.operation.valid.IsValidOp;
import org.wintersill.grid.Crs;
import org.wintersill.grid.GridGeometry;

class ClassPolygonsLaws {

    private static final Crs SYSTEM = new Crs("EPSG:3035", "ETRS89-LAEA", "wkt", Crs.Kind.PROJECTED, 1, null);

    /** A raster drawn as text, one digit a cell, rows from the north. */
    private record Raster(int columns, byte[] codes) {
        static Raster of(String... rows) {
            byte[] codes = new byte[rows.length * rows[0].length()];
            for (int i = 0; i < codes.length; i++) {
                codes[i] = (byte) (rows[i / rows[0].length()].charAt(i % rows[0].length()) - '0');
            }
            return new Raster(rows[0].length(), codes);
        }

        GridGeometry grid() {
            return new GridGeometry(columns, codes.length / columns, 4_321_000.5, 3_210_000.25, 100, 50, SYSTEM);
        }
    }

    @Provide
    Arbitrary<Raster> rasters() {
        return Combinators.combine(Arbitraries.integers().between(1, 14), Arbitraries.integers().between(1, 14),
                Arbitraries.integers().between(1, 4), Arbitraries.longs()).as((columns, rows, classes, seed) -> {
                    Random random = new Random(seed);
                    byte[] codes = new byte[columns * rows];
                    for (int i = 0; i < codes.length; i++) {
                        codes[i] = (byte) random.nextInt(classes + 1);
                    }
                    return new Raster(columns, codes);
                });
    }

    @Property(tries = 400)
    void polygonsAreValidAndCoverExactlyTheirCells(@ForAll("rasters") Raster raster) {
        check(raster);
    }

    @Property(tries = 20)
    void largeNoiseIsValidToo(@ForAll long seed) {
        Random random = new Random(seed);
        byte[] codes = new byte[120 * 90];
        for (int i = 0; i < codes.length; i++) {
            codes[i] = (byte) (random.nextInt(5) < 3 ? 1 : 2);
        }
        check(new Raster(120, codes));
    }

    @Example
    void oneCellIsASquare() {
        ClassPolygons polygons = new ClassPolygons(Raster.of("1").grid(), new byte[] {1});
        assertEquals("MULTIPOLYGON (((4321000.5 3210000.25, 4321000.5 3209950.25, 4321100.5 3209950.25, "
                + "4321100.5 3210000.25, 4321000.5 3210000.25)))", polygons.dissolve(1).toText());
        assertTrue(polygons.dissolve(2).isEmpty());
        check(Raster.of("1"));
    }

    @Example
    void aSingleRowAndASingleColumnWork() {
        check(Raster.of("1122011"));
        check(Raster.of("1", "1", "2", "0", "1"));
    }

    @Example
    void classesAboveOneHundredTwentySevenAreUnsigned() {
        ClassPolygons polygons = new ClassPolygons(Raster.of("11").grid(), new byte[] {(byte) 255, 1});
        assertArrayEquals(new int[] {1, 255}, polygons.classes());
        assertEquals(1, polygons.dissolve(255).getNumGeometries());
    }

    @Example
    void aCheckerboardIsOnePolygonACell() {
        Raster board = Raster.of("1212", "2121", "1212");
        check(board);
        assertEquals(6, new ClassPolygons(board.grid(), board.codes()).dissolve(1).getNumGeometries());
    }

    @Example
    void nestedRingsAreShellsInHoles() {
        Raster nested = Raster.of(
                "1111111",
                "1222221",
                "1211121",
                "1210121",
                "1211121",
                "1222221",
                "1111111");
        check(nested);
        MultiPolygon ones = new ClassPolygons(nested.grid(), nested.codes()).dissolve(1);
        assertEquals(2, ones.getNumGeometries());
        assertEquals(1, ((Polygon) ones.getGeometryN(0)).getNumInteriorRing());
        assertEquals(1, ((Polygon) ones.getGeometryN(1)).getNumInteriorRing());
    }

    @Example
    void aRingClosedByACornerIsAShellWithATouchingHole() {
        Raster pinched = Raster.of(
                "1110",
                "1010",
                "1101",
                "0111");
        check(pinched);
        Raster closed = Raster.of(
                "111",
                "101",
                "110");
        check(closed);
        Polygon only = (Polygon) new ClassPolygons(closed.grid(), closed.codes()).dissolve(1).getGeometryN(0);
        assertEquals(1, only.getNumInteriorRing());
        Raster chain = Raster.of(
                "11111",
                "10111",
                "11011",
                "11101",
                "11111");
        check(chain);
        Polygon chained = (Polygon) new ClassPolygons(chain.grid(), chain.codes()).dissolve(1).getGeometryN(0);
        assertEquals(3, chained.getNumInteriorRing());
    }

    @Example
    void straightLinesHaveNoCornersInside() {
        Raster block = Raster.of("1111", "1111", "1111");
        assertEquals(5, new ClassPolygons(block.grid(), block.codes()).dissolve(1).getNumPoints());
    }

    @Example
    void partsAreNumberedFromTheNorthWest() {
        Raster raster = Raster.of("1021", "1001", "0220");
        ClassPolygons polygons = new ClassPolygons(raster.grid(), raster.codes());
        assertEquals(4, polygons.partCount());
        StringBuilder seen = new StringBuilder();
        polygons.parts(1, (part, polygon) -> seen.append(part).append(':').append(polygons.cells(part)).append(' '));
        polygons.parts(2, (part, polygon) -> seen.append(part).append(':').append(polygons.cells(part)).append(' '));
        assertEquals("1:2 3:2 2:1 4:2 ", seen.toString());
    }

    /** Every promise of the class, on one raster. */
    private static void check(Raster raster) {
        GridGeometry grid = raster.grid();
        ClassPolygons polygons = new ClassPolygons(grid, raster.codes());
        double cellArea = grid.cellWidth() * grid.cellHeight();
        for (int code = 1; code <= 4; code++) {
            MultiPolygon dissolved = polygons.dissolve(code);
            IsValidOp valid = new IsValidOp(dissolved);
            assertTrue(valid.isValid(), () -> valid.getValidationError() + "\n" + dissolved);
            int cells = 0;
            for (byte value : raster.codes()) {
                cells += value == code ? 1 : 0;
            }
            assertEquals(cells * cellArea, dissolved.getArea(), 1e-6 * cellArea * Math.max(1, cells));
            if (cells > 0) {
                IndexedPointInAreaLocator locator = new IndexedPointInAreaLocator(dissolved);
                for (int row = 0; row < grid.rows(); row++) {
                    for (int column = 0; column < grid.columns(); column++) {
                        int place = locator.locate(new Coordinate(grid.centreX(column), grid.centreY(row)));
                        boolean mine = raster.codes()[row * grid.columns() + column] == code;
                        assertEquals(mine ? Location.INTERIOR : Location.EXTERIOR, place);
                    }
                }
            }
            polygons.parts(code, (part, polygon) -> {
                assertEquals(polygons.cells(part) * cellArea, polygon.getArea(), 1e-6 * cellArea * polygons.cells(part));
                assertTrue(Orientation.isCCW(polygon.getExteriorRing().getCoordinateSequence()));
                for (int hole = 0; hole < polygon.getNumInteriorRing(); hole++) {
                    assertTrue(!Orientation.isCCW(polygon.getInteriorRingN(hole).getCoordinateSequence()));
                }
            });
        }
    }
}
