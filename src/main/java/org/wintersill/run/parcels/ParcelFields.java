package org.wintersill.run.parcels;

import java.util.List;
import java.util.Locale;
import java.util.stream.Collectors;
import org.wintersill.parcel.ClassTotals;
import org.wintersill.parcel.LayerTotals;

/** What the tables show, and in which words: one row a parcel, one a parcel and cultivar, one a parcel, cultivar and winter. */
final class ParcelFields {
    /** A row of the second table. */
    record CultivarRow(ParcelResult parcel, int number, FinishedRun.CultivarEntry entry) {
        CultivarResult result() {
            return parcel.cultivars().get(number);
        }
    }

    /** A row of the third table. */
    record WinterRow(CultivarRow cultivar, int winter) {
    }

    private final FinishedRun run;
    private final ParcelRun job;

    ParcelFields(FinishedRun run, ParcelRun job) {
        this.run = run;
        this.job = job;
    }

    List<TableField<ParcelResult>> parcels() {
        TableField.Fields<ParcelResult> fields = new TableField.Fields<ParcelResult>()
                .text("parcel_id", "Parcel", "what identifies the parcel in its file", row -> row.feature().id())
                .text("parcel_name", "Name", "name of the parcel in its file", row -> row.feature().name())
                .count("source_row", "Row", "number of the row in the file of parcels", row -> row.feature().number())
                .number("area_ha", "Area", "area of the parcel, on the ellipsoid for grids in degrees, else in the plane of the grid", "ha",
                        ParcelResult::areaHa)
                .share("covered_share", "Covered share", "share of the parcel's area on cells with values", ParcelResult::coveredShare)
                .count("cells", "Cells", "number of cells that the parcel meets", row -> row.extent().cells())
                .text("best_cultivars", "Best cultivars", "cultivars that no other one has clearly less damage than, the least damage first",
                        row -> String.join(", ", row.best()))
                .count("meet_target", "Cultivars that meet the target", "number of cultivars whose frequency of killing winters is at most "
                        + run.target(), row -> valued(row) ? (Object) row.cultivars().stream().filter(CultivarResult::meetsTarget).count() : null)
                .share("least_killing_probability", "Least killing probability", "lowest frequency of killing winters of any cultivar",
                        row -> row.cultivars().stream().mapToDouble(CultivarResult::probability).filter(Double::isFinite).min().orElse(Double.NaN))
                .share("least_damage", "Least damage", "lowest mean damage over winters of any cultivar",
                        row -> row.cultivars().stream().mapToDouble(CultivarResult::expectedDamage).filter(Double::isFinite).min().orElse(Double.NaN))
                .share("cold_ground_share", "Cold ground", "share of the area with values in ground where cold air gathers; empty where the run does "
                        + "not know", ParcelResult::coldGround);
        for (int i = 0; i < job.shared().size(); i++) {
            int at = i;
            LayerInfo layer = job.shared().get(i);
            if (layer.hasClasses()) {
                classes(fields, layer, row -> row.sharedClasses()[at], ParcelResult::number);
            } else {
                amounts(fields, layer, row -> row.shared()[at], ParcelResult::number);
            }
        }
        return fields.text("warnings", "Warnings", "what a reader must know before believing the numbers",
                row -> String.join("; ", row.warnings())).list();
    }

    private static boolean valued(ParcelResult row) {
        return row.cultivars().stream().anyMatch(cultivar -> cultivar.winters() > 0);
    }

