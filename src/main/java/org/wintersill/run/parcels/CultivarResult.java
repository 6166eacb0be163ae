package org.wintersill.run.parcels;

import java.util.List;
import org.wintersill.parcel.ClassTotals;
import org.wintersill.parcel.LayerTotals;

/**
 * What a run says of one cultivar in one parcel.
 *
 * @param margin mean margin of each winter, K; NaN where the winter does not count in the parcel
 * @param damage mean damage of each winter, 0..1; likewise
 * @param night date of the worst night of each winter; empty where there is none
 * @param winters number of winters that count
 * @param killing number of them that kill the run's share of the parcel's buds
 * @param probability frequency of killing winters; NaN without winters
 * @param lower lower bound of the frequency
 * @param upper upper bound
 * @param expectedDamage mean damage over the winters that count; NaN without winters
 * @param worst positions of the worst winters, the worst first
 * @param rank 1 plus the number of cultivars with clearly less damage; 0 without winters
 * @param tiedWith ids of the cultivars that cannot be told from this one
 * @param meetsTarget whether the frequency of killing winters is accepted
 * @param layers means and extremes of the summary layers, in their order; null for layers of classes
 * @param classes areas of the classes, in the order of the layers; null for others
 * @param number of the parcel in them
 */
record CultivarResult(double[] margin, double[] damage, String[] night, int winters, int killing, double probability, double lower,
                      double upper, double expectedDamage, List<Integer> worst, int rank, List<String> tiedWith, boolean meetsTarget,
                      LayerTotals[] layers, ClassTotals[] classes, int number) {
}
