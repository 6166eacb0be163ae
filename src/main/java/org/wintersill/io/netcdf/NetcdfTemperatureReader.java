package org.wintersill.io.netcdf;

import java.nio.file.Path;
import org.wintersill.grid.Block;
import org.wintersill.problem.ProblemException;
import org.wintersill.temperature.DailyTemperatureReader;

/** An open netCDF record: finds the records of the wanted days and lets them be copied north-up. One thread. */
final class NetcdfTemperatureReader implements DailyTemperatureReader {
    private final Path path;
    private final Slabs slabs;
    private final GridPlacement placement;
    private final int[] records;
    private long setAside;

    NetcdfTemperatureReader(Path path, Slabs slabs, GridPlacement placement, int[] records) {
        this.path = path;
        this.slabs = slabs;
        this.placement = placement;
        this.records = records;
    }

    @Override
    public void read(int firstDay, int dayCount, Block block, float[] out, int offset, int dayStride) {
        if (firstDay < 0 || dayCount < 0 || firstDay + dayCount > records.length
                || block.columnEnd() > placement.grid().columns() || block.rowEnd() > placement.grid().rows()
                || dayCount > 0 && offset + (dayCount - 1L) * dayStride + block.cells() > out.length) {
            throw new IllegalArgumentException("days " + firstDay + " + " + dayCount + " of " + records.length + ", " + block
                    + " of " + placement.grid().describe());
        }
        try {
            int done = 0;
            while (done < dayCount) {
                int record = records[firstDay + done];
                int run = 1;
                while (done + run < dayCount && records[firstDay + done + run] == record + run) {
                    run++;
                }
                setAside += placement.copy(slabs, record, run, block, out, offset + done * dayStride, dayStride);
                done += run;
            }
        } catch (ProblemException e) {
            throw e;
        } catch (ArithmeticException | IndexOutOfBoundsException e) {
            throw CdfProblems.damaged(path, "its values cannot be decoded", e);
        }
    }

    @Override
    public long valuesSetAside() {
        return setAside;
    }

    @Override
    public void close() {
        slabs.close();
    }
}
