#!/usr/bin/python3
"""Makes the small GeoTIFF files of the tests of the GeoTIFF readers.

    /usr/bin/python3 src/test/python/geotiff_read_fixtures.py src/test/resources/geotiff-read

Needs GDAL's Python bindings (made with 3.6.2). All temperature files hold, unless their name says otherwise,
    t(day, row, column) = -20 + 1.5 day + 0.5 row - 0.25 column    degrees Celsius, day, row, column from 0
on 40 x 24 cells, row 0 in the north, with no value where (row + 2 column) % 17 == 0. All height files hold
    h(row, column) = 100 + 10 row + column                          metres
with voids where (row + 3 column) % 19 == 0.
"""
import os
import sys

import numpy as np
from osgeo import gdal, osr

gdal.UseExceptions()
gdal.SetConfigOption("GDAL_PAM_ENABLED", "NO")
OUT = sys.argv[1]
ROWS, COLUMNS = 24, 40
R, C = np.mgrid[0:ROWS, 0:COLUMNS]
HOLE = (R + 2 * C) % 17 == 0
VOID = (R + 3 * C) % 19 == 0
DRIVER = gdal.GetDriverByName("GTiff")


def temperature(day):
    return -20 + 1.5 * day + 0.5 * R - 0.25 * C


def system(text):
    srs = osr.SpatialReference()
    srs.SetFromUserInput(text)
    return srs


def write(name, bands, kind=gdal.GDT_Float32, options=(), crs="EPSG:4326", origin=(5.0, 48.0), cell=(0.1, -0.1), nodata=-9999,
          unit="degC", dates=("2003-01-15", "2003-01-16", "2003-01-17"), scale=None, mask=None, meta=None, transform=True):
    path = os.path.join(OUT, name)
    ds = DRIVER.Create(path, bands[0].shape[1], bands[0].shape[0], len(bands), kind, list(options))
    if crs:
        ds.SetProjection(system(crs).ExportToWkt())
    if transform:
        ds.SetGeoTransform((origin[0], cell[0], 0, origin[1], 0, cell[1]))
    for key, value in (meta or {}).items():
        ds.SetMetadataItem(key, value)
    if mask is not None:
        ds.CreateMaskBand(gdal.GMF_PER_DATASET)
    for i, values in enumerate(bands):
        band = ds.GetRasterBand(i + 1)
        if nodata is not None:
            band.SetNoDataValue(nodata)
        if unit:
            band.SetUnitType(unit)
        if dates:
            band.SetDescription(dates[i])
        if scale:
            band.SetScale(scale[0])
            band.SetOffset(scale[1])
        band.WriteArray(values)
    if mask is not None:
        ds.GetRasterBand(1).GetMaskBand().WriteArray(mask)
    ds = None
    return path


def celsius(days=3, hole=-9999.0, dtype=np.float32):
    return [np.where(HOLE, hole, temperature(d)).astype(dtype) for d in range(days)]


def tenths(days=3, hole=-9999):
    return [np.where(HOLE, hole, np.round(temperature(d) * 100)).astype(np.int16) for d in range(days)]


