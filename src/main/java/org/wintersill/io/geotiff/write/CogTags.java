package org.wintersill.io.geotiff.write;

import java.util.Arrays;
import java.util.List;
import org.wintersill.grid.GridGeometry;
import org.wintersill.layer.LayerStyle;
import org.wintersill.layer.RasterHeader;
import org.wintersill.layer.SampleType;

/** Fills the directories of a file: what each level is, and for the first one all that the header says. */
final class CogTags {
    private static final int PALETTE = 3;
    private static final int MIN_IS_BLACK = 1;

    private final RasterHeader header;
    private final GeoKeyTags keys;
    private final String metadata;

    CogTags(RasterHeader header, GeoKeyTags keys, List<ValueStatistics> statistics) {
        this.header = header;
        this.keys = keys;
        metadata = BandMetadata.xml(header, statistics);
    }

    /**
     * The directory of one level.
     *
     * @param positions start of each tile in the file, band after band
     * @param lengths bytes of each tile
     */
    TiffDirectory directory(PyramidLevel level, boolean full, long[] positions, int[] lengths, boolean big) {
        SampleType type = header.layer().type();
        int bands = header.bands().size();
        TiffDirectory tags = new TiffDirectory();
        if (!full) {
            tags.longs(254, 1);
        }
        tags.longs(256, level.columns()).longs(257, level.rows());
        tags.shorts(258, repeated(8 * type.bytes(), bands)).shorts(259, 8);
        tags.shorts(277, bands).shorts(284, bands == 1 ? 1 : 2).shorts(317, TileCodec.predictor(type));
        tags.longs(322, PyramidLevel.TILE).longs(323, PyramidLevel.TILE);
        tags.positions(324, positions, big).longs(325, lengths);
        if (bands > 1) {
            tags.shorts(338, new int[bands - 1]);
        }
        tags.shorts(339, repeated(sampleFormat(type), bands));
        tags.text(42113, Integer.toString(type.nodata()));
        colours(tags);
        if (full) {
            words(tags);
            place(tags);
        }
        return tags;
    }

    /** A palette belongs to files of one band: TIFF knows none for several. */
    private void colours(TiffDirectory tags) {
        if (header.layer().type() != SampleType.BYTE || header.bands().size() > 1
                || !(header.layer().style() instanceof LayerStyle.Classes classes)) {
            tags.shorts(262, MIN_IS_BLACK);
            return;
        }
        int[] map = new int[3 * 256];
        for (LayerStyle.Entry entry : classes.entries()) {
            map[entry.code()] = entry.colour().red() * 257;
            map[256 + entry.code()] = entry.colour().green() * 257;
            map[512 + entry.code()] = entry.colour().blue() * 257;
        }
        tags.shorts(262, PALETTE).shorts(320, map);
    }

    private void words(TiffDirectory tags) {
        tags.text(270, oneLine(header.layer().title() + ": " + header.layer().description()));
        tags.text(305, oneLine(header.software()));
        tags.text(306, header.dateTime());
        tags.text(42112, metadata);
    }

    private static String oneLine(String text) {
        return BandMetadata.printable(text).replace('\n', ' ').replace('\t', ' ');
    }

    private void place(TiffDirectory tags) {
        GridGeometry grid = header.grid();
        tags.doubles(33550, grid.cellWidth(), grid.cellHeight(), 0);
        tags.doubles(33922, 0, 0, 0, grid.west(), grid.north(), 0);
        tags.shorts(34735, keys.directory());
        if (keys.doubles().length > 0) {
            tags.doubles(34736, keys.doubles());
        }
        if (!keys.ascii().isEmpty()) {
            tags.text(34737, keys.ascii());
        }
    }

    private static int sampleFormat(SampleType type) {
        return switch (type) {
            case FLOAT32 -> 3;
            case INT16 -> 2;
            case BYTE -> 1;
        };
    }

    private static int[] repeated(int value, int count) {
        int[] values = new int[count];
        Arrays.fill(values, value);
        return values;
    }
}
