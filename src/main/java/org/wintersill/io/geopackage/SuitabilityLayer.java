package org.wintersill.io.geopackage;

import java.util.List;
import org.locationtech.jts.geom.Geometry;
import org.locationtech.jts.geom.MultiPolygon;
import org.locationtech.jts.geom.Polygon;
import org.wintersill.layer.LayerStyle;

/**
 * The table {@code suitability}: where a cultivar is secure, workable, marginal or unfit, one row a cultivar and class, or
 * one a connected part. Geometries are multipolygons throughout.
 */
public final class SuitabilityLayer {

    public static final String TABLE = "suitability";

    /**
     * What is known of the area of one row.
     *
     * @param cultivar id of the cultivar
     * @param cultivarName readable name
     * @param species species, may be null
     * @param status how well founded the curve is, as the cultivar file says; may be null
     * @param classCode class, 1..4
     * @param areaKm2 area on the ellipsoid, square kilometres
     * @param share share of the area of all cells that have a class, 0..1
     * @param elevationMin lowest ground, m; NaN without terrain model
     * @param elevationMean mean ground height, m; NaN without terrain model
     * @param elevationMax highest ground, m; NaN without terrain model
     * @param cells number of cells
     */
    public record Row(String cultivar, String cultivarName, String species, String status, int classCode, double areaKm2,
                      double share, double elevationMin, double elevationMean, double elevationMax, long cells) {
    }

    private final FeatureTable table;
    private final GeoPackageWriter writer;
    private final LayerStyle.Classes classes;

    /**
     * Makes the table.
     *
     * @param srsId reference system, already added to the writer
     * @param title readable title of the layer
     * @param description abstract: period, scenario, caution
     * @param classes the classes with their names
     */
    public SuitabilityLayer(GeoPackageWriter writer, int srsId, String title, String description,
                            LayerStyle.Classes classes) {
        this.writer = writer;
        this.classes = classes;
        Constraint names = new Constraint.Enumeration("suitability_class", classes.entries().stream()
                .map(entry -> new Constraint.Value(entry.name(), entry.label())).toList());
        Constraint codes = new Constraint.Enumeration("suitability_code", classes.entries().stream()
                .map(entry -> new Constraint.Value(Integer.toString(entry.code()), entry.name())).toList());
        table = writer.features(new TableDefinition(TABLE, title, description, "MULTIPOLYGON", srsId, List.of(
                Column.text("cultivar", "Cultivar", "id of the cultivar"),
                Column.text("cultivar_name", "Cultivar name", "readable name of the cultivar"),
                Column.text("species", "Species", "species of the cultivar"),
                Column.text("status", "Status", "how well founded the hardiness curve is"),
                new Column("class_code", ColumnType.SMALLINT, "Class code", "class as a number, as the rasters store it",
                        "", codes),
                new Column("class", ColumnType.TEXT, "Class", "class by frequency of killing winters", "", names),
                Column.number("area_km2", "Area", "area on the ellipsoid", "km2"),
                Column.fraction("share", "Share", "share of the area of all cells that have a class for the cultivar"),
                Column.number("elevation_min", "Lowest ground", "lowest elevation of the terrain model", "m"),
                Column.number("elevation_mean", "Mean ground", "mean elevation of the terrain model", "m"),
                Column.number("elevation_max", "Highest ground", "highest elevation of the terrain model", "m"),
                Column.count("cells", "Cells", "number of grid cells"))));
    }

    /**
     * Adds a row; a single polygon is stored as a multipolygon of one.
     *
     * @throws IllegalArgumentException when the class is not among those of the layer
     */
    public void add(Row row, Geometry area) {
        Geometry multi = area instanceof Polygon polygon
                ? polygon.getFactory().createMultiPolygon(new Polygon[] {polygon}) : (MultiPolygon) area;
        table.add(multi, row.cultivar(), row.cultivarName(), row.species(), row.status(), row.classCode(),
                className(row.classCode()), row.areaKm2(), row.share(), row.elevationMin(), row.elevationMean(),
                row.elevationMax(), row.cells());
    }

    /** Stores the look of the layer, as QML and SLD over the column {@code class}. */
    public void style(String qml, String sld) {
        writer.style(TABLE, classes.id(), qml, sld, classes.title());
    }

    private String className(int code) {
        return classes.entries().stream().filter(entry -> entry.code() == code).findFirst()
                .orElseThrow(() -> new IllegalArgumentException("no class has the code " + code)).name();
    }
}
