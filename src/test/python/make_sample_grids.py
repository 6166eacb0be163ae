#!/usr/bin/python3
"""Makes the sample grids of the invented basin Tarnmoor.

  make_sample_grids.py FOLDER

Place, relief, weather, cultivars and parcels are invented; the coordinates lie in the open ocean so that nobody takes the basin for a
real one. A fixed seed makes every value repeatable. Needs numpy, scipy, netCDF4 and GDAL's Python module.
The texts beside the data (run.yaml, cultivars.yaml, README.md) are written by hand and not made here.
"""
import datetime as dt
import os
import sys

import netCDF4
import numpy as np
from osgeo import gdal, ogr, osr
from scipy.ndimage import gaussian_filter

gdal.UseExceptions()
ogr.UseExceptions()
osr.UseExceptions()

SEED = 20240717
WEST, NORTH, STEP = -38.0, 50.5, 0.05         # outer north-west corner and cell size of the temperature grid, degrees
ROWS, COLUMNS, FINER = 18, 24, 10             # the terrain model is FINER times finer and aligned
FIRST, LAST = dt.date(2005, 1, 1), dt.date(2018, 12, 31)
FILES = ((2005, 2009), (2010, 2014), (2015, 2018))
LAPSE = 4.5                                   # K/km, also the lapse rate of run.yaml
FILL = np.int16(-32768)
DEM_FILL = -9999
TEXT_DATE = "2024-01-01T00:00:00.000Z"        # stands in the files instead of the clock

# Cold spells: first day, length, depth in K at the centre of the spell, what it is for.
SPELLS = (
    (dt.date(2008, 2, 8), 4, -4.0),           # an ordinary hard frost
    (dt.date(2010, 1, 11), 6, -12.5),         # kills in midwinter
    (dt.date(2012, 10, 23), 3, -10.0),        # kills before the buds have hardened
    (dt.date(2014, 2, 2), 4, -4.5),
    (dt.date(2017, 4, 19), 3, -10.0),         # kills after the buds have lost their hardiness
)
# Days that the files lack altogether, within the completeness rule (first two) and beyond it (last).
ABSENT = ((dt.date(2007, 1, 20), 2), (dt.date(2009, 3, 5), 4), (dt.date(2015, 12, 10), 7))
# Days present but masked in a few cells: first day, length, rows, columns. Six days in a row break the month.
MASKED = ((dt.date(2013, 2, 14), 6, slice(3, 6), slice(16, 20)), (dt.date(2006, 11, 3), 3, slice(10, 12), slice(4, 9)))


def terrain(rng):
    """Elevation in m on the fine grid [row, column], north-west first: valley floor, bench, two ridges, sea in the south-east."""
    rows, columns = ROWS * FINER, COLUMNS * FINER
    y, x = np.mgrid[0:rows, 0:columns]
    x, y = (x + 0.5) / columns, (y + 0.5) / rows
    axis = 0.50 + 0.14 * np.sin(2.6 * x + 0.4) - 0.10 * x          # the valley runs from west to east
    away = y - axis
    floor = 150 + 150 * (1 - x)
    north = 780 * np.clip(-away / 0.34, 0, 1.15) ** 1.3
    south = np.where(away > 0.10, 150 / (1 + np.exp(-(away - 0.12) / 0.012)), 0) + 620 * np.clip((away - 0.25) / 0.2, 0, 1.1) ** 1.2
    ridge = 260 * np.exp(-((y - 0.13 - 0.06 * np.sin(5 * x)) / 0.05) ** 2)
    rough = gaussian_filter(rng.standard_normal((rows, columns)), 6)
    rough *= 55 / rough.std()
    z = floor + np.where(away < 0, north, south) + ridge + rough * np.clip(np.abs(away) / 0.12, 0.08, 1)
    coast = np.hypot((1 - x) * 1.3, 1 - y) + 0.01 * rough / 55
    z *= np.clip((coast - 0.16) / 0.16, 0, 1)
    return np.round(np.maximum(z, 0)).astype(np.int16)


def days():
    """All dates of the record, absent ones left out."""
    gone = {first + dt.timedelta(k) for first, length in ABSENT for k in range(length)}
    whole = (FIRST + dt.timedelta(k) for k in range((LAST - FIRST).days + 1))
    return [d for d in whole if d not in gone]


