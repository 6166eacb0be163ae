"""check_winters.py FILE.nc projected|geographic|rotated

Reads a file written by CfWinterWriterTest with netCDF4, xarray and GDAL and compares values, calendar,
reference system and corners with what the test wrote. Exit 0 when all agree.
"""
import sys

import netCDF4
import numpy as np
import xarray
from osgeo import gdal, osr

gdal.UseExceptions()
osr.UseExceptions()
path, kind = sys.argv[1:3]

with netCDF4.Dataset(path) as file:
    assert file.data_model == "NETCDF3_64BIT_OFFSET", file.data_model
    assert file.Conventions == "CF-1.8, ACDD-1.3"
    assert file.cultivar == "Gew\u00fcrztraminer", file.cultivar
    margin = file["margin"][:]
    assert margin.shape == (2, 4, 6) and margin.mask.sum() == 2 and margin.mask[:, 0, 0].all()
    w, r, c = np.indices(margin.shape)
    assert (margin == -2.5 + w + r * 0.5 + c * 0.25).all()
    assert (file["worst_night"][:] == 100 * w + 6 * r + c).all()
    assert (file["phase"][:] == 1 + (r + c) % 2).all()
    time = file["time"]
    dates = netCDF4.num2date(time[:], time.units, time.calendar)
    last = {"projected": (5, 31), "geographic": (5, 31), "rotated": (5, 30)}[kind]
    assert [(d.year, d.month, d.day) for d in dates] == [(2004,) + last, (2005,) + last], dates
    first = netCDF4.num2date(file["time_bnds"][:, 0], time.units, time.calendar)
    assert [(d.year, d.month, d.day) for d in first] == [(2003, 9, 1), (2004, 9, 1)], first

with xarray.open_dataset(path) as data:
    assert data.margin.dims[0] == "time"
    assert list(data.winter.values) == [2004, 2005]
    assert float(data.margin.sel(time=data.winter == 2005).max()) == -1.5 + 1.5 + 1.25

layer = gdal.Open("NETCDF:%s:margin" % path)
assert layer.RasterCount == 2
corner = {"projected": (4000000, 1000, 0, 2900000, 0, -500), "geographic": (7, 0.125, 0, 47, 0, -0.25),
          "rotated": (-3, 0.11, 0, 1, 0, -0.11)}[kind]
assert np.allclose(layer.GetGeoTransform(), corner, rtol=0, atol=1e-9), layer.GetGeoTransform()
assert np.array_equal(layer.GetRasterBand(2).ReadAsArray()[1:], margin[1, 1:].filled())
system = osr.SpatialReference(layer.GetProjection())
if kind != "rotated":
    same = osr.SpatialReference()
    same.ImportFromEPSG({"projected": 3035, "geographic": 4326}[kind])
    # Compared without the order of axes, which WKT 1 need not tell.
    assert system.ExportToProj4() == same.ExportToProj4(), system.ExportToWkt()
else:
    # The origin of the rotated grid lies 90 degrees south of the pole at 39.25 N 162 W: 50.75 N 18 E.
    globe = osr.SpatialReference()
    globe.ImportFromEPSG(4326)
    for s in (system, globe):
        s.SetAxisMappingStrategy(osr.OAMS_TRADITIONAL_GIS_ORDER)
    lon, lat, _ = osr.CoordinateTransformation(system, globe).TransformPoint(0, 0)
    assert abs(lon - 18) < 1e-6 and abs(lat - 50.75) < 1e-6, (lon, lat)
