package org.wintersill.run;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Polygons as the area of a run: values inside are those of the whole, outside there are none, and the window is cut to them. */
class AreaPolygonsTest {
    /** A triangle over the sample basin, in degrees. */
    private static final double[][] TRIANGLE = {{-37.7, 49.9}, {-37.2, 49.95}, {-37.5, 50.2}, {-37.7, 49.9}};

    @TempDir
    private Path folder;

    private Program.Ended map(String name, String... more) {
        String[] arguments = {"map", SampleRun.RUN_FILE.toString(), "--out", folder.resolve(name).toString(), "--quiet",
            "--set", "cultivars.use=[slate]", "--set", "outputs.geopackage=false"};
        return Program.run(Stream.concat(Stream.of(arguments), Stream.of(more)).toArray(String[]::new));
    }

    private Path geoJson(double[][] ring, boolean swapped) throws IOException {
        StringBuilder text = new StringBuilder("{\"type\":\"Polygon\",\"coordinates\":[[");
        for (int i = 0; i < ring.length; i++) {
            text.append(i == 0 ? "" : ",").append('[').append(ring[i][swapped ? 1 : 0]).append(',').append(ring[i][swapped ? 0 : 1]).append(']');
        }
        return Files.writeString(folder.resolve("zones.geojson"), text.append("]]}"));
    }

    private static boolean inside(double x, double y) {
        boolean inside = false;
        for (int i = 0; i < 3; i++) {
            double[] a = TRIANGLE[i];
            double[] b = TRIANGLE[i + 1];
            if (a[1] > y != b[1] > y && x < a[0] + (y - a[1]) / (b[1] - a[1]) * (b[0] - a[0])) {
                inside = !inside;
            }
        }
        return inside;
    }

    private void compare(double step, String... more) throws IOException {
        map("whole", more).expect(0);
        map("part", Stream.concat(Stream.of(more), Stream.of("--set", "area.polygons=" + geoJson(TRIANGLE, false).toAbsolutePath()))
                .toArray(String[]::new)).expect(0);
        RasterFile whole = RasterFile.read(folder.resolve("whole/slate/winters/margin.tif"));
        RasterFile part = RasterFile.read(folder.resolve("part/slate/winters/margin.tif"));
        int firstRow = (int) Math.round((whole.north() - part.north()) / step);
        int firstColumn = (int) Math.round((part.west() - whole.west()) / step);
        float[][] expected = whole.part(firstRow, firstColumn, part.rows(), part.columns());
        int values = 0;
        for (int cell = 0; cell < part.rows() * part.columns(); cell++) {
            double x = part.west() + (cell % part.columns() + 0.5) * step;
            double y = part.north() - (cell / part.columns() + 0.5) * step;
            for (int band = 0; band < expected.length; band++) {
                float wanted = inside(x, y) ? expected[band][cell] : Float.NaN;
                assertEquals(wanted, part.bands()[band][cell], "band " + band + ", cell " + cell);
                values += wanted == wanted ? 1 : 0;
            }
        }
        assertTrue(values > 100, values + " values");
        assertEquals(0.5, part.columns() * step, 1.5 * step);
        assertEquals(0.3, part.rows() * step, 1.5 * step);
        String record = Files.readString(folder.resolve("part/record.json"));
        assertTrue(record.contains("\"polygons\" : \"zones.geojson\"") && record.contains("\"role\" : \"area polygons\""), record);
    }

    @Test
    void onTheTerrainsGrid() throws IOException {
        compare(0.005, "--set", "elevation.source-height=dem-mean");
    }

    @Test
    void onTheGridOfTheTemperatures() throws IOException {
        Path run = folder.resolve("plain.yaml");
        Path sample = SampleRun.RUN_FILE.toAbsolutePath().getParent();
        Files.writeString(run, "temperature: {minimum: '" + sample + "/tmin-*.nc'}\ncultivars: {files: ['" + sample + "/cultivars.yaml'], use: [slate]}\n");
        Program.run("map", run.toString(), "--out", folder.resolve("whole").toString(), "--quiet").expect(0);
        Program.run("map", run.toString(), "--out", folder.resolve("part").toString(), "--quiet", "--set",
                "area.polygons=" + geoJson(TRIANGLE, false).toAbsolutePath()).expect(0);
        RasterFile whole = RasterFile.read(folder.resolve("whole/slate/margin-mean.tif"));
        RasterFile part = RasterFile.read(folder.resolve("part/slate/margin-mean.tif"));
        float[] expected = whole.part((int) Math.round((whole.north() - part.north()) / 0.05), (int) Math.round((part.west() - whole.west()) / 0.05),
                part.rows(), part.columns())[0];
        for (int cell = 0; cell < expected.length; cell++) {
            double x = part.west() + (cell % part.columns() + 0.5) * 0.05;
            double y = part.north() - (cell / part.columns() + 0.5) * 0.05;
            assertEquals(inside(x, y) ? expected[cell] : Float.NaN, part.bands()[0][cell], "cell " + cell);
        }
    }

    @Test
    void polygonsThatNowhereMeetTheGridAreRefused() throws IOException {
        Program.Ended swapped = map("swapped", "--set", "area.polygons=" + geoJson(TRIANGLE, true).toAbsolutePath());
        assertTrue(swapped.expect(2).err().contains("x and y seem to be swapped in the polygons"), swapped.err());
        double[][] elsewhere = {{10, 45}, {11, 45}, {11, 46}, {10, 45}};
        Program.Ended outside = map("outside", "--set", "area.polygons=" + geoJson(elsewhere, false).toAbsolutePath());
        assertTrue(outside.expect(2).err().contains("no cell of the target grid has its centre in one of the polygons"), outside.err());
        assertTrue(!Files.exists(folder.resolve("outside")));
    }
}
