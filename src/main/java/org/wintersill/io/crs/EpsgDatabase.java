package org.wintersill.io.crs;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.concurrent.ConcurrentHashMap;
import org.geotools.api.referencing.FactoryException;
import org.geotools.api.referencing.NoSuchAuthorityCodeException;
import org.geotools.api.referencing.crs.CoordinateReferenceSystem;
import org.geotools.api.referencing.crs.ProjectedCRS;
import org.geotools.api.referencing.operation.MathTransform;
import org.geotools.api.referencing.operation.TransformException;
import org.geotools.referencing.CRS;
import org.wintersill.problem.Problem;

/**
 * The EPSG dataset that comes with GeoTools. The first look-up of a process takes more than a second and unpacks the
 * dataset into a folder of the user's, once; where that cannot be written, into a temporary one.
 */
final class EpsgDatabase {
    private static final String FOLDER_PROPERTY = "EPSG-HSQL.directory";
    private static final Map<Integer, SystemDefinition> FOUND = new ConcurrentHashMap<>();

    private EpsgDatabase() {
    }

    /** @throws org.wintersill.problem.ProblemException when there is no such code or no way to read it */
    static SystemDefinition definition(int code) {
        SystemDefinition found = FOUND.get(code);
        if (found == null) {
            found = KnownSystems.of(code).orElseGet(() -> ask(code));
            FOUND.put(code, found);
        }
        return found;
    }

    private static synchronized SystemDefinition ask(int code) {
        chooseFolder();
        String label = "EPSG:" + code;
        try {
            CoordinateReferenceSystem system = CRS.decode(label, true);
            SystemDefinition read = WktReader.read(((org.geotools.referencing.wkt.Formattable) system).toWKT(0, false));
            return read.withShift(mended(system, read.base()));
        } catch (NoSuchAuthorityCodeException e) {
            throw Problem.input("There is no coordinate reference system '" + label + "'", "",
                    "Give the code of a geographic or projected system, such as EPSG:4326 or EPSG:3035").asException(e);
        } catch (IllegalArgumentException e) {
            throw Problem.input("The system " + label + " cannot be used: " + e.getMessage(), "",
                    "Bring the data to another system first, for example with gdalwarp -t_srs EPSG:4326").asException(e);
        } catch (FactoryException | RuntimeException e) {
            throw Problem.input("The system " + label + " could not be looked up: " + e.getMessage(), "",
                    "Make a writable folder for the EPSG dataset and name it with -D" + FOLDER_PROPERTY + "=FOLDER").asException(e);
        }
    }

    /**
     * GeoTools gives the three rotations of a coordinate frame transformation (EPSG method 9607) with the sign of only the
     * first turned, where all three must be for the position vector convention. Its own operation between the same two
     * systems is right and tells which signs are meant.
     */
    private static List<Double> mended(CoordinateReferenceSystem system, GeographicSystem base) throws FactoryException {
        List<Double> p = base.toWgs84();
        if (p.isEmpty() || p.get(4) == 0 && p.get(5) == 0) {
            return p;
        }
        List<Double> turned = List.of(p.get(0), p.get(1), p.get(2), p.get(3), -p.get(4), -p.get(5), p.get(6));
        MathTransform own = CRS.findMathTransform(CRS.getHorizontalCRS(geographic(system)), CRS.decode("EPSG:4326", true), true);
        return misfit(own, base, turned) < misfit(own, base, p) ? turned : p;
    }

    private static CoordinateReferenceSystem geographic(CoordinateReferenceSystem system) {
        return system instanceof ProjectedCRS projected ? projected.getBaseCRS() : system;
    }

    private static double misfit(MathTransform own, GeographicSystem base, List<Double> shift) {
        double sum = 0;
        for (double[] place : new double[][] {{5, 50}, {-70, -30}, {120, 15}}) {
            double[] ours = place.clone();
            double[] theirs = place.clone();
            new DatumShift(base, shift, GeographicSystem.WGS84, List.of()).apply(ours, 0);
            try {
                own.transform(theirs, 0, theirs, 0, 1);
            } catch (TransformException e) {
                return Double.NaN;
            }
            sum += Math.hypot(ours[0] - theirs[0], ours[1] - theirs[1]);
        }
        return sum;
    }

    private static void chooseFolder() {
        if (System.getProperty(FOLDER_PROPERTY) != null) {
            return;
        }
        String cache = System.getenv("XDG_CACHE_HOME");
        Path folder = (cache == null || cache.isBlank() ? Path.of(System.getProperty("user.home", "."), ".cache") : Path.of(cache))
                .resolve("wintersill").resolve("epsg");
        System.setProperty(FOLDER_PROPERTY, writable(folder).toString());
    }

    private static Path writable(Path folder) {
        try {
            Files.createDirectories(folder);
            Files.delete(Files.createTempFile(folder, "try", ".tmp"));
            return folder;
        } catch (IOException | RuntimeException e) {
            return Path.of(System.getProperty("java.io.tmpdir"), "wintersill-epsg-" + System.getProperty("user.name", "user"));
        }
    }
}
