package org.wintersill.io.geopackage;

import java.util.ArrayList;
import java.util.List;
import org.wintersill.grid.GridGeometry;
import org.wintersill.layer.LayerDefinition;
import org.wintersill.layer.LayerStyle;
import org.wintersill.layer.SampleType;

/** A table of points, one a cell that has a value in any layer, with the layers as columns: {@code cells}. */
public final class CellLayer {

    private static final int FIXED_COLUMNS = 2;

    private final FeatureTable table;
    private final GridGeometry grid;
    private final List<LayerDefinition> layers;

    /**
     * Makes the table.
     *
     * @param tableName {@code cells}, or another where there is one table a cultivar
     * @param srsId reference system of the grid, already added to the writer
     * @param layers the columns, in their order
     */
    public CellLayer(GeoPackageWriter writer, String tableName, int srsId, String title, String description,
                     GridGeometry grid, List<LayerDefinition> layers) {
        this.grid = grid;
        this.layers = List.copyOf(layers);
        List<Column> columns = new ArrayList<>();
        columns.add(Column.count("grid_row", "Row", "row of the grid, from 0 in the north"));
        columns.add(Column.count("grid_column", "Column", "column of the grid, from 0 in the west"));
        for (LayerDefinition layer : layers) {
            columns.add(column(layer));
        }
        table = writer.features(new TableDefinition(tableName, title, description, "POINT", srsId, columns));
    }

    private static Column column(LayerDefinition layer) {
        ColumnType type = layer.type() == SampleType.FLOAT32 ? ColumnType.DOUBLE
                : layer.type() == SampleType.INT16 ? ColumnType.MEDIUMINT : ColumnType.SMALLINT;
        Constraint constraint = null;
        if (layer.style() instanceof LayerStyle.Classes classes) {
            constraint = new Constraint.Enumeration(classes.id().replace('-', '_') + "_code", classes.entries().stream()
                    .map(entry -> new Constraint.Value(Integer.toString(entry.code()), entry.name())).toList());
        }
        return new Column(layer.column(), type, layer.title(), layer.description(), layer.unit(), constraint);
    }

    /**
     * Adds the cells of full-width rows.
     *
     * @param firstRow row of the grid of the first value
     * @param values {@code [layer][row * columns + column]}, NaN for no value; integer layers hold whole numbers
     */
    public void addRows(int firstRow, int rows, float[][] values) {
        Object[] row = new Object[FIXED_COLUMNS + layers.size()];
        for (int r = 0; r < rows; r++) {
            for (int column = 0; column < grid.columns(); column++) {
                if (fill(row, values, r * grid.columns() + column)) {
                    row[0] = firstRow + r;
                    row[1] = column;
                    table.addPoint(grid.centreX(column), grid.centreY(firstRow + r), row);
                }
            }
        }
    }

    /** Puts the values of a cell into a row; false if there are none. */
    private boolean fill(Object[] row, float[][] values, int cell) {
        boolean any = false;
        for (int layer = 0; layer < values.length; layer++) {
            float value = values[layer][cell];
            boolean present = !Float.isNaN(value);
            any |= present;
            row[FIXED_COLUMNS + layer] = !present ? null
                    : layers.get(layer).type() == SampleType.FLOAT32 ? (Object) value : (Object) Math.round(value);
        }
        return any;
    }
}
