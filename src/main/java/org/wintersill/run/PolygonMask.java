package org.wintersill.run;

import java.util.BitSet;
import org.wintersill.config.PolygonEntry;
import org.wintersill.grid.CoordinateOperations;
import org.wintersill.grid.GridGeometry;
import org.wintersill.parcel.CentreMask;
import org.wintersill.parcel.OutlinePlacement;
import org.wintersill.parcel.PolygonFeature;
import org.wintersill.parcel.PolygonReader;
import org.wintersill.problem.Notices;

/**
 * The cells of a grid whose centres lie in a polygon of a file.
 *
 * @param inside {@code row * columns + column}
 * @param system name of the polygons' reference system
 * @param swapped whether nothing lies on the grid, and something would if x and y changed places
 */
record PolygonMask(BitSet inside, String system, boolean swapped) {

    /**
     * Reads the file once, polygon by polygon.
     *
     * @param notices told of polygons that were repaired or cannot be used
     */
    static PolygonMask of(GridGeometry grid, PolygonEntry entry, InputFormats formats, CoordinateOperations operations, Notices notices) {
        try (PolygonReader reader = formats.polygons(entry)) {
            // Rows are even here: the rule asks for centres, and areas do not matter.
            OutlinePlacement placement = new OutlinePlacement(grid, operations.between(reader.crs(), grid.crs()), y -> y);
            CentreMask mask = new CentreMask(grid.columns(), grid.rows());
            CentreMask turned = new CentreMask(grid.columns(), grid.rows());
            for (PolygonFeature feature = reader.next(); feature != null; feature = reader.next()) {
                if (!feature.remark().isEmpty()) {
                    notices.add(entry.file() + ", polygon " + feature.id() + ": " + feature.remark());
                }
                mask.add(placement.place(feature.outline()).rings());
                if (mask.inside().isEmpty()) {
                    turned.add(placement.place(feature.outline().swapped()).rings());
                }
            }
            return new PolygonMask(mask.inside(), reader.crs().label(), mask.inside().isEmpty() && !turned.inside().isEmpty());
        }
    }
}
