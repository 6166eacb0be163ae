package org.wintersill.run.parcels;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.wintersill.parcel.CoveredCells;
import org.wintersill.parcel.PolygonFeature;

/** What a reader must know about a parcel before believing its numbers; sentences without full stop. */
final class ParcelWarnings {
    private static final double NEARLY_WHOLE = 0.995;
    private static final int FEW_WINTERS = 5;
    private static final double FEW_CELLS = 1;

    private ParcelWarnings() {
    }

    static List<String> of(FinishedRun run, PolygonFeature feature, CoveredCells.Extent extent, double coveredShare,
                           List<CultivarResult> cultivars, boolean swapped, boolean repeated) {
        List<String> warnings = new ArrayList<>();
        if (!feature.remark().isEmpty()) {
            warnings.add(feature.remark());
        }
        if (repeated) {
            warnings.add("the id stands in the file more than once");
        }
        if (feature.outline().isEmpty()) {
            return warnings;
        }
        if (Double.isNaN(extent.areaKm2())) {
            warnings.add("the parcel cannot be brought to the reference system of the grid");
            return warnings;
        }
        if (extent.cells() == 0) {
            warnings.add("the parcel lies outside of the grid" + (swapped ? "; x and y seem to be swapped" : ""));
            return warnings;
        }
        if (!(coveredShare > 0)) {
            warnings.add("no cell of the parcel has a value");
            return warnings;
        }
        if (coveredShare < NEARLY_WHOLE) {
            warnings.add(String.format(Locale.ROOT, "only %.0f %% of the parcel lies on cells with values", Math.floor(100 * coveredShare)));
        }
        if (extent.largestShare() < FEW_CELLS) {
            warnings.add(extent.cells() == 1 ? "the parcel is smaller than a cell and has that cell's values"
                    : "the parcel fills no cell: its values are those of " + extent.cells() + " cells that reach beyond it");
        }
        int winters = cultivars.stream().mapToInt(CultivarResult::winters).max().orElse(0);
        if (winters > 0 && winters < FEW_WINTERS) {
            warnings.add("only " + winters + (winters == 1 ? " winter counts" : " winters count"));
        }
        if (winters > 0 && cultivars.stream().noneMatch(CultivarResult::meetsTarget)) {
            warnings.add(String.format(Locale.ROOT, "no cultivar keeps the frequency of killing winters at or below %.0f %%", 100 * run.target()));
        }
        return warnings;
    }
}
