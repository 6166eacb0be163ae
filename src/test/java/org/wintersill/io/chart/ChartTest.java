package org.wintersill.io.chart;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.awt.image.BufferedImage;
import java.io.ByteArrayInputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import javax.imageio.ImageIO;
import javax.xml.parsers.DocumentBuilderFactory;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.w3c.dom.Document;
import org.w3c.dom.Element;
import org.wintersill.layer.ColourSight;
import org.wintersill.problem.ProblemException;
import org.wintersill.time.CfCalendar;
import org.wintersill.time.SeasonWindow;

class ChartTest {
    private static final String HOSTILE = "</title><script>alert(1)</script>\"'& \u202egnp\u0000\ud800 ]]>";

    @TempDir
    Path folder;

    private static Chart chart(String name, Mark... marks) {
        return new Chart(name, List.of(name), name, Axis.linear(name, 0, 10),
                List.of(new Panel(name, Axis.linear(name, -5, 5), 200, List.of(marks))), List.of(name));
    }

    private static Mark.Points points(double[] x, double[] y) {
        return new Mark.Points(x, y, ChartColours.DANGER, Mark.Shape.DISC, "");
    }

    private static Document parsed(String svg) throws Exception {
        DocumentBuilderFactory factory = DocumentBuilderFactory.newInstance();
        factory.setNamespaceAware(true);
        return factory.newDocumentBuilder().parse(new ByteArrayInputStream(svg.getBytes(StandardCharsets.UTF_8)));
    }

    private static List<double[]> circles(String svg) throws Exception {
        List<double[]> places = new ArrayList<>();
        var found = parsed(svg).getElementsByTagName("circle");
        for (int i = 0; i < found.getLength(); i++) {
            Element circle = (Element) found.item(i);
            places.add(new double[] {Double.parseDouble(circle.getAttribute("cx")), Double.parseDouble(circle.getAttribute("cy"))});
        }
        return places;
    }

    @Test
    void hostileNamesAreTextAndNothingElse() throws Exception {
        Document svg = parsed(SvgChart.text(chart(HOSTILE, new Mark.Callout(1, 1, HOSTILE, ChartColours.INK),
                new Mark.Line(new double[] {0, 1}, new double[] {0, 1}, ChartColours.INK, Mark.Stroke.DASHED, HOSTILE))));
        assertEquals(0, svg.getElementsByTagName("script").getLength());
        String title = svg.getElementsByTagName("title").item(0).getTextContent();
        assertEquals("</title><script>alert(1)</script>\"'& gnp\ufffd\ufffd ]]>", title);
        assertEquals(title, svg.getDocumentElement().getAttribute("aria-label"));
        assertEquals(title, svg.getElementsByTagName("desc").item(0).getTextContent());
        assertTrue(PngChart.bytes(chart(HOSTILE)).length > 1000);
    }

    @Test
    void endlessNamesStayInThePicture() throws Exception {
        String name = "W".repeat(5000);
        Document svg = parsed(SvgChart.text(chart(name, new Mark.Callout(9, 1, name, ChartColours.INK))));
        var texts = svg.getElementsByTagName("text");
        for (int i = 0; i < texts.getLength(); i++) {
            assertTrue(texts.item(i).getTextContent().length() < 120, "text " + i);
        }
        assertTrue(Integer.parseInt(svg.getDocumentElement().getAttribute("height")) < 500);
    }

    @Test
    void valuesStandWhereTheAxesSay() throws Exception {
        double[] x = {0, 2.5, 10};
        double[] y = {-5, 1.25, 5};
        String svg = SvgChart.text(chart("a", points(x, y)));
        List<double[]> places = circles(svg);
        assertEquals(3, places.size());
        double left = places.get(0)[0];
        double right = places.get(2)[0];
        double bottom = places.get(0)[1];
        double top = places.get(2)[1];
        assertEquals(200, bottom - top, 0.01);
        assertEquals(left + 0.25 * (right - left), places.get(1)[0], 0.01);
        assertEquals(bottom - 0.625 * 200, places.get(1)[1], 0.01);
    }

