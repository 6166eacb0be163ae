package org.wintersill.run.parcels;

import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.wintersill.climatology.FrequencyInterval;
import org.wintersill.hardiness.Status;
import org.wintersill.io.json.JsonValue;
import org.wintersill.problem.Problem;
import org.wintersill.problem.ProblemException;
import org.wintersill.run.Caution;
import org.wintersill.run.FinishedFolder;
import org.wintersill.run.OutputFolder;
import org.wintersill.time.CfCalendar;
import org.wintersill.time.CfDate;

/**
 * What the record of a run says that parcels need.
 *
 * @param folder where its layers lie
 * @param title of the run
 * @param cultivars in the order of the run
 * @param winters labels, in the order of time and of the bands
 * @param starts first day of each winter's window; empty for runs that did not record them
 * @param calendar of those days
 * @param killing percent of buds that makes a killing winter
 * @param bounds kind of interval of a frequency
 * @param interval its probability, 0..1
 * @param target frequency of killing winters that is accepted
 * @param layers names of the GeoTIFF files, relative to the folder, sorted
 */
record FinishedRun(Path folder, String title, List<CultivarEntry> cultivars, List<String> winters, List<CfDate> starts, CfCalendar calendar,
                   int killing, FrequencyInterval bounds, double interval, double target, List<String> layers) {
    private static final Pattern LAYER = Pattern.compile("[a-z0-9-]+/(winters/)?[a-z0-9-]+\\.tif");
    private static final Pattern DATE = Pattern.compile("(-?\\d{1,9})-(\\d\\d)-(\\d\\d)");

    /** @param dependable whether a plan may be built on the curve */
    record CultivarEntry(String id, String name, String species, String organ, String status, String source, boolean dependable) {
    }

    /**
     * The run of a folder.
     *
     * @throws org.wintersill.problem.ProblemException when its record lacks what is needed
     */
    static FinishedRun of(FinishedFolder folder) {
        JsonValue record = folder.record();
        JsonValue statistics = folder.configuration().get("statistics");
        List<CultivarEntry> cultivars = folder.cultivars().stream().map(id -> cultivar(id, folder.cultivar(id))).toList();
        List<CfDate> starts = record.get("winter-starts").items().stream().map(start -> date(folder, start)).toList();
        List<String> names = record.get("outputs").items().stream().map(output -> output.get("path").text().orElse(""))
                .filter(name -> LAYER.matcher(name).matches()).sorted().toList();
        return new FinishedRun(folder.path(), record.get("title").text().orElse(""), cultivars, folder.winters(), starts,
                record.get("calendar").text().flatMap(CfCalendar::named).orElse(CfCalendar.STANDARD),
                (int) number(folder, folder.configuration().get("damage").get("killing")),
                statistics.get("bounds").text().flatMap(FrequencyInterval::named).orElse(FrequencyInterval.JEFFREYS),
                number(folder, statistics.get("interval")), number(folder, statistics.get("target")), names);
    }

    private static CultivarEntry cultivar(String id, JsonValue entry) {
        String status = entry.get("status").text().orElse("");
        return new CultivarEntry(id, entry.get("name").text().orElse(id), entry.get("species").text().orElse(""),
                entry.get("organ").text().orElse(""), status, entry.get("source").text().orElse(""),
                Status.named(status).map(Status::dependable).orElse(false));
    }

    private static double number(FinishedFolder folder, JsonValue value) {
        return value.number().orElseThrow(() -> damaged(folder, "a number of its configuration is missing"));
    }

    private static CfDate date(FinishedFolder folder, JsonValue value) {
        Matcher parts = DATE.matcher(value.text().orElse(""));
        if (!parts.matches()) {
            throw damaged(folder, "a start of a winter is no date");
        }
        return new CfDate(Integer.parseInt(parts.group(1)), Integer.parseInt(parts.group(2)), Integer.parseInt(parts.group(3)));
    }

    private static ProblemException damaged(FinishedFolder folder, String what) {
        return Problem.input("the record is not one of this version: " + what, folder.path().resolve(OutputFolder.RECORD).toString(),
                "Make the outputs again with map").asException();
    }

    /** Date of a night; empty where the record does not tell when its winter began. */
    String date(int winter, double night) {
        if (winter >= starts.size() || Double.isNaN(night)) {
            return "";
        }
        return calendar.date(calendar.dayNumber(starts.get(winter)) + Math.round(night)).toString();
    }

    /** A time that depends on the run alone: the start of its last winter, a day that every calendar has. */
    String lastChange() {
        if (starts.isEmpty()) {
            return "1970-01-01T00:00:00.000Z";
        }
        CfDate last = starts.get(starts.size() - 1);
        return new CfDate(last.year(), last.month(), Math.min(28, last.day())) + "T00:00:00.000Z";
    }

    /** Names of the summary layers of a cultivar, or of none, in the order of their names. */
    List<String> summaries(String folderName) {
        return layers.stream().filter(name -> name.startsWith(folderName + "/") && !name.contains("/winters/")).toList();
    }

    Optional<String> winterLayer(String cultivar, String id) {
        return Optional.of(cultivar + "/winters/" + id + ".tif").filter(layers::contains);
    }

    /** The caution of pages and tables about some of the cultivars. */
    String caution(List<CultivarEntry> shown) {
        List<String> unverified = shown.stream().filter(entry -> !entry.dependable()).map(entry -> entry.id() + " (" + entry.status() + ")").toList();
        return Caution.SHORT + (unverified.isEmpty() ? "" : " Not verified: " + String.join(", ", unverified) + ".");
    }
}
