package org.wintersill.io.style;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import java.util.TreeSet;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.wintersill.layer.LayerStyle;
import org.wintersill.layer.LayerStyles;

/** Keeps the folder {@code styles/} equal to what the code writes, and writes it anew when asked to. */
class StyleFilesTest {
    private static final Path FOLDER = Path.of("styles");
    private static final String REMEDY = "the folder styles/ is out of date; rewrite it with "
            + "mvn test -Dtest=StyleFilesTest -Dstyles.write=true";

    private static Map<String, String> files() {
        Map<String, String> files = new TreeMap<>();
        for (LayerStyle style : LayerStyles.all()) {
            files.put(style.id() + ".qml", QmlWriter.raster(style, Optional.empty()));
            files.put(style.id() + ".sld", SldWriter.raster(style));
        }
        return files;
    }

    private static TreeSet<String> present() throws IOException {
        TreeSet<String> names = new TreeSet<>();
        if (Files.isDirectory(FOLDER)) {
            try (Stream<Path> list = Files.list(FOLDER)) {
                list.map(file -> file.getFileName().toString())
                        .filter(name -> name.endsWith(".qml") || name.endsWith(".sld")).forEach(names::add);
            }
        }
        return names;
    }

    @Test
    void theStylesFolderIsWhatTheCodeWrites() throws IOException {
        Map<String, String> files = files();
        if (Boolean.getBoolean("styles.write")) {
            Files.createDirectories(FOLDER);
            for (String name : present()) {
                Files.delete(FOLDER.resolve(name));
            }
            for (Map.Entry<String, String> file : files.entrySet()) {
                Files.writeString(FOLDER.resolve(file.getKey()), file.getValue());
            }
        }
        assertEquals(files.keySet(), present(), REMEDY);
        for (Map.Entry<String, String> file : files.entrySet()) {
            assertEquals(file.getValue(), Files.readString(FOLDER.resolve(file.getKey())), REMEDY);
        }
    }
}
