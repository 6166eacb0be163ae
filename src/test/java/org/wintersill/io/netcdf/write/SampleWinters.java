package org.wintersill.io.netcdf.write;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.wintersill.grid.Crs;
import org.wintersill.grid.Envelope;
import org.wintersill.grid.GridGeometry;
import org.wintersill.layer.Colour;
import org.wintersill.layer.LayerDefinition;
import org.wintersill.layer.LayerStyle;
import org.wintersill.layer.SampleType;
import org.wintersill.time.CfCalendar;
import org.wintersill.time.SeasonWindow;

/** Descriptions of small files in the three kinds of reference system. */
final class SampleWinters {

    private static final LayerStyle RAMP = new LayerStyle.Ramp("margin", "Margin", List.of(
            new LayerStyle.Stop(-5, Colour.hex("#b2182b"), "-5 K"), new LayerStyle.Stop(5, Colour.hex("#2166ac"), "5 K")));
    private static final LayerStyle CLASSES = new LayerStyle.Classes("phase", "Phase", List.of(
            new LayerStyle.Entry(1, "autumn", "autumn", Colour.hex("#92c5de")),
            new LayerStyle.Entry(2, "mid winter", "midwinter", Colour.hex("#2166ac"))));
    static final List<LayerDefinition> LAYERS = List.of(
            new LayerDefinition("margin", "Margin", "lowest of Tmin - LT50 over the nights", "K", SampleType.FLOAT32,
                    "time: minimum", RAMP),
            new LayerDefinition("worst-night", "Worst night", "days from the first day of the winter", "days",
                    SampleType.INT16, "time: point", RAMP),
            new LayerDefinition("phase", "Phase", "phase of the worst night", "1", SampleType.BYTE, "time: point", CLASSES));
    static final String WGS84 = "GEOGCS[\"WGS 84\",DATUM[\"WGS_1984\",SPHEROID[\"WGS 84\",6378137,298.257223563]],"
            + "PRIMEM[\"Greenwich\",0],UNIT[\"degree\",0.0174532925199433],AUTHORITY[\"EPSG\",\"4326\"]]";
    /** EPSG:3035 as {@code gdalsrsinfo -o wkt1} gives it, authorities of the parts left out. */
    private static final String LAEA = "PROJCS[\"ETRS89-extended / LAEA Europe\",GEOGCS[\"ETRS89\","
            + "DATUM[\"European_Terrestrial_Reference_System_1989\",SPHEROID[\"GRS 1980\",6378137,298.257222101]],"
            + "PRIMEM[\"Greenwich\",0],UNIT[\"degree\",0.0174532925199433]],PROJECTION[\"Lambert_Azimuthal_Equal_Area\"],"
            + "PARAMETER[\"latitude_of_center\",52],PARAMETER[\"longitude_of_center\",10],"
            + "PARAMETER[\"false_easting\",4321000],PARAMETER[\"false_northing\",3210000],UNIT[\"metre\",1],"
            + "AUTHORITY[\"EPSG\",\"3035\"]]";
    private static final String DEGREE = "ANGLEUNIT[\"degree\",0.0174532925199433]";
    /** The form in which PROJ 9 and GDAL 3.6 write a rotated pole of CF. */
    static final String ROTATED = "GEOGCRS[\"Rotated pole\",BASEGEOGCRS[\"WGS 84\",DATUM[\"World Geodetic System 1984\","
            + "ELLIPSOID[\"WGS 84\",6378137,298.257223563,LENGTHUNIT[\"metre\",1]]],PRIMEM[\"Greenwich\",0," + DEGREE + "]],"
            + "DERIVINGCONVERSION[\"Pole rotation (netCDF CF convention)\","
            + "METHOD[\"Pole rotation (netCDF CF convention)\"],"
            + "PARAMETER[\"Grid north pole latitude (netCDF CF convention)\",39.25," + DEGREE + "],"
            + "PARAMETER[\"Grid north pole longitude (netCDF CF convention)\",-162," + DEGREE + "],"
            + "PARAMETER[\"North pole grid longitude (netCDF CF convention)\",0," + DEGREE + "]],"
            + "CS[ellipsoidal,2],AXIS[\"latitude\",north,ORDER[1]," + DEGREE + "],"
            + "AXIS[\"longitude\",east,ORDER[2]," + DEGREE + "]]";

