#!/usr/bin/python3
"""Lets GDAL compare the forms of reference systems: for each NAME.wkt1 in a folder NAME.wkt2, NAME.tif and NAME.nc.wkt, where
there are such files, must be the same system. Prints one line a difference; exit code 1 if there is any."""
import glob
import os
import sys

from osgeo import gdal, osr

gdal.UseExceptions()
osr.UseExceptions()
OPTIONS = ["IGNORE_DATA_AXIS_TO_SRS_AXIS_MAPPING=YES", "CRITERION=EQUIVALENT_EXCEPT_AXIS_ORDER_GEOGCRS"]


def system(text):
    srs = osr.SpatialReference()
    srs.ImportFromWkt(text)
    return srs


bad = 0
for path in sorted(glob.glob(os.path.join(sys.argv[1], "*.wkt1"))):
    name = os.path.basename(path)[:-5]
    first = system(open(path, encoding="utf-8").read())
    others = {"wkt2": path[:-1] + "2", "code": path[:-4] + "code", "tif": path[:-4] + "tif"}
    for kind, other in others.items():
        if not os.path.exists(other):
            continue
        if kind == "tif":
            second = gdal.Open(other).GetSpatialRef()
        elif kind == "code":
            second = osr.SpatialReference()
            second.SetFromUserInput(open(other, encoding="utf-8").read())
        else:
            second = system(open(other, encoding="utf-8").read())
        if not second or not first.IsSame(second, OPTIONS):
            bad += 1
            print("%s: %s differs\n  %s\n  %s" % (name, kind, first.ExportToWkt(["FORMAT=WKT2"]), second and second.ExportToWkt(["FORMAT=WKT2"])))
sys.exit(1 if bad else 0)
