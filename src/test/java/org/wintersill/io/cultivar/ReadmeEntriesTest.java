package org.wintersill.io.cultivar;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Set;
import java.util.TreeSet;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.wintersill.hardiness.Cultivar;
import org.wintersill.hardiness.model.HardinessModels;
import org.wintersill.problem.Notices;

/** What the README shows can be read, and it shows every model. */
class ReadmeEntriesTest {
    @TempDir
    Path folder;

    @Test
    void theExamplesOfTheReadmeAreReadAndShowEveryModel() throws Exception {
        String readme = Files.readString(Path.of("README.md"));
        String examples = readme.substring(readme.indexOf("## Cultivar files"));
        examples = examples.substring(examples.indexOf("```yaml") + 7);
        Path file = Files.writeString(folder.resolve("readme.yaml"), examples.substring(0, examples.indexOf("```")));
        List<Cultivar> cultivars = CultivarFile.read(file, new Notices());
        Set<String> shown = new TreeSet<>();
        cultivars.forEach(cultivar -> shown.add(cultivar.model().id()));
        assertEquals(new TreeSet<>(HardinessModels.words()), shown);
    }
}
