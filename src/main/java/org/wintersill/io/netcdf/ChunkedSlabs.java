package org.wintersill.io.netcdf;

import org.wintersill.problem.Problem;

/**
 * Chunked HDF5 variables. A chunk that a read covers is decoded straight into the result. Of one that a read cuts, the
 * records from the wanted one on are kept, as many as fit when every chunk across the map has its share of
 * {@link #MEMORY}: so a map cut into bands is decoded once, and a record of long time pencils can be read day by day
 * without decoding every pencil every day.
 */
final class ChunkedSlabs implements Slabs {
    /** Bytes of decoded values that one reader keeps at most, beyond a single chunk. Assumed: 64 MiB. */
    static final int MEMORY = 64 << 20;
    /** Largest chunk that is decoded, in values: 1 GiB as floats. */
    private static final int LARGEST_CHUNK = 1 << 28;

    private final RawReader raw;
    private final CdfVariable variable;
    private final Storage.Chunked storage;
    private final Unpacker unpacker;
    private final int cells;
    private final Axis time;
    private final Axis y;
    private final Axis x;
    private final int fixedChunk;
    private final int fixedOffset;
    /** Records of a chunk that are kept at a time. */
    private final int window;
    private final boolean timeSlowest;
    /** Kept parts; a chunk can only be in the one that its place on the map leads to. */
    private final Slot[] slots;
    private float[] scratch;

    /**
     * One dimension in the chunk grid: length of the variable, length of a chunk, step between neighbours inside a chunk
     * and between chunks.
     */
    private record Axis(int length, int chunk, int stride, int chunkStride) {
        int inside(int index) {
            return Math.min(chunk, length - index * chunk);
        }
    }

    /** The part of a read that lies in one chunk: first index inside the chunk and count, a dimension. */
    private record Part(int record, int records, int row, int rows, int column, int columns) {
    }

    /** Steps through the result. */
    private record Target(float[] out, int start, int recordStep, int rowStep, int columnStep) {
    }

    private static final class Slot {
        private int chunk = -1;
        private int firstRecord;
        private int records;
        private float[] values;
    }

    ChunkedSlabs(RawReader raw, CdfHeader header, CdfVariable variable, Storage.Chunked storage, Order order,
                 Unpacker unpacker) {
        this.raw = raw;
        this.variable = variable;
        this.storage = storage;
        this.unpacker = unpacker;
        long size = 1;
        int rank = variable.rank();
        int[] strides = new int[rank];
        int[] chunkStrides = new int[rank];
        int chunksBehind = 1;
        for (int i = rank - 1; i >= 0; i--) {
            strides[i] = (int) size;
            chunkStrides[i] = chunksBehind;
            size *= storage.chunk()[i];
            chunksBehind *= storage.index().count(i);
            if (size > LARGEST_CHUNK) {
                raw.close();
                throw Problem.limit("A chunk of the variable has more than " + LARGEST_CHUNK + " values",
                        CdfProblems.at(header.path(), variable.name()), "Rewrite the file with smaller chunks").asException();
            }
        }
        cells = (int) size;
        time = order.time() < 0 ? new Axis(1, 1, cells, 0) : axis(order.time(), strides, chunkStrides);
        y = axis(order.y(), strides, chunkStrides);
        x = axis(order.x(), strides, chunkStrides);
        int chunk = 0;
        int offset = 0;
        for (int i = 0; i < rank; i++) {
            if (i != order.time() && i != order.y() && i != order.x()) {
                chunk += order.fixed()[i] / storage.chunk()[i] * chunkStrides[i];
                offset += order.fixed()[i] % storage.chunk()[i] * strides[i];
            }
        }
        fixedChunk = chunk;
        fixedOffset = offset;
        long layer = Math.max(1, (long) storage.index().count(order.y()) * storage.index().count(order.x()));
        timeSlowest = (long) time.stride() * time.chunk() == cells;
        int perRecord = cells / time.chunk();
        window = timeSlowest ? (int) Math.max(1, Math.min(time.chunk(), MEMORY / (4L * perRecord * layer))) : time.chunk();
        slots = new Slot[(int) Math.max(1, Math.min(layer, MEMORY / (4L * perRecord * window)))];
    }

    private Axis axis(int dimension, int[] strides, int[] chunkStrides) {
        return new Axis(variable.shape()[dimension], storage.chunk()[dimension], strides[dimension], chunkStrides[dimension]);
    }

