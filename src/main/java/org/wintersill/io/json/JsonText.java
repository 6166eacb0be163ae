package org.wintersill.io.json;

import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.core.util.DefaultIndenter;
import com.fasterxml.jackson.core.util.DefaultPrettyPrinter;
import com.fasterxml.jackson.databind.ObjectMapper;
import com.fasterxml.jackson.databind.ObjectWriter;
import java.util.Map;

/** Turns ordered maps, lists, texts and numbers into indented JSON. */
public final class JsonText {
    private static final ObjectWriter WRITER = writer();

    private JsonText() {
    }

    private static ObjectWriter writer() {
        DefaultIndenter indenter = new DefaultIndenter("  ", "\n");
        DefaultPrettyPrinter printer = new DefaultPrettyPrinter();
        printer.indentArraysWith(DefaultPrettyPrinter.FixedSpaceIndenter.instance);
        printer.indentObjectsWith(indenter);
        return new ObjectMapper().writer(printer);
    }

    /** The text, ended by a line feed. */
    public static String of(Map<String, ?> document) {
        try {
            return WRITER.writeValueAsString(document) + "\n";
        } catch (JsonProcessingException e) {
            throw new IllegalArgumentException(e);
        }
    }

    /** A number for JSON: null where it is NaN or infinite. */
    public static Double number(double value) {
        return Double.isNaN(value) || Double.isInfinite(value) ? null : Double.valueOf(value);
    }

    /** A float for JSON with its own shortest digits; null where it is NaN or infinite. */
    public static Double number(float value) {
        return Float.isNaN(value) || Float.isInfinite(value) ? null : Double.valueOf(Float.toString(value));
    }
}
