package org.wintersill.io.geotiff.read;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.wintersill.elevation.ElevationField;
import org.wintersill.io.crs.GeoToolsCrs;
import org.wintersill.problem.Notices;
import org.wintersill.problem.ProblemException;

/** Files made by GDAL with {@code src/test/python/geotiff_read_fixtures.py}: h = 100 + 10 row + column, in the unit of the name. */
class GeotiffElevationFormatTest {
    private final GeotiffElevationFormat format = new GeotiffElevationFormat(new GeoToolsCrs());
    private final Notices notices = new Notices();

    private ElevationField read(String name, String unit) {
        return format.read(GeotiffTemperatureFormatTest.FILES.resolve(name), Optional.empty(), Optional.ofNullable(unit), notices);
    }

    @ParameterizedTest
    @ValueSource(strings = {"dem-int16", "dem-feet", "dem-us-feet", "dem-no-unit", "dem-vertical-feet", "dem-mask"})
    void heightsAreMetresAndVoidsAreMissing(String name) {
        ElevationField field = read(name + ".tif", null);
        assertEquals(field.grid(), format.grid(GeotiffTemperatureFormatTest.FILES.resolve(name + ".tif"), Optional.empty(), notices));
        for (int row = 0; row < 24; row++) {
            for (int column = 0; column < 40; column++) {
                float expected = (row + 3 * column) % 19 == 0 ? Float.NaN : 100 + 10 * row + column;
                assertEquals(expected, field.metres()[row * 40 + column], 1e-4, "row " + row + " column " + column);
            }
        }
    }

    @Test
    void projectedModelKeepsItsSystem() {
        ElevationField field = read("dem-int16.tif", "m");
        assertEquals("EPSG:2056", field.grid().crs().code());
        assertEquals(2600000, field.grid().west());
        assertEquals(1200000, field.grid().north());
        assertEquals(100, field.grid().cellWidth());
    }

    @Test
    void horizontalPartOfACompoundSystemIsTaken() {
        assertEquals("EPSG:4269", read("dem-vertical-feet.tif", null).grid().crs().code());
    }

    @Test
    void unitOfTheRunFileIsUsedWhereTheFileIsSilent() {
        assertEquals(101 * 0.3048, read("dem-no-unit.tif", "ft").metres()[1], 1e-4);
        read("dem-no-unit.tif", null);
        assertTrue(notices.counts().keySet().stream().anyMatch(t -> t.contains("metres are assumed")));
    }

    @Test
    void contradictingAndUnknownUnitsAreRefused() {
        ProblemException e = assertThrows(ProblemException.class, () -> read("dem-feet.tif", "m"));
        assertTrue(e.getMessage().contains("in ft") && e.getMessage().contains("in m"), e.getMessage());
        e = assertThrows(ProblemException.class, () -> read("none-strips.tif", null));
        assertTrue(e.getMessage().contains("'degC'"), e.getMessage());
    }
}
