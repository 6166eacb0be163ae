package org.wintersill.config;

import java.util.Optional;
import org.wintersill.time.MonthDay;
import org.wintersill.time.SeasonWindow;

/**
 * What a winter is. Whatever is empty follows from the hemisphere.
 *
 * @param from first day
 * @param to last day
 * @param completeFrom first day of the part that must be complete
 * @param completeTo last day of that part
 * @param hemisphere empty: found from the grid
 */
public record WinterConfig(Optional<MonthDay> from, Optional<MonthDay> to, Optional<MonthDay> completeFrom,
                           Optional<MonthDay> completeTo, Optional<SeasonWindow.Hemisphere> hemisphere) {
}
