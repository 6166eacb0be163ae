package org.wintersill.season;

/**
 * The values of one winter in one lane of cells. Arrays are {@code [cell of the lane]}, NaN where the winter does not count.
 * Planes are numbered so that a store can keep them without knowing what they mean: {@link #plane(int)}.
 */
public final class WinterValues {
    private final int levels;
    private final int cultivars;
    private final DamageReckoning reckoning;
    private final float[][] planes;

    WinterValues(int cultivars, int levels, DamageReckoning reckoning, int cells) {
        this.cultivars = cultivars;
        this.levels = levels;
        this.reckoning = reckoning;
        planes = new float[planes(cultivars, levels, reckoning)][cells];
    }

    /**
     * Number of planes: the minimum, for each cultivar a margin a level, the damage and the worst night, and after all of these what
     * else the reckoning keeps of each cultivar; last what it keeps of the winter itself.
     */
    public static int planes(int cultivars, int levels, DamageReckoning reckoning) {
        return 1 + cultivars * (levels + 2 + reckoning.extraPlanes()) + (reckoning.coldNight().isPresent() ? 2 : 0);
    }

    /** Plane of the lowest minimum. */
    public static int minimumPlane() {
        return 0;
    }

    /** Plane of a cultivar's margin to the lethal temperature of a level; level 0 is LT50. */
    public static int marginPlane(int cultivar, int level, int levels) {
        return 1 + cultivar * (levels + 2) + level;
    }

    public static int damagePlane(int cultivar, int levels) {
        return marginPlane(cultivar, levels, levels);
    }

    public static int worstNightPlane(int cultivar, int levels) {
        return marginPlane(cultivar, levels + 1, levels);
    }

    /** Empty values of as many planes as these, for another number of cells. */
    public WinterValues room(int cells) {
        return new WinterValues(cultivars, levels, reckoning, cells);
    }

    /**
     * Puts the values of a block of cells in their place among wider rows.
     *
     * @param block values of {@code rows * columns} cells, row by row
     * @param first place of the block's first cell among these
     * @param rowLength cells of a row of these
     */
    public void put(WinterValues block, int rows, int columns, int first, int rowLength) {
        for (int plane = 0; plane < planes.length; plane++) {
            for (int row = 0; row < rows; row++) {
                System.arraycopy(block.planes[plane], row * columns, planes[plane], first + row * rowLength, columns);
            }
        }
    }

    /** Plane of the number of cold nights; only where the reckoning counts them. The next one is that of the longest run. */
    public static int coldNightsPlane(int cultivars, int levels, DamageReckoning reckoning) {
        return 1 + cultivars * (levels + 2 + reckoning.extraPlanes());
    }

    /** Plane of a cultivar's expected damage with uncertainty; only where the reckoning keeps it. */
    public static int expectedDamagePlane(int cultivar, int cultivars, int levels, DamageReckoning reckoning) {
        return 1 + cultivars * (levels + 2) + cultivar * reckoning.extraPlanes();
    }

    /** Plane of a cultivar's damage when autumn (0) or midwinter (1) ended; only where the reckoning keeps it. */
    public static int damageAtPlane(int cultivar, int phaseEnd, int cultivars, int levels, DamageReckoning reckoning) {
        return expectedDamagePlane(cultivar, cultivars, levels, reckoning) + (reckoning.keepsExpected() ? 1 : 0) + phaseEnd;
    }

    public int planeCount() {
        return planes.length;
    }

    public float[] plane(int plane) {
        return planes[plane];
    }

    /** Lowest minimum temperature of the winter, degrees Celsius. */
    public float[] minimum() {
        return planes[minimumPlane()];
    }

    /** Lowest margin, K. */
    public float[] margin(int cultivar, int level) {
        return planes[marginPlane(cultivar, level, levels)];
    }

    /** Fraction of buds killed, 0..1. */
    public float[] damage(int cultivar) {
        return planes[damagePlane(cultivar, levels)];
    }

    /** Position in the window of the earliest night of the lowest margin, a whole number. */
    public float[] worstNight(int cultivar) {
        return planes[worstNightPlane(cultivar, levels)];
    }

    /** Number of cold nights; only where the reckoning counts them. */
    public float[] coldNights() {
        return planes[coldNightsPlane(cultivars, levels, reckoning)];
    }

    /** Longest run of cold nights; likewise. */
    public float[] coldSpell() {
        return planes[coldNightsPlane(cultivars, levels, reckoning) + 1];
    }

    /** Expected fraction of buds killed with uncertainty, 0..1; only where the reckoning keeps it. */
    public float[] expectedDamage(int cultivar) {
        return planes[expectedDamagePlane(cultivar, cultivars, levels, reckoning)];
    }

    /** Fraction of buds killed when autumn (0) or midwinter (1) ended, 0..1; only where the reckoning keeps it. */
    public float[] damageAt(int cultivar, int phaseEnd) {
        return planes[damageAtPlane(cultivar, phaseEnd, cultivars, levels, reckoning)];
    }
}
