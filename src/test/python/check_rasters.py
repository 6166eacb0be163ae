#!/usr/bin/python3
"""Checks every GeoTIFF of an output folder with GDAL and numpy.

  check_rasters.py OUT_FOLDER

One line a file: `ok name` or `FAILED name: reasons`. The rules are those of a Cloud Optimized GeoTIFF plus what a GIS user needs: unit, description, one no-data value,
exact statistics in the tags, overviews that stay within the band's own range, classes with names and colours. Exits 1 on a failure.
"""
import glob
import os
import re
import struct
import sys

import numpy as np
from osgeo import gdal
from osgeo_utils.samples.validate_cloud_optimized_geotiff import validate

gdal.UseExceptions()
SIZES = {1: 1, 2: 1, 3: 2, 4: 4, 5: 8, 7: 1, 11: 4, 12: 8, 16: 8}


def tags_of_first_image(path):
    """{tag: values or text} of the first directory, read without any library."""
    with open(path, "rb") as f:
        d = f.read()
    order = {b"II": "<", b"MM": ">"}[d[:2]]
    big = struct.unpack_from(order + "H", d, 2)[0] == 43
    at = struct.unpack_from(order + ("Q" if big else "I"), d, 8 if big else 4)[0]
    count = struct.unpack_from(order + ("Q" if big else "H"), d, at)[0]
    at += 8 if big else 2
    out = {}
    for _ in range(count):
        tag, kind = struct.unpack_from(order + "HH", d, at)
        n = struct.unpack_from(order + ("Q" if big else "I"), d, at + 4)[0]
        place, room = at + (12 if big else 8), 8 if big else 4
        length = SIZES.get(kind, 1) * n
        if length > room:
            place = struct.unpack_from(order + ("Q" if big else "I"), d, place)[0]
        raw = d[place:place + length]
        if kind == 2:
            out[tag] = raw.split(b"\0")[0].decode("utf-8")
        elif kind in (3, 4, 16):
            out[tag] = struct.unpack(order + "%d%s" % (n, {3: "H", 4: "I", 16: "Q"}[kind]), raw)
        else:
            out[tag] = raw
        at += 20 if big else 12
    return out


def check(path, winter_folder):
    wrong = []
    warnings, errors, _ = validate(path, full_check=True)
    wrong += ["COG: " + x for x in list(errors) + list(warnings)]
    t = tags_of_first_image(path)
    ds = gdal.Open(path)
    first = ds.GetRasterBand(1)
    whole = first.DataType != gdal.GDT_Float32

    def need(ok, text):
        if not ok:
            wrong.append(text)

    one = lambda tag, otherwise=None: t.get(tag, (otherwise,))[0]
    need(322 in t and one(322) % 16 == 0 and one(323) % 16 == 0, "T3 not tiled in multiples of 16")
    need(one(259) in (5, 8, 50000), "T5 compression %s" % one(259))
    bits, kind = t[258][0], one(339, 1)
    need(one(317, 1) == (3 if kind == 3 else 2 if bits > 8 else 1), "T6 predictor %s for %d bits of kind %d" % (one(317, 1), bits, kind))
    need(re.match(r"\d{4}:\d\d:\d\d \d\d:\d\d:\d\d$", t.get(306, "")), "T14 DateTime %r" % t.get(306))
    need(t.get(305) and t.get(270) and "\n" not in t[270], "T15 Software or ImageDescription")
    need(33550 in t and 33922 in t and 34264 not in t, "T17 pixel scale and tie point")
    keys = t.get(34735, ())
    meaning = {keys[k]: keys[k + 3] for k in range(4, len(keys) - 3, 4)}
    need(meaning.get(1025) == 1 and ds.GetMetadataItem("AREA_OR_POINT") == "Area", "T18 cells are points")
    need(ds.GetSpatialRef() is not None, "T19 no CRS")
    g = ds.GetGeoTransform()
    need(g[2] == 0 and g[4] == 0 and g[5] < 0, "T17 not north-up: %s" % (g,))
    if ds.GetSpatialRef() is not None and ds.GetSpatialRef().IsGeographic():
        need(-180.0000001 <= g[0] and g[0] + g[1] * ds.RasterXSize <= 180.0000001, "T20 longitudes beyond 180")
    need(ds.GetMetadataItem("LAYOUT", "IMAGE_STRUCTURE") == "COG", "T2 no COG layout note")
    need(not os.path.exists(path + ".ovr") and not os.path.exists(path + ".msk"), "T23 .ovr or .msk beside it")
    need(os.path.exists(path[:-4] + ".qml"), "S1 no .qml beside it")
    descriptions = [ds.GetRasterBand(k + 1).GetDescription() for k in range(ds.RasterCount)]
    need(all(descriptions) and len(set(descriptions)) == len(descriptions), "T10 band descriptions %s" % descriptions[:4])
    if winter_folder:
        need(all(re.match(r"\d{4}-\d\d$|\d{4}$", x) for x in descriptions), "band descriptions are no winter labels: %s" % descriptions[:4])
        need(descriptions == sorted(descriptions), "winters out of order")
    need(len({repr(ds.GetRasterBand(k + 1).GetNoDataValue()) for k in range(ds.RasterCount)}) == 1, "T9 several no-data values")
    if whole and first.DataType == gdal.GDT_Byte and first.GetColorInterpretation() == gdal.GCI_PaletteIndex:
        need(one(262) == 3 and 320 in t, "T21 palette")
        need(first.GetCategoryNames(), "T21 no category names")
    for k in range(ds.RasterCount):
        wrong += check_band(ds.GetRasterBand(k + 1), k + 1, whole)
    return wrong


