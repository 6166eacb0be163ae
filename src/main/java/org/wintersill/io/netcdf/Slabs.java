package org.wintersill.io.netcdf;

/** Values of one variable, box by box in the order of the file. An open file; one thread at a time. */
interface Slabs extends AutoCloseable {

    /**
     * A box in file order: records along time, rows along the y dimension, columns along the x dimension, from 0.
     */
    record Box(int record, int records, int row, int rows, int column, int columns) {
    }

    /**
     * Copies unpacked values: that of record {@code r}, row {@code y}, column {@code x} of the box (each from 0) goes to
     * {@code out[base + r * recordStep + y * rowStep + x * columnStep]}. Steps may be negative: that is how maps are turned
     * north-up.
     *
     * @return number of implausible values among them; they are NaN in {@code out}
     */
    long copy(Box box, float[] out, int base, int recordStep, int rowStep, int columnStep);

    @Override
    void close();

    /**
     * Which dimension of the variable is what.
     *
     * @param time place of the time dimension; -1 if the variable has none
     * @param y place of the dimension of rows
     * @param x place of the dimension of columns
     * @param fixed index along every dimension; used for those that are none of the three
     */
    record Order(int time, int y, int x, int[] fixed) {
    }

    /** Opens what fits the storage of the variable. */
    static Slabs open(CdfHeader header, CdfVariable variable, Order order, Unpacker unpacker) {
        Storage storage = variable.storage();
        if (storage instanceof Storage.Chunked chunked) {
            return new ChunkedSlabs(new RawReader(header), header, variable, chunked, order, unpacker);
        }
        if (storage instanceof Storage.Contiguous contiguous) {
            return new ContiguousSlabs(new RawReader(header), variable, contiguous, order, unpacker);
        }
        String reason = storage instanceof Storage.Unreadable unreadable ? unreadable.reason()
                : "it is kept inside the header";
        throw CdfLimits.unreadable(header.path(), variable, new Storage.Unreadable(reason));
    }
}
