package org.wintersill.run.parcels;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Locale;
import java.util.Set;
import java.util.TreeSet;
import java.util.function.Function;
import org.wintersill.config.ParcelsConfig;
import org.wintersill.grid.CoordinateOperation;
import org.wintersill.problem.Notices;
import org.wintersill.problem.Problem;

/** Which parcels get a page, and under which name: by row number, so that no two share one, and with the harmless letters of their id. */
final class SheetSelection {
    /** Pages that are written unless all are asked for. */
    private static final int MOST_UNASKED = 200;
    private static final int LONGEST_NAME = 40;

    private final ParcelsConfig config;
    private final Function<String, Path> place;
    private final Notices notices;
    private final Set<String> wanted;
    private int written;

    SheetSelection(ParcelsConfig config, Function<String, Path> place, Notices notices) {
        this.config = config;
        this.place = place;
        this.notices = notices;
        wanted = new TreeSet<>(config.sheetIds());
    }

    void add(ParcelResult parcel, ParcelRun job, FinishedRun run, CoordinateOperation toGrid) {
        boolean chosen = switch (config.sheets()) {
            case ALL -> true;
            case NONE -> false;
            case AUTO -> written < MOST_UNASKED;
            case SOME -> config.sheetIds().contains(parcel.feature().id());
        };
        if (!chosen) {
            if (config.sheets() == ParcelsConfig.Sheets.AUTO) {
                notices.add("only the first " + MOST_UNASKED + " parcels get a page; ask for others with sheets");
            }
            return;
        }
        wanted.remove(parcel.feature().id());
        written++;
        Path file = place.apply("sheets/" + name(parcel.feature().number(), parcel.feature().id()) + ".html");
        try {
            Files.writeString(file, new ParcelSheet(run, job, parcel, toGrid).html(), StandardCharsets.UTF_8);
        } catch (IOException e) {
            throw Problem.output("the file cannot be written: " + e.getMessage(), file.toString(),
                    "Check the permissions of the folder and the free space of the disk").asException(e);
        }
    }

    static String name(long row, String id) {
        String plain = id.toLowerCase(Locale.ROOT).replaceAll("[^a-z0-9]+", "-").replaceAll("^-+|-+$", "");
        String cut = plain.length() <= LONGEST_NAME ? plain : plain.substring(0, LONGEST_NAME);
        return String.format(Locale.ROOT, "parcel-%05d", row) + (cut.isEmpty() ? "" : "-" + cut);
    }

    /** @throws org.wintersill.problem.ProblemException when a page was asked for a parcel that is not in the file */
    void finish() {
        if (!wanted.isEmpty()) {
            throw Problem.usage("the file has no parcel " + String.join(", ", wanted) + ", and a page of it is asked for", "sheets",
                    "Give ids of the column that identifies the parcels, or all").asException();
        }
    }
}
