package org.wintersill.run;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** An area of the sample terrain gives the values of the whole, also where source heights are means of the terrain. */
class AreaLawsTest {
    @TempDir
    private Path folder;

    private RasterFile margins(String name, String... more) {
        String[] arguments = {"map", SampleRun.RUN_FILE.toString(), "--out", folder.resolve(name).toString(), "--quiet",
            "--set", "elevation.source-height=dem-mean", "--set", "cultivars.use=[slate]"};
        String[] all = java.util.stream.Stream.concat(java.util.Arrays.stream(arguments), java.util.Arrays.stream(more))
                .toArray(String[]::new);
        assertEquals(0, Program.run(all).code());
        return RasterFile.read(folder.resolve(name).resolve("slate/winters/margin.tif"));
    }

    @Test
    void meanHeightsOfSourceCellsDoNotDependOnTheArea() {
        RasterFile whole = margins("whole");
        RasterFile part = margins("part", "--set", "area.bbox=[-37.613, 49.917, -37.388, 50.162]");
        int row = (int) Math.round((whole.north() - part.north()) / 0.005);
        int column = (int) Math.round((part.west() - whole.west()) / 0.005);
        assertTrue(part.columns() > 30 && part.rows() > 30);
        assertTrue(RasterFile.same(whole.part(row, column, part.rows(), part.columns()), part.bands()));
    }
}
