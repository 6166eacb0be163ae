package org.wintersill.io.chart;

import java.util.Arrays;
import org.wintersill.io.chart.Drawing.Frame;
import org.wintersill.io.chart.Pen.Anchor;
import org.wintersill.io.chart.Pen.Letters;
import org.wintersill.layer.Colour;

/** Draws the marks of one panel. */
final class MarkDrawing {
    static final double BAND_OPACITY = 0.28;
    static final double ZONE_OPACITY = 0.1;
    private static final double CALLOUT_SIZE = 12;
    private static final double CALLOUT_GAP = 11;
    /** How much wider bold letters are. */
    static final double BOLD = 1.1;
    private static final double RADIUS = 3.2;

    private final Pen pen;
    private final Frame frame;
    private final Axis horizontal;
    private final Axis vertical;

    MarkDrawing(Pen pen, Frame frame, Axis horizontal, Axis vertical) {
        this.pen = pen;
        this.frame = frame;
        this.horizontal = horizontal;
        this.vertical = vertical;
    }

    void draw(Mark mark) {
        if (mark instanceof Mark.Line line) {
            line(line);
        } else if (mark instanceof Mark.Band band) {
            band(band);
        } else if (mark instanceof Mark.Drops drops) {
            drops(drops);
        } else if (mark instanceof Mark.Points points) {
            int[] there = there(points.x(), points.y(), points.y());
            points(pen, xs(points.x(), there), ys(points.y(), there), points.colour(), points.shape());
        } else if (mark instanceof Mark.Spans spans) {
            int[] there = there(spans.x(), spans.low(), spans.high());
            span(pen, xs(spans.x(), there), ys(spans.low(), there), ys(spans.high(), there), spans.colour());
        } else if (mark instanceof Mark.Zone zone) {
            block(pen, frame.left(), frame.right(), frame.y(vertical, zone.to()), frame.y(vertical, zone.from()), zone.colour(),
                    ZONE_OPACITY);
        } else if (mark instanceof Mark.Rule rule) {
            double y = frame.y(vertical, rule.value());
            pen.line(new double[] {frame.left(), frame.right()}, new double[] {y, y}, rule.colour(), rule.stroke().width(),
                    rule.stroke().dashed());
        } else if (mark instanceof Mark.Callout callout) {
            callout(callout);
        }
    }

    private void line(Mark.Line line) {
        eachStretch(line.x(), line.y(), line.y(), (from, to) -> {
            int[] there = range(from, to);
            double[] x = xs(line.x(), there);
            double[] y = ys(line.y(), there);
            if (x.length == 1) {
                pen.dots(x, y, line.stroke().width(), line.colour());
            } else {
                pen.line(x, y, line.colour(), line.stroke().width(), line.stroke().dashed());
            }
        });
    }

    private void band(Mark.Band band) {
        eachStretch(band.x(), band.lower(), band.upper(), (from, to) -> {
            int n = to - from;
            double[] x = new double[2 * n];
            double[] y = new double[2 * n];
            for (int i = 0; i < n; i++) {
                x[i] = frame.x(horizontal, band.x()[from + i]);
                y[i] = frame.y(vertical, band.upper()[from + i]);
                x[2 * n - 1 - i] = x[i];
                y[2 * n - 1 - i] = frame.y(vertical, band.lower()[from + i]);
            }
            pen.area(x, y, band.colour(), BAND_OPACITY);
        });
    }

    private void drops(Mark.Drops drops) {
        double base = frame.y(vertical, drops.base());
        int[] there = there(drops.x(), drops.y(), drops.y());
        int[] above = Arrays.stream(there).filter(i -> drops.y()[i] >= drops.base()).toArray();
        int[] below = Arrays.stream(there).filter(i -> drops.y()[i] < drops.base()).toArray();
        drop(pen, xs(drops.x(), above), base, ys(drops.y(), above), drops.above(), false);
        drop(pen, xs(drops.x(), below), base, ys(drops.y(), below), drops.below(), true);
    }

