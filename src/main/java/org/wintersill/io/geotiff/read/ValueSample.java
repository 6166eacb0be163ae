package org.wintersill.io.geotiff.read;

import java.util.Arrays;

/** A few stored values of a band, from the middle of the grid outwards until some are not missing. */
final class ValueSample {
    private static final int MOST_VALUES = 4096;
    private static final int ROWS = 16;
    /** Places to look, as shares of the height: the middle first. */
    private static final double[] PLACES = {0.5, 0.25, 0.75, 0.4, 0.6, 0.1, 0.9, 0.33, 0.67, 0, 1};
    /** What files hold for "no value" although they do not say so. */
    private static final double[] COMMON_FILLS = {-9999, -32768, -32767, -999, -99999, 32767, 255, 65535};

    private ValueSample() {
    }

    static double[] of(WindowReader reader, GeotiffHeader header, int band) {
        TiffImage image = header.image();
        boolean silent = header.nodata().isEmpty();
        double[] found = new double[MOST_VALUES];
        int[] count = {0};
        for (double place : PLACES) {
            int row = (int) Math.min(image.height() - 1, Math.round(place * (image.height() - 1)));
            int rows = Math.min(ROWS, image.height() - row);
            reader.read(new int[] {band}, row, rows, 0, image.width(), (b, r, c, stored, n) -> {
                for (int i = 0; i < n && count[0] < MOST_VALUES; i++) {
                    if (Double.isFinite(stored[i]) && Math.abs(stored[i]) < 1e30 && !(silent && isFill(stored[i]))) {
                        found[count[0]++] = stored[i];
                    }
                }
            });
            if (count[0] > 0) {
                break;
            }
        }
        return Arrays.copyOf(found, count[0]);
    }

    private static boolean isFill(double stored) {
        return Arrays.stream(COMMON_FILLS).anyMatch(f -> f == stored);
    }
}
