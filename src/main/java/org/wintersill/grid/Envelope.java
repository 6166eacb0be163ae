package org.wintersill.grid;

import java.io.Serializable;

/** A rectangle in the coordinates of one reference system: outer edges. */
public record Envelope(double west, double south, double east, double north) implements Serializable {

    public Envelope {
        if (!(west <= east) || !(south <= north)) {
            throw new IllegalArgumentException("edges in the wrong order: " + west + " " + south + " " + east + " " + north);
        }
    }

    public boolean contains(double x, double y) {
        return x >= west && x <= east && y >= south && y <= north;
    }

    public double width() {
        return east - west;
    }

    public double height() {
        return north - south;
    }
}
