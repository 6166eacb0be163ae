package org.wintersill.run;

import java.nio.file.Path;
import java.util.List;
import org.wintersill.grid.GridGeometry;
import org.wintersill.hardiness.Cultivar;
import org.wintersill.io.crs.CrsDefinitions;
import org.wintersill.io.geopackage.ClassPolygons;
import org.wintersill.io.geopackage.CrsRow;
import org.wintersill.io.geopackage.GeoPackageWriter;
import org.wintersill.io.geopackage.SuitabilityLayer;
import org.wintersill.io.style.QmlWriter;
import org.wintersill.io.style.SldWriter;
import org.wintersill.layer.LayerStyles;
import org.wintersill.time.CfDate;

/** {@code layers.gpkg}: suitability polygons of every cultivar with their areas, styles and the record. */
final class PackageOutput {
    private static final String VOCABULARY = "https://www.iana.org/assignments/media-types/application/json";

    private PackageOutput() {
    }

    /**
     * Writes the file.
     *
     * @param classes {@code [cultivar][cell]}
     * @param areas one a cultivar
     * @param record provenance, JSON
     */
    static void write(Path file, RunPlan plan, String period, byte[][] classes, List<ClassAreas> areas, String record) {
        GridGeometry grid = plan.target();
        try (GeoPackageWriter writer = GeoPackageWriter.create(file, lastChange(plan))) {
            int srs = writer.addCrs(CrsRow.of(grid.crs(), CrsDefinitions.wkt2(grid.crs()), CrsRow.FIRST_OWN_ID));
            SuitabilityLayer layer = new SuitabilityLayer(writer, srs, "Suitability, winters " + period,
                    plan.config().title() + ". Class by the frequency of killing winters, winters " + period + ", cells of "
                            + grid.cellWidth() + " x " + grid.cellHeight() + ". " + Caution.SHORT, LayerStyles.suitability());
            for (int c = 0; c < plan.cultivars().size(); c++) {
                addCultivar(layer, plan, plan.cultivars().get(c), new ClassPolygons(grid, classes[c]), areas.get(c));
            }
            layer.style(QmlWriter.polygons(LayerStyles.suitability(), "class"),
                    SldWriter.polygons(LayerStyles.suitability(), "class"));
            writer.metadata(VOCABULARY, record);
            writer.finish();
        }
    }

    private static void addCultivar(SuitabilityLayer layer, RunPlan plan, Cultivar cultivar, ClassPolygons polygons, ClassAreas areas) {
        for (int code : polygons.classes()) {
            layer.add(new SuitabilityLayer.Row(cultivar.id(), cultivar.name(), cultivar.species(), cultivar.status().word(), code,
                    areas.areaKm2()[code], areas.share(code), areas.lowest()[code], areas.mean()[code], areas.highest()[code],
                    areas.cells()[code]), polygons.dissolve(code));
        }
    }

    /** End of the period: never the clock, so that the same input gives the same bytes. */
    private static String lastChange(RunPlan plan) {
        CfDate end = plan.seasons().get(plan.seasons().size() - 1).last();
        return new CfDate(end.year(), end.month(), Math.min(28, end.day())) + "T00:00:00.000Z";
    }
}
