package org.wintersill.io.vector;

import com.fasterxml.jackson.core.JsonFactory;
import com.fasterxml.jackson.core.JsonParseException;
import com.fasterxml.jackson.core.JsonParser;
import com.fasterxml.jackson.core.JsonToken;
import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import org.wintersill.problem.Problem;

/**
 * What must be known of a GeoJSON file before its first feature: members may come in any order, so the whole file is looked
 * through once.
 *
 * @param collection whether it is a collection of features
 * @param bareGeometry whether it is a geometry without a feature around it
 * @param crs name of the reference system in the older member {@code crs}; empty if there is none
 * @param columns names of the properties of the first feature that has any
 */
record GeoJsonHeader(boolean collection, boolean bareGeometry, Optional<String> crs, List<String> columns) {
    private static final int MOST_COLUMNS = 1000;

    static GeoJsonHeader read(Path file, JsonFactory factory) throws IOException {
        String type = "";
        Optional<String> crs = Optional.empty();
        Set<String> columns = new LinkedHashSet<>();
        try (JsonParser parser = factory.createParser(file.toFile())) {
            require(parser, parser.nextToken() == JsonToken.START_OBJECT, "an object is expected");
            while (parser.nextToken() == JsonToken.FIELD_NAME) {
                String member = parser.currentName();
                JsonToken value = parser.nextToken();
                if (member.equals("type") && value == JsonToken.VALUE_STRING) {
                    type = parser.getText();
                } else if (member.equals("crs") && value == JsonToken.START_OBJECT) {
                    crs = Optional.of(crs(parser, file));
                } else if (member.equals("properties") && value == JsonToken.START_OBJECT) {
                    properties(parser, columns);
                } else if (member.equals("features")) {
                    require(parser, value == JsonToken.START_ARRAY, "features must be a list");
                    features(parser, columns);
                } else {
                    parser.skipChildren();
                }
            }
            require(parser, parser.currentToken() == JsonToken.END_OBJECT && parser.nextToken() == null, "the file goes on after its end");
        }
        boolean geometry = Set.of("Polygon", "MultiPolygon").contains(type);
        if (!geometry && !type.equals("FeatureCollection") && !type.equals("Feature")) {
            throw Problem.input("the file is no GeoJSON with polygons: its type is '" + type + "'", file.toString(),
                    "Give a FeatureCollection, a Feature, a Polygon or a MultiPolygon").asException();
        }
        return new GeoJsonHeader(type.equals("FeatureCollection"), geometry, crs, new ArrayList<>(columns));
    }

    static void require(JsonParser parser, boolean right, String what) throws JsonParseException {
        if (!right) {
            throw new JsonParseException(parser, what);
        }
    }

    /** Looks into features until one has properties, and skips the rest. */
    private static void features(JsonParser parser, Set<String> columns) throws IOException {
        while (parser.nextToken() == JsonToken.START_OBJECT) {
            while (parser.nextToken() == JsonToken.FIELD_NAME) {
                String member = parser.currentName();
                JsonToken value = parser.nextToken();
                if (columns.isEmpty() && member.equals("properties") && value == JsonToken.START_OBJECT) {
                    properties(parser, columns);
                } else {
                    parser.skipChildren();
                }
            }
        }
        require(parser, parser.currentToken() == JsonToken.END_ARRAY, "a feature is expected");
    }

    private static void properties(JsonParser parser, Set<String> columns) throws IOException {
        while (parser.nextToken() == JsonToken.FIELD_NAME) {
            require(parser, columns.size() < MOST_COLUMNS, "a feature has more than " + MOST_COLUMNS + " properties");
            columns.add(parser.currentName());
            parser.nextToken();
            parser.skipChildren();
        }
    }

    private static String crs(JsonParser parser, Path file) throws IOException {
        String name = "";
        int depth = 1;
        while (depth > 0) {
            JsonToken token = parser.nextToken();
            require(parser, token != null, "the file ends inside of crs");
            depth += token.isStructStart() ? 1 : token.isStructEnd() ? -1 : 0;
            if (token == JsonToken.VALUE_STRING && parser.currentName() != null && Set.of("name", "href").contains(parser.currentName())) {
                if (parser.currentName().equals("href")) {
                    throw Problem.input("the file only gives an address of its reference system, and nothing is fetched", file.toString(),
                            "Make the file anew with ogr2ogr -t_srs EPSG:4326").asException();
                }
                name = parser.getText();
            }
        }
        return name;
    }
}
