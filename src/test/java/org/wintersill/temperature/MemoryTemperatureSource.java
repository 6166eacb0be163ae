package org.wintersill.temperature;

import java.util.List;
import org.wintersill.grid.Block;
import org.wintersill.grid.GridGeometry;
import org.wintersill.time.DayAxis;

/** A record held in memory, for tests of everything that does not care where temperatures come from. */
public final class MemoryTemperatureSource implements DailyTemperatureSource {
    private final GridGeometry grid;
    private final DayAxis days;
    private final StorageLayout layout;
    private final float[][] values;
    private final ForcingVariable variable;

    /** @param values {@code [day][cell]}, degrees Celsius, NaN for missing */
    public MemoryTemperatureSource(GridGeometry grid, DayAxis days, StorageLayout layout, float[][] values) {
        this(grid, days, layout, values, ForcingVariable.MINIMUM);
    }

    /** The same for another daily quantity. */
    public MemoryTemperatureSource(GridGeometry grid, DayAxis days, StorageLayout layout, float[][] values, ForcingVariable variable) {
        this.variable = variable;
        this.grid = grid;
        this.days = days;
        this.layout = layout;
        this.values = values;
    }

    @Override
    public GridGeometry grid() {
        return grid;
    }

    @Override
    public DayAxis days() {
        return days;
    }

    @Override
    public ForcingVariable variable() {
        return variable;
    }

    @Override
    public StorageLayout layout() {
        return layout;
    }

    @Override
    public List<SourceFile> files() {
        return List.of();
    }

    @Override
    public DailyTemperatureReader open() {
        return new DailyTemperatureReader() {
            @Override
            public void read(int firstDay, int dayCount, Block block, float[] out, int offset, int dayStride) {
                for (int day = 0; day < dayCount; day++) {
                    for (int row = 0; row < block.rows(); row++) {
                        System.arraycopy(values[firstDay + day], (block.row() + row) * grid.columns() + block.column(), out,
                                offset + day * dayStride + row * block.columns(), block.columns());
                    }
                }
            }

            @Override
            public long valuesSetAside() {
                return 0;
            }

            @Override
            public void close() {
                // nothing is open
            }
        };
    }
}
