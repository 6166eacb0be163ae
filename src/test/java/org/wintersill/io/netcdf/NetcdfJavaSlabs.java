package org.wintersill.io.netcdf;

import java.io.IOException;
import java.nio.file.Path;
import ucar.nc2.NetcdfFile;

/** Values as NetCDF-Java reads them: a second opinion for tests. */
final class NetcdfJavaSlabs implements Slabs {
    private final Path path;
    private final NetcdfFile file;
    private final CdfVariable variable;
    private final Order order;
    private final Unpacker unpacker;

    NetcdfJavaSlabs(CdfHeader header, CdfVariable variable, Order order, Unpacker unpacker) {
        this.path = header.path();
        this.variable = variable;
        this.order = order;
        this.unpacker = unpacker;
        try {
            file = NetcdfJavaHeader.open(path);
        } catch (IOException | RuntimeException e) {
            throw CdfProblems.damaged(path, "its HDF5 structure cannot be decoded", e);
        }
    }

    @Override
    public long copy(Box box, float[] out, int base, int recordStep, int rowStep, int columnStep) {
        long wild = 0;
        int rank = variable.rank();
        for (int r = 0; r < box.records(); r++) {
            int[] origin = order.fixed().clone();
            int[] shape = new int[rank];
            java.util.Arrays.fill(shape, 1);
            if (order.time() >= 0) {
                origin[order.time()] = box.record() + r;
            }
            origin[order.y()] = box.row();
            origin[order.x()] = box.column();
            shape[order.y()] = box.rows();
            shape[order.x()] = box.columns();
            double[] values = NetcdfJavaHeader.box(file, path, variable, origin, shape);
            int rowStride = order.y() < order.x() ? box.columns() : 1;
            int columnStride = order.y() < order.x() ? 1 : box.rows();
            for (int j = 0; j < box.rows(); j++) {
                for (int i = 0; i < box.columns(); i++) {
                    float value = unpacker.value(values[j * rowStride + i * columnStride]);
                    if (Float.floatToRawIntBits(value) == Unpacker.WILD_BITS) {
                        wild++;
                        value = Float.NaN;
                    }
                    out[base + r * recordStep + j * rowStep + i * columnStep] = value;
                }
            }
        }
        return wild;
    }

    @Override
    public void close() {
        try {
            file.close();
        } catch (IOException e) {
            // nothing was written, so nothing can be lost
        }
    }
}
