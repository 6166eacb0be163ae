package org.wintersill.io.chart;

import java.util.List;

/**
 * One frame of a chart.
 *
 * @param heading what it shows, above its top left corner; may be empty
 * @param vertical its axis
 * @param height of the frame in pixels of a chart {@value Drawing#WIDTH} wide
 * @param marks drawn in this order; those with a label stand in the legend
 */
public record Panel(String heading, Axis vertical, double height, List<Mark> marks) {

    public Panel {
        marks = List.copyOf(marks);
        if (!(height > 0)) {
            throw new IllegalArgumentException("not a height: " + height);
        }
    }
}