    @Test
    void thePngShowsWhatTheSvgShows() throws Exception {
        Chart chart = chart("a", points(new double[] {1, 2.5, 7}, new double[] {-4, 1.25, 3}));
        BufferedImage image = ImageIO.read(new ByteArrayInputStream(PngChart.bytes(chart)));
        Element svg = parsed(SvgChart.text(chart)).getDocumentElement();
        assertEquals(2 * Integer.parseInt(svg.getAttribute("width")), image.getWidth());
        assertEquals(2 * Integer.parseInt(svg.getAttribute("height")), image.getHeight());
        assertEquals(ChartColours.PAPER.hex(), hex(image, 1, 1));
        for (double[] place : circles(SvgChart.text(chart))) {
            assertEquals(ChartColours.DANGER.hex(), hex(image, (int) (2 * place[0]), (int) (2 * place[1])));
        }
    }

    private static String hex(BufferedImage image, int x, int y) {
        return String.format(Locale.ROOT, "#%06x", image.getRGB(x, y) & 0xffffff);
    }

    @Test
    void whatIsMissingIsLeftOut() throws Exception {
        double nan = Double.NaN;
        double[] x = {0, 1, 2, 3, 4};
        double[] y = {0, 1, nan, 3, 4};
        assertEquals(4, circles(SvgChart.text(chart("a", points(x, y)))).size());
        assertEquals(4, circles(SvgChart.text(chart("a",
                new Mark.Drops(x, y, 0, ChartColours.SAFE, ChartColours.DANGER, "")))).size());
        String plain = SvgChart.text(chart("a"));
        String line = SvgChart.text(chart("a", new Mark.Line(x, y, ChartColours.COLD, Mark.Stroke.STRONG, "")));
        assertEquals(2, count(line, ChartColours.COLD.hex()) - count(plain, ChartColours.COLD.hex()));
        String band = SvgChart.text(chart("a", new Mark.Band(x, y, y, ChartColours.COLD, "")));
        assertEquals(2, count(band, ChartColours.COLD.hex()) - count(plain, ChartColours.COLD.hex()));
        assertFalse((line + band).contains("NaN"));
    }

    private static int count(String text, String part) {
        return text.split(part, -1).length - 1;
    }

    @Test
    void everyMarkHasItsSignInTheLegend() throws Exception {
        double[] x = {1, 2};
        List<Mark> marks = List.of(new Mark.Line(x, x, ChartColours.INK, Mark.Stroke.STRONG, "line"),
                new Mark.Band(x, x, x, ChartColours.INK, "band"),
                new Mark.Drops(x, x, 0, ChartColours.INK, ChartColours.INK, "drops"),
                new Mark.Points(x, x, ChartColours.INK, Mark.Shape.DIAMOND, "points"),
                new Mark.Spans(x, x, x, ChartColours.INK, "spans"), new Mark.Zone(0, 1, ChartColours.INK, "zone"),
                new Mark.Rule(0, ChartColours.INK, Mark.Stroke.FAINT, "rule"));
        for (Mark mark : marks) {
            String labelled = SvgChart.text(chart("a", mark));
            assertTrue(labelled.contains(">" + mark.label() + "</text>"), mark.label());
            String colour = ChartColours.INK.hex() + "\"";
            assertTrue(count(labelled, colour) >= count(SvgChart.text(chart("a")), colour) + 3, mark.label());
        }
    }

    @Test
    void theSameBytesInEveryLanguage() {
        Chart chart = chart("a", new Mark.Callout(2, 1.5, Axis.number(-1234.5, 2), ChartColours.INK));
        String before = SvgChart.text(chart);
        Locale usual = Locale.getDefault();
        try {
            Locale.setDefault(Locale.forLanguageTag("ar-EG-u-nu-arab"));
            assertEquals(before, SvgChart.text(chart("a", new Mark.Callout(2, 1.5, Axis.number(-1234.5, 2), ChartColours.INK))));
        } finally {
            Locale.setDefault(usual);
        }
        assertTrue(before.contains("\u22121234.50"));
    }

