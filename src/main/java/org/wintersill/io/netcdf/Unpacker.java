package org.wintersill.io.netcdf;

import java.lang.invoke.MethodHandles;
import java.lang.invoke.VarHandle;
import java.nio.ByteOrder;

/**
 * Turns stored numbers into floats of the program's unit: raw fill compared first, then scale and offset, then unit.
 *
 * <p>NaN where there is no value. A number that is there but is not finite or lies outside the plausible range becomes
 * {@link #WILD}, a NaN of its own, so that whoever hands values out can count it. Immutable, thread-safe.
 */
final class Unpacker {
    /** Bits of the NaN that marks an implausible value; never leaves this package. */
    static final int WILD_BITS = 0x7fc0beef;
    static final float WILD = Float.intBitsToFloat(WILD_BITS);

    /** Values that are looked at together: a fill value sends so many through the slow way. */
    private static final int BLOCK = 256;
    private static final VarHandle SHORT_LE = handle(short[].class, ByteOrder.LITTLE_ENDIAN);
    private static final VarHandle SHORT_BE = handle(short[].class, ByteOrder.BIG_ENDIAN);
    private static final VarHandle INT_LE = handle(int[].class, ByteOrder.LITTLE_ENDIAN);
    private static final VarHandle INT_BE = handle(int[].class, ByteOrder.BIG_ENDIAN);
    private static final VarHandle LONG_LE = handle(long[].class, ByteOrder.LITTLE_ENDIAN);
    private static final VarHandle LONG_BE = handle(long[].class, ByteOrder.BIG_ENDIAN);

    private final Packing packing;
    private final boolean littleEndian;
    private final double factor;
    private final double shift;
    private final float lowest;
    private final float highest;
    /** Values of all 8- or 16-bit patterns; null for wider types. */
    private final float[] table;
    /** Whether stored numbers are the values themselves, and every plausible one counts. */
    private final boolean plain;
    /** Bits of the largest amount that is plausible on either side of zero; sizes of floats order like their bits. */
    private final int ordinaryBits;
    /** Whether a plausible value can still be missing: then each one is looked at. */
    private final boolean wary;

    /**
     * @param factor factor on unpacked values, to the unit wanted
     * @param shift summand after it
     * @param lowest smallest plausible result
     * @param highest largest plausible result
     */
    Unpacker(Packing packing, boolean littleEndian, double factor, double shift, double lowest, double highest) {
        this.packing = packing;
        this.littleEndian = littleEndian;
        this.factor = factor;
        this.shift = shift;
        this.lowest = (float) lowest;
        this.highest = (float) highest;
        int bits = packing.type().isInteger() && packing.type().bytes() <= 2 ? packing.type().bytes() * 8 : 0;
        this.table = bits == 0 ? null : new float[1 << bits];
        boolean signed = packing.type() == RawType.BYTE || packing.type() == RawType.SHORT;
        for (int i = 0; table != null && i < table.length; i++) {
            table[i] = value(signed && i >= table.length / 2 ? i - table.length : i);
        }
        boolean careful = packing.lowest() > Double.NEGATIVE_INFINITY || packing.highest() < Double.POSITIVE_INFINITY;
        for (double fill : packing.fills()) {
            float converted = convert(fill);
            careful |= converted >= this.lowest && converted <= this.highest;
        }
        this.wary = careful;
        this.ordinaryBits = Float.floatToIntBits(Math.max(0, Math.min(-this.lowest, this.highest)));
        this.plain = !careful && packing.isIdentity() && factor == 1 && shift == 0;
    }

    private static VarHandle handle(Class<?> type, ByteOrder order) {
        return MethodHandles.byteArrayViewVarHandle(type, order);
    }

    private float convert(double raw) {
        return (float) ((raw * packing.scale() + packing.offset()) * factor + shift);
    }

    /** One value: NaN for missing, {@link #WILD} for an implausible one. */
    float value(double raw) {
        if (packing.isMissing(raw)) {
            return Float.NaN;
        }
        float value = convert(raw);
        return value >= lowest && value <= highest ? value : WILD;
    }

