package org.wintersill.io.chart;

import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.Locale;
import org.wintersill.io.file.NewFile;
import org.wintersill.problem.Problem;

/** Writes a chart in the format that the name of its file asks for: {@code .svg} or {@code .png}. */
public final class ChartFile {
    private ChartFile() {
    }

    /**
     * Says whether a chart may be written there, without touching anything.
     *
     * @throws org.wintersill.problem.ProblemException for another ending, or a file that is in the way
     */
    public static void check(Path file, boolean overwrite) {
        String name = name(file);
        if (!name.endsWith(".svg") && !name.endsWith(".png")) {
            throw Problem.usage("a chart is written as .svg or .png, not as '" + file.getFileName() + "'", "--chart",
                    "Choose a name with one of the two endings").asException();
        }
        NewFile.check(file, overwrite);
    }

    /** Draws and writes; the file appears whole or not at all. */
    public static void write(Chart chart, Path file, boolean overwrite) {
        check(file, overwrite);
        byte[] bytes = name(file).endsWith(".png") ? PngChart.bytes(chart)
                : ("<?xml version=\"1.0\" encoding=\"UTF-8\"?>\n" + SvgChart.text(chart)).getBytes(StandardCharsets.UTF_8);
        NewFile.write(file, bytes, overwrite);
    }

    private static String name(Path file) {
        return String.valueOf(file.getFileName()).toLowerCase(Locale.ROOT);
    }
}
