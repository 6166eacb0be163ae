package org.wintersill.layer;

import java.io.Serializable;
import java.util.List;

/** How a layer looks, in every format: QML, SLD, palette, page. */
public sealed interface LayerStyle extends Serializable {

    /** Name of the style; files under {@code styles/} are called after it. */
    String id();

    /** Readable title for legends. */
    String title();

    /**
     * Colours that run through a range of values.
     *
     * @param stops at least two, values ascending; values beyond the ends keep the end's colour
     */
    record Ramp(String id, String title, List<Stop> stops) implements LayerStyle {
        public Ramp {
            stops = List.copyOf(stops);
            for (int i = 1; i < stops.size(); i++) {
                if (!(stops.get(i).value() > stops.get(i - 1).value())) {
                    throw new IllegalArgumentException("stops of " + id + " must ascend");
                }
            }
        }
    }

    /**
     * One colour a class.
     *
     * @param entries classes by their number, ascending; from 1 to 255 where they are stored as bytes
     */
    record Classes(String id, String title, List<Entry> entries) implements LayerStyle {
        public Classes {
            entries = List.copyOf(entries);
        }
    }

    /** @param label text of the legend, with the unit where it helps */
    record Stop(double value, Colour colour, String label) implements Serializable {
    }

    /**
     * @param code stored value
     * @param name class name as it stands in tables
     * @param label text of the legend
     */
    record Entry(int code, String name, String label, Colour colour) implements Serializable {
    }
}
