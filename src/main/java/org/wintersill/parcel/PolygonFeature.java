package org.wintersill.parcel;

/**
 * One row of a file of polygons.
 *
 * @param number number of the row as the file counts it
 * @param id what identifies it, as the file gives it; the number where no column does
 * @param name a name for people; empty where there is none
 * @param outline where it lies; empty where the row has no usable polygon
 * @param remark what was repaired, or why there is no outline; empty if all is well
 */
public record PolygonFeature(long number, String id, String name, Outline outline, String remark) {
}
