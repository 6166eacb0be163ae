#!/usr/bin/python3
"""Grids for timing whole runs. Everything is invented and lies in the open ocean.

  make_bench_grids.py FOLDER NAME ROWS COLUMNS YEARS        for example: FOLDER S 200 200 10

Writes NAME-day.nc (float32, deflate 1 with shuffle, one chunk a day), NAME-block.nc (tenths in int16, chunks of 365 x 64 x 64), NAME-classic.nc (float32, 64-bit offset),
NAME-orog.nc, NAME-dem.tif (ten times finer), NAME-run.yaml for the run with the terrain model, and cultivars.yaml with five cultivars. Days run from 1 January 1991.
"""
import datetime as dt
import os
import sys

import netCDF4
import numpy as np
from osgeo import gdal, osr

gdal.UseExceptions()
FIRST = dt.date(1991, 1, 1)
WEST, NORTH, STEP, FINER = -39.0, 52.0, 0.05, 10
POOL = 24                                     # smooth patterns from which the weather of a day is mixed

CURVE = (("09-01", -4.0, 1.4), ("10-15", -10.0, 2.0), ("11-20", -16.5, 2.4), ("12-25", -23.0, 2.8), ("02-10", -23.0, 2.8), ("03-15", -17.0, 2.3),
         ("04-15", -8.5, 1.7), ("05-31", -3.2, 1.0))
CULTIVARS = (("ash", 0.0, 1.00), ("brock", 1.8, 0.92), ("clint", -1.2, 1.06), ("dell", 3.0, 0.88), ("esker", 0.6, 1.10))
RUN = """title: timing run on invented grids
temperature: {minimum: %(name)s-day.nc}
elevation: {dem: %(name)s-dem.tif, source-height: %(name)s-orog.nc, lapse-rate: 4.5}
cultivars: {files: [cultivars.yaml]}
outputs: {folder: out}
"""


def smooth(rng, rows, columns, length):
    """Random periodic field of unit spread whose patterns are about `length` cells wide."""
    k = np.hypot(np.fft.fftfreq(rows)[:, None], np.fft.rfftfreq(columns)[None, :])
    spectrum = np.fft.rfft2(rng.standard_normal((rows, columns))) * np.exp(-0.5 * (2 * np.pi * k * length / 2.5) ** 2)
    spectrum[0, 0] = 0
    field = np.fft.irfft2(spectrum, s=(rows, columns))
    return (field / field.std()).astype(np.float32)


def write_cultivars(path):
    with open(path, "w") as f:
        f.write("# Invented, for timing only.\ncultivars:\n")
        for name, shift, stretch in CULTIVARS:
            f.write("  - id: %s\n    name: %s (invented)\n    species: grapevine\n    organ: primary bud\n    model: dated\n    source: invented\n    status: invented\n    curve:\n"
                    % (name, name.title()))
            for date, lt50, half in CURVE:
                middle = lt50 * stretch + shift * lt50 / CURVE[3][1]
                f.write("      - {date: %s, lt10: %.2f, lt50: %.2f, lt90: %.2f}\n" % (date, middle + half, middle, middle - 0.9 * half))


def open_grid(path, kind, rows, columns):
    nc = netCDF4.Dataset(path, "w", format="NETCDF3_64BIT_OFFSET" if kind == "classic" else "NETCDF4")
    nc.Conventions = "CF-1.8"
    for name, n in (("time", None), ("lat", rows), ("lon", columns)):
        nc.createDimension(name, n)
    t = nc.createVariable("time", "f8", ("time",), **({} if kind == "classic" else {"chunksizes": (1024,)}))
    t.setncatts({"units": "days since %s" % FIRST, "calendar": "standard", "standard_name": "time", "axis": "T"})
    axes(nc, rows, columns)
    packing = {"day": dict(zlib=True, complevel=1, shuffle=True, chunksizes=(1, rows, columns)),
               "block": dict(zlib=True, complevel=1, shuffle=True, chunksizes=(365, min(64, rows), min(64, columns))), "classic": {}}[kind]
    fill = np.int16(-32768) if kind == "block" else np.float32(-9999)
    v = nc.createVariable("tmin", "i2" if kind == "block" else "f4", ("time", "lat", "lon"), fill_value=fill, **packing)
    v.setncatts({"units": "degC", "standard_name": "air_temperature", "cell_methods": "time: minimum"})
    if kind == "block":
        v.setncatts({"scale_factor": 0.1, "add_offset": 0.0})
    v.set_auto_maskandscale(False)
    return nc, t, v


