package org.wintersill.run.parcels;

import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import java.util.stream.Collectors;
import java.util.stream.IntStream;
import org.wintersill.grid.CoordinateOperation;
import org.wintersill.io.chart.SvgChart;
import org.wintersill.layer.LayerStyle;
import org.wintersill.layer.LayerStyles;
import org.wintersill.parcel.LayerTotals;
import org.wintersill.run.RunVersion;

/**
 * One page about one parcel: where it lies, how the cultivars rank and how sure that is, its winters, and what the numbers cannot say.
 * One file without script, address or font from elsewhere; printable.
 */
final class ParcelSheet {
    private static final String STYLE = """
            :root{--ink:#2b2a33;--soft:#6b6673;--line:#d9d3c7;--paper:#fdfcf8;--warn:#96381a}
            *{box-sizing:border-box}
            body{margin:0;background:#efece4;color:var(--ink);font:15px/1.45 Georgia,'DejaVu Serif',serif}
            main{max-width:920px;margin:24px auto;background:var(--paper);padding:34px 42px}
            h1{font-size:30px;line-height:1.15;margin:0 0 4px;overflow-wrap:anywhere}
            h2{font-size:18px;margin:30px 0 8px;padding-bottom:3px;border-bottom:2px solid var(--ink)}
            p{margin:6px 0 10px}.sub{color:var(--soft);margin:0 0 18px;overflow-wrap:anywhere}
            .two{display:flex;flex-wrap:wrap;gap:28px;align-items:flex-start}
            .two>div{flex:1 1 300px;min-width:0}.two>figure{flex:0 0 auto}
            figure{margin:0}figcaption{font-size:12.5px;color:var(--soft);max-width:420px;margin-top:6px}
            table{border-collapse:collapse;width:100%;font-size:14px}
            th,td{text-align:left;padding:5px 8px 5px 0;border-bottom:1px solid var(--line);vertical-align:top;overflow-wrap:anywhere}
            th{font-weight:600;color:var(--soft);font-size:12.5px}
            td.n,th.n{text-align:right;white-space:nowrap;font-variant-numeric:tabular-nums}
            tr.best td{background:#f1eee2}
            .warn{border-left:5px solid var(--warn);background:#f8eee5;padding:8px 14px;margin:14px 0}
            .warn ul{margin:4px 0;padding-left:18px}
            .bar{display:flex;height:13px;width:130px;background:#e8e4da}.bar i{display:block;height:13px}
            .key{font-size:12.5px;color:var(--soft);margin-top:6px}.key b{display:inline-block;width:12px;height:12px;margin:0 4px 0 12px;vertical-align:-1px}
            .key b:first-child{margin-left:0}
            .ramp{display:flex;width:420px;max-width:100%;margin-top:6px}.ramp span{flex:1;font-size:10.5px;color:var(--soft);border-top:10px solid}
            svg{max-width:100%;height:auto;display:block}
            footer{font-size:12.5px;color:var(--soft);margin-top:26px;border-top:1px solid var(--line);padding-top:10px}
            @media print{body{background:none}main{margin:0;padding:0;max-width:none}h2{break-after:avoid}table,figure,.warn{break-inside:avoid}
            *{-webkit-print-color-adjust:exact;print-color-adjust:exact}}
            """;

    private final FinishedRun run;
    private final ParcelRun job;
    private final ParcelResult parcel;
    private final CoordinateOperation toGrid;
    private final List<Integer> order;

    /** @param toGrid from the parcel's reference system to the grid's */
    ParcelSheet(FinishedRun run, ParcelRun job, ParcelResult parcel, CoordinateOperation toGrid) {
        this.run = run;
        this.job = job;
        this.parcel = parcel;
        this.toGrid = toGrid;
        order = IntStream.range(0, parcel.cultivars().size()).boxed().sorted(Comparator.comparingInt((Integer c) -> parcel.cultivars().get(c).rank())
                .thenComparingDouble(c -> parcel.cultivars().get(c).expectedDamage()).thenComparing(c -> c)).toList();
    }

