package org.wintersill.run;

import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.wintersill.config.FileEntry;
import org.wintersill.config.PolygonEntry;
import org.wintersill.config.TemperatureEntry;
import org.wintersill.elevation.ElevationField;
import org.wintersill.elevation.ElevationFormat;
import org.wintersill.grid.CrsParser;
import org.wintersill.grid.GridGeometry;
import org.wintersill.io.geotiff.read.GeotiffElevationFormat;
import org.wintersill.io.geotiff.read.GeotiffTemperatureFormat;
import org.wintersill.io.netcdf.NetcdfElevationFormat;
import org.wintersill.io.netcdf.NetcdfTemperatureFormat;
import org.wintersill.io.netcdf.UnknownContent;
import org.wintersill.io.vector.PolygonFiles;
import org.wintersill.parcel.PolygonReader;
import org.wintersill.problem.Notices;
import org.wintersill.problem.Problem;
import org.wintersill.problem.Problems;
import org.wintersill.temperature.DailyTemperatureSource;
import org.wintersill.temperature.JoinedTemperatureSource;
import org.wintersill.temperature.TemperatureFormat;
import org.wintersill.temperature.TemperatureRequest;

/** The list of input formats, and the choice of one by a file's first bytes. */
public final class InputFormats {
    private static final int HEAD = 16;
    /** Enough problems for one message; the rest is usually the same mistake. */
    private static final int MOST_PROBLEMS = 20;

    private final List<TemperatureFormat> temperatureFormats;
    private final List<ElevationFormat> elevationFormats;
    private final PolygonFiles polygonFiles;

    public InputFormats(CrsParser crs) {
        temperatureFormats = List.of(new NetcdfTemperatureFormat(crs), new GeotiffTemperatureFormat(crs));
        elevationFormats = List.of(new GeotiffElevationFormat(crs), new NetcdfElevationFormat(crs));
        polygonFiles = new PolygonFiles(crs);
    }

    /**
     * Opens all files of an entry as one record.
     *
     * @throws org.wintersill.problem.ProblemException with every file's problem
     */
    public DailyTemperatureSource open(TemperatureEntry entry, Notices notices) {
        return JoinedTemperatureSource.join(openEach(entry.files(), entry.request(), notices), notices);
    }

    private List<DailyTemperatureSource> openEach(List<Path> files, TemperatureRequest request, Notices notices) {
        Problems problems = new Problems();
        List<DailyTemperatureSource> sources = new ArrayList<>();
        for (Path file : files) {
            problems.attempt(() -> sources.add(open(file, request, notices)));
            if (problems.all().size() >= MOST_PROBLEMS) {
                break;
            }
        }
        problems.throwIfAny();
        return sources;
    }

    /** Opens one file. */
    public DailyTemperatureSource open(Path file, TemperatureRequest request, Notices notices) {
        byte[] head = head(file);
        return temperatureFormats.stream().filter(format -> format.recognises(file, head)).findFirst()
                .orElseThrow(() -> UnknownContent.describe(file, head).asException()).open(file, request, notices);
    }

    /** Reads ground heights. */
    public ElevationField heights(FileEntry entry, Notices notices) {
        return elevationFormat(entry.file()).read(entry.file(), entry.crs(), entry.unit(), notices);
    }

    /** The grid of ground heights, without reading them. */
    GridGeometry heightGrid(FileEntry entry, Notices notices) {
        return elevationFormat(entry.file()).grid(entry.file(), entry.crs(), notices);
    }

    /** Opens a file of polygons; the caller closes it. */
    public PolygonReader polygons(PolygonEntry entry) {
        return polygonFiles.open(entry.file(), entry.request());
    }

    private ElevationFormat elevationFormat(Path file) {
        byte[] head = head(file);
        Optional<ElevationFormat> format = elevationFormats.stream().filter(known -> known.recognises(file, head)).findFirst();
        return format.orElseThrow(() -> UnknownContent.describe(file, head).asException());
    }

    private static byte[] head(Path file) {
        if (Files.isDirectory(file)) {
            throw Problem.input("a file is needed, this is a folder", file.toString(), "Name the files in it, or use a pattern")
                    .asException();
        }
        try (InputStream in = Files.newInputStream(file)) {
            return in.readNBytes(HEAD);
        } catch (java.nio.file.NoSuchFileException e) {
            throw Problem.input("there is no such file", file.toString(), "Check the path; paths in a run file are relative to it")
                    .asException(e);
        } catch (IOException e) {
            throw Problem.input("the file cannot be read: " + e.getMessage(), file.toString(), "Check its permissions").asException(e);
        }
    }
}
