package org.wintersill.io.json;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;

/** Reads texts back from a document of ours; whatever is not such a document has none. */
public final class JsonNames {
    private static final long LONGEST = 64L << 20;

    private JsonNames() {
    }

    /**
     * The texts under one key of the objects in a list.
     *
     * @param file a JSON document; need not exist, need not be one
     * @param list key of the list in the document
     * @param key key of the text in each entry
     * @return in the order of the document; empty where the file has no such list
     */
    public static List<String> of(Path file, String list, String key) {
        List<String> names = new ArrayList<>();
        try {
            if (Files.isRegularFile(file) && Files.size(file) <= LONGEST) {
                for (JsonNode entry : new ObjectMapper().readTree(Files.readAllBytes(file)).path(list)) {
                    if (entry.path(key).isTextual()) {
                        names.add(entry.path(key).textValue());
                    }
                }
            }
        } catch (IOException e) {
            return List.of();
        }
        return names;
    }
}
