#!/usr/bin/python3
"""check_parcels.py OUT_FOLDER PARCELS_FOLDER PARCELS_FILE

Holds the result of `wintersill parcels` to GDAL: every parcel is rasterised at least 20 times finer than the grid (finer for small
ones, so that its edge is no larger share of it), and covered area, means of layers and damage of each winter are worked out again from
the GeoTIFFs. Agreement: areas within 0.1 %, means within 0.1 % of their value or of their spread in the parcel, the larger of the two. Then the tables
are opened by other programs, where these are installed: the CSV files by LibreOffice, the pages by Chromium.

One line a check, `ok name` or `FAILED name: reason`; ends with `N passed, N failed`; exits 1 on a failure.
"""
import csv
import json
import os
import re
import shutil
import subprocess
import sys
import tempfile
import zipfile

import numpy as np
from osgeo import gdal, ogr, osr

gdal.UseExceptions()
ogr.UseExceptions()
FINER = 20
FEWEST_FINE_CELLS = 4_000_000
E2 = 0.00669437999014132          # WGS 84
passed = failed = 0


def say(name, reason=""):
    global passed, failed
    if reason:
        failed += 1
        print("FAILED %s: %s" % (name, str(reason)[:300]))
    else:
        passed += 1
        print("ok     " + name)


def strip_area(north, south):
    """Relative area on the ellipsoid between two latitudes: Snyder 1987, equation 3-12."""
    e = np.sqrt(E2)
    def q(lat):
        s = np.sin(np.radians(lat))
        return (1 - E2) * (s / (1 - E2 * s * s) - np.log((1 - e * s) / (1 + e * s)) / (2 * e))
    return q(north) - q(south)


def band(path, number=1):
    source = gdal.Open(path)
    data = source.GetRasterBand(number).ReadAsArray().astype(float)
    data[data == source.GetRasterBand(number).GetNoDataValue()] = np.nan
    return data


def weights(geometry, transform, columns, rows, grid):
    """Covered area of each cell of the block that the parcel meets, and the block's place."""
    west, east, south, north = geometry.GetEnvelope()
    x0, dx, _, y0, _, dy = transform
    left = max(0, int(np.floor((west - x0) / dx)))
    right = min(columns, int(np.ceil((east - x0) / dx)))
    top = max(0, int(np.floor((north - y0) / dy)))
    bottom = min(rows, int(np.ceil((south - y0) / dy)))
    if left >= right or top >= bottom:
        return None
    finer = max(FINER, int(np.ceil(np.sqrt(FEWEST_FINE_CELLS / ((right - left) * (bottom - top))))))
    target = gdal.GetDriverByName("MEM").Create("", (right - left) * finer, (bottom - top) * finer, 1, gdal.GDT_Byte)
    target.SetSpatialRef(grid)
    target.SetGeoTransform((x0 + left * dx, dx / finer, 0, y0 + top * dy, 0, dy / finer))
    memory = ogr.GetDriverByName("Memory").CreateDataSource("")
    layer = memory.CreateLayer("one", grid, ogr.wkbUnknown)
    feature = ogr.Feature(layer.GetLayerDefn())
    feature.SetGeometry(geometry)
    layer.CreateFeature(feature)
    gdal.RasterizeLayer(target, [1], layer, burn_values=[1])
    inside = target.ReadAsArray().astype(float)
    if grid.IsGeographic():
        edges = y0 + top * dy + np.arange(inside.shape[0] + 1) * dy / finer
        inside *= strip_area(edges[:-1], edges[1:])[:, None]
    shape = (bottom - top, finer, right - left, finer)
    return inside.reshape(shape).sum(axis=(1, 3)), slice(top, bottom), slice(left, right)


