package org.wintersill.comparison;

/**
 * Where a range lies: area, centroid, heights. Cells are added one by one in a fixed order. On a longitude-latitude grid the
 * centroid is that of points on a sphere, elsewhere that of the plane of the map. Used by one thread.
 */
public final class RangeTotals {
    /** Heights are counted in steps of a metre between these. */
    private static final int LOWEST = -500;
    private static final int HIGHEST = 9000;

    private final boolean sphere;
    private final double[] sums = new double[3];
    private final double[] areaByHeight = new double[HIGHEST - LOWEST + 1];
    private double areaWithHeight;
    private double area;
    private long cells;

    /** @param sphere whether coordinates are degrees of longitude and latitude */
    public RangeTotals(boolean sphere) {
        this.sphere = sphere;
    }

    /**
     * Adds a cell.
     *
     * @param areaKm2 its area
     * @param height metres; NaN for none
     */
    public void add(double x, double y, double areaKm2, float height) {
        cells++;
        area += areaKm2;
        if (sphere) {
            double latitude = Math.toRadians(y);
            double longitude = Math.toRadians(x);
            sums[0] += areaKm2 * Math.cos(latitude) * Math.cos(longitude);
            sums[1] += areaKm2 * Math.cos(latitude) * Math.sin(longitude);
            sums[2] += areaKm2 * Math.sin(latitude);
        } else {
            sums[0] += areaKm2 * x;
            sums[1] += areaKm2 * y;
        }
        if (height == height) {
            int step = Math.max(LOWEST, Math.min(HIGHEST, Math.round(height)));
            areaByHeight[step - LOWEST] += areaKm2;
            areaWithHeight += areaKm2;
        }
    }

    public double areaKm2() {
        return area;
    }

    public long cells() {
        return cells;
    }

    /** x and y of the area-weighted centroid; NaN for an empty range. */
    public double[] centroid() {
        if (cells == 0) {
            return new double[] {Double.NaN, Double.NaN};
        }
        if (!sphere) {
            return new double[] {sums[0] / area, sums[1] / area};
        }
        return new double[] {Math.toDegrees(Math.atan2(sums[1], sums[0])),
            Math.toDegrees(Math.atan2(sums[2], Math.hypot(sums[0], sums[1])))};
    }

    /**
     * Height that a share of the area does not exceed, to the metre; NaN where no cell has a height.
     *
     * @param share 0..1
     */
    public double height(double share) {
        if (areaWithHeight == 0) {
            return Double.NaN;
        }
        double sum = 0;
        for (int step = 0; step < areaByHeight.length; step++) {
            sum += areaByHeight[step];
            if (sum >= share * areaWithHeight * (1 - 1e-12) && areaByHeight[step] > 0) {
                return LOWEST + step;
            }
        }
        return HIGHEST;
    }
}
