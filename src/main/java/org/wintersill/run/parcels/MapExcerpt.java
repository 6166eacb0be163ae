package org.wintersill.run.parcels;

import java.util.Base64;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import org.wintersill.grid.Block;
import org.wintersill.grid.Crs;
import org.wintersill.grid.GridGeometry;
import org.wintersill.io.chart.PngBytes;
import org.wintersill.io.geotiff.read.PlainRaster;
import org.wintersill.layer.Colour;
import org.wintersill.layer.LayerStyle;

/**
 * A piece of a layer around a parcel as SVG: the cells as a picture inside of it, one point a cell, the outline over them, a scale.
 * North is up.
 */
final class MapExcerpt {
    private static final double WIDTH = 420;
    private static final double HEIGHT = 340;
    private static final int AROUND = 4;
    private static final double AROUND_SHARE = 0.35;
    /** Cells along a side of the picture; larger parcels are shown by every so many cells. */
    private static final int MOST_CELLS = 400;
    private static final double METRES_PER_DEGREE = 111_195;
    private static final int NO_VALUE = 0xffffff;

    private final GridGeometry grid;
    private final List<double[]> rings;
    /** Edges of what is shown, in columns and rows; may reach beyond the grid. */
    private final double left;
    private final double top;
    private final double columns;
    private final double rows;
    private final Block block;

    /** @param rings positions of the parcel's outline in columns and rows, one at least of them on the grid */
    MapExcerpt(GridGeometry grid, List<double[]> rings) {
        this.grid = grid;
        this.rings = rings;
        double west = Double.POSITIVE_INFINITY;
        double east = Double.NEGATIVE_INFINITY;
        double north = Double.POSITIVE_INFINITY;
        double south = Double.NEGATIVE_INFINITY;
        for (double[] ring : rings) {
            for (int i = 0; i < ring.length; i += 2) {
                west = Math.min(west, ring[i]);
                east = Math.max(east, ring[i]);
                north = Math.min(north, ring[i + 1]);
                south = Math.max(south, ring[i + 1]);
            }
        }
        double around = AROUND + AROUND_SHARE * Math.max(east - west, south - north);
        left = Math.floor(west - around);
        top = Math.floor(north - around);
        columns = Math.ceil(east + around) - left;
        rows = Math.ceil(south + around) - top;
        int firstColumn = clamp(left, grid.columns() - 1);
        int firstRow = clamp(top, grid.rows() - 1);
        block = new Block(firstColumn, firstRow, clamp(left + columns - 1, grid.columns() - 1) - firstColumn + 1,
                clamp(top + rows - 1, grid.rows() - 1) - firstRow + 1);
    }

    private static int clamp(double position, int last) {
        return (int) Math.max(0, Math.min(last, position));
    }

    /** The picture as an {@code <svg>} element. */
    String svg(PlainRaster raster, LayerStyle.Ramp ramp, String title) {
        double ratio = widthToHeight();
        double scale = Math.min(WIDTH / (columns * ratio), HEIGHT / rows);
        double width = columns * ratio * scale;
        double height = rows * scale;
        StringBuilder svg = new StringBuilder(String.format(Locale.ROOT, "<svg xmlns=\"http://www.w3.org/2000/svg\" width=\"%.0f\" height=\"%.0f\" "
                + "viewBox=\"0 0 %.2f %.2f\" role=\"img\" aria-label=\"%s\">%n<rect width=\"100%%\" height=\"100%%\" fill=\"#ffffff\"/>%n", width, height,
                width, height, PageText.escaped(title)));
        svg.append(String.format(Locale.ROOT, "<image x=\"%.2f\" y=\"%.2f\" width=\"%.2f\" height=\"%.2f\" preserveAspectRatio=\"none\" "
                + "style=\"image-rendering:pixelated\" href=\"data:image/png;base64,%s\"/>%n", (block.column() - left) * ratio * scale,
                (block.row() - top) * scale, block.columns() * ratio * scale, block.rows() * scale, picture(raster, ramp)));
        StringBuilder path = new StringBuilder();
        for (double[] ring : rings) {
            for (int i = 0; i < ring.length; i += 2) {
                path.append(String.format(Locale.ROOT, "%s%.2f %.2f", i == 0 ? "M" : "L", (ring[i] - left) * ratio * scale,
                        (ring[i + 1] - top) * scale));
            }
            path.append('Z');
        }
        svg.append("<path d=\"").append(path).append("\" fill=\"none\" stroke=\"#ffffff\" stroke-width=\"4\" stroke-linejoin=\"round\"/>\n");
        svg.append("<path d=\"").append(path).append("\" fill=\"none\" stroke=\"#15141a\" stroke-width=\"1.6\" stroke-linejoin=\"round\"/>\n");
        scaleBar(svg, height, scale / rowMetres());
        return svg.append("</svg>\n").toString().replace("\r\n", "\n");
    }

