#!/usr/bin/python3
"""Holds the terrain indices to GDAL and to plain numpy on a real relief.

  check_terrain.py CLASSPATH        class folders, such as target/classes:target/test-classes

The relief is a window of etopo5 (Debian package ferret-datasets), once as if its cells were squares of 90 m, for gdaldem, and once with
the true sizes of its cells on a sphere, which narrow towards the pole. Prints `N passed, M failed`; without the data set it says so
and passes nothing.
"""
import os
import subprocess
import sys
import tempfile

import netCDF4
import numpy as np
from osgeo import gdal, osr

gdal.UseExceptions()
RELIEF = "/usr/share/ferret-vis/data/etopo5.cdf"
passed = failed = 0


def check(name, ours, other, tolerance):
    global passed, failed
    same = np.array_equal(np.isnan(ours), np.isnan(other))
    off = np.nanmax(np.abs(ours - other)) if same else float("nan")
    if same and off <= tolerance:
        passed += 1
        print("ok     %s: %d cells, largest difference %.2g" % (name, np.isfinite(ours).sum(), off))
    else:
        failed += 1
        print("FAILED %s: voids %s, largest difference %s" % (name, "agree" if same else "differ", off))


def window(west, east, south, north):
    with netCDF4.Dataset(RELIEF) as nc:
        rose = nc.variables["ROSE"]
        x = nc.variables[rose.dimensions[1]][:]
        y = nc.variables[rose.dimensions[0]][:]
        columns = np.where((x % 360 >= west) & (x % 360 <= east))[0]
        rows = np.where((y >= south) & (y <= north))[0]
        z = np.ma.filled(rose[rows, columns].astype("f4"), np.nan)
        y = np.asarray(y[rows])
    return (z[::-1], y[::-1]) if y[0] < y[-1] else (z, y)


def ours(classes, folder, z, width, tall, radius, shape):
    z.astype("<f4").tofile(os.path.join(folder, "height.f32"))
    width.astype("<f8").tofile(os.path.join(folder, "width.f64"))
    tall.astype("<f8").tofile(os.path.join(folder, "tall.f64"))
    subprocess.run(["java", "-cp", classes, "org.wintersill.elevation.terrain.IndexFiles", folder, str(z.shape[1]), str(radius), shape], check=True)
    return {n: np.fromfile(os.path.join(folder, n + ".f32"), "<f4").reshape(z.shape).astype("f8")
            for n in ("percentile", "above", "position", "slope", "curvature", "shore")}


def brute(z, width, tall, radius, shape):
    """Percentile, height above the lowest, position index: one shift of the whole grid after the other."""
    rows, columns = z.shape
    z = z.astype("f8")
    lower, equal, count, total = (np.zeros(z.shape) for _ in range(4))
    lowest = np.full(z.shape, np.inf)
    row = np.arange(rows)
    high, wide = int(radius / tall.min()) + 1, int(radius / width.min()) + 1
    for dy in range(-high, high + 1):
        for dx in range(-wide, wide + 1):
            a, b = abs(dx) * width, abs(dy) * tall
            limit = radius * (1 + 1e-9)
            reach = np.hypot(a, b) <= limit if shape == "disc" else (a <= limit) & (b <= limit)
            other = np.full(z.shape, np.nan)
            r0, r1, c0, c1 = max(0, -dy), min(rows, rows - dy), max(0, -dx), min(columns, columns - dx)
            if r0 >= r1 or c0 >= c1:
                continue
            other[r0:r1, c0:c1] = z[r0 + dy:r1 + dy, c0 + dx:c1 + dx]
            other[~reach[row]] = np.nan
            there = np.isfinite(other)
            lower += there & (other < z)
            equal += there & (other == z)
            count += there
            total += np.where(there, other, 0)
            lowest = np.where(there & (other < lowest), other, lowest)
    gone = np.isnan(z)
    with np.errstate(divide="ignore", invalid="ignore"):
        out = (lower + equal / 2) / count, z - lowest, z - (total - z) / (count - 1)
    return [np.where(gone, np.nan, v) for v in out]


