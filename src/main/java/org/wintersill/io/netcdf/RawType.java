package org.wintersill.io.netcdf;

/** Types that numbers have in a file, before anything is done to them. */
enum RawType {
    BYTE(1, true), UBYTE(1, true), SHORT(2, true), USHORT(2, true), INT(4, true), UINT(4, true), LONG(8, true),
    ULONG(8, true), FLOAT(4, false), DOUBLE(8, false), CHAR(1, false), OTHER(1, false);

    private final int bytes;
    private final boolean integer;

    RawType(int bytes, boolean integer) {
        this.bytes = bytes;
        this.integer = integer;
    }

    int bytes() {
        return bytes;
    }

    boolean isInteger() {
        return integer;
    }

    boolean isNumeric() {
        return this != CHAR && this != OTHER;
    }

    /** The unsigned type of the same width, for files that say {@code _Unsigned}. */
    RawType unsigned() {
        return switch (this) {
            case BYTE -> UBYTE;
            case SHORT -> USHORT;
            case INT -> UINT;
            case LONG -> ULONG;
            default -> this;
        };
    }

    /**
     * A number as this type would hold it: a float loses digits, a negative number in an unsigned type wraps round (so
     * that a signed fill of {@code _Unsigned} data is found).
     */
    double cast(double value) {
        return switch (this) {
            case FLOAT -> (float) value;
            case UBYTE -> value < 0 ? value + 0x1p8 : value;
            case USHORT -> value < 0 ? value + 0x1p16 : value;
            case UINT -> value < 0 ? value + 0x1p32 : value;
            case ULONG -> value < 0 ? value + 0x1p64 : value;
            default -> value;
        };
    }

    /**
     * Value that the netCDF library writes where nobody wrote, if the file names no other (netcdf.h, NC_FILL_*); NaN for
     * bytes, where every pattern may be data.
     */
    double defaultFill() {
        return switch (this) {
            case SHORT -> -32767;
            case USHORT -> 65535;
            case INT -> -2147483647;
            case UINT -> 4294967295.0;
            case LONG -> -9223372036854775806.0;
            case ULONG -> 18446744073709551614.0;
            case FLOAT -> 9.9692099683868690e+36f;
            case DOUBLE -> 9.9692099683868690e+36;
            default -> Double.NaN;
        };
    }
}
