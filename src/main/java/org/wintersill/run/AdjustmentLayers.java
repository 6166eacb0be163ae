package org.wintersill.run;

import java.util.List;
import java.util.Optional;
import org.wintersill.elevation.AdjustedTemperature;
import org.wintersill.elevation.ElevationAdjustment;
import org.wintersill.elevation.NightAdjuster;
import org.wintersill.elevation.NightFields;
import org.wintersill.elevation.PoolChange;
import org.wintersill.elevation.terrain.PoolGround;
import org.wintersill.engine.NightMeans;
import org.wintersill.layer.LayerDefinition;
import org.wintersill.layer.LayerStyle;
import org.wintersill.layer.LayerStyles;
import org.wintersill.layer.RasterWriter;
import org.wintersill.layer.SampleType;
import org.wintersill.problem.Notices;

/** The layers that show what the adjustment did to the minima of each cell beside the change of height, for checking. */
final class AdjustmentLayers {
    private static final LayerDefinition POOL_INDEX = definition("pool-index", "Pool index",
            "How low the cell lies among its neighbours: 1 at the bottom of a hollow, 0 from the middle up", "1", LayerStyles.share());
    private static final LayerDefinition TERRAIN_CLASS = new LayerDefinition("terrain-class", "Cold-air class",
            "Whether the ground is prone to pools of cold air: flat, low and concave; missing along the border of the terrain model", "1",
            SampleType.BYTE, "", LayerStyles.coldAir());
    private static final LayerDefinition POOL_CHANGE = definition("cold-pool-change", "Cooling by cold-air pools",
            "Change of the minimum by pools of cold air on a night of full strength", "K", LayerStyles.temperatureChange());
    private static final LayerDefinition WATER_CHANGE = definition("water-change", "Warming by water",
            "Change of the minimum by open water", "K", LayerStyles.temperatureChange());
    private static final LayerDefinition ADJUSTMENT_MEAN = definition("adjustment-mean", "Mean adjustment",
            "Mean over the nights of all winters of what height, pools, water and offsets together add to the interpolated minimum", "K",
            LayerStyles.temperatureChange());
    private static final LayerDefinition LAPSE_MEAN = definition("lapse-rate-mean", "Mean lapse rate",
            "Mean over the nights of all winters of the lapse rate fitted to each night; positive where higher is colder", "K/km",
            LayerStyles.lapseRate());
    private static final LayerDefinition LAPSE_SD = definition("lapse-rate-sd", "Spread of lapse rates",
            "Standard deviation over the nights of all winters of the fitted lapse rate, interpolated between source cells", "K/km",
            LayerStyles.lapseRateSpread());

    private final RunPlan plan;
    private final Optional<NightMeans> means;
    private final LayerOutput output;
    private final LayerSelection selection;

    /** @param means over the nights; empty where winters were kept from an earlier run and no night was looked at */
    AdjustmentLayers(RunPlan plan, Optional<NightMeans> means, LayerOutput output, LayerSelection selection) {
        this.plan = plan;
        this.means = means;
        this.output = output;
        this.selection = selection;
    }

    private static LayerDefinition definition(String id, String title, String description, String unit, LayerStyle style) {
        return new LayerDefinition(id, title, description, unit, SampleType.FLOAT32, "", style);
    }

    static List<String> ids() {
        return List.of(POOL_INDEX.id(), TERRAIN_CLASS.id(), POOL_CHANGE.id(), WATER_CHANGE.id(), ADJUSTMENT_MEAN.id(), LAPSE_MEAN.id(),
                LAPSE_SD.id());
    }

    /** Fills one target row, NaN for missing. */
    private interface RowFiller {
        void fill(int row, float[] values);
    }

