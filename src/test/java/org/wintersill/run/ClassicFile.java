package org.wintersill.run;

import java.io.ByteArrayOutputStream;
import java.io.DataOutputStream;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * A netCDF classic file (CDF-1) in the making, written from the format specification of the NetCDF Users Guide, appendix B, and
 * kept apart from the code under test.
 */
final class ClassicFile {
    private static final int SHORT = 3;
    private static final int FLOAT = 5;
    private static final int DOUBLE = 6;

    private final Map<String, Integer> dimensions = new LinkedHashMap<>();
    private final List<Variable> variables = new ArrayList<>();
    private String unlimited = "";

    private record Variable(String name, List<String> dimensions, Class<?> type, Map<String, Object> attributes, double[] values) {
        int typeCode() {
            return type == short.class ? SHORT : type == float.class ? FLOAT : DOUBLE;
        }

        int size() {
            return type == short.class ? 2 : type == float.class ? 4 : 8;
        }
    }

    ClassicFile dimension(String name, int length) {
        dimensions.put(name, length);
        return this;
    }

    /** Makes a dimension the record dimension; it must be the first of every variable that has it. */
    ClassicFile unlimited(String name) {
        unlimited = name;
        return this;
    }

    /** @param values in the order of the dimensions, as they are to be stored */
    ClassicFile variable(String name, List<String> dims, Class<?> type, Map<String, Object> attributes, double[] values) {
        variables.add(new Variable(name, dims, type, attributes, values));
        return this;
    }

    void write(Path file) {
        try {
            long[] begins = new long[variables.size()];
            long at = header(begins).length;
            for (boolean record : new boolean[] {false, true}) {
                for (int i = 0; i < begins.length; i++) {
                    if (isRecord(variables.get(i)) == record) {
                        begins[i] = at;
                        at += slabBytes(variables.get(i));
                    }
                }
            }
            ByteArrayOutputStream bytes = new ByteArrayOutputStream();
            bytes.write(header(begins));
            DataOutputStream out = new DataOutputStream(bytes);
            for (Variable variable : variables) {
                if (!isRecord(variable)) {
                    values(out, variable, 0, variable.values().length);
                }
            }
            int records = dimensions.getOrDefault(unlimited, 0);
            for (int r = 0; r < records; r++) {
                for (Variable variable : variables) {
                    if (isRecord(variable)) {
                        int count = variable.values().length / records;
                        values(out, variable, r * count, count);
                    }
                }
            }
            Files.write(file, bytes.toByteArray());
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    private boolean isRecord(Variable variable) {
        return variable.dimensions().contains(unlimited);
    }

    /** Bytes of a variable, or of one record of it, filled up to four. */
    private long slabBytes(Variable variable) {
        int count = variable.values().length / (isRecord(variable) ? Math.max(1, dimensions.get(unlimited)) : 1);
        return ((long) count * variable.size() + 3) / 4 * 4;
    }

    private byte[] header(long[] begins) throws IOException {
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        DataOutputStream out = new DataOutputStream(bytes);
        out.writeBytes("CDF\u0001");
        out.writeInt(dimensions.getOrDefault(unlimited, 0));
        out.writeInt(0x0A);
        out.writeInt(dimensions.size());
        for (Map.Entry<String, Integer> dimension : dimensions.entrySet()) {
            name(out, dimension.getKey());
            out.writeInt(dimension.getKey().equals(unlimited) ? 0 : dimension.getValue());
        }
        attributes(out, Map.of());
        out.writeInt(0x0B);
        out.writeInt(variables.size());
        List<String> order = new ArrayList<>(dimensions.keySet());
        for (int i = 0; i < begins.length; i++) {
            Variable variable = variables.get(i);
            name(out, variable.name());
            out.writeInt(variable.dimensions().size());
            for (String dimension : variable.dimensions()) {
                out.writeInt(order.indexOf(dimension));
            }
            attributes(out, variable.attributes());
            out.writeInt(variable.typeCode());
            out.writeInt((int) slabBytes(variable));
            out.writeInt((int) begins[i]);
        }
        return bytes.toByteArray();
    }

    private static void attributes(DataOutputStream out, Map<String, Object> attributes) throws IOException {
        out.writeInt(attributes.isEmpty() ? 0 : 0x0C);
        out.writeInt(attributes.size());
        for (Map.Entry<String, Object> attribute : attributes.entrySet()) {
            name(out, attribute.getKey());
            if (attribute.getValue() instanceof String text) {
                out.writeInt(2);
                name(out, text);
            } else if (attribute.getValue() instanceof Short number) {
                out.writeInt(SHORT);
                out.writeInt(1);
                out.writeShort(number);
                out.writeShort(0);
            } else if (attribute.getValue() instanceof Float number) {
                out.writeInt(FLOAT);
                out.writeInt(1);
                out.writeFloat(number);
            } else {
                out.writeInt(DOUBLE);
                out.writeInt(1);
                out.writeDouble((Double) attribute.getValue());
            }
        }
    }

    private static void name(DataOutputStream out, String name) throws IOException {
        byte[] bytes = name.getBytes(StandardCharsets.UTF_8);
        out.writeInt(bytes.length);
        out.write(bytes);
        fill(out, bytes.length);
    }

    private static void values(DataOutputStream out, Variable variable, int first, int count) throws IOException {
        for (int i = first; i < first + count; i++) {
            double value = variable.values()[i];
            switch (variable.typeCode()) {
                case SHORT -> out.writeShort((short) Math.round(value));
                case FLOAT -> out.writeFloat((float) value);
                default -> out.writeDouble(value);
            }
        }
        fill(out, count * variable.size());
    }

    private static void fill(DataOutputStream out, int bytes) throws IOException {
        for (int i = bytes; i % 4 != 0; i++) {
            out.write(0);
        }
    }
}
