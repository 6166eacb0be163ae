#!/usr/bin/python3
"""Two rasters of one layer side by side in the colours of their style.

  draw_before_after.py BEFORE.tif AFTER.tif OUT.png

The colours are those of the .qml beside the first file. sample-grids/cold-pool.png is slate/margin-low.tif of run.yaml and of
run-cold-pool.yaml.
"""
import os
import sys
import xml.etree.ElementTree as xml

import numpy as np
from osgeo import gdal

gdal.UseExceptions()
GAP, SCALE = 6, 2


def colours(path):
    items = xml.parse(os.path.splitext(path)[0] + ".qml").getroot().iter("item")
    stops = [(float(i.get("value")), [int(i.get("color").lstrip("#")[k:k + 2], 16) for k in (0, 2, 4)]) for i in items]
    stops.sort()
    return np.array([s[0] for s in stops]), np.array([s[1] for s in stops], float)


def panel(path, values, rgb):
    raster = gdal.Open(path)
    band = raster.GetRasterBand(1)
    z = band.ReadAsArray().astype(float)
    gone = z == band.GetNoDataValue()
    out = np.stack([np.interp(z, values, rgb[:, k]) for k in range(3)]).astype(np.uint8)
    out[:, gone] = 255
    return out.repeat(SCALE, 1).repeat(SCALE, 2)


def main():
    before, after, out = sys.argv[1:4]
    values, rgb = colours(before)
    left, right = panel(before, values, rgb), panel(after, values, rgb)
    picture = np.concatenate([left, np.full((3, left.shape[1], GAP), 255, np.uint8), right], 2)
    memory = gdal.GetDriverByName("MEM").Create("", picture.shape[2], picture.shape[1], 3, gdal.GDT_Byte)
    memory.WriteArray(picture)
    gdal.GetDriverByName("PNG").CreateCopy(out, memory, options=["ZLEVEL=9"])
    if os.path.exists(out + ".aux.xml"):
        os.remove(out + ".aux.xml")


main()