def laplacian(z, width, tall):
    z = z.astype("f8")
    out = np.full(z.shape, np.nan)
    out[1:-1, 1:-1] = ((z[1:-1, :-2] + z[1:-1, 2:] - 2 * z[1:-1, 1:-1]) / width[1:-1, None] ** 2
                       + (z[:-2, 1:-1] + z[2:, 1:-1] - 2 * z[1:-1, 1:-1]) / tall[1:-1, None] ** 2)
    for dy in (-1, 0, 1):
        for dx in (-1, 0, 1):
            out[1:-1, 1:-1][np.isnan(z[1 + dy:z.shape[0] - 1 + dy, 1 + dx:z.shape[1] - 1 + dx])] = np.nan
    return out


def shore(z, width, tall):
    """Every cell against every water cell: distance from the centre to the nearest edge."""
    rows, columns = z.shape
    wr, wc = np.where(z <= 0)
    edge = np.concatenate([[0], np.cumsum(tall)])
    middle = (edge[:-1] + edge[1:]) / 2
    out = np.empty(z.shape)
    for r in range(rows):
        along = np.maximum(0, np.maximum(edge[wr] - middle[r], middle[r] - edge[wr + 1]))
        for c in range(columns):
            across = np.maximum(0, np.abs(wc - c) - 0.5) * width[r]
            out[r, c] = np.sqrt(np.min(along ** 2 + across ** 2))
    return out


def gdaldem(kind, z, cell, folder):
    path = os.path.join(folder, "relief.tif")
    tif = gdal.GetDriverByName("GTiff").Create(path, z.shape[1], z.shape[0], 1, gdal.GDT_Float32)
    srs = osr.SpatialReference()
    srs.ImportFromEPSG(3035)
    tif.SetProjection(srs.ExportToWkt())
    tif.SetGeoTransform((4000000, cell, 0, 3000000, 0, -cell))
    band = tif.GetRasterBand(1)
    band.SetNoDataValue(-9999)
    band.WriteArray(np.where(np.isnan(z), -9999, z))
    tif = band = None
    out = gdal.DEMProcessing(os.path.join(folder, kind + ".tif"), path, kind).ReadAsArray().astype("f8")
    return np.where(out == -9999, np.nan, out)


def main():
    classes = sys.argv[1]
    if not os.path.exists(RELIEF):
        print("skipped: ferret-datasets is not installed\n0 passed, 0 failed")
        return
    z, lat = window(5, 17, 43, 49)
    z[20, 30:33] = np.nan
    with tempfile.TemporaryDirectory() as folder:
        size = np.full(z.shape[0], 90.0)
        got = ours(classes, folder, z, size, size, 90, "square")
        check("slope, against gdaldem", got["slope"], gdaldem("slope", z, 90, folder), 2e-4)
        tpi = gdaldem("TPI", z, 90, folder)
        inner = np.full(z.shape, np.nan)
        inner[1:-1, 1:-1] = got["position"][1:-1, 1:-1]
        beside = np.isnan(tpi) & np.isfinite(inner)      # gdaldem gives nothing beside a void; we leave the void out
        print("       cells that only gdaldem leaves out: %d" % beside.sum())
        check("position index of the eight neighbours, against gdaldem TPI", np.where(beside, np.nan, inner), tpi, 2e-3)
        width = np.radians(1 / 12) * 6371000 * np.cos(np.radians(lat))
        tall = np.full(z.shape[0], np.radians(1 / 12) * 6371000)
        for shape, radius in (("disc", 40000), ("square", 30000)):
            got = ours(classes, folder, z, width, tall, radius, shape)
            for name, value in zip(("percentile", "above", "position"), brute(z, width, tall, radius, shape)):
                check("%s in a %s, against numpy" % (name, shape), got[name], value, 1e-3 if name == "position" else 1e-6)
        check("curvature, against numpy", got["curvature"], laplacian(z, width, tall), 1e-9)
        check("distance to the sea, against all pairs", got["shore"], shore(np.where(np.isnan(z), 1, z), width, tall), 0.1)
    print("%d passed, %d failed" % (passed, failed))
    sys.exit(1 if failed else 0)


main()
