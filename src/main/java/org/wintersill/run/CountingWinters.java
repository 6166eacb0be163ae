package org.wintersill.run;

import org.wintersill.engine.WinterStore;
import org.wintersill.problem.Problem;
import org.wintersill.season.WinterValues;

/** Whether the fold found anything at all: an empty map looks like a map, and would be taken for one. */
final class CountingWinters {
    private static final int ROWS_AT_ONCE = 64;

    private CountingWinters() {
    }

    /**
     * Looks until the first value.
     *
     * @throws org.wintersill.problem.ProblemException when no winter counts in any cell
     */
    static void require(RunPlan plan, WinterStore store) {
        int rows = plan.target().rows();
        for (int winter = 0; winter < plan.seasons().size(); winter++) {
            for (int row = 0; row < rows; row += ROWS_AT_ONCE) {
                for (float value : store.read(WinterValues.minimumPlane(), winter, row, Math.min(ROWS_AT_ONCE, rows - row))) {
                    if (value == value) {
                        return;
                    }
                }
            }
        }
        boolean heights = plan.adjustment().hasHeights();
        String file = plan.source().files().isEmpty() ? "the record" : plan.source().files().get(0).path();
        String terrain = plan.config().elevation().map(elevation -> ", " + elevation.dem().file()).orElse("");
        throw Problem.input("no cell has a winter that counts: from " + plan.seasons().get(0).label() + " to "
                        + plan.seasons().get(plan.seasons().size() - 1).label() + ", temperatures are missing on too many days "
                        + (heights ? "wherever the terrain model has a height" : "in every cell"), file + terrain,
                "Look with inspect whether the file holds values, and whether its missing value is right"
                        + (heights ? "; check that the terrain model has heights where there are temperatures" : "")
                        + "; or take another rule for missing-days").asException();
    }
}
