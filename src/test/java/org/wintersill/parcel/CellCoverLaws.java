package org.wintersill.parcel;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import net.jqwik.api.Example;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import net.jqwik.api.constraints.IntRange;
import net.jqwik.api.constraints.Scale;
import org.locationtech.jts.geom.Envelope;
import org.locationtech.jts.geom.Geometry;
import org.locationtech.jts.geom.GeometryFactory;
import org.wintersill.grid.CoordinateOperation;
import org.wintersill.grid.Crs;
import org.wintersill.grid.CoordinateOperations;
import org.wintersill.grid.GridGeometry;
import org.wintersill.io.crs.CellAreas;
import org.wintersill.io.crs.GeoToolsCrs;

/** Covered parts of cells against JTS intersections and against points thrown at random. */
class CellCoverLaws {
    private static final int COLUMNS = 19;
    private static final int ROWS = 13;
    private static final GeoToolsCrs SYSTEMS = new GeoToolsCrs();

    /** A shell and, where it is large enough, a hole, in rows that grow downwards. */
    private static List<double[]> rings(RandomOutlines random, double radius, int corners, boolean hole) {
        double x = random.between(-4, COLUMNS + 4);
        double y = random.between(-4, ROWS + 4);
        List<double[]> rings = new ArrayList<>(List.of(down(random.star(x, y, radius, corners))));
        if (hole && corners >= 8) {
            rings.add(random.star(x, y, radius * 0.1, 5));
        }
        return rings;
    }

    /** Shells run the other way where y grows downwards. */
    private static double[] down(double[] ring) {
        double[] turned = new double[ring.length];
        for (int i = 0; i < ring.length; i += 2) {
            turned[i] = ring[ring.length - 2 - i];
            turned[i + 1] = ring[ring.length - 1 - i];
        }
        return turned;
    }

    private static double[] shares(List<double[]> rings, int columns, int rows) {
        double[] shares = new double[columns * rows];
        int[] before = {-1};
        new CellCover(columns, rows).find(rings, (row, column, length, share) -> {
            int from = row * columns + column;
            assertTrue(from > before[0] && column >= 0 && column + length <= columns && row >= 0 && row < rows, "runs come in order");
            before[0] = from + length - 1;
            Arrays.fill(shares, from, from + length, share);
        });
        return shares;
    }

    private static Geometry geometry(List<double[]> rings) {
        Geometry area = RandomOutlines.polygon(rings.get(0));
        for (double[] hole : rings.subList(1, rings.size())) {
            area = area.difference(RandomOutlines.polygon(hole));
        }
        return area;
    }

    private static double intersection(Geometry area, double west, double north, double east, double south) {
        return new GeometryFactory().toGeometry(new Envelope(west, east, Math.min(north, south), Math.max(north, south))).intersection(area).getArea();
    }

    @Property(tries = 150)
    void everyShareIsTheAreaOfTheIntersection(@ForAll long seed, @ForAll @IntRange(min = 3, max = 60) int corners,
                                              @ForAll @Scale(4) @DoubleRange(min = 0.001, max = 20) double radius, @ForAll boolean hole) {
        List<double[]> rings = rings(new RandomOutlines(seed), radius, corners, hole);
        Geometry area = geometry(rings);
        double[] shares = shares(rings, COLUMNS, ROWS);
        double total = 0;
        for (int cell = 0; cell < shares.length; cell++) {
            int column = cell % COLUMNS;
            int row = cell / COLUMNS;
            double expected = intersection(area, column, row, column + 1, row + 1);
            assertEquals(expected, shares[cell], 1e-9, "cell " + column + ", " + row);
            total += shares[cell];
        }
        assertEquals(intersection(area, 0, 0, COLUMNS, ROWS), total, 1e-8);
    }

    @Property(tries = 20)
    void sharesAreThoseOfPointsThrownAtRandom(@ForAll long seed, @ForAll @IntRange(min = 3, max = 12) int corners) {
        RandomOutlines random = new RandomOutlines(seed);
        List<double[]> rings = rings(random, 4, corners, true);
        double[] shares = shares(rings, COLUMNS, ROWS);
        int[] hits = new int[shares.length];
        int points = 40_000;
        CentreMask fine = new CentreMask(COLUMNS * 40, ROWS * 40);
        fine.add(rings.stream().map(ring -> Arrays.stream(ring).map(v -> v * 40).toArray()).toList());
        for (int i = 0; i < points; i++) {
            int column = (int) random.between(0, COLUMNS * 40);
            int row = (int) random.between(0, ROWS * 40);
            hits[row / 40 * COLUMNS + column / 40] += fine.inside().get(row * COLUMNS * 40 + column) ? 1 : 0;
        }
        double perCell = (double) points / shares.length;
        for (int cell = 0; cell < shares.length; cell++) {
            assertEquals(shares[cell], hits[cell] / perCell, 6 * Math.sqrt(0.5 / perCell) + 0.02);
        }
    }

