package org.wintersill.io.geotiff.write;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.SplittableRandom;
import java.util.concurrent.ExecutorService;
import java.util.function.Function;
import org.wintersill.grid.Crs;
import org.wintersill.grid.GridGeometry;
import org.wintersill.layer.LayerDefinition;
import org.wintersill.layer.LayerStyle;
import org.wintersill.layer.LayerStyles;
import org.wintersill.layer.RasterHeader;
import org.wintersill.layer.RasterWriter;
import org.wintersill.layer.SampleType;

/** Made-up layers that look like real ones: hills, noise, a coast, single missing cells. */
record SyntheticLayer(RasterHeader header, float[][] bands) {
    static final Crs WGS84 = new Crs("EPSG:4326", "WGS 84", "", Crs.Kind.GEOGRAPHIC, 1, null);
    static final Crs LAEA = new Crs("EPSG:3035", "ETRS89-extended / LAEA Europe", "", Crs.Kind.PROJECTED, 1, null);

    /** Keys by OGC 19-008r4: model type 1024, area 1025, then 2048 for geographic and 3072 for projected systems. */
    static final Function<Crs, GeoKeyTags> KEYS = crs -> crs.angular()
            ? new GeoKeyTags(new int[] {1, 1, 0, 3, 1024, 0, 1, 2, 1025, 0, 1, 1, 2048, 0, 1, 4326}, new double[0], "")
            : new GeoKeyTags(new int[] {1, 1, 0, 3, 1024, 0, 1, 1, 1025, 0, 1, 1, 3072, 0, 1, 3035}, new double[0], "");

    static SyntheticLayer margins(int columns, int rows, int bands) {
        return of(SampleType.FLOAT32, columns, rows, bands, WGS84, LayerStyles.margin());
    }

    static SyntheticLayer years(int columns, int rows, int bands) {
        return of(SampleType.INT16, columns, rows, bands, LAEA, LayerStyles.year());
    }

    static SyntheticLayer classes(int columns, int rows) {
        return of(SampleType.BYTE, columns, rows, 1, LAEA, LayerStyles.suitability());
    }

    static SyntheticLayer of(SampleType type, int columns, int rows, int bands, Crs crs, LayerStyle style) {
        GridGeometry grid = crs.angular()
                ? new GridGeometry(columns, rows, 5, 48, 1 / 120.0, 1 / 120.0, crs)
                : new GridGeometry(columns, rows, 4_000_000, 2_900_000, 1000, 1000, crs);
        List<RasterHeader.Band> heads = new ArrayList<>();
        float[][] values = new float[bands][];
        for (int band = 0; band < bands; band++) {
            heads.add(new RasterHeader.Band("Margin " + (1980 + band), type == SampleType.FLOAT32 ? "K" : "1"));
            values[band] = field(type, columns, rows, band);
        }
        Map<String, String> metadata = new LinkedHashMap<>();
        metadata.put("CULTIVAR", "Blauer <Sp\u00e4t> & \"Frost\" &amp; \u8461\u8404");
        metadata.put("STATUS", "unverified");
        LayerDefinition layer = new LayerDefinition("sample", "Sample margin", "lowest of Tmin - LT50, negative is dangerous",
                "K", type, "", style);
        return new SyntheticLayer(new RasterHeader(grid, layer, heads, metadata, "2004:05:31 23:59:59",
                "Wintersill 0.1.0"), values);
    }

    private static float[] field(SampleType type, int columns, int rows, int band) {
        SplittableRandom random = new SplittableRandom(columns * 31L + rows + band);
        float[] values = new float[columns * rows];
        for (int i = 0; i < values.length; i++) {
            double x = i % columns / 90.0;
            double y = i / columns / 70.0;
            double hills = Math.sin(x + band) * Math.cos(y) + 0.3 * Math.sin(5 * x) * Math.sin(4 * y);
            double value = 6 * hills + 0.05 * random.nextDouble();
            boolean missing = Math.sin(x * 0.7) + Math.cos(y * 0.5 + 1) > 1.2 || random.nextInt(50) == 0;
            values[i] = missing ? Float.NaN : switch (type) {
                case FLOAT32 -> (float) value;
                case INT16 -> Math.round(1990 + 3 * value);
                case BYTE -> 1 + (int) Math.min(3, Math.abs(value));
            };
        }
        return values;
    }

    /** Writes all bands, interleaved row band by row band. */
    void write(CogFormat format, Path file, ExecutorService workers) {
        GridGeometry grid = header.grid();
        try (RasterWriter writer = format.create(file, header, workers)) {
            for (int row = 0; row < grid.rows(); row += format.rowsAtOnce()) {
                int count = Math.min(format.rowsAtOnce(), grid.rows() - row);
                for (int band = 0; band < bands.length; band++) {
                    float[] part = new float[count * grid.columns()];
                    System.arraycopy(bands[band], row * grid.columns(), part, 0, part.length);
                    writer.write(band, row, count, part);
                    java.util.Arrays.fill(part, 12345); // the writer may not keep the array
                }
            }
            writer.finish();
        }
    }

    /** Puts the values that went in where a checking program finds them. */
    Path dump(Path file) {
        try (var out = Files.newByteChannel(file, java.nio.file.StandardOpenOption.CREATE,
                java.nio.file.StandardOpenOption.WRITE,
                java.nio.file.StandardOpenOption.TRUNCATE_EXISTING)) {
            for (float[] band : bands) {
                ByteBuffer bytes = ByteBuffer.allocate(4 * band.length).order(ByteOrder.LITTLE_ENDIAN);
                bytes.asFloatBuffer().put(band);
                out.write(bytes);
            }
            return file;
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }
}
