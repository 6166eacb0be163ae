package org.wintersill.io.geotiff.read;

import java.io.IOException;
import java.util.List;
import java.util.Optional;
import javax.xml.stream.XMLStreamException;
import org.wintersill.io.crs.GeoKeys;

/**
 * Everything a GeoTIFF file says of itself, read from its first image directory and that of its internal mask.
 * Overviews are left aside.
 *
 * @param image how values are stored
 * @param mask how the internal mask is stored; null for a file without one
 * @param place where the cells lie
 * @param keys keys of the reference system
 * @param metadata what GDAL's XML says of the bands
 * @param nodata the no-data value; empty if the file names none
 */
record GeotiffHeader(TiffImage image, TiffImage mask, Georeference place, GeoKeys keys, GdalMetadata metadata,
                     Optional<Double> nodata) {

    private static final int OVERVIEW = 1;
    private static final int MASK = 4;

    /** @throws org.wintersill.problem.ProblemException when the file is refused */
    static GeotiffHeader read(TiffFile file, CrsLookup systems, Optional<String> crs) {
        try {
            List<TiffDirectory> all = file.directories();
            TiffDirectory first = all.get(0);
            TiffImage image = TiffImage.read(file, first);
            if (image.kind() == SampleKind.BIT) {
                throw file.refuse("The file holds single bits, no numbers", "Give the file with the values");
            }
            TiffImage mask = null;
            for (TiffDirectory other : all.subList(1, all.size())) {
                int type = other.number(TiffDirectory.SUBFILE_TYPE, 0);
                if (type == MASK && mask == null) {
                    mask = mask(file, other, image);
                } else if ((type & (OVERVIEW | MASK)) == 0) {
                    throw file.refuse("The file holds several images as pages; one image whose bands are the days is expected",
                            "Make one file of each with gdal_translate GTIFF_DIR:1:" + file.path().getFileName());
                }
            }
            GeoKeys keys = keys(first);
            var system = systems.of(file, keys, crs);
            Georeference place = Georeference.read(file, first, image.width(), image.height(), keys.pixelIsPoint(), system);
            return new GeotiffHeader(image, mask, place, keys, metadata(file, first), nodata(file, first));
        } catch (IOException e) {
            throw org.wintersill.problem.Problem.input("The header cannot be read: " + e.getMessage(), file.path().toString(),
                    "Fetch or make the file again").asException(e);
        }
    }

    private static TiffImage mask(TiffFile file, TiffDirectory d, TiffImage image) throws IOException {
        TiffImage mask = TiffImage.read(file, d);
        if (mask.width() != image.width() || mask.height() != image.height()
                || mask.kind() != SampleKind.BIT && mask.kind() != SampleKind.UINT8 || mask.kind() == SampleKind.BIT && mask.samples() > 1) {
            throw file.refuse("The internal mask of the file does not fit its image", "Make the file anew with gdal_translate");
        }
        return mask;
    }

    private static GeoKeys keys(TiffDirectory d) throws IOException {
        long[] numbers = d.longs(TiffDirectory.GEO_KEYS);
        int[] directory = new int[numbers.length];
        for (int i = 0; i < directory.length; i++) {
            directory[i] = (int) numbers[i];
        }
        return new GeoKeys(directory, d.doubles(TiffDirectory.GEO_DOUBLES), d.text(TiffDirectory.GEO_ASCII));
    }

    private static GdalMetadata metadata(TiffFile file, TiffDirectory d) throws IOException {
        try {
            return new GdalMetadata(d.text(TiffDirectory.GDAL_METADATA));
        } catch (XMLStreamException e) {
            throw org.wintersill.problem.Problem.input("The GDAL metadata of the file (tag 42112) are damaged", file.path().toString(),
                    "Make the file anew with gdal_translate").asException(e);
        }
    }

    private static Optional<Double> nodata(TiffFile file, TiffDirectory d) throws IOException {
        String text = d.text(TiffDirectory.GDAL_NODATA).trim();
        if (text.isEmpty()) {
            return Optional.empty();
        }
        try {
            return Optional.of(text.toLowerCase(java.util.Locale.ROOT).endsWith("nan") ? Double.NaN
                    : Double.parseDouble(text.replaceFirst("(?i)^([+-]?)inf(inity)?$", "$1Infinity")));
        } catch (NumberFormatException e) {
            throw file.refuse("The no-data value '" + text + "' of the file is not a number", "Set it anew with gdal_edit.py -a_nodata");
        }
    }

    /** One line on strips or tiles, compression and type. */
    String storage() {
        return (image.tiled() ? "tiles of " + image.chunkWidth() + " x " + image.chunkHeight() : "strips of " + image.chunkHeight() + " rows")
                + ", " + ChunkCodec.name(image.compression()) + (image.predictor() > 1 ? " with predictor " + image.predictor() : "") + ", "
                + image.kind().word() + (image.samples() > 1 ? image.separate() ? ", bands apart" : ", bands interleaved" : "")
                + nodata.map(v -> ", no-data " + Numbers.plain(v)).orElse("") + (mask != null ? ", internal mask" : "");
    }
}
