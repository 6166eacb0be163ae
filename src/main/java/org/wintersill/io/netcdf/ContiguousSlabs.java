package org.wintersill.io.netcdf;

/**
 * Variables that lie in the file one value after the other: classic files and unchunked HDF5. Nothing is kept; what lies
 * side by side in the file is fetched in one go.
 */
final class ContiguousSlabs implements Slabs {
    /** Most bytes fetched at once. Assumed: enough that the call itself costs nothing. */
    private static final int FETCH = 8 << 20;

    private final RawReader raw;
    private final Storage.Contiguous storage;
    private final Unpacker unpacker;
    private final int width;
    private final long[] stride;
    private final int[] slowestFirst;
    private final long fixed;
    private byte[] fetched = new byte[0];
    private float[] line = new float[0];

    ContiguousSlabs(RawReader raw, CdfVariable variable, Storage.Contiguous storage, Order order, Unpacker unpacker) {
        this.raw = raw;
        this.storage = storage;
        this.unpacker = unpacker;
        this.width = variable.type().bytes();
        long[] strides = new long[variable.rank()];
        long step = width;
        for (int i = variable.rank() - 1; i >= 0; i--) {
            strides[i] = i == 0 ? storage.outerStride() : step;
            step *= variable.shape()[i];
        }
        long offset = 0;
        for (int i = 0; i < strides.length; i++) {
            if (i != order.time() && i != order.y() && i != order.x()) {
                offset += order.fixed()[i] * strides[i];
            }
        }
        fixed = offset;
        stride = new long[] {order.time() < 0 ? Long.MAX_VALUE / 4 : strides[order.time()], strides[order.y()],
            strides[order.x()]};
        slowestFirst = new int[] {0, 1, 2};
        for (int i = 0; i < 2; i++) {
            for (int j = 0; j < 2 - i; j++) {
                if (stride[slowestFirst[j]] < stride[slowestFirst[j + 1]]) {
                    int swap = slowestFirst[j];
                    slowestFirst[j] = slowestFirst[j + 1];
                    slowestFirst[j + 1] = swap;
                }
            }
        }
    }

    @Override
    public long copy(Box box, float[] out, int base, int recordStep, int rowStep, int columnStep) {
        int[] start = {box.record(), box.row(), box.column()};
        int[] count = {box.records(), box.rows(), box.columns()};
        int[] step = {recordStep, rowStep, columnStep};
        int a = slowestFirst[0];
        int b = slowestFirst[1];
        int c = slowestFirst[2];
        long runBytes = (count[c] - 1) * stride[c] + width;
        // worth fetching across the gaps between runs only where the gaps are not most of it
        boolean together = runBytes * 4 >= stride[b];
        int most = together ? (int) Math.max(1, Math.min(count[b], (FETCH - runBytes) / stride[b] + 1)) : 1;
        long wild = 0;
        for (int i = 0; i < count[a]; i++) {
            long outer = storage.begin() + fixed + (a == 0 && stride[a] > Long.MAX_VALUE / 8 ? 0 : (start[a] + i) * stride[a]);
            for (int j = 0; j < count[b]; j += most) {
                int runs = Math.min(most, count[b] - j);
                long begin = outer + (start[b] + j) * stride[b] + start[c] * stride[c];
                int length = Math.toIntExact((runs - 1) * stride[b] + runBytes);
                fetched = fetched.length >= length ? fetched : new byte[length];
                raw.span(begin, fetched, length);
                for (int k = 0; k < runs; k++) {
                    int to = base + i * step[a] + (j + k) * step[b];
                    wild += line((int) (k * stride[b]), (int) stride[c], count[c], out, to, step[c]);
                }
            }
        }
        return wild;
    }

    /** Decodes one run of the fetched bytes. */
    private long line(int from, int valueStride, int count, float[] out, int to, int step) {
        if (valueStride == width && step == 1) {
            return unpacker.decode(fetched, from, 0, count, out, to) ? Unpacker.settle(out, to, count, 1) : 0;
        }
        line = line.length >= count ? line : new float[count];
        boolean wild = false;
        if (valueStride == width) {
            wild = unpacker.decode(fetched, from, 0, count, line, 0);
        } else {
            for (int i = 0; i < count; i++) {
                wild |= unpacker.decode(fetched, from + i * valueStride, 0, 1, line, i);
            }
        }
        for (int i = 0; i < count; i++) {
            out[to + i * step] = line[i];
        }
        return wild ? Unpacker.settle(out, to, count, step) : 0;
    }

    @Override
    public void close() {
        raw.close();
    }
}
