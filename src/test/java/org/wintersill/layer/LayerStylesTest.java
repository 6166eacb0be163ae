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
    /** Machado, Oliveira and Fernandes 2009, IEEE TVCG 15(6), 1291-1298: severity 1.0, on linear RGB. */
    private static final double[][][] SIGHT = {
        {{1, 0, 0}, {0, 1, 0}, {0, 0, 1}},
        {{0.152286, 1.052583, -0.204868}, {0.114503, 0.786281, 0.099216}, {-0.003882, -0.048116, 1.051998}},
        {{0.367322, 0.860646, -0.227968}, {0.280085, 0.672501, 0.047413}, {-0.011820, 0.042940, 0.968881}}};
    /** sRGB to XYZ with white D65, IEC 61966-2-1. */
    private static final double[][] XYZ = {
        {0.4124564, 0.3575761, 0.1804375}, {0.2126729, 0.7151522, 0.0721750}, {0.0193339, 0.1191920, 0.9503041}};
    private static final double[] WHITE = {0.95047, 1, 1.08883};
    private static final double NEIGHBOURS = 8;
    private static final double CLASSES = 20;
    /** Choice has up to seven classes in sequence. */
    private static final double CHOICES = 10;

    private static double[] times(double[][] matrix, double[] vector) {
        double[] product = new double[3];
        for (int i = 0; i < 3; i++) {
            for (int j = 0; j < 3; j++) {
                product[i] += matrix[i][j] * vector[j];
            }
        }
        return product;
    }

    private static double linear(int value) {
        double share = value / 255.0;
        return share <= 0.04045 ? share / 12.92 : Math.pow((share + 0.055) / 1.055, 2.4);
    }

    private static double[] lab(Colour colour, double[][] sight) {
        double[] seen = times(sight, new double[] {linear(colour.red()), linear(colour.green()), linear(colour.blue())});
        for (int i = 0; i < 3; i++) {
            seen[i] = Math.max(0, Math.min(1, seen[i]));
        }
        double[] f = times(XYZ, seen);
        for (int i = 0; i < 3; i++) {
            double ratio = f[i] / WHITE[i];
            f[i] = ratio > 216.0 / 24389 ? Math.cbrt(ratio) : (24389.0 / 27 * ratio + 16) / 116;
        }
        return new double[] {116 * f[1] - 16, 500 * (f[0] - f[1]), 200 * (f[1] - f[2])};
    }

    private static double distance(Colour a, Colour b, double[][] sight) {
        double[] one = lab(a, sight);
        double[] other = lab(b, sight);
        return Math.sqrt(Math.pow(one[0] - other[0], 2) + Math.pow(one[1] - other[1], 2)
                + Math.pow(one[2] - other[2], 2));
    }

    private static List<Colour> colours(LayerStyle style) {
        return style instanceof LayerStyle.Ramp ramp ? ramp.stops().stream().map(LayerStyle.Stop::colour).toList()
                : ((LayerStyle.Classes) style).entries().stream().map(LayerStyle.Entry::colour).toList();
    }

    private static void allApart(LayerStyle style, double least) {
        List<Colour> colours = colours(style);
        for (double[][] sight : SIGHT) {
            for (int i = 0; i < colours.size(); i++) {
                for (int j = 0; j < i; j++) {
                    double distance = distance(colours.get(i), colours.get(j), sight);
                    assertTrue(distance >= least, style.id() + " " + colours.get(i).hex() + " and "
                            + colours.get(j).hex() + " are " + distance + " apart");
                }
            }
        }
    }

    @Test
    void theLabOfWhiteBlackAndRedIsThatOfTheStandard() {
        // Lab of sRGB red under D65, from the CIE 1976 formulas: 53.24, 80.09, 67.20 (B. Lindbloom's calculator).
        double[] red = lab(Colour.hex("#ff0000"), SIGHT[0]);
        assertEquals(53.24, red[0], 0.01);
        assertEquals(80.09, red[1], 0.02);
        assertEquals(67.20, red[2], 0.02);
        assertEquals(100, lab(Colour.hex("#ffffff"), SIGHT[0])[0], 1e-3);
        assertEquals(0, lab(Colour.hex("#000000"), SIGHT[0])[0], 1e-9);
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
        for (int cultivars = 1; cultivars <= 6; cultivars++) {
            allApart(LayerStyles.choice(cultivars), CHOICES);
        }
    }

    @Test
    void sequencesRunThroughLightnessWithoutTurning() {
        for (LayerStyle style : List.of(LayerStyles.probability(), LayerStyles.damage(), LayerStyles.temperature(),
                LayerStyles.night(), LayerStyles.year(), LayerStyles.count(), LayerStyles.share(),
                LayerStyles.returnPeriod())) {
            for (double[][] sight : SIGHT) {
                List<Double> lightness = new ArrayList<>();
                colours(style).forEach(colour -> lightness.add(lab(colour, sight)[0]));
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
                LayerStyles.heightChange())) {
            List<Colour> colours = colours(ramp);
            int middle = colours.size() / 2;
            assertEquals(0, ramp.stops().get(middle).value());
            for (double[][] sight : SIGHT) {
                for (int i = 1; i <= middle; i++) {
                    Colour below = colours.get(middle - i);
                    Colour above = colours.get(middle + i);
                    assertTrue(lab(below, sight)[0] < lab(colours.get(middle - i + 1), sight)[0]);
                    assertTrue(lab(above, sight)[0] < lab(colours.get(middle + i - 1), sight)[0]);
                    assertTrue(distance(below, above, sight) > 25, ramp.id() + " " + i);
                }
            }
        }
    }

    @Test
    void zeroMarginIsNotThePaperOfTheMap() {
        Colour paper = Colour.hex("#ffffff");
        for (LayerStyle style : LayerStyles.all()) {
            for (double[][] sight : SIGHT) {
                colours(style).forEach(colour -> assertTrue(distance(colour, paper, sight) > 8,
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
