#!/usr/bin/env python3
"""Makes the netCDF fixtures of the tests and what a reader must find in them.

  make_netcdf_fixtures.py [OUTDIR]        default: src/test/resources/netcdf

Needs numpy, netCDF4 and h5py (Debian: python3-netcdf4 python3-h5py). Every file is made from a map that is first made
north-up and west-first in degrees Celsius; expected.json holds that map, so that what a reader must return does not come
from any reader. All places and temperatures are invented.
"""
import datetime as dt
import gzip
import json
import os
import sys
import netCDF4
import h5py
import numpy as np

OUT = sys.argv[1] if len(sys.argv) > 1 else os.path.join(os.path.dirname(__file__), "..", "resources", "netcdf")
EXPECTED = {}
DAY0 = dt.date(2003, 1, 29)


def path(name):
    return os.path.join(OUT, name)


def truth(days=6, rows=4, columns=5, seed=1):
    """Degrees Celsius in steps of 0.5, [day, row from the north, column from the west], some cells missing."""
    d, r, c = np.meshgrid(np.arange(days), np.arange(rows), np.arange(columns), indexing="ij")
    t = -12.0 + 0.5 * ((d * 7 + r * 3 + c * 2 + seed) % 23) - 2.0 * r
    t[:, rows - 1, 0] = np.nan
    t[min(1, days - 1), 0, columns - 1] = np.nan
    return t


def dates(count, first=DAY0):
    return [(first + dt.timedelta(days=i)).isoformat() for i in range(count)]


def expect(name, values, days, west, north, width, height, **more):
    v = np.asarray(values, dtype="f8")
    EXPECTED[name] = dict(days=days, west=west, north=north, cellWidth=width, cellHeight=height, rows=v.shape[1],
                          columns=v.shape[2], values=[None if np.isnan(x) else float(np.float32(x)) for x in v.ravel()], **more)


class Grid:
    """What most files share; every part can be changed before write()."""

    def __init__(self, name, values=None, **change):
        self.name = name
        self.fmt = "NETCDF3_CLASSIC"
        self.values = truth() if values is None else values
        n, ny, nx = self.values.shape
        self.lat = 46.5 - 0.5 * np.arange(ny)
        self.lon = 7.25 + 0.5 * np.arange(nx)
        self.ylat, self.xlon = "lat", "lon"
        self.yatt = dict(units="degrees_north", standard_name="latitude")
        self.xatt = dict(units="degrees_east", standard_name="longitude")
        self.axistype = "f8"
        self.time = (DAY0 - dt.date(1970, 1, 1)).days + np.arange(n)
        self.timetype = "f8"
        self.tatt = dict(units="days since 1970-01-01", calendar="standard", standard_name="time")
        self.bounds = None
        self.var = "tasmin"
        self.dims = ("time", "lat", "lon")
        self.atts = dict(units="degC", standard_name="air_temperature", cell_methods="time: minimum")
        self.type = "f4"
        self.fill = np.float32(-999)
        self.create = {}
        self.unlimited = True
        self.raw = None          # values as stored, (time, y, x); default: values with fill
        self.extra = lambda nc: None
        self.nc = {}
        for k, v in change.items():
            setattr(self, k, v)

    def write(self):
        n, ny, nx = self.values.shape
        nc = netCDF4.Dataset(path(self.name), "w", format=self.fmt)
        nc.Conventions = "CF-1.8"
        nc.createDimension("time", None if self.unlimited else n)
        nc.createDimension("lat", ny)
        nc.createDimension("lon", nx)
        if self.bounds is not None:
            nc.createDimension("bnds", 2)
        t = nc.createVariable("time", self.timetype, ("time",))
        t.setncatts(self.tatt)
        if self.ylat:
            y = nc.createVariable(self.ylat, self.axistype, ("lat",))
            y.setncatts(self.yatt)
            y[:] = self.lat
        if self.xlon:
            x = nc.createVariable(self.xlon, self.axistype, ("lon",))
            x.setncatts(self.xatt)
            x[:] = self.lon
        self.extra(nc)
        v = nc.createVariable(self.var, self.type, self.dims, **({} if self.fill is None else dict(fill_value=self.fill)),
                              **self.create)
        v.set_auto_maskandscale(False)
        v.setncatts(self.atts)
        raw = self.raw
        if raw is None:
            raw = np.where(np.isnan(self.values), self.fill if self.fill is not None else np.nan, self.values).astype(self.type)
        order = {"time": 0, "lat": 1, "lon": 2}
        plain = [d for d in self.dims if d in order]
        raw = np.transpose(raw, [order[d] for d in plain])
        raw = raw.reshape([len(nc.dimensions[d]) if d not in order else raw.shape[plain.index(d)] for d in self.dims])
        v[:] = raw
        t[:] = self.time
        if self.bounds is not None:
            b = nc.createVariable("time_bnds", "f8", ("time", "bnds"))
            b[:] = self.bounds
        nc.close()
        return self

    def expect(self, **more):
        n, ny, nx = self.values.shape
        if "values" not in more:
            more["values"] = self.values
        e = dict(days=dates(n), west=7.0, north=46.75, width=0.5, height=0.5)
        e.update(more)
        expect(self.name, **e)


