package org.wintersill.config;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Random;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.IntRange;
import net.jqwik.api.lifecycle.AfterContainer;
import net.jqwik.api.lifecycle.BeforeContainer;
import org.wintersill.io.cultivar.CultivarFile;
import org.wintersill.problem.Notices;
import org.wintersill.problem.ProblemException;

/** Whatever happens to the text of a file, it is read or refused, never anything else. */
class DamagedTextLaws {
    private static final String RUN = """
            title: &t Tarnmoor basin
            temperature:
              minimum: {files: [a.nc, 'b*.nc', "c.nc"], variable: tn, unit: degC, scale: 0.1, first-day: 2019-02-30}
            elevation: {dem: dem.tif, source-height: dem-mean, lapse-rate: [3, 3, 4, 4, 5, 5, 5, 5, 4, 4, 3, -1.5]}
            winter: {from: 10-01, to: 04-30, complete: 11-01..03-31}
            cultivars: {files: [c.yaml], use: [slate, amber]}
            damage: {levels: [90, 20, 50], killing: 20}
            classes: [0.1, 0.2, 0.3]
            area: {bbox: [2600000, 1100000, 2700000, 1200000]}
            limits: {threads: 2, memory: 1.5g}
            """;
    private static final String CULTIVARS = """
            cultivars:
              - id: amber
                model: dated
                source: 'made up'
                status: invented
                curve:
                  - {date: 10-10, lt10: -7.5, lt50: -9, lt90: -11}
                  - {date: 02-29, lt50: -24, spread: 1.2}
              - {id: r, model: response, source: s, status: invented, mean-days: 5, spread: 1,
                 autumn: {tender-limit: -3, hardy-limit: -25, steepness: 0.55, midpoint: 6},
                 spring: {tender-limit: -3, hardy-limit: -25, steepness: 0.7, midpoint: 2}, spring-from: {chilling: [600, 900]}}
              - {id: t, built-in: grapevine-merlot, variants: [{id: a, offset: 1}, {id: b, offset: -1}],
                 after-budbreak: {built-in: grapevine-stages, degree-days: {base: 10, at: {bud burst: 0, first leaf: 35}}}}
              - {id: x, model: relaxation, source: s, status: invented, initial: -8, time-constants: [3, 7], lt10-above: 2,
                 lt90-below: 3, target: {level: 2, temperature: {slope: 0.6, from: -10, to: 12}, night: {slope: -1, from: 9, to: 15}}}
              - {id: p, built-in: peach-stages, dates: {first swelling: 03-10, full bloom: 04-12}, before-first: hold}
            """;
    private static final List<String> PIECES = List.of("{", "}", "[", "]", ":", ": ", "- ", "*t", "&t ", "!!int ", "'", "\"", "\n", "\t",
            "#", "|", ">", "%", "---\n", "?", "~", "-1e999", "99999999999", "\0", "\u2028", "\ud83c\udf31", "..", "-", ".", "=");
    private static Path folder;

    @BeforeContainer
    static void makeFolder() throws IOException {
        folder = Files.createTempDirectory("damaged-text");
    }

    @AfterContainer
    static void removeFolder() throws IOException {
        Files.deleteIfExists(folder.resolve("run.yaml"));
        Files.deleteIfExists(folder.resolve("c.yaml"));
        Files.deleteIfExists(folder);
    }

    @Property(tries = 1500)
    void aRunFileIsReadOrRefused(@ForAll long seed, @ForAll @IntRange(min = 1, max = 6) int changes) throws IOException {
        Path file = Files.write(folder.resolve("run.yaml"), damaged(RUN, seed, changes));
        try {
            ConfigReader.read(file, Map.of());
        } catch (ProblemException e) {
            e.problems().forEach(Object::toString);
        }
    }

    @Property(tries = 1500)
    void aCultivarFileIsReadOrRefused(@ForAll long seed, @ForAll @IntRange(min = 1, max = 6) int changes) throws IOException {
        Path file = Files.write(folder.resolve("c.yaml"), damaged(CULTIVARS, seed, changes));
        try {
            CultivarFile.read(file, new Notices());
        } catch (ProblemException e) {
            e.problems().forEach(Object::toString);
        }
    }

    private static byte[] damaged(String text, long seed, int changes) {
        Random random = new Random(seed);
        StringBuilder damaged = new StringBuilder(text);
        for (int change = 0; change < changes; change++) {
            int at = random.nextInt(damaged.length());
            switch (random.nextInt(3)) {
                case 0 -> damaged.insert(at, PIECES.get(random.nextInt(PIECES.size())));
                case 1 -> damaged.deleteCharAt(at);
                default -> damaged.replace(at, Math.min(damaged.length(), at + 1 + random.nextInt(8)),
                        PIECES.get(random.nextInt(PIECES.size())));
            }
        }
        byte[] bytes = damaged.toString().getBytes(StandardCharsets.UTF_8);
        if (random.nextInt(20) == 0) {
            bytes[random.nextInt(bytes.length)] = (byte) random.nextInt(256);
        }
        return bytes;
    }
}