    private boolean hasValues() {
        return parcel.cultivars().stream().anyMatch(cultivar -> cultivar.winters() > 0);
    }

    private String label() {
        return parcel.feature().name().isEmpty() ? "Parcel " + parcel.feature().id() : parcel.feature().name();
    }

    /** The page. */
    String html() {
        PageText page = new PageText().raw("<!DOCTYPE html>\n<html lang=\"en\">\n<head>\n<meta charset=\"utf-8\">\n"
                + "<meta name=\"viewport\" content=\"width=device-width, initial-scale=1\">\n"
                + "<meta http-equiv=\"Content-Security-Policy\" content=\"default-src 'none'; img-src data:; style-src 'unsafe-inline'\">\n")
                .element("title", label() + " (" + parcel.feature().id() + ")").raw("<style>\n" + STYLE + "</style>\n</head>\n<body>\n<main>\n");
        page.element("h1", label());
        page.raw("<p class=\"sub\">").words("Parcel " + parcel.feature().id() + ", row " + parcel.feature().number() + ". " + run.title() + ". Winters "
                + period() + ".").raw("</p>\n");
        warnings(page);
        page.raw("<div class=\"two\">\n<div>\n");
        facts(page);
        page.raw("</div>\n");
        if (hasValues()) {
            map(page);
        }
        page.raw("</div>\n");
        if (hasValues()) {
            ranking(page);
            winters(page);
        }
        cautions(page);
        return page.raw("</main>\n</body>\n</html>\n").toString();
    }

    private String period() {
        return run.winters().size() == 1 ? run.winters().get(0) : run.winters().get(0) + " to " + run.winters().get(run.winters().size() - 1);
    }

    private void warnings(PageText page) {
        if (!parcel.warnings().isEmpty()) {
            page.raw("<div class=\"warn\"><strong>Before you read on</strong><ul>\n");
            parcel.warnings().forEach(warning -> page.element("li", warning + "."));
            page.raw("</ul></div>\n");
        }
    }

    private void facts(PageText page) {
        page.raw("<table>\n");
        fact(page, "Area", number(parcel.areaHa(), parcel.areaHa() < 10 ? 2 : 0, "ha"));
        fact(page, "Cells of the grid it meets", String.valueOf(parcel.extent().cells()));
        fact(page, "Share on cells with values", number(Math.floor(100 * parcel.coveredShare() + 1e-9), 0, "%"));
        if (!Double.isNaN(parcel.coldGround())) {
            fact(page, "Share in cold ground", number(100 * parcel.coldGround(), 0, "%"));
        }
        for (int i = 0; i < job.shared().size(); i++) {
            LayerInfo layer = job.shared().get(i);
            LayerTotals totals = parcel.shared()[i];
            if (totals != null && !Double.isNaN(totals.mean(parcel.number())) && !layer.id().equals("choice")) {
                fact(page, layer.title() + ": mean (lowest to highest)", number(totals.mean(parcel.number()), decimals(layer), layer.unit()) + " ("
                        + number(totals.lowest(parcel.number()), decimals(layer), "") + " to "
                        + number(totals.highest(parcel.number()), decimals(layer), "") + ")");
            }
        }
        page.raw("</table>\n");
    }

    private static int decimals(LayerInfo layer) {
        return layer.unit().equals("m") || layer.unit().equals("count") ? 0 : 1;
    }

    private static void fact(PageText page, String name, String value) {
        page.raw("<tr><td>").words(name).raw("</td><td class=\"n\">").words(value).raw("</td></tr>\n");
    }

    /** A number with a unit; a dash where there is none. */
    private static String number(double value, int decimals, String unit) {
        if (Double.isNaN(value)) {
            return "\u2013";
        }
        String text = String.format(Locale.ROOT, "%." + decimals + "f", value);
        String shown = text.matches("-0(\\.0*)?") ? text.substring(1) : text.replace('-', '\u2212');
        return shown + switch (unit) {
            case "", "1", "count" -> "";
            case "degC" -> "\u00a0\u00b0C";
            default -> "\u00a0" + unit;
        };
    }

