package org.wintersill.io.geotiff.read;

import java.io.IOException;
import java.util.Arrays;
import org.wintersill.problem.Problem;

/**
 * How one image of a file is stored.
 *
 * @param chunkWidth columns a chunk; the width for strips
 * @param chunkHeight rows a chunk
 * @param separate whether each band has chunks of its own
 * @param offsets {@code [band of chunks][chunk row][chunk column]}, flat; byte position, 0 for a chunk that was left out
 * @param counts bytes of each chunk
 */
record TiffImage(int width, int height, int samples, SampleKind kind, int compression, int predictor, boolean separate,
                 boolean tiled, int chunkWidth, int chunkHeight, long[] offsets, long[] counts) {

    private static final long LARGEST_CHUNK = 1L << 29;
    private static final int PIECE = 1 << 21;
    private static final int MOST_SAMPLES = 65535;

    static TiffImage read(TiffFile file, TiffDirectory d) throws IOException {
        int width = d.number(TiffDirectory.WIDTH, 0);
        int height = d.number(TiffDirectory.LENGTH, 0);
        int samples = d.number(TiffDirectory.SAMPLES, 1);
        if (width < 1 || height < 1 || samples < 1 || samples > MOST_SAMPLES) {
            throw file.refuse("The image has " + width + " x " + height + " cells and " + samples + " bands", "Make the file again");
        }
        SampleKind kind = kind(file, d);
        int compression = d.number(TiffDirectory.COMPRESSION, 1);
        ChunkCodec.check(file, compression);
        int predictor = d.number(TiffDirectory.PREDICTOR, 1);
        if (!ChunkCodec.usesPredictor(compression)) {
            predictor = 1;
        }
        checkPredictor(file, predictor, kind);
        if (d.number(TiffDirectory.FILL_ORDER, 1) != 1) {
            throw file.refuse("The bits of the file are stored in reverse (FillOrder 2)", "Make it anew with gdal_translate");
        }
        boolean tiled = d.has(TiffDirectory.TILE_WIDTH);
        int chunkWidth = tiled ? d.number(TiffDirectory.TILE_WIDTH, 0) : width;
        int chunkHeight = tiled ? d.number(TiffDirectory.TILE_LENGTH, 0) : rowsPerStrip(d, height);
        if (chunkWidth < 1 || chunkHeight < 1) {
            throw file.refuse("A chunk has " + chunkWidth + " x " + chunkHeight + " cells", "Make the file again");
        }
        boolean separate = d.number(TiffDirectory.PLANAR, 1) == 2 && samples > 1;
        long across = ceil(width, chunkWidth);
        long down = ceil(height, chunkHeight);
        long expected = across * down * (separate ? samples : 1);
        int offsetTag = tiled ? TiffDirectory.TILE_OFFSETS : TiffDirectory.STRIP_OFFSETS;
        int countTag = tiled ? TiffDirectory.TILE_COUNTS : TiffDirectory.STRIP_COUNTS;
        if (d.count(offsetTag) < expected || d.count(countTag) < expected) {
            throw file.refuse("The file lists " + Math.min(d.count(offsetTag), d.count(countTag)) + " chunks where " + expected
                    + " are needed", "Make the file again");
        }
        TiffImage image = new TiffImage(width, height, samples, kind, compression, predictor, separate, tiled, chunkWidth,
                chunkHeight, d.longs(offsetTag), d.longs(countTag));
        for (int i = 0; i < expected; i++) {
            if (image.offsets[i] < 0 || image.counts[i] < 0 || image.offsets[i] > file.size() - image.counts[i]) {
                throw file.truncated();
            }
        }
        if (compression == 1 && !tiled) {
            image = image.inPieces(file);
        }
        image.checkChunk(file);
        return image;
    }

    private static SampleKind kind(TiffFile file, TiffDirectory d) throws IOException {
        long[] bits = d.longs(TiffDirectory.BITS);
        long[] formats = d.longs(TiffDirectory.SAMPLE_FORMAT);
        int oneBits = bits.length == 0 ? 1 : (int) Math.min(bits[0], 1024);
        int oneFormat = formats.length == 0 ? 1 : (int) Math.min(formats[0], 1024);
        boolean mixed = Arrays.stream(bits).anyMatch(b -> b != bits[0]) || Arrays.stream(formats).anyMatch(f -> f != formats[0]);
        return SampleKind.of(oneBits, oneFormat).filter(k -> !mixed).orElseThrow(() -> file.refuse("Values of " + oneBits
                + " bits (sample format " + oneFormat + (mixed ? ", differing between bands" : "") + ") are not supported; 8, 16 and"
                + " 32 bit integers and 32 and 64 bit reals are", "Make the file anew with gdal_translate -ot Float32"));
    }

    private static void checkPredictor(TiffFile file, int predictor, SampleKind kind) {
        boolean known = predictor == 1 || predictor == 2 && kind.bytes() > 0 || predictor == 3 && kind.real();
        if (!known) {
            throw file.refuse("Predictor " + predictor + " with " + kind.word() + " values is not supported; 1, 2 and, for reals, 3 are",
                    "Make the file anew with gdal_translate");
        }
    }

    private static int rowsPerStrip(TiffDirectory d, int height) throws IOException {
        long[] rows = d.longs(TiffDirectory.ROWS_PER_STRIP);
        return rows.length == 0 || rows[0] > height || rows[0] < 0 ? height : (int) rows[0];
    }

    private static long ceil(long a, long b) {
        return (a + b - 1) / b;
    }

    int across() {
        return (int) ceil(width, chunkWidth);
    }

    int down() {
        return (int) ceil(height, chunkHeight);
    }

    /** Bands that lie together in one chunk. */
    int samplesPerChunk() {
        return separate ? 1 : samples;
    }

    /** Bytes of one row of a chunk. */
    long rowBytes() {
        return ceil((long) chunkWidth * samplesPerChunk() * kind.bits(), 8);
    }

    /** Rows that a chunk holds: the last strip is cut, tiles never are. */
    int rowsIn(int chunkRow) {
        return tiled ? chunkHeight : Math.min(chunkHeight, height - chunkRow * chunkHeight);
    }

    int chunkIndex(int band, int chunkRow, int chunkColumn) {
        return ((separate ? band : 0) * down() + chunkRow) * across() + chunkColumn;
    }

    private void checkChunk(TiffFile file) {
        if (rowBytes() > LARGEST_CHUNK / chunkHeight) {
            throw Problem.limit("One chunk of the file unpacks to " + rowBytes() * chunkHeight / 1000000 + " MB; at most "
                    + LARGEST_CHUNK / 1000000 + " MB are read at once", file.path().toString(),
                    "Make the file anew with gdal_translate -co TILED=YES").asException();
        }
    }

    /** Large strips without compression can be read a few rows at a time. */
    private TiffImage inPieces(TiffFile file) {
        long row = rowBytes();
        if (row * chunkHeight <= PIECE || row > LARGEST_CHUNK) {
            return this;
        }
        int rows = (int) Math.max(1, PIECE / row);
        if (chunkHeight < height && chunkHeight % rows != 0) {
            while (chunkHeight % rows != 0) {
                rows--;
            }
        }
        int planes = separate ? samples : 1;
        int pieces = (int) ceil(height, rows);
        long[] at = new long[planes * pieces];
        long[] length = new long[at.length];
        for (int plane = 0; plane < planes; plane++) {
            for (int piece = 0; piece < pieces; piece++) {
                int first = piece * rows;
                int strip = plane * down() + first / chunkHeight;
                long skipped = (long) (first % chunkHeight) * row;
                long wanted = Math.min(rows, height - first) * row;
                if (offsets[strip] != 0 && skipped + wanted > counts[strip]) {
                    throw file.truncated();
                }
                at[plane * pieces + piece] = offsets[strip] == 0 ? 0 : offsets[strip] + skipped;
                length[plane * pieces + piece] = offsets[strip] == 0 ? 0 : wanted;
            }
        }
        return new TiffImage(width, height, samples, kind, compression, predictor, separate, tiled, chunkWidth, rows, at, length);
    }
}
