package org.wintersill.layer;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import org.junit.jupiter.api.Test;

/**
 * Colours are compared as distances in CIE 1976 L*a*b* (2.3 is the just noticeable difference of Mahy, van Eycken and
 * Oosterlinck 1994), for normal sight and as red-green blind people see them.
 */
class LayerStylesTest {
    private static final double NEIGHBOURS = 8;
    private static final double CLASSES = 20;
    /** Choice has up to seven classes in sequence. */
    private static final double CHOICES = 10;

    private static List<Colour> colours(LayerStyle style) {
        return style instanceof LayerStyle.Ramp ramp ? ramp.stops().stream().map(LayerStyle.Stop::colour).toList()
                : ((LayerStyle.Classes) style).entries().stream().map(LayerStyle.Entry::colour).toList();
    }

    private static void allApart(LayerStyle style, double least) {
        List<Colour> colours = colours(style);
        for (double[][] sight : ColourSight.SIGHT) {
            for (int i = 0; i < colours.size(); i++) {
                for (int j = 0; j < i; j++) {
                    double distance = ColourSight.distance(colours.get(i), colours.get(j), sight);
                    assertTrue(distance >= least, style.id() + " " + colours.get(i).hex() + " and "
                            + colours.get(j).hex() + " are " + distance + " apart");
                }
            }
        }
    }

    @Test
    void theLabOfWhiteBlackAndRedIsThatOfTheStandard() {
        // Lab of sRGB red under D65, from the CIE 1976 formulas: 53.24, 80.09, 67.20 (B. Lindbloom's calculator).
        double[] red = ColourSight.lab(Colour.hex("#ff0000"), ColourSight.SIGHT[0]);
        assertEquals(53.24, red[0], 0.01);
        assertEquals(80.09, red[1], 0.02);
        assertEquals(67.20, red[2], 0.02);
        assertEquals(100, ColourSight.lab(Colour.hex("#ffffff"), ColourSight.SIGHT[0])[0], 1e-3);
        assertEquals(0, ColourSight.lab(Colour.hex("#000000"), ColourSight.SIGHT[0])[0], 1e-9);
    }

    @Test
    void noTwoStopsOfARampLookAlikeToTheRedGreenBlind() {
        for (LayerStyle style : LayerStyles.all()) {
            if (style instanceof LayerStyle.Ramp) {
                allApart(style, NEIGHBOURS);
            }
        }
    }

    @Test
    void noTwoClassesLookAlikeToTheRedGreenBlind() {
        allApart(LayerStyles.suitability(), CLASSES);
        allApart(LayerStyles.fitFlag(), CLASSES);
        allApart(LayerStyles.trendSignificance(), CLASSES);
        allApart(LayerStyles.coldAir(), CLASSES);
        for (int cultivars = 1; cultivars <= 6; cultivars++) {
            allApart(LayerStyles.choice(cultivars), CHOICES);
        }
    }

    @Test
    void sequencesRunThroughLightnessWithoutTurning() {
        for (LayerStyle style : List.of(LayerStyles.probability(), LayerStyles.damage(), LayerStyles.temperature(),
                LayerStyles.night(), LayerStyles.year(), LayerStyles.count(), LayerStyles.share(),
                LayerStyles.returnPeriod(), LayerStyles.spread(), LayerStyles.lapseRateSpread(), LayerStyles.fitCorrelation())) {
            for (double[][] sight : ColourSight.SIGHT) {
                List<Double> lightness = new ArrayList<>();
                colours(style).forEach(colour -> lightness.add(ColourSight.lab(colour, sight)[0]));
                double way = Math.signum(lightness.get(1) - lightness.get(0));
                for (int i = 1; i < lightness.size(); i++) {
                    assertTrue(way * (lightness.get(i) - lightness.get(i - 1)) > 4, style.id() + " at " + i);
                }
            }
        }
    }

    @Test
    void divergingRampsAreLightestAtZeroAndTellTheSignApart() {
        for (LayerStyle.Ramp ramp : List.of(LayerStyles.margin(), LayerStyles.requiredHardiness(),
                LayerStyles.heightChange(), LayerStyles.temperatureChange(), LayerStyles.lapseRate(), LayerStyles.trend(), LayerStyles.shape())) {
            List<Colour> colours = colours(ramp);
            int middle = colours.size() / 2;
            assertEquals(0, ramp.stops().get(middle).value());
            for (double[][] sight : ColourSight.SIGHT) {
                for (int i = 1; i <= middle; i++) {
                    Colour below = colours.get(middle - i);
                    Colour above = colours.get(middle + i);
                    assertTrue(ColourSight.lab(below, sight)[0] < ColourSight.lab(colours.get(middle - i + 1), sight)[0]);
                    assertTrue(ColourSight.lab(above, sight)[0] < ColourSight.lab(colours.get(middle + i - 1), sight)[0]);
                    assertTrue(ColourSight.distance(below, above, sight) > 25, ramp.id() + " " + i);
                }
            }
        }
    }

    @Test
    void zeroMarginIsNotThePaperOfTheMap() {
        Colour paper = Colour.hex("#ffffff");
        for (LayerStyle style : LayerStyles.all()) {
            for (double[][] sight : ColourSight.SIGHT) {
                colours(style).forEach(colour -> assertTrue(ColourSight.distance(colour, paper, sight) > 8,
                        style.id() + " " + colour.hex()));
            }
        }
    }

    @Test
    void idsAreUniqueFileNamesAndTextsAreFilled() {
        Set<String> ids = new HashSet<>();
        for (LayerStyle style : LayerStyles.all()) {
            assertTrue(ids.add(style.id()) && style.id().matches("[a-z]+(-[a-z]+)*"), style.id());
            assertTrue(!style.title().isBlank());
        }
    }

    @Test
    void requiredHardinessMirrorsTheMargin() {
        List<LayerStyle.Stop> margin = LayerStyles.margin().stops();
        List<LayerStyle.Stop> lacking = LayerStyles.requiredHardiness().stops();
        for (int i = 0; i < margin.size(); i++) {
            LayerStyle.Stop mirrored = lacking.get(lacking.size() - 1 - i);
            assertEquals(margin.get(i).colour(), mirrored.colour());
            assertEquals(-margin.get(i).value(), mirrored.value(), 0);
        }
    }

    @Test
    void choiceHasAClassForEveryCountFromNone() {
        for (int cultivars : new int[] {1, 2, 7, 254}) {
            List<LayerStyle.Entry> entries = LayerStyles.choice(cultivars).entries();
            assertEquals(cultivars + 1, entries.size());
            for (int count = 0; count <= cultivars; count++) {
                assertEquals(count, entries.get(count).code());
            }
        }
        assertThrows(IllegalArgumentException.class, () -> LayerStyles.choice(0));
        assertThrows(IllegalArgumentException.class, () -> LayerStyles.choice(255));
    }

    @Test
    void rampsMadeToMeasureCoverTheirRange() {
        for (int last = 1990; last < 2100; last++) {
            List<LayerStyle.Stop> stops = LayerStyles.year(1990, last).stops();
            assertEquals(1990, stops.get(0).value());
            assertEquals(Math.max(last, 1991), stops.get(stops.size() - 1).value());
            assertTrue(stops.size() >= 2);
        }
        assertEquals(1, LayerStyles.count(0).stops().get(1).value());
    }
}
