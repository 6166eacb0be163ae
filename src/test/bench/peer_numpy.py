#!/usr/bin/python3
"""The same job as a careful scientist would write it with numpy and netCDF4: one winter in memory at a time.

  peer_numpy.py FILE.nc CULTIVARS.yaml OUT_FOLDER

Seven layers a cultivar, one GeoTIFF each with seven bands: mean, 10th percentile and lowest margin, probability of 10, 50 and 90 percent killed, mean damage.
Imported by peer_numpy_dem.py for all but the loop over nights.
"""
import datetime as dt
import os
import sys

import netCDF4
import numpy as np
import yaml
from osgeo import gdal, osr

gdal.UseExceptions()
LN9 = np.float32(np.log(9.0))
BANDS = ("margin-mean", "margin-low", "margin-worst", "damage-probability-10", "damage-probability-50", "damage-probability-90", "damage-mean")


def cultivars(path):
    with open(path) as f:
        return {c["id"]: c["curve"] for c in yaml.load(f, yaml.BaseLoader)["cultivars"]}


def winters(nc):
    """(first day, length, first index) of each winter from 1 September to 31 May that the file holds whole."""
    start = netCDF4.num2date(nc["time"][0], nc["time"].units)
    start, n = dt.date(start.year, start.month, start.day), nc["time"].size
    out = []
    for year in range(start.year, start.year + n // 365 + 1):
        a, b = dt.date(year, 9, 1), dt.date(year + 1, 6, 1)
        if a >= start and (b - start).days <= n:
            out.append((a, (b - a).days, (a - start).days))
    return out


def nightly(curve, first, length):
    """LT10, LT50, LT90 of each night as float32 [3][night]."""
    place = [(dt.date(first.year + (int(r["date"][:2]) < 9), int(r["date"][:2]), int(r["date"][3:])) - first).days for r in curve]
    return np.array([np.interp(np.arange(length), place, [float(r[k]) for r in curve]) for k in ("lt10", "lt50", "lt90")], np.float32)


def fold(t, lt, state):
    """One night into the lowest margin to each level and the greatest exponent of damage."""
    lt10, lt50, lt90 = lt
    m = t - lt50
    np.fmin(state[0], m, out=state[0])
    np.fmin(state[1], t - lt10, out=state[1])
    np.fmin(state[2], t - lt90, out=state[2])
    m *= np.where(m > 0, -LN9 / (lt10 - lt50), -LN9 / (lt50 - lt90))
    np.fmax(state[3], m, out=state[3])


def begin(shape):
    state = np.full((4,) + shape, np.inf, np.float32)
    state[3] = -np.inf
    return state


def summarise(winters_, missing):
    """[winter][4][row][column] -> seven layers."""
    m, m10, m90, exponent = (winters_[:, k] for k in range(4))
    with np.errstate(over="ignore"):
        damage = 1 / (1 + np.exp(-exponent))
    layers = np.stack([m.mean(0), np.percentile(m, 10, axis=0), m.min(0), (m10 <= 0).mean(0), (m <= 0).mean(0), (m90 <= 0).mean(0), damage.mean(0)]).astype(np.float32)
    layers[:, missing] = -9999
    return layers


def write(path, layers, transform):
    ds = gdal.GetDriverByName("GTiff").Create(path, layers.shape[2], layers.shape[1], layers.shape[0], gdal.GDT_Float32,
                                              ["TILED=YES", "COMPRESS=DEFLATE", "PREDICTOR=3", "INTERLEAVE=BAND", "NUM_THREADS=2"])
    crs = osr.SpatialReference()
    crs.ImportFromEPSG(4326)
    ds.SetSpatialRef(crs)
    ds.SetGeoTransform(transform)
    for k, name in enumerate(BANDS):
        band = ds.GetRasterBand(k + 1)
        band.SetNoDataValue(-9999)
        band.SetDescription(name)
        band.WriteArray(layers[k])


def main(path, table, out):
    os.makedirs(out, exist_ok=True)
    nc = netCDF4.Dataset(path)
    v, curves = nc["tmin"], cultivars(table)
    shape = v.shape[1:]
    folded = {name: [] for name in curves}
    missing = None
    for first, length, at in winters(nc):
        t = np.ma.filled(v[at:at + length].astype(np.float32), np.nan)
        missing = np.isnan(t[0]) if missing is None else missing
        for name, curve in curves.items():
            lt10, lt50, lt90 = nightly(curve, first, length)[:, :, None, None]
            state = begin(shape)
            m = t - lt50
            state[0] = m.min(0)
            state[1] = (t - lt10).min(0)
            state[2] = (t - lt90).min(0)
            m *= np.where(m > 0, -LN9 / (lt10 - lt50), -LN9 / (lt50 - lt90))
            state[3] = m.max(0)
            folded[name].append(state)
    lon, lat = nc["lon"][:].data, nc["lat"][:].data
    dx, dy = (lon[-1] - lon[0]) / (lon.size - 1), (lat[-1] - lat[0]) / (lat.size - 1)
    for name, states in folded.items():
        write(os.path.join(out, name + ".tif"), summarise(np.stack(states), missing), (lon[0] - dx / 2, dx, 0, lat[0] - dy / 2, 0, dy))


if __name__ == "__main__":
    if len(sys.argv) != 4:
        sys.exit(__doc__)
    main(*sys.argv[1:])
