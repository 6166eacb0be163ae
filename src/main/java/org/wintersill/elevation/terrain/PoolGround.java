package org.wintersill.elevation.terrain;

import org.wintersill.elevation.PoolChange;
import org.wintersill.grid.Block;

/**
 * The ground of a target grid as {@link ColdPools} see it: index, class and cooling by row. Worked out once, all rows by
 * {@link #prepare}, or a row at a time where only a few are asked for; both give the same.
 */
public final class PoolGround implements PoolChange {
    /** Rows that a task takes: those of a tile of {@link LocalHeights}. */
    private static final int TASK_ROWS = 192;
    private static final int BYTES_A_CELL = 9;

    private final ColdPools pools;
    private final Relief relief;
    private final Block block;
    private final float[][] index;
    private final float[][] change;
    private final byte[][] classes;

    /**
     * @param relief the terrain model, with as much of the surroundings of the target as its windows reach
     * @param block the target's cells in it
     */
    public PoolGround(ColdPools pools, Relief relief, Block block) {
        this.pools = pools;
        this.relief = relief;
        this.block = block;
        index = new float[block.rows()][];
        change = new float[block.rows()][];
        classes = new byte[block.rows()][];
    }

    /** The number of tasks of {@link #prepare}. */
    public int tasks() {
        return (block.rows() + TASK_ROWS - 1) / TASK_ROWS;
    }

    /** Works out the rows of one task. */
    public void prepare(int task) {
        int first = task * TASK_ROWS;
        take(first, Math.min(block.rows(), first + TASK_ROWS));
    }

    private void take(int first, int end) {
        Block rows = new Block(block.column(), block.row() + first, block.columns(), end - first);
        ColdPools.Ground ground = pools.over(relief, rows, Tasks.inOrder());
        for (int row = first; row < end; row++) {
            int from = (row - first) * block.columns();
            int to = from + block.columns();
            index[row] = java.util.Arrays.copyOfRange(ground.index(), from, to);
            classes[row] = java.util.Arrays.copyOfRange(ground.classes(), from, to);
            float[] cooling = java.util.Arrays.copyOfRange(ground.change(), from, to);
            for (int i = 0; i < cooling.length; i++) {
                // A void has no height and so no temperature; it must not spoil its neighbours in a loop over the row.
                cooling[i] = cooling[i] == cooling[i] ? cooling[i] : 0;
            }
            change[row] = cooling;
        }
    }

    private void have(int row) {
        if (change[row] == null) {
            take(row, row + 1);
        }
    }

    @Override
    public float[] row(int targetRow) {
        have(targetRow);
        return change[targetRow];
    }

    /** Pool index of a target row, {@code [column]}, 0..1, NaN for a void. */
    public float[] indexRow(int targetRow) {
        have(targetRow);
        return index[targetRow];
    }

    /** Codes of {@link ColdAirClass} of a target row, 0 for none. */
    public byte[] classRow(int targetRow) {
        have(targetRow);
        return classes[targetRow];
    }

    @Override
    public long bytes() {
        return (long) BYTES_A_CELL * block.cells() + 4L * relief.columns() * relief.rows();
    }
}
