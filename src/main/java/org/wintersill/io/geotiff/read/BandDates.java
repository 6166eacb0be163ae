package org.wintersill.io.geotiff.read;

import java.util.Arrays;
import java.util.Comparator;
import java.util.Optional;
import java.util.stream.IntStream;
import org.wintersill.problem.Notices;
import org.wintersill.temperature.TemperatureRequest;
import org.wintersill.time.CfCalendar;
import org.wintersill.time.CfDate;
import org.wintersill.time.DayAxis;

/**
 * The day of each band: from band descriptions, from the first day in the run file, or from the file name.
 *
 * @param axis days in ascending order
 * @param bands band of each position of the axis, from 0
 * @param source where the dates came from, for the record
 */
record BandDates(DayAxis axis, int[] bands, String source) {

    private static final CfCalendar CALENDAR = CfCalendar.STANDARD;
    private static final String REMEDY = "Set first-day: to the date of the first band, or dates: to the form of the date in the file names";

    static BandDates of(TiffFile file, GdalMetadata metadata, int count, TemperatureRequest request, Notices notices) {
        CfDate[] described = new CfDate[count];
        int known = 0;
        for (int band = 0; band < count; band++) {
            described[band] = metadata.item("description", band).flatMap(text -> FileNameDates.unambiguousDay(text, CALENDAR)).orElse(null);
            known += described[band] == null ? 0 : 1;
        }
        if (known > 0 && known < count) {
            int missing = IntStream.range(0, count).filter(i -> described[i] == null).findFirst().orElse(0);
            throw file.refuse("The description of band " + (missing + 1) + " holds no date, those of " + known + " other bands do",
                    "Describe every band by its date, such as 2003-01-15");
        }
        long[] own = known == 0 ? null : Arrays.stream(described).mapToLong(CALENDAR::dayNumber).toArray();
        long[] said = fromRequest(file, count, request);
        if (own != null && said != null && !Arrays.equals(own, said)) {
            int at = Arrays.mismatch(own, said);
            throw file.refuse("Band " + (at + 1) + " is described as " + CALENDAR.date(own[at]) + ", but by "
                    + (request.firstDay().isPresent() ? "first-day:" : "the file name") + " it is " + CALENDAR.date(said[at]),
                    "Take the wrong one out");
        }
        if (own != null) {
            return sorted(file, own, "band descriptions");
        }
        if (said != null) {
            return sorted(file, said, request.firstDay().isPresent() ? "first-day of the run file" : "file name by dates: " + request.dates().orElse(""));
        }
        String name = file.path().getFileName().toString();
        Optional<CfDate> guessed = count == 1 ? FileNameDates.unambiguousDay(name, CALENDAR) : Optional.empty();
        if (guessed.isEmpty()) {
            throw file.refuse("The file does not say which day" + (count == 1 ? " its band is" : "s its " + count + " bands are"), REMEDY);
        }
        notices.add("Dates of GeoTIFF files are taken from their names (such as " + name + " for " + guessed.get() + ")");
        return sorted(file, new long[] {CALENDAR.dayNumber(guessed.get())}, "file name, found by itself");
    }

    /** Day numbers that the run file gives; null if it gives none. */
    private static long[] fromRequest(TiffFile file, int count, TemperatureRequest request) {
        long[] byPattern = request.dates().map(pattern -> byPattern(file, count, pattern)).orElse(null);
        long[] byFirst = request.firstDay().map(first -> {
            if (!CALENDAR.isValid(first)) {
                throw file.refuse("first-day: " + first + " is no date of the standard calendar", "Give an existing date");
            }
            long start = CALENDAR.dayNumber(first);
            return IntStream.range(0, count).mapToLong(i -> start + i).toArray();
        }).orElse(null);
        if (byPattern != null && byFirst != null && !Arrays.equals(byPattern, byFirst)) {
            throw file.refuse("By dates: the first band is " + CALENDAR.date(byPattern[0]) + ", by first-day: it is "
                    + CALENDAR.date(byFirst[0]), "Take one of the two out");
        }
        return byFirst != null ? byFirst : byPattern;
    }

    private static long[] byPattern(TiffFile file, int count, String pattern) {
        FileNameDates.Named named = FileNameDates.byPattern(pattern, file.path().getFileName().toString(), file.path().toString(), CALENDAR);
        int expected = named.days(CALENDAR);
        if (count != expected) {
            String period = switch (named.span()) {
                case DAY -> "The file name gives one day, " + named.first() + ",";
                case MONTH -> "The file name gives the month " + named.first().toString().substring(0, 7) + " of " + expected + " days,";
                case YEAR -> "The file name gives the year " + named.first().year() + " of " + expected + " days,";
            };
            throw file.refuse(period + " but the file has " + count + " bands", "Give a file with one band a day, or describe the bands by their dates");
        }
        long start = CALENDAR.dayNumber(named.first());
        return IntStream.range(0, count).mapToLong(i -> start + i).toArray();
    }

    private static BandDates sorted(TiffFile file, long[] days, String source) {
        int[] order = IntStream.range(0, days.length).boxed().sorted(Comparator.comparingLong(i -> days[i])).mapToInt(i -> i).toArray();
        long[] ascending = Arrays.stream(order).mapToLong(i -> days[i]).toArray();
        for (int i = 1; i < ascending.length; i++) {
            if (ascending[i] == ascending[i - 1]) {
                throw file.refuse("The day " + CALENDAR.date(ascending[i]) + " comes twice, in band " + (order[i - 1] + 1) + " and band "
                        + (order[i] + 1), "Keep one of the two");
            }
        }
        return new BandDates(new DayAxis(CALENDAR, ascending), order, source);
    }
}