    /**
     * Decodes a run of stored numbers.
     *
     * @param bytes stored numbers
     * @param from byte at which the first begins (of its first plane, if planar)
     * @param plane 0 for ordinary numbers; otherwise the distance in bytes between the planes of byte-sorted ones
     * @param count how many
     * @return whether any became {@link #WILD}
     */
    boolean decode(byte[] bytes, int from, int plane, int count, float[] out, int at) {
        if (plane != 0) {
            return planar(bytes, from, plane, count, out, at);
        }
        boolean wild = false;
        VarHandle shorts = littleEndian ? SHORT_LE : SHORT_BE;
        VarHandle ints = littleEndian ? INT_LE : INT_BE;
        VarHandle longs = littleEndian ? LONG_LE : LONG_BE;
        switch (packing.type()) {
            case BYTE, UBYTE -> {
                for (int i = 0; i < count; i++) {
                    out[at + i] = table[bytes[from + i] & 0xff];
                }
                wild = anyWild(out, at, count);
            }
            case SHORT, USHORT -> {
                for (int i = 0; i < count; i++) {
                    out[at + i] = table[(short) shorts.get(bytes, from + 2 * i) & 0xffff];
                }
                wild = anyWild(out, at, count);
            }
            case FLOAT -> {
                for (int i = 0; i < count; i++) {
                    wild |= single(Float.intBitsToFloat((int) ints.get(bytes, from + 4 * i)), out, at + i);
                }
            }
            default -> {
                for (int i = 0; i < count; i++) {
                    double raw = switch (packing.type()) {
                        case INT -> (int) ints.get(bytes, from + 4 * i);
                        case UINT -> (int) ints.get(bytes, from + 4 * i) & 0xffffffffL;
                        case LONG -> (long) longs.get(bytes, from + 8 * i);
                        case ULONG -> RawNumbers.unsigned((long) longs.get(bytes, from + 8 * i));
                        default -> Double.longBitsToDouble((long) longs.get(bytes, from + 8 * i));
                    };
                    out[at + i] = value(raw);
                }
                wild = anyWild(out, at, count);
            }
        }
        return wild;
    }

    /** The same for byte-sorted numbers, little-endian ones without a detour. */
    private boolean planar(byte[] bytes, int from, int plane, int count, float[] out, int at) {
        if (littleEndian && packing.type() == RawType.FLOAT) {
            if (plain) {
                return planarFloats(bytes, from, plane, count, out, at);
            }
            boolean wild = false;
            int second = from + plane;
            int third = second + plane;
            int fourth = third + plane;
            for (int i = 0; i < count; i++) {
                int bits = bytes[from + i] & 0xff | (bytes[second + i] & 0xff) << 8 | (bytes[third + i] & 0xff) << 16
                        | bytes[fourth + i] << 24;
                wild |= single(Float.intBitsToFloat(bits), out, at + i);
            }
            return wild;
        }
        if (table != null && packing.type().bytes() == 2) {
            int low = littleEndian ? from : from + plane;
            int high = littleEndian ? from + plane : from;
            for (int i = 0; i < count; i++) {
                out[at + i] = table[bytes[low + i] & 0xff | (bytes[high + i] & 0xff) << 8];
            }
            return anyWild(out, at, count);
        }
        int width = packing.type().bytes();
        byte[] ordered = new byte[count * width];
        for (int k = 0; k < width; k++) {
            for (int i = 0; i < count; i++) {
                ordered[i * width + k] = bytes[from + k * plane + i];
            }
        }
        return decode(ordered, 0, 0, count, out, at);
    }

    /**
     * Byte-sorted floats that need no arithmetic: the usual case of large files. A block at a time is put together without looking
     * at single values; only where one of them is not ordinary is the block gone through again.
     */
    private boolean planarFloats(byte[] bytes, int from, int plane, int count, float[] out, int at) {
        boolean wild = false;
        for (int start = 0; start < count; start += BLOCK) {
            int length = Math.min(BLOCK, count - start);
            if (join(bytes, from + start, plane, length, out, at + start) > ordinaryBits) {
                for (int i = at + start; i < at + start + length; i++) {
                    wild |= single(out[i], out, i);
                }
            }
        }
        return wild;
    }

    /** Puts floats together from four planes of bytes, lowest first; gives the bits of the largest amount. */
    private static int join(byte[] bytes, int from, int plane, int count, float[] out, int at) {
        int second = from + plane;
        int third = second + plane;
        int fourth = third + plane;
        int largest = 0;
        for (int i = 0; i < count; i++) {
            int bits = bytes[from + i] & 0xff | (bytes[second + i] & 0xff) << 8 | (bytes[third + i] & 0xff) << 16
                    | bytes[fourth + i] << 24;
            largest = Math.max(largest, bits & Integer.MAX_VALUE);
            out[at + i] = Float.intBitsToFloat(bits);
        }
        return largest;
    }

    /** Stores one float; the common case is two comparisons. */
    private boolean single(float raw, float[] out, int at) {
        float value = convert(raw);
        if (value >= lowest && value <= highest && !wary) {
            out[at] = value;
            return false;
        }
        float careful = value(raw);
        out[at] = careful;
        return Float.floatToRawIntBits(careful) == WILD_BITS;
    }

    private static boolean anyWild(float[] values, int at, int count) {
        boolean wild = false;
        for (int i = at; i < at + count; i++) {
            wild |= Float.floatToRawIntBits(values[i]) == WILD_BITS;
        }
        return wild;
    }

    /** Turns wild values of a finished result into plain NaN and counts them. */
    static long settle(float[] out, int to, int count, int step) {
        long wild = 0;
        for (int i = 0; i < count; i++) {
            if (Float.floatToRawIntBits(out[to + i * step]) == WILD_BITS) {
                out[to + i * step] = Float.NaN;
                wild++;
            }
        }
        return wild;
    }
}
