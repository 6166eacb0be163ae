"""check_geotiff.py FILE.tif VALUES.f32 TYPE

Compares a written GeoTIFF with the values that went in, by GDAL and numpy alone:
VALUES.f32 holds little-endian float32 [band, row, column], NaN for missing; TYPE is
FLOAT32, INT16 or BYTE. Prints every difference; exit code 0 if there is none.
Needs python3-gdal and python3-numpy.
"""
import sys
import numpy as np
from osgeo import gdal

gdal.UseExceptions()
path, values, kind = sys.argv[1:4]
ds = gdal.Open(path)
bands, rows, columns = ds.RasterCount, ds.RasterYSize, ds.RasterXSize
want = np.fromfile(values, "<f4").reshape(bands, rows, columns)
want[~np.isfinite(want)] = np.nan
nodata = 0 if kind == "BYTE" else -9999
dtype = {"FLOAT32": "<f4", "INT16": "<i2", "BYTE": "u1"}[kind]
wrong = []


def check(ok, what):
    if not ok:
        wrong.append(what)


def pad(a):
    return np.pad(a, ((0, a.shape[0] % 2), (0, a.shape[1] % 2)), constant_values=np.nan)


def quads(a):
    a = pad(a)
    return np.stack([a[0::2, 0::2], a[0::2, 1::2], a[1::2, 0::2], a[1::2, 1::2]])


def halve(a):
    q = quads(a)
    if kind == "FLOAT32":
        n = np.sum(~np.isnan(q), axis=0)
        s = np.zeros(q.shape[1:])
        for k in range(4):  # in the order of the writer, in double
            s += np.where(np.isnan(q[k]), 0.0, q[k].astype("f8"))
        with np.errstate(invalid="ignore"):
            return (s / n).astype("f4")
    best = np.full(q.shape[1:], np.nan, "f4")
    most = np.zeros(q.shape[1:], int)
    for k in range(4):
        votes = np.sum(q == q[k], axis=0)
        if kind == "INT16":
            votes = np.where(np.isnan(q[k]), 0, 1)
        take = votes > most
        best = np.where(take, q[k], best)
        most = np.where(take, votes, most)
    return best


def stored(a):
    return np.where(np.isnan(a), nodata, a).astype(dtype)


for b in range(bands):
    band = ds.GetRasterBand(b + 1)
    name = "band %d" % (b + 1)
    check(band.GetNoDataValue() == nodata, name + " nodata %r" % band.GetNoDataValue())
    got = band.ReadAsArray()
    check(got.dtype == np.dtype(dtype), name + " type %s" % got.dtype)
    check(got.tobytes() == stored(want[b]).tobytes(), name + " values differ")
    meta = band.GetMetadata()
    ok = want[b][~np.isnan(want[b])].astype("f8")
    check(abs(float(meta["STATISTICS_VALID_PERCENT"]) - 100.0 * ok.size / want[b].size) < 1e-9, name + " valid percent")
    if ok.size:
        check(float(meta["STATISTICS_MINIMUM"]) == ok.min(), name + " minimum")
        check(float(meta["STATISTICS_MAXIMUM"]) == ok.max(), name + " maximum")
        scale = max(1e-30, np.abs(ok).max())
        check(abs(float(meta["STATISTICS_MEAN"]) - ok.mean()) <= 1e-12 * scale, name + " mean")
        check(abs(float(meta["STATISTICS_STDDEV"]) - ok.std()) <= 1e-10 * scale, name + " stddev")
    else:
        check("STATISTICS_MINIMUM" not in meta, name + " minimum of nothing")
    need, side = 0, max(rows, columns)
    while side > 256:
        side, need = (side + 1) // 2, need + 1
    check(band.GetOverviewCount() == need, name + " has %d overviews" % band.GetOverviewCount())
    level = want[b]
    for o in range(need):
        level = halve(level)
        check(band.GetOverview(o).ReadAsArray().tobytes() == stored(level).tobytes(), name + " overview %d" % o)

check(ds.GetMetadataItem("LAYOUT", "IMAGE_STRUCTURE") == "COG", "no COG layout")
try:
    from osgeo_utils.samples.validate_cloud_optimized_geotiff import validate
    warnings, errors, _ = validate(path, full_check=True)
    check(not errors and not warnings, "COG check: %s %s" % (errors, warnings))
except ImportError:
    pass
print("\n".join(wrong))
sys.exit(1 if wrong else 0)
