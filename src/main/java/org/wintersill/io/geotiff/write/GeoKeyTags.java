package org.wintersill.io.geotiff.write;

/**
 * The three tags that say in which reference system a GeoTIFF lies (OGC 19-008r4, section 7.1).
 *
 * @param directory GeoKeyDirectoryTag 34735: unsigned 16-bit numbers, four a key after four of head; it must say that a
 *                  value stands for its cell (key 1025 = 1)
 * @param doubles GeoDoubleParamsTag 34736; empty when no key refers to it
 * @param ascii GeoAsciiParamsTag 34737, texts ended by {@code |}; empty when no key refers to it
 */
public record GeoKeyTags(int[] directory, double[] doubles, String ascii) {
    private static final int RASTER_TYPE = 1025;
    private static final int PIXEL_IS_AREA = 1;

    public GeoKeyTags {
        directory = directory.clone();
        doubles = doubles.clone();
        if (directory.length < 4 || directory[0] != 1 || directory.length != 4 * (directory[3] + 1)) {
            throw new IllegalArgumentException("not a GeoKey directory");
        }
        boolean area = false;
        for (int i = 4; i < directory.length; i += 4) {
            area |= directory[i] == RASTER_TYPE && directory[i + 1] == 0 && directory[i + 3] == PIXEL_IS_AREA;
        }
        for (int value : directory) {
            if (value < 0 || value > 0xFFFF) {
                throw new IllegalArgumentException("a GeoKey directory holds unsigned 16-bit numbers, not " + value);
            }
        }
        if (!area) {
            throw new IllegalArgumentException("the values of a layer stand for cells: GeoKey 1025 must be 1");
        }
    }

    @Override
    public int[] directory() {
        return directory.clone();
    }

    @Override
    public double[] doubles() {
        return doubles.clone();
    }
}
