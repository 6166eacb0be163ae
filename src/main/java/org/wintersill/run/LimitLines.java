package org.wintersill.run;

import java.nio.file.Path;
import java.util.List;
import org.wintersill.comparison.LimitLine;
import org.wintersill.grid.Block;
import org.wintersill.grid.GridGeometry;
import org.wintersill.io.crs.CrsDefinitions;
import org.wintersill.io.geopackage.Column;
import org.wintersill.io.geopackage.CrsRow;
import org.wintersill.io.geopackage.FeatureTable;
import org.wintersill.io.geopackage.GeoPackageWriter;
import org.wintersill.io.geopackage.MergedLines;
import org.wintersill.io.geopackage.TableDefinition;
import org.wintersill.io.geotiff.read.PlainRaster;
import org.wintersill.io.style.QmlWriter;
import org.wintersill.io.style.SldWriter;
import org.wintersill.layer.LayerStyles;

/** Where the frequency of killing winters meets the target, as lines in {@code changes.gpkg}: one row a cultivar and period. */
final class LimitLines {
    private static final String TABLE = "limit_lines";
    private static final int ROWS_AT_ONCE = 256;

    private final ComparisonRun run;
    private final FeatureTable table;

    private LimitLines(ComparisonRun run, FeatureTable table) {
        this.run = run;
        this.table = table;
    }

    static void write(ComparisonRun run, Path file, String lastChange, String record) {
        GridGeometry grid = run.base().grid();
        try (GeoPackageWriter writer = GeoPackageWriter.create(file, lastChange)) {
            int srs = writer.addCrs(CrsRow.of(grid.crs(), CrsDefinitions.wkt2(grid.crs()), CrsRow.FIRST_OWN_ID));
            FeatureTable table = writer.features(new TableDefinition(TABLE, "Limit lines", "Where the frequency of killing winters equals "
                    + run.target() + ", between cell centres. " + Caution.SHORT, "MULTILINESTRING", srs, List.of(
                    Column.text("cultivar", "Cultivar", "id of the cultivar"),
                    Column.text("side", "Side", "base or other"),
                    Column.text("run", "Run", "name of the run that the line belongs to"),
                    Column.text("winters", "Winters", "first and last winter"),
                    Column.number("target", "Target", "frequency of killing winters", "1"))));
            LimitLines lines = new LimitLines(run, table);
            for (String cultivar : run.cultivars()) {
                lines.add(run.base(), "base", "base", cultivar);
                for (ComparisonRun.Other other : run.others()) {
                    lines.add(other.folder(), "other", other.name(), cultivar);
                }
            }
            writer.style(TABLE, "limit-lines", QmlWriter.lines(LayerStyles.limitLines(), "side"),
                    SldWriter.lines(LayerStyles.limitLines(), "side"), "Limit of the range");
            writer.metadata(PackageOutput.VOCABULARY, record);
            writer.finish();
        }
    }

    private void add(FinishedFolder folder, String side, String name, String cultivar) {
        MergedLines lines = new MergedLines();
        GridGeometry grid = folder.grid();
        LimitLine line = new LimitLine(grid, run.target(), lines::add);
        try (PlainRaster raster = folder.required(cultivar, "damage-probability-" + run.killing())) {
            for (int row = 0; row < grid.rows(); row += ROWS_AT_ONCE) {
                Block block = new Block(0, row, grid.columns(), Math.min(ROWS_AT_ONCE, grid.rows() - row));
                float[] values = new float[block.cells()];
                raster.read(0, block, values);
                for (int r = 0; r < block.rows(); r++) {
                    line.row(values, r * grid.columns());
                }
            }
        }
        List<String> winters = folder.winters();
        table.addLines(lines, cultivar, side, name, winters.get(0) + " to " + winters.get(winters.size() - 1),
                run.target());
    }
}
