package org.wintersill.io.yaml;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.wintersill.problem.Problem;
import org.wintersill.problem.ProblemException;

class YamlReaderTest {
    @TempDir
    Path folder;

    @Test
    void valuesKnowTheirLine() {
        YamlValue.Mapping map = (YamlValue.Mapping) parse("a: 1\nb:\n  - x\n  - 'null'\nc: {d: ~}\n");
        assertEquals("f.yaml:1", map.entries().get("a").place());
        YamlValue.Sequence list = assertInstanceOf(YamlValue.Sequence.class, map.entries().get("b"));
        assertEquals("f.yaml:4", list.items().get(1).place());
        assertEquals(false, ((YamlValue.Text) list.items().get(1)).absent());
        assertEquals(true, ((YamlValue.Text) ((YamlValue.Mapping) map.entries().get("c")).entries().get("d")).absent());
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', ignoreLeadingAndTrailingWhitespace = true, value = {
        "a: !!java.io.File [x]              | 1 | tag",
        "a: !home x                         | 1 | tag",
        "a: 1~b: 2~a: 3                     | 3 | key a stands here and already at f.yaml:1",
        "a: *.nc                            | 1 | begins with * (such as the pattern *.nc) needs quotation marks",
        "a: &a [*a]                         | 1 | no anchor",
        "a: x: y                            | 1 | ': '",
        "a:~\tb: 1                          | 2 | not with tabs",
        "a: 1~---~b: 2                      | 2 | more than one document",
        "a: 'x~b                            | 2 | not YAML",
        "{a: 1                              | 1 | not YAML",
        "%YAML 3.0~---~a: 1                 | 1 | only YAML 1.2",
        "? [1, 2]~: x                       | 1 | key must be a text",
        "a: `x`                             | 1 | not YAML"})
    void whatIsNoPlainYamlIsRefusedWithItsLine(String text, int line, String words) {
        ProblemException refused = assertThrows(ProblemException.class, () -> parse(text.replace('~', '\n')));
        assertEquals("f.yaml:" + line, refused.problems().get(0).where(), refused.getMessage());
        assertTrue(refused.getMessage().contains(words), refused.getMessage());
    }

    @Test
    void depthAndAliasesAreBounded() {
        assertRefused("[".repeat(100_000), "nested");
        StringBuilder laughs = new StringBuilder("a0: &a0 [x, x, x, x, x, x, x, x, x, x]\n");
        for (int i = 1; i < 9; i++) {
            laughs.append("a").append(i).append(": &a").append(i).append(" [").append(("*a" + (i - 1) + " , ").repeat(10)).append("]\n");
        }
        assertRefused(laughs.toString(), "aliases");
    }

    @Test
    void filesThatAreNoTextAreRefused() throws Exception {
        Path latin = Files.write(folder.resolve("latin.yaml"), "title: H\u00fcgel".getBytes(StandardCharsets.ISO_8859_1));
        assertFileRefused(latin, "UTF-8");
        assertFileRefused(Files.write(folder.resolve("large.yaml"), new byte[YamlReader.LARGEST_FILE + 1]), "larger than 4 MiB");
        assertFileRefused(folder, "folder");
        Files.writeString(folder.resolve("run.yaml"), "");
        assertFileRefused(folder.resolve("rnu.yaml"), "Did you mean run.yaml?");
        assertFileRefused(folder.resolve("none/run.yaml"), "folder does not exist");
    }

    @Test
    void aByteOrderMarkAndAnEmptyFileAreRead() throws Exception {
        Path marked = Files.writeString(folder.resolve("marked.yaml"), "\ufefftitle: x");
        assertTrue(((YamlValue.Mapping) new YamlReader(Problem.Kind.USAGE).read(marked)).entries().containsKey("title"));
        Path empty = Files.writeString(folder.resolve("empty.yaml"), "# nothing\n");
        assertTrue(((YamlValue.Mapping) new YamlReader(Problem.Kind.USAGE).read(empty)).entries().isEmpty());
    }

    @Test
    void whatIsWrittenReadsTheSame() {
        Map<String, Object> tree = new LinkedHashMap<>();
        tree.put("title", "true");
        tree.put("colon", "a: b # c");
        tree.put("star", "*.nc");
        tree.put("null", "~");
        tree.put("date", "10-10");
        tree.put("accent", "H\u00fcgel\n\"x\"");
        tree.put("numbers", List.of(4.5, 1e-3, 10));
        YamlValue.Mapping read = (YamlValue.Mapping) parse(YamlText.of(tree));
        tree.forEach((key, value) -> {
            if (value instanceof String text) {
                YamlValue.Text found = (YamlValue.Text) read.entries().get(key);
                assertEquals(text, found.text());
                assertEquals(false, found.absent());
            }
        });
        assertEquals("0.001", ((YamlValue.Text) ((YamlValue.Sequence) read.entries().get("numbers")).items().get(1)).text()
                .replace("1.0E-3", "0.001"));
    }

    private static YamlValue parse(String text) {
        return new YamlReader(Problem.Kind.USAGE).parse(text, "f.yaml");
    }

    private static void assertRefused(String text, String words) {
        ProblemException refused = assertThrows(ProblemException.class, () -> parse(text));
        assertTrue(refused.getMessage().contains(words), refused.getMessage());
    }

    private static void assertFileRefused(Path file, String words) {
        ProblemException refused = assertThrows(ProblemException.class, () -> new YamlReader(Problem.Kind.USAGE).read(file));
        assertTrue(refused.getMessage().contains(words), refused.getMessage());
    }
}
