package org.wintersill.io.netcdf;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.net.URISyntaxException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.wintersill.problem.Notices;
import org.wintersill.temperature.DailyTemperatureSource;
import org.wintersill.temperature.ForcingVariable;
import org.wintersill.temperature.TemperatureRequest;
import org.wintersill.temperature.TemperatureUnit;

/** The files made by {@code src/test/python/make_netcdf_fixtures.py} and what the script says is in them. */
final class Fixtures {
    private Fixtures() {
    }

    static Path path(String name) {
        try {
            return Path.of(Fixtures.class.getResource("/netcdf/" + name).toURI());
        } catch (URISyntaxException e) {
            throw new IllegalStateException(e);
        }
    }

    static JsonNode expected() {
        try (InputStream in = Fixtures.class.getResourceAsStream("/netcdf/expected.json")) {
            return new ObjectMapper().readTree(in);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    static List<String> names(JsonNode expected) {
        List<String> names = new ArrayList<>();
        expected.fieldNames().forEachRemaining(names::add);
        return names;
    }

    static float[] values(JsonNode entry) {
        JsonNode list = entry.get("values");
        float[] values = new float[list.size()];
        for (int i = 0; i < values.length; i++) {
            values[i] = list.get(i).isNull() ? Float.NaN : (float) list.get(i).asDouble();
        }
        return values;
    }

    static TemperatureRequest minimum() {
        return TemperatureRequest.of(ForcingVariable.MINIMUM);
    }

    static TemperatureRequest request(String variable, TemperatureUnit unit, Double scale, String member, String crs) {
        return new TemperatureRequest(ForcingVariable.MINIMUM, Optional.ofNullable(variable), Optional.ofNullable(unit),
                Optional.ofNullable(scale), Optional.empty(), Optional.empty(), Optional.empty(), Optional.ofNullable(member),
                Optional.ofNullable(crs));
    }

    static DailyTemperatureSource open(String name, TemperatureRequest request, Notices notices) {
        return new NetcdfTemperatureFormat(new StubCrsParser()).open(path(name), request, notices);
    }

    static DailyTemperatureSource open(String name) {
        return open(name, minimum(), new Notices());
    }
}
