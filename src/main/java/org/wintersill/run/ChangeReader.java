package org.wintersill.run;

import java.util.Arrays;
import java.util.Optional;
import org.wintersill.comparison.FrequencyTest;
import org.wintersill.grid.Block;
import org.wintersill.io.geotiff.read.PlainRaster;

/** The layers of one cultivar in two finished folders, block by block. Used by one thread. */
final class ChangeReader implements AutoCloseable {
    private final Side[] sides;
    private final Optional<PlainRaster> elevations;
    private float[] elevation;

    ChangeReader(FinishedFolder base, FinishedFolder other, String cultivar, int killing) {
        sides = new Side[] {new Side(base, cultivar, killing), new Side(other, cultivar, killing)};
        elevations = base.layer(FinishedFolder.SHARED, SharedLayers.ELEVATION);
    }

    /** One of the two folders. */
    static final class Side implements AutoCloseable {
        private final PlainRaster margins;
        private final PlainRaster damages;
        private final PlainRaster frequencies;
        private final PlainRaster hardiness;
        private final PlainRaster winters;
        private final float killed;
        private float[] margin;
        private float[] damage;
        private float[] frequency;
        private float[] required;
        private int[] counts;
        private int[] events;

        Side(FinishedFolder folder, String cultivar, int killing) {
            margins = folder.required(cultivar, "margin-mean");
            damages = folder.required(cultivar, "damage-mean");
            frequencies = folder.required(cultivar, "damage-probability-" + killing);
            hardiness = folder.required(cultivar, "required-hardiness");
            winters = folder.winters(cultivar, "damage");
            // A winter of exactly that damage is a killing one, and its float may lie a digit below.
            killed = killing / 100f - 1e-6f;
        }

        private void read(Block block) {
            margin = values(margins, 0, block);
            damage = values(damages, 0, block);
            frequency = values(frequencies, 0, block);
            required = values(hardiness, 0, block);
            counts = new int[block.cells()];
            events = new int[block.cells()];
            float[] winter = new float[block.cells()];
            for (int band = 0; band < winters.bands(); band++) {
                winters.read(band, block, winter);
                for (int i = 0; i < winter.length; i++) {
                    counts[i] += winter[i] == winter[i] ? 1 : 0;
                    events[i] += winter[i] >= killed ? 1 : 0;
                }
            }
        }

        private static float[] values(PlainRaster raster, int band, Block block) {
            float[] values = new float[block.cells()];
            raster.read(band, block, values);
            return values;
        }

        float[] frequency() {
            return frequency;
        }

        float[] required() {
            return required;
        }

        @Override
        public void close() {
            margins.close();
            damages.close();
            frequencies.close();
            hardiness.close();
            winters.close();
        }
    }

    void read(Block block) {
        for (Side side : sides) {
            side.read(block);
        }
        elevation = new float[block.cells()];
        Arrays.fill(elevation, Float.NaN);
        elevations.ifPresent(raster -> raster.read(0, block, elevation));
    }

    /** 0 for the base, 1 for the other. */
    Side side(int number) {
        return sides[number];
    }

    /** Ground heights, m; NaN where there are none. */
    float[] elevation() {
        return elevation;
    }

    float[] marginChange() {
        return difference(sides[0].margin, sides[1].margin);
    }

    float[] damageChange() {
        return difference(sides[0].damage, sides[1].damage);
    }

    float[] frequencyChange() {
        return difference(sides[0].frequency, sides[1].frequency);
    }

    float[] requiredChange() {
        return difference(sides[0].required, sides[1].required);
    }

    private static float[] difference(float[] before, float[] after) {
        float[] difference = new float[before.length];
        for (int i = 0; i < difference.length; i++) {
            difference[i] = after[i] - before[i];
        }
        return difference;
    }

    /** p-values of the change of the frequency, negative where killing winters became fewer; NaN where one side has no winter. */
    void signedP(FrequencyTest test, float[] out, int offset) {
        for (int i = 0; i < sides[0].counts.length; i++) {
            int n1 = sides[0].counts[i];
            int n2 = sides[1].counts[i];
            int k1 = sides[0].events[i];
            int k2 = sides[1].events[i];
            float p = n1 == 0 || n2 == 0 ? Float.NaN : (float) test.pValue(k1, n1, k2, n2);
            out[offset + i] = (long) k2 * n1 < (long) k1 * n2 ? -p : p;
        }
    }

    @Override
    public void close() {
        for (Side side : sides) {
            side.close();
        }
        elevations.ifPresent(PlainRaster::close);
    }
}
