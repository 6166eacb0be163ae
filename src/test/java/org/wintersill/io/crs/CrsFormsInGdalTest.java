package org.wintersill.io.crs;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.Assumptions;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.wintersill.grid.Crs;

/** GDAL reads WKT 1, WKT 2 and GeoTIFF keys as one and the same system. */
class CrsFormsInGdalTest {
    private static final String PYTHON = "/usr/bin/python3";

    @Test
    void gdalReadsAllFormsAsTheSameSystem(@TempDir Path folder) throws Exception {
        Assumptions.assumeTrue(Files.isExecutable(Path.of(PYTHON)) && run(PYTHON, "-c", "import osgeo.gdal").isEmpty(),
                "GDAL's Python bindings are not installed");
        GeoToolsCrs systems = new GeoToolsCrs();
        Map<String, Crs> all = new LinkedHashMap<>(CoordinateOperationTest.systems());
        for (String code : List.of("4326", "4258", "4269", "2056", "3035", "32632", "32719", "25832", "26918", "3857", "28992", "27700",
                "2263", "3031", "32661", "5070", "2154")) {
            all.put("EPSG" + code, systems.fromCode("EPSG:" + code));
        }
        all.put("km", CoordinateOperationTest.mapping(1000, "grid_mapping_name", "lambert_conformal_conic", "standard_parallel",
                new double[] {25, 60}, "latitude_of_projection_origin", 42.5, "longitude_of_central_meridian", -100, "false_easting", 100));
        all.put("sphere", CoordinateOperationTest.mapping(1, "grid_mapping_name", "latitude_longitude", "earth_radius", 6371229.0));
        for (Map.Entry<String, Crs> entry : all.entrySet()) {
            Crs crs = entry.getValue();
            if (crs.pole() == null) {
                Files.writeString(folder.resolve(entry.getKey() + ".wkt1"), CrsDefinitions.wkt1(crs));
                Files.writeString(folder.resolve(entry.getKey() + ".wkt2"), CrsDefinitions.wkt2(crs));
                // GDAL names old datums in WKT 1 with their parameters to WGS 84, in keys and codes without.
                // For 3035 they have the northing first, where our WKT 1 has no axes at all.
                if (!crs.wkt().contains("TOWGS84") && !crs.code().equals("EPSG:3035")) {
                    if (!crs.code().isEmpty()) {
                        Files.writeString(folder.resolve(entry.getKey() + ".code"), crs.code());
                    }
                    Files.write(folder.resolve(entry.getKey() + ".tif"), tiff(GeoKeys.of(crs)));
                }
            }
        }
        assertEquals("", run(PYTHON, "src/test/python/check_crs.py", folder.toString()));
    }

    private static String run(String... command) throws IOException, InterruptedException {
        Process process = new ProcessBuilder(command).redirectErrorStream(true).start();
        String text = new String(process.getInputStream().readAllBytes(), StandardCharsets.UTF_8);
        return process.waitFor(60, TimeUnit.SECONDS) && process.exitValue() == 0 ? "" : text + "failed";
    }

    /** One cell of one byte with the keys. */
    private static byte[] tiff(GeoKeys keys) {
        TreeMap<Integer, Object> tags = new TreeMap<>();
        for (int tag : new int[] {256, 257, 259, 262, 277, 278, 279}) {
            tags.put(tag, new int[] {1});
        }
        tags.put(258, new int[] {8});
        tags.put(273, new int[] {8});
        tags.put(33550, new double[] {1, 1, 0});
        tags.put(33922, new double[] {0, 0, 0, 0, 0, 0});
        tags.put(34735, keys.directory());
        if (keys.doubles().length > 0) {
            tags.put(34736, keys.doubles());
        }
        if (!keys.ascii().isEmpty()) {
            tags.put(34737, keys.ascii() + "\0");
        }
        ByteBuffer out = ByteBuffer.allocate(8192).order(ByteOrder.LITTLE_ENDIAN);
        out.putShort((short) 0x4949).putShort((short) 42).putInt(10).putShort((short) 0).putShort((short) tags.size());
        int after = 12 + 12 * tags.size() + 4;
        for (Map.Entry<Integer, Object> tag : tags.entrySet()) {
            byte[] value = bytes(tag.getValue());
            int type = tag.getValue() instanceof int[] ? 3 : tag.getValue() instanceof double[] ? 12 : 2;
            out.putShort(tag.getKey().shortValue()).putShort((short) type).putInt(value.length / (type == 3 ? 2 : type == 12 ? 8 : 1));
            if (value.length <= 4) {
                out.put(java.util.Arrays.copyOf(value, 4));
            } else {
                out.putInt(after);
                out.put(after, value);
                after += value.length + value.length % 2;
            }
        }
        return java.util.Arrays.copyOf(out.array(), after);
    }

    private static byte[] bytes(Object value) {
        if (value instanceof String text) {
            return text.getBytes(StandardCharsets.US_ASCII);
        }
        ByteBuffer buffer = ByteBuffer.allocate(2048).order(ByteOrder.LITTLE_ENDIAN);
        if (value instanceof int[] shorts) {
            for (int v : shorts) {
                buffer.putShort((short) v);
            }
        } else {
            for (double v : (double[]) value) {
                buffer.putDouble(v);
            }
        }
        return java.util.Arrays.copyOf(buffer.array(), buffer.position());
    }
}