    @Override
    public long copy(Box box, float[] out, int base, int recordStep, int rowStep, int columnStep) {
        long wild = 0;
        for (int t = box.record() / time.chunk(); t * (long) time.chunk() < box.record() + box.records(); t++) {
            int firstRecord = Math.max(box.record(), t * time.chunk());
            int records = (int) Math.min(box.record() + box.records(), (t + 1L) * time.chunk()) - firstRecord;
            for (int j = box.row() / y.chunk(); j * (long) y.chunk() < box.row() + box.rows(); j++) {
                int firstRow = Math.max(box.row(), j * y.chunk());
                int rows = (int) Math.min(box.row() + box.rows(), (j + 1L) * y.chunk()) - firstRow;
                for (int i = box.column() / x.chunk(); i * (long) x.chunk() < box.column() + box.columns(); i++) {
                    int firstColumn = Math.max(box.column(), i * x.chunk());
                    int columns = (int) Math.min(box.column() + box.columns(), (i + 1L) * x.chunk()) - firstColumn;
                    int start = base + (firstRecord - box.record()) * recordStep + (firstRow - box.row()) * rowStep
                            + (firstColumn - box.column()) * columnStep;
                    Part part = new Part(firstRecord - t * time.chunk(), records, firstRow - j * y.chunk(), rows,
                            firstColumn - i * x.chunk(), columns);
                    boolean all = records == time.inside(t) && rows == y.inside(j) && columns == x.inside(i);
                    wild += copyPart(fixedChunk + t * time.chunkStride() + j * y.chunkStride() + i * x.chunkStride(),
                            slotOf(j, i), all, part, new Target(out, start, recordStep, rowStep, columnStep));
                }
            }
        }
        return wild;
    }

    private int slotOf(int chunkRow, int chunkColumn) {
        long across = (x.length() + x.chunk() - 1L) / x.chunk();
        return (int) ((chunkRow * across + chunkColumn) % slots.length);
    }

    /** @param all whether the part is the whole chunk, so that nobody will ask for the rest of it soon */
    private long copyPart(int chunk, int slotIndex, boolean all, Part part, Target target) {
        if (!storage.index().present(chunk)) {
            fillMissing(part, target);
            return 0;
        }
        Slot slot = slots[slotIndex];
        if (slot != null && slot.chunk == chunk && part.record() >= slot.firstRecord
                && part.record() + part.records() <= slot.firstRecord + slot.records) {
            return copyDecoded(slot.values, slot.firstRecord, part, target);
        }
        byte[] bytes = raw.chunk(storage, chunk, variable.type());
        int plane = raw.planar() ? cells : 0;
        if (all && x.stride() == 1 && target.columnStep() == 1) {
            return decodeRows(bytes, plane, part, target);
        }
        if (all || part.records() > window) {
            scratch = scratch == null ? new float[cells] : scratch;
            unpacker.decode(bytes, 0, plane, cells, scratch, 0);
            return copyDecoded(scratch, 0, part, target);
        }
        if (slot == null) {
            slot = new Slot();
            slot.values = new float[cells / time.chunk() * window];
            slots[slotIndex] = slot;
        }
        slot.chunk = -1;
        slot.firstRecord = timeSlowest ? part.record() : 0;
        slot.records = Math.min(window, time.chunk() - slot.firstRecord);
        int from = slot.firstRecord * (cells / time.chunk());
        int count = timeSlowest ? slot.records * (cells / time.chunk()) : cells;
        unpacker.decode(bytes, from * (plane == 0 ? variable.type().bytes() : 1), plane, count, slot.values, 0);
        slot.chunk = chunk;
        return copyDecoded(slot.values, slot.firstRecord, part, target);
    }

    /** Unpacks a whole chunk row by row into the result, in longer runs where rows lie side by side on both sides. */
    private long decodeRows(byte[] bytes, int plane, Part part, Target target) {
        int width = plane == 0 ? variable.type().bytes() : 1;
        boolean joined = y.stride() == part.columns() && target.rowStep() == part.columns();
        int runs = joined ? 1 : part.rows();
        int length = joined ? part.rows() * part.columns() : part.columns();
        long wild = 0;
        for (int r = 0; r < part.records(); r++) {
            for (int j = 0; j < runs; j++) {
                int from = fixedOffset + r * time.stride() + j * y.stride();
                int to = target.start() + r * target.recordStep() + j * target.rowStep();
                if (unpacker.decode(bytes, from * width, plane, length, target.out(), to)) {
                    wild += Unpacker.settle(target.out(), to, length, 1);
                }
            }
        }
        return wild;
    }

    /** @param firstRecord record of the chunk at which the decoded values begin */
    private long copyDecoded(float[] values, int firstRecord, Part part, Target target) {
        int source = fixedOffset + (part.record() - firstRecord) * time.stride() + part.row() * y.stride()
                + part.column() * x.stride();
        float[] out = target.out();
        long wild = 0;
        for (int r = 0; r < part.records(); r++) {
            for (int j = 0; j < part.rows(); j++) {
                int from = source + r * time.stride() + j * y.stride();
                int to = target.start() + r * target.recordStep() + j * target.rowStep();
                for (int i = 0; i < part.columns(); i++) {
                    float value = values[from + i * x.stride()];
                    if (Float.floatToRawIntBits(value) == Unpacker.WILD_BITS) {
                        wild++;
                        value = Float.NaN;
                    }
                    out[to + i * target.columnStep()] = value;
                }
            }
        }
        return wild;
    }

    private static void fillMissing(Part part, Target target) {
        for (int r = 0; r < part.records(); r++) {
            for (int j = 0; j < part.rows(); j++) {
                for (int i = 0; i < part.columns(); i++) {
                    target.out()[target.start() + r * target.recordStep() + j * target.rowStep()
                            + i * target.columnStep()] = Float.NaN;
                }
            }
        }
    }

    @Override
    public void close() {
        raw.close();
    }
}
