package org.wintersill.io.crs;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Map;
import java.util.concurrent.ConcurrentHashMap;
import org.geotools.api.referencing.FactoryException;
import org.geotools.api.referencing.NoSuchAuthorityCodeException;
import org.geotools.api.referencing.crs.CoordinateReferenceSystem;
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
            return WktReader.read(((org.geotools.referencing.wkt.Formattable) system).toWKT(0, false));
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
