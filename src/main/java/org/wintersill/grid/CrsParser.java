package org.wintersill.grid;

import java.util.Map;

/**
 * Port: understands what files say about their coordinate reference system.
 *
 * <p>All methods throw {@link org.wintersill.problem.ProblemException} when the definition is not understood.
 */
public interface CrsParser {

    /** The system of an authority code such as {@code EPSG:4326}. */
    Crs fromCode(String code);

    /** The system of a definition in WKT 1 or WKT 2. */
    Crs fromWkt(String wkt);

    /**
     * The system of a CF grid mapping variable.
     *
     * @param attributes attributes by name; a value is a String, a Double, or a double[] where there are several numbers
     * @param metresPerAxisUnit length in metres of one unit of the projected axes, in which false easting and northing
     *                          are given too; 1 for angles
     */
    Crs fromGridMapping(Map<String, Object> attributes, double metresPerAxisUnit);
}
