package org.wintersill.parcel;

/** Area of each class of a band in every parcel. */
public final class ClassTotals {
    private final int classes;
    private final double[] area;

    /** @param highest largest class number; classes are numbered from 0 */
    public ClassTotals(int parcels, int highest) {
        classes = highest + 1;
        area = new double[Math.multiplyExact(parcels, classes)];
    }

    /** @param values of the tile, whole numbers; NaN and numbers of no class count for nothing */
    public void add(CoveredCells cells, int tile, float[] values) {
        cells.eachRun(tile, (parcel, from, count, weight) -> {
            for (int i = from; i < from + count; i++) {
                int code = values[i] >= 0 ? (int) values[i] : -1;
                if (code >= 0 && code < classes) {
                    area[parcel * classes + code] += weight;
                }
            }
        });
    }

    /** Area of a class, km2. */
    public double area(int parcel, int code) {
        return area[parcel * classes + code];
    }

    /** Share of the area of all classes; NaN where there is none. */
    public double share(int parcel, int code) {
        double total = 0;
        for (int c = 0; c < classes; c++) {
            total += area[parcel * classes + c];
        }
        return total > 0 ? area[parcel * classes + code] / total : Double.NaN;
    }
}