    private void map(PageText page) {
        int cultivar = order.get(0);
        List<LayerInfo> layers = job.layers(cultivar);
        for (String id : List.of("margin-low", "margin-mean")) {
            LayerInfo layer = layers.stream().filter(candidate -> candidate.id().equals(id)).findFirst().orElse(null);
            if (layer != null) {
                String name = run.cultivars().get(cultivar).name();
                LayerStyle.Ramp ramp = LayerStyles.margin();
                page.raw("<figure>\n").raw(job.excerpt(parcel.feature().outline(), toGrid, layer, ramp, layer.title() + " of " + name + " around the parcel"))
                        .raw("<div class=\"ramp\">");
                ramp.stops().forEach(stop -> page.raw("<span style=\"border-color:" + stop.colour().hex() + "\">").words(stop.label()).raw("</span>"));
                page.raw("</div>\n<figcaption>").words(layer.title() + " of " + name + ": " + layer.meaning()
                        + ". Warm colours: below zero more than half of the buds die. White: no value. Squares are the cells of the grid.")
                        .raw("</figcaption>\n</figure>\n");
                return;
            }
        }
    }

    private void ranking(PageText page) {
        page.element("h2", "Cultivars").raw("<table>\n<tr><th class=\"n\">Rank</th><th>Cultivar</th><th class=\"n\">Mean damage</th>"
                + "<th class=\"n\">Killing winters</th><th class=\"n\">").words(String.format(Locale.ROOT, "Frequency (%.0f %% bounds)", 100 * run.interval()))
                .raw("</th><th>Suitability</th><th class=\"n\">Margin, low</th></tr>\n");
        for (int cultivar : order) {
            CultivarResult result = parcel.cultivars().get(cultivar);
            FinishedRun.CultivarEntry entry = run.cultivars().get(cultivar);
            page.raw(result.rank() == 1 ? "<tr class=\"best\">" : "<tr>");
            page.raw("<td class=\"n\">" + (result.rank() == 0 ? "\u2013" : String.valueOf(result.rank())) + "</td><td>").words(entry.name()).raw("<br><small>")
                    .words(entry.species() + ", " + entry.organ() + "; curve " + entry.status()).raw("</small></td><td class=\"n\">")
                    .words(number(100 * result.expectedDamage(), 1, "%")).raw("</td><td class=\"n\">").words(result.killing() + " of " + result.winters())
                    .raw("</td><td class=\"n\">").words(number(100 * result.probability(), 0, "%")).raw("<br><small>")
                    .words(number(100 * result.lower(), 0, "") + " to " + number(100 * result.upper(), 0, "%"))
                    .raw("</small></td><td>");
            suitability(page, cultivar);
            page.raw("</td><td class=\"n\">").words(low(cultivar)).raw("</td></tr>\n");
        }
        page.raw("</table>\n");
        page.raw("<p class=\"key\">");
        LayerStyles.suitability().entries().forEach(entry -> page.raw("<b style=\"background:" + entry.colour().hex() + "\"></b>").words(entry.label()));
        page.raw("</p>\n");
        page.element("p", verdict());
        page.element("p", "A killing winter kills at least " + run.killing() + " % of the parcel's buds. Rank is 1 plus the number of cultivars whose mean damage "
                + "over the same winters is lower by more than the uncertainty of that difference; equal ranks are ties. Margin, low: in one winter of ten "
                + "the margin is lower.");
    }

    private String low(int cultivar) {
        List<LayerInfo> layers = job.layers(cultivar);
        for (int i = 0; i < layers.size(); i++) {
            if (layers.get(i).id().equals("margin-low")) {
                CultivarResult result = parcel.cultivars().get(cultivar);
                return number(result.layers()[i].mean(result.number()), 1, "K");
            }
        }
        return "\u2013";
    }