    private SampleWinters() {
    }

    static WinterFile projected() {
        Map<String, Object> mapping = new LinkedHashMap<>();
        mapping.put("grid_mapping_name", "lambert_azimuthal_equal_area");
        mapping.put("latitude_of_projection_origin", 52.0);
        mapping.put("longitude_of_projection_origin", 10.0);
        mapping.put("false_easting", 4321000.0);
        mapping.put("false_northing", 3210000.0);
        mapping.put("semi_major_axis", 6378137.0);
        mapping.put("inverse_flattening", 298.257222101);
        mapping.put("crs_wkt", LAEA);
        return file(new GridGeometry(6, 4, 4_000_000, 2_900_000, 1000, 500,
                new Crs("EPSG:3035", "LAEA", LAEA, Crs.Kind.PROJECTED, 1, null)), CfCalendar.STANDARD, mapping);
    }

    static WinterFile geographic() {
        Map<String, Object> mapping = new LinkedHashMap<>();
        mapping.put("grid_mapping_name", "latitude_longitude");
        mapping.put("semi_major_axis", 6378137.0);
        mapping.put("inverse_flattening", 298.257223563);
        mapping.put("crs_wkt", WGS84);
        return file(new GridGeometry(6, 4, 7, 47, 0.125, 0.25,
                new Crs("EPSG:4326", "WGS 84", WGS84, Crs.Kind.GEOGRAPHIC, 1, null)), CfCalendar.NOLEAP, mapping);
    }

    static WinterFile rotated() {
        Map<String, Object> mapping = new LinkedHashMap<>();
        mapping.put("grid_mapping_name", "rotated_latitude_longitude");
        mapping.put("grid_north_pole_latitude", 39.25);
        mapping.put("grid_north_pole_longitude", -162.0);
        mapping.put("north_pole_grid_longitude", 0.0);
        mapping.put("crs_wkt", ROTATED);
        return file(new GridGeometry(6, 4, -3, 1, 0.11, 0.11, new Crs("", "rotated pole", WGS84, Crs.Kind.ROTATED_POLE, 1,
                new Crs.RotatedPole(39.25, -162, 0))), CfCalendar.DAYS_360, mapping);
    }

    private static WinterFile file(GridGeometry grid, CfCalendar calendar, Map<String, Object> mapping) {
        Map<String, String> attributes = new LinkedHashMap<>();
        for (String name : WinterFile.REQUIRED) {
            attributes.put(name, name.equals("date_created") ? "2005-05-31" : name + " of the sample, \u00fc");
        }
        attributes.put("cultivar", "Gew\u00fcrztraminer");
        SeasonWindow window = SeasonWindow.north();
        return new WinterFile(grid, new Envelope(7, 46, 7.75, 47),
                List.of(window.beginningIn(2003, calendar), window.beginningIn(2004, calendar)), LAYERS, mapping, attributes);
    }

    /** Value of a cell; NaN in the north-west corner. */
    static float value(int layer, int winter, int row, int column) {
        if (row == 0 && column == 0) {
            return Float.NaN;
        }
        return switch (layer) {
            case 0 -> -2.5f + winter + row * 0.5f + column * 0.25f;
            case 1 -> 100 * winter + 6 * row + column;
            default -> 1 + (row + column) % 2;
        };
    }

    static float[] rows(int layer, int winter, int firstRow, int rows, int columns) {
        float[] values = new float[rows * columns];
        for (int i = 0; i < values.length; i++) {
            values[i] = value(layer, winter, firstRow + i / columns, i % columns);
        }
        return values;
    }
}