    /** Writes those that the run has; tells of those it cannot have. */
    void write(Notices notices) {
        ElevationAdjustment adjustment = plan.adjustment();
        if (adjustment.isPlain()) {
            return;
        }
        PoolChange pools = adjustment.terms().pools();
        if (pools instanceof PoolGround ground) {
            write(POOL_INDEX, covered((row, values) -> System.arraycopy(ground.indexRow(row), 0, values, 0, values.length)));
            write(TERRAIN_CLASS, covered((row, values) -> classes(ground.classRow(row), values)));
        }
        if (pools != null) {
            write(POOL_CHANGE, covered((row, values) -> System.arraycopy(pools.row(row), 0, values, 0, values.length)));
        }
        if (adjustment.terms().hasWater()) {
            write(WATER_CHANGE, covered((row, values) -> {
                for (int column = 0; column < values.length; column++) {
                    values[column] = adjustment.terms().water(row, column);
                }
            }));
        }
        if (means.isEmpty()) {
            notices.add("winters are taken from an earlier run: layers of means over nights, " + ADJUSTMENT_MEAN.id() + " and lapse rates, are "
                    + "not written");
            return;
        }
        write(ADJUSTMENT_MEAN, mean(means.get()));
        if (adjustment.localLapse().isPresent()) {
            write(LAPSE_MEAN, field(means.get().meanRate()));
            write(LAPSE_SD, field(means.get().spreadOfRate()));
        }
    }

    private static void classes(byte[] codes, float[] values) {
        for (int i = 0; i < values.length; i++) {
            values[i] = codes[i] == 0 ? Float.NaN : codes[i];
        }
    }

    /** Cells that can have no temperature have none of these values. */
    private RowFiller covered(RowFiller filler) {
        return (row, values) -> {
            filler.fill(row, values);
            for (int column = 0; column < values.length; column++) {
                if (!plan.adjustment().covers(row, column)) {
                    values[column] = Float.NaN;
                }
            }
        };
    }

    private RowFiller field(float[] values) {
        NightAdjuster adjuster = new NightAdjuster(plan.adjustment());
        return covered((row, out) -> adjuster.interpolateField(values, row, out));
    }

    /** The adjustment of a night of zero degrees everywhere, with the means of all nights for its fields: everything in it is linear in them. */
    private RowFiller mean(NightMeans means) {
        ElevationAdjustment adjustment = plan.adjustment();
        NightAdjuster adjuster = new NightAdjuster(adjustment);
        NightMeans.OverNights nights = means.overNights();
        float[] rates = means.meanRate();
        float[] weights = means.meanWeight();
        NightFields fields = new NightFields().set(nights.lapse(), rates, weights, false);
        float[] zero = new float[plan.job().window().cells()];
        for (int i = 0; i < zero.length; i++) {
            boolean none = rates != null && Float.isNaN(rates[i]) || weights != null && Float.isNaN(weights[i]);
            zero[i] = none ? Float.NaN : 0;
        }
        return (row, values) -> {
            adjuster.adjust(zero, 0, fields, AdjustedTemperature.MINIMUM, row, 1, values);
            for (int column = 0; column < values.length; column++) {
                values[column] = values[column] == Float.POSITIVE_INFINITY ? Float.NaN
                        : values[column] + (float) nights.openShare() * adjustment.terms().water(row, column);
            }
        };
    }

    private void write(LayerDefinition layer, RowFiller filler) {
        if (!selection.contains(layer.id())) {
            return;
        }
        int rows = plan.target().rows();
        int columns = plan.target().columns();
        float[] values = new float[columns];
        try (RasterWriter writer = output.summary(layer, Optional.empty())) {
            int stripRows = Math.min(rows, output.rowsAtOnce());
            for (int row = 0; row < rows; row += stripRows) {
                int count = Math.min(stripRows, rows - row);
                float[] strip = new float[count * columns];
                for (int r = 0; r < count; r++) {
                    filler.fill(row + r, values);
                    System.arraycopy(values, 0, strip, r * columns, columns);
                }
                writer.write(0, row, count, strip);
            }
            writer.finish();
        }
    }
}
