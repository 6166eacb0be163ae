package org.wintersill.io.chart;

import java.util.ArrayList;
import java.util.List;

/** Words of a chart: made harmless, measured without a font, wrapped and cut to a width. */
final class ChartText {
    private static final String NARROW = "iljtfrI.,:;|'!()[] \u2019-/";
    private static final String WIDE = "mwMW@%\u2014";
    private static final double NARROW_WIDTH = 0.37;
    private static final double WIDE_WIDTH = 0.95;
    private static final double USUAL_WIDTH = 0.62;
    private static final double CAPITAL_WIDTH = 0.73;
    /** First letter of the scripts whose letters fill a square. */
    private static final int SQUARE_SCRIPTS = 0x1100;
    private static final char SUBSTITUTE = '\ufffd';

    private ChartText() {
    }

    /**
     * The text without what could harm where it lands: control characters, halves of surrogate pairs and characters that XML
     * 1.0 does not know become U+FFFD, marks that turn the direction of writing are dropped, line ends become blanks.
     */
    static String clean(String text) {
        StringBuilder clean = new StringBuilder(text.length());
        text.codePoints().forEach(c -> {
            if (c == '\n' || c == '\r' || c == '\t') {
                clean.append(' ');
            } else if (Character.isISOControl(c) || c >= 0xd800 && c <= 0xdfff || c == 0xfffe || c == 0xffff) {
                clean.append(SUBSTITUTE);
            } else if (!(c >= 0x202a && c <= 0x202e || c >= 0x2066 && c <= 0x2069 || c == 0x200e || c == 0x200f)) {
                clean.appendCodePoint(c);
            }
        });
        return clean.toString();
    }

    /** Estimated width of a text in pixels, the same on every machine; a little generous. */
    static double width(String text, double size) {
        return size * text.codePoints().mapToDouble(ChartText::width).sum();
    }

    private static double width(int c) {
        if (c >= SQUARE_SCRIPTS && !(c >= 0x2000 && c < 0x2e80)) {
            return 1;
        }
        if (NARROW.indexOf(c) >= 0) {
            return NARROW_WIDTH;
        }
        return WIDE.indexOf(c) >= 0 ? WIDE_WIDTH : Character.isUpperCase(c) ? CAPITAL_WIDTH : USUAL_WIDTH;
    }

    /** The text cut to a width, with an ellipsis where something is missing. */
    static String cut(String text, double size, double room) {
        if (width(text, size) <= room) {
            return text;
        }
        int end = 0;
        double used = size * WIDE_WIDTH;
        while (end < text.length() && used + size * width(text.codePointAt(end)) <= room) {
            used += size * width(text.codePointAt(end));
            end = text.offsetByCodePoints(end, 1);
        }
        return text.substring(0, end).stripTrailing() + "\u2026";
    }

    /** The text in lines of a width, broken at blanks; words longer than a line are cut. */
    static List<String> wrap(String text, double size, double room) {
        List<String> lines = new ArrayList<>();
        StringBuilder line = new StringBuilder();
        for (String word : text.trim().split(" +")) {
            String longer = line.isEmpty() ? word : line + " " + word;
            if (!line.isEmpty() && width(longer, size) > room) {
                lines.add(cut(line.toString(), size, room));
                line.setLength(0);
                line.append(word);
            } else {
                line.setLength(0);
                line.append(longer);
            }
        }
        lines.add(cut(line.toString(), size, room));
        return lines;
    }
}
