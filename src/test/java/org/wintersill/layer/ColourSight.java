package org.wintersill.layer;

/** Colours as people see them, for tests: distances in CIE 1976 L*a*b*, for normal and red-green blind sight. */
public final class ColourSight {
    /** Machado, Oliveira and Fernandes 2009, IEEE TVCG 15(6), 1291-1298: severity 1.0, on linear RGB. */
    public static final double[][][] SIGHT = {
        {{1, 0, 0}, {0, 1, 0}, {0, 0, 1}},
        {{0.152286, 1.052583, -0.204868}, {0.114503, 0.786281, 0.099216}, {-0.003882, -0.048116, 1.051998}},
        {{0.367322, 0.860646, -0.227968}, {0.280085, 0.672501, 0.047413}, {-0.011820, 0.042940, 0.968881}}};
    /** sRGB to XYZ with white D65, IEC 61966-2-1. */
    private static final double[][] XYZ = {
        {0.4124564, 0.3575761, 0.1804375}, {0.2126729, 0.7151522, 0.0721750}, {0.0193339, 0.1191920, 0.9503041}};
    private static final double[] WHITE = {0.95047, 1, 1.08883};

    private ColourSight() {
    }

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

    static double[] lab(Colour colour, double[][] sight) {
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

    /** Distance of two colours for one kind of sight. */
    public static double distance(Colour a, Colour b, double[][] sight) {
        double[] one = lab(a, sight);
        double[] other = lab(b, sight);
        return Math.sqrt(Math.pow(one[0] - other[0], 2) + Math.pow(one[1] - other[1], 2)
                + Math.pow(one[2] - other[2], 2));
    }
}
