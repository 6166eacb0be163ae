package org.wintersill.io.chart;

import org.wintersill.layer.Colour;

/** What a picture format must be able to draw. Coordinates in pixels from the top left corner, y downwards. */
interface Pen {

    /** Where a text stands from its place. */
    enum Anchor { START, MIDDLE, END }

    /**
     * Look of a text.
     *
     * @param size height of the letters in pixels
     * @param turned whether it reads upwards
     */
    record Letters(double size, boolean bold, boolean turned, Anchor anchor, Colour colour) {
    }

    /** A filled shape. */
    void area(double[] x, double[] y, Colour colour, double opacity);

    /** A line with round corners. */
    void line(double[] x, double[] y, Colour colour, double width, boolean dashed);

    /** Separate vertical strokes. */
    void strokes(double[] x, double[] from, double[] to, Colour colour, double width, double opacity);

    /** Filled circles. */
    void dots(double[] x, double[] y, double radius, Colour colour);

    /** Open circles on the ground of the chart. */
    void rings(double[] x, double[] y, double radius, Colour colour, double width);

    /** A cleaned text on its base line. */
    void text(String text, double x, double y, Letters letters);
}
