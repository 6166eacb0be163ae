package org.wintersill.io.netcdf;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.IntRange;
import org.wintersill.grid.Crs;
import org.wintersill.grid.GridGeometry;

/** However a file turns its map, the value of a place stays at the place. */
class GridPlacementLaws {
    private static final Crs WGS84 = new Crs("EPSG:4326", "WGS 84", "GEOGCS", Crs.Kind.GEOGRAPHIC, 1, null);

    /** A file without time whose value is a function of longitude (modulo 360) and latitude. */
    private record Field(double firstX, double stepX, double firstY, double stepY) implements Slabs {
        static float value(double x, double y) {
            double turned = x - 360 * Math.floor((x + 180) / 360 + 1e-9);
            return (float) (Math.rint(turned * 100) + Math.rint(y * 100) / 1e5);
        }

        @Override
        public long copy(Box box, float[] out, int base, int recordStep, int rowStep, int columnStep) {
            for (int j = 0; j < box.rows(); j++) {
                for (int i = 0; i < box.columns(); i++) {
                    out[base + j * rowStep + i * columnStep] = value(firstX + (box.column() + i) * stepX,
                            firstY + (box.row() + j) * stepY);
                }
            }
            return 0;
        }

        @Override
        public void close() {
            // nothing is open
        }
    }

    @Property(tries = 300)
    void placesKeepTheirValues(@ForAll @IntRange(min = 2, max = 40) int columns, @ForAll @IntRange(min = 2, max = 9) int rows,
                               @ForAll @IntRange(min = -400, max = 400) int west, @ForAll boolean around,
                               @ForAll boolean southUp, @ForAll boolean eastFirst) {
        double step = around ? 360.0 / columns : 4;
        double firstX = west + step / 2;
        double lastX = firstX + (columns - 1) * step;
        double firstY = southUp ? 10 : 10 + (rows - 1) * 5;
        EvenAxis x = new EvenAxis(eastFirst ? lastX : firstX, eastFirst ? -step : step, columns);
        EvenAxis y = new EvenAxis(firstY, southUp ? 5 : -5, rows);
        GridPlacement placement = GridPlacement.of(x, y, WGS84);
        GridGeometry grid = placement.grid();
        assertTrue(grid.centreX(0) >= -180 - 1e-6 && grid.centreX(0) < 180, grid.describe());
        float[] out = new float[(int) grid.cells()];
        placement.copy(new Field(x.first(), x.step(), y.first(), y.step()), 0, 1, grid.whole(), out, 0, 0);
        for (int row = 0; row < rows; row++) {
            for (int column = 0; column < columns; column++) {
                assertEquals(Field.value(grid.centreX(column), grid.centreY(row)), out[row * columns + column], 0.02f,
                        grid.describe());
            }
        }
    }
}