    @Example
    void aSquareOnTheBordersOfCellsCoversThemWholeAndNoOthers() {
        double[] shares = shares(List.of(down(new double[] {2, 3, 5, 3, 5, 7, 2, 7, 2, 3})), COLUMNS, ROWS);
        for (int cell = 0; cell < shares.length; cell++) {
            boolean inside = cell % COLUMNS >= 2 && cell % COLUMNS < 5 && cell / COLUMNS >= 3 && cell / COLUMNS < 7;
            assertEquals(inside ? 1 : 0, shares[cell]);
        }
    }

    private static OutlinePlacement placement(GridGeometry grid, CoordinateOperation toGrid) {
        return new OutlinePlacement(grid, toGrid, CellAreas.areaNorthward(grid.crs()));
    }

    /** On the globe the share is one of areas on the ellipsoid, and the parts of a parcel add up to its own area. */
    @Property(tries = 60)
    void areasOnTheEllipsoidAddUp(@ForAll long seed, @ForAll @IntRange(min = 3, max = 30) int corners,
                                  @ForAll @DoubleRange(min = 0.01, max = 3) double radius, @ForAll @DoubleRange(min = -70, max = 70) double latitude) {
        GridGeometry grid = new GridGeometry(100, 80, -10, latitude + 8, 0.2, 0.2, SYSTEMS.wgs84());
        RandomOutlines random = new RandomOutlines(seed);
        Outline outline = new Outline(List.of(random.star(0, latitude, radius, corners)));
        CoveredCells cells = new CoveredCells(placement(grid, CoordinateOperation.identity()), 32);
        CoveredCells.Extent extent = cells.add(outline);
        assertEquals(extent.areaKm2(), extent.onGridKm2(), extent.areaKm2() * 1e-4 + OutlinePlacement.TOLERANCE * 4 * Math.PI * radius / 0.2 * 500);
        // A strip of a tenth of the cells' height, by the area of its own.
        GridGeometry fine = new GridGeometry(1000, 800, -10, latitude + 8, 0.02, 0.02, SYSTEMS.wgs84());
        CoveredCells.Extent again = new CoveredCells(placement(fine, CoordinateOperation.identity()), 32).add(outline);
        assertEquals(again.areaKm2(), extent.areaKm2(), OutlinePlacement.TOLERANCE * 4 * Math.PI * radius / 0.2 * 500);
    }

    /** Half of the area of a high, wide cell lies nearer to the equator. */
    @Example
    void theShareOfHalfACellIsMoreThanHalfOnItsEquatorSide() {
        GridGeometry grid = new GridGeometry(1, 1, 0, 60, 10, 10, SYSTEMS.wgs84());
        double[] half = {0, 50, 10, 50, 10, 55, 0, 55, 0, 50};
        double[] share = new double[1];
        new CellCover(1, 1).find(placement(grid, CoordinateOperation.identity()).place(new Outline(List.of(half))).rings(),
                (row, column, length, part) -> share[0] = part);
        double e = Math.sqrt(0.00669437999014);
        double expected = (q(55, e) - q(50, e)) / (q(60, e) - q(50, e));
        assertTrue(share[0] > 0.53);
        assertEquals(expected, share[0], 1e-9);
    }

    /** Snyder 1987, equation 3-12. */
    private static double q(double latitude, double e) {
        double s = Math.sin(Math.toRadians(latitude));
        return (1 - e * e) * (s / (1 - e * e * s * s) - Math.log((1 - e * s) / (1 + e * s)) / (2 * e));
    }

