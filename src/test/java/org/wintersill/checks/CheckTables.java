package org.wintersill.checks;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Objects;
import org.apache.commons.csv.CSVFormat;
import org.apache.commons.csv.CSVRecord;

/** Reads the check tables under {@code src/test/resources/checks}; each carries its sources inside. */
public final class CheckTables {
    private CheckTables() {
    }

    public static JsonNode json(String name) {
        try (InputStream in = open(name)) {
            return new ObjectMapper().readTree(in);
        } catch (IOException e) {
            throw new IllegalStateException(e);
        }
    }

    public static List<CSVRecord> csv(String name) {
        try (InputStream in = open(name)) {
            return CSVFormat.RFC4180.builder().setHeader().setSkipHeaderRecord(true).get()
                    .parse(new InputStreamReader(in, StandardCharsets.UTF_8)).getRecords();
        } catch (IOException e) {
            throw new IllegalStateException(e);
        }
    }

    private static InputStream open(String name) {
        return Objects.requireNonNull(CheckTables.class.getResourceAsStream("/checks/" + name), name);
    }
}
