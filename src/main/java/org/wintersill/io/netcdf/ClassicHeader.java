package org.wintersill.io.netcdf;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.channels.FileChannel;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * Reads the header of classic files: CDF-1, CDF-2 (64-bit offset) and CDF-5 (64-bit data).
 *
 * <p>Source: "The NetCDF Classic Format Specification" (Unidata) and its CDF-5 extension. Every length is compared with
 * what is left of the file before anything is allocated. A file that is shorter than its header promises is refused: other
 * programs invent the missing values.
 */
final class ClassicHeader {
    private static final int DIMENSIONS = 10;
    private static final int VARIABLES = 11;
    private static final int ATTRIBUTES = 12;
    private static final long STREAMING = 0xffffffffL;
    /** Longest header that is believed; real ones have a few kilobytes. */
    private static final int HEADER_LIMIT = 64 << 20;

    private final Path path;
    private final FileChannel channel;
    private final long fileSize;
    private final int version;
    private ByteBuffer window;
    private long windowStart;

    private ClassicHeader(Path path, FileChannel channel, int version) throws IOException {
        this.path = path;
        this.channel = channel;
        this.version = version;
        this.fileSize = channel.size();
        this.window = ByteBuffer.allocate(0);
    }

    static CdfHeader read(Path path, int version) throws IOException {
        try (FileChannel channel = FileChannel.open(path, StandardOpenOption.READ)) {
            return new ClassicHeader(path, channel, version).header();
        }
    }

    private record Described(String name, RawType type, int[] dimensions, Map<String, Object> attributes, long begin) {
    }

    private CdfHeader header() throws IOException {
        windowStart = 4;
        long records = version == 5 ? longInteger() : Integer.toUnsignedLong(integer());
        int tag = integer();
        int dimensionCount = listLength(tag, DIMENSIONS, "dimension");
        List<String> names = new ArrayList<>();
        List<Long> lengths = new ArrayList<>();
        int recordDimension = -1;
        for (int i = 0; i < dimensionCount; i++) {
            names.add(name());
            long length = count("dimension length", Long.MAX_VALUE);
            if (length == 0) {
                recordDimension = i;
            }
            lengths.add(length);
        }
        attributes();
        int variableCount = listLength(integer(), VARIABLES, "variable");
        List<Described> described = new ArrayList<>();
        for (int i = 0; i < variableCount; i++) {
            described.add(variable(dimensionCount));
        }
        return assemble(described, names, lengths, recordDimension, records);
    }

    private Described variable(int dimensionCount) throws IOException {
        String name = name();
        int rank = (int) count("rank of " + name, 1024);
        int[] dimensions = new int[rank];
        for (int i = 0; i < rank; i++) {
            long id = version == 5 ? longInteger() : integer();
            if (id < 0 || id >= dimensionCount) {
                throw damaged("variable '" + name + "' uses a dimension that does not exist");
            }
            dimensions[i] = (int) id;
        }
        Map<String, Object> attributes = attributes();
        RawType type = type(integer());
        // the stored size is redundant and wraps round for large variables, so it is not used
        skipNumber();
        long begin = version == 1 ? Integer.toUnsignedLong(integer()) : longInteger();
        return new Described(name, type, dimensions, attributes, begin);
    }

    private CdfHeader assemble(List<Described> described, List<String> names, List<Long> lengths, int recordDimension,
                               long records) {
        long recordSize = 0;
        int recordVariables = 0;
        for (Described d : described) {
            if (isRecord(d, recordDimension)) {
                recordVariables++;
                recordSize = Math.addExact(recordSize, padded(valuesSize(d, lengths, true)));
            }
        }
        boolean streaming = records < 0 || version != 5 && records == STREAMING;
        long recordCount = streaming ? recordsThatFit(described, recordDimension, recordSize) : records;
        Map<String, CdfVariable> variables = new LinkedHashMap<>();
        for (Described d : described) {
            boolean record = isRecord(d, recordDimension);
            long inner = valuesSize(d, lengths, record);
            // the specification: a lone record variable is not padded
            long stride = record ? (recordVariables == 1 ? inner : recordSize) : inner / Math.max(1, first(d, lengths));
            int[] shape = new int[d.dimensions().length];
            List<String> dimensionNames = new ArrayList<>();
            for (int i = 0; i < shape.length; i++) {
                boolean isRecordDimension = d.dimensions()[i] == recordDimension;
                long length = isRecordDimension ? recordCount : lengths.get(d.dimensions()[i]);
                if (length > Integer.MAX_VALUE) {
                    throw damaged("dimension '" + names.get(d.dimensions()[i]) + "' has " + length + " entries");
                }
                shape[i] = (int) length;
                dimensionNames.add(names.get(d.dimensions()[i]));
            }
            long end = record ? (recordCount == 0 ? 0 : d.begin() + (recordCount - 1) * stride + inner) : d.begin() + inner;
            if (d.begin() < 0 || end < 0 || end > fileSize) {
                throw CdfProblems.truncated(path, end, fileSize);
            }
            variables.put(d.name(), new CdfVariable(d.name(), d.type(), false, List.copyOf(dimensionNames), shape,
                    d.attributes(), new Storage.Contiguous(d.begin(), stride)));
        }
        String format = switch (version) {
            case 1 -> "netCDF-3 classic";
            case 2 -> "netCDF-3 64-bit offset";
            default -> "netCDF-3 64-bit data (CDF-5)";
        };
        return new CdfHeader(path, format, fileSize, variables);
    }

