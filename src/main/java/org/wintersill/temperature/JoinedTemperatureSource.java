package org.wintersill.temperature;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.IntStream;
import org.wintersill.grid.Block;
import org.wintersill.grid.GridGeometry;
import org.wintersill.problem.Notices;
import org.wintersill.problem.Problem;
import org.wintersill.problem.ProblemException;
import org.wintersill.problem.Problems;
import org.wintersill.time.DayAxis;

/**
 * Several files as one record, in any order; their days may interleave but not coincide.
 *
 * <p>All files must have the same grid, reference system, calendar and daily quantity. Readers open files when they are
 * first needed and keep only {@link #OPEN_FILES} of them open, so that thousands of files of one day each work.
 * Immutable and thread-safe.
 */
public final class JoinedTemperatureSource implements DailyTemperatureSource {
    /** Files that one reader keeps open. Assumed: a season touches two yearly or nine monthly files. */
    static final int OPEN_FILES = 8;
    private static final int SHOWN = 5;

    private final List<DailyTemperatureSource> parts;
    private final DayAxis days;
    /** {@code [position]}: part that has the day, and the position of the day in it. */
    private final int[] part;
    private final int[] position;
    private final StorageLayout layout;

    private JoinedTemperatureSource(List<DailyTemperatureSource> parts, DayAxis days, int[] part, int[] position) {
        this.parts = parts;
        this.days = days;
        this.part = part;
        this.position = position;
        this.layout = layout(parts);
    }

    /**
     * Joins files into one record.
     *
     * @param sources at least one, in any order
     * @param notices told when files had to be interleaved
     * @return the one source itself if there is only one
     * @throws ProblemException naming both files and what differs, or the days that two files have
     */
    public static DailyTemperatureSource join(List<DailyTemperatureSource> sources, Notices notices) {
        if (sources.isEmpty()) {
            throw Problem.input("There are no temperature files", "", "Give at least one").asException();
        }
        if (sources.size() == 1) {
            return sources.get(0);
        }
        List<DailyTemperatureSource> parts = new ArrayList<>(sources);
        parts.sort(Comparator.<DailyTemperatureSource>comparingLong(s -> s.days().day(0)).thenComparing(s -> path(s)));
        Problems problems = new Problems();
        DailyTemperatureSource first = sources.get(0);
        for (DailyTemperatureSource other : sources) {
            if (problems.all().size() < SHOWN) {
                problems.attempt(() -> refuseDifference(first, other));
            }
        }
        problems.throwIfAny();
        int total = parts.stream().mapToInt(s -> s.days().size()).sum();
        long[] keys = new long[total];
        int[] owner = new int[total];
        int[] place = new int[total];
        int next = 0;
        for (int i = 0; i < parts.size(); i++) {
            for (int d = 0; d < parts.get(i).days().size(); d++, next++) {
                keys[next] = parts.get(i).days().day(d);
                owner[next] = i;
                place[next] = d;
            }
        }
        int[] order = IntStream.range(0, total).boxed().sorted(Comparator.<Integer>comparingLong(i -> keys[i])
                .thenComparing(Comparator.naturalOrder())).mapToInt(Integer::intValue).toArray();
        refuseCoincidence(parts, keys, owner, order);
        DayAxis days = new DayAxis(first.days().calendar(), IntStream.of(order).mapToLong(i -> keys[i]).toArray());
        int[] part = IntStream.of(order).map(i -> owner[i]).toArray();
        int[] position = IntStream.of(order).map(i -> place[i]).toArray();
        for (int i = 1; i < total; i++) {
            if (part[i] < part[i - 1]) {
                notices.add("The days of several temperature files interleave; they were sorted");
                break;
            }
        }
        return new JoinedTemperatureSource(List.copyOf(parts), days, part, position);
    }

    private static String path(DailyTemperatureSource source) {
        return source.files().isEmpty() ? "" : source.files().get(0).path();
    }

    private static void refuseDifference(DailyTemperatureSource first, DailyTemperatureSource other) {
        if (first.variable() != other.variable()) {
            throw difference(first, other, "daily quantity", first.variable().word(), other.variable().word());
        }
        if (first.days().calendar() != other.days().calendar()) {
            throw difference(first, other, "calendar", first.days().calendar().cfName(), other.days().calendar().cfName());
        }
        GridGeometry a = first.grid();
        GridGeometry b = other.grid();
        if (!a.crs().sameAs(b.crs())) {
            throw difference(first, other, "reference system", a.crs().label(), b.crs().label());
        }
        if (a.columns() != b.columns() || a.rows() != b.rows()) {
            throw difference(first, other, "number of cells", a.columns() + " x " + a.rows(), b.columns() + " x " + b.rows());
        }
        if (!a.sameAs(b)) {
            throw difference(first, other, "place of the grid", a.describe(), b.describe());
        }
    }

    private static ProblemException difference(DailyTemperatureSource first, DailyTemperatureSource other, String what,
                                               String a, String b) {
        return Problem.input("Two temperature files do not belong together: the " + what + " of " + path(first) + " is " + a
                + ", that of " + path(other) + " is " + b, "", "Give files of one data set, or bring them to one grid and"
                + " calendar first").asException();
    }