def compare(out, folder, parcels_file):
    with open(os.path.join(folder, "parcels.json"), encoding="utf-8") as f:
        parcels = json.load(f)["parcels"]
    first = gdal.Open(os.path.join(out, parcels[0]["cultivars"][0]["id"], "winters", "margin.tif"))
    transform, columns, rows = first.GetGeoTransform(), first.RasterXSize, first.RasterYSize
    grid = first.GetSpatialRef()
    grid.SetAxisMappingStrategy(osr.OAMS_TRADITIONAL_GIS_ORDER)
    source = ogr.Open(parcels_file)
    layer = source.GetLayer(0)
    own = layer.GetSpatialRef()
    own.SetAxisMappingStrategy(osr.OAMS_TRADITIONAL_GIS_ORDER)
    change = osr.CoordinateTransformation(own, grid)
    worst_area = worst_mean = worst_damage = compared = 0
    for feature, said in zip(layer, parcels):
        geometry = feature.GetGeometryRef()
        # GDAL mends crossing rings by another rule than JTS, so repaired parcels are no measure.
        if geometry is None or not said["cells"] or any("repaired" in warning for warning in said["warnings"]):
            continue
        geometry = geometry.MakeValid()
        geometry.Segmentize(abs(transform[1]) * (20000 if grid.IsGeographic() and not own.IsGeographic() else 0.2))
        geometry.Transform(change)
        found = weights(geometry, transform, columns, rows, grid)
        if found is None:
            continue
        weight, down, across = found
        compared += 1
        for cultivar in said["cultivars"]:
            for name in ("margin-mean", "damage-mean", "margin-low"):
                values = band(os.path.join(out, cultivar["id"], name + ".tif"))[down, across]
                there = ~np.isnan(values)
                if not (weight * there).sum() > 0:
                    continue
                mean = np.nansum(weight * values) / (weight * there).sum()
                spread = np.nanmax(values[weight > 0]) - np.nanmin(values[weight > 0])
                off = abs(mean - cultivar["layers"][name]["mean"]) / max(spread, abs(mean), 1e-3)
                worst_mean = max(worst_mean, off)
            for winter, damage in enumerate(cultivar["damage"]):
                if damage is None:
                    continue
                values = band(os.path.join(out, cultivar["id"], "winters", "damage.tif"), winter + 1)[down, across]
                mean = np.nansum(weight * values) / (weight * ~np.isnan(values)).sum()
                worst_damage = max(worst_damage, abs(mean - damage))
        valued = ~np.isnan(band(os.path.join(out, said["cultivars"][0]["id"], "margin-mean.tif"))[down, across])
        # The area in an equal-area plane that touches the parcel's middle.
        middle = geometry.Centroid()
        plane = osr.SpatialReference()
        if grid.IsGeographic():
            plane.ImportFromProj4("+proj=laea +lat_0=%.8f +lon_0=%.8f +ellps=WGS84 +units=m" % (middle.GetY(), middle.GetX()))
            flat = geometry.Clone()
            flat.Transform(osr.CoordinateTransformation(grid, plane))
        else:
            flat = geometry
        area = flat.GetArea() / 1e4
        worst_area = max(worst_area, abs(said["area-ha"] / area - 1))
        share = (weight * valued).sum() / weight.sum()
        if said["covered-share"] > 0.9999 and share < 0.999:
            say("covered share of " + said["parcel"], "GDAL finds %.4f" % share)
    say("%d parcels were compared" % compared, "" if compared >= 10 else "too few")
    say("areas agree with an equal-area plane within 0.1 %%, worst %.5f %%" % (100 * worst_area), "" if worst_area < 1e-3 else worst_area)
    say("means of layers agree with GDAL within 0.1 %%, worst %.4f %%" % (100 * worst_mean), "" if worst_mean < 1e-3 else worst_mean)
    say("damage of each winter agrees within 0.001, worst %.6f" % worst_damage, "" if worst_damage < 1e-3 else worst_damage)


def tables(folder):
    for name in ("parcels.csv", "parcel-cultivars.csv", "parcel-winters.csv", "parcel-classes.csv"):
        with open(os.path.join(folder, name), encoding="utf-8", newline="") as f:
            rows = list(csv.reader(f))
        widths = {len(row) for row in rows}
        say("%s: %d rows of one width" % (name, len(rows) - 1), "" if len(widths) == 1 and len(rows) > 1 else widths)
        if shutil.which("soffice"):
            with tempfile.TemporaryDirectory() as scratch:
                subprocess.run(["soffice", "--headless", "-env:UserInstallation=file://" + scratch + "/profile", "--convert-to", "xlsx", "--outdir", scratch,
                                os.path.join(folder, name)], capture_output=True, timeout=300)
                book = os.path.join(scratch, name.replace(".csv", ".xlsx"))
                found = 0
                if os.path.exists(book):
                    with zipfile.ZipFile(book) as z:
                        found = len(re.findall(r"<row ", z.read("xl/worksheets/sheet1.xml").decode("utf-8")))
                say("LibreOffice opens " + name, "" if found == len(rows) else "%d of %d rows" % (found, len(rows)))
        else:
            print("skipped: LibreOffice is not installed")


def pages(folder):
    sheets = sorted(os.listdir(os.path.join(folder, "sheets")))
    for name in sheets[:3]:
        path = os.path.join(folder, "sheets", name)
        with open(path, encoding="utf-8") as f:
            text = f.read()
        outside = [url for url in re.findall(r"(?:href|src)=[\"']([^\"']*)", text) if not url.startswith("data:")]
        say(name + " needs no network and has no script", "" if not outside and "<script" not in text else outside)
        say(name + " carries the caution", "" if "no substitute for on-site loggers" in text else "missing")
        if shutil.which("chromium"):
            with tempfile.TemporaryDirectory() as scratch:
                shot = os.path.join(scratch, "page.png")
                done = subprocess.run(["chromium", "--headless", "--no-sandbox", "--disable-gpu", "--user-data-dir=" + scratch, "--enable-logging=stderr",
                                       "--screenshot=" + shot, "--window-size=1000,1800", "file://" + os.path.abspath(path)], capture_output=True,
                                      text=True, timeout=300)
                trouble = [line for line in done.stderr.splitlines() if "CONSOLE" in line]
                say("Chromium shows %s without a word on its console" % name, "" if os.path.exists(shot) and not trouble else trouble or "no picture")
        else:
            print("skipped: Chromium is not installed")


if __name__ == "__main__":
    if len(sys.argv) != 4:
        sys.exit(__doc__)
    compare(sys.argv[1], sys.argv[2], sys.argv[3])
    tables(sys.argv[2])
    pages(sys.argv[2])
    print("%d passed, %d failed" % (passed, failed))
    sys.exit(1 if failed else 0)