def members(name, fmt, kind):
    """(member, time, height, lat, lon) with labels."""
    g = Grid(name)
    base = truth()
    nc = netCDF4.Dataset(path(name), "w", format=fmt)
    for d, n in (("member", 3), ("time", 6), ("height", 1), ("lat", 4), ("lon", 5), ("strlen", 4)):
        nc.createDimension(d, n)
    for v, d, a, x in (("time", "time", g.tatt, g.time), ("lat", "lat", g.yatt, g.lat), ("lon", "lon", g.xatt, g.lon),
                       ("height", "height", dict(units="m", standard_name="height"), [2.0])):
        c = nc.createVariable(v, "f8", (d,))
        c.setncatts(a)
        c[:] = x
    labels = ["r1i1", "r2i1", "ctrl"]
    if kind == "char":
        m = nc.createVariable("member_id", "S1", ("member", "strlen"))
        m[:] = netCDF4.stringtochar(np.array(labels, "S4"))
    else:
        m = nc.createVariable("member", str, ("member",))
        for i, text in enumerate(labels):
            m[i] = text
    v = nc.createVariable("tn", "f4", ("member", "time", "height", "lat", "lon"), fill_value=np.float32(1e20))
    v.setncatts(dict(units="K", standard_name="air_temperature", cell_methods="time: minimum"))
    v.set_auto_maskandscale(False)
    for k in range(3):
        t = base + 273.15 + k
        v[k] = np.where(np.isnan(t), np.float32(1e20), t).astype("f4").reshape(6, 1, 4, 5)
    nc.close()
    for k, key in ((0, "1"), (2, "ctrl")):
        t = (base + 273.15 + k).astype("f4").astype("f8") - 273.15
        expect(name + "#" + key, t, dates(6), 7.0, 46.75, 0.5, 0.5)


