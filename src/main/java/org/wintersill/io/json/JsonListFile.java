package org.wintersill.io.json;

import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.BufferedWriter;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Map;
import org.wintersill.problem.Problem;

/** Writes a document whose last member is a long list, entry by entry, one a line. */
public final class JsonListFile implements AutoCloseable {
    private final ObjectMapper mapper = new ObjectMapper();
    private final Path file;
    private final BufferedWriter out;
    private boolean any;

    /**
     * Begins the document.
     *
     * @param head members before the list
     * @param list key of the list
     */
    public JsonListFile(Path file, Map<String, ?> head, String list) {
        this.file = file;
        try {
            out = Files.newBufferedWriter(file);
            String text = JsonText.of(head);
            out.write(text.substring(0, text.lastIndexOf('}')).stripTrailing());
            out.write(",\n  " + mapper.writeValueAsString(list) + " : [\n");
        } catch (IOException e) {
            throw problem(e);
        }
    }

    public void add(Map<String, ?> entry) {
        try {
            out.write(any ? ",\n" : "");
            out.write(mapper.writeValueAsString(entry));
            any = true;
        } catch (IOException e) {
            throw problem(e);
        }
    }

    /** Ends list and document. */
    @Override
    public void close() {
        try (out) {
            out.write("\n  ]\n}\n");
        } catch (IOException e) {
            throw problem(e);
        }
    }

    private RuntimeException problem(IOException e) {
        return Problem.output("the file cannot be written: " + e.getMessage(), file.toString(),
                "Check the permissions of the folder and the free space of the disk").asException(e);
    }
}
