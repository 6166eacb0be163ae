package org.wintersill.run;

import java.io.IOException;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.Map;
import java.util.TreeMap;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.zip.DataFormatException;
import org.wintersill.io.geotiff.write.PlainTiff;

/**
 * A layer of a finished run, read by the tests' own TIFF reader.
 *
 * @param bands {@code [band][row * columns + column]}, NaN for missing
 * @param names one a band
 * @param items metadata of the whole file
 * @param west outer edge, from tie point and pixel scale
 */
record RasterFile(int columns, int rows, float[][] bands, String[] names, Map<String, String> items, double west, double north,
                  double cellWidth) {
    private static final Pattern ITEM = Pattern.compile("<Item name=\"([A-Z0-9_]+)\">([^<]*)</Item>");
    private static final Pattern NAME = Pattern.compile("<Item name=\"DESCRIPTION\" sample=\"(\\d+)\"[^>]*>([^<]*)</Item>");

    static RasterFile read(Path file) {
        try {
            PlainTiff tiff = new PlainTiff(file);
            int count = (int) tiff.number(0, 277);
            float missing = Float.parseFloat(tiff.text(0, 42113).trim());
            float[][] bands = new float[count][];
            for (int band = 0; band < count; band++) {
                bands[band] = tiff.band(0, band);
                for (int i = 0; i < bands[band].length; i++) {
                    bands[band][i] = bands[band][i] == missing ? Float.NaN : bands[band][i];
                }
            }
            String text = tiff.text(0, 42112);
            Map<String, String> items = new TreeMap<>();
            Matcher item = ITEM.matcher(text);
            while (item.find()) {
                items.put(item.group(1), item.group(2));
            }
            String[] names = new String[count];
            Matcher name = NAME.matcher(text);
            while (name.find()) {
                names[Integer.parseInt(name.group(1))] = name.group(2);
            }
            double[] scale = (double[]) tiff.directories.get(0).get(33550);
            double[] tie = (double[]) tiff.directories.get(0).get(33922);
            return new RasterFile((int) tiff.number(0, 256), (int) tiff.number(0, 257), bands, names, items, tie[3], tie[4], scale[0]);
        } catch (IOException | DataFormatException e) {
            throw new AssertionError(file.toString(), e);
        }
    }

    float[] band() {
        return bands[0];
    }

    float value(int band, int row, int column) {
        return bands[band][row * columns + column];
    }

    int valid(int band) {
        int n = 0;
        for (float value : bands[band]) {
            n += value == value ? 1 : 0;
        }
        return n;
    }

    /** A part of it, as an array of bands. */
    float[][] part(int row, int column, int partRows, int partColumns) {
        float[][] part = new float[bands.length][partRows * partColumns];
        for (int band = 0; band < bands.length; band++) {
            for (int r = 0; r < partRows; r++) {
                System.arraycopy(bands[band], (row + r) * columns + column, part[band], r * partColumns, partColumns);
            }
        }
        return part;
    }

    static boolean same(float[][] a, float[][] b) {
        return Arrays.deepEquals(a, b);
    }
}
