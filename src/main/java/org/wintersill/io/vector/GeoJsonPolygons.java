package org.wintersill.io.vector;

import com.fasterxml.jackson.core.JsonFactory;
import com.fasterxml.jackson.core.JsonParseException;
import com.fasterxml.jackson.core.JsonParser;
import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.core.JsonToken;
import java.io.IOException;
import java.nio.file.Path;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.wintersill.grid.Crs;
import org.wintersill.grid.CrsParser;
import org.wintersill.parcel.PolygonFeature;
import org.wintersill.parcel.PolygonReader;
import org.wintersill.parcel.PolygonRequest;
import org.wintersill.problem.Problem;
import org.wintersill.problem.ProblemException;

/**
 * Polygons of a GeoJSON file (RFC 7946): a collection of features, one feature or one geometry, read as a stream. Coordinates are
 * longitude and latitude of WGS 84 unless the older member {@code crs} names another system; easting or longitude comes first in any
 * case. A system that the file only refers to by an address is refused.
 */
final class GeoJsonPolygons implements PolygonReader {
    private static final JsonFactory FACTORY = new JsonFactory();
    private static final Pattern EPSG = Pattern.compile("(?i)(?:urn:(?:ogc|x-ogc):def:crs:)?EPSG:[\\d.]*:?(\\d+)");
    private static final double FARTHEST_LONGITUDE = 360.000001;
    private static final double FARTHEST_LATITUDE = 90.000001;

    private final Path file;
    private final GeoJsonHeader header;
    private final Crs crs;
    private final NamedColumns named;
    private final JsonParser parser;
    private final GeoJsonFeature feature;
    private boolean ended;
    private long count;

    private GeoJsonPolygons(Path file, PolygonRequest request, CrsParser systems) throws IOException {
        this.file = file;
        header = GeoJsonHeader.read(file, FACTORY);
        request.layer().ifPresent(layer -> {
            throw Problem.usage("a GeoJSON file has no layers, and layer " + layer + " is asked for", file.toString(),
                    "Take the layer out").asException();
        });
        Optional<String> own = header.crs().isEmpty() && request.crs().isPresent() ? Optional.empty()
                : Optional.of(header.crs().map(this::code).orElse("EPSG:4326"));
        crs = new SystemOfFile(file, systems).settle(own, request.crs());
        named = NamedColumns.of(file, header.columns(), request);
        feature = new GeoJsonFeature(named);
        parser = FACTORY.createParser(file.toFile());
        position();
    }

    static GeoJsonPolygons open(Path file, PolygonRequest request, CrsParser parser) {
        try {
            return new GeoJsonPolygons(file, request, parser);
        } catch (IOException e) {
            throw damaged(file, e);
        }
    }

    static ProblemException damaged(Path file, IOException e) {
        String place = e instanceof JsonProcessingException json && json.getLocation() != null
                ? ", line " + json.getLocation().getLineNr() + " column " + json.getLocation().getColumnNr() : "";
        String what = e instanceof JsonParseException json ? json.getOriginalMessage() : e instanceof JsonProcessingException json
                ? json.getOriginalMessage() : e.getMessage();
        return Problem.input("the GeoJSON file is damaged or cut short: " + String.valueOf(what).split("\n")[0], file + place,
                "Fetch or make the file again").asException(e);
    }

    private String code(String name) {
        if (name.matches("(?i)(urn:(ogc|x-ogc):def:crs:)?(OGC:[\\d.]*:?)?CRS:?84")) {
            return "EPSG:4326";
        }
        Matcher matcher = EPSG.matcher(name);
        if (!matcher.matches()) {
            throw Problem.input("the member crs names the system '" + name + "', which is not known", file.toString(),
                    "Make the file anew with ogr2ogr -t_srs EPSG:4326").asException();
        }
        return "EPSG:" + matcher.group(1);
    }

    /** Brings the parser to the first feature. */
    private void position() throws IOException {
        parser.nextToken();
        if (!header.collection()) {
            return;
        }
        while (parser.nextToken() == JsonToken.FIELD_NAME) {
            boolean features = parser.currentName().equals("features");
            parser.nextToken();
            if (features) {
                return;
            }
            parser.skipChildren();
        }
        ended = true;
    }

    @Override
    public Crs crs() {
        return crs;
    }

    @Override
    public String layer() {
        return String.valueOf(file.getFileName());
    }

    @Override
    public String idColumn() {
        return named.id().orElse("");
    }

    @Override
    public PolygonFeature next() {
        if (ended) {
            return null;
        }
        try {
            if (header.collection() && parser.nextToken() != JsonToken.START_OBJECT) {
                if (parser.currentToken() != JsonToken.END_ARRAY) {
                    throw new JsonParseException(parser, "a feature is expected");
                }
                ended = true;
                return null;
            }
            ended = !header.collection();
            count++;
            feature.read(parser, header.bareGeometry());
        } catch (IOException e) {
            throw damaged(file, e);
        }
        checkDegrees();
        RingRepair.Repaired repaired = feature.unknownType().isEmpty() ? RingRepair.of(feature.geometry())
                : RingRepair.Repaired.none("the geometry is a " + feature.unknownType() + ", no polygon");
        String id = feature.id();
        return new PolygonFeature(count, id.isEmpty() ? Long.toString(count) : id, feature.name(), repaired.outline(), repaired.remark());
    }

    private void checkDegrees() {
        double[] far = feature.farthest();
        if (crs.kind() == Crs.Kind.GEOGRAPHIC && (far[0] > FARTHEST_LONGITUDE || far[1] > FARTHEST_LATITUDE)) {
            boolean swapped = far[1] <= FARTHEST_LONGITUDE && far[0] <= FARTHEST_LATITUDE;
            throw Problem.input("feature " + count + " has coordinates up to " + far[0] + ", " + far[1]
                            + ", which are no longitude and latitude", file.toString(), swapped ? "Longitude comes first in GeoJSON: the two seem to be swapped"
                            : "Make the file anew in degrees with ogr2ogr -t_srs EPSG:4326, or name its system with crs").asException();
        }
    }

    @Override
    public void close() {
        try {
            parser.close();
        } catch (IOException e) {
            throw damaged(file, e);
        }
    }
}
