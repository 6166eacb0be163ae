package org.wintersill.run.parcels;

import java.math.BigDecimal;
import java.math.RoundingMode;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.function.Function;
import java.util.stream.Stream;
import org.wintersill.io.json.CsvFile;
import org.wintersill.io.json.JsonListFile;
import org.wintersill.io.json.JsonText;
import org.wintersill.parcel.LayerTotals;
import org.wintersill.run.parcels.ParcelFields.CultivarRow;
import org.wintersill.run.parcels.ParcelFields.WinterRow;

/**
 * The tables as text: {@code parcels.csv}, {@code parcel-cultivars.csv}, {@code parcel-winters.csv}, {@code parcel-classes.csv} and
 * {@code parcels.json}. Written row by row.
 */
final class ParcelFiles implements AutoCloseable {
    private final FinishedRun run;
    private final ParcelRun job;
    private final List<TableField<ParcelResult>> parcelFields;
    private final List<TableField<CultivarRow>> cultivarFields;
    private final List<TableField<WinterRow>> winterFields;
    private final String caution;
    private final List<AutoCloseable> open = new ArrayList<>();
    private final Set<CsvFile> cautioned = new HashSet<>();
    private final CsvFile parcels;
    private final CsvFile cultivars;
    private final CsvFile winters;
    private final CsvFile classes;
    private final JsonListFile json;

    /** @param place where to write a file of a name */
    ParcelFiles(FinishedRun run, ParcelRun job, ParcelFields fields, Function<String, Path> place) {
        this.run = run;
        this.job = job;
        parcelFields = fields.parcels();
        cultivarFields = fields.cultivars();
        winterFields = fields.winters();
        caution = run.caution(run.cultivars());
        parcels = csv(place.apply("parcels.csv"), names(parcelFields));
        cultivars = csv(place.apply("parcel-cultivars.csv"), names(cultivarFields));
        winters = csv(place.apply("parcel-winters.csv"), names(winterFields));
        classes = csv(place.apply("parcel-classes.csv"), Stream.of("parcel_id", "parcel_name", "source_row", "cultivar", "layer", "class", "area_ha",
                "share"));
        json = new JsonListFile(place.apply("parcels.json"), head(), "parcels");
        open.add(json);
    }

    private CsvFile csv(Path file, Stream<String> names) {
        CsvFile csv = new CsvFile(file, Stream.concat(names, Stream.of("caution")).toArray(String[]::new));
        open.add(csv);
        return csv;
    }

    private static <R> Stream<String> names(List<TableField<R>> fields) {
        return fields.stream().map(field -> field.column().name());
    }

    private Map<String, Object> head() {
        Map<String, Object> head = new LinkedHashMap<>();
        head.put("version", 1);
        head.put("title", run.title());
        head.put("caution", caution);
        head.put("winters", run.winters());
        head.put("killing-percent", run.killing());
        head.put("bounds", run.bounds().key());
        head.put("interval", run.interval());
        head.put("target", run.target());
        return head;
    }

    void add(ParcelResult parcel) {
        row(parcels, TableField.values(parcelFields, parcel));
        List<Object> entries = new ArrayList<>();
        for (int c = 0; c < parcel.cultivars().size(); c++) {
            CultivarRow row = new CultivarRow(parcel, c, run.cultivars().get(c));
            row(cultivars, TableField.values(cultivarFields, row));
            for (int winter = 0; winter < run.winters().size(); winter++) {
                if (!Double.isNaN(row.result().damage()[winter])) {
                    row(winters, TableField.values(winterFields, new WinterRow(row, winter)));
                }
            }
            addClasses(parcel, c);
            entries.add(entry(parcel, c));
        }
        Map<String, Object> entry = new LinkedHashMap<>();
        entry.put("parcel", parcel.feature().id());
        entry.put("name", parcel.feature().name());
        entry.put("row", parcel.feature().number());
        entry.put("area-ha", number(parcel.areaHa(), 6));
        entry.put("covered-share", number(parcel.coveredShare(), 6));
        entry.put("cells", parcel.extent().cells());
        entry.put("cold-ground-share", number(parcel.coldGround(), 6));
        entry.put("best", parcel.best());
        entry.put("warnings", parcel.warnings());
        entry.put("layers", layers(job.shared(), parcel.shared(), parcel.number()));
        entry.put("cultivars", entries);
        json.add(entry);
    }

