package org.wintersill.io.netcdf;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.wintersill.elevation.ElevationField;
import org.wintersill.problem.Notices;
import org.wintersill.problem.ProblemException;

class NetcdfElevationTest {
    private final NetcdfElevationFormat format = new NetcdfElevationFormat(new StubCrsParser());

    @ParameterizedTest
    @ValueSource(strings = {"height-metres.nc", "height-feet.nc"})
    void heightsAreMetresNorthUpWithVoidsMissing(String name) {
        JsonNode expected = Fixtures.expected().get(name);
        ElevationField field = format.read(Fixtures.path(name), Optional.empty(), Optional.empty(), new Notices());
        assertArrayEquals(Fixtures.values(expected), field.metres(), 1e-3f);
        assertEquals(expected.get("north").asDouble(), field.grid().north(), 1e-9);
        assertTrue(field.grid().sameAs(format.grid(Fixtures.path(name), Optional.empty(), new Notices())));
    }

    @Test
    void contradictingUnitIsRefused() {
        ProblemException e = assertThrows(ProblemException.class, () -> format.read(Fixtures.path("height-metres.nc"),
                Optional.empty(), Optional.of("ft"), new Notices()));
        assertTrue(e.getMessage().contains("the run file says ft"), e.getMessage());
    }

    @Test
    void fileWithoutHeightsListsWhatItHas() {
        ProblemException e = assertThrows(ProblemException.class, () -> format.grid(Fixtures.path("height-none.nc"),
                Optional.empty(), new Notices()));
        assertTrue(e.getMessage().contains("rain"), e.getMessage());
    }
}
