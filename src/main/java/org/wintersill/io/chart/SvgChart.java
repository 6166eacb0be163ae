package org.wintersill.io.chart;

import org.wintersill.layer.Colour;

/**
 * Draws a chart as SVG 1.1. Coordinates have two decimals; there are no ids, scripts, styles or links, so the text can stand alone
 * or inside a page.
 */
public final class SvgChart implements Pen {
    private final StringBuilder text = new StringBuilder();

    private SvgChart() {
    }

    /** The picture as an {@code <svg>} element, ended by a line feed. */
    public static String text(Chart chart) {
        Drawing drawing = new Drawing(chart);
        SvgChart pen = new SvgChart();
        String title = escaped(ChartText.clean(chart.title()));
        pen.text.append("<svg xmlns=\"http://www.w3.org/2000/svg\" width=\"").append(Drawing.WIDTH).append("\" height=\"")
                .append(drawing.height()).append("\" viewBox=\"0 0 ").append(Drawing.WIDTH).append(' ').append(drawing.height())
                .append("\" role=\"img\" aria-label=\"").append(title)
                .append("\" font-family=\"Helvetica, Arial, 'DejaVu Sans', sans-serif\">\n<title>").append(title)
                .append("</title>\n<desc>").append(escaped(ChartText.clean(chart.description()))).append("</desc>\n");
        drawing.draw(pen);
        return pen.text.append("</svg>\n").toString();
    }

    @Override
    public void area(double[] x, double[] y, Colour colour, double opacity) {
        text.append("<path d=\"");
        path(x, y);
        text.append("Z\" fill=\"").append(colour.hex()).append('"');
        if (opacity < 1) {
            text.append(" fill-opacity=\"").append(number(opacity)).append('"');
        }
        text.append("/>\n");
    }

    @Override
    public void line(double[] x, double[] y, Colour colour, double width, boolean dashed) {
        text.append("<path d=\"");
        path(x, y);
        text.append("\" fill=\"none\" stroke=\"").append(colour.hex()).append("\" stroke-width=\"").append(number(width))
                .append("\" stroke-linejoin=\"round\"").append(dashed ? " stroke-dasharray=\"6 4\"" : "").append("/>\n");
    }

    @Override
    public void strokes(double[] x, double[] from, double[] to, Colour colour, double width, double opacity) {
        if (x.length == 0) {
            return;
        }
        text.append("<path d=\"");
        for (int i = 0; i < x.length; i++) {
            text.append('M').append(number(x[i])).append(' ').append(number(from[i])).append('V').append(number(to[i]));
        }
        text.append("\" fill=\"none\" stroke=\"").append(colour.hex()).append("\" stroke-width=\"").append(number(width))
                .append("\" stroke-opacity=\"").append(number(opacity)).append("\"/>\n");
    }

    @Override
    public void dots(double[] x, double[] y, double radius, Colour colour) {
        if (x.length == 0) {
            return;
        }
        text.append("<g fill=\"").append(colour.hex()).append("\">\n");
        circles(x, y, radius);
    }

    @Override
    public void rings(double[] x, double[] y, double radius, Colour colour, double width) {
        if (x.length == 0) {
            return;
        }
        text.append("<g fill=\"none\" stroke=\"").append(colour.hex()).append("\" stroke-width=\"").append(number(width)).append("\">\n");
        circles(x, y, radius);
    }

    private void circles(double[] x, double[] y, double radius) {
        for (int i = 0; i < x.length; i++) {
            text.append("<circle cx=\"").append(number(x[i])).append("\" cy=\"").append(number(y[i])).append("\" r=\"")
                    .append(number(radius)).append("\"/>\n");
        }
        text.append("</g>\n");
    }

    @Override
    public void text(String words, double x, double y, Letters letters) {
        if (words.isEmpty()) {
            return;
        }
        text.append("<text x=\"").append(number(x)).append("\" y=\"").append(number(y)).append("\" font-size=\"")
                .append(number(letters.size())).append("\" fill=\"").append(letters.colour().hex()).append('"');
        if (letters.bold()) {
            text.append(" font-weight=\"bold\"");
        }
        if (letters.anchor() != Anchor.START) {
            text.append(" text-anchor=\"").append(letters.anchor() == Anchor.END ? "end" : "middle").append('"');
        }
        if (letters.turned()) {
            text.append(" transform=\"rotate(-90 ").append(number(x)).append(' ').append(number(y)).append(")\"");
        }
        text.append('>').append(escaped(words)).append("</text>\n");
    }

    private void path(double[] x, double[] y) {
        for (int i = 0; i < x.length; i++) {
            text.append(i == 0 ? 'M' : 'L').append(number(x[i])).append(' ').append(number(y[i]));
        }
    }

    /** At most two decimals, without trailing zeros. */
    static String number(double value) {
        long hundredths = Math.round(value * 100);
        String sign = hundredths < 0 ? "-" : "";
        long size = Math.abs(hundredths);
        String decimals = size % 100 == 0 ? "" : size % 10 == 0 ? "." + size % 100 / 10 : (size % 100 < 10 ? ".0" : ".") + size % 100;
        return sign + size / 100 + decimals;
    }

    private static String escaped(String words) {
        return words.replace("&", "&amp;").replace("<", "&lt;").replace(">", "&gt;").replace("\"", "&quot;").replace("'", "&#39;");
    }
}
