package org.wintersill.io.vector;

import java.io.BufferedInputStream;
import java.io.DataInputStream;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.Charset;
import java.nio.charset.IllegalCharsetNameException;
import java.nio.charset.StandardCharsets;
import java.nio.charset.UnsupportedCharsetException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * The columns of a Shapefile, row by row. Texts are in the code page of the {@code .cpg} file, else of the table's language byte, else
 * Latin-1.
 */
final class DbfTable implements AutoCloseable {
    private static final int HEADER = 32;
    private static final int FIELD = 32;
    private static final int LANGUAGE_BYTE = 29;
    private static final byte FIELDS_END = 0x0d;
    private static final byte DELETED = '*';

    /** @param offset bytes from the start of a row, whose first byte marks deletion */
    private record Field(String name, char type, int offset, int length) {
    }

    /** @param deleted whether the row is marked as deleted */
    record Row(boolean deleted, String id, String name) {
        static final Row NONE = new Row(false, "", "");
    }

    private final Path file;
    private final DataInputStream in;
    private final Charset charset;
    private final List<Field> fields = new ArrayList<>();
    private final byte[] row;
    private final long rows;
    private long given;

    private DbfTable(Path file, DataInputStream in, Optional<Path> codePage) throws IOException {
        this.file = file;
        this.in = in;
        byte[] head = in.readNBytes(HEADER);
        if (head.length < HEADER) {
            throw new IOException(file.getFileName() + " is too short");
        }
        ByteBuffer header = ByteBuffer.wrap(head).order(ByteOrder.LITTLE_ENDIAN);
        rows = Integer.toUnsignedLong(header.getInt(4));
        int headerLength = header.getShort(8) & 0xffff;
        int rowLength = header.getShort(10) & 0xffff;
        charset = charset(codePage, head[LANGUAGE_BYTE] & 255);
        byte[] rest = in.readNBytes(Math.max(0, headerLength - HEADER));
        if (rest.length < headerLength - HEADER || rowLength < 1) {
            throw new IOException("the header of " + file.getFileName() + " is cut short");
        }
        int offset = 1;
        for (int at = 0; at + FIELD <= rest.length && rest[at] != FIELDS_END; at += FIELD) {
            int end = at;
            while (end < at + 11 && rest[end] != 0) {
                end++;
            }
            int length = rest[at + 16] & 255;
            fields.add(new Field(new String(rest, at, end - at, charset).trim(), (char) rest[at + 11], offset, length));
            offset += length;
        }
        if (offset > rowLength) {
            throw new IOException("the columns of " + file.getFileName() + " are longer than its rows");
        }
        row = new byte[rowLength];
    }

    static DbfTable open(Path file, Optional<Path> codePage) throws IOException {
        DataInputStream in = new DataInputStream(new BufferedInputStream(Files.newInputStream(file), 1 << 16));
        try {
            return new DbfTable(file, in, codePage);
        } catch (IOException | RuntimeException e) {
            in.close();
            throw e;
        }
    }

    private static Charset charset(Optional<Path> codePage, int language) throws IOException {
        if (codePage.isPresent()) {
            byte[] text;
            try (var in = Files.newInputStream(codePage.get())) {
                text = in.readNBytes(100);
            }
            Optional<Charset> named = named(new String(text, StandardCharsets.ISO_8859_1).trim());
            if (named.isPresent()) {
                return named.get();
            }
        }
        // Language drivers of dBase: 0x57 and 0x03 Windows ANSI, 0x02 DOS multilingual, 0x01 DOS USA; the others are rare.
        return switch (language) {
            case 0x03, 0x57, 0x58, 0x59 -> named("windows-1252").orElse(StandardCharsets.ISO_8859_1);
            case 0x02 -> named("IBM850").orElse(StandardCharsets.ISO_8859_1);
            case 0x01 -> named("IBM437").orElse(StandardCharsets.ISO_8859_1);
            case 0xc8 -> named("windows-1250").orElse(StandardCharsets.ISO_8859_1);
            case 0xc9 -> named("windows-1251").orElse(StandardCharsets.ISO_8859_1);
            default -> StandardCharsets.ISO_8859_1;
        };
    }

    /** The spellings of code pages that programs write: UTF-8, 65001, 1252, ANSI 1252, ISO 88591, 8859_1, OEM 850 ... */
    private static Optional<Charset> named(String text) {
        String word = text.toUpperCase(Locale.ROOT).replaceAll("[\\s_-]", "").replaceFirst("^(ANSI|OEM|CP|WINDOWS|IBM|ISO)+", "");
        String name = switch (word) {
            case "UTF8", "65001" -> "UTF-8";
            case "437", "850", "852", "866" -> "IBM" + word;
            case "932" -> "windows-31j";
            default -> word.matches("125\\d|874") ? "windows-" + word : word.matches("8859\\d{1,2}") ? "ISO-8859-" + word.substring(4) : text;
        };
        try {
            return Optional.of(Charset.forName(name));
        } catch (IllegalCharsetNameException | UnsupportedCharsetException e) {
            return Optional.empty();
        }
    }

    List<String> columns() {
        return fields.stream().map(Field::name).toList();
    }

    /** The next row, read together with the shape of the same number. */
    Row next(NamedColumns named) throws IOException {
        if (given == rows) {
            throw new IOException(file.getFileName() + " has only " + rows + " rows");
        }
        given++;
        if (in.readNBytes(row, 0, row.length) < row.length) {
            throw new IOException(file.getFileName() + " is cut short");
        }
        return new Row(row[0] == DELETED, text(named.id()), text(named.name()));
    }

    private String text(Optional<String> column) {
        if (column.isEmpty()) {
            return "";
        }
        Field field = fields.stream().filter(f -> f.name().equals(column.get())).findFirst().orElseThrow();
        String text = new String(row, field.offset(), field.length(), charset).replace("\0", "").strip();
        boolean number = (field.type() == 'N' || field.type() == 'F') && text.matches("[-+]?\\d+\\.\\d+");
        return NamedColumns.text(number ? (Object) Double.valueOf(text) : text);
    }

    @Override
    public void close() throws IOException {
        in.close();
    }
}
