#!/usr/bin/python3
"""Statistics over the winters of a map, made anew with scipy from the winters that the same run wrote.

  check_statistics.py --make FOLDER    an invented record of 31 winters on 12 x 16 cells, the eastern half growing milder, and a run file
  check_statistics.py OUT              compare the layers of its outputs; exits 1 when one differs
"""
import datetime as dt
import math
import os
import sys

import numpy as np
from scipy import optimize, special, stats

RUN = """title: Thirty-one invented winters
temperature: {minimum: tmin.nc}
cultivars: {files: %s, use: [slate]}
statistics: {bootstrap: {replicates: 50}, return-periods: [10, 50], cold-night: -8}
outputs: {layers: all, geopackage: false}
"""


def make(folder):
    import netCDF4
    os.makedirs(folder, exist_ok=True)
    random = np.random.default_rng(3)
    first, last = dt.date(1985, 8, 20), dt.date(2016, 6, 10)
    days, rows, columns = (last - first).days + 1, 12, 16
    with netCDF4.Dataset(os.path.join(folder, "tmin.nc"), "w") as file:
        for name, size in (("time", days), ("lat", rows), ("lon", columns)):
            file.createDimension(name, size)
        time = file.createVariable("time", "i4", ("time",))
        time.setncatts({"units": f"days since {first}", "calendar": "standard", "standard_name": "time"})
        time[:] = np.arange(days)
        lat = file.createVariable("lat", "f8", ("lat",))
        lat.setncatts({"units": "degrees_north", "standard_name": "latitude"})
        lat[:] = 50 - np.arange(rows) * 0.1
        lon = file.createVariable("lon", "f8", ("lon",))
        lon.setncatts({"units": "degrees_east", "standard_name": "longitude"})
        lon[:] = 10 + np.arange(columns) * 0.1
        tmin = file.createVariable("tmin", "f4", ("time", "lat", "lon"))
        tmin.setncatts({"units": "degC", "standard_name": "air_temperature", "cell_methods": "time: minimum"})
        spell = 0.0
        milder = np.where(np.arange(columns) >= columns // 2, 1.0, 0.0)[None, :]
        for day in range(days):
            date = first + dt.timedelta(day)
            spell = 0.8 * spell + 2.0 * random.standard_normal()
            season = 5 - 11 * math.cos(2 * math.pi * (date.timetuple().tm_yday - 20) / 365)
            tmin[day] = season + spell + 0.00045 * day * milder + 0.8 * random.standard_normal((rows, columns))
    cultivars = os.path.abspath(os.path.join(os.path.dirname(__file__), "../../../sample-grids/cultivars.yaml"))
    with open(os.path.join(folder, "run.yaml"), "w", encoding="utf-8") as run:
        run.write(RUN % cultivars)


class Comparison:
    def __init__(self):
        self.passed = self.failed = 0

    def close(self, name, ours, theirs, tolerance):
        same_gaps = np.array_equal(np.isnan(ours), np.isnan(theirs))
        worst = np.nanmax(np.abs(ours - theirs)) if np.isfinite(ours).any() else 0.0
        good = same_gaps and worst <= tolerance
        print(f"{'ok    ' if good else 'FAILED'} {name}: largest difference {worst:.2g}{'' if same_gaps else ', other cells are missing'}")
        self.passed += good
        self.failed += not good


def layer(out, name):
    from osgeo import gdal
    gdal.UseExceptions()
    data = gdal.Open(os.path.join(out, name + ".tif"))
    values = data.ReadAsArray().astype(float)
    values[values == data.GetRasterBand(1).GetNoDataValue()] = np.nan
    return values


def gev(lows):
    """L-moment fit of the negated values with the exact shape; scipy's genextreme."""
    x = np.sort(-lows)
    n, i = len(x), np.arange(len(x))
    b = [x.mean(), (i * x).sum() / n / (n - 1), (i * (i - 1) * x).sum() / n / (n - 1) / (n - 2)]
    l2 = 2 * b[1] - b[0]
    t3 = (6 * b[2] - 6 * b[1] + b[0]) / l2
    k = optimize.brentq(lambda k: 2 * np.expm1(-k * math.log(3)) / np.expm1(-k * math.log(2)) - 3 - t3, -0.9, 3, xtol=1e-12)
    if abs(k) > 0.4 and n < 40:
        scale = l2 / math.log(2)
        return stats.gumbel_r(b[0] - np.euler_gamma * scale, scale)
    scale = l2 * k / ((1 - 2 ** -k) * special.gamma(1 + k))
    return stats.genextreme(k, b[0] - scale * (1 - special.gamma(1 + k)) / k, scale)


def mann_kendall(values):
    n = len(values)
    s = sum(np.sign(values[j] - values[i]) for i in range(n) for j in range(i + 1, n))
    ties = np.unique(values, return_counts=True)[1]
    variance = (n * (n - 1) * (2 * n + 5) - (ties * (ties - 1) * (2 * ties + 5)).sum()) / 18
    return s, 2 * stats.norm.sf(max(0, abs(s) - 1) / math.sqrt(variance))


def compare(out):
    result = Comparison()
    for place, field in (("shared", "minimum"), ("slate", "margin")):
        winters = layer(out, f"{place}/winters/{field}")
        n, shape = len(winters), winters.shape[1:]
        cells = winters.reshape(n, -1).T
        fits = [gev(cell) for cell in cells]
        for period in (10, 50):
            levels = np.array([-fit.isf(1 / period) for fit in fits]).reshape(shape)
            result.close(f"return level {period} of the {field}", layer(out, f"{place}/return-level-{field}-{period}"), levels, 1e-3)
            lower, upper = (layer(out, f"{place}/return-level-{field}-{period}-{side}") for side in ("lower", "upper"))
            result.close(f"bounds of it enclose it, {field} {period}", np.where((lower <= levels + 1e-3) & (levels <= upper + 1e-3), 0.0, 1.0),
                         np.zeros(shape), 0)
        slopes = np.array([10 * stats.theilslopes(cell, np.arange(n))[0] for cell in cells]).reshape(shape)
        result.close(f"Theil-Sen slope of the {field}", layer(out, f"{place}/trend-{field}"), slopes, 1e-4)
        tests = [mann_kendall(cell) for cell in cells]
        p = np.array([test[1] for test in tests])
        result.close(f"Mann-Kendall p of the {field}", layer(out, f"{place}/trend-{field}-test"), p.reshape(shape), 1e-6)
        ordered = np.sort(p)
        called = np.nonzero(ordered <= 0.1 * np.arange(1, len(p) + 1) / len(p))[0]
        threshold = ordered[called[-1]] if len(called) else -1
        classes = np.array([2.0 if q > threshold else 3.0 if s > 0 else 1.0 for s, q in tests])
        result.close(f"significant trends of the {field}, {int((classes != 2).sum())} of {len(p)} cells",
                     layer(out, f"{place}/trend-{field}-significant"), classes.reshape(shape), 0)
        if field == "margin":
            killing = np.array([1 / fit.sf(0) for fit in fits]).reshape(shape)
            ours = layer(out, "slate/return-period-killing")
            result.close("return period of a killing winter, relative", ours / killing, np.ones(shape), 2e-3)
    print(f"{result.passed} passed, {result.failed} failed")
    return 1 if result.failed else 0


if sys.argv[1] == "--make":
    make(sys.argv[2])
else:
    sys.exit(compare(sys.argv[1]))
