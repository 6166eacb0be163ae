package org.wintersill.climatology.statistic;

import org.wintersill.climatology.WinterRecord;

/** Counts the winters whose margin to the lethal temperature of a level is not above zero: the level's share of buds died. */
final class EventFrequency {
    private EventFrequency() {
    }

    /** Number of winters that count. */
    static int winters(WinterRecord record, int level, int cell) {
        int n = 0;
        for (float[] winter : record.margins()[level]) {
            if (winter[cell] == winter[cell]) {
                n++;
            }
        }
        return n;
    }

    /** Number of winters with the event; a margin of exactly zero is one. */
    static int events(WinterRecord record, int level, int cell) {
        int k = 0;
        for (float[] winter : record.margins()[level]) {
            if (winter[cell] <= 0) {
                k++;
            }
        }
        return k;
    }
}