    /** A writer that could not know the number of records leaves it open; the length of the file tells. */
    private long recordsThatFit(List<Described> described, int recordDimension, long recordSize) {
        long begin = described.stream().filter(d -> isRecord(d, recordDimension)).mapToLong(Described::begin).min().orElse(0);
        return recordSize == 0 ? 0 : Math.max(0, (fileSize - begin) / recordSize);
    }

    private static boolean isRecord(Described d, int recordDimension) {
        return d.dimensions().length > 0 && d.dimensions()[0] == recordDimension;
    }

    private static long first(Described d, List<Long> lengths) {
        return d.dimensions().length == 0 ? 1 : lengths.get(d.dimensions()[0]);
    }

    /** Bytes of all values, or of one record. */
    private long valuesSize(Described d, List<Long> lengths, boolean record) {
        long size = d.type().bytes();
        for (int i = record ? 1 : 0; i < d.dimensions().length; i++) {
            size = Math.multiplyExact(size, lengths.get(d.dimensions()[i]));
        }
        return size;
    }

    private Map<String, Object> attributes() throws IOException {
        int tag = integer();
        int number = listLength(tag, ATTRIBUTES, "attribute");
        Map<String, Object> attributes = new LinkedHashMap<>();
        for (int i = 0; i < number; i++) {
            String name = name();
            RawType type = type(integer());
            int length = (int) count("length of attribute " + name, HEADER_LIMIT / type.bytes());
            byte[] bytes = bytes(length * type.bytes());
            if (type == RawType.CHAR) {
                attributes.put(name, new String(bytes, StandardCharsets.UTF_8).replace("\0", ""));
            } else {
                attributes.put(name, new CdfVariable.Numbers(type, RawNumbers.toDoubles(bytes, type, false)));
            }
        }
        return attributes;
    }

    private int listLength(int tag, int expected, String what) throws IOException {
        long number = count("number of " + what + "s", fileSize);
        if (tag != expected && !(tag == 0 && number == 0)) {
            throw damaged("the list of " + what + "s begins with " + tag + " instead of " + expected);
        }
        return (int) Math.min(number, Integer.MAX_VALUE);
    }

    private RawType type(int code) {
        RawType[] types = {RawType.BYTE, RawType.CHAR, RawType.SHORT, RawType.INT, RawType.FLOAT, RawType.DOUBLE,
            RawType.UBYTE, RawType.USHORT, RawType.UINT, RawType.LONG, RawType.ULONG};
        int known = version == 5 ? 11 : 6;
        if (code < 1 || code > known) {
            throw damaged("unknown type " + code);
        }
        return types[code - 1];
    }

    private String name() throws IOException {
        int length = (int) count("length of a name", 65536);
        return new String(bytes(length), StandardCharsets.UTF_8);
    }

    private byte[] bytes(int length) throws IOException {
        byte[] bytes = new byte[length];
        int padded = (int) padded(length);
        need(padded);
        window.get(bytes);
        window.position(window.position() + padded - length);
        return bytes;
    }

    private static long padded(long length) {
        return length + 3 & ~3L;
    }

    private long count(String what, long limit) throws IOException {
        long number = version == 5 ? longInteger() : Integer.toUnsignedLong(integer());
        if (number < 0 || number > limit) {
            throw damaged("the " + what + " is " + number);
        }
        return number;
    }

    private void skipNumber() throws IOException {
        if (version == 5) {
            longInteger();
        } else {
            integer();
        }
    }

    private int integer() throws IOException {
        need(4);
        return window.getInt();
    }

    private long longInteger() throws IOException {
        need(8);
        return window.getLong();
    }

    /** Makes the next bytes available in the window. */
    private void need(int length) throws IOException {
        if (window.remaining() >= length) {
            return;
        }
        windowStart += window.position();
        if (windowStart + length > Math.min(fileSize, HEADER_LIMIT)) {
            throw CdfProblems.truncated(path, windowStart + length, fileSize);
        }
        ByteBuffer next = ByteBuffer.allocate((int) Math.min(Math.max(length, 1 << 16), fileSize - windowStart));
        while (next.hasRemaining() && channel.read(next, windowStart + next.position()) > 0) {
            // read on until the window is full
        }
        window = next.flip();
    }

    private RuntimeException damaged(String what) {
        return CdfProblems.damaged(path, "its header makes no sense: " + what, null);
    }
}
