package org.wintersill.run.parcels;

import java.util.List;
import org.wintersill.parcel.ClassTotals;
import org.wintersill.parcel.CoveredCells;
import org.wintersill.parcel.LayerTotals;
import org.wintersill.parcel.PolygonFeature;

/**
 * What a run says of one parcel.
 *
 * @param feature the polygon as read
 * @param extent what it covers
 * @param coveredShare share of its area on cells with values, 0..1
 * @param shared means and extremes of the layers of no cultivar, in their order; null for layers of classes
 * @param sharedClasses areas of the classes, in the order of the layers; null for others
 * @param number of the parcel in them
 * @param coldGround share of its area in cold ground, 0..1; NaN where the run does not know
 * @param cultivars results, in the order of the run
 * @param best ids of the cultivars of rank 1
 * @param warnings what a reader must know, sentences without full stop
 */
record ParcelResult(PolygonFeature feature, CoveredCells.Extent extent, double coveredShare, LayerTotals[] shared, ClassTotals[] sharedClasses,
                    int number, double coldGround, List<CultivarResult> cultivars, List<String> best, List<String> warnings) {

    /** Area in hectares; NaN where it is not known. */
    double areaHa() {
        return extent.areaKm2() * 100;
    }
}
