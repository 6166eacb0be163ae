package org.wintersill.io.chart;

import java.util.List;
import org.wintersill.layer.Colour;
import org.wintersill.layer.LayerStyle;
import org.wintersill.layer.LayerStyles;

/** Colours of charts, taken from the styles of the layers so that a chart and a map speak alike. */
public final class ChartColours {
    /** Text, frames and neutral lines. */
    public static final Colour INK = Colour.hex("#2b2a33");
    /** What lies behind: grids of an axis, other curves for comparison. */
    public static final Colour FAINT = Colour.hex("#b9b4ac");
    /** The ground of a chart. */
    public static final Colour PAPER = Colour.hex("#fdfcf8");
    /** Margins on the safe side. */
    public static final Colour SAFE = margin(3);
    /** Margins below zero. */
    public static final Colour DANGER = margin(-6);
    /** Temperatures. */
    public static final Colour COLD = LayerStyles.temperature().stops().get(3).colour();
    /** Hardiness, alone in its panel. */
    public static final Colour HARDINESS = LayerStyles.night().stops().get(4).colour();

    private static final List<Colour> SERIES = List.of(Colour.hex("#1d4e89"), Colour.hex("#cc6a2a"), Colour.hex("#74a68e"),
            Colour.hex("#7a2018"), Colour.hex("#9081b2"), Colour.hex("#d6b32c"));

    private ChartColours() {
    }

    /** Colour of the i-th of several series; they come round after six. */
    public static Colour series(int i) {
        return SERIES.get(i % SERIES.size());
    }

    private static Colour margin(double value) {
        return LayerStyles.margin().stops().stream().filter(stop -> stop.value() == value).map(LayerStyle.Stop::colour).findFirst()
                .orElseThrow();
    }
}