def weather(rng, height):
    """Daily minimum and maximum in degC, [day, row, column], for every date of the unbroken record."""
    n = (LAST - FIRST).days + 1
    east = np.linspace(0, 1, COLUMNS)[None, :]
    south = np.linspace(0, 1, ROWS)[:, None]
    low, high = np.empty((2, n, ROWS, COLUMNS))
    synoptic, local = 0.0, np.zeros((ROWS, COLUMNS))
    yearly = {y: rng.normal(0, 0.7) for y in range(FIRST.year, LAST.year + 2)}
    for k in range(n):
        date = FIRST + dt.timedelta(k)
        phase = 2 * np.pi * (date.timetuple().tm_yday - 20) / 365.25
        winterly = 0.5 * (1 + np.cos(phase))
        synoptic = 0.72 * synoptic + 0.69 * rng.normal(0, 1)
        patch = gaussian_filter(rng.standard_normal((ROWS, COLUMNS)), 4)
        local = 0.5 * local + 0.8 * patch / max(patch.std(), 0.2)
        mean = 5.5 - 9.0 * np.cos(phase) + yearly[date.year + (date.month >= 7)] * winterly
        field = mean + (1.9 + 1.4 * winterly) * synoptic + 0.45 * local + 1.2 * (east - 0.5) + 0.8 * (south - 0.5)
        # Clear calm nights of high pressure hold cold air on the low ground.
        still = max(0.0, -synoptic - 0.8)
        field = field - LAPSE * height / 1000 - 0.9 * still * np.exp(-height / 250)
        for first, length, depth in SPELLS:
            place = (date - first).days
            if 0 <= place < length:
                field = field - 0.6 * (field - field.mean()) + depth * np.sin(np.pi * (place + 0.5) / length)
        span = 7.5 - 2.5 * winterly + 1.2 * np.tanh(-synoptic) + 0.3 * rng.normal(0, 1)
        low[k], high[k] = field, field + max(span, 1.5) + 0.0015 * (600 - height)
    return low, high


def write_daily(folder, name, years, values, sea, method, words, crs_wkt):
    """One CF file of packed tenths of a degree; `values` covers the unbroken record."""
    dates = [d for d in days() if years[0] <= d.year <= years[1]]
    with netCDF4.Dataset(os.path.join(folder, "%s-%d-%d.nc" % (name, *years)), "w", format="NETCDF4_CLASSIC") as nc:
        nc.Conventions = "CF-1.8"
        nc.title = "Tarnmoor, daily %s temperature (invented)" % words
        nc.institution = "none: an invented place"
        nc.source = "random numbers with a fixed seed"
        nc.history = "made by make_sample_grids.py"
        nc.comment = "No station, model or satellite stands behind these numbers."
        nc.createDimension("time", None)
        nc.createDimension("lat", ROWS)
        nc.createDimension("lon", COLUMNS)
        nc.createDimension("bnds", 2)
        t = nc.createVariable("time", "f8", ("time",), chunksizes=(512,), zlib=True)
        t.setncatts({"standard_name": "time", "axis": "T", "units": "days since 2000-01-01 00:00:00", "calendar": "standard",
                     "bounds": "time_bnds"})
        b = nc.createVariable("time_bnds", "f8", ("time", "bnds"), chunksizes=(512, 2), zlib=True)
        add_axes(nc, crs_wkt)
        v = nc.createVariable(name, "i2", ("time", "lat", "lon"), zlib=True, complevel=9, shuffle=True,
                              chunksizes=(92, ROWS, COLUMNS), fill_value=FILL)
        v.setncatts({"standard_name": "air_temperature", "long_name": "daily %s temperature at 2 m" % words, "units": "degC",
                     "scale_factor": 0.1, "add_offset": 0.0, "cell_methods": "time: %s" % method, "grid_mapping": "crs"})
        number = np.array([(d - dt.date(2000, 1, 1)).days for d in dates], float)
        t[:] = number + 0.5
        b[:] = np.stack([number, number + 1], 1)
        v.set_auto_maskandscale(False)
        v[:] = packed(dates, values, sea)


def packed(dates, values, sea):
    """Tenths of a degree as int16 with the sea and the masked days filled."""
    out = np.round(values[[(d - FIRST).days for d in dates]] * 10).astype(np.int16)
    out[:, sea] = FILL
    for first, length, rows, columns in MASKED:
        hit = [k for k, d in enumerate(dates) if 0 <= (d - first).days < length]
        for k in hit:
            out[k, rows, columns] = FILL
    return out