    /** Short tables say the caution in every row, so that no part of one is without; the long ones only in their first. */
    private void row(CsvFile file, Object[] values) {
        Object[] row = Arrays.copyOf(values, values.length + 1);
        boolean everyRow = file == parcels || file == cultivars;
        row[values.length] = everyRow || cautioned.add(file) ? caution : null;
        file.row(row);
    }

    private void addClasses(ParcelResult parcel, int number) {
        List<LayerInfo> layers = job.layers(number);
        CultivarResult result = parcel.cultivars().get(number);
        for (int layer = 0; layer < layers.size(); layer++) {
            for (int code = 0; code < layers.get(layer).classes().size(); code++) {
                String name = layers.get(layer).classes().get(code);
                if (!name.isEmpty() && !Double.isNaN(result.classes()[layer].share(result.number(), code))) {
                    row(classes, new Object[] {parcel.feature().id(), parcel.feature().name(), parcel.feature().number(),
                        run.cultivars().get(number).id(), layers.get(layer).id(), name,
                        number(result.classes()[layer].area(result.number(), code) * 100, 6),
                        number(result.classes()[layer].share(result.number(), code), 6)});
                }
            }
        }
    }

    private Map<String, Object> entry(ParcelResult parcel, int number) {
        CultivarResult result = parcel.cultivars().get(number);
        Map<String, Object> entry = new LinkedHashMap<>();
        entry.put("id", run.cultivars().get(number).id());
        entry.put("curve-status", run.cultivars().get(number).status());
        entry.put("rank", result.rank() == 0 ? null : result.rank());
        entry.put("tied-with", result.tiedWith());
        entry.put("meets-target", result.winters() == 0 ? null : result.meetsTarget());
        entry.put("winters", result.winters());
        entry.put("killing-winters", result.killing());
        entry.put("killing-probability", number(result.probability(), 6));
        entry.put("killing-probability-lower", number(result.lower(), 6));
        entry.put("killing-probability-upper", number(result.upper(), 6));
        entry.put("mean-damage", number(result.expectedDamage(), 6));
        entry.put("worst-winters", result.worst().stream().map(run.winters()::get).toList());
        entry.put("margin", numbers(result.margin(), 4));
        entry.put("damage", numbers(result.damage(), 6));
        entry.put("worst-night", Arrays.stream(result.night()).map(night -> night.isEmpty() ? null : night).toList());
        Map<String, Object> shares = new LinkedHashMap<>();
        List<LayerInfo> layers = job.layers(number);
        for (int layer = 0; layer < layers.size(); layer++) {
            for (int code = 0; code < layers.get(layer).classes().size(); code++) {
                if (!layers.get(layer).classes().get(code).isEmpty()) {
                    shares.put(layers.get(layer).classes().get(code), number(result.classes()[layer].share(result.number(), code), 6));
                }
            }
        }
        entry.put("class-shares", shares);
        entry.put("layers", layers(layers, result.layers(), result.number()));
        return entry;
    }

    private static Map<String, Object> layers(List<LayerInfo> layers, LayerTotals[] totals, int parcel) {
        Map<String, Object> values = new LinkedHashMap<>();
        for (int i = 0; i < layers.size(); i++) {
            if (totals[i] != null) {
                Map<String, Object> value = new LinkedHashMap<>();
                if (layers.get(i).hasMean()) {
                    value.put("mean", number(totals[i].mean(parcel), 6));
                }
                value.put("lowest", number(totals[i].lowest(parcel), 6));
                value.put("highest", number(totals[i].highest(parcel), 6));
                values.put(layers.get(i).id(), value);
            }
        }
        return values;
    }

    private static Double number(double value, int decimals) {
        Double there = JsonText.number(value);
        return there == null ? null : Double.valueOf(BigDecimal.valueOf(there).setScale(decimals, RoundingMode.HALF_EVEN).doubleValue());
    }

    private static List<Double> numbers(double[] values, int decimals) {
        return Arrays.stream(values).mapToObj(value -> number(value, decimals)).toList();
    }

    @Override
    public void close() {
        RuntimeException first = null;
        for (AutoCloseable file : open) {
            try {
                file.close();
            } catch (RuntimeException e) {
                first = first == null ? e : first;
            } catch (Exception e) {
                throw new IllegalStateException(e);
            }
        }
        if (first != null) {
            throw first;
        }
    }
}