    private void callout(Mark.Callout callout) {
        double x = frame.x(horizontal, callout.x());
        double y = frame.y(vertical, callout.y());
        boolean toTheRight = x < (frame.left() + frame.right()) / 2;
        String words = ChartText.cut(ChartText.clean(callout.words()), CALLOUT_SIZE, (frame.right() - frame.left()) / 2 - 4 * CALLOUT_GAP);
        double width = ChartText.width(words, CALLOUT_SIZE) * BOLD;
        double textX = toTheRight ? x + CALLOUT_GAP : x - CALLOUT_GAP;
        double below = y + CALLOUT_SIZE + CALLOUT_GAP;
        double textY = below < frame.bottom() - 6 ? below : Math.max(frame.top() + CALLOUT_SIZE, y - CALLOUT_GAP);
        pen.rings(new double[] {x}, new double[] {y}, 6.5, callout.colour(), 2);
        block(pen, toTheRight ? textX - 2 : textX - width, toTheRight ? textX + width : textX + 2, textY - CALLOUT_SIZE, textY + 4,
                ChartColours.PAPER, 0.8);
        pen.text(words, textX, textY, new Letters(CALLOUT_SIZE, true, false, toTheRight ? Anchor.START : Anchor.END, callout.colour()));
    }

    static void drop(Pen pen, double[] x, double base, double[] y, Colour colour, boolean strong) {
        double[] from = new double[x.length];
        Arrays.fill(from, base);
        pen.strokes(x, from, y, colour, strong ? 2.2 : 1.2, strong ? 0.9 : 0.55);
        pen.dots(x, y, strong ? 2.7 : 1.9, colour);
    }

    static void points(Pen pen, double[] x, double[] y, Colour colour, Mark.Shape shape) {
        switch (shape) {
            case DISC -> pen.dots(x, y, RADIUS, colour);
            case RING -> pen.rings(x, y, RADIUS, colour, 1.4);
            case DIAMOND -> {
                double half = RADIUS * 1.35;
                for (int i = 0; i < x.length; i++) {
                    pen.area(new double[] {x[i] - half, x[i], x[i] + half, x[i]}, new double[] {y[i], y[i] - half, y[i], y[i] + half},
                            colour, 1);
                }
            }
        }
    }

    static void span(Pen pen, double[] x, double[] low, double[] high, Colour colour) {
        pen.strokes(x, low, high, colour, 3.4, 0.35);
    }

    static void block(Pen pen, double left, double right, double top, double bottom, Colour colour, double opacity) {
        pen.area(new double[] {left, right, right, left}, new double[] {top, top, bottom, bottom}, colour, opacity);
    }

    private interface Stretch {
        void draw(int from, int to);
    }

    /** Calls for every longest run of positions at which nothing is NaN. */
    private static void eachStretch(double[] x, double[] a, double[] b, Stretch stretch) {
        int from = 0;
        for (int i = 0; i <= x.length; i++) {
            if (i == x.length || Double.isNaN(x[i] + a[i] + b[i])) {
                if (i > from) {
                    stretch.draw(from, i);
                }
                from = i + 1;
            }
        }
    }

    /** Positions at which nothing is NaN and x lies on the axis. */
    private int[] there(double[] x, double[] a, double[] b) {
        return Arrays.stream(range(0, x.length)).filter(i -> !Double.isNaN(a[i] + b[i]) && x[i] >= horizontal.from()
                && x[i] <= horizontal.to()).toArray();
    }

    private static int[] range(int from, int to) {
        return java.util.stream.IntStream.range(from, to).toArray();
    }

    private double[] xs(double[] values, int[] positions) {
        return Arrays.stream(positions).mapToDouble(i -> frame.x(horizontal, values[i])).toArray();
    }

    private double[] ys(double[] values, int[] positions) {
        return Arrays.stream(positions).mapToDouble(i -> frame.y(vertical, values[i])).toArray();
    }
}