    List<TableField<CultivarRow>> cultivars() {
        String share = run.killing() + " %";
        String bounds = String.format(Locale.ROOT, "%s, %.0f %% two-sided", run.bounds().key(), 100 * run.interval());
        TableField.Fields<CultivarRow> fields = new TableField.Fields<CultivarRow>()
                .text("parcel_id", "Parcel", "what identifies the parcel in its file", row -> row.parcel().feature().id())
                .text("parcel_name", "Name", "name of the parcel in its file", row -> row.parcel().feature().name())
                .count("source_row", "Row", "number of the row in the file of parcels", row -> row.parcel().feature().number())
                .text("cultivar", "Cultivar", "id of the cultivar", row -> row.entry().id())
                .text("cultivar_name", "Cultivar name", "readable name of the cultivar", row -> row.entry().name())
                .text("species", "Species", "species of the cultivar", row -> row.entry().species())
                .text("curve_status", "Status", "how well founded the hardiness curve is", row -> row.entry().status())
                .count("rank", "Rank", "1 plus the number of cultivars with less mean damage by more than the uncertainty of the difference (Student's "
                        + "interval for pairs of winters)", row -> row.result().rank() == 0 ? null : (Object) row.result().rank())
                .text("tied_with", "Tied with", "cultivars whose mean damage cannot be told from this one's",
                        row -> String.join(", ", row.result().tiedWith()))
                .text("meets_target", "Meets the target", "yes where the frequency of killing winters is at most " + run.target(),
                        row -> row.result().winters() == 0 ? null : row.result().meetsTarget() ? "yes" : "no")
                .count("winters", "Winters", "winters that count on at least half of the parcel's area with values", row -> row.result().winters())
                .count("killing_winters", "Killing winters", "winters that killed at least " + share + " of the parcel's buds",
                        row -> row.result().killing())
                .share("killing_probability", "Killing probability", "frequency of winters that kill at least " + share + " of the parcel's buds",
                        row -> row.result().probability())
                .share("killing_prob_lower", "Killing probability, lower", "lower bound of the frequency; " + bounds, row -> row.result().lower())
                .share("killing_prob_upper", "Killing probability, upper", "upper bound of the frequency; " + bounds, row -> row.result().upper())
                .share("mean_damage", "Mean damage", "mean over winters of the share of the parcel's buds killed, without the uncertainty of the curve",
                        row -> row.result().expectedDamage())
                .text("worst_winters", "Worst winters", "the worst winters with the date of the worst night, margin and damage of the parcel",
                        row -> worst(row.result()));
        List<LayerInfo> layers = job.layers(0);
        for (int i = 0; i < layers.size(); i++) {
            int at = i;
            if (layers.get(i).hasClasses()) {
                classes(fields, layers.get(i), row -> row.result().classes()[at], row -> row.result().number());
            } else {
                amounts(fields, layers.get(i), row -> row.result().layers()[at], row -> row.result().number());
            }
        }
        return fields.list();
    }

    private String worst(CultivarResult result) {
        return result.worst().stream().map(winter -> run.winters().get(winter) + (result.night()[winter].isEmpty() ? "" : " (" + result.night()[winter] + ")")
                + String.format(Locale.ROOT, ": margin %.2f K, damage %.1f %%", result.margin()[winter], 100 * result.damage()[winter]))
                .collect(Collectors.joining("; "));
    }

    List<TableField<WinterRow>> winters() {
        return new TableField.Fields<WinterRow>()
                .text("parcel_id", "Parcel", "what identifies the parcel in its file", row -> row.cultivar().parcel().feature().id())
                .count("source_row", "Row", "number of the row in the file of parcels", row -> row.cultivar().parcel().feature().number())
                .text("cultivar", "Cultivar", "id of the cultivar", row -> row.cultivar().entry().id())
                .text("winter", "Winter", "label of the winter", row -> run.winters().get(row.winter()))
                .number("margin", "Margin", "mean over the parcel of the winter's lowest Tmin - LT50", "K", row -> row.cultivar().result().margin()[row.winter()])
                .share("damage", "Damage", "share of the parcel's buds killed", row -> row.cultivar().result().damage()[row.winter()])
                .text("worst_night", "Worst night", "date, in the calendar of the record, of the parcel's lowest margin",
                        row -> emptyToNull(row.cultivar().result().night()[row.winter()])).list();
    }

    private static String emptyToNull(String text) {
        return text.isEmpty() ? null : text;
    }

    private static <R> void amounts(TableField.Fields<R> fields, LayerInfo layer, java.util.function.Function<R, LayerTotals> totals,
                                    java.util.function.ToIntFunction<R> number) {
        String about = layer.meaning().isEmpty() ? layer.title() : layer.meaning();
        if (layer.hasMean()) {
            fields.number(layer.id(), layer.title(), "mean over the parcel: " + about, layer.unit(), row -> totals.apply(row).mean(number.applyAsInt(row)));
        }
        fields.number(layer.id() + "-min", layer.title() + ", lowest", "lowest cell of the parcel: " + about, layer.unit(),
                row -> totals.apply(row).lowest(number.applyAsInt(row)));
        fields.number(layer.id() + "-max", layer.title() + ", highest", "highest cell of the parcel: " + about, layer.unit(),
                row -> totals.apply(row).highest(number.applyAsInt(row)));
    }

    private static <R> void classes(TableField.Fields<R> fields, LayerInfo layer, java.util.function.Function<R, ClassTotals> totals,
                                    java.util.function.ToIntFunction<R> number) {
        for (int code = 0; code < layer.classes().size(); code++) {
            int at = code;
            String name = layer.classes().get(code);
            if (!name.isEmpty()) {
                fields.share("share-" + columnPart(name), layer.title() + ", share " + name, "share of the area with a class that is " + name,
                        row -> totals.apply(row).share(number.applyAsInt(row), at));
                fields.number("area-" + columnPart(name) + "-ha", layer.title() + ", area " + name, "area of the parcel that is " + name, "ha",
                        row -> totals.apply(row).area(number.applyAsInt(row), at) * 100);
            }
        }
    }

    /** Class names are ours; whatever else stands in a file becomes letters that a column may have. */
    private static String columnPart(String name) {
        return name.toLowerCase(Locale.ROOT).replaceAll("[^a-z0-9]+", "-");
    }
}
