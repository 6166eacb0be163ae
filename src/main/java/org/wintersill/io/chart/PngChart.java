package org.wintersill.io.chart;

import java.awt.BasicStroke;
import java.awt.Color;
import java.awt.Font;
import java.awt.Graphics2D;
import java.awt.RenderingHints;
import java.awt.geom.AffineTransform;
import java.awt.geom.Ellipse2D;
import java.awt.geom.Line2D;
import java.awt.geom.Path2D;
import java.awt.image.BufferedImage;
import java.util.LinkedHashMap;
import java.util.Map;
import org.wintersill.layer.Colour;
import org.wintersill.problem.Problem;

/** Draws a chart as PNG, two pixels to one of the layout, with the machine's sans-serif font and without a display. */
public final class PngChart implements Pen {
    private static final int SCALE = 2;

    private final Graphics2D graphics;

    private PngChart(Graphics2D graphics) {
        this.graphics = graphics;
    }

    /**
     * The bytes of the file.
     *
     * @throws org.wintersill.problem.ProblemException where the machine has no font
     */
    public static byte[] bytes(Chart chart) {
        Drawing drawing = new Drawing(chart);
        BufferedImage image = new BufferedImage(SCALE * Drawing.WIDTH, SCALE * drawing.height(), BufferedImage.TYPE_INT_RGB);
        Graphics2D graphics = image.createGraphics();
        try {
            graphics.scale(SCALE, SCALE);
            graphics.setRenderingHint(RenderingHints.KEY_ANTIALIASING, RenderingHints.VALUE_ANTIALIAS_ON);
            graphics.setRenderingHint(RenderingHints.KEY_TEXT_ANTIALIASING, RenderingHints.VALUE_TEXT_ANTIALIAS_ON);
            graphics.setRenderingHint(RenderingHints.KEY_FRACTIONALMETRICS, RenderingHints.VALUE_FRACTIONALMETRICS_ON);
            graphics.setRenderingHint(RenderingHints.KEY_STROKE_CONTROL, RenderingHints.VALUE_STROKE_PURE);
            drawing.draw(new PngChart(graphics));
        } catch (InternalError | NoClassDefFoundError | UnsatisfiedLinkError | NullPointerException noFonts) {
            // what the JDK throws where fontconfig or every font is missing, as in bare containers
            throw Problem.output("a PNG cannot be drawn, since this machine has no fonts for Java", "--chart",
                    "Ask for a name that ends in .svg, or install fontconfig and a font").asException(noFonts);
        } finally {
            graphics.dispose();
        }
        Map<String, String> texts = new LinkedHashMap<>();
        texts.put("Title", ChartText.clean(chart.title()));
        texts.put("Description", ChartText.clean(chart.description()));
        return PngBytes.of(image.getWidth(), image.getHeight(),
                image.getRGB(0, 0, image.getWidth(), image.getHeight(), null, 0, image.getWidth()), texts);
    }

    @Override
    public void area(double[] x, double[] y, Colour colour, double opacity) {
        Path2D path = path(x, y);
        path.closePath();
        graphics.setColor(colour(colour, opacity));
        graphics.fill(path);
    }

    @Override
    public void line(double[] x, double[] y, Colour colour, double width, boolean dashed) {
        graphics.setColor(colour(colour, 1));
        graphics.setStroke(dashed
                ? new BasicStroke((float) width, BasicStroke.CAP_BUTT, BasicStroke.JOIN_ROUND, 1, new float[] {6, 4}, 0)
                : new BasicStroke((float) width, BasicStroke.CAP_BUTT, BasicStroke.JOIN_ROUND));
        graphics.draw(path(x, y));
    }

    @Override
    public void strokes(double[] x, double[] from, double[] to, Colour colour, double width, double opacity) {
        graphics.setColor(colour(colour, opacity));
        graphics.setStroke(new BasicStroke((float) width, BasicStroke.CAP_BUTT, BasicStroke.JOIN_ROUND));
        for (int i = 0; i < x.length; i++) {
            graphics.draw(new Line2D.Double(x[i], from[i], x[i], to[i]));
        }
    }

    @Override
    public void dots(double[] x, double[] y, double radius, Colour colour) {
        graphics.setColor(colour(colour, 1));
        for (int i = 0; i < x.length; i++) {
            graphics.fill(circle(x[i], y[i], radius));
        }
    }

    @Override
    public void rings(double[] x, double[] y, double radius, Colour colour, double width) {
        graphics.setColor(colour(colour, 1));
        graphics.setStroke(new BasicStroke((float) width));
        for (int i = 0; i < x.length; i++) {
            graphics.draw(circle(x[i], y[i], radius));
        }
    }

    @Override
    public void text(String words, double x, double y, Letters letters) {
        graphics.setColor(colour(letters.colour(), 1));
        Font font = new Font(Font.SANS_SERIF, letters.bold() ? Font.BOLD : Font.PLAIN, 1).deriveFont((float) letters.size());
        graphics.setFont(font);
        double width = font.getStringBounds(words, graphics.getFontRenderContext()).getWidth();
        double shift = switch (letters.anchor()) {
            case START -> 0;
            case MIDDLE -> -width / 2;
            case END -> -width;
        };
        AffineTransform before = graphics.getTransform();
        graphics.translate(x, y);
        if (letters.turned()) {
            graphics.transform(AffineTransform.getQuadrantRotateInstance(-1));
        }
        graphics.drawString(words, (float) shift, 0);
        graphics.setTransform(before);
    }

    private static Ellipse2D circle(double x, double y, double radius) {
        return new Ellipse2D.Double(x - radius, y - radius, 2 * radius, 2 * radius);
    }

    private static Path2D path(double[] x, double[] y) {
        Path2D path = new Path2D.Double(Path2D.WIND_NON_ZERO, x.length + 1);
        for (int i = 0; i < x.length; i++) {
            if (i == 0) {
                path.moveTo(x[i], y[i]);
            } else {
                path.lineTo(x[i], y[i]);
            }
        }
        return path;
    }

    private static Color colour(Colour colour, double opacity) {
        return new Color(colour.red(), colour.green(), colour.blue(), (int) Math.round(255 * opacity));
    }
}
