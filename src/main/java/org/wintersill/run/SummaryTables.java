package org.wintersill.run;

import java.math.BigDecimal;
import java.math.RoundingMode;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.wintersill.hardiness.Cultivar;
import org.wintersill.io.json.CsvText;
import org.wintersill.io.json.JsonText;
import org.wintersill.layer.LayerStyle;
import org.wintersill.layer.LayerStyles;

/** {@code summary.csv} and {@code summary.json}: area by class and cultivar, height ranges, counts. */
final class SummaryTables {
    private SummaryTables() {
    }

    static String csv(RunPlan plan, List<ClassAreas> areas) {
        CsvText csv = new CsvText("cultivar", "cultivar_name", "species", "curve_status", "class", "cells", "area_km2", "share",
                "elevation_min_m", "elevation_mean_m", "elevation_max_m", "winters", "caution");
        for (int c = 0; c < areas.size(); c++) {
            Cultivar cultivar = plan.cultivars().get(c);
            ClassAreas area = areas.get(c);
            for (LayerStyle.Entry entry : LayerStyles.suitability().entries()) {
                int code = entry.code();
                csv.row(cultivar.id(), cultivar.name(), cultivar.species(), cultivar.status().word(), entry.name(),
                        area.cells()[code], decimals(area.areaKm2()[code], 4), decimals(area.share(code), 6), decimals(area.lowest()[code], 1),
                        decimals(area.mean()[code], 1), decimals(area.highest()[code], 1), plan.seasons().size(), Caution.SHORT);
            }
        }
        return csv.toString();
    }

    /** A number with so many decimals and no exponent; empty where there is none. */
    private static BigDecimal decimals(double value, int places) {
        return Double.isFinite(value) ? BigDecimal.valueOf(value).setScale(places, RoundingMode.HALF_EVEN) : null;
    }

    static String json(RunPlan plan, List<ClassAreas> areas) {
        List<Map<String, Object>> cultivars = new ArrayList<>();
        for (int c = 0; c < areas.size(); c++) {
            Cultivar cultivar = plan.cultivars().get(c);
            ClassAreas area = areas.get(c);
            List<Map<String, Object>> classes = new ArrayList<>();
            for (LayerStyle.Entry entry : LayerStyles.suitability().entries()) {
                int code = entry.code();
                Map<String, Object> row = new LinkedHashMap<>();
                row.put("class", entry.name());
                row.put("cells", area.cells()[code]);
                row.put("area-km2", area.areaKm2()[code]);
                row.put("share", JsonText.number(area.share(code)));
                row.put("elevation-min", JsonText.number(area.lowest()[code]));
                row.put("elevation-mean", JsonText.number(area.mean()[code]));
                row.put("elevation-max", JsonText.number(area.highest()[code]));
                classes.add(row);
            }
            Map<String, Object> entry = new LinkedHashMap<>();
            entry.put("id", cultivar.id());
            entry.put("name", cultivar.name());
            entry.put("species", cultivar.species());
            entry.put("curve-status", cultivar.status().word());
            entry.put("cells-without-class", area.cells()[0]);
            entry.put("classes", classes);
            cultivars.add(entry);
        }
        Map<String, Object> document = new LinkedHashMap<>();
        document.put("version", 1);
        document.put("title", plan.config().title());
        document.put("winters", plan.seasons().stream().map(season -> season.label()).toList());
        document.put("killing-winter-classes", plan.config().classes());
        document.put("cultivars", cultivars);
        document.put("caution", Caution.SHORT);
        return JsonText.of(document);
    }
}