def add_axes(nc, crs_wkt):
    for name, n, axis, standard, units, first, step in (
            ("lat", ROWS, "Y", "latitude", "degrees_north", NORTH, -STEP), ("lon", COLUMNS, "X", "longitude", "degrees_east", WEST, STEP)):
        a = nc.createVariable(name, "f8", (name,))
        a.setncatts({"standard_name": standard, "axis": axis, "units": units})
        a[:] = np.round(first + step * (np.arange(n) + 0.5), 6)
    c = nc.createVariable("crs", "i4", ())
    c.setncatts({"grid_mapping_name": "latitude_longitude", "semi_major_axis": 6378137.0, "inverse_flattening": 298.257223563,
                 "longitude_of_prime_meridian": 0.0, "crs_wkt": crs_wkt})


def write_orography(folder, height, crs_wkt):
    with netCDF4.Dataset(os.path.join(folder, "orog.nc"), "w", format="NETCDF4_CLASSIC") as nc:
        nc.Conventions = "CF-1.8"
        nc.title = "Tarnmoor, ground height of the temperature grid (invented)"
        nc.history = "made by make_sample_grids.py: mean of the terrain model over each cell"
        nc.createDimension("lat", ROWS)
        nc.createDimension("lon", COLUMNS)
        add_axes(nc, crs_wkt)
        v = nc.createVariable("orog", "f4", ("lat", "lon"), zlib=True, fill_value=np.float32(-9999))
        v.setncatts({"standard_name": "surface_altitude", "long_name": "surface altitude", "units": "m", "cell_methods": "area: mean",
                     "grid_mapping": "crs"})
        v[:] = height.astype(np.float32)


def write_dem(folder, z, crs):
    step = STEP / FINER
    ds = gdal.GetDriverByName("GTiff").Create(os.path.join(folder, "dem.tif"), z.shape[1], z.shape[0], 1, gdal.GDT_Int16,
                                              ["TILED=YES", "BLOCKXSIZE=128", "BLOCKYSIZE=128", "COMPRESS=DEFLATE", "PREDICTOR=2", "ZLEVEL=9"])
    ds.SetSpatialRef(crs)
    ds.SetGeoTransform((WEST, step, 0, NORTH, 0, -step))
    ds.SetMetadata({"AREA_OR_POINT": "Area", "TIFFTAG_IMAGEDESCRIPTION": "Tarnmoor, surface altitude in m (invented)"})
    band = ds.GetRasterBand(1)
    band.SetNoDataValue(DEM_FILL)
    band.SetUnitType("m")
    band.SetDescription("surface altitude")
    band.WriteArray(z)


def write_winter_tiff(folder, low, sea, crs):
    """The minima of the winter 2010-11 once more, one band a night with the date as band description."""
    dates = [d for d in days() if dt.date(2010, 9, 1) <= d <= dt.date(2011, 5, 31)]
    values = packed(dates, low, sea)
    ds = gdal.GetDriverByName("GTiff").Create(os.path.join(folder, "tmin-2010-11.tif"), COLUMNS, ROWS, len(dates), gdal.GDT_Int16,
                                              ["COMPRESS=DEFLATE", "PREDICTOR=2", "ZLEVEL=9", "INTERLEAVE=BAND"])
    ds.SetSpatialRef(crs)
    ds.SetGeoTransform((WEST, STEP, 0, NORTH, 0, -STEP))
    ds.SetMetadata({"AREA_OR_POINT": "Area", "TIFFTAG_IMAGEDESCRIPTION": "Tarnmoor, daily minimum temperature 2010-11 (invented)"})
    for k, date in enumerate(dates):
        band = ds.GetRasterBand(k + 1)
        band.SetDescription(date.isoformat())
        band.SetUnitType("degC")
        band.SetScale(0.1)
        band.SetNoDataValue(float(FILL))
        band.WriteArray(values[k])


