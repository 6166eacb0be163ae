package org.wintersill.io.geopackage;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.List;
import org.wintersill.grid.Crs;
import org.wintersill.grid.GridGeometry;
import org.wintersill.layer.Colour;
import org.wintersill.layer.LayerDefinition;
import org.wintersill.layer.LayerStyle;
import org.wintersill.layer.SampleType;

/** A small GeoPackage with every kind of table, made by the writers under test. */
final class SampleGeoPackage {

    static final String LAST_CHANGE = "2020-05-31T00:00:00.000Z";
    static final Crs LAEA = new Crs("EPSG:3035", "ETRS89-extended / LAEA Europe", resource("epsg-3035.wkt1"),
            Crs.Kind.PROJECTED, 1, null);
    static final String LAEA_WKT2 = resource("epsg-3035.wkt2");
    static final LayerStyle.Classes CLASSES = new LayerStyle.Classes("suitability", "Suitability", List.of(
            new LayerStyle.Entry(1, "secure", "secure", Colour.hex("#2166ac")),
            new LayerStyle.Entry(2, "workable", "workable", Colour.hex("#92c5de")),
            new LayerStyle.Entry(3, "marginal", "marginal", Colour.hex("#f4a582")),
            new LayerStyle.Entry(4, "unfit", "unfit", Colour.hex("#b2182b"))));
    private static final LayerStyle RAMP = new LayerStyle.Ramp("margin", "Margin", List.of(
            new LayerStyle.Stop(-5, Colour.hex("#b2182b"), "-5 K"), new LayerStyle.Stop(5, Colour.hex("#2166ac"), "5 K")));
    private static final int COLUMNS = 10;
    private static final int ROWS = 15;

    private SampleGeoPackage() {
    }

    static Path write(Path file) {
        try (GeoPackageWriter writer = GeoPackageWriter.create(file, LAST_CHANGE)) {
            int srs = writer.addCrs(CrsRow.of(LAEA, LAEA_WKT2, CrsRow.FIRST_OWN_ID));
            suitability(writer, srs);
            cells(writer, srs);
            FeatureTable table = writer.features(TableDefinition.attributes("parcel_cultivars", "Parcels by cultivar",
                    "one row a parcel and cultivar", List.of(
                            Column.text("parcel", "Parcel", "name of the parcel"),
                            Column.fraction("covered_share", "Covered share", "share of the parcel with data"),
                            new Column("killing_night", ColumnType.DATE, "Killing night", "a night", "", null),
                            new Column("warned", ColumnType.BOOLEAN, "Warned", "whether a warning applies", "", null))));
            table.addAttributes("Upper slope", 0.75, "2012-02-06", true);
            table.addAttributes(null, Double.NaN, null, false);
            writer.metadata("https://www.w3.org/ns/prov", "{\"entity\": {}}");
            writer.finish();
        }
        return file;
    }

    private static void suitability(GeoPackageWriter writer, int srs) {
        byte[] codes = new byte[COLUMNS * ROWS];
        for (int i = 0; i < codes.length; i++) {
            int row = i / COLUMNS;
            int column = i % COLUMNS;
            codes[i] = (byte) (row % 5 == 2 && column == 4 ? 0 : 1 + (row / 4 + (column * row % 3 == 1 ? 1 : 0)) % 4);
        }
        ClassPolygons polygons = new ClassPolygons(
                new GridGeometry(COLUMNS, ROWS, 4_321_000, 3_210_000, 100, 50, LAEA), codes);
        SuitabilityLayer layer = new SuitabilityLayer(writer, srs, "Suitability", "classes by killing winters", CLASSES);
        for (int code : polygons.classes()) {
            double ground = code == 4 ? Double.NaN : 100 * code;
            layer.add(new SuitabilityLayer.Row("riesling", "Riesling & Co <1>", "Vitis vinifera", null, code, 1.25,
                    0.25, ground, ground + 5.5, ground + 50, 30), polygons.dissolve(code));
        }
        layer.style(resource("suitability.qml"), resource("suitability.sld"));
    }

    private static void cells(GeoPackageWriter writer, int srs) {
        LayerDefinition margin = new LayerDefinition("margin-worst", "Worst margin", "lowest margin of all winters", "K",
                SampleType.FLOAT32, "", RAMP);
        LayerDefinition damage = new LayerDefinition("damage-mean", "Mean damage", "expected fraction killed", "1",
                SampleType.FLOAT32, "", RAMP);
        LayerDefinition winters = new LayerDefinition("valid-winters", "Valid winters", "winters that count", "1",
                SampleType.INT16, "", RAMP);
        LayerDefinition suitability = new LayerDefinition("suitability", "Suitability", "class", "1", SampleType.BYTE, "",
                CLASSES);
        GridGeometry grid = new GridGeometry(4, 3, 4_321_000, 3_210_000, 100, 50, LAEA);
        CellLayer layer = new CellLayer(writer, "cells", srs, "Cells", "summary layers, cell by cell", grid,
                List.of(margin, damage, winters, suitability));
        float none = Float.NaN;
        layer.addRows(0, 1, new float[][] {{1, none, none, -2.5f}, {0, 0.3f, none, 1}, {30, 29, none, 30}, {1, 2, none, 4}});
        layer.addRows(1, 2, new float[][] {new float[8], new float[8], new float[8], {1, 1, 2, 2, 3, 3, 4, 4}});
    }

    private static String resource(String name) {
        try (var stream = SampleGeoPackage.class.getResourceAsStream("/io/geopackage/" + name)) {
            return new String(stream.readAllBytes(), StandardCharsets.UTF_8).strip();
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }
}
