package org.wintersill.config;

import java.util.List;

/**
 * Parcels to describe at the end of a run, or from its outputs.
 *
 * @param polygons the file, and its columns for ids and names
 * @param sheets which parcels get a page of their own
 * @param sheetIds ids of those parcels where {@code sheets} is {@link Sheets#SOME}; empty otherwise
 */
public record ParcelsConfig(PolygonEntry polygons, Sheets sheets, List<String> sheetIds) {

    /** Which parcels get a page. */
    public enum Sheets {
        /** All, unless there are very many. */
        AUTO,
        /** All. */
        ALL,
        /** Those named. */
        SOME,
        /** None. */
        NONE
    }

    public ParcelsConfig {
        sheetIds = List.copyOf(sheetIds);
    }

    /** What a list of words asks for: {@code all}, {@code none}, {@code auto} alone, or ids. */
    public static ParcelsConfig of(PolygonEntry polygons, List<String> sheets) {
        if (sheets.isEmpty() || sheets.equals(List.of("auto"))) {
            return new ParcelsConfig(polygons, Sheets.AUTO, List.of());
        }
        if (sheets.equals(List.of("all")) || sheets.equals(List.of("none"))) {
            return new ParcelsConfig(polygons, sheets.equals(List.of("all")) ? Sheets.ALL : Sheets.NONE, List.of());
        }
        return new ParcelsConfig(polygons, Sheets.SOME, sheets);
    }
}
