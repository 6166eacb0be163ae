package org.wintersill.io.netcdf;

import java.nio.ByteBuffer;
import java.nio.ByteOrder;

/** Turns stored bytes into doubles, for attributes, coordinates and other short rows; maps go through {@link Unpacker}. */
final class RawNumbers {
    private RawNumbers() {
    }

    /** @return one double a stored number; integers of 64 bits are rounded to 53 */
    static double[] toDoubles(byte[] bytes, RawType type, boolean littleEndian) {
        ByteBuffer buffer = ByteBuffer.wrap(bytes).order(littleEndian ? ByteOrder.LITTLE_ENDIAN : ByteOrder.BIG_ENDIAN);
        double[] values = new double[bytes.length / type.bytes()];
        for (int i = 0; i < values.length; i++) {
            values[i] = switch (type) {
                case BYTE -> buffer.get();
                case UBYTE, CHAR, OTHER -> buffer.get() & 0xff;
                case SHORT -> buffer.getShort();
                case USHORT -> buffer.getShort() & 0xffff;
                case INT -> buffer.getInt();
                case UINT -> buffer.getInt() & 0xffffffffL;
                case LONG -> buffer.getLong();
                case ULONG -> unsigned(buffer.getLong());
                case FLOAT -> buffer.getFloat();
                case DOUBLE -> buffer.getDouble();
            };
        }
        return values;
    }

    static double unsigned(long value) {
        return value >= 0 ? value : (value >>> 1 | value & 1) * 2.0;
    }
}