    /** An edge that is straight in one system bends in the other; its image must be followed, not its chord. */
    @Example
    void longEdgesAreDividedBeforeTheyAreTransformed() {
        Crs laea = SYSTEMS.fromCode("EPSG:3035");
        CoordinateOperations operations = SYSTEMS;
        GridGeometry grid = new GridGeometry(300, 300, 3000000, 4000000, 5000, 5000, laea);
        double[] band = {0, 50, 15, 50, 15, 51, 0, 51, 0, 50};
        double[] dense = new double[2 * 4001];
        for (int i = 0; i <= 4000; i++) {
            int edge = Math.min(3, i / 1000);
            double along = i / 1000.0 - edge;
            dense[2 * i] = band[2 * edge] + along * (band[2 * edge + 2] - band[2 * edge]);
            dense[2 * i + 1] = band[2 * edge + 1] + along * (band[2 * edge + 3] - band[2 * edge + 1]);
        }
        OutlinePlacement placement = placement(grid, operations.between(SYSTEMS.wgs84(), laea));
        double[] coarse = shares(placement.place(new Outline(List.of(band))).rings(), 300, 300);
        double[] fine = shares(placement.place(new Outline(List.of(dense))).rings(), 300, 300);
        double covered = 0;
        for (int cell = 0; cell < fine.length; cell++) {
            assertEquals(fine[cell], coarse[cell], 5e-4, "cell " + cell);
            covered += fine[cell];
        }
        assertTrue(covered > 1000, "covers " + covered + " cells");
    }

    @Example
    void aParcelSmallerThanRoundingLiesInItsCell() {
        GridGeometry grid = new GridGeometry(4000, 4000, 0, 50, 0.01, 0.01, SYSTEMS.wgs84());
        double x = 17.4567;
        double y = 33.3333;
        double d = 1e-9;
        CoveredCells cells = new CoveredCells(placement(grid, CoordinateOperation.identity()), 256);
        CoveredCells.Extent extent = cells.add(new Outline(List.of(new double[] {x, y, x + d, y, x + d, y + d, x, y + d, x, y})));
        assertEquals(1, extent.cells());
        cells.sortByTile();
        List<Integer> found = new ArrayList<>();
        for (int tile = 0; tile < cells.tiles(); tile++) {
            int number = tile;
            cells.eachRun(tile, (parcel, from, count, weight) -> found.add((cells.block(number).row() + from / cells.block(number).columns()) * 4000
                    + cells.block(number).column() + from % cells.block(number).columns()));
        }
        assertEquals(List.of(grid.rowAt(y) * 4000 + grid.columnAt(x)), found);
    }

    @Example
    void theSeamOfAGlobalGridIsNoBorder() {
        GridGeometry grid = new GridGeometry(360, 180, -180, 90, 1, 1, SYSTEMS.wgs84());
        double[] ring = {179, 10, 181, 10, 181, 11, 179, 11, 179, 10};
        double[] shares = shares(placement(grid, CoordinateOperation.identity()).place(new Outline(List.of(ring))).rings(), 360, 180);
        assertEquals(1, shares[79 * 360 + 359], 1e-9);
        assertEquals(1, shares[79 * 360], 1e-9);
        assertEquals(2, Arrays.stream(shares).sum(), 1e-9);
    }

    @Example
    void meansOfAParcelAreThoseOfItsCells() {
        GridGeometry grid = new GridGeometry(10, 10, 0, 10, 1, 1, SYSTEMS.fromCode("EPSG:32632"));
        CoveredCells cells = new CoveredCells(placement(grid, CoordinateOperation.identity()), 4);
        cells.add(new Outline(List.of(new double[] {3.5, 5, 5, 5, 5, 6, 3.5, 6, 3.5, 5})));
        cells.add(Outline.EMPTY);
        cells.add(new Outline(List.of(new double[] {20, 20, 21, 20, 21, 21, 20, 20})));
        cells.sortByTile();
        LayerTotals totals = new LayerTotals(3);
        ClassTotals classes = new ClassTotals(3, 99);
        for (int tile = 0; tile < cells.tiles(); tile++) {
            float[] values = new float[cells.block(tile).cells()];
            for (int i = 0; i < values.length; i++) {
                int column = cells.block(tile).column() + i % cells.block(tile).columns();
                values[i] = (cells.block(tile).row() + i / cells.block(tile).columns()) * 10 + column;
            }
            totals.add(cells, tile, values);
            classes.add(cells, tile, values);
        }
        assertEquals((0.5 * 43 + 44) / 1.5, totals.mean(0), 1e-6);
        assertEquals(43, totals.lowest(0));
        assertEquals(44, totals.highest(0));
        assertEquals(1.0 / 3, classes.share(0, 43), 1e-6);
        assertEquals(1.5e-6, totals.weight(0), 1e-12);
        for (int parcel = 1; parcel < 3; parcel++) {
            assertTrue(Double.isNaN(totals.mean(parcel)) && Double.isNaN(classes.share(parcel, 43)));
        }
    }
}
