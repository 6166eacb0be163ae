package org.wintersill.scenario;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.wintersill.elevation.ElevationAdjustment;
import org.wintersill.elevation.LaneAdjuster;
import org.wintersill.elevation.SourcePositions;
import org.wintersill.grid.Block;
import org.wintersill.grid.CoordinateOperation;
import org.wintersill.grid.GridGeometry;
import org.wintersill.problem.Problem;

/**
 * From the model's grid to rows of the observed grid. Definition, thread-safe; {@link #rows} begins a run.
 *
 * <p>Bilinear between cell centres as everywhere in the program (science 16.9), or conservative: the mean of the model's cells
 * weighted by the area that each shares with the observed cell, missing where less than half of it is covered.
 */
public final class Regridding {

    /** The two kinds. */
    public enum Kind {
        BILINEAR("bilinear"), CONSERVATIVE("conservative");

        private final String key;

        Kind(String key) {
            this.key = key;
        }

        public static Optional<Kind> named(String key) {
            return Arrays.stream(values()).filter(kind -> kind.key.equals(key)).findFirst();
        }

        public static List<String> keys() {
            return Arrays.stream(values()).map(kind -> kind.key).toList();
        }
    }

    private final SourcePositions positions;
    private final Block window;
    private final Overlaps across;
    private final Overlaps down;

    private Regridding(SourcePositions positions, Block window, Overlaps across, Overlaps down) {
        this.positions = positions;
        this.window = window;
        this.across = across;
        this.down = down;
    }

    /**
     * @param toModel coordinates of the observed grid to those of the model's
     * @param where file of the model, for messages
     * @throws org.wintersill.problem.ProblemException where the grids do not meet, or cannot be brought together conservatively
     */
    public static Regridding of(Kind kind, GridGeometry model, GridGeometry observed, CoordinateOperation toModel, String where) {
        SourcePositions positions = new SourcePositions(model, observed, toModel);
        Block window = positions.window().orElseThrow(() -> Problem.input("the model's grid nowhere meets the observed one: it covers "
                + model.describe() + "; the observations cover " + observed.describe(), where, "Check both reference systems")
                .asException());
        if (kind == Kind.BILINEAR) {
            return new Regridding(positions.within(window), window, null, null);
        }
        if (!positions.isSeparable()) {
            throw Problem.usage("conservative regridding needs one reference system for both grids; the model has "
                    + model.crs().label() + ", the observations " + observed.crs().label(), "scenario.regrid",
                    "Write regrid: bilinear").asException();
        }
        Overlaps across = Overlaps.ofColumns(observed, model);
        Overlaps down = Overlaps.ofRows(observed, model);
        Block whole = new Block(across.first(), down.first(), across.end() - across.first(), down.end() - down.first());
        return new Regridding(positions, whole, across, down);
    }

    /** The model's cells that observed rows from..to-1 need, in the model's grid; empty where they lie beyond it. */
    Optional<Block> needed(int from, int to) {
        int[] rows = across == null ? positions.sourceRows(from, to) : down.range(from, to);
        if (rows[1] <= rows[0]) {
            return Optional.empty();
        }
        int shift = across == null ? window.row() : 0;
        return Optional.of(new Block(window.column(), rows[0] + shift, window.columns(), rows[1] - rows[0]));
    }

    /** Room for one thread. */
    Rows rows() {
        return new Rows();
    }

    /** Brings days to observed rows. */
    final class Rows {
        private final LaneAdjuster bilinear = across == null ? new LaneAdjuster(ElevationAdjustment.interpolation(positions)) : null;

        /**
         * @param values the model's values in the block of {@link #needed}, beginning at {@code offset}; NaN for missing
         * @param out {@code [row * columns + column]} of the observed rows; NaN for missing
         */
        void bring(float[] values, int offset, Block block, int from, int to, float[] out) {
            if (bilinear == null) {
                conservative(values, offset, block, from, to, out);
                return;
            }
            bilinear.adjust(values, offset - (block.row() - window.row()) * window.columns(), 0, from, to - from, out);
            for (int i = 0; i < out.length; i++) {
                out[i] = out[i] == Float.POSITIVE_INFINITY ? Float.NaN : out[i];
            }
        }

        private void conservative(float[] values, int offset, Block block, int from, int to, float[] out) {
            int columns = positions.target().columns();
            for (int row = from; row < to; row++) {
                for (int column = 0; column < columns; column++) {
                    double total = 0;
                    double covered = 0;
                    for (int r = down.firstOf(row); r < down.endOf(row); r++) {
                        for (int c = across.firstOf(column); c < across.endOf(column); c++) {
                            float value = values[offset + (r - block.row()) * block.columns() + c - block.column()];
                            double weight = down.share(row, r) * across.share(column, c);
                            if (value == value) {
                                total += weight * value;
                                covered += weight;
                            }
                        }
                    }
                    out[(row - from) * columns + column] = covered >= 0.5 ? (float) (total / covered) : Float.NaN;
                }
            }
        }
    }
}