def good():
    # containers
    two = lambda nc: nc.createVariable("other", "i2", ("time", "lat")).__setitem__(slice(None), np.ones((6, 4), "i2"))
    kelvin = truth() + 273.15
    kelvin_c = kelvin.astype("f4").astype("f8") - 273.15
    Grid("classic.nc", extra=two, raw=np.where(np.isnan(kelvin), -999, kelvin).astype("f4"),
         atts=dict(units="K", standard_name="air_temperature", cell_methods="time: minimum within days")
         ).write().expect(values=kelvin_c)
    Grid("lone-record.nc", type="i2", fill=np.int16(-32768), raw=np.where(np.isnan(truth()), -32768, truth() * 10).astype("i2"),
         atts=dict(units="celsius", scale_factor=0.1, cell_methods="time: minimum", standard_name="air_temperature")
         ).write().expect()
    Grid("offset64.nc", fmt="NETCDF3_64BIT_OFFSET", unlimited=False, type="f8", fill=-999.0).write().expect()
    Grid("cdf5.nc", fmt="NETCDF3_64BIT_DATA", type="u2", fill=np.uint16(65535),
         raw=np.where(np.isnan(truth()), 65535, (truth() + 100) * 10).astype("u2"),
         atts=dict(units="degC", scale_factor=0.1, add_offset=-100.0, cell_methods="time: minimum", standard_name="air_temperature")
         ).write().expect()
    big = truth(8, 20, 24, 3)
    lon32 = (7.25 + 0.1 * np.arange(24)).astype("f4")
    lat32 = (46.5 - 0.1 * np.arange(20)).astype("f4")
    geometry = dict(west=float(lon32[0]) - 0.05, north=float(lat32[0]) + 0.05, width=0.1, height=0.1, days=dates(8))
    Grid("day-chunks.nc", big, fmt="NETCDF4", axistype="f4", lat=lat32, lon=lon32,
         create=dict(zlib=True, shuffle=True, chunksizes=(1, 20, 24))).write().expect(**geometry)
    packed = np.where(np.isnan(big), -32768, big * 10).astype("i2")
    pack = dict(units="deg_C", standard_name="air_temperature", cell_methods="time: minimum", scale_factor=np.float32(0.1),
                add_offset=np.float32(0))
    Grid("pencil-chunks.nc", big, fmt="NETCDF4", axistype="f4", lat=lat32[::-1], lon=lon32, type="i2", fill=np.int16(-32768),
         raw=packed[:, ::-1], atts=pack, create=dict(zlib=True, shuffle=True, fletcher32=True, chunksizes=(5, 8, 7))
         ).write().expect(**geometry)
    Grid("checksum-only.nc", big, fmt="NETCDF4", axistype="f4", lat=lat32, lon=lon32, type="i2", fill=np.int16(-32768),
         raw=packed, atts=pack, create=dict(fletcher32=True, chunksizes=(3, 9, 24))).write().expect(**geometry)
    Grid("big-endian.nc", big, fmt="NETCDF4", axistype="f4", lat=lat32, lon=lon32, unlimited=False,
         create=dict(endian="big", contiguous=True)).write().expect(**geometry)
    Grid("big-endian-chunks.nc", big, fmt="NETCDF4", axistype="f4", lat=lat32, lon=lon32,
         create=dict(endian="big", zlib=True, shuffle=True, chunksizes=(2, 20, 24))).write().expect(**geometry)
    Grid("int32-chunks.nc", big, fmt="NETCDF4", axistype="f4", lat=lat32, lon=lon32, type="i4", fill=np.int32(-9999),
         raw=np.where(np.isnan(big), -9999, big * 1000).astype("i4"),
         atts=dict(pack, scale_factor=0.001, add_offset=0.0), create=dict(zlib=True, shuffle=True, chunksizes=(4, 10, 12))
         ).write().expect(**geometry)
    # deflate that gains nothing is left out for a chunk: random bytes, no shuffle
    rng = np.random.default_rng(5)
    noise = rng.integers(-100, 100, (6, 4, 5)).astype("i1")
    Grid("incompressible.nc", noise * 0.5, fmt="NETCDF4", type="i1", fill=np.int8(-128), raw=noise,
         atts=dict(units="degC", standard_name="air_temperature", cell_methods="time: minimum", scale_factor=0.5),
         create=dict(zlib=True, complevel=1, shuffle=False, chunksizes=(1, 4, 5))).write().expect()
    with h5py.File(path("incompressible.nc"), "r+") as f:
        f["tasmin"].id.write_direct_chunk((2, 0, 0), noise[2].tobytes(), filter_mask=1)
    sparse = truth()
    sparse[2:4] = np.nan
    nc = netCDF4.Dataset(path("unwritten-chunks.nc"), "w")
    g = Grid("unwritten-chunks.nc", sparse)
    for d, k in (("time", 6), ("lat", 4), ("lon", 5)):
        nc.createDimension(d, k)
    for d, a, x in (("time", g.tatt, g.time), ("lat", g.yatt, g.lat), ("lon", g.xatt, g.lon)):
        c = nc.createVariable(d, "f8", (d,))
        c.setncatts(a)
        c[:] = x
    v = nc.createVariable("tasmin", "f4", g.dims, zlib=True, chunksizes=(1, 4, 5), fill_value=np.float32(-999))
    v.setncatts(g.atts)
    for d in (0, 1, 4, 5):
        v[d] = np.where(np.isnan(sparse[d]), -999, sparse[d])
    nc.close()
    g.expect()
    latest(big[:6])

    # values
    Grid("unsigned-bytes.nc", type="i1", fill=np.int8(-1),
         raw=np.where(np.isnan(truth()), 255, (truth() + 60) * 2).astype("u1").view("i1"),
         atts=dict(units="degrees C", standard_name="air_temperature", cell_methods="time: minimum", _Unsigned="true",
                   scale_factor=0.5, add_offset=-60.0)).write().expect()
    two_fills = np.where(np.isnan(truth()), -32768, truth() * 10).astype("i2")
    two_fills[0, 1, 1] = -9999
    seen = truth()
    seen[0, 1, 1] = np.nan
    Grid("both-fills.nc", type="i2", fill=np.int16(-32768), raw=two_fills,
         atts=dict(units="degC", standard_name="air_temperature", cell_methods="time: minimum", scale_factor=0.1,
                   missing_value=np.int16(-9999))).write().expect(values=seen)
    wild = truth().astype("f4")
    wild[np.isnan(wild)] = -999
    wild[0, 0, 0], wild[0, 0, 1], wild[0, 0, 2], wild[0, 0, 3] = np.inf, -np.inf, 1e20, -95.0
    wild[0, 1, 1] = np.nan
    seen = truth()
    seen[0, 0, :4] = np.nan
    seen[0, 1, 1] = np.nan
    Grid("wild.nc", raw=wild).write().expect(values=seen, setAside=4)
    Grid("wild-chunks.nc", raw=wild, fmt="NETCDF4", create=dict(zlib=True, shuffle=True, chunksizes=(2, 4, 5))
         ).write().expect(values=seen, setAside=4)
    default = np.where(np.isnan(truth()), netCDF4.default_fillvals["f4"], truth()).astype("f4")
    Grid("default-fill.nc", raw=default, fill=None).write().expect()
    double_missing = np.where(np.isnan(truth()), np.float32(-3.4e38), truth()).astype("f4")
    Grid("float-fill-as-double.nc", raw=double_missing, fill=None,
         atts=dict(units="degC", standard_name="air_temperature", cell_methods="time: minimum", missing_value=-3.4e38)
         ).write().expect()
    f = truth() * 1.8 + 32
    Grid("fahrenheit.nc", type="f8", fill=-999.0, raw=np.where(np.isnan(f), -999, f),
         atts=dict(units="degF", standard_name="air_temperature", cell_methods="time: minimum")).write().expect()
    ranged = truth()
    ranged[ranged < -15] = np.nan
    raw = np.where(np.isnan(truth()), -32768, truth() * 10).astype("i2")
    air = dict(units="degC", standard_name="air_temperature", cell_methods="time: minimum", scale_factor=0.1)
    Grid("valid-range-packed.nc", type="i2", fill=np.int16(-32768), raw=raw,
         atts=dict(air, valid_range=np.array([-150, 600], "i2"))).write().expect(values=ranged)
    Grid("valid-min-unpacked.nc", type="i2", fill=np.int16(-32768), raw=raw,
         atts=dict(air, valid_min=-15.0)).write().expect(values=ranged)

    # axes
    Grid("south-up.nc", lat=(46.5 - 0.5 * np.arange(4))[::-1], raw=np.where(np.isnan(truth()), -999, truth()).astype("f4")[:, ::-1]
         ).write().expect()
    around = truth(6, 4, 8)
    Grid("lon-0-360.nc", around, lon=45.0 * np.arange(8)).write().expect(
        values=np.roll(around, 4, axis=2), west=-202.5, width=45.0)
    Grid("lon-0-360-chunks.nc", around, lon=45.0 * np.arange(8), fmt="NETCDF4",
         create=dict(zlib=True, chunksizes=(3, 2, 3))).write().expect(values=np.roll(around, 4, axis=2), west=-202.5, width=45.0)
    Grid("lon-230.nc", lon=230.25 + 0.5 * np.arange(5)).write().expect(west=-130.0)
    Grid("greenwich.nc", lon=np.array([359.0, 359.5, 0.0, 0.5, 1.0])).write().expect(west=-1.25)
    Grid("date-line.nc", lon=np.array([179.0, 179.5, -180.0, -179.5, -179.0])).write().expect(west=178.75)
    Grid("east-first.nc", lon=(7.25 + 0.5 * np.arange(5))[::-1],
         raw=np.where(np.isnan(truth()), -999, truth()).astype("f4")[:, :, ::-1]).write().expect()
    Grid("time-last.nc", dims=("lat", "lon", "time"), unlimited=False).write().expect()
    Grid("time-last-chunks.nc", fmt="NETCDF4", dims=("lat", "lon", "time"), create=dict(zlib=True, chunksizes=(2, 3, 4))
         ).write().expect()
    Grid("lon-before-lat.nc", dims=("time", "lon", "lat")).write().expect()
    Grid("other-axis-names.nc", ylat="latitude", xlon="longitude", var="T2MIN",
         atts=dict(units="C")).write().expect()
    rotated = lambda nc: nc.createVariable("rotated_pole", "i4", ()).setncatts(
        dict(grid_mapping_name="rotated_latitude_longitude", grid_north_pole_latitude=39.25, grid_north_pole_longitude=-162.0))
    Grid("rotated-pole.nc", ylat="rlat", xlon="rlon", lat=1.0 - 0.5 * np.arange(4), lon=-10.0 + 0.5 * np.arange(5),
         yatt=dict(units="degrees", standard_name="grid_latitude"), xatt=dict(units="degrees", standard_name="grid_longitude"),
         extra=rotated, atts=dict(units="degC", standard_name="air_temperature", cell_methods="time: minimum",
                                  grid_mapping="rotated_pole")).write().expect(west=-10.25, north=1.25)
    lcc = lambda nc: nc.createVariable("crs", "i4", ()).setncatts(
        dict(grid_mapping_name="lambert_conformal_conic", standard_parallel=np.array([45.0, 50.0]),
             longitude_of_central_meridian=10.0, latitude_of_projection_origin=48.0))
    km = dict(ylat="y", xlon="x", lat=100.0 - 10.0 * np.arange(4), lon=-20.0 + 10.0 * np.arange(5),
              yatt=dict(units="km", standard_name="projection_y_coordinate"),
              xatt=dict(units="km", standard_name="projection_x_coordinate"))
    Grid("lambert-km.nc", extra=lcc, atts=dict(units="degC", standard_name="air_temperature", cell_methods="time: minimum",
                                               grid_mapping="crs: x y"), **km
         ).write().expect(west=-25000.0, north=105000.0, width=10000.0, height=10000.0)
    Grid("projected-no-mapping.nc", **km).write().expect(west=-25000.0, north=105000.0, width=10000.0, height=10000.0)

    # time
    Grid("days-360.nc", time=np.arange(6) * 24 + 12, timetype="i4",
         tatt=dict(units="hours since 2000-02-28 00:00:00", calendar="360_day")).write().expect(
        days=["2000-02-28", "2000-02-29", "2000-02-30", "2000-03-01", "2000-03-02", "2000-03-03"])
    Grid("noleap.nc", time=np.arange(6) * 1440, timetype="i4",
         tatt=dict(units="minutes since 2000-02-27", calendar="noleap")).write().expect(
        days=["2000-02-27", "2000-02-28", "2000-03-01", "2000-03-02", "2000-03-03", "2000-03-04"])
    Grid("float-seconds.nc", time=np.arange(6) * 86400.0 + 21600, tatt=dict(units="seconds since 2003-01-29T00:00:00Z")
         ).write().expect()
    Grid("end-of-day-bounds.nc", time=np.arange(1, 7), tatt=dict(units="days since 2003-01-29", bounds="time_bnds"),
         bounds=np.stack([np.arange(6), np.arange(1, 7)], axis=1)).write().expect()
    shuffled = [3, 0, 5, 1, 4, 2]
    Grid("disorder.nc", time=((DAY0 - dt.date(1970, 1, 1)).days + np.arange(6))[shuffled],
         raw=np.where(np.isnan(truth()), -999, truth()).astype("f4")[shuffled]).write().expect()
    g = Grid("one-day.nc", truth(1))
    nc = netCDF4.Dataset(path(g.name), "w", format="NETCDF3_CLASSIC")
    nc.createDimension("lat", 4)
    nc.createDimension("lon", 5)
    for d, a, x in (("lat", g.yatt, g.lat), ("lon", g.xatt, g.lon)):
        c = nc.createVariable(d, "f8", (d,))
        c.setncatts(a)
        c[:] = x
    c = nc.createVariable("time", "i4", ())
    c.setncatts(g.tatt)
    c[...] = g.time[0]
    v = nc.createVariable("tasmin", "f4", ("lat", "lon"), fill_value=np.float32(-999))
    v.setncatts(g.atts)
    v[:] = np.where(np.isnan(g.values[0]), -999, g.values[0])
    nc.close()
    g.expect()
    members("members.nc", "NETCDF3_CLASSIC", "char")
    members("members-nc4.nc", "NETCDF4", "string")
    heights()


