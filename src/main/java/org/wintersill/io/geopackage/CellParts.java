package org.wintersill.io.geopackage;

import java.util.Arrays;

/**
 * The connected parts of a raster of classes. Two cells belong together when they share an edge and a class. Parts are
 * numbered from 1 in the order of their first cells, row by row from the north-west; 0 is no class.
 *
 * <p>Two passes over the cells with a union of provisional numbers; time grows with the number of cells.
 */
final class CellParts {

    private final int[] partOfCell;
    private final byte[] classOfPart;
    private final int[] cellsOfPart;

    /** @param codes {@code [row * columns + column]}, 0 for none */
    CellParts(byte[] codes, int columns) {
        partOfCell = new int[codes.length];
        int[] parent = new int[64];
        int provisional = 0;
        for (int cell = 0; cell < codes.length; cell++) {
            if (codes[cell] == 0) {
                continue;
            }
            int left = cell % columns > 0 && codes[cell - 1] == codes[cell] ? partOfCell[cell - 1] : 0;
            int above = cell >= columns && codes[cell - columns] == codes[cell] ? partOfCell[cell - columns] : 0;
            if (left == 0 && above == 0) {
                if (++provisional == parent.length) {
                    parent = Arrays.copyOf(parent, parent.length * 2);
                }
                parent[provisional] = provisional;
                partOfCell[cell] = provisional;
            } else if (left == 0 || above == 0) {
                partOfCell[cell] = left + above;
            } else {
                int a = root(parent, left);
                int b = root(parent, above);
                // The smaller number survives, so that a root never comes after its members.
                parent[Math.max(a, b)] = Math.min(a, b);
                partOfCell[cell] = Math.min(a, b);
            }
        }
        int[] finalNumber = new int[provisional + 1];
        int parts = 0;
        for (int p = 1; p <= provisional; p++) {
            int root = root(parent, p);
            finalNumber[p] = root == p ? ++parts : finalNumber[root];
        }
        classOfPart = new byte[parts + 1];
        cellsOfPart = new int[parts + 1];
        for (int cell = 0; cell < codes.length; cell++) {
            int part = finalNumber[partOfCell[cell]];
            partOfCell[cell] = part;
            classOfPart[part] = part == 0 ? 0 : codes[cell];
            cellsOfPart[part]++;
        }
    }

    private static int root(int[] parent, int member) {
        int at = member;
        while (parent[at] != at) {
            parent[at] = parent[parent[at]];
            at = parent[at];
        }
        return at;
    }

    int count() {
        return classOfPart.length - 1;
    }

    int partOf(int cell) {
        return partOfCell[cell];
    }

    byte classOf(int part) {
        return classOfPart[part];
    }

    int cells(int part) {
        return cellsOfPart[part];
    }
}