    @Test
    void ticksAreRoundNumbersInsideTheAxis() {
        Axis axis = Axis.around("K", new double[] {-3.2, Double.NaN, 17.9});
        assertEquals(List.of("\u22125", "0", "5", "10", "15", "20"), axis.ticks().stream().map(Axis.Tick::label).toList());
        assertEquals(List.of("0.1", "0.2", "0.5", "1", "2", "5", "10"),
                Axis.logarithmic("a", 0.1, 10).ticks().stream().map(Axis.Tick::label).toList());
        assertEquals(0.5, Axis.logarithmic("a", 1, 100).share(10), 1e-15);
        assertEquals(0, Axis.around("K", new double[] {Double.NaN}).from());
        assertThrows(IllegalArgumentException.class, () -> Axis.linear("a", 1, 1));
        assertThrows(IllegalArgumentException.class, () -> Axis.logarithmic("a", 0, 1));
        assertEquals("0.00", Axis.number(-0.001, 2));
        assertEquals("+0.10", Axis.signed(0.1, 2));
    }

    @Test
    void aWinterHasItsMonthsInEveryCalendar() {
        for (CfCalendar calendar : CfCalendar.values()) {
            Axis axis = Axis.winter(SeasonWindow.north().beginningIn(2011, calendar));
            assertEquals(List.of("Sep", "Oct", "Nov", "Dec", "Jan", "Feb", "Mar", "Apr", "May"),
                    axis.ticks().stream().map(Axis.Tick::label).toList());
        }
    }

    @Test
    void numbersHaveAtMostTwoDecimals() {
        assertArrayEquals(new String[] {"0", "-1.05", "12.5", "3", "0.01"},
                new String[] {SvgChart.number(-0.001), SvgChart.number(-1.05), SvgChart.number(12.5), SvgChart.number(2.999),
                    SvgChart.number(0.0051)});
    }

    @Test
    void seriesAreToldApartByTheRedGreenBlind() {
        for (double[][] sight : ColourSight.SIGHT) {
            for (int i = 0; i < 6; i++) {
                for (int j = 0; j < i; j++) {
                    double distance = ColourSight.distance(ChartColours.series(i), ChartColours.series(j), sight);
                    assertTrue(distance > 15, i + " and " + j + " are " + distance + " apart");
                }
                assertTrue(ColourSight.distance(ChartColours.series(i), ChartColours.PAPER, sight) > 30, "series " + i);
            }
            assertTrue(ColourSight.distance(ChartColours.SAFE, ChartColours.DANGER, sight) > 40);
            assertTrue(ColourSight.distance(ChartColours.COLD, ChartColours.HARDINESS, sight) > 20);
        }
    }

    @Test
    void filesAppearWholeAndReplaceNothing() throws Exception {
        Path svg = folder.resolve("a.svg");
        ChartFile.write(chart("a"), svg, false);
        byte[] first = Files.readAllBytes(svg);
        parsed(Files.readString(svg));
        ProblemException there = assertThrows(ProblemException.class, () -> ChartFile.write(chart("b"), svg, false));
        assertEquals(4, there.exitCode());
        assertArrayEquals(first, Files.readAllBytes(svg));
        ChartFile.write(chart("b"), svg, true);
        assertTrue(Files.readString(svg).contains("<title>b</title>"));
        ChartFile.write(chart("a"), folder.resolve("A.PNG"), false);
        assertEquals(2, assertThrows(ProblemException.class, () -> ChartFile.check(folder.resolve("a.pdf"), false)).exitCode());
        assertEquals(4, assertThrows(ProblemException.class, () -> ChartFile.check(folder.resolve("no/a.svg"), false)).exitCode());
        try (var files = Files.list(folder)) {
            assertEquals(List.of("A.PNG", "a.svg"), files.map(file -> file.getFileName().toString()).sorted().toList());
        }
    }
}
