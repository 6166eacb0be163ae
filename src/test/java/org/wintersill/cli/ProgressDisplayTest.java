package org.wintersill.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.ByteArrayOutputStream;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import org.junit.jupiter.api.Test;

class ProgressDisplayTest {
    private static final long SECOND = 1_000_000_000L;
    private final ByteArrayOutputStream bytes = new ByteArrayOutputStream();
    private final PrintStream stream = new PrintStream(bytes, true, StandardCharsets.UTF_8);
    private long now;

    @Test
    void aPipeGetsPlainLinesEvery30SecondsOr5Percent() {
        ProgressDisplay display = new ProgressDisplay(stream, false, () -> now);
        display.begin("Winters", 1000);
        for (int second = 1; second <= 100; second++) {
            now += SECOND;
            display.advance(second <= 60 ? 1 : 20);
        }
        now += SECOND;
        display.end();
        String[] lines = text().split("\n");
        assertEquals("[00:30] Winters: 3 %, 1.0/s, 16:10 left", lines[0]);
        assertEquals("[01:00] Winters: 6 %, 1.0/s, 15:40 left", lines[1]);
        assertTrue(lines[2].startsWith("[01:03] Winters: 12 %"), lines[2]);
        assertTrue(lines[lines.length - 1].equals("[01:41] Winters: done in 01:41"), text());
        assertFalse(text().contains("\r"));
    }

    @Test
    void aShortJobOnAPipeSaysNothing() {
        ProgressDisplay display = new ProgressDisplay(stream, false, () -> now);
        display.begin("Winters", 10);
        display.advance(10);
        display.end();
        assertEquals("", text());
    }

    @Test
    void aTerminalGetsOneLineThatGivesWayToMessages() {
        ProgressDisplay display = new ProgressDisplay(stream, true, () -> now);
        display.begin("Winters", 200);
        now += 4 * SECOND;
        display.advance(100);
        display.advance(1);
        display.print("note: x");
        display.end();
        String text = text();
        assertTrue(text.startsWith("\rWinters: 0 %\rWinters: 50 %, 25/s, 00:04 left"), text);
        assertTrue(text.contains("\rnote: x\n\rWinters: 50 %"), text);
        assertTrue(text.endsWith("\r[00:04] Winters: done in 00:04\n"), text);
        assertFalse(text.contains("\u001b"));
    }

    @Test
    void figuresAreShortInEveryLocale() {
        assertEquals("1.5 M", ProgressDisplay.rate(1_500_000));
        assertEquals("12 k", ProgressDisplay.rate(12_000));
        assertEquals("950", ProgressDisplay.rate(950));
        assertEquals("0.3", ProgressDisplay.rate(0.3));
        assertEquals("1:01:05", ProgressDisplay.time(3665 * SECOND));
    }

    private String text() {
        return bytes.toString(StandardCharsets.UTF_8).replace(System.lineSeparator(), "\n");
    }
}
