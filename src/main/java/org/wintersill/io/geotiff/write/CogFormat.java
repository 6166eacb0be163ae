package org.wintersill.io.geotiff.write;

import java.nio.file.Path;
import java.util.concurrent.ExecutorService;
import java.util.function.Function;
import org.wintersill.grid.Crs;
import org.wintersill.layer.RasterFormat;
import org.wintersill.layer.RasterHeader;
import org.wintersill.layer.RasterWriter;
import org.wintersill.problem.Problem;

/** Writes layers as Cloud Optimized GeoTIFF. */
public final class CogFormat implements RasterFormat {
    /** Most tiles of a file: the list of them is kept in memory and at the head of the file. */
    private static final long MOST_TILES = 20_000_000;
    /** Most bands: TIFF counts them in 16 bits. */
    private static final int MOST_BANDS = 65_535;

    private final Function<Crs, GeoKeyTags> geoKeys;
    private final long classicLimit;

    /** @param geoKeys tags of a reference system; may throw a ProblemException for one that GeoTIFF cannot express */
    public CogFormat(Function<Crs, GeoKeyTags> geoKeys) {
        this(geoKeys, CogAssembly.CLASSIC_LIMIT);
    }

    /** @param classicLimit length in bytes beyond which a file becomes a BigTIFF */
    CogFormat(Function<Crs, GeoKeyTags> geoKeys, long classicLimit) {
        this.geoKeys = geoKeys;
        this.classicLimit = classicLimit;
    }

    @Override
    public String suffix() {
        return ".tif";
    }

    @Override
    public int rowsAtOnce() {
        return PyramidLevel.TILE;
    }

    @Override
    public RasterWriter create(Path file, RasterHeader header, ExecutorService workers) {
        int bands = header.bands().size();
        if (bands == 0) {
            throw new IllegalArgumentException("a file needs a band");
        }
        if (!header.dateTime().matches("[0-9]{4}:[0-9]{2}:[0-9]{2} [0-9]{2}:[0-9]{2}:[0-9]{2}")) {
            throw new IllegalArgumentException("not a TIFF time: " + header.dateTime());
        }
        if (header.grid().crs().kind() == Crs.Kind.ROTATED_POLE) {
            throw Problem.output("a GeoTIFF cannot hold a grid with a rotated pole", file.toString(),
                    "Write a regular grid in another reference system").asException();
        }
        long tiles = ((header.grid().columns() - 1L) / PyramidLevel.TILE + 1)
                * ((header.grid().rows() - 1L) / PyramidLevel.TILE + 1) * bands;
        if (tiles > MOST_TILES || bands > MOST_BANDS) {
            throw Problem.limit("a file of " + header.grid().columns() + " x " + header.grid().rows() + " cells and "
                    + bands + " bands has " + tiles + " tiles, more than " + MOST_TILES, file.toString(),
                    "Write a smaller area or fewer bands").asException();
        }
        return new CogWriter(file, header, geoKeys.apply(header.grid().crs()), workers, classicLimit);
    }
}
