package org.wintersill.run;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.stream.Collectors;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.wintersill.config.Setting;
import org.wintersill.io.crs.GeoToolsCrs;
import org.wintersill.problem.Notices;
import org.wintersill.problem.ProblemException;

class FolderContentsTest {
    @TempDir
    Path folder;
    private final Notices notices = new Notices();

    private Map<String, String> found() {
        List<Setting> settings = FolderContents.settings(folder, new InputFormats(new GeoToolsCrs()), notices);
        return new TreeMap<>(settings.stream().collect(Collectors.toMap(Setting::key, setting -> setting.values().stream()
                .map(value -> value.replace(folder + "/", "")).collect(Collectors.joining(" ")))));
    }

    private void copy(String name) throws Exception {
        Files.copy(Path.of("sample-grids", name), folder.resolve(name));
    }

    @Test
    void eachFileOfTheSampleIsTakenForWhatItIs() throws Exception {
        for (String name : List.of("run.yaml", "cultivars.yaml", "dem.tif", "orog.nc", "tmin-2005-2009.nc", "tmin-2010-2014.nc",
                "tmin-2010-11.tif", "tmax-2005-2009.nc")) {
            copy(name);
        }
        assertEquals(Map.of("temperature.minimum.files", "tmin-2005-2009.nc tmin-2010-2014.nc",
                "temperature.maximum.files", "tmax-2005-2009.nc", "elevation.dem.file", "dem.tif",
                "elevation.source-height.file", "orog.nc", "cultivars.files", "cultivars.yaml"), found());
        assertTrue(notices.counts().keySet().stream().anyMatch(note -> note.contains("tmin-2010-11.tif are left aside")),
                notices.counts().toString());
        assertTrue(notices.counts().keySet().stream().anyMatch(note -> note.contains("run.yaml is not used")));
    }

    @Test
    void sourceHeightsWithoutATerrainModelAreNoElevation() throws Exception {
        copy("cultivars.yaml");
        copy("tmin-2005-2009.nc");
        copy("orog.nc");
        assertEquals(Map.of("temperature.minimum.files", "tmin-2005-2009.nc", "cultivars.files", "cultivars.yaml"), found());
    }

    @Test
    void datesInNamesAreRecognised() throws Exception {
        copy("cultivars.yaml");
        for (int day = 0; day < 3; day++) {
            RecordInTiff.oneDay(folder.resolve("tmin_201103" + (2 + day) + ".tif"), -5 - day);
        }
        Map<String, String> found = found();
        assertEquals("tmin_2011032.tif tmin_2011033.tif tmin_2011034.tif", found.get("temperature.minimum.files"));
        assertEquals("yyyyDDD", found.get("temperature.dates"));
    }

    @Test
    void aFolderWithoutMinimaIsRefused() throws Exception {
        copy("cultivars.yaml");
        copy("tmax-2005-2009.nc");
        ProblemException refusal = assertThrows(ProblemException.class, this::found);
        assertTrue(refusal.problems().get(0).what().contains("no daily minima"), refusal.getMessage());
        assertEquals(2, refusal.exitCode());
    }
}
