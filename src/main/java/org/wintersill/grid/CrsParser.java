package org.wintersill.grid;

import java.util.Map;

/** Port: turns the ways in which files and people name a coordinate reference system into a {@link Crs}. */
public interface CrsParser {

    /**
     * @param code authority and code such as {@code EPSG:2056}
     * @throws org.wintersill.problem.ProblemException when the code is unknown
     */
    Crs fromCode(String code);

    /**
     * @param wkt definition as WKT 1 or WKT 2
     * @throws org.wintersill.problem.ProblemException when the text is damaged or its projection is not known
     */
    Crs fromWkt(String wkt);

    /**
     * @param attributes attributes of a CF grid-mapping variable: numbers, arrays of numbers or texts
     * @param metresPerAxisUnit length in metres of one unit of the coordinate axes; 1 for degrees
     * @throws org.wintersill.problem.ProblemException when the mapping is unknown or incomplete
     */
    Crs fromGridMapping(Map<String, Object> attributes, double metresPerAxisUnit);
}
