package org.wintersill.io.geotiff.read;

import java.nio.file.Path;
import java.util.Locale;
import java.util.Optional;
import org.wintersill.elevation.ElevationField;
import org.wintersill.elevation.ElevationFormat;
import org.wintersill.grid.CrsParser;
import org.wintersill.grid.GridGeometry;
import org.wintersill.io.crs.GeoKeys;
import org.wintersill.problem.Notices;
import org.wintersill.problem.Problem;

/**
 * Ground heights in GeoTIFF files: the first band, integers or reals, in metres, feet (0.3048 m) or US survey feet
 * (1200/3937 m). The unit comes from the band's unit, from the vertical keys, or from the run file; metres are assumed, and
 * said, where nobody says. Voids are NaN: the no-data value, the mask, -32768, and where the file names no no-data value
 * also -9999 and -32767. Besides the heights themselves one chunk of the file is held in memory. Thread-safe.
 */
public final class GeotiffElevationFormat implements ElevationFormat {
    /** Void of int16 terrain models since SRTM, whether the file says so or not. */
    private static final double INT16_VOID = -32768;
    /** Beyond the deepest trench and the highest summit, metres. */
    private static final double LOWEST = -11500;
    private static final double HIGHEST = 9000;
    private static final double FOOT = 0.3048;
    private static final double US_FOOT = 1200.0 / 3937;

    private final CrsLookup systems;

    /** @param parser turns the codes in files and run file into reference systems */
    public GeotiffElevationFormat(CrsParser parser) {
        this.systems = new CrsLookup(parser);
    }

    @Override
    public boolean recognises(Path file, byte[] head) {
        return TiffFile.recognises(head);
    }

    @Override
    public GridGeometry grid(Path path, Optional<String> crs, Notices notices) {
        try (TiffFile file = TiffFile.open(path)) {
            return GeotiffHeader.read(file, systems, crs).place().grid();
        }
    }

    @Override
    public ElevationField read(Path path, Optional<String> crs, Optional<String> unit, Notices notices) {
        try (TiffFile file = TiffFile.open(path)) {
            GeotiffHeader header = GeotiffHeader.read(file, systems, crs);
            GridGeometry grid = header.place().grid();
            double metres = metresPerUnit(file, header, unit, notices);
            double scale = number(file, header, "scale", 1) * metres;
            double offset = number(file, header, "offset", 0) * metres;
            float[] heights = allocate(file, grid);
            boolean undeclared = header.nodata().isEmpty();
            boolean int16 = header.image().kind() == SampleKind.INT16;
            long[] odd = {0};
            WindowReader window = new WindowReader(file, header);
            new GridWindow(header.place()).read(window, new int[] {0}, grid.whole(), (band, row, column, stored, count) -> {
                int to = row * grid.columns() + column;
                for (int i = 0; i < count; i++) {
                    double value = stored[i];
                    double height = value * scale + offset;
                    boolean none = Double.isNaN(value) || int16 && value == INT16_VOID || undeclared && isVoid(value);
                    if (!none && !(height >= LOWEST && height <= HIGHEST)) {
                        odd[0]++;
                        none = true;
                    }
                    heights[to + i] = none ? Float.NaN : (float) height;
                }
            });
            if (odd[0] > 0) {
                notices.add(path + ": " + odd[0] + " heights outside " + (int) LOWEST + ".." + (int) HIGHEST + " m are taken as missing");
            }
            if (header.image().samples() > 1) {
                notices.add(path + ": the first of " + header.image().samples() + " bands is taken as the heights");
            }
            return new ElevationField(grid, heights, path.getFileName() + ": " + grid.describe() + "; " + header.storage()
                    + (header.place().change().isEmpty() ? "" : "; " + header.place().change()));
        }
    }

