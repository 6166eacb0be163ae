package org.wintersill.io.crs;

import java.lang.reflect.Array;
import java.util.List;
import java.util.Map;

/** Typed access to the attributes of a CF grid mapping, which readers deliver as numbers, arrays, lists or texts. */
final class GridMappingAttributes {
    private final Map<String, Object> attributes;

    GridMappingAttributes(Map<String, Object> attributes) {
        this.attributes = attributes;
    }

    boolean has(String name) {
        return attributes.get(name) != null && !text(name).isEmpty();
    }

    String text(String name) {
        Object value = attributes.get(name);
        return value == null ? "" : value.toString().trim();
    }

    double number(String name, double otherwise) {
        return has(name) ? numbers(name)[0] : otherwise;
    }

    /** @throws IllegalArgumentException when it is absent */
    double required(String name) {
        if (!has(name)) {
            throw new IllegalArgumentException("the attribute " + name + " is missing");
        }
        return numbers(name)[0];
    }

    /** One number or several; empty if the attribute is absent. */
    double[] numbers(String name) {
        Object value = attributes.get(name);
        if (value == null) {
            return new double[0];
        }
        Object[] parts;
        if (value instanceof List<?> list) {
            parts = list.toArray();
        } else if (value.getClass().isArray()) {
            parts = new Object[Array.getLength(value)];
            for (int i = 0; i < parts.length; i++) {
                parts[i] = Array.get(value, i);
            }
        } else if (value instanceof CharSequence words) {
            parts = words.toString().trim().split("[,\\s]+");
        } else {
            parts = new Object[] {value};
        }
        double[] out = new double[parts.length];
        for (int i = 0; i < out.length; i++) {
            out[i] = number(name, parts[i]);
        }
        if (out.length == 0) {
            throw new IllegalArgumentException("the attribute " + name + " is empty");
        }
        return out;
    }

    private static double number(String name, Object part) {
        try {
            double value = part instanceof Number n ? n.doubleValue() : Double.parseDouble(String.valueOf(part));
            if (Double.isFinite(value)) {
                return value;
            }
        } catch (NumberFormatException e) {
            // told below
        }
        throw new IllegalArgumentException("the attribute " + name + " = '" + part + "' is not a number");
    }
}
