package org.wintersill.io.chart;

import org.wintersill.layer.Colour;

/** Something drawn in a panel; coordinates in data units. Arrays of one mark are of one length and are not copied. */
public sealed interface Mark {

    /** Text of the legend; empty for none. */
    String label();

    /** Weight of a line. */
    enum Stroke {
        STRONG(2, false), THIN(1.1, false), FAINT(0.8, false), DASHED(1.4, true);

        private final double width;
        private final boolean dashed;

        Stroke(double width, boolean dashed) {
            this.width = width;
            this.dashed = dashed;
        }

        double width() {
            return width;
        }

        boolean dashed() {
            return dashed;
        }
    }

    /** Form of a point, so that colour is never the only difference. */
    enum Shape { DISC, RING, DIAMOND }

    /** A line through points in order; NaN interrupts it. */
    record Line(double[] x, double[] y, Colour colour, Stroke stroke, String label) implements Mark {
    }

    /** The area between two lines; NaN in either interrupts it. */
    record Band(double[] x, double[] lower, double[] upper, Colour colour, String label) implements Mark {
    }

    /**
     * One drop a value, hanging above or below a base line with a bead at its end.
     *
     * @param above colour of drops that end above the base or on it
     * @param below colour of those below, drawn stronger
     */
    record Drops(double[] x, double[] y, double base, Colour above, Colour below, String label) implements Mark {
    }

    /** Separate points. */
    record Points(double[] x, double[] y, Colour colour, Shape shape, String label) implements Mark {
    }

    /** Vertical strokes from low to high, such as intervals. */
    record Spans(double[] x, double[] low, double[] high, Colour colour, String label) implements Mark {
    }

    /** A tint over the whole width between two values. */
    record Zone(double from, double to, Colour colour, String label) implements Mark {
    }

    /** A horizontal line at a value. */
    record Rule(double value, Colour colour, Stroke stroke, String label) implements Mark {
    }

    /** A ring around a place with words beside it; drawn where there is room. */
    record Callout(double x, double y, String words, Colour colour) implements Mark {
        @Override
        public String label() {
            return "";
        }
    }
}
