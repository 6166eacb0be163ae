package org.wintersill.io.chart;

import java.util.ArrayList;
import java.util.List;
import org.wintersill.io.chart.Pen.Anchor;

/** The labelled marks of a panel, in rows that end at the right edge, beside the heading and under it. */
final class Legend {
    private static final double SIZE = 11.5;
    private static final double SWATCH = 22;
    private static final double GAP = 16;

    private record Item(Mark mark, String text, double width) {
    }

    private final List<List<Item>> rows = new ArrayList<>();
    private final double right;

    /** @param taken width that the heading takes in the first row */
    Legend(List<Mark> marks, double taken, double left, double right) {
        this.right = right;
        double room = right - left;
        rows.add(new ArrayList<>());
        double used = taken + GAP;
        for (Mark mark : marks) {
            if (mark.label().isEmpty()) {
                continue;
            }
            String text = ChartText.cut(ChartText.clean(mark.label()), SIZE, room / 2);
            double width = SWATCH + 6 + ChartText.width(text, SIZE) + GAP;
            if (used + width > room && used > 0) {
                rows.add(new ArrayList<>());
                used = 0;
            }
            rows.get(rows.size() - 1).add(new Item(mark, text, width));
            used += width;
        }
    }

    int lines() {
        return rows.size();
    }

    /** @param y base line of the first row */
    void draw(Pen pen, double y, double step) {
        for (int row = 0; row < rows.size(); row++) {
            double x = right + GAP - rows.get(row).stream().mapToDouble(Item::width).sum();
            for (Item item : rows.get(row)) {
                swatch(pen, item.mark(), x, y + row * step - 4);
                pen.text(item.text(), x + SWATCH + 6, y + row * step, Drawing.letters(SIZE, Anchor.START));
                x += item.width();
            }
        }
    }

    private static void swatch(Pen pen, Mark mark, double x, double y) {
        double middle = x + SWATCH / 2;
        if (mark instanceof Mark.Line line) {
            pen.line(new double[] {x, x + SWATCH}, new double[] {y, y}, line.colour(), line.stroke().width(), line.stroke().dashed());
        } else if (mark instanceof Mark.Rule rule) {
            pen.line(new double[] {x, x + SWATCH}, new double[] {y, y}, rule.colour(), rule.stroke().width(), rule.stroke().dashed());
        } else if (mark instanceof Mark.Band band) {
            MarkDrawing.block(pen, x, x + SWATCH, y - 5, y + 5, band.colour(), MarkDrawing.BAND_OPACITY);
        } else if (mark instanceof Mark.Zone zone) {
            MarkDrawing.block(pen, x, x + SWATCH, y - 5, y + 5, zone.colour(), MarkDrawing.ZONE_OPACITY);
        } else if (mark instanceof Mark.Drops drops) {
            MarkDrawing.drop(pen, new double[] {middle - 4}, y + 1, new double[] {y - 6}, drops.above(), false);
            MarkDrawing.drop(pen, new double[] {middle + 4}, y - 3, new double[] {y + 5}, drops.below(), true);
        } else if (mark instanceof Mark.Points points) {
            MarkDrawing.points(pen, new double[] {middle}, new double[] {y}, points.colour(), points.shape());
        } else if (mark instanceof Mark.Spans spans) {
            MarkDrawing.span(pen, new double[] {middle}, new double[] {y - 6}, new double[] {y + 6}, spans.colour());
        }
    }
}