# Candidate parcels: id, name, centre (longitude, latitude), half width and half height in m, turn in degrees.
PARCELS = (
    ("P01", "Low Acre", (-37.82, 50.07), 900, 600, 12), ("P02", "Withy Flat", (-37.55, 50.05), 1500, 700, -8),
    ("P03", "Bench Head", (-37.62, 49.925), 1200, 500, 5), ("P04", "Long Bench", (-37.35, 49.94), 2600, 450, 3),
    ("P05", "Gallet Slope", (-37.48, 50.20), 800, 1100, 20), ("P06", "Upper Gallet", (-37.45, 50.27), 900, 900, 0),
    ("P07", "Sallow Field", (-37.12, 50.10), 1000, 1000, 45), ("P08", "Kiln Side", (-37.02, 50.18), 700, 1300, -15),
    ("P09", "Marram", (-37.03, 49.86), 1100, 800, 30), ("P10", "East Edge", (-36.805, 50.22), 1400, 700, 0),
    ("P11", "Thimble", (-37.27, 50.061), 45, 30, 0), ("P12", "South Fell", (-37.72, 49.72), 1700, 900, -25),
)


def write_parcels(folder):
    """Rectangles in web Mercator. East Edge lies partly outside the grid; Thimble is smaller than a cell; Withy Flat has two parts."""
    path = os.path.join(folder, "parcels.gpkg")
    if os.path.exists(path):
        os.remove(path)
    gdal.SetConfigOption("OGR_CURRENT_DATE", TEXT_DATE)
    geographic, mercator = osr.SpatialReference(), osr.SpatialReference()
    geographic.ImportFromEPSG(4326)
    geographic.SetAxisMappingStrategy(osr.OAMS_TRADITIONAL_GIS_ORDER)
    mercator.ImportFromEPSG(3857)
    move = osr.CoordinateTransformation(geographic, mercator)
    ds = ogr.GetDriverByName("GPKG").CreateDataSource(path, options=["VERSION=1.3"])
    layer = ds.CreateLayer("candidates", mercator, ogr.wkbMultiPolygon,
                           ["IDENTIFIER=Candidate parcels (invented)", "DESCRIPTION=Invented parcels in the invented basin Tarnmoor"])
    layer.CreateField(ogr.FieldDefn("parcel_id", ogr.OFTString))
    layer.CreateField(ogr.FieldDefn("name", ogr.OFTString))
    for number, name, (lon, lat), half_width, half_height, turn in PARCELS:
        stretch = 1 / np.cos(np.radians(lat))
        x, y, _ = move.TransformPoint(lon, lat)
        shape = ogr.Geometry(ogr.wkbMultiPolygon)
        for shift in ((0, 4500) if name == "Withy Flat" else (0,)):
            ring = ogr.Geometry(ogr.wkbLinearRing)
            for u, v in ((-1, -1), (1, -1), (1, 1), (-1, 1), (-1, -1)):
                a, b, c = u * half_width * stretch, v * half_height * stretch, np.radians(turn)
                ring.AddPoint_2D(round(x + shift + a * np.cos(c) - b * np.sin(c), 2), round(y + a * np.sin(c) + b * np.cos(c), 2))
            part = ogr.Geometry(ogr.wkbPolygon)
            part.AddGeometry(ring)
            shape.AddGeometry(part)
        feature = ogr.Feature(layer.GetLayerDefn())
        feature["parcel_id"], feature["name"] = number, name
        feature.SetGeometry(shape)
        layer.CreateFeature(feature)
    ds = None
    gdal.SetConfigOption("OGR_CURRENT_DATE", None)


def main(folder):
    os.makedirs(folder, exist_ok=True)
    rng = np.random.default_rng(SEED)
    crs = osr.SpatialReference()
    crs.ImportFromEPSG(4326)
    wkt = crs.ExportToWkt(["FORMAT=WKT2_2019"])
    z = terrain(rng)
    height = z.reshape(ROWS, FINER, COLUMNS, FINER).mean(axis=(1, 3))
    sea = (z == 0).reshape(ROWS, FINER, COLUMNS, FINER).mean(axis=(1, 3)) > 0.5
    low, high = weather(rng, height)
    for years in FILES:
        write_daily(folder, "tmin", years, low, sea, "minimum", "minimum", wkt)
        write_daily(folder, "tmax", years, high, sea, "maximum", "maximum", wkt)
    write_orography(folder, height, wkt)
    write_winter_tiff(folder, low, sea, crs)
    holes = z.copy()
    holes[118:121, 60:64] = DEM_FILL
    holes[40, 150] = DEM_FILL
    write_dem(folder, holes, crs)
    write_parcels(folder)


if __name__ == "__main__":
    if len(sys.argv) != 2:
        sys.exit(__doc__)
    main(sys.argv[1])