def latest(values):
    """HDF5 of the newest format (superblock 3), as h5py writes it, with dimension scales."""
    name = "superblock3.nc"
    with h5py.File(path(name), "w", libver="latest") as f:
        axes = dict(time=((DAY0 - dt.date(1970, 1, 1)).days + np.arange(6)).astype("f8"), lat=46.5 - 0.5 * np.arange(20),
                    lon=7.25 + 0.5 * np.arange(24))
        units = dict(time="days since 1970-01-01", lat="degrees_north", lon="degrees_east")
        for d, x in axes.items():
            f.create_dataset(d, data=x).make_scale(d)
            f[d].attrs["units"] = np.bytes_(units[d])
        v = f.create_dataset("tasmin", data=np.where(np.isnan(values), -999, values).astype("f4"), chunks=(2, 10, 24),
                             compression="gzip", shuffle=True, fletcher32=True, fillvalue=np.float32(-999))
        for i, d in enumerate(axes):
            v.dims[i].attach_scale(f[d])
        v.attrs["_FillValue"] = np.float32(-999)
        v.attrs["units"] = np.bytes_("degC")
        v.attrs["cell_methods"] = np.bytes_("time: minimum")
        v.attrs["standard_name"] = np.bytes_("air_temperature")
    expect(name, values, dates(6), 7.0, 46.75, 0.5, 0.5)


