package org.wintersill.io.vector;

import com.fasterxml.jackson.core.JsonParser;
import com.fasterxml.jackson.core.JsonToken;
import java.io.IOException;
import java.util.ArrayList;
import java.util.List;
import java.util.Set;
import org.locationtech.jts.geom.Coordinate;
import org.locationtech.jts.geom.Geometry;
import org.locationtech.jts.geom.GeometryFactory;
import org.locationtech.jts.geom.LinearRing;
import org.locationtech.jts.geom.Polygon;

/** Reads one feature after the other and keeps the values of the last one. */
final class GeoJsonFeature {
    private static final GeometryFactory GEOMETRIES = new GeometryFactory();
    /** Points of one feature; more than that is no parcel. */
    private static final int MOST_POINTS = 20_000_000;
    private static final int FEWEST_RING_POINTS = 4;

    private final NamedColumns named;
    private String id;
    private String name;
    private String ownId;
    private String type;
    private List<List<Coordinate[]>> polygons;
    private double farX;
    private double farY;
    private int points;

    GeoJsonFeature(NamedColumns named) {
        this.named = named;
    }

    /** @param bareGeometry whether the object is itself a geometry */
    void read(JsonParser parser, boolean bareGeometry) throws IOException {
        id = "";
        name = "";
        ownId = "";
        type = "";
        polygons = new ArrayList<>();
        farX = 0;
        farY = 0;
        points = 0;
        if (bareGeometry) {
            geometryMembers(parser);
            return;
        }
        while (parser.nextToken() == JsonToken.FIELD_NAME) {
            String member = parser.currentName();
            JsonToken value = parser.nextToken();
            if (member.equals("geometry") && value == JsonToken.START_OBJECT) {
                geometryMembers(parser);
            } else if (member.equals("properties") && value == JsonToken.START_OBJECT) {
                properties(parser);
            } else if (member.equals("id") && value.isScalarValue()) {
                ownId = text(parser, value);
            } else {
                parser.skipChildren();
            }
        }
    }

    private void properties(JsonParser parser) throws IOException {
        while (parser.nextToken() == JsonToken.FIELD_NAME) {
            String key = parser.currentName();
            JsonToken value = parser.nextToken();
            if (!value.isScalarValue()) {
                parser.skipChildren();
                continue;
            }
            if (named.id().filter(key::equals).isPresent()) {
                id = text(parser, value);
            }
            if (named.name().filter(key::equals).isPresent()) {
                name = text(parser, value);
            }
        }
    }

    private static String text(JsonParser parser, JsonToken value) throws IOException {
        return value == JsonToken.VALUE_NULL ? "" : NamedColumns.text(value == JsonToken.VALUE_NUMBER_FLOAT
                ? (Object) parser.getDoubleValue() : parser.getText());
    }

    private void geometryMembers(JsonParser parser) throws IOException {
        while (parser.nextToken() == JsonToken.FIELD_NAME) {
            String member = parser.currentName();
            JsonToken value = parser.nextToken();
            if (member.equals("type") && value == JsonToken.VALUE_STRING) {
                type = parser.getText();
            } else if (member.equals("coordinates") && value == JsonToken.START_ARRAY) {
                coordinates(parser);
            } else {
                parser.skipChildren();
            }
        }
    }

    /** Rings of a Polygon lie three lists deep, those of a MultiPolygon four; the type may only come afterwards. */
    private void coordinates(JsonParser parser) throws IOException {
        int depth = 1;
        List<Coordinate> ring = new ArrayList<>();
        boolean multi = false;
        List<Coordinate[]> polygon = new ArrayList<>();
        while (depth > 0) {
            JsonToken token = parser.nextToken();
            if (token == JsonToken.START_ARRAY) {
                depth++;
                GeoJsonHeader.require(parser, depth <= 4, "coordinates are nested too deeply");
            } else if (token == JsonToken.END_ARRAY) {
                depth--;
                if (!ring.isEmpty() && depth == (multi ? 2 : 1)) {
                    polygon.add(ring.toArray(new Coordinate[0]));
                    ring.clear();
                }
                if (!polygon.isEmpty() && depth == (multi ? 1 : 0)) {
                    polygons.add(polygon);
                    polygon = new ArrayList<>();
                }
            } else {
                GeoJsonHeader.require(parser, token != null && token.isNumeric(), "a number is expected in coordinates");
                multi = depth == 4;
                ring.add(position(parser));
                depth--;
            }
        }
        if (!ring.isEmpty()) {
            polygons.clear();
        }
    }

    /** The rest of a position whose first number is at hand; further numbers than two are left out. */
    private Coordinate position(JsonParser parser) throws IOException {
        double x = parser.getDoubleValue();
        GeoJsonHeader.require(parser, parser.nextToken() != null && parser.currentToken().isNumeric(), "a position needs two numbers");
        double y = parser.getDoubleValue();
        while (parser.nextToken() != JsonToken.END_ARRAY) {
            GeoJsonHeader.require(parser, parser.currentToken() != null && parser.currentToken().isNumeric(), "a position holds numbers only");
        }
        GeoJsonHeader.require(parser, ++points <= MOST_POINTS, "a feature has more than " + MOST_POINTS + " points");
        farX = Math.max(farX, Math.abs(x));
        farY = Math.max(farY, Math.abs(y));
        return new Coordinate(x, y);
    }

    /** What the chosen column says, else the feature's own id; empty for neither. */
    String id() {
        return id.isEmpty() ? ownId : id;
    }

    String name() {
        return name;
    }

    /** The type where it is one that cannot be an area; empty otherwise. */
    String unknownType() {
        return type.isEmpty() || Set.of("Polygon", "MultiPolygon").contains(type) ? "" : type;
    }

    /** Greatest absolute coordinates. */
    double[] farthest() {
        return new double[] {farX, farY};
    }

    /** Null where there is none. */
    Geometry geometry() {
        List<Polygon> made = new ArrayList<>();
        for (List<Coordinate[]> rings : polygons) {
            LinearRing[] closed = rings.stream().map(GeoJsonFeature::ring).toArray(LinearRing[]::new);
            made.add(GEOMETRIES.createPolygon(closed[0], java.util.Arrays.copyOfRange(closed, 1, closed.length)));
        }
        return made.isEmpty() ? null : made.size() == 1 ? made.get(0) : GEOMETRIES.createMultiPolygon(made.toArray(new Polygon[0]));
    }

    static LinearRing ring(Coordinate[] points) {
        Coordinate[] closed = points;
        if (!points[0].equals2D(points[points.length - 1]) || points.length < FEWEST_RING_POINTS) {
            closed = java.util.Arrays.copyOf(points, Math.max(FEWEST_RING_POINTS, points.length + 1));
            java.util.Arrays.fill(closed, points.length, closed.length, points[0]);
        }
        return GEOMETRIES.createLinearRing(closed);
    }
}
