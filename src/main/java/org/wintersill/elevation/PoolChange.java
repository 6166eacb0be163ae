package org.wintersill.elevation;

/** How much pools of cold air lower the minimum of target cells on a night of full strength. */
public interface PoolChange {

    /** Change of a target row, {@code [column]}, K; 0 where there is none, never NaN. Shared, not copied. */
    float[] row(int targetRow);

    /** Bytes that all rows take. */
    long bytes();
}
