package org.wintersill.layer;

/** How the values of a layer are stored, with the one missing value of each type. */
public enum SampleType {
    /** Quantities: margins, probabilities, temperatures. */
    FLOAT32(4, -9999),
    /** Counts, years, day numbers. */
    INT16(2, -9999),
    /** Classes, numbered from 1. */
    BYTE(1, 0);

    private final int bytes;
    private final int nodata;

    SampleType(int bytes, int nodata) {
        this.bytes = bytes;
        this.nodata = nodata;
    }

    public int bytes() {
        return bytes;
    }

    /** The missing value, one a type, never a value that can occur. */
    public int nodata() {
        return nodata;
    }
}