def axes(nc, rows, columns):
    for name, a, standard, units in (("lat", NORTH - STEP * (np.arange(rows) + 0.5), "latitude", "degrees_north"),
                                     ("lon", WEST + STEP * (np.arange(columns) + 0.5), "longitude", "degrees_east")):
        v = nc.createVariable(name, "f8", (name,))
        v.setncatts({"standard_name": standard, "units": units})
        v[:] = a


def main(folder, name, rows, columns, years):
    os.makedirs(folder, exist_ok=True)
    at = lambda ending: os.path.join(folder, name + ending)
    rng = np.random.default_rng(11)
    write_cultivars(os.path.join(folder, "cultivars.yaml"))
    with open(at("-run.yaml"), "w") as f:
        f.write(RUN % {"name": name})
    z = np.round(np.clip(450 + 300 * smooth(rng, rows * FINER, columns * FINER, 60) + 60 * smooth(rng, rows * FINER, columns * FINER, 8), 0, None), 1)
    height = z.reshape(rows, FINER, columns, FINER).mean((1, 3)).astype(np.float32)
    ds = gdal.GetDriverByName("GTiff").Create(at("-dem.tif"), columns * FINER, rows * FINER, 1, gdal.GDT_Float32, ["TILED=YES", "COMPRESS=DEFLATE", "PREDICTOR=3"])
    crs = osr.SpatialReference()
    crs.ImportFromEPSG(4326)
    ds.SetSpatialRef(crs)
    ds.SetGeoTransform((WEST, STEP / FINER, 0, NORTH, 0, -STEP / FINER))
    ds.GetRasterBand(1).SetUnitType("m")
    ds.GetRasterBand(1).WriteArray(z)
    ds = None
    with netCDF4.Dataset(at("-orog.nc"), "w") as nc:
        nc.createDimension("lat", rows)
        nc.createDimension("lon", columns)
        axes(nc, rows, columns)
        v = nc.createVariable("orog", "f4", ("lat", "lon"), zlib=True)
        v.setncatts({"standard_name": "surface_altitude", "units": "m"})
        v[:] = height
    sea = np.hypot(np.arange(rows)[:, None] / rows - 1, np.arange(columns)[None, :] / columns) < 0.25
    wide = [smooth(rng, rows, columns, 60) for _ in range(POOL)]
    narrow = [smooth(rng, rows, columns, 4) for _ in range(POOL)]
    grids = {kind: open_grid(at("-%s.nc" % kind), kind, rows, columns) for kind in ("day", "block", "classic")}
    n = (dt.date(FIRST.year + years, 1, 1) - FIRST).days
    field, slope = np.zeros((rows, columns), np.float32), 0.0
    for start in range(0, n, 365):
        length = min(365, n - start)
        slab = np.empty((length, rows, columns), np.float32)
        for k in range(length):
            season = np.cos(2 * np.pi * (((FIRST + dt.timedelta(start + k)).timetuple().tm_yday - 20) / 365.25))
            new = np.roll(wide[rng.integers(POOL)], tuple(rng.integers(0, (rows, columns))), (0, 1))
            field = np.float32(0.75) * field + np.float32(0.66) * new
            slope = 0.6 * slope + 0.8 * rng.standard_normal()
            near = np.roll(narrow[rng.integers(POOL)], tuple(rng.integers(0, (rows, columns))), (0, 1))
            slab[k] = 3.5 - 11.0 * season + (3.6 + season) * field + 0.9 * near - (4.5 + 1.5 * slope) * height / 1000
        np.round(slab, 2, out=slab)
        packed = np.rint(slab * 10).astype(np.int16)
        slab[:, sea], packed[:, sea] = -9999, -32768
        for kind, (nc, t, v) in grids.items():
            t[start:start + length] = np.arange(start, start + length)
            v[start:start + length] = packed if kind == "block" else slab
    for nc, _, _ in grids.values():
        nc.close()


if __name__ == "__main__":
    if len(sys.argv) != 6:
        sys.exit(__doc__)
    main(sys.argv[1], sys.argv[2], *(int(a) for a in sys.argv[3:]))
