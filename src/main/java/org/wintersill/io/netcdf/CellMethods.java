package org.wintersill.io.netcdf;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.wintersill.temperature.ForcingVariable;

/** Reads what a {@code cell_methods} attribute says about time (CF conventions 1.8, section 7.3). */
final class CellMethods {
    private static final Pattern ENTRY = Pattern.compile("((?:[\\w.]+\\s*:\\s*)+)(\\w+)");

    private CellMethods() {
    }

    /** Methods applied along time, in order; comments in brackets are left out. */
    static List<String> overTime(String text, String timeDimension) {
        String plain = text.replaceAll("\\([^)]*\\)", " ").toLowerCase(Locale.ROOT);
        List<String> methods = new ArrayList<>();
        Matcher matcher = ENTRY.matcher(plain);
        while (matcher.find()) {
            for (String name : matcher.group(1).split(":")) {
                if (name.trim().equals("time") || name.trim().equals(timeDimension.toLowerCase(Locale.ROOT))) {
                    methods.add(matcher.group(2));
                }
            }
        }
        return methods;
    }

    /** Whether the methods are those of the daily quantity and nothing else was done along time. */
    static boolean agree(List<String> methods, ForcingVariable forcing) {
        return !methods.isEmpty() && methods.stream().allMatch(m -> m.equals(forcing.word()));
    }
}
