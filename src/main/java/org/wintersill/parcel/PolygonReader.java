package org.wintersill.parcel;

import org.wintersill.grid.Crs;

/** Port: gives the rows of a file of polygons one after the other. Used by one thread. */
public interface PolygonReader extends AutoCloseable {

    /** Reference system of the outlines. */
    Crs crs();

    /** Name of the layer. */
    String layer();

    /** Column that the ids are taken from; empty where the rows' numbers are. */
    String idColumn();

    /**
     * The next row; null after the last.
     *
     * @throws org.wintersill.problem.ProblemException when the file is damaged
     */
    PolygonFeature next();

    @Override
    void close();
}
