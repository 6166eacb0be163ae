package org.wintersill.run;

import java.nio.file.Path;
import java.util.List;
import java.util.function.Consumer;
import org.wintersill.grid.GridGeometry;
import org.wintersill.hardiness.Cultivar;
import org.wintersill.io.crs.CrsDefinitions;
import org.wintersill.io.geopackage.CellLayer;
import org.wintersill.io.geopackage.ClassPolygons;
import org.wintersill.io.geopackage.CrsRow;
import org.wintersill.io.geopackage.GeoPackageWriter;
import org.wintersill.io.geopackage.SuitabilityLayer;
import org.wintersill.io.style.QmlWriter;
import org.wintersill.io.style.SldWriter;
import org.wintersill.layer.LayerStyles;

/** {@code layers.gpkg}: suitability polygons of every cultivar with their areas, styles and the record. */
final class PackageOutput {
    static final String VOCABULARY = "https://www.iana.org/assignments/media-types/application/json";

    private static final int LONGEST_TABLE_NAME = 30;

    private final RunPlan plan;
    private final SummaryPass summaries;
    private final double[] rowAreasKm2;
    private final String period;

    /** @param rowAreasKm2 area of a cell in each row of the target */
    PackageOutput(RunPlan plan, SummaryPass summaries, double[] rowAreasKm2, String period) {
        this.plan = plan;
        this.summaries = summaries;
        this.rowAreasKm2 = rowAreasKm2;
        this.period = period;
    }

    /**
     * Writes the file.
     *
     * @param areas by class, one a cultivar
     * @param record provenance, JSON
     * @param more adds further tables
     */
    void write(Path file, List<ClassAreas> areas, String record, Consumer<GeoPackageWriter> more) {
        GridGeometry grid = plan.target();
        try (GeoPackageWriter writer = GeoPackageWriter.create(file, PeriodEnd.of(plan.seasons()) + "T00:00:00.000Z")) {
            int srs = writer.addCrs(CrsRow.of(grid.crs(), CrsDefinitions.wkt2(grid.crs()), CrsRow.FIRST_OWN_ID));
            SuitabilityLayer layer = new SuitabilityLayer(writer, srs, "Suitability, winters " + period,
                    plan.config().title() + ". Class by the frequency of killing winters, winters " + period + ", cells of "
                            + grid.cellWidth() + " x " + grid.cellHeight() + "; one set of polygons a cultivar, so filter by cultivar. "
                            + Caution.SHORT, LayerStyles.suitability());
            for (int c = 0; c < plan.cultivars().size(); c++) {
                addCultivar(layer, plan.cultivars().get(c), summaries.classes()[c], areas.get(c));
            }
            layer.style(QmlWriter.polygons(LayerStyles.suitability(), "class"), SldWriter.polygons(LayerStyles.suitability(), "class"));
            if (plan.config().outputs().cells()) {
                for (int c = 0; c < plan.cultivars().size(); c++) {
                    addCells(writer, srs, c);
                }
            }
            more.accept(writer);
            writer.metadata(VOCABULARY, record);
            writer.finish();
        }
    }

    private void addCultivar(SuitabilityLayer layer, Cultivar cultivar, byte[] classes, ClassAreas areas) {
        ClassPolygons polygons = new ClassPolygons(plan.target(), classes);
        if (!plan.config().outputs().parts()) {
            for (int code : polygons.classes()) {
                layer.add(row(cultivar, code, areas, code, areas.total()), polygons.dissolve(code));
            }
            return;
        }
        ClassAreas parts = ClassAreas.of(polygons.partCount(), polygons::part, plan.target().columns(), rowAreasKm2, plan.adjustment());
        for (int code : polygons.classes()) {
            polygons.parts(code, (part, polygon) -> layer.add(row(cultivar, code, parts, part, areas.total()), polygon));
        }
    }

    private static SuitabilityLayer.Row row(Cultivar cultivar, int code, ClassAreas areas, int group, double total) {
        return new SuitabilityLayer.Row(cultivar.id(), cultivar.name(), cultivar.species(), cultivar.status().word(), code,
                areas.areaKm2()[group], areas.areaKm2()[group] / total, areas.lowest()[group], areas.mean()[group],
                areas.highest()[group], areas.cells()[group]);
    }

    /** The cells of a cultivar as points with all its summaries. */
    private void addCells(GeoPackageWriter writer, int srs, int number) {
        Cultivar cultivar = plan.cultivars().get(number);
        String name = "cells_" + cultivar.id().replace('-', '_');
        String table = name.length() <= LONGEST_TABLE_NAME ? name : "cells_" + (number + 1);
        CellLayer layer = new CellLayer(writer, table, srs,
                "Cells of " + cultivar.id() + ", winters " + period, "Summaries of every cell for " + cultivar.name() + ", curve "
                        + cultivar.status().word() + ". " + Caution.SHORT, plan.target(), summaries.cultivarLayers(number));
        summaries.eachRow(number, layer::addRows);
        writer.style(table, "margin-low", QmlWriter.graduatedPoints(LayerStyles.margin(), "margin_low"),
                SldWriter.graduatedPoints(LayerStyles.margin(), "margin_low"), "Margin, one winter in ten");
    }
}
