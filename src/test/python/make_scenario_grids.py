#!/usr/bin/python3
"""Makes the invented climate model runs that go with the sample grids.

  make_scenario_grids.py FOLDER

Two members, alder and birch, on a grid four times coarser than the observed one and on calendars without leap days and with months of
thirty days. Each has a past (2005-2018) that is off by a bias of its own, and a future (2055-2068) that is warmer, in the coldest days
more than on average. Numbers of a random generator with a fixed seed: no climate model stands behind them.
"""
import os
import sys

import netCDF4
import numpy as np

WEST, NORTH, STEP, ROWS, COLUMNS = -38.1, 50.6, 0.2, 6, 7
SEED = 20240718
YEARS = {"past": 2005, "future": 2055}
COUNT = 14
# Member: calendar, days of a year, bias in K, mean warming in K, further warming of the coldest days.
MEMBERS = (("alder", "noleap", 365, 1.6, 1.9, 0.12), ("birch", "360_day", 360, -1.8, 0.9, 0.08))
FILL = np.int16(-32768)


def minima(rng, length, bias, warming, cold):
    """Daily minima [day, row, column]: a yearly course, spells of about a week, and a slope to the north."""
    n = COUNT * length
    place = np.arange(n) % length / length
    course = 3.5 - 8.5 * np.cos(2 * np.pi * (place - 0.06))
    spell, noise = np.zeros(n), rng.standard_normal(n)
    for k in range(1, n):
        spell[k] = 0.82 * spell[k - 1] + 2.1 * noise[k]
    winter = np.clip(np.cos(2 * np.pi * (place - 0.04)), 0, 1)
    spell *= 1 + 0.55 * winter * (spell < 0)
    spell = np.where(spell < 0, spell * (1 - cold), spell)
    cells = rng.standard_normal((n, ROWS, COLUMNS)) * 0.6
    slope = -1.4 * np.linspace(1, -1, ROWS)[None, :, None]
    return course[:, None, None] + spell[:, None, None] + cells + slope + bias + warming


def write(folder, name, member, calendar, length, values):
    with netCDF4.Dataset(os.path.join(folder, "%s-%s.nc" % (name, member)), "w", format="NETCDF4_CLASSIC") as nc:
        nc.Conventions = "CF-1.8"
        nc.title = "Tarnmoor, %s of the invented model %s" % (name, member)
        nc.institution = "none: an invented place"
        nc.source = "random numbers with a fixed seed"
        nc.comment = "No climate model stands behind these numbers."
        nc.createDimension("time", None)
        nc.createDimension("lat", ROWS)
        nc.createDimension("lon", COLUMNS)
        nc.createDimension("bnds", 2)
        t = nc.createVariable("time", "f8", ("time",), chunksizes=(512,), zlib=True)
        t.setncatts({"standard_name": "time", "axis": "T", "units": "days since %d-01-01" % YEARS[name], "calendar": calendar,
                     "bounds": "time_bnds"})
        b = nc.createVariable("time_bnds", "f8", ("time", "bnds"), chunksizes=(512, 2), zlib=True)
        for axis, n, standard, units, first, step in (("lat", ROWS, "latitude", "degrees_north", NORTH - STEP * (ROWS - 0.5), STEP),
                                                      ("lon", COLUMNS, "longitude", "degrees_east", WEST + STEP / 2, STEP)):
            a = nc.createVariable(axis, "f8", (axis,))
            a.setncatts({"standard_name": standard, "axis": axis == "lat" and "Y" or "X", "units": units})
            a[:] = np.round(first + step * np.arange(n), 6)
        v = nc.createVariable("tasmin", "i2", ("time", "lat", "lon"), zlib=True, complevel=9, shuffle=True,
                              chunksizes=(length, ROWS, COLUMNS), fill_value=FILL)
        v.setncatts({"standard_name": "air_temperature", "long_name": "daily minimum temperature", "units": "K", "scale_factor": 0.1,
                     "add_offset": 273.15, "cell_methods": "time: minimum"})
        day = np.arange(COUNT * length, dtype=float)
        t[:] = day + 0.5
        b[:] = np.stack([day, day + 1], 1)
        v.set_auto_maskandscale(False)
        # Rows run from the south in these files.
        v[:] = np.round(values[:, ::-1] * 10).astype(np.int16)


def main(folder):
    os.makedirs(folder, exist_ok=True)
    for number, (member, calendar, length, bias, warming, cold) in enumerate(MEMBERS):
        for name, change in (("past", 0), ("future", 1)):
            rng = np.random.default_rng(SEED + 10 * number + change)
            write(folder, name, member, calendar, length, minima(rng, length, bias, change * warming, change * cold))


if __name__ == "__main__":
    if len(sys.argv) != 2:
        sys.exit(__doc__)
    main(sys.argv[1])
