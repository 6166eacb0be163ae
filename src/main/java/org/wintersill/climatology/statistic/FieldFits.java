package org.wintersill.climatology.statistic;

import org.wintersill.climatology.WinterRecord;
import org.wintersill.climatology.extreme.ExtremeFit;
import org.wintersill.climatology.extreme.LowExtreme;

/** The fits of a field in every cell of a record; made once for all layers that need them. */
final class FieldFits {
    private final WinterRecord record;
    private final WinterField field;
    private final ExtremeFit[] fits;
    private final double[] room;

    private record Key(int level, ExtremeFit.Method method) {
    }

    private FieldFits(WinterRecord record, WinterField field, ExtremeFit.Method method) {
        this.record = record;
        this.field = field;
        room = new double[record.winters()];
        fits = new ExtremeFit[record.cells()];
        for (int cell = 0; cell < fits.length; cell++) {
            fits[cell] = ExtremeFit.of(room, sortedMaxima(cell), method);
        }
    }

    static FieldFits of(WinterRecord record, WinterField field, ExtremeChoices choices) {
        ExtremeFit.Method method = choices.method().orElseThrow();
        return record.derived(new Key(field.level(), method), () -> new FieldFits(record, field, method));
    }

    /** The fit of maxima of the negated field. */
    ExtremeFit at(int cell) {
        return fits[cell];
    }

    /** Fills {@link #room} with the negated values of a cell, ascending, and says how many there are. */
    int sortedMaxima(int cell) {
        int n = WinterRecord.valid(field.values(record), cell, room);
        LowExtreme.toSortedMaxima(room, n);
        return n;
    }

    /** Room for the values of one cell. */
    double[] room() {
        return room;
    }
}
