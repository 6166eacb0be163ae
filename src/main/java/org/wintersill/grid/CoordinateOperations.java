package org.wintersill.grid;

/** Port: finds the operation between two coordinate reference systems. */
public interface CoordinateOperations {

    /**
     * The operation from one system to another.
     *
     * @throws RuntimeException with a problem for the user when there is none
     */
    CoordinateOperation between(Crs from, Crs to);

    /** WGS 84 longitude and latitude, EPSG:4326. */
    Crs wgs84();
}
