/**
 * <b>Purpose.</b> Charts: described once in data units, drawn as SVG text or as PNG with the same content.
 *
 * <p><b>May depend on.</b> {@code layer} (colours), {@code time}, {@code problem}; {@code java.awt} without a display.
 *
 * <p><b>Conventions.</b> A {@link org.wintersill.io.chart.Chart} is panels stacked over one horizontal axis; each panel has a vertical
 * axis and {@link org.wintersill.io.chart.Mark}s, drawn in their order. NaN interrupts a line or band and leaves a point out;
 * values beyond an axis are drawn on its edge. The SVG is the same bytes everywhere: nothing in it depends on fonts, since text is
 * placed by estimated widths. The PNG has the same layout, drawn with the machine's own sans-serif font. Names from outside are
 * cleaned and escaped here. For example:
 *
 * <pre>{@code
 * Axis years = Axis.linear("Return period (years)", 1, 50);
 * Panel panel = new Panel("Winter minimum", Axis.around("\u00b0C", minima), 240, List.of(
 *         new Mark.Band(x, low, high, ChartColours.SAFE, "90 % interval"),
 *         new Mark.Line(x, fitted, ChartColours.SAFE, Mark.Stroke.STRONG, "fitted"),
 *         new Mark.Points(x, minima, ChartColours.INK, Mark.Shape.DISC, "winters")));
 * Chart chart = new Chart("Cold winters at Tarnmoor", List.of("invented"), "Minima of 12 winters and a fitted curve.", years,
 *         List.of(panel), List.of(caution));
 * ChartFile.write(chart, Path.of("minima.svg"), false);
 * String inlineInAPage = SvgChart.text(chart);
 * }</pre>
 *
 * <p>Start reading in {@link org.wintersill.io.chart.Chart} and {@link org.wintersill.io.chart.ChartFile}.
 */
package org.wintersill.io.chart;