    private double middleLatitude() {
        return grid.crs().angular() ? grid.north() - (top + rows / 2) * grid.cellHeight() : 0;
    }

    /** Width of a cell over its height, on the ground. */
    private double widthToHeight() {
        return grid.cellWidth() / grid.cellHeight() * Math.max(0.05, Math.cos(Math.toRadians(middleLatitude())));
    }

    private double rowMetres() {
        return grid.cellHeight() * (grid.crs().kind() == Crs.Kind.PROJECTED ? grid.crs().metresPerUnit() : METRES_PER_DEGREE);
    }

    private static void scaleBar(StringBuilder svg, double height, double pixelsPerMetre) {
        double metres = Math.pow(10, Math.floor(Math.log10(120 / pixelsPerMetre)));
        metres *= 120 / pixelsPerMetre / metres >= 5 ? 5 : 120 / pixelsPerMetre / metres >= 2 ? 2 : 1;
        double length = metres * pixelsPerMetre;
        String label = metres >= 1000 ? String.format(Locale.ROOT, "%.0f km", metres / 1000) : String.format(Locale.ROOT, "%.0f m", metres);
        svg.append(String.format(Locale.ROOT, "<rect x=\"8\" y=\"%.2f\" width=\"%.2f\" height=\"24\" fill=\"#fdfcf8\" fill-opacity=\"0.85\"/>%n"
                        + "<path d=\"M14 %.2fv5h%.2fv-5\" fill=\"none\" stroke=\"#15141a\" stroke-width=\"1.4\"/>%n"
                        + "<text x=\"%.2f\" y=\"%.2f\" font-size=\"11\" font-family=\"Helvetica, Arial, sans-serif\" fill=\"#15141a\">%s</text>%n",
                height - 32, length + 62, height - 21, length, length + 20, height - 15, label));
    }

    private String picture(PlainRaster raster, LayerStyle.Ramp ramp) {
        int step = Math.max(1, (Math.max(block.columns(), block.rows()) + MOST_CELLS - 1) / MOST_CELLS);
        int across = (block.columns() + step - 1) / step;
        int down = (block.rows() + step - 1) / step;
        int[] rgb = new int[across * down];
        float[] values = new float[block.columns()];
        for (int row = 0; row < down; row++) {
            raster.read(0, new Block(block.column(), block.row() + row * step, block.columns(), 1), values);
            for (int column = 0; column < across; column++) {
                rgb[row * across + column] = colour(ramp, values[column * step]);
            }
        }
        return Base64.getEncoder().encodeToString(PngBytes.of(across, down, rgb, Map.of()));
    }

    /** Colour between the stops of a ramp, mixed by share; white without a value. */
    static int colour(LayerStyle.Ramp ramp, double value) {
        if (Double.isNaN(value)) {
            return NO_VALUE;
        }
        List<LayerStyle.Stop> stops = ramp.stops();
        int upper = 1;
        while (upper < stops.size() - 1 && stops.get(upper).value() < value) {
            upper++;
        }
        LayerStyle.Stop a = stops.get(upper - 1);
        LayerStyle.Stop b = stops.get(upper);
        double share = Math.max(0, Math.min(1, (value - a.value()) / (b.value() - a.value())));
        return mixed(a.colour(), b.colour(), share);
    }

    private static int mixed(Colour a, Colour b, double share) {
        long red = Math.round(a.red() + share * (b.red() - a.red()));
        long green = Math.round(a.green() + share * (b.green() - a.green()));
        long blue = Math.round(a.blue() + share * (b.blue() - a.blue()));
        return (int) (red << 16 | green << 8 | blue);
    }
}