def heights():
    z = 100.0 * np.arange(20).reshape(4, 5) + 50
    z[1, 1] = np.nan

    def make(name, fmt, var, atts, raw, fill, type, lat, time=False, **create):
        nc = netCDF4.Dataset(path(name), "w", format=fmt)
        nc.createDimension("time", 1)
        nc.createDimension("lat", 4)
        nc.createDimension("lon", 5)
        for d, a, x in (("lat", "degrees_north", lat), ("lon", "degrees_east", 7.25 + 0.5 * np.arange(5))):
            c = nc.createVariable(d, "f8", (d,))
            c.units = a
            c[:] = x
        v = nc.createVariable(var, type, ("time", "lat", "lon") if time else ("lat", "lon"), fill_value=fill, **create)
        v.set_auto_maskandscale(False)
        v.setncatts(atts)
        v[:] = raw.reshape((1, 4, 5)) if time else raw
        nc.close()

    lat = 46.5 - 0.5 * np.arange(4)
    make("height-metres.nc", "NETCDF3_CLASSIC", "orog", dict(units="m", standard_name="surface_altitude"),
         np.where(np.isnan(z), -32768, z).astype("i2")[::-1], np.int16(-32768), "i2", lat[::-1])
    expect("height-metres.nc", z[None], ["static"], 7.0, 46.75, 0.5, 0.5)
    feet = z / 0.3048
    make("height-feet.nc", "NETCDF4", "elevation", dict(units="feet"), np.where(np.isnan(feet), -9999, feet).astype("f8"),
         1e30, "f8", lat, time=True, zlib=True)
    expect("height-feet.nc", z[None], ["static"], 7.0, 46.75, 0.5, 0.5)
    make("height-none.nc", "NETCDF3_CLASSIC", "rain", dict(units="mm"), np.nan_to_num(z), -999.0, "f8", lat)


