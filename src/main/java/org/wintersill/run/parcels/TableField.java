package org.wintersill.run.parcels;

import java.math.BigDecimal;
import java.math.RoundingMode;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.function.Function;
import org.wintersill.io.geopackage.Column;

/**
 * A column of a table with the value it shows, the same in GeoPackage and CSV.
 *
 * @param column name, meaning and unit
 * @param value what a row shows; null and NaN for nothing
 */
record TableField<R>(Column column, Function<R, Object> value) {
    private static final int LONGEST_NAME = 30;
    private static final int DECIMALS = 6;

    /** The columns of a table in their order, with names that are free. */
    static final class Fields<R> {
        private final List<TableField<R>> fields = new ArrayList<>();
        private final Set<String> names = new HashSet<>();

        Fields<R> text(String name, String title, String description, Function<R, Object> value) {
            return add(Column.text(free(name), title, description), value);
        }

        Fields<R> count(String name, String title, String description, Function<R, Object> value) {
            return add(Column.count(free(name), title, description), value);
        }

        Fields<R> number(String name, String title, String description, String unit, Function<R, Double> value) {
            return add(Column.number(free(name), title, description, unit), row -> rounded(value.apply(row)));
        }

        Fields<R> share(String name, String title, String description, Function<R, Double> value) {
            return add(Column.fraction(free(name), title, description), row -> rounded(value.apply(row)));
        }

        private Fields<R> add(Column column, Function<R, Object> value) {
            fields.add(new TableField<>(column, value));
            return this;
        }

        /** The name, shortened where GeoPackage needs it, and numbered where another column has it already. */
        private String free(String wanted) {
            String name = wanted.replace('-', '_');
            name = name.length() <= LONGEST_NAME ? name : name.replace("probability", "prob").replace("killing_winter_return", "killing_return");
            name = name.length() <= LONGEST_NAME ? name : name.substring(0, LONGEST_NAME);
            for (int i = 2; !names.add(name); i++) {
                String end = "_" + i;
                name = name.substring(0, Math.min(name.length(), LONGEST_NAME - end.length())) + end;
            }
            return name;
        }

        List<TableField<R>> list() {
            return List.copyOf(fields);
        }
    }

    private static Double rounded(Double value) {
        return value == null || !Double.isFinite(value) ? Double.NaN
                : BigDecimal.valueOf(value).setScale(DECIMALS, RoundingMode.HALF_EVEN).doubleValue();
    }

    static <R> Object[] values(List<TableField<R>> fields, R row) {
        return fields.stream().map(field -> field.value().apply(row)).toArray();
    }

    static <R> List<Column> columns(List<TableField<R>> fields) {
        return fields.stream().map(TableField::column).toList();
    }
}
