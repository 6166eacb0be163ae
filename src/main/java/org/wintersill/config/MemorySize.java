package org.wintersill.config;

import java.util.Locale;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** Amounts of memory such as {@code 512m} and {@code 2g}; units are powers of 1024. */
final class MemorySize {
    static final String ACCEPTED = "an amount of memory such as 512m or 2g, at least 32m";
    private static final Pattern FORM = Pattern.compile("([0-9]{1,12})(\\.[0-9]{1,6})?\\s*([kmgt])(i?b)?");
    private static final String UNITS = "kmgt";
    private static final long LEAST = 32L << 20;

    private MemorySize() {
    }

    /**
     * Number of bytes.
     *
     * @throws IllegalArgumentException if the text is no amount, or too small to run in
     */
    static long parse(String text) {
        Matcher matcher = FORM.matcher(text.trim().toLowerCase(Locale.ROOT));
        if (!matcher.matches()) {
            throw new IllegalArgumentException(text);
        }
        double amount = Double.parseDouble(matcher.group(1) + (matcher.group(2) == null ? "" : matcher.group(2)));
        double bytes = amount * (1L << 10 * (UNITS.indexOf(matcher.group(3)) + 1));
        if (bytes < LEAST || bytes > 1L << 60) {
            throw new IllegalArgumentException(text);
        }
        return (long) bytes;
    }

    /** The amount in the largest unit that leaves it whole. */
    static String text(long bytes) {
        int unit = 0;
        long amount = bytes;
        while (unit < UNITS.length() && amount % 1024 == 0) {
            amount /= 1024;
            unit++;
        }
        return unit == 0 ? Math.round(bytes / 1024.0) + "k" : amount + UNITS.substring(unit - 1, unit);
    }
}
