package org.wintersill.io.crs;

/** A map projection: degrees from the system's own prime meridian to metres, in place. Thread-safe. */
interface PlaneProjection {

    /** @return false if the point has no image */
    boolean forward(double[] xy, int at);

    /** @return false if the point has no image */
    boolean inverse(double[] xy, int at);
}