def bad():
    air = dict(units="degC", standard_name="air_temperature", cell_methods="time: minimum")
    Grid("bad-maximum-only.nc", var="tasmax", atts=dict(air, cell_methods="time: maximum")).write()
    Grid("bad-mean-named-tn.nc", var="tn", atts=dict(air, cell_methods="time: mean")).write()
    Grid("bad-monthly-mean-of-minima.nc", atts=dict(air, cell_methods="time: minimum within days time: mean over days")).write()

    def second(nc):
        v = nc.createVariable("t_low", "f4", ("time", "lat", "lon"))
        v.setncatts(air)
        v[:] = np.zeros((6, 4, 5))
    Grid("bad-two-candidates.nc", var="t_two", extra=second, atts=air).write()
    Grid("bad-no-units.nc", atts=dict(cell_methods="time: minimum", standard_name="air_temperature")).write()
    Grid("bad-units.nc", atts=dict(air, units="mK")).write()
    Grid("bad-kelvin-called-celsius.nc", raw=(np.nan_to_num(truth()) + 273.15).astype("f4")).write()
    Grid("bad-celsius-called-kelvin.nc", atts=dict(air, units="K")).write()
    Grid("bad-hourly.nc", time=np.arange(6) * 6, tatt=dict(units="hours since 2003-01-29")).write()
    Grid("bad-same-day.nc", time=np.array([0, 1, 2, 2, 3, 4]) + 0.5, tatt=dict(units="days since 2003-01-29")).write()
    Grid("bad-monthly.nc", time=np.array([15, 46, 74, 105, 135, 166]), tatt=dict(units="days since 2003-01-01")).write()
    Grid("bad-months.nc", time=np.arange(6), tatt=dict(units="months since 2003-01-01")).write()
    Grid("bad-year-zero.nc", time=np.arange(6) * 24, tatt=dict(units="hours since 0000-01-01", calendar="standard")).write()
    Grid("bad-calendar.nc", tatt=dict(units="days since 2003-01-29", calendar="lunar")).write()
    Grid("bad-time-fill.nc", time=np.array([0, 1, netCDF4.default_fillvals["f8"], 3, 4, 5]),
         tatt=dict(units="days since 2003-01-29")).write()
    Grid("bad-uneven.nc", lat=np.array([46.5, 46.0, 45.4, 45.0])).write()
    Grid("bad-not-monotonic.nc", lat=np.array([46.5, 45.5, 46.0, 45.0])).write()
    Grid("bad-latitude.nc", lat=np.array([91.0, 90.0, 89.0, 88.0])).write()
    nc = netCDF4.Dataset(path("bad-levels.nc"), "w", format="NETCDF3_CLASSIC")
    g = Grid("bad-levels.nc")
    for d, k in (("time", 6), ("level", 3), ("lat", 4), ("lon", 5)):
        nc.createDimension(d, k)
    for d, a, x in (("time", g.tatt, g.time), ("lat", g.yatt, g.lat), ("lon", g.xatt, g.lon)):
        c = nc.createVariable(d, "f8", (d,))
        c.setncatts(a)
        c[:] = x
    v = nc.createVariable("tasmin", "f4", ("time", "level", "lat", "lon"))
    v.setncatts(air)
    v[:] = np.zeros((6, 3, 4, 5))
    nc.close()

    def curvilinear(nc):
        for name, unit in (("nav_lat", "degrees_north"), ("nav_lon", "degrees_east")):
            v = nc.createVariable(name, "f4", ("lat", "lon"))
            v.units = unit
            v[:] = np.zeros((4, 5))
    Grid("bad-two-dimensional.nc", ylat=None, xlon=None, extra=curvilinear, atts=dict(air, coordinates="nav_lat nav_lon")).write()
    Grid("bad-no-axes.nc", ylat=None, xlon=None).write()
    empty = Grid("bad-zero-days.nc", np.zeros((0, 4, 5)))
    empty.write()
    with h5py.File(path("bad-lzf.nc"), "w") as f:
        for d, x, u in (("time", np.arange(6.0), "days since 2003-01-29"), ("lat", 46.5 - 0.5 * np.arange(4), "degrees_north"),
                        ("lon", 7.25 + 0.5 * np.arange(5), "degrees_east")):
            f.create_dataset(d, data=x).make_scale(d)
            f[d].attrs["units"] = np.bytes_(u)
        v = f.create_dataset("tasmin", data=np.nan_to_num(truth()).astype("f4"), chunks=(6, 4, 5), compression="lzf")
        for i, d in enumerate(("time", "lat", "lon")):
            v.dims[i].attach_scale(f[d])
        v.attrs["units"] = np.bytes_("degC")

    # not what their names say
    whole = open(path("offset64.nc"), "rb").read()
    open(path("bad-truncated-classic.nc"), "wb").write(whole[:-100])
    whole = open(path("day-chunks.nc"), "rb").read()
    open(path("bad-truncated-hdf5.nc"), "wb").write(whole[:-1500])
    whole = bytearray(open(path("pencil-chunks.nc"), "rb").read())
    with h5py.File(path("pencil-chunks.nc"), "r") as f:
        chunk = f["tasmin"].id.get_chunk_info_by_coord((5, 16, 21))
    middle = chunk.byte_offset + chunk.size // 2
    for i in range(8):
        whole[middle + i] ^= 0x5A
    open(path("bad-chunk.nc"), "wb").write(bytes(whole))
    whole = bytearray(open(path("checksum-only.nc"), "rb").read())
    with h5py.File(path("checksum-only.nc"), "r") as f:
        chunk = f["tasmin"].id.get_chunk_info_by_coord((6, 18, 0))
    whole[chunk.byte_offset + 10] ^= 1
    open(path("bad-checksum.nc"), "wb").write(bytes(whole))
    open(path("bad-html.nc"), "wb").write(b"\n<!DOCTYPE html>\n<html><title>Sign in</title></html>\n")
    open(path("bad-empty.nc"), "wb").write(b"")
    with open(path("bad-gzip.nc"), "wb") as raw, gzip.GzipFile("", "wb", 9, raw, mtime=0) as out:
        out.write(b"CDF\x01")
    open(path("bad-header.nc"), "wb").write(b"CDF\x01" + bytes([0, 0, 0, 1, 0, 0, 0, 10, 0x7F, 0xFF, 0xFF, 0xFF]) + b"\0" * 40)


os.makedirs(OUT, exist_ok=True)
good()
bad()
with open(path("expected.json"), "w") as out:
    out.write("{\n" + ",\n".join(json.dumps(k) + ": " + json.dumps(v, separators=(",", ":")) for k, v in EXPECTED.items()) + "\n}\n")
