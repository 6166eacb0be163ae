package org.wintersill.io.chart;

import java.util.List;

/**
 * What is to be drawn, free of pixels and formats.
 *
 * @param title one line; also the accessible name of the picture
 * @param subtitle lines under the title, such as place, source and status
 * @param description what the picture shows, in sentences, for those who cannot see it
 * @param horizontal axis that all panels share
 * @param panels from top to bottom, at least one
 * @param notes lines under the picture, wrapped where they are long; the place of the caution
 */
public record Chart(String title, List<String> subtitle, String description, Axis horizontal, List<Panel> panels, List<String> notes) {

    public Chart {
        subtitle = List.copyOf(subtitle);
        panels = List.copyOf(panels);
        notes = List.copyOf(notes);
        if (panels.isEmpty()) {
            throw new IllegalArgumentException("a chart needs a panel");
        }
    }
}
