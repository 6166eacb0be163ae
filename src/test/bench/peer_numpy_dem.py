#!/usr/bin/python3
"""The job with a terrain model in numpy: night by night on the fine grid.

  peer_numpy_dem.py FILE.nc DEM.tif OROG.nc CULTIVARS.yaml OUT_FOLDER [ROWS]

With ROWS, only so many rows of the terrain model from the south are done, so that the job ends within minutes; rates are compared then.

Reduce, interpolate, restore at 4.5 K/km; layers as in peer_numpy.py. The coarse corners without value are left out and the weights rescaled only where the sea begins,
by carrying the interpolated weights of the cells that have values.
"""
import os
import sys

import netCDF4
import numpy as np
from osgeo import gdal

import peer_numpy as peer

LAPSE = np.float32(4.5e-3)


def plan(fine, coarse):
    """Neighbours and weight of the second along one axis; the containing coarse cell."""
    place = (np.arange(fine) + 0.5) * coarse / fine - 0.5
    held = np.clip(place, 0, coarse - 1)
    first = np.minimum(held.astype(int), coarse - 2)
    return first, first + 1, (held - first).astype(np.float32), np.floor(place + 0.5).astype(int)


def bilinear(field, rows, columns):
    r0, r1, wr, _ = rows
    c0, c1, wc, _ = columns
    a = field[r0] + wr[:, None] * (field[r1] - field[r0])
    return a[:, c0] + wc * (a[:, c1] - a[:, c0])


def main(path, dem, orography, table, out, wanted=None):
    os.makedirs(out, exist_ok=True)
    nc = netCDF4.Dataset(path)
    v, curves = nc["tmin"], peer.cultivars(table)
    z_source = netCDF4.Dataset(orography)["orog"][:].data.astype(np.float32)
    ds = gdal.Open(dem)
    z = ds.ReadAsArray()
    rows, columns = plan(z.shape[0], z_source.shape[0]), plan(z.shape[1], z_source.shape[1])
    top = 0 if wanted is None else max(0, z.shape[0] - int(wanted))
    z, rows = z[top:], tuple(part[top:] for part in rows)
    west, dx, _, north, _, dy = ds.GetGeoTransform()
    seen = ~np.ma.getmaskarray(v[0])
    weight = bilinear(seen.astype(np.float32), rows, columns)
    missing = ~seen[np.ix_(rows[3], columns[3])]
    weight[missing] = 1
    drop = LAPSE * z
    folded = {name: [] for name in curves}
    for first, length, at in peer.winters(nc):
        t = np.ma.filled(v[at:at + length].astype(np.float32), 0)
        t += LAPSE * z_source
        t[:, ~seen] = 0
        lt = {name: peer.nightly(curve, first, length) for name, curve in curves.items()}
        state = {name: peer.begin(z.shape) for name in curves}
        for night in range(length):
            fine = bilinear(t[night], rows, columns)
            fine /= weight
            fine -= drop
            for name in curves:
                peer.fold(fine, lt[name][:, night], state[name])
        for name in curves:
            folded[name].append(state[name])
    for name, states in folded.items():
        peer.write(os.path.join(out, name + ".tif"), peer.summarise(np.stack(states), missing), (west, dx, 0, north + top * dy, 0, dy))


if __name__ == "__main__":
    if len(sys.argv) not in (6, 7):
        sys.exit(__doc__)
    main(*sys.argv[1:])
