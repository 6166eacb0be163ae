package org.wintersill.io.json;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import com.fasterxml.jackson.databind.node.MissingNode;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.wintersill.problem.Problem;

/** A value of a JSON document that this program wrote; what is not there is an absent value, not a failure. Immutable. */
public final class JsonValue {
    private static final JsonValue ABSENT = new JsonValue(MissingNode.getInstance());

    private final JsonNode node;

    private JsonValue(JsonNode node) {
        this.node = node;
    }

    /**
     * Reads a document.
     *
     * @param longest bytes that it may have
     * @throws org.wintersill.problem.ProblemException when it is longer, no JSON, or cannot be read
     */
    public static JsonValue read(Path file, long longest) {
        try {
            if (Files.size(file) > longest) {
                throw Problem.input("the file is longer than any that this program writes", file.toString(), "Make it again").asException();
            }
            return new JsonValue(new ObjectMapper().readTree(Files.readAllBytes(file)));
        } catch (IOException e) {
            throw Problem.input("the file cannot be read: " + e.getMessage(), file.toString(), "Make it again").asException(e);
        }
    }

    /** The value of a key. */
    public JsonValue get(String key) {
        JsonNode value = node.get(key);
        return value == null || value.isNull() ? ABSENT : new JsonValue(value);
    }

    /** Whether there is a value. */
    public boolean isPresent() {
        return !node.isMissingNode();
    }

    /** Texts and numbers as text; empty for everything else. */
    public Optional<String> text() {
        return node.isTextual() || node.isNumber() || node.isBoolean() ? Optional.of(node.asText()) : Optional.empty();
    }

    /** Empty for what is no number. */
    public Optional<Double> number() {
        return node.isNumber() ? Optional.of(node.doubleValue()) : Optional.empty();
    }

    /** Values of a list; none for what is no list. */
    public List<JsonValue> items() {
        List<JsonValue> items = new ArrayList<>();
        if (node.isArray()) {
            node.forEach(item -> items.add(new JsonValue(item)));
        }
        return items;
    }

    /** Keys of an object, in order; none for what is no object. */
    public List<String> keys() {
        List<String> keys = new ArrayList<>();
        node.fieldNames().forEachRemaining(keys::add);
        return keys;
    }
}