def check_band(band, number, whole):
    wrong = []
    need = lambda ok, text: None if ok else wrong.append("band %d: %s" % (number, text))
    fill = band.GetNoDataValue()
    need(fill is not None and (fill == -9999 if band.DataType == gdal.GDT_Float32 else fill in (0, 255, -9999, 65535)), "T9 no-data value %s" % fill)
    need(band.GetScale() in (None, 1.0) and band.GetOffset() in (None, 0.0), "T13 scale or offset")
    unit = band.GetUnitType()
    values = band.ReadAsArray()
    need(np.isfinite(values.astype(float)).all(), "T9 NaN or infinity in the cells")
    cells = values[values != fill].astype(float)
    tags = band.GetMetadata()
    if band.GetColorInterpretation() != gdal.GCI_PaletteIndex:
        need(unit is not None, "T11 no unit")
        need(cells.size == 0 or "STATISTICS_MEAN" in tags, "T12 no statistics")
    if cells.size and "STATISTICS_MEAN" in tags:
        need(tags.get("STATISTICS_APPROXIMATE") != "YES", "T12 approximate statistics")
        for name, value in (("MINIMUM", cells.min()), ("MAXIMUM", cells.max()), ("MEAN", cells.mean()), ("STDDEV", cells.std())):
            told = float(tags["STATISTICS_" + name])
            need(abs(told - value) <= 1e-6 * max(1, abs(value)), "T12 STATISTICS_%s %.9g, numpy %.9g" % (name, told, value))
        told = float(tags.get("STATISTICS_VALID_PERCENT", "nan"))
        need(abs(told - 100.0 * cells.size / values.size) <= 0.01, "T12 STATISTICS_VALID_PERCENT %s, numpy %.4f" % (told, 100.0 * cells.size / values.size))
    longest, overviews, tile = max(values.shape), band.GetOverviewCount(), band.GetBlockSize()[0]
    wanted = 0
    while longest > tile:
        longest, wanted = (longest + 1) // 2, wanted + 1
    need(overviews >= wanted, "T4 %d overviews instead of %d" % (overviews, wanted))
    for k in range(overviews):
        small = band.GetOverview(k).ReadAsArray()
        small = small[small != fill].astype(float)
        if not small.size:
            continue
        if not cells.size:
            need(False, "T22 overview %d has values, the band none" % k)
            continue
        slack = 1e-6 * max(1, abs(cells.min()), abs(cells.max()))
        need(cells.min() - slack <= small.min() and small.max() <= cells.max() + slack, "T22 overview %d spans %g..%g, the band %g..%g" % (
            k, small.min(), small.max(), cells.min(), cells.max()))
        if band.DataType == gdal.GDT_Byte:
            need(set(np.unique(small)) <= set(np.unique(cells)), "T21 overview %d has classes that the band lacks" % k)
    return wrong


def main(folder):
    failed = 0
    paths = sorted(glob.glob(os.path.join(folder, "**", "*.tif"), recursive=True))
    if not paths:
        print("FAILED rasters: no .tif in the folder")
        failed = 1
    for path in paths:
        try:
            wrong = check(path, os.path.basename(os.path.dirname(path)) == "winters")
        except Exception as e:                     # a file that cannot even be read is a failed check, not a broken checker
            wrong = ["unreadable: %s" % e]
        failed += bool(wrong)
        name = "raster " + os.path.relpath(path, folder)
        print("FAILED %s: %s" % (name, "; ".join(wrong)[:600]) if wrong else "ok     " + name)
    return failed


if __name__ == "__main__":
    if len(sys.argv) != 2:
        sys.exit(__doc__)
    sys.exit(1 if main(sys.argv[1]) else 0)