    private static float[] allocate(TiffFile file, GridGeometry grid) {
        if (grid.cells() > Integer.MAX_VALUE - 16 || grid.cells() * Float.BYTES > Runtime.getRuntime().maxMemory() / 10 * 9) {
            throw tooLarge(file, grid, null);
        }
        try {
            return new float[(int) grid.cells()];
        } catch (OutOfMemoryError e) {
            throw tooLarge(file, grid, e);
        }
    }

    private static RuntimeException tooLarge(TiffFile file, GridGeometry grid, Throwable cause) {
        return Problem.limit("The terrain model of " + grid.cells() + " cells needs " + grid.cells() * Float.BYTES / 1000000
                + " MB of memory", file.path().toString(), "Cut it to the area (gdal_translate -projwin), make it coarser, or give Java"
                + " more memory with -Xmx").asException(cause);
    }

    /** What files hold for "no height" although they do not say so. */
    private static boolean isVoid(double stored) {
        return Math.abs(stored) > 1e30 || stored == -9999 || stored == -32767 || stored == -99999;
    }

    private static double number(TiffFile file, GeotiffHeader header, String role, double usual) {
        return header.metadata().item(role, 0).map(text -> {
            try {
                return Double.parseDouble(text);
            } catch (NumberFormatException e) {
                throw file.refuse("The " + role + " '" + text + "' of the file is not a number", "Set it anew with gdal_edit.py -" + role);
            }
        }).orElse(usual);
    }

    private static double metresPerUnit(TiffFile file, GeotiffHeader header, Optional<String> given, Notices notices) {
        Optional<Double> own = header.metadata().item("unittype", 0).map(text -> unit(file, text, "of the file"))
                .or(() -> fromKeys(file, header.keys()));
        Optional<Double> asked = given.map(text -> unit(file, text, "of the run file"));
        if (own.isPresent() && asked.isPresent() && Math.abs(own.get() / asked.get() - 1) > 1e-9) {
            throw file.refuse("The file gives heights in " + word(own.get()) + ", the run file in " + word(asked.get()),
                    "Take the unit out of the run file, or mend the file with gdal_edit.py -units");
        }
        if (own.isEmpty() && asked.isEmpty()) {
            notices.add(file.path() + ": the file does not give the unit of its heights, metres are assumed");
        }
        return own.or(() -> asked).orElse(1.0);
    }

    private static Optional<Double> fromKeys(TiffFile file, GeoKeys keys) {
        return switch (keys.verticalUnit()) {
            case 9001 -> Optional.of(1.0);
            case 9002 -> Optional.of(FOOT);
            case 9003 -> Optional.of(US_FOOT);
            case 0 -> switch (keys.verticalSystem()) {
                // NAVD88 height and depth in feet and US survey feet, EPSG dataset.
                case 8228 -> Optional.of(FOOT);
                case 6360 -> Optional.of(US_FOOT);
                default -> Optional.empty();
            };
            default -> throw file.refuse("The vertical unit of the file has code " + keys.verticalUnit()
                    + "; metres (9001), feet (9002) and US survey feet (9003) are known", "Make the file anew in metres");
        };
    }

    private static double unit(TiffFile file, String text, String whose) {
        return switch (text.trim().toLowerCase(Locale.ROOT).replace('_', ' ').replace("-", " ")) {
            case "m", "metre", "meter", "metres", "meters", "mtr" -> 1;
            case "ft", "foot", "feet", "international foot", "international feet" -> FOOT;
            case "us ft", "ftus", "us survey foot", "us survey feet", "foot us", "survey foot", "survey feet", "us foot", "us feet",
                    "ussft", "sft", "usft" -> US_FOOT;
            default -> throw file.refuse("The unit '" + text + "' " + whose + " is no unit of height that is known; m, ft and us-ft are",
                    "Check that the file holds heights, and set its unit with gdal_edit.py -units");
        };
    }

    private static String word(double metres) {
        return metres == 1 ? "m" : metres == FOOT ? "ft" : "us-ft";
    }
}
