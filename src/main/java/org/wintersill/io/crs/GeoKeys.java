package org.wintersill.io.crs;

import java.nio.charset.StandardCharsets;
import org.wintersill.grid.Crs;
import org.wintersill.grid.CrsParser;
import org.wintersill.problem.Problem;

/**
 * The keys by which a GeoTIFF file names its coordinate reference system (OGC 19-008r4, GeoTIFF 1.1).
 *
 * @param directory GeoKeyDirectoryTag 34735: 16-bit numbers in fours, the first four being version and count
 * @param doubles GeoDoubleParamsTag 34736; empty if there are none
 * @param ascii GeoAsciiParamsTag 34737, each text ended by {@code |}; empty if there are none
 */
public record GeoKeys(int[] directory, double[] doubles, String ascii) {
    static final int MODEL_TYPE = 1024;
    static final int RASTER_TYPE = 1025;
    static final int GEOGRAPHIC_TYPE = 2048;
    static final int GEOGRAPHIC_CITATION = 2049;
    static final int DATUM = 2050;
    static final int PRIME_MERIDIAN = 2051;
    static final int ANGULAR_UNITS = 2054;
    static final int ELLIPSOID = 2056;
    static final int SEMI_MAJOR = 2057;
    static final int SEMI_MINOR = 2058;
    static final int INVERSE_FLATTENING = 2059;
    static final int MERIDIAN_LONGITUDE = 2061;
    static final int PROJECTED_TYPE = 3072;
    static final int PROJECTED_CITATION = 3073;
    static final int PROJECTION = 3074;
    static final int TRANSFORMATION = 3075;
    static final int LINEAR_UNITS = 3076;
    static final int LINEAR_UNIT_SIZE = 3077;
    static final int VERTICAL_TYPE = 4096;
    static final int VERTICAL_UNITS = 4099;
    static final int USER_DEFINED = 32767;
    static final int DEGREE = 9102;

    private static final int DOUBLES_TAG = 34736;
    private static final int ASCII_TAG = 34737;

    /**
     * Keys of a system, for cells as areas (GTRasterTypeGeoKey = 1).
     *
     * @throws org.wintersill.problem.ProblemException for a rotated pole and for projections that GeoTIFF has no form for
     */
    public static GeoKeys of(Crs crs) {
        if (crs.kind() == Crs.Kind.ROTATED_POLE) {
            throw Problem.output("A GeoTIFF file cannot hold the rotated pole grid '" + crs.name() + "'", "",
                    "Write NetCDF, or a regular grid in another system (longitude and latitude, or a projection)").asException();
        }
        return GeoKeyWriter.write(SystemDefinition.of(crs));
    }

    /**
     * The system that the keys name.
     *
     * @param parser looks up the codes
     * @throws org.wintersill.problem.ProblemException when they name none or one that is not known
     */
    public static Crs toCrs(GeoKeys keys, CrsParser parser) {
        return GeoKeyReader.read(keys, parser);
    }

    /** Whether any key says which system the file is in. */
    public boolean namesSystem() {
        return number(MODEL_TYPE, 0) != 0 || number(PROJECTED_TYPE, 0) != 0 || number(GEOGRAPHIC_TYPE, 0) != 0;
    }

    /** Whether coordinates are those of cell centres (PixelIsPoint). */
    public boolean pixelIsPoint() {
        return number(RASTER_TYPE, 1) == 2;
    }

    /** EPSG code of the unit of heights; 0 if the keys give none. */
    public int verticalUnit() {
        return number(VERTICAL_UNITS, 0);
    }

    /** EPSG code of the vertical system; 0 if the keys give none. */
    public int verticalSystem() {
        int code = number(VERTICAL_TYPE, 0);
        return code == USER_DEFINED ? 0 : code;
    }

    private int entry(int key) {
        for (int i = 4; i + 3 < directory.length; i += 4) {
            if (directory[i] == key) {
                return i;
            }
        }
        return -1;
    }

    /** A short value held in the directory itself. */
    int number(int key, int otherwise) {
        int at = entry(key);
        return at < 0 || directory[at + 1] != 0 ? otherwise : directory[at + 3];
    }

    double real(int key, double otherwise) {
        int at = entry(key);
        if (at < 0) {
            return otherwise;
        }
        if (directory[at + 1] == 0) {
            return directory[at + 3];
        }
        return directory[at + 1] == DOUBLES_TAG && directory[at + 3] < doubles.length ? doubles[directory[at + 3]] : otherwise;
    }

    boolean entryExists(int key) {
        return entry(key) >= 0;
    }

    String text(int key) {
        int at = entry(key);
        if (at < 0 || directory[at + 1] != ASCII_TAG) {
            return "";
        }
        int start = Math.min(directory[at + 3], ascii.length());
        int end = Math.min(start + directory[at + 2], ascii.length());
        String text = ascii.substring(start, end);
        return text.endsWith("|") ? text.substring(0, text.length() - 1) : text;
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof GeoKeys k && java.util.Arrays.equals(directory, k.directory)
                && java.util.Arrays.equals(doubles, k.doubles) && ascii.equals(k.ascii);
    }

    @Override
    public int hashCode() {
        return 31 * (31 * java.util.Arrays.hashCode(directory) + java.util.Arrays.hashCode(doubles)) + ascii.hashCode();
    }

    @Override
    public String toString() {
        return "GeoKeys" + java.util.Arrays.toString(directory) + java.util.Arrays.toString(doubles) + ascii;
    }

    /** Collects keys in ascending order, as the standard demands. */
    static final class Builder {
        private final java.util.TreeMap<Integer, Object> keys = new java.util.TreeMap<>();

        Builder put(int key, int value) {
            keys.put(key, value);
            return this;
        }

        Builder put(int key, double value) {
            keys.put(key, value);
            return this;
        }

        /** Letters beyond ASCII become question marks; the bar ends a text and so becomes a slash. */
        Builder put(int key, String value) {
            String plain = new String(value.getBytes(StandardCharsets.US_ASCII), StandardCharsets.US_ASCII);
            keys.put(key, plain.replace('|', '/') + "|");
            return this;
        }

        /** A citation of several parts, each ended by a bar, as GDAL writes and reads it. */
        Builder putParts(int key, String... parts) {
            StringBuilder text = new StringBuilder();
            for (String part : parts) {
                text.append(part.replace('|', '/')).append('|');
            }
            keys.put(key, new String(text.toString().getBytes(StandardCharsets.US_ASCII), StandardCharsets.US_ASCII));
            return this;
        }

        GeoKeys build() {
            int[] directory = new int[4 + 4 * keys.size()];
            directory[0] = 1;
            directory[1] = 1;
            directory[3] = keys.size();
            double[] doubles = new double[(int) keys.values().stream().filter(v -> v instanceof Double).count()];
            StringBuilder ascii = new StringBuilder();
            int at = 4;
            int used = 0;
            for (var entry : keys.entrySet()) {
                directory[at] = entry.getKey();
                directory[at + 2] = 1;
                if (entry.getValue() instanceof Integer value) {
                    directory[at + 3] = value;
                } else if (entry.getValue() instanceof Double value) {
                    directory[at + 1] = DOUBLES_TAG;
                    directory[at + 3] = used;
                    doubles[used++] = value;
                } else {
                    String text = (String) entry.getValue();
                    directory[at + 1] = ASCII_TAG;
                    directory[at + 2] = text.length();
                    directory[at + 3] = ascii.length();
                    ascii.append(text);
                }
                at += 4;
            }
            return new GeoKeys(directory, doubles, ascii.toString());
        }
    }
}
