package org.wintersill.run.parcels;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.stream.IntStream;
import org.wintersill.climatology.PairedDifference;
import org.wintersill.parcel.ClassTotals;
import org.wintersill.parcel.CoveredCells;
import org.wintersill.parcel.LayerTotals;
import org.wintersill.parcel.PolygonFeature;

/** From the totals of a pass to what is said of each parcel. */
final class ParcelResults {
    /** A winter counts in a parcel when it does on this share of the parcel's area with values. */
    private static final double COUNTING_SHARE = 0.5;
    private static final int WORST_SHOWN = 3;

    private final FinishedRun run;
    private final List<List<RasterPass.Summary>> summaries;
    private final List<RasterPass.Winters> winters;
    private final List<RasterPass.Summary> shared;
    private final ColdGround coldGround;

    /**
     * @param summaries {@code [cultivar][layer]}
     * @param winters {@code [cultivar]}
     * @param shared layers of no cultivar
     */
    ParcelResults(FinishedRun run, List<List<RasterPass.Summary>> summaries, List<RasterPass.Winters> winters, List<RasterPass.Summary> shared,
                  ColdGround coldGround) {
        this.run = run;
        this.summaries = summaries;
        this.winters = winters;
        this.shared = shared;
        this.coldGround = coldGround;
    }

    /**
     * The result of one parcel.
     *
     * @param number of the parcel in the pass
     * @param swapped whether it would lie on the grid if x and y changed places
     * @param repeated whether its id stands in the file more than once
     */
    ParcelResult of(int number, PolygonFeature feature, CoveredCells.Extent extent, boolean swapped, boolean repeated) {
        double valued = valuedArea(number);
        double coveredShare = extent.areaKm2() > 0 ? Math.min(1, valued / extent.areaKm2()) : Double.NaN;
        List<double[]> damages = new ArrayList<>();
        for (int c = 0; c < run.cultivars().size(); c++) {
            damages.add(damages(c, number, valued));
        }
        List<CultivarResult> cultivars = new ArrayList<>();
        for (int c = 0; c < run.cultivars().size(); c++) {
            cultivars.add(cultivar(c, number, damages));
        }
        List<String> best = IntStream.range(0, cultivars.size()).filter(c -> cultivars.get(c).rank() == 1).boxed()
                .sorted(Comparator.comparingDouble((Integer c) -> cultivars.get(c).expectedDamage()).thenComparing(c -> c))
                .map(c -> run.cultivars().get(c).id()).toList();
        List<String> warnings = ParcelWarnings.of(run, feature, extent, coveredShare, cultivars, swapped, repeated);
        return new ParcelResult(feature, extent, coveredShare, shared.stream().map(RasterPass.Summary::totals).toArray(LayerTotals[]::new),
                shared.stream().map(RasterPass.Summary::classes).toArray(ClassTotals[]::new), number, coldGround.share(number), cultivars, best,
                warnings);
    }

    /** Largest area with a value that any layer has in the parcel, km2. */
    private double valuedArea(int parcel) {
        double area = 0;
        for (RasterPass.Winters cultivar : winters) {
            for (LayerTotals winter : cultivar.margin()) {
                area = Math.max(area, winter.weight(parcel));
            }
        }
        for (List<RasterPass.Summary> layers : summaries) {
            for (RasterPass.Summary layer : layers) {
                area = Math.max(area, layer.totals() == null ? 0 : layer.totals().weight(parcel));
            }
        }
        return area;
    }

    /** Damage of each winter; NaN where the winter does not count. */
    private double[] damages(int cultivar, int parcel, double valued) {
        LayerTotals[] totals = winters.get(cultivar).damage();
        double[] damage = new double[totals.length];
        for (int winter = 0; winter < damage.length; winter++) {
            boolean counts = valued > 0 && totals[winter].weight(parcel) >= COUNTING_SHARE * valued;
            damage[winter] = counts ? totals[winter].mean(parcel) : Double.NaN;
        }
        return damage;
    }

    private CultivarResult cultivar(int number, int parcel, List<double[]> damages) {
        double[] damage = damages.get(number);
        RasterPass.Winters totals = winters.get(number);
        double[] margin = new double[damage.length];
        String[] night = new String[damage.length];
        int counting = 0;
        int killing = 0;
        double sum = 0;
        for (int winter = 0; winter < damage.length; winter++) {
            boolean counts = !Double.isNaN(damage[winter]);
            margin[winter] = counts ? totals.margin()[winter].mean(parcel) : Double.NaN;
            night[winter] = counts && totals.nights() != null ? run.date(winter, totals.nights()[winter].night(parcel)) : "";
            counting += counts ? 1 : 0;
            sum += counts ? damage[winter] : 0;
            killing += counts && damage[winter] >= run.killing() / 100.0 ? 1 : 0;
        }
        double[] bounds = counting == 0 ? new double[] {Double.NaN, Double.NaN} : run.bounds().bounds(killing, counting, run.interval());
        double probability = counting == 0 ? Double.NaN : (double) killing / counting;
        List<Integer> worst = IntStream.range(0, damage.length).boxed().filter(winter -> !Double.isNaN(damage[winter]))
                .sorted(Comparator.comparingDouble((Integer winter) -> -damage[winter]).thenComparingDouble(winter -> margin[winter])
                        .thenComparing(Comparator.reverseOrder())).limit(WORST_SHOWN).toList();
        int rank = counting == 0 ? 0 : 1;
        List<String> tied = new ArrayList<>();
        for (int other = 0; rank > 0 && other < damages.size(); other++) {
            PairedDifference difference = PairedDifference.of(damages.get(other), damage, run.interval());
            if (other != number && difference.clearlyLower()) {
                rank++;
            } else if (other != number && !PairedDifference.of(damage, damages.get(other), run.interval()).clearlyLower()) {
                tied.add(run.cultivars().get(other).id());
            }
        }
        List<RasterPass.Summary> layers = summaries.get(number);
        return new CultivarResult(margin, damage, night, counting, killing, probability, bounds[0], bounds[1],
                counting == 0 ? Double.NaN : sum / counting, worst, rank, tied, counting > 0 && probability <= run.target(),
                layers.stream().map(RasterPass.Summary::totals).toArray(LayerTotals[]::new),
                layers.stream().map(RasterPass.Summary::classes).toArray(ClassTotals[]::new), parcel);
    }
}
