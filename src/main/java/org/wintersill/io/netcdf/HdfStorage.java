package org.wintersill.io.netcdf;

import io.jhdf.HdfFile;
import io.jhdf.ObjectHeader;
import io.jhdf.api.Dataset;
import io.jhdf.api.dataset.ContiguousDataset;
import io.jhdf.dataset.CompactDataset;
import io.jhdf.dataset.chunked.Chunk;
import io.jhdf.dataset.chunked.ChunkOffset;
import io.jhdf.dataset.chunked.ChunkedDatasetV3;
import io.jhdf.dataset.chunked.ChunkedDatasetV4;
import io.jhdf.object.message.FilterPipelineMessage;
import java.nio.ByteBuffer;
import java.nio.file.Path;
import java.util.Collection;
import java.util.List;
import java.util.Map;

/** Finds where an HDF5 dataset keeps its values. jHDF decodes the indexes; the chunks themselves are read by {@link RawReader}. */
final class HdfStorage {
    /** Most chunks that are indexed, present or not; 30 years of days in a thousand tiles are eleven million. */
    private static final long CHUNK_LIMIT = 20_000_000;
    private static final long UNDEFINED = -1;

    private final HdfFile file;
    private final Path path;
    private final long fileSize;

    HdfStorage(HdfFile file, Path path, long fileSize) {
        this.file = file;
        this.path = path;
        this.fileSize = fileSize;
    }

    Storage of(Dataset dataset, ObjectHeader header, int[] shape, RawType type) {
        if (dataset instanceof ContiguousDataset contiguous) {
            return contiguous(dataset, contiguous.getDataAddress(), shape, type);
        }
        if (dataset instanceof CompactDataset compact) {
            ByteBuffer buffer = compact.getDataBuffer();
            byte[] bytes = new byte[buffer.remaining()];
            buffer.get(bytes);
            return new Storage.Inline(bytes);
        }
        int[] filters = filters(header);
        for (int filter : filters) {
            if (filter != Storage.Chunked.DEFLATE && filter != Storage.Chunked.SHUFFLE && filter != Storage.Chunked.FLETCHER32) {
                return new Storage.Unreadable("it is compressed with " + filterName(filter)
                        + "; deflate, shuffle and Fletcher-32 are read");
            }
        }
        if (dataset instanceof ChunkedDatasetV3 v3) {
            Third indexed = new Third(dataset, header, file);
            return chunked(indexed.chunks(), v3.getChunkDimensions(), filters, shape);
        }
        if (dataset instanceof ChunkedDatasetV4 v4) {
            Fourth indexed = new Fourth(dataset, header, file);
            return chunked(indexed.chunks(), v4.getChunkDimensions(), filters, shape);
        }
        return new Storage.Unreadable("it is stored in a way that is not known here");
    }

    /** Opens jHDF's index of chunks, which it keeps to its subclasses. */
    private static final class Third extends ChunkedDatasetV3 {
        Third(Dataset dataset, ObjectHeader header, HdfFile file) {
            super(file.getHdfBackingStorage(), dataset.getAddress(), dataset.getName(), dataset.getParent(), header);
        }

        Map<ChunkOffset, Chunk> chunks() {
            return getChunkLookup();
        }
    }

    /** The same for the indexes of HDF5 1.10 and later. */
    private static final class Fourth extends ChunkedDatasetV4 {
        Fourth(Dataset dataset, ObjectHeader header, HdfFile file) {
            super(file.getHdfBackingStorage(), dataset.getAddress(), dataset.getName(), dataset.getParent(), header);
        }

        Map<ChunkOffset, Chunk> chunks() {
            return getChunkLookup();
        }
    }

