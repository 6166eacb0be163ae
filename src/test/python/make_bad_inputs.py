#!/usr/bin/python3
"""Writes one folder for each kind of input that must be refused.

  make_bad_inputs.py FOLDER

FOLDER/NAME/ holds run.yaml with its inputs (all small, all invented) and the file `expect`: accepted exit codes, a tab, a pattern that the message must contain. A file
`args`, where there is one, holds further arguments. The case `good` must succeed: it shows that the others fail for the reason meant.
"""
import datetime as dt
import gzip
import os
import sys

import netCDF4
import numpy as np
from osgeo import gdal, osr

gdal.UseExceptions()
FIRST, DAYS, ROWS, COLUMNS = dt.date(2010, 7, 1), 365, 5, 6
WEST, NORTH, STEP = -38.0, 50.5, 0.1
RUN = """title: refused
temperature:
  minimum: %(minimum)s
elevation:
  dem: dem.tif
  source-height: dem-mean
  lapse-rate: 4.5
cultivars: {files: [cultivars.yaml]}
outputs: {folder: out}
"""
CULTIVARS = """cultivars:
  - id: moss
    name: Moss (invented)
    species: grapevine
    organ: primary bud
    model: dated
    source: invented
    status: invented
    curve:
      - {date: 09-01, lt10: -4, lt50: -6, lt90: -8}
      - {date: 01-15, lt10: -18, lt50: -21, lt90: -24}
      - {date: 05-31, lt10: -3, lt50: -4, lt90: -5}
"""
LAEA = {"grid_mapping_name": "lambert_azimuthal_equal_area", "longitude_of_projection_origin": -38.0, "latitude_of_projection_origin": 50.0,
        "false_easting": 0.0, "false_northing": 0.0, "semi_major_axis": 6378137.0, "inverse_flattening": 298.257223563}


def minima(days=DAYS, rows=ROWS, columns=COLUMNS):
    rng = np.random.default_rng(5)
    season = 6 - 9 * np.cos(2 * np.pi * (np.arange(days) - 200) / 365)
    return (season[:, None, None] + rng.normal(0, 3, (days, rows, columns))).astype(np.float32)


def netcdf(path, days=None, values=None, fmt="NETCDF4", time_units=None, stamp=None, calendar="standard", lat=None, lon=None, mapping=None,
           projected=False, variable="tmin", units="degC", methods="time: minimum", fletcher=False, standard_name="air_temperature"):
    values = minima() if values is None else values
    n = len(values)
    with netCDF4.Dataset(path, "w", format=fmt) as nc:
        nc.Conventions = "CF-1.8"
        y, x = ("y", "x") if projected else ("lat", "lon")
        nc.createDimension("time", None)
        nc.createDimension(y, values.shape[1])
        nc.createDimension(x, values.shape[2])
        t = nc.createVariable("time", "f8", ("time",))
        t.units = time_units or "days since %s" % FIRST
        t.calendar = calendar
        t.standard_name = "time"
        t[:] = np.arange(n, dtype=float) if stamp is None else stamp
        lat = NORTH - STEP * (np.arange(values.shape[1]) + 0.5) if lat is None else lat
        lon = WEST + STEP * (np.arange(values.shape[2]) + 0.5) if lon is None else lon
        for key, a, geographic, plane, unit in ((y, lat, "latitude", "projection_y_coordinate", "degrees_north"),
                                                (x, lon, "longitude", "projection_x_coordinate", "degrees_east")):
            v = nc.createVariable(key, "f8", (key,))
            v.standard_name, v.units = (plane, "m") if projected else (geographic, unit)
            v[:] = a
        packing = dict(zlib=True, complevel=4, fletcher32=fletcher, chunksizes=(30,) + values.shape[1:]) if fmt.startswith("NETCDF4") else {}
        v = nc.createVariable(variable, "f4", ("time", y, x), fill_value=np.float32(-9999), **packing)
        if standard_name:
            v.standard_name = standard_name
        if units is not None:
            v.units = units
        if methods:
            v.cell_methods = methods
        if mapping:
            m = nc.createVariable("crs", "i4", ())
            m.setncatts(mapping)
            v.grid_mapping = "crs"
        v[:] = np.where(np.isnan(values), -9999, values)


