#!/usr/bin/python3
"""Scenarios against numpy: random series through the program, every night of a cell made anew with numpy's quantiles.

  check_scenario.py JAR FOLDER
"""
import datetime as dt
import json
import os
import subprocess
import sys

import netCDF4
import numpy as np

TOLERANCE = 1e-6      # K, beside the last digit of a float of the value's size
MONTHS = {"noleap": [31, 28, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31], "360_day": [30] * 12}
passed = failed = 0


def say(good, name, words):
    global passed, failed
    passed, failed = passed + bool(good), failed + (not good)
    print("%s %s: %s" % ("ok    " if good else "FAILED", name, words))


def calendar_days(calendar, first, years):
    """(year, month, day, place in the year) of each day."""
    out = []
    for year in range(first, first + years):
        lengths = list(MONTHS.get(calendar, [31, 28 + (year % 4 == 0), 31, 30, 31, 30, 31, 31, 30, 31, 30, 31]))
        number = 0
        for month, length in enumerate(lengths, 1):
            for day in range(1, length + 1):
                number += 1
                out.append((year, month, day, (number - 0.5) / sum(lengths)))
    return out


def write(path, calendar, first, values, west, north, step):
    n, rows, columns = values.shape
    with netCDF4.Dataset(path, "w") as nc:
        for name, size in (("time", n), ("lat", rows), ("lon", columns)):
            nc.createDimension(name, size)
        t = nc.createVariable("time", "f8", ("time",))
        t.setncatts({"units": "days since %d-01-01" % first, "calendar": calendar, "standard_name": "time"})
        t[:] = np.arange(n)
        for name, unit, start, sign in (("lat", "degrees_north", north, -1), ("lon", "degrees_east", west, 1)):
            v = nc.createVariable(name, "f8", (name,))
            v.units = unit
            v[:] = start + sign * step * (np.arange(len(nc.dimensions[name])) + 0.5)
        v = nc.createVariable("tasmin", "f4", ("time", "lat", "lon"))
        v.setncatts({"units": "degC", "standard_name": "air_temperature", "cell_methods": "time: minimum"})
        v[:] = values


def inverse(sample, x):
    """Probability of x under the type-7 quantile function of a sample, clamped."""
    ordered = np.sort(sample)
    return np.interp(x, ordered, np.linspace(0, 1, ordered.size))


def mapped(method, x, observed, past, future):
    q = lambda sample, tau: np.quantile(sample, tau, method="linear")
    if method == "quantile-delta":
        tau = inverse(future, x)
        return x + q(observed, tau) - q(past, tau)
    if method == "quantile-mapping":
        return q(observed, inverse(past, x))
    return x + future.mean() - past.mean()


def members(days, pool, day):
    if pool == "month":
        return np.array([d[1] == day[1] for d in days])
    centre = int(day[3] * 365) + 0.5
    away = np.abs(np.array([d[3] for d in days]) * 365 - centre)
    return np.minimum(away, 365 - away) <= 15.5


def bilinear(values, x, y, west, north, step):
    column, row = (x - west) / step - 0.5, (north - y) / step - 0.5
    c, r = int(np.floor(column)), int(np.floor(row))
    e, s = column - c, row - r
    v = values.astype(float)
    return (1 - s) * ((1 - e) * v[:, r, c] + e * v[:, r, c + 1]) + s * ((1 - e) * v[:, r + 1, c] + e * v[:, r + 1, c + 1])


def weighted(values, x, y, size, west, north, step):
    """Area mean of the model's cells under an observed cell, on the sphere."""
    total, area = 0.0, 0.0
    for r in range(values.shape[1]):
        top, bottom = min(north - r * step, y + size / 2), max(north - (r + 1) * step, y - size / 2)
        for c in range(values.shape[2]):
            left, right = max(west + c * step, x - size / 2), min(west + (c + 1) * step, x + size / 2)
            if top > bottom and right > left:
                w = (right - left) * (np.sin(np.radians(top)) - np.sin(np.radians(bottom)))
                total, area = total + w * values[:, r, c].astype(float), area + w
    return total / area


