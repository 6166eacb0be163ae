package org.wintersill.io.netcdf;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;

import java.io.IOException;
import java.nio.file.Path;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import ucar.nc2.NetcdfFile;
import ucar.nc2.Variable;

/** The reader of our own against NetCDF-Java, which shares no code with it. */
class CrossCheckTest {

    /** Source of the expected values: NetCDF-Java 4.5.5. */
    @ParameterizedTest
    @ValueSource(strings = {"day-chunks.nc", "pencil-chunks.nc", "checksum-only.nc", "big-endian.nc", "big-endian-chunks.nc",
        "int32-chunks.nc", "unwritten-chunks.nc", "wild-chunks.nc", "time-last-chunks.nc", "classic.nc",
        "lone-record.nc", "offset64.nc", "unsigned-bytes.nc", "time-last.nc"})
    void valuesAreThoseOfNetcdfJava(String name) throws IOException {
        Path path = Fixtures.path(name);
        CdfHeader own = CdfFiles.header(path);
        try (NetcdfFile file = NetcdfJavaHeader.open(path)) {
            CdfVariable variable = own.variable("tasmin").orElseThrow();
            Variable foreign = file.findVariable("tasmin");
            assertArrayEquals(foreign.getShape(), variable.shape());
            Packing packing = Packing.of(variable, java.util.Optional.empty(), java.util.Optional.empty());
            Unpacker unpacker = new Unpacker(packing, variable.littleEndian(), 1, 0, -1e30, 1e30);
            int time = variable.dimensions().indexOf("time");
            int y = variable.dimensions().indexOf("lat");
            int x = variable.dimensions().indexOf("lon");
            int[] shape = variable.shape();
            Slabs.Order order = new Slabs.Order(time, y, x, new int[shape.length]);
            Slabs.Box all = new Slabs.Box(0, shape[time], 0, shape[y], 0, shape[x]);
            float[] found = new float[(int) variable.size()];
            float[] wanted = new float[found.length];
            try (Slabs slabs = Slabs.open(own, variable, order, unpacker)) {
                slabs.copy(all, found, 0, shape[y] * shape[x], shape[x], 1);
            }
            try (Slabs slabs = new NetcdfJavaSlabs(own, variable, order, unpacker)) {
                slabs.copy(all, wanted, 0, shape[y] * shape[x], shape[x], 1);
            }
            assertArrayEquals(wanted, found);
        }
    }

    @ParameterizedTest
    @ValueSource(strings = {"day-chunks.nc", "pencil-chunks.nc", "members-nc4.nc"})
    void headersAreThoseOfNetcdfJava(String name) throws IOException {
        CdfHeader own = CdfFiles.header(Fixtures.path(name));
        CdfHeader foreign = NetcdfJavaHeader.read(Fixtures.path(name), own.fileSize());
        for (CdfVariable variable : own.all()) {
            CdfVariable other = foreign.variable(variable.name()).orElseThrow();
            assertEquals(other.dimensions(), variable.dimensions());
            assertEquals(other.text("units"), variable.text("units"));
            for (Map.Entry<String, Object> attribute : other.attributes().entrySet()) {
                if (attribute.getValue() instanceof CdfVariable.Numbers numbers && !attribute.getKey().startsWith("_Chunk")
                        && variable.attributes().containsKey(attribute.getKey())) {
                    assertArrayEquals(numbers.values(), variable.numbers(attribute.getKey()).orElseThrow().values());
                }
            }
        }
    }

    @Test
    void fletcherSumIsTheOneOfHdf5() {
        // worked out by hand from Fletcher (1982): words 0x0102, 0x0304
        assertEquals(0x0102 + 0x0304 | (0x0102 + 0x0102 + 0x0304) << 16, RawReader.fletcher32(new byte[] {1, 2, 3, 4}, 4));
    }
}