    private Storage contiguous(Dataset dataset, long address, int[] shape, RawType type) {
        long size = type.bytes();
        for (int length : shape) {
            size = Math.multiplyExact(size, (long) length);
        }
        if (address == UNDEFINED) {
            // space that nobody wrote to: nothing but fill
            return shape.length == 0 ? new Storage.Unreadable("it was never written")
                    : new Storage.Chunked(ones(shape), new int[0], emptyIndex(shape));
        }
        long begin = address + file.getUserBlockSize();
        if (begin < 0 || begin + size > fileSize) {
            throw CdfProblems.truncated(path, begin + size, fileSize);
        }
        int outer = shape.length == 0 || shape[0] == 0 ? 1 : shape[0];
        return new Storage.Contiguous(begin, size / outer);
    }

    private static int[] ones(int[] shape) {
        int[] chunk = shape.clone();
        chunk[0] = 1;
        return chunk;
    }

    private static ChunkIndex emptyIndex(int[] shape) {
        int[] counts = new int[shape.length];
        java.util.Arrays.fill(counts, 1);
        counts[0] = shape[0];
        return new ChunkIndex(counts);
    }

    private static int[] filters(ObjectHeader header) {
        if (!header.hasMessageOfType(FilterPipelineMessage.class)) {
            return new int[0];
        }
        List<FilterPipelineMessage.FilterInfo> infos = header.getMessageOfType(FilterPipelineMessage.class).getFilters();
        return infos.stream().mapToInt(FilterPipelineMessage.FilterInfo::getId).toArray();
    }

    /** Names from the registry of HDF5 filters; the numbers are what a file holds. */
    static String filterName(int id) {
        String name = switch (id) {
            case 4 -> "szip";
            case 5 -> "n-bit packing";
            case 6 -> "scale-offset packing";
            case 307 -> "bzip2";
            case 32000 -> "LZF";
            case 32001 -> "Blosc";
            case 32004 -> "LZ4";
            case 32008 -> "bitshuffle";
            case 32013 -> "ZFP";
            case 32015 -> "Zstandard";
            case 32026 -> "Blosc 2";
            default -> "a filter";
        };
        return name + " (HDF5 filter " + id + ")";
    }

    private Storage chunked(Map<ChunkOffset, Chunk> found, int[] chunk, int[] filters, int[] shape) {
        int[] counts = new int[shape.length];
        long total = 1;
        for (int i = 0; i < shape.length; i++) {
            if (chunk.length != shape.length || chunk[i] < 1) {
                return new Storage.Unreadable("its chunks have no sensible shape");
            }
            counts[i] = (shape[i] + chunk[i] - 1) / chunk[i];
            total = Math.multiplyExact(total, (long) counts[i]);
        }
        if (total > CHUNK_LIMIT) {
            return new Storage.Unreadable("it has " + total + " chunks; at most " + CHUNK_LIMIT + " are read");
        }
        ChunkIndex index = new ChunkIndex(counts);
        fill(index, found.values(), chunk, counts);
        return new Storage.Chunked(chunk, filters, index);
    }

    private void fill(ChunkIndex index, Collection<Chunk> found, int[] chunk, int[] counts) {
        for (Chunk entry : found) {
            long address = entry.getAddress();
            if (address == UNDEFINED) {
                continue;
            }
            long begin = address + file.getUserBlockSize();
            if (begin < 0 || entry.getSize() < 0 || begin + entry.getSize() > fileSize) {
                throw CdfProblems.truncated(path, begin + entry.getSize(), fileSize);
            }
            long[] offset = entry.getChunkOffset();
            int place = 0;
            for (int i = 0; i < counts.length; i++) {
                long along = offset[i] / chunk[i];
                if (along < 0 || along >= counts[i]) {
                    // left over from a dimension that was shortened
                    place = -1;
                    break;
                }
                place = place * counts[i] + (int) along;
            }
            if (place >= 0) {
                int skipped = 0;
                if (entry.getFilterMask() != null) {
                    for (int bit = entry.getFilterMask().nextSetBit(0); bit >= 0 && bit < 32;
                            bit = entry.getFilterMask().nextSetBit(bit + 1)) {
                        skipped |= 1 << bit;
                    }
                }
                index.put(place, begin, entry.getSize(), skipped);
            }
        }
    }
}