def tiff(path, bands, names, west=WEST, north=NORTH, step=STEP, epsg=4326, unit="degC", fill=-9999.0, options=()):
    ds = gdal.GetDriverByName("GTiff").Create(path, bands[0].shape[1], bands[0].shape[0], len(bands), gdal.GDT_Float32, list(options))
    crs = osr.SpatialReference()
    crs.ImportFromEPSG(epsg)
    ds.SetSpatialRef(crs)
    ds.SetGeoTransform((west, step, 0, north, 0, -step))
    for k, a in enumerate(bands):
        b = ds.GetRasterBand(k + 1)
        b.WriteArray(a)
        b.SetNoDataValue(fill)
        b.SetUnitType(unit)
        if names[k]:
            b.SetDescription(names[k])


class Cases:
    def __init__(self, folder):
        self.folder = folder

    def start(self, name, codes, pattern, run=None, cultivars=CULTIVARS, minimum="'*.nc'", args=""):
        place = os.path.join(self.folder, name)
        os.makedirs(place)
        text = {"run.yaml": RUN % {"minimum": minimum} if run is None else run, "cultivars.yaml": cultivars, "expect": "%s\t%s\n" % (codes, pattern)}
        for file, content in text.items():
            with open(os.path.join(place, file), "w", encoding="utf-8") as f:
                f.write(content)
        if args:
            with open(os.path.join(place, "args"), "w") as f:
                f.write(args + "\n")
        z = np.add.outer(np.linspace(600, 200, ROWS * 4), np.linspace(0, 90, COLUMNS * 4)).astype(np.float32)
        tiff(os.path.join(place, "dem.tif"), [z], ["surface altitude"], step=STEP / 4, unit="m")
        return lambda file: os.path.join(place, file)

    def file(self, name, codes, pattern, **keys):
        """A case of one bad NetCDF."""
        netcdf(self.start(name, codes, pattern)("a.nc"), **keys)


def bad_netcdf(c):
    c.file("unit-absent", "3", "a.nc.*unit|unit.*a.nc", units=None)
    c.file("unit-wrong", "3", "hPa", units="hPa")
    c.file("unit-does-not-fit", "3", "a.nc|tmin", values=minima() + np.float32(273.15))
    c.file("kelvin-that-is-celsius", "3", "a.nc|tmin", units="K")
    c.file("duplicate-day", "3", "2010-07-11", stamp=np.r_[0:11, 10:DAYS - 1].astype(float))
    c.file("hourly", "3", "a.nc", time_units="hours since 2010-12-01", stamp=np.arange(DAYS, dtype=float))
    c.file("time-in-months", "3", "month", time_units="months since 2010-07-01")
    c.file("year-zero", "3", "0000|year 0|year zero", time_units="hours since 0000-01-01", stamp=17628000.0 + 24 * np.arange(DAYS))
    c.file("unknown-calendar", "3", "lunar", calendar="lunar")
    c.file("a-mean", "3", "mean", methods="time: mean", variable="tmean")
    c.file("a-maximum", "3", "maximum|tmax", methods="time: maximum", variable="tmax")
    c.file("no-temperature", "3", "a.nc", variable="rain", units="mm", standard_name="precipitation_amount", methods="time: sum")
    lon = WEST + STEP * (np.arange(COLUMNS) + 0.5)
    c.file("axis-turns-back", "3", "lon", lon=lon[[0, 1, 3, 2, 4, 5]])
    c.file("axis-uneven", "3", "lon", lon=lon + np.array([0, 0, 0, 0.04, 0.08, 0.3]))
    c.file("latitude-beyond-90", "3", "lat", lat=90.3 - STEP * np.arange(ROWS))
    c.file("zero-days", "3", "a.nc", values=minima(0))
    c.file("nothing-valid", "3", ".", values=np.full((DAYS, ROWS, COLUMNS), np.nan, np.float32))
    c.file("projected-without-mapping", "3", "grid_mapping|CRS|crs|projection", projected=True, lat=1000.0 * np.arange(ROWS)[::-1], lon=1000.0 * np.arange(COLUMNS))

    half, rest = minima()[:200], minima()[200:]
    later = "days since %s" % (FIRST + dt.timedelta(200))
    at = c.start("mixed-grids", "3", "b.nc")
    netcdf(at("a.nc"), values=half)
    netcdf(at("b.nc"), values=rest, time_units=later, lon=lon + 0.03)
    at = c.start("mixed-calendars", "3", "calendar")
    netcdf(at("a.nc"), values=half)
    netcdf(at("b.nc"), values=rest, time_units=later, calendar="noleap")
    at = c.start("mixed-crs", "3", "b.nc")
    plane = dict(projected=True, lat=5000.0 * np.arange(ROWS)[::-1], lon=5000.0 * np.arange(COLUMNS))
    netcdf(at("a.nc"), values=half, mapping=LAEA, **plane)
    netcdf(at("b.nc"), values=rest, time_units=later, mapping=dict(LAEA, latitude_of_projection_origin=40.0), **plane)
    at = c.start("same-days-twice", "3", "2010-07-01")
    netcdf(at("a.nc"))
    netcdf(at("b.nc"))


