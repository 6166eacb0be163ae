package org.wintersill.run.parcels;

import java.util.List;
import org.wintersill.parcel.ClassTotals;

/**
 * Where cold air gathers, as the run knows it: the class {@value #PRONE} of the layer {@code terrain-class}, else cells whose
 * {@code pool-index} is at least {@value #POOL} (a local rank of height below 0.3, science 7.4), else nothing.
 *
 * @param totals areas of the classes; null where the run has neither layer
 * @param code class that is cold ground
 */
record ColdGround(ClassTotals totals, int code) {
    private static final String PRONE = "prone";
    private static final float POOL = 0.4f;
    private static final ColdGround UNKNOWN = new ColdGround(null, 0);

    /**
     * Plans it.
     *
     * @param shared summaries of the layers of no cultivar, planned already
     */
    static ColdGround plan(List<RasterPass.Summary> shared, RasterPass pass) {
        for (RasterPass.Summary summary : shared) {
            if (summary.layer().id().equals("terrain-class") && summary.layer().classes().contains(PRONE)) {
                return new ColdGround(summary.classes(), summary.layer().classes().indexOf(PRONE));
            }
        }
        return shared.stream().filter(summary -> summary.layer().id().equals("pool-index")).findFirst()
                .map(summary -> new ColdGround(pass.atLeast(summary.layer(), POOL), 1)).orElse(UNKNOWN);
    }

    boolean known() {
        return totals != null;
    }

    /** Share of the area with values, 0..1; NaN where it is not known. */
    double share(int parcel) {
        return totals == null ? Double.NaN : totals.share(parcel, code);
    }
}
