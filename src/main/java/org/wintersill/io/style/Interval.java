package org.wintersill.io.style;

import java.util.ArrayList;
import java.util.List;
import org.wintersill.layer.Colour;
import org.wintersill.layer.LayerStyle;

/**
 * A piece of a ramp for things that take one colour: from one stop to the next, in the colour half way between the two.
 * A value on a stop belongs to the piece below it, as QGIS has it; what lies beyond the ends of the ramp belongs to the
 * first and the last piece.
 *
 * @param lower start, NaN for the first piece
 * @param upper end, NaN for the last piece
 */
record Interval(double lower, double upper, Colour colour, String label) {
    /** Stands for "no limit" where a format wants a number. */
    static final double FAR = 1e9;

    static List<Interval> of(LayerStyle.Ramp ramp) {
        List<LayerStyle.Stop> stops = ramp.stops();
        List<Interval> pieces = new ArrayList<>();
        for (int i = 0; i + 1 < stops.size(); i++) {
            LayerStyle.Stop from = stops.get(i);
            LayerStyle.Stop to = stops.get(i + 1);
            boolean first = i == 0;
            boolean last = i + 2 == stops.size();
            String label = first ? "up to " + to.label() : last ? "over " + from.label()
                    : from.label() + " to " + to.label();
            pieces.add(new Interval(first ? Double.NaN : from.value(), last ? Double.NaN : to.value(),
                    middle(from.colour(), to.colour()), label));
        }
        return pieces;
    }

    private static Colour middle(Colour a, Colour b) {
        return new Colour((a.red() + b.red()) / 2, (a.green() + b.green()) / 2, (a.blue() + b.blue()) / 2);
    }

    double lowerOr(double none) {
        return Double.isNaN(lower) ? none : lower;
    }

    double upperOr(double none) {
        return Double.isNaN(upper) ? none : upper;
    }
}
