package org.wintersill.config;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Set;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class FilePatternsTest {
    @TempDir
    Path folder;

    @BeforeEach
    void makeFiles() throws Exception {
        for (String name : List.of("tmin-2003.nc", "tmin-2001.nc", "tmin-2002.nc", "tmin-x.txt", ".tmin-1.nc", "a/b/tmin-2004.nc",
                "a/tmin-2005.nc", ".hidden/tmin-2006.nc", "odd name [1].nc", "T.TIF")) {
            Path file = folder.resolve(name);
            Files.createDirectories(file.getParent());
            Files.createFile(file);
        }
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', value = {
        "tmin-*.nc          | tmin-2001.nc,tmin-2002.nc,tmin-2003.nc",
        "tmin-200?.nc       | tmin-2001.nc,tmin-2002.nc,tmin-2003.nc",
        "TMIN-*.nc          | ''",
        ".tmin*             | .tmin-1.nc",
        "*/tmin-*           | a/tmin-2005.nc",
        "**/tmin-*.nc       | a/b/tmin-2004.nc,a/tmin-2005.nc,tmin-2001.nc,tmin-2002.nc,tmin-2003.nc",
        "a/**               | a/b/tmin-2004.nc,a/tmin-2005.nc",
        "a/../tmin-2001.*   | a/../tmin-2001.nc",
        "odd name [1].nc    | odd name [1].nc",
        "a                  | a/tmin-2005.nc",
        ".                  | ./T.TIF,./odd name [1].nc,./tmin-2001.nc,./tmin-2002.nc,./tmin-2003.nc"})
    void patternsFindTheSameFilesInTheSameOrder(String given, String expected) {
        FilePatterns.Found found = new FilePatterns(folder, Set.of(".nc", ".tif")).find(given);
        List<String> names = found.files().stream().map(file -> file.toString().substring(folder.toString().length() + 1)
                .replace('\\', '/')).toList();
        assertEquals(expected, String.join(",", names), found.what());
    }

    @Test
    void whatIsNotFoundNamesTheFolderAndWhatIsThere() {
        FilePatterns patterns = new FilePatterns(folder, Set.of(".nc"));
        assertTrue(patterns.find("tmax-*.nc").what().contains("in the folder " + folder));
        assertTrue(patterns.find("tmax-*.nc").remedy().startsWith("The folder holds T.TIF, a, odd name"));
        assertEquals("Did you mean tmin-2001.nc?", patterns.find("tmn-2001.nc").remedy());
        assertTrue(patterns.find("b/*.nc").what().contains("does not exist"));
        assertTrue(patterns.find("x\0y").what().contains("cannot be a path"));
    }

    @Test
    void manyStarsTakeNoTime() {
        assertTrue(!FilePatterns.matches("*a".repeat(60) + "b", "a".repeat(250)));
        assertTrue(FilePatterns.matches("*a*b*", "xxaxxbxx"));
        assertTrue(FilePatterns.matches("***", ""));
    }
}