def main():
    os.makedirs(OUT, exist_ok=True)
    gdal.SetConfigOption("GDAL_TIFF_INTERNAL_MASK", "YES")
    strips = ["BLOCKYSIZE=7"]
    tiles = ["TILED=YES", "BLOCKXSIZE=16", "BLOCKYSIZE=16"]
    apart = ["INTERLEAVE=BAND"]
    write("none-strips.tif", celsius(), options=strips)
    write("none-tiles-apart.tif", celsius(), options=tiles + apart)
    for name, options in {"lzw": ["COMPRESS=LZW"], "lzw2": ["COMPRESS=LZW", "PREDICTOR=2"], "lzw3": ["COMPRESS=LZW", "PREDICTOR=3"],
                          "deflate": ["COMPRESS=DEFLATE"], "deflate2": ["COMPRESS=DEFLATE", "PREDICTOR=2"],
                          "deflate3": ["COMPRESS=DEFLATE", "PREDICTOR=3"], "packbits": ["COMPRESS=PACKBITS"],
                          "zstd": ["COMPRESS=ZSTD"], "zstd3": ["COMPRESS=ZSTD", "PREDICTOR=3"]}.items():
        write(name + "-strips.tif", celsius(), options=options + strips)
        write(name + "-tiles-apart.tif", celsius(), options=options + tiles + apart)
    for name, options in {"big-endian": strips, "big-endian-lzw2": ["COMPRESS=LZW", "PREDICTOR=2"] + tiles,
                          "big-endian-deflate3": ["COMPRESS=DEFLATE", "PREDICTOR=3"] + tiles + apart}.items():
        write(name + ".tif", celsius(), options=options + ["ENDIANNESS=BIG"])
    write("bigtiff.tif", celsius(), options=["BIGTIFF=YES", "COMPRESS=DEFLATE"] + tiles)
    write("bigtiff-big-endian.tif", celsius(), options=["BIGTIFF=YES", "ENDIANNESS=BIG"] + strips)
    write("float64.tif", celsius(dtype=np.float64), kind=gdal.GDT_Float64, options=["COMPRESS=DEFLATE", "PREDICTOR=3"] + tiles)
    write("float64-lzw2.tif", celsius(dtype=np.float64), kind=gdal.GDT_Float64, options=["COMPRESS=LZW", "PREDICTOR=2"] + apart)
    # Hundredths of a degree, so that the quarter steps of the formula are exact in integers.
    write("int16-scaled.tif", tenths(), kind=gdal.GDT_Int16, scale=(0.01, 0), options=["COMPRESS=LZW", "PREDICTOR=2"])
    write("int16-unscaled.tif", tenths(hole=-32768), kind=gdal.GDT_Int16, nodata=-32768, options=["COMPRESS=DEFLATE", "PREDICTOR=2"] + apart)
    write("int16-offset.tif", [np.where(HOLE, -9999, np.round((temperature(d) + 50) * 100)).astype(np.int16) for d in range(3)],
          kind=gdal.GDT_Int16, scale=(0.01, -50))
    # With this offset the no-data value would become a believable -9.99 if it were unpacked first.
    write("nodata-first.tif", [np.where(HOLE, -999, np.round(temperature(d) * 100)).astype(np.int16) for d in range(3)],
          kind=gdal.GDT_Int16, nodata=-999, scale=(0.01, 0))
    write("kelvin.tif", [np.where(HOLE, -9999, temperature(d) + 273.15).astype(np.float32) for d in range(3)], unit="K")
    write("fahrenheit.tif", [np.where(HOLE, -9999, temperature(d) * 1.8 + 32).astype(np.float32) for d in range(3)], unit="degF")
    write("kelvin-as-celsius.tif", [np.where(HOLE, -9999, temperature(d) + 273.15).astype(np.float32) for d in range(3)], unit="degC")
    write("no-unit.tif", celsius(), unit=None)
    write("nodata-nan.tif", celsius(hole=np.nan), nodata=float("nan"))
    lowest = float(np.finfo(np.float32).min)
    write("nodata-lowest.tif", celsius(hole=lowest), nodata=lowest)
    write("nodata-lowest-short.tif", celsius(hole=lowest), nodata=-3.4e38)
    write("nodata-undeclared.tif", celsius(), nodata=None)
    write("mask.tif", celsius(hole=0.0), nodata=None, mask=np.where(HOLE, 0, 255).astype(np.uint8), options=["COMPRESS=DEFLATE"] + tiles)
    # Only the first tile of the first band is in the file; nodata everywhere else.
    one = np.full((ROWS, COLUMNS), -9999, np.float32)
    one[:16, :16] = celsius(1)[0][:16, :16]
    write("sparse.tif", [one], options=tiles + ["SPARSE_OK=YES"], dates=("2003-01-15",))
    write("pixel-is-point.tif", celsius(), meta={"AREA_OR_POINT": "Point"})
    write("south-up.tif", [b[::-1] for b in celsius()], origin=(5.0, 45.6), cell=(0.1, 0.1), options=strips)
    write("unordered.tif", [celsius()[i] for i in (2, 0, 1)], dates=("tmin 20030117", "tmin 20030115", "tmin 20030116"))
    write("no-dates.tif", celsius(), dates=None)
    write("tmin_20030115.tif", celsius(1), dates=None)
    write("tmin_2003015.tif", celsius(1), dates=None)
    small = [b[:4, :6] for b in celsius(29)]
    write("tmin_2004_02.tif", small, dates=None)
    write("tmin_2003_02.tif", small, dates=None)
    write("twice.tif", celsius(), dates=("2003-01-15", "2003-01-16", "2003-01-15"))
    write("maximum.tif", celsius(1), dates=("daily maximum 2003-01-15",))
    write("no-crs.tif", celsius(), crs=None)
    write("no-place.tif", celsius(), transform=False)
    path = write("rotated.tif", celsius())
    ds = gdal.Open(path, gdal.GA_Update)
    ds.SetGeoTransform((5, 0.1, 0.02, 48, 0.02, -0.1))
    ds = None
    globe = np.round(np.tile(np.arange(36) * 1.0 - 18, (18, 1)))
    write("lon-0-360.tif", [globe.astype(np.float32)], origin=(0, 90), cell=(10, -10), dates=("2003-01-15",))
    write("overviews.tif", celsius(), options=tiles)
    ds = gdal.Open(os.path.join(OUT, "overviews.tif"), gdal.GA_Update)
    ds.BuildOverviews("AVERAGE", [2])
    ds = None
    for name in ("LERC", "LZMA"):
        write(name.lower() + ".tif", celsius(), options=["COMPRESS=" + name])
    write("jpeg.tif", [np.zeros((24, 40), np.uint8)], kind=gdal.GDT_Byte, options=["COMPRESS=JPEG"], nodata=None, dates=("2003-01-15",))
    gtiff_pages()

    height = 100.0 + 10 * R + C
    write("dem-int16.tif", [np.where(VOID, -32768, height).astype(np.int16)], kind=gdal.GDT_Int16, nodata=None, unit="m", dates=None,
          crs="EPSG:2056", origin=(2600000, 1200000), cell=(100, -100), options=["COMPRESS=DEFLATE", "PREDICTOR=2"])
    write("dem-feet.tif", [np.where(VOID, -9999, height / 0.3048).astype(np.float64)], kind=gdal.GDT_Float64, unit="ft", dates=None)
    write("dem-us-feet.tif", [np.where(VOID, -9999, height * 3937 / 1200).astype(np.float64)], kind=gdal.GDT_Float64,
          unit="US survey foot", dates=None)
    write("dem-no-unit.tif", [np.where(VOID, np.nan, height).astype(np.float32)], nodata=float("nan"), unit=None, dates=None)
    write("dem-vertical-feet.tif", [np.where(VOID, -9999, height * 3937 / 1200).astype(np.float64)], kind=gdal.GDT_Float64,
          unit=None, dates=None, crs="EPSG:4269+6360", options=["GEOTIFF_VERSION=1.1"])
    write("dem-mask.tif", [np.where(VOID, 0, height).astype(np.float32)], nodata=None, unit="m", dates=None,
          mask=np.where(VOID, 0, 255).astype(np.uint8))


def gtiff_pages():
    path = os.path.join(OUT, "pages.tif")
    if os.path.exists(path):
        os.remove(path)
    for i in range(2):
        options = ["APPEND_SUBDATASET=YES"] if i else []
        memory = gdal.GetDriverByName("MEM").Create("", COLUMNS, ROWS, 1, gdal.GDT_Float32)
        memory.SetProjection(system("EPSG:4326").ExportToWkt())
        memory.SetGeoTransform((5, 0.1, 0, 48, 0, -0.1))
        memory.GetRasterBand(1).WriteArray(temperature(i))
        DRIVER.CreateCopy(path, memory, options=options)


main()