    /** Refuses days that two files have, naming them as ranges and both files, for the first few pairs. */
    private static void refuseCoincidence(List<DailyTemperatureSource> parts, long[] keys, int[] owner, int[] order) {
        Map<String, List<long[]>> ranges = new LinkedHashMap<>();
        for (int i = 1; i < order.length; i++) {
            if (keys[order[i]] != keys[order[i - 1]]) {
                continue;
            }
            String pair = path(parts.get(owner[order[i - 1]])) + " and " + path(parts.get(owner[order[i]]));
            List<long[]> of = ranges.computeIfAbsent(pair, p -> new ArrayList<>());
            long day = keys[order[i]];
            if (!of.isEmpty() && day <= of.get(of.size() - 1)[1] + 1) {
                of.get(of.size() - 1)[1] = day;
            } else {
                of.add(new long[] {day, day});
            }
        }
        Problems problems = new Problems();
        ranges.entrySet().stream().limit(SHOWN).forEach(entry -> {
            List<String> texts = entry.getValue().stream().limit(SHOWN).map(r -> range(parts.get(0).days(), r)).toList();
            String more = entry.getValue().size() > SHOWN ? " and others" : "";
            problems.add(Problem.input("Two files have the same days: " + String.join(", ", texts) + more + " are in "
                    + entry.getKey(), "", "Give each day once"));
        });
        problems.throwIfAny();
    }

    private static String range(DayAxis days, long[] range) {
        String from = days.calendar().date(range[0]).toString();
        return range[0] == range[1] ? from : from + ".." + days.calendar().date(range[1]);
    }

    /**
     * The common layout where files are cut alike. Chunks of time begin anew in each file and may be shorter in one, so
     * only the longest is given; a reader splits by file. Files cut differently across the map have no common pieces:
     * whole maps of single days, which every layout serves in bounded memory.
     */
    private static StorageLayout layout(List<DailyTemperatureSource> parts) {
        StorageLayout common = parts.get(0).layout();
        GridGeometry grid = parts.get(0).grid();
        int days = 1;
        for (DailyTemperatureSource part : parts) {
            StorageLayout own = part.layout();
            days = Math.max(days, own.days());
            if (own.rows() != common.rows() || own.columns() != common.columns() || own.rowOffset() != common.rowOffset()) {
                return new StorageLayout(1, grid.rows(), grid.columns(), 0);
            }
        }
        return new StorageLayout(days, common.rows(), common.columns(), common.rowOffset());
    }

    @Override
    public GridGeometry grid() {
        return parts.get(0).grid();
    }

    @Override
    public DayAxis days() {
        return days;
    }

    @Override
    public ForcingVariable variable() {
        return parts.get(0).variable();
    }

    @Override
    public StorageLayout layout() {
        return layout;
    }

    @Override
    public int chunkStart(int at) {
        if (layout.days() == 1) {
            return at;
        }
        int start = parts.get(part[at]).chunkStart(position[at]);
        int first = at;
        while (first > 0 && part[first - 1] == part[at] && position[first - 1] >= start) {
            first--;
        }
        return first;
    }

    @Override
    public List<SourceFile> files() {
        return parts.stream().flatMap(p -> p.files().stream()).toList();
    }

    @Override
    public DailyTemperatureReader open() {
        return new Reader();
    }

    /** One thread's view: the most recently used files stay open. */
    private final class Reader implements DailyTemperatureReader {
        private final LinkedHashMap<Integer, DailyTemperatureReader> open = new LinkedHashMap<>(16, 0.75f, true);
        private long setAsideByClosed;

        @Override
        public void read(int firstDay, int dayCount, Block block, float[] out, int offset, int dayStride) {
            if (firstDay < 0 || dayCount < 0 || firstDay + dayCount > part.length) {
                throw new IllegalArgumentException("days " + firstDay + " + " + dayCount + " of " + part.length);
            }
            int done = 0;
            while (done < dayCount) {
                int here = firstDay + done;
                int run = 1;
                while (done + run < dayCount && part[here + run] == part[here]
                        && position[here + run] == position[here] + run) {
                    run++;
                }
                reader(part[here]).read(position[here], run, block, out, offset + done * dayStride, dayStride);
                done += run;
            }
        }

        private DailyTemperatureReader reader(int index) {
            DailyTemperatureReader found = open.get(index);
            if (found == null) {
                if (open.size() >= OPEN_FILES) {
                    Integer oldest = open.keySet().iterator().next();
                    retire(open.remove(oldest));
                }
                found = parts.get(index).open();
                open.put(index, found);
            }
            return found;
        }

        private void retire(DailyTemperatureReader reader) {
            setAsideByClosed += reader.valuesSetAside();
            reader.close();
        }

        @Override
        public long valuesSetAside() {
            return setAsideByClosed + open.values().stream().mapToLong(DailyTemperatureReader::valuesSetAside).sum();
        }

        @Override
        public void close() {
            open.values().forEach(this::retire);
            open.clear();
        }
    }
}
