package org.wintersill.temperature;

import java.util.Arrays;
import java.util.List;
import java.util.stream.IntStream;
import org.wintersill.grid.Block;
import org.wintersill.grid.GridGeometry;
import org.wintersill.time.DayAxis;

/**
 * A record on a longer day axis: the days that it lacks are missing in every cell. Two records of different days are so read
 * position by position. Immutable and thread-safe as the record is.
 */
public final class AlignedTemperatureSource implements DailyTemperatureSource {
    private final DailyTemperatureSource source;
    private final DayAxis days;
    /** {@code [position]}: position in the record, or -1. */
    private final int[] position;

    private AlignedTemperatureSource(DailyTemperatureSource source, DayAxis days) {
        this.source = source;
        this.days = days;
        position = new int[days.size()];
        for (int i = 0; i < position.length; i++) {
            position[i] = Math.max(-1, source.days().indexOf(days.day(i)));
        }
    }

    /**
     * The record on an axis.
     *
     * @param days holds every day of the record, in the same calendar
     * @return the record itself where nothing is added
     */
    public static DailyTemperatureSource on(DayAxis days, DailyTemperatureSource source) {
        return days.size() == source.days().size() ? source : new AlignedTemperatureSource(source, days);
    }

    /** The record on the days of an axis: days that it lacks are missing, days that the axis lacks are left out. */
    public static DailyTemperatureSource matching(DayAxis days, DailyTemperatureSource source) {
        boolean same = days.size() == source.days().size()
                && IntStream.range(0, days.size()).allMatch(i -> days.day(i) == source.days().day(i));
        return same ? source : new AlignedTemperatureSource(source, days);
    }

    /** The days that either of two records has. */
    public static DayAxis union(DayAxis one, DayAxis other) {
        long[] all = new long[one.size() + other.size()];
        for (int i = 0; i < all.length; i++) {
            all[i] = i < one.size() ? one.day(i) : other.day(i - one.size());
        }
        return new DayAxis(one.calendar(), Arrays.stream(all).sorted().distinct().toArray());
    }

    @Override
    public GridGeometry grid() {
        return source.grid();
    }

    @Override
    public DayAxis days() {
        return days;
    }

    @Override
    public ForcingVariable variable() {
        return source.variable();
    }

    @Override
    public StorageLayout layout() {
        return source.layout();
    }

    /** Days that the record lacks count to the chunk of the last day before them. */
    @Override
    public int chunkStart(int at) {
        int known = at;
        while (known >= 0 && position[known] < 0) {
            known--;
        }
        if (known < 0) {
            return at;
        }
        int start = days.indexOf(source.days().day(source.chunkStart(position[known])));
        return Math.max(0, start);
    }

    @Override
    public List<SourceFile> files() {
        return source.files();
    }

    @Override
    public DailyTemperatureReader open() {
        return new Reader(source.open());
    }

    /** Reads runs of days that follow each other in the record. */
    private final class Reader implements DailyTemperatureReader {
        private final DailyTemperatureReader reader;

        Reader(DailyTemperatureReader reader) {
            this.reader = reader;
        }

        @Override
        public void read(int firstDay, int dayCount, Block block, float[] out, int offset, int dayStride) {
            int done = 0;
            while (done < dayCount) {
                int here = position[firstDay + done];
                int at = offset + done * dayStride;
                int run = 1;
                if (here < 0) {
                    Arrays.fill(out, at, at + block.cells(), Float.NaN);
                } else {
                    while (done + run < dayCount && position[firstDay + done + run] == here + run) {
                        run++;
                    }
                    reader.read(here, run, block, out, at, dayStride);
                }
                done += run;
            }
        }

        @Override
        public long valuesSetAside() {
            return reader.valuesSetAside();
        }

        @Override
        public void close() {
            reader.close();
        }
    }
}
