package org.wintersill.layer;

import java.io.Serializable;

/** An opaque colour, 0..255 each. */
public record Colour(int red, int green, int blue) implements Serializable {

    public Colour {
        if ((red | green | blue) < 0 || red > 255 || green > 255 || blue > 255) {
            throw new IllegalArgumentException("not a colour: " + red + " " + green + " " + blue);
        }
    }

    /** Reads {@code #rrggbb}. */
    public static Colour hex(String text) {
        int rgb = Integer.parseInt(text.substring(1), 16);
        return new Colour(rgb >> 16 & 255, rgb >> 8 & 255, rgb & 255);
    }

    /** {@code #rrggbb} in lower case. */
    public String hex() {
        String digits = Integer.toHexString(red << 16 | green << 8 | blue);
        return "#" + "0".repeat(6 - digits.length()) + digits;
    }
}