def main(jar, folder):
    os.makedirs(folder, exist_ok=True)
    rng = np.random.default_rng(42)
    days = {"observed": calendar_days("standard", 2001, 5), "past": calendar_days("noleap", 2001, 5), "future": calendar_days("360_day", 2051, 5)}
    def series(days, shift, shape):
        place = np.array([d[3] for d in days])[:, None, None]
        return (shift - 9 * np.cos(2 * np.pi * (place - 0.05)) + 4 * rng.standard_normal((len(days),) + shape)).astype("f4")
    observed = series(days["observed"], 2, (3, 4))
    past, future = series(days["past"], 3, (4, 4)), series(days["future"], 6, (4, 4))
    write(folder + "/observed.nc", "standard", 2001, observed, 0, 50, 0.5)
    write(folder + "/past.nc", "noleap", 2001, past, -1, 51, 1)
    write(folder + "/future.nc", "360_day", 2051, future, -1, 51, 1)
    with open(folder + "/cultivars.yaml", "w") as out:
        out.write("- {id: oat, name: Oat, model: dated, source: made up, status: own data, outside: hold, curve: "
                  "[{date: 12-01, lt10: -15, lt50: -18, lt90: -21}, {date: 02-01, lt10: -15, lt50: -18, lt90: -21}]}\n")
    row, column = 1, 2
    x, y = 0.5 * (column + 0.5), 50 - 0.5 * (row + 0.5)
    write(folder + "/past-same.nc", "noleap", 2001, past[:, :3], 0, 50, 0.5)
    write(folder + "/future-same.nc", "360_day", 2051, future[:, :3], 0, 50, 0.5)
    for method, pool, regrid in (("quantile-delta", "month", "same grid"), ("quantile-delta", "31-days", "same grid"),
                                 ("quantile-mapping", "month", "same grid"), ("quantile-delta", "month", "bilinear"), ("quantile-delta", "31-days", "bilinear"),
                                 ("quantile-delta", "month", "conservative"), ("quantile-mapping", "month", "bilinear"),
                                 ("monthly-delta", "month", "bilinear")):
        same = regrid == "same grid"
        with open(folder + "/run.yaml", "w") as out:
            out.write("temperature: {minimum: observed.nc}\ncultivars: cultivars.yaml\nscenario: {historical: past%s.nc, future: future%s.nc, "
                      "method: %s, pool: %s, regrid: %s}\n" % (("-same",) * 2 + (method, pool, "bilinear") if same
                                                              else ("", "", method, pool, regrid)))
        name = "%s, %s, %s" % (method, pool, regrid)
        ran = subprocess.run(["java", "-jar", jar, "explain", folder + "/run.yaml", "--at", "%r,%r" % (x, y), "--json", "-q"],
                             capture_output=True, text=True)
        if ran.returncode:
            say(False, name, ran.stderr[:300])
            continue
        at = (lambda v: v[:, row, column]) if same else (lambda v: bilinear(v, x, y, -1, 51, 1)) if regrid == "bilinear" else (lambda v: weighted(v, x, y, 0.5, -1, 51, 1))
        o = observed[:, row, column].astype(float)
        p, f = at(past).astype("f4").astype(float), at(future).astype("f4").astype(float)
        base_days, base = (days["observed"], o) if method == "monthly-delta" else (days["future"], f)
        index = {"%04d-%02d-%02d" % d[:3]: k for k, d in enumerate(base_days)}
        worst, count = 0.0, 0
        for winter in json.loads(ran.stdout)["cultivars"][0]["winters"]:
            for night in winter["nights"]:
                if night["tmin"] is None:
                    continue
                k = index[night["date"]]
                day = base_days[k]
                want = mapped(method, base[k], o[members(days["observed"], pool, day)], p[members(days["past"], pool, day)],
                              f[members(days["future"], pool, day)])
                worst = max(worst, abs(night["source"] - base[k]) - 1e-6)
                worst, count = max(worst, abs(night["tmin"] - want) - abs(np.spacing(np.float32(want)))), count + 1
        # Regridded values are floats in the program too, but their last digit may differ from numpy's, and where samples are thin
        # the mapping is steep.
        bound = TOLERANCE if same or method == "monthly-delta" else 50 * TOLERANCE
        say(count > 800 and worst <= bound, name, "%d nights, greatest difference %.1e K" % (count, max(worst, 0)))
    print("%d passed, %d failed" % (passed, failed))
    return 1 if failed else 0


if __name__ == "__main__":
    if len(sys.argv) != 3:
        sys.exit(__doc__)
    sys.exit(main(*sys.argv[1:]))
