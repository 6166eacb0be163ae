package org.wintersill.io.netcdf;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.List;
import org.junit.jupiter.api.Test;

/** Examples after CF conventions 1.8, section 7.3. */
class CellMethodsTest {

    @Test
    void methodsOverTimeAreFoundAmongOthers() {
        assertEquals(List.of("minimum"), CellMethods.overTime("time: minimum", "time"));
        assertEquals(List.of("minimum"), CellMethods.overTime("area: mean time: minimum within days (interval: 1 hour)", "time"));
        assertEquals(List.of("mean"), CellMethods.overTime("lat: lon: time: mean", "time"));
        assertEquals(List.of("minimum", "mean"), CellMethods.overTime("time: minimum within days time: mean over days", "time"));
        assertEquals(List.of("minimum"), CellMethods.overTime("day: minimum", "day"));
        assertEquals(List.of(), CellMethods.overTime("area: mean (comment: time: mean)", "time"));
    }
}
