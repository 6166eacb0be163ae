package org.wintersill.run;

import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.stream.IntStream;
import org.wintersill.grid.GridGeometry;
import org.wintersill.io.crs.GeoKeys;
import org.wintersill.io.crs.GeoToolsCrs;
import org.wintersill.io.geotiff.write.CogFormat;
import org.wintersill.io.geotiff.write.GeoKeyTags;
import org.wintersill.layer.LayerDefinition;
import org.wintersill.layer.LayerStyles;
import org.wintersill.layer.RasterHeader;
import org.wintersill.layer.RasterWriter;
import org.wintersill.layer.SampleType;

/** Stores records and heights as GeoTIFF; dates become band descriptions. */
final class RecordInTiff {
    private RecordInTiff() {
    }

    static void write(Path file, ColdRecord record) {
        float[][] bands = new float[record.days().length][record.rows() * record.columns()];
        for (int day = 0; day < bands.length; day++) {
            for (int cell = 0; cell < bands[day].length; cell++) {
                int tenths = record.tenths()[day][cell];
                bands[day][cell] = tenths == ColdRecord.MISSING ? Float.NaN : (float) (tenths / 10.0);
            }
        }
        List<String> dates = IntStream.range(0, bands.length).mapToObj(day -> record.calendar().date(record.days()[day]).toString()).toList();
        write(file, new GridGeometry(record.columns(), record.rows(), record.west(), record.north(), record.step(), record.step(),
                new GeoToolsCrs().wgs84()), "degC", dates, bands);
    }

    /** A file of one day, without a date inside. */
    static void oneDay(Path file, float degrees) {
        float[] values = new float[6];
        java.util.Arrays.fill(values, degrees);
        write(file, new GridGeometry(3, 2, -37, 50, 0.5, 0.5, new GeoToolsCrs().wgs84()), "degC", List.of("minimum"), new float[][] {values});
    }

    /** Heights in m. */
    static void heights(Path file, GridGeometry grid, float[] metres) {
        write(file, grid, "m", List.of("height"), new float[][] {metres});
    }

    private static void write(Path file, GridGeometry grid, String unit, List<String> names, float[][] bands) {
        CogFormat format = new CogFormat(crs -> {
            GeoKeys keys = GeoKeys.of(crs);
            return new GeoKeyTags(keys.directory(), keys.doubles(), keys.ascii());
        });
        LayerDefinition layer = new LayerDefinition("input", "Input", "An input of a test", unit, SampleType.FLOAT32, "",
                LayerStyles.temperature());
        RasterHeader header = new RasterHeader(grid, layer, names.stream().map(name -> new RasterHeader.Band(name, unit)).toList(),
                Map.of(), "2000:01:01 00:00:00", "test");
        ExecutorService workers = Executors.newSingleThreadExecutor();
        try (RasterWriter writer = format.create(file, header, workers)) {
            for (int band = 0; band < bands.length; band++) {
                for (int row = 0; row < grid.rows(); row += format.rowsAtOnce()) {
                    int rows = Math.min(format.rowsAtOnce(), grid.rows() - row);
                    writer.write(band, row, rows, java.util.Arrays.copyOfRange(bands[band], row * grid.columns(),
                            (row + rows) * grid.columns()));
                }
            }
            writer.finish();
        } finally {
            workers.shutdown();
        }
    }
}
