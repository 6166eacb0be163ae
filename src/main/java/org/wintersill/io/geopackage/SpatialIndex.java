package org.wintersill.io.geopackage;

import java.util.List;

/**
 * The statements of the spatial index of one table (OGC 12-128r17, annex F.3). The triggers keep the index right when
 * another program edits the table; they are made after the load, so that they cost nothing while it runs.
 */
final class SpatialIndex {

    private SpatialIndex() {
    }

    static String name(String table) {
        return "rtree_" + table + "_geom";
    }

    static String create(String table) {
        return "CREATE VIRTUAL TABLE \"" + name(table) + "\" USING rtree(id, minx, maxx, miny, maxy)";
    }

    static String insert(String table) {
        return "INSERT INTO \"" + name(table) + "\" VALUES (?, ?, ?, ?, ?)";
    }

    /** The six triggers of version 1.3; version 1.4 has other ones. */
    static List<String> triggers(String table) {
        String index = "\"" + name(table) + "\"";
        String on = " ON \"" + table + "\" ";
        String filled = "(NEW.\"geom\" NOTNULL AND NOT ST_IsEmpty(NEW.\"geom\"))";
        String empty = "(NEW.\"geom\" ISNULL OR ST_IsEmpty(NEW.\"geom\"))";
        String put = "INSERT OR REPLACE INTO " + index + " VALUES (NEW.\"fid\", ST_MinX(NEW.\"geom\"), "
                + "ST_MaxX(NEW.\"geom\"), ST_MinY(NEW.\"geom\"), ST_MaxY(NEW.\"geom\")); ";
        String remove = "DELETE FROM " + index + " WHERE id = OLD.\"fid\"; ";
        String sameRow = "WHEN OLD.\"fid\" = NEW.\"fid\" AND ";
        String movedRow = "WHEN OLD.\"fid\" != NEW.\"fid\" AND ";
        return List.of(
                trigger(table, "insert", "AFTER INSERT" + on + "WHEN " + filled, put),
                trigger(table, "update1", "AFTER UPDATE OF \"geom\"" + on + sameRow + filled, put),
                trigger(table, "update2", "AFTER UPDATE OF \"geom\"" + on + sameRow + empty, remove),
                trigger(table, "update3", "AFTER UPDATE" + on + movedRow + filled, remove + put),
                trigger(table, "update4", "AFTER UPDATE" + on + movedRow + empty,
                        "DELETE FROM " + index + " WHERE id IN (OLD.\"fid\", NEW.\"fid\"); "),
                trigger(table, "delete", "AFTER DELETE" + on + "WHEN OLD.\"geom\" NOTNULL", remove));
    }

    private static String trigger(String table, String event, String when, String action) {
        return "CREATE TRIGGER \"" + name(table) + "_" + event + "\" " + when + " BEGIN " + action + "END";
    }
}