def damaged(c):
    def cut(name, fmt, share):
        path = c.start(name, "3", "a.nc")("a.nc")
        netcdf(path, fmt=fmt)
        os.truncate(path, int(os.path.getsize(path) * share))

    cut("cut-hdf5", "NETCDF4", 0.6)
    cut("cut-hdf5-early", "NETCDF4", 0.02)
    cut("cut-classic", "NETCDF3_CLASSIC", 0.7)
    cut("cut-64-bit", "NETCDF3_64BIT_OFFSET", 0.999)
    path = c.start("flipped-bytes", "3", "a.nc")("a.nc")
    netcdf(path, fletcher=True)
    size = os.path.getsize(path)
    with open(path, "r+b") as f:
        data = bytearray(f.read())
        # Deflate streams fill most of the file: its last third is data, not headers.
        for k in range(int(size * 0.5), int(size * 0.95), 97):
            data[k] ^= 0x5A
        f.seek(0)
        f.write(data)
    with open(c.start("empty-file", "3", "a.nc")("a.nc"), "w"):
        pass
    with open(c.start("login-page", "3", "a.nc.*(HTML|html|page)|(HTML|html|page).*a.nc")("a.nc"), "w") as f:
        f.write("<!DOCTYPE html><html><head><title>Sign in</title></head><body>Please sign in to download.</body></html>\n")
    at = c.start("gzipped", "3", "gzip|compressed")
    netcdf(at("b"))
    with open(at("b"), "rb") as f, gzip.open(at("a.nc"), "wb") as g:
        g.write(f.read())
    os.remove(at("b"))
    with open(c.start("random-bytes", "3", "a.nc")("a.nc"), "wb") as f:
        f.write(np.random.default_rng(1).bytes(50000))
    c.start("no-such-file", "2|3", "nowhere", minimum="nowhere-*.nc")

    days = [(FIRST + dt.timedelta(k)).isoformat() for k in range(DAYS)]
    at = c.start("tiff-cut", "3", "a.tif", minimum="a.tif")
    tiff(at("a.tif"), list(minima()), days)
    os.truncate(at("a.tif"), os.path.getsize(at("a.tif")) // 2)
    at = c.start("tiff-without-dates", "2|3", "date|first-day", minimum="a.tif")
    tiff(at("a.tif"), list(minima()), [""] * DAYS)
    at = c.start("tiff-duplicate-day", "3", "2010-07-02", minimum="a.tif")
    tiff(at("a.tif"), list(minima()), days[:2] + days[1:-1])


def bad_terrain(c):
    at = c.start("dem-elsewhere", "3", "dem.tif")
    netcdf(at("a.nc"))
    tiff(at("dem.tif"), [np.full((40, 40), 300, np.float32)], ["z"], west=120.0, north=-20.0, step=0.02, unit="m")
    at = c.start("dem-is-a-page", "3", "dem.tif")
    netcdf(at("a.nc"))
    with open(at("dem.tif"), "w") as f:
        f.write("<html><body>404</body></html>")
    at = c.start("dem-cut", "3", "dem.tif")
    netcdf(at("a.nc"))
    os.truncate(at("dem.tif"), os.path.getsize(at("dem.tif")) // 2)
    at = c.start("dem-all-void", "3", "dem.tif")
    netcdf(at("a.nc"))
    tiff(at("dem.tif"), [np.full((20, 24), -9999, np.float32)], ["z"], step=STEP / 4, unit="m")
    at = c.start("dem-absent", "2|3", "dem.tif")
    netcdf(at("a.nc"))
    os.remove(at("dem.tif"))


def bad_configuration(c):
    run = RUN % {"minimum": "'*.nc'"}

    def case(name, codes, pattern, old="", new="", cultivars=CULTIVARS, text=None, args=""):
        netcdf(c.start(name, codes, pattern, run=text or run.replace(old, new), cultivars=cultivars, args=args)("a.nc"))

    case("unknown-key", "2", "lapse-rate", "  lapse-rate:", "  lapse-rat:")
    case("unknown-section", "2", "elevation", "elevation:", "elevaton:")
    case("key-twice", "2", "title", "title: refused", "title: refused\ntitle: again")
    case("no-minimum", "2", "minimum", "  minimum: '*.nc'", "  variable: tmin")
    case("no-text-for-number", "2", "lapse-rate", "lapse-rate: 4.5", "lapse-rate: steep")
    case("not-yaml", "2", "run.yaml|line", "title: refused", "title: [refused")
    case("foreign-tag", "2", "run.yaml|line|tag", "title: refused", "title: !!javax.script.ScriptEngineManager [refused]")
    bomb = "a: &a [x,x,x,x,x,x,x,x,x]\n" + "".join("%s: &%s [%s]\n" % (n, n, ",".join(["*" + p] * 9)) for p, n in zip("abcdefgh", "bcdefghi"))
    case("alias-bomb", "2", ".", text=bomb + run)
    case("target-beyond-one", "2", "target", "outputs:", "statistics: {target: 1.5}\noutputs:")
    case("classes-out-of-order", "2", "classes", "outputs:", "classes: [0.2, 0.1, 0.05]\noutputs:")
    case("unknown-rule", "2", "rule", "outputs:", "missing-days: {rule: whatever}\noutputs:")
    case("unknown-cultivar", "2", "moss", "files: [cultivars.yaml]", "files: [cultivars.yaml], use: [mos]")
    case("unknown-flag", "2", "no-such-flag", args="--no-such-flag")
    # A cultivar file is configuration to some and input to others: either code will do.
    case("lt-out-of-order", "2|3", "moss|cultivars.yaml", cultivars=CULTIVARS.replace("lt50: -21", "lt50: -25"))
    case("curve-too-short", "2|3", "moss|cultivars.yaml", cultivars=CULTIVARS.replace("05-31", "03-31"))
    case("no-such-date", "2|3", "moss|cultivars.yaml|02-31", cultivars=CULTIVARS.replace("01-15", "02-31"))
    case("unknown-model", "2|3", "dated", cultivars=CULTIVARS.replace("model: dated", "model: datd"))
    case("cultivar-twice", "2|3", "moss", cultivars=CULTIVARS + CULTIVARS.split("\n", 1)[1])
    case("cultivar-leaves-the-folder", "2|3", r"\.\.", cultivars=CULTIVARS.replace("id: moss", "id: ../../moss"))
    case("cultivar-without-curve", "2|3", "curve", cultivars=CULTIVARS.split("    curve:")[0])
    case("lethal-temperature-absurd", "2|3", "moss|cultivars.yaml", cultivars=CULTIVARS.replace("lt90: -24", "lt90: -240"))


def bad_output_and_limits(c):
    at = c.start("folder-exists", "4|2", "overwrite")
    netcdf(at("a.nc"))
    os.mkdir(at("out"))
    with open(at("out/keep.txt"), "w") as f:
        f.write("mine\n")
    at = c.start("folder-under-a-file", "4", "out|plain", run=(RUN % {"minimum": "'*.nc'"}).replace("folder: out", "folder: plain/out"))
    netcdf(at("a.nc"))
    with open(at("plain"), "w") as f:
        f.write("a file, not a folder\n")
    at = c.start("beyond-memory", "5", "memory", args="--memory 64m")
    with netCDF4.Dataset(at("a.nc"), "w") as nc:           # never written: a few kB that promise a terabyte
        n = 30000
        nc.createDimension("time", 400)
        nc.createDimension("lat", n)
        nc.createDimension("lon", n)
        for name, size, units, first, step in (("time", 400, "days since 2010-07-01", 0, 1), ("lat", n, "degrees_north", 50.5, -1e-4), ("lon", n, "degrees_east", -38, 1e-4)):
            v = nc.createVariable(name, "f8", (name,), zlib=True)
            v.units = units
            v[:] = first + step * np.arange(size)
        v = nc.createVariable("tmin", "f4", ("time", "lat", "lon"), zlib=True, chunksizes=(1, 1000, 1000))
        v.units, v.standard_name, v.cell_methods = "degC", "air_temperature", "time: minimum"


def main(folder):
    c = Cases(folder)
    netcdf(c.start("good", "0", ".")("a.nc"))
    bad_netcdf(c)
    damaged(c)
    bad_terrain(c)
    bad_configuration(c)
    bad_output_and_limits(c)


if __name__ == "__main__":
    if len(sys.argv) != 2:
        sys.exit(__doc__)
    main(sys.argv[1])