    private void suitability(PageText page, int cultivar) {
        List<LayerInfo> layers = job.layers(cultivar);
        CultivarResult result = parcel.cultivars().get(cultivar);
        for (int i = 0; i < layers.size(); i++) {
            if (layers.get(i).id().equals("suitability")) {
                StringBuilder words = new StringBuilder();
                page.raw("<div class=\"bar\">");
                for (LayerStyle.Entry entry : LayerStyles.suitability().entries()) {
                    double share = result.classes()[i].share(result.number(), entry.code());
                    if (share > 0) {
                        page.raw(String.format(Locale.ROOT, "<i style=\"width:%.2f%%;background:%s\"></i>", 100 * share, entry.colour().hex()));
                        words.append(words.isEmpty() ? "" : ", ").append(number(100 * share, 0, "%")).append(' ').append(entry.label());
                    }
                }
                page.raw("</div><small>").words(words.toString()).raw("</small>");
            }
        }
    }

    /** What the ranking says in words. */
    private String verdict() {
        List<String> best = parcel.best().stream().map(this::name).toList();
        List<String> meeting = order.stream().filter(c -> parcel.cultivars().get(c).meetsTarget()).map(c -> run.cultivars().get(c).name()).toList();
        String first = best.size() == 1 ? best.get(0) + " has clearly the least damage here"
                : String.join(", ", best) + " cannot be told apart: the differences of their mean damage are smaller than their uncertainty";
        String target = number(100 * run.target(), 0, "%");
        return first + ". " + (meeting.isEmpty() ? "No cultivar keeps killing winters at or below the accepted frequency of " + target + "."
                : "Killing winters at or below the accepted frequency of " + target + ": " + String.join(", ", meeting) + ".");
    }

    private String name(String id) {
        return run.cultivars().stream().filter(entry -> entry.id().equals(id)).map(FinishedRun.CultivarEntry::name).collect(Collectors.joining());
    }

    private void winters(PageText page) {
        page.element("h2", "Winters").raw(SvgChart.text(WinterChart.of(run, parcel, order)));
        page.raw("<table>\n<tr><th>Cultivar</th><th>Worst winter</th><th>Worst night</th><th class=\"n\">Margin</th><th class=\"n\">Damage</th></tr>\n");
        for (int cultivar : order) {
            CultivarResult result = parcel.cultivars().get(cultivar);
            for (int winter : result.worst()) {
                page.raw("<tr><td>").words(run.cultivars().get(cultivar).name()).raw("</td><td>").words(run.winters().get(winter)).raw("</td><td>")
                        .words(result.night()[winter].isEmpty() ? "\u2013" : result.night()[winter]).raw("</td><td class=\"n\">")
                        .words(number(result.margin()[winter], 2, "K")).raw("</td><td class=\"n\">").words(number(100 * result.damage()[winter], 1, "%"))
                        .raw("</td></tr>\n");
            }
        }
        page.raw("</table>\n");
        page.element("p", "Margin and damage are means over the parcel; the night is that of the parcel's coldest place against the curve. "
                + "Margin: minimum temperature minus LT50, the temperature that kills half of the buds.");
    }

    private void cautions(PageText page) {
        page.element("h2", "What this page cannot say").element("p", run.caution(run.cultivars()));
        page.element("p", "Cells are " + job.grid().cellWidth() + " x " + job.grid().cellHeight() + (job.grid().crs().angular() ? " degrees" : " units")
                + " wide and high in " + job.grid().crs().label() + "; nothing smaller is known. Few winters mean wide bounds: read them. Differences between "
                + "neighbouring parcels that are smaller than the spread inside of one are no reason to choose.");
        page.raw("<table>\n<tr><th>Cultivar</th><th>Status of the curve</th><th>Source</th></tr>\n");
        run.cultivars().forEach(entry -> page.raw("<tr><td>").words(entry.name()).raw("</td><td>").words(entry.status()).raw("</td><td>").words(entry.source())
                .raw("</td></tr>\n"));
        page.raw("</table>\n<footer>").words("Made by " + RunVersion.program() + " from the layers of the run '" + run.title()
                + "'. All numbers stand in the tables beside this page; record.json names what made them.").raw("</footer>\n");
    }
}
