package org.wintersill.io.crs;

import org.wintersill.grid.CoordinateOperation;

/**
 * Coordinates of one system turned into those of another by way of longitude and latitude: inverse projection or
 * rotation, prime meridian, datum, projection or rotation. Holds nothing that changes, so any thread may use it.
 */
final class SystemOperation implements CoordinateOperation {
    private final SystemDefinition source;
    private final SystemDefinition target;
    private final DatumShift shift;
    private final PlaneProjection unproject;
    private final PlaneProjection project;
    private final PoleRotation unrotate;
    private final PoleRotation rotate;

    SystemOperation(SystemDefinition source, SystemDefinition target, DatumShift shift) {
        this.source = source;
        this.target = target;
        this.shift = shift;
        unproject = source.method() == null ? null : MapProjections.of(source);
        project = target.method() == null ? null : MapProjections.of(target);
        unrotate = source.pole() == null ? null : new PoleRotation(source.pole());
        rotate = target.pole() == null ? null : new PoleRotation(target.pole());
    }

    @Override
    public void transform(double[] xy, int points) {
        for (int i = 0; i < points; i++) {
            int at = 2 * i;
            boolean good = Double.isFinite(xy[at]) && Double.isFinite(xy[at + 1]) && toLonLat(xy, at) && fromLonLat(xy, at)
                    && Double.isFinite(xy[at]) && Double.isFinite(xy[at + 1]);
            if (!good) {
                xy[at] = Double.NaN;
                xy[at + 1] = Double.NaN;
            }
        }
    }

    private boolean toLonLat(double[] xy, int at) {
        if (unproject != null) {
            xy[at] *= source.metresPerUnit();
            xy[at + 1] *= source.metresPerUnit();
            if (!unproject.inverse(xy, at)) {
                return false;
            }
        }
        if (Math.abs(xy[at + 1]) > 90) {
            return false;
        }
        if (unrotate != null) {
            unrotate.toTrue(xy, at);
        }
        xy[at] = PoleRotation.wrap(xy[at] + source.base().meridian());
        if (!shift.isIdentity()) {
            shift.apply(xy, at);
        }
        return true;
    }

    private boolean fromLonLat(double[] xy, int at) {
        xy[at] = PoleRotation.wrap(xy[at] - target.base().meridian());
        if (rotate != null) {
            rotate.toRotated(xy, at);
        }
        if (project == null) {
            return true;
        }
        if (!project.forward(xy, at)) {
            return false;
        }
        xy[at] /= target.metresPerUnit();
        xy[at + 1] /= target.metresPerUnit();
        return true;
    }
}
