package org.wintersill.io.geopackage;

/**
 * A column of a table.
 *
 * @param name column name: lower-case letters, digits and underscores, at most 30
 * @param type how it is stored
 * @param title a few words, shown as heading
 * @param description what the value means
 * @param unit unit as text; empty or {@code 1} for pure numbers and texts
 * @param constraint legal values; null for none
 */
public record Column(String name, ColumnType type, String title, String description, String unit, Constraint constraint) {

    public Column {
        TableDefinition.requireName(name);
    }

    public static Column text(String name, String title, String description) {
        return new Column(name, ColumnType.TEXT, title, description, "", null);
    }

    public static Column number(String name, String title, String description, String unit) {
        return new Column(name, ColumnType.DOUBLE, title, description, unit, null);
    }

    public static Column count(String name, String title, String description) {
        return new Column(name, ColumnType.INTEGER, title, description, "", null);
    }

    /** A column of values from 0 to 1. */
    public static Column fraction(String name, String title, String description) {
        return new Column(name, ColumnType.DOUBLE, title, description, "1", Constraint.fraction());
    }

    /** Title with the unit, as headings show it. */
    String heading() {
        return hasUnit() ? title + " (" + unit + ")" : title;
    }

    /** Description with the unit named. */
    String fullDescription() {
        return hasUnit() ? description + "; unit " + unit : description;
    }

    private boolean hasUnit() {
        return !unit.isEmpty() && !unit.equals("1");
    }
}
