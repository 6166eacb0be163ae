package org.wintersill.io.geopackage;

import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import org.locationtech.jts.geom.Envelope;
import org.locationtech.jts.geom.Geometry;
import org.locationtech.jts.geom.Point;
import org.locationtech.jts.io.ByteOrderValues;
import org.locationtech.jts.io.WKBWriter;

/**
 * Geometries as the standard stores them (OGC 12-128r17, clause 2.1.3): a header with reference system and envelope,
 * then WKB; all of it little-endian. Points carry no envelope, and empty geometries say so in the header.
 */
public final class GeometryBlob {

    private static final int PLAIN_HEADER = 8;
    private static final int ENVELOPE = 4 * Double.BYTES;
    private static final int POINT_WKB = 1 + Integer.BYTES + 2 * Double.BYTES;
    private static final byte LITTLE_ENDIAN = 1;
    private static final byte WITH_ENVELOPE = 1 << 1;
    private static final byte EMPTY = 1 << 4;

    private GeometryBlob() {
    }

    /**
     * The blob of a geometry of two dimensions.
     *
     * @throws IllegalArgumentException when a coordinate is not finite
     */
    public static byte[] of(Geometry geometry, int srsId) {
        byte[] wkb = new WKBWriter(2, ByteOrderValues.LITTLE_ENDIAN).write(geometry);
        Envelope box = geometry.getEnvelopeInternal();
        if (!geometry.isEmpty()) {
            requireFinite(box.getMinX() + box.getMaxX() + box.getMinY() + box.getMaxY());
        }
        boolean envelope = !geometry.isEmpty() && !(geometry instanceof Point);
        byte flags = (byte) (LITTLE_ENDIAN | (envelope ? WITH_ENVELOPE : 0) | (geometry.isEmpty() ? EMPTY : 0));
        ByteBuffer blob = header(PLAIN_HEADER + (envelope ? ENVELOPE : 0) + wkb.length, flags, srsId);
        if (envelope) {
            blob.putDouble(box.getMinX()).putDouble(box.getMaxX()).putDouble(box.getMinY()).putDouble(box.getMaxY());
        }
        return blob.put(wkb).array();
    }

    /** The blob of a point, without a geometry object: tables of cells have millions. */
    public static byte[] point(double x, double y, int srsId) {
        requireFinite(x + y);
        return header(PLAIN_HEADER + POINT_WKB, LITTLE_ENDIAN, srsId)
                .put(LITTLE_ENDIAN).putInt(1).putDouble(x).putDouble(y).array();
    }

    private static ByteBuffer header(int length, byte flags, int srsId) {
        return ByteBuffer.allocate(length).order(ByteOrder.LITTLE_ENDIAN)
                .put((byte) 'G').put((byte) 'P').put((byte) 0).put(flags).putInt(srsId);
    }

    private static void requireFinite(double sum) {
        if (!Double.isFinite(sum)) {
            throw new IllegalArgumentException("a geometry has coordinates that are not finite");
        }
    }
}
