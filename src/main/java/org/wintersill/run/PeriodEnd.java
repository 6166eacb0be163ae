package org.wintersill.run;

import java.time.YearMonth;
import java.util.List;
import org.wintersill.time.CfDate;
import org.wintersill.time.Season;

/**
 * The last day of the period that outputs cover, as a date of the common calendar: outputs are dated by it and never by the
 * clock, so that the same input gives the same bytes.
 */
final class PeriodEnd {
    private PeriodEnd() {
    }

    /** A day that the common calendar lacks, such as 30 February, becomes the last of its month. */
    static CfDate of(List<Season> seasons) {
        CfDate end = seasons.get(seasons.size() - 1).last();
        return new CfDate(end.year(), end.month(), Math.min(end.day(), YearMonth.of(end.year(), end.month()).lengthOfMonth()));
    }
}
