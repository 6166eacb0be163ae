package org.wintersill.io.chart;

import java.util.ArrayList;
import java.util.List;
import org.wintersill.io.chart.Pen.Anchor;
import org.wintersill.io.chart.Pen.Letters;
import org.wintersill.layer.Colour;

/** Turns a chart into strokes of a pen: the layout in pixels, the same for every format. */
final class Drawing {
    /** Width of every chart in pixels. */
    static final int WIDTH = 960;
    private static final double LEFT = 66;
    private static final double RIGHT = WIDTH - 26;
    private static final double MARGIN = 26;
    private static final double TITLE_SIZE = 20;
    private static final double TEXT_SIZE = 12.5;
    private static final double SMALL_SIZE = 11.5;
    private static final double LINE_STEP = 17;
    private static final double BETWEEN_PANELS = 20;
    private static final double HEADING_ROOM = 24;
    private static final double TICK = 4;

    private final Chart chart;
    private final List<String> subtitle = new ArrayList<>();
    private final List<String> notes = new ArrayList<>();
    private final List<PanelDrawing> panels = new ArrayList<>();
    private final double axisY;
    private final int height;

    Drawing(Chart chart) {
        this.chart = chart;
        chart.subtitle().forEach(line -> subtitle.addAll(ChartText.wrap(ChartText.clean(line), TEXT_SIZE, WIDTH - 2 * MARGIN)));
        chart.notes().forEach(note -> notes.addAll(ChartText.wrap(ChartText.clean(note), SMALL_SIZE, WIDTH - 2 * MARGIN)));
        double y = MARGIN + TITLE_SIZE + LINE_STEP * subtitle.size();
        for (Panel panel : chart.panels()) {
            Legend legend = new Legend(panel.marks(), headingWidth(panel), LEFT, RIGHT);
            y += BETWEEN_PANELS + HEADING_ROOM * legend.lines();
            panels.add(new PanelDrawing(panel, chart.horizontal(), legend, new Frame(LEFT, RIGHT, y, y + panel.height())));
            y += panel.height();
        }
        axisY = y;
        double axisRoom = 24 + (chart.horizontal().label().isEmpty() ? 0 : LINE_STEP);
        height = (int) Math.ceil(y + axisRoom + LINE_STEP * notes.size() + MARGIN);
    }

    private static double headingWidth(Panel panel) {
        return ChartText.width(heading(panel), TEXT_SIZE) * MarkDrawing.BOLD;
    }

    private static String heading(Panel panel) {
        return ChartText.cut(ChartText.clean(panel.heading()), TEXT_SIZE, (RIGHT - LEFT) / MarkDrawing.BOLD);
    }

    /** Height of the whole picture in pixels. */
    int height() {
        return height;
    }

    void draw(Pen pen) {
        pen.area(new double[] {0, WIDTH, WIDTH, 0}, new double[] {0, 0, height, height}, ChartColours.PAPER, 1);
        double y = MARGIN + TITLE_SIZE * 0.7;
        pen.text(ChartText.cut(ChartText.clean(chart.title()), TITLE_SIZE, (WIDTH - 2 * MARGIN) / MarkDrawing.BOLD), MARGIN, y,
                new Letters(TITLE_SIZE, true, false, Anchor.START, ChartColours.INK));
        for (String line : subtitle) {
            y += LINE_STEP + 2;
            pen.text(line, MARGIN, y, letters(TEXT_SIZE, Anchor.START));
        }
        for (PanelDrawing panel : panels) {
            panel.draw(pen);
        }
        horizontalAxis(pen);
        y = height - MARGIN - LINE_STEP * (notes.size() - 1) + 6;
        for (String note : notes) {
            pen.text(note, MARGIN, y, letters(SMALL_SIZE, Anchor.START));
            y += LINE_STEP;
        }
    }

    private void horizontalAxis(Pen pen) {
        Axis axis = chart.horizontal();
        List<Axis.Tick> ticks = axis.ticks();
        for (int i = 0; i < ticks.size(); i++) {
            double x = LEFT + axis.share(ticks.get(i).value()) * (RIGHT - LEFT);
            double next = i + 1 < ticks.size() ? LEFT + axis.share(ticks.get(i + 1).value()) * (RIGHT - LEFT) : RIGHT;
            pen.line(new double[] {x, x}, new double[] {axisY, axisY + TICK}, ChartColours.INK, 1, false);
            pen.text(ticks.get(i).label(), axis.labelsBetween() ? (x + next) / 2 : x, axisY + LINE_STEP,
                    letters(SMALL_SIZE, Anchor.MIDDLE));
        }
        pen.text(ChartText.cut(ChartText.clean(axis.label()), TEXT_SIZE, RIGHT - LEFT), (LEFT + RIGHT) / 2, axisY + 2 * LINE_STEP,
                letters(TEXT_SIZE, Anchor.MIDDLE));
    }

    static Letters letters(double size, Anchor anchor) {
        return new Letters(size, false, false, anchor, ChartColours.INK);
    }

    /** Edges of a panel in pixels. */
    record Frame(double left, double right, double top, double bottom) {
        double x(Axis axis, double value) {
            return left + axis.share(value) * (right - left);
        }

        double y(Axis axis, double value) {
            return bottom - axis.share(value) * (bottom - top);
        }
    }

    /** A panel with its place. */
    private record PanelDrawing(Panel panel, Axis horizontal, Legend legend, Frame frame) {

        void draw(Pen pen) {
            double headingY = frame.top() - HEADING_ROOM * (legend.lines() - 1) - 9;
            pen.text(heading(panel), frame.left(), headingY,
                    new Letters(TEXT_SIZE, true, false, Anchor.START, ChartColours.INK));
            legend.draw(pen, headingY, HEADING_ROOM);
            grid(pen);
            MarkDrawing marks = new MarkDrawing(pen, frame, horizontal, panel.vertical());
            panel.marks().forEach(marks::draw);
            stroke(pen, frame.left(), frame.top(), frame.left(), frame.bottom(), ChartColours.INK);
            stroke(pen, frame.left(), frame.bottom(), frame.right(), frame.bottom(), ChartColours.INK);
            pen.text(ChartText.cut(ChartText.clean(panel.vertical().label()), TEXT_SIZE, panel.height()), frame.left() - 46,
                    (frame.top() + frame.bottom()) / 2,
                    new Letters(TEXT_SIZE, false, true, Anchor.MIDDLE, ChartColours.INK));
        }

        private void grid(Pen pen) {
            for (Axis.Tick tick : panel.vertical().ticks()) {
                double y = frame.y(panel.vertical(), tick.value());
                pen.line(new double[] {frame.left(), frame.right()}, new double[] {y, y}, ChartColours.FAINT, 0.5, false);
                pen.text(tick.label(), frame.left() - 8, y + 4, letters(SMALL_SIZE, Anchor.END));
            }
            for (Axis.Tick tick : horizontal.ticks()) {
                double x = frame.x(horizontal, tick.value());
                pen.line(new double[] {x, x}, new double[] {frame.top(), frame.bottom()}, ChartColours.FAINT, 0.5, false);
            }
        }

        private static void stroke(Pen pen, double x1, double y1, double x2, double y2, Colour colour) {
            pen.line(new double[] {x1, x2}, new double[] {y1, y2}, colour, 1, false);
        }
    }
}
