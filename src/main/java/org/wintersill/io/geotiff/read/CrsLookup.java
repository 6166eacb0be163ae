package org.wintersill.io.geotiff.read;

import java.util.Map;
import java.util.Optional;
import java.util.concurrent.ConcurrentHashMap;
import org.wintersill.grid.Crs;
import org.wintersill.grid.CrsParser;
import org.wintersill.io.crs.CrsDefinitions;
import org.wintersill.io.crs.GeoKeys;
import org.wintersill.problem.Problem;
import org.wintersill.problem.ProblemException;

/** The reference system of a file from its keys or from the run file, each looked up once for thousands of files. Thread-safe. */
final class CrsLookup {
    private final CrsParser parser;
    private final Map<Object, Crs> found = new ConcurrentHashMap<>();

    CrsLookup(CrsParser parser) {
        this.parser = parser;
    }

    Crs of(TiffFile file, GeoKeys keys, Optional<String> given) {
        try {
            Optional<Crs> named = given.map(code -> cached(code, () -> fromText(code)));
            if (!keys.namesSystem()) {
                return named.orElseThrow(() -> file.refuse("The file does not name its coordinate reference system",
                        "Set crs: to its code, such as crs: EPSG:4326"));
            }
            Crs own = cached(keys, () -> GeoKeys.toCrs(keys, parser));
            if (named.isPresent() && !CrsDefinitions.sameSystem(named.get(), own)) {
                throw file.refuse("The file is in " + own.label() + ", the run file says crs: " + given.get(),
                        "Take crs: out, or mend the file with gdal_edit.py -a_srs");
            }
            return own;
        } catch (ProblemException e) {
            Problem first = e.problems().get(0);
            throw first.where().isEmpty() ? new Problem(first.kind(), first.what(), file.path().toString(), first.remedy()).asException(e) : e;
        }
    }

    private Crs fromText(String text) {
        return text.contains("[") ? parser.fromWkt(text) : parser.fromCode(text);
    }

    private Crs cached(Object key, java.util.function.Supplier<Crs> maker) {
        Crs known = found.get(key);
        if (known == null) {
            known = maker.get();
            found.put(key, known);
        }
        return known;
    }
}
