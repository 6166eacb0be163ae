package org.wintersill.climatology.statistic;

import org.wintersill.climatology.ClimatologyStatistic;
import org.wintersill.climatology.WinterRecord;
import org.wintersill.layer.LayerDefinition;
import org.wintersill.layer.LayerStyles;
import org.wintersill.layer.SampleType;

/** Year in which the winter of the lowest margin ended; the earliest of equals. */
public final class WorstWinter implements ClimatologyStatistic {
    private final int firstYear;
    private final int lastYear;

    /** @param firstYear year of the first winter of the run, for the colours; {@code lastYear} likewise */
    public WorstWinter(int firstYear, int lastYear) {
        this.firstYear = firstYear;
        this.lastYear = lastYear;
    }

    @Override
    public LayerDefinition layer() {
        return new LayerDefinition("worst-winter", "Worst winter",
                "Year in which the winter with the lowest margin ended; the earliest of equals",
                "year", SampleType.INT16, "", LayerStyles.year(firstYear, lastYear));
    }

    @Override
    public void summarise(WinterRecord record, float[] out, int from, int to) {
        for (int cell = from; cell < to; cell++) {
            int worst = MarginWorst.worstWinter(record, cell);
            out[cell] = worst < 0 ? Float.NaN : record.years()[worst];
        }
    }
}
