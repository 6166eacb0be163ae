#!/usr/bin/python3
"""Makes a small record, runs the program over it in three ways, and computes every layer of damage anew with numpy and scipy.

  check_damage.py JAR WORK_FOLDER    prints one line a layer; ends with `N passed, N failed`

The three ways: worst night with uncertainty of the margin, independent nights, correlated nights. Looked at are damage, its mean and its
probabilities with bounds, the shares of the phases, the layers of a population of variants, the shares of variance, and the gain by a
milder site. Temperatures and cultivars are invented. Tolerances: probabilities and shares 1e-5, K 1e-4.
"""
import datetime as dt
import math
import os
import subprocess
import sys

import netCDF4
import numpy as np
from osgeo import gdal
from scipy.stats import beta, norm

gdal.UseExceptions()
ROWS, COLUMNS, WINTERS = 7, 9, 8
WEST, NORTH, SIZE = -38.0, 51.0, 0.02
ROWS_OF_CURVES = [(9, 1, -3.5, -6.0, -8.0), (11, 15, -9.0, -12.0, -15.0), (12, 20, -13.0, -16.0, -18.5), (2, 15, -13.0, -16.0, -18.5),
                  (4, 1, -5.0, -7.0, -8.5), (5, 31, -3.0, -4.2, -5.0)]
SD = {"model": 1.0, "site": 0.8}
OFFSETS = [-2.0, 0.5, 1.0]
SPREAD = 1.4
RHO = 0.6
KILOMETRES = 4.0
passed = failed = 0


def check(name, found, expected, tolerance):
    """One line; missing cells must be the same."""
    global passed, failed
    found = np.asarray(found, float)
    expected = np.broadcast_to(np.asarray(expected, float), found.shape)
    same = np.array_equal(np.isnan(found), np.isnan(expected))
    worst = np.nanmax(np.abs(found - expected)) if not np.isnan(expected).all() else 0.0
    if same and worst <= tolerance:
        passed += 1
        print(f"ok     {name}: within {worst:.1e}")
    else:
        failed += 1
        print(f"FAILED {name}: {worst:.3e} apart, missing cells {'the same' if same else 'differ'}")


def weather():
    """Dates and temperatures, [day, row, column]; one corner is missing."""
    first, last = dt.date(2000, 7, 1), dt.date(2000 + WINTERS, 7, 15)
    days = [first + dt.timedelta(n) for n in range((last - first).days)]
    rng = np.random.default_rng(11)
    place = rng.normal(0, 1.2, (ROWS, COLUMNS))
    values = np.empty((len(days), ROWS, COLUMNS), np.float32)
    for n, day in enumerate(days):
        year = math.cos(2 * math.pi * (day.timetuple().tm_yday - 20) / 365.25)
        # hundredths of their own, so that no two nights tie but for the last digit of a float
        values[n] = np.round(3 - 10 * year + rng.normal(0, 3.5) + place + rng.normal(0, 0.7, place.shape), 1) + rng.uniform(0.01, 0.04)
    values[:, 0, 0] = np.nan
    return days, values


def write_inputs(folder, days, values):
    with netCDF4.Dataset(os.path.join(folder, "tmin.nc"), "w") as nc:
        for name, size in (("time", len(days)), ("lat", ROWS), ("lon", COLUMNS)):
            nc.createDimension(name, size)
        time = nc.createVariable("time", "i4", ("time",))
        time.units, time.calendar, time.standard_name = "days since 2000-01-01", "standard", "time"
        time[:] = [(day - dt.date(2000, 1, 1)).days for day in days]
        lat = nc.createVariable("lat", "f8", ("lat",))
        lat.units, lat.standard_name = "degrees_north", "latitude"
        lat[:] = NORTH - SIZE * (np.arange(ROWS) + 0.5)
        lon = nc.createVariable("lon", "f8", ("lon",))
        lon.units, lon.standard_name = "degrees_east", "longitude"
        lon[:] = WEST + SIZE * (np.arange(COLUMNS) + 0.5)
        tmin = nc.createVariable("tmin", "f4", ("time", "lat", "lon"), fill_value=np.float32(-9999))
        tmin.units, tmin.standard_name, tmin.cell_methods = "degC", "air_temperature", "time: minimum"
        tmin[:] = np.where(np.isnan(values), -9999, values)
    curve = "".join(f"\n      - {{date: {m:02d}-{d:02d}, lt10: {a}, lt50: {b}, lt90: {c}}}" for m, d, a, b, c in ROWS_OF_CURVES)
    with open(os.path.join(folder, "cultivars.yaml"), "w") as out:
        for name, tolerance, variants in (("oak", "split-logistic", "[" + ", ".join(f"{{id: v{i}, offset: {o}}}" for i, o in enumerate(OFFSETS)) + "]"),
                                          ("ash", "split-probit", f"{{sd: {SPREAD}}}")):
            out.write(f"  - id: {name}\n    model: dated\n    source: invented\n    status: invented\n    tolerance: {tolerance}\n"
                      f"    variants: {variants}\n    curve:{curve}\n")


def run(jar, folder, name, damage):
    path = os.path.join(folder, name + ".yaml")
    with open(path, "w") as out:
        out.write("temperature: {minimum: tmin.nc}\ncultivars: cultivars.yaml\n"
                  f"damage: {{neighbourhood-km: {KILOMETRES}, {damage}}}\noutputs: {{folder: {name}}}\n")
    subprocess.run(["java", "-jar", jar, "map", path, "--overwrite"], check=True, stderr=subprocess.DEVNULL)
    return os.path.join(folder, name)


def raster(*parts):
    """[band, row, column] of a GeoTIFF, NaN where there is no value."""
    file = gdal.Open(os.path.join(*parts) + ".tif")
    values = file.ReadAsArray().astype(float)
    values[values == file.GetRasterBand(1).GetNoDataValue()] = np.nan
    return values if values.ndim == 3 else values[None]


def lethal(date):
    """LT10, LT50, LT90 of a night, linear in days."""
    begin = date.year if date.month >= 7 else date.year - 1
    at = [dt.date(begin if m >= 7 else begin + 1, m, d).toordinal() for m, d, *_ in ROWS_OF_CURVES]
    return [np.interp(date.toordinal(), at, [row[k] for row in ROWS_OF_CURVES]) for k in (2, 3, 4)]


def killed(margin, warm, cold, probit):
    """Share of buds killed at a margin to LT50; warm and cold are LT10 - LT50 and LT50 - LT90."""
    tenth = norm.ppf(0.9) if probit else math.log(9)
    z = -margin * tenth / np.where(margin > 0, warm, cold)
    return norm.cdf(z) if probit else 1 / (1 + np.exp(-z))


class Winter:
    """Margins and damage of every night of one winter."""

    def __init__(self, days, values, year, probit):
        nights = [n for n, day in enumerate(days) if dt.date(year, 9, 1) <= day <= dt.date(year + 1, 5, 31)]
        lt = np.array([lethal(days[n]) for n in nights])[:, :, None, None]
        t = values[nights].astype(float)
        self.margins = [np.min(t - lt[:, k], 0) for k in (1, 0, 2)]                # LT50, LT10, LT90
        self.all = t - lt[:, 1]
        self.warm, self.cold = lt[:, 0] - lt[:, 1], lt[:, 1] - lt[:, 2]
        self.p = killed(self.all, self.warm, self.cold, probit)
        self.phase = np.array([0 if days[n].month >= 9 and days[n].month < 12 else 1 if days[n].month in (12, 1, 2) else 2 for n in nights])
        self.probit = probit

    def expected(self, sd):
        """Expected share with a normal error of the margin of the deadliest night."""
        worst = np.argmax(np.nan_to_num(self.p), 0)[None]
        margin, warm, cold = (np.take_along_axis(np.broadcast_to(v, self.p.shape), worst, 0)[0] for v in (self.all, self.warm, self.cold))
        node, weight = np.polynomial.hermite.hermgauss(32)
        return sum(w * killed(margin - math.sqrt(2) * sd * x, warm, cold, self.probit) for x, w in zip(node, weight)) / math.sqrt(math.pi)

    def joined(self, rule, nights):
        """Damage of those nights."""
        p = self.p[nights]
        if len(p) == 0:
            return np.zeros(self.p.shape[1:])
        if rule == "worst":
            return p.max(0)
        if rule == "independent":
            return 1 - np.prod(1 - p, 0)
        u = np.linspace(-8, 8, 401)
        alive = np.ones(u.shape + p.shape[1:])
        for night in norm.ppf(p):
            alive *= norm.cdf((math.sqrt(RHO) * u[:, None, None] - night) / math.sqrt(1 - RHO))
        return 1 - np.trapz(alive * norm.pdf(u)[:, None, None], u, axis=0)


def shares(winters, rule):
    """Sum of what each phase adds divided by the sum of the damage, winters below 0.001 left out."""
    added, total = np.zeros((3, ROWS, COLUMNS)), np.zeros((ROWS, COLUMNS))
    for winter in winters:
        reached = [winter.joined(rule, winter.phase <= phase) for phase in range(3)]
        counts = reached[2] >= 0.001
        parts = np.diff(np.array([np.zeros((ROWS, COLUMNS))] + reached), axis=0)
        added += np.where(counts, parts, 0)
        total += np.where(counts, reached[2], 0)
    return np.where(total > 0, added / np.where(total > 0, total, 1), np.nan)


def mildest(mean):
    """Highest mean margin within the distance, on the ellipsoid WGS 84, by the size of the cells of each row."""
    a, f = 6378.137, 1 / 298.257223563
    e2 = f * (2 - f)
    best = np.full(mean.shape, np.nan)
    for row in range(ROWS):
        phi = math.radians(NORTH - SIZE * (row + 0.5))
        w2 = 1 - e2 * math.sin(phi) ** 2
        width = a / math.sqrt(w2) * math.cos(phi) * math.radians(SIZE)
        height = a * (1 - e2) / w2 ** 1.5 * math.radians(SIZE)
        for column in range(COLUMNS):
            y, x = np.ogrid[:ROWS, :COLUMNS]
            near = np.hypot((y - row) * height, (x - column) * width) <= KILOMETRES
            best[row, column] = np.nanmax(np.where(near, mean, np.nan))
    return best


def bounds(k, n):
    return beta.ppf(0.05, k + 0.5, n - k + 0.5), beta.ppf(0.95, k + 0.5, n - k + 0.5)


def check_uncertain(out, cultivar, winters, population):
    sd = math.sqrt(sum(s * s for s in SD.values()))
    check(f"{cultivar} damage", raster(out, cultivar, "winters", "damage"), [w.joined("worst", slice(None)) for w in winters], 1e-5)
    check(f"{cultivar} damage-mean", raster(out, cultivar, "damage-mean"), np.mean([w.expected(sd) for w in winters], 0), 1e-5)
    for level, k in ((50, 0), (10, 1), (90, 2)):
        margins = np.array([w.margins[k] for w in winters])
        p = norm.cdf(-margins / sd).mean(0)
        name = f"damage-probability-{level}"
        check(f"{cultivar} {name}", raster(out, cultivar, name), p, 1e-5)
        low, high = bounds(p * WINTERS, WINTERS)
        check(f"{cultivar} {name}-lower", raster(out, cultivar, name + "-lower"), np.minimum(low, p), 1e-5)
        check(f"{cultivar} {name}-upper", raster(out, cultivar, name + "-upper"), np.maximum(high, p), 1e-5)
        shared = norm.cdf(-margins / math.hypot(sd, SPREAD)).mean(0) if population is None else \
            np.mean([norm.cdf(-(margins - o) / sd).mean(0) for o in population], 0)
        check(f"{cultivar} population-{name}", raster(out, cultivar, "population-" + name), shared, 1e-5)
    margins = np.array([w.margins[0] for w in winters])
    parts = {"winter": margins.var(0), "cultivar": SPREAD ** 2 if population is None else np.var(population), "interaction": 0.0,
             **{name: s * s for name, s in SD.items()}}
    missing = np.where(np.isnan(margins[0]), np.nan, 1)
    for name, part in parts.items():
        check(f"{cultivar} variance-{name}", raster(out, cultivar, "variance-" + name), part / sum(parts.values()) * missing, 1e-5)
    gain = norm.ppf(0.9) * SPREAD if population is None else np.median(population) - min(population)
    check(f"{cultivar} hardier-gain", raster(out, cultivar, "hardier-gain"), gain * missing, 1e-4)
    mean = margins.mean(0)
    check(f"{cultivar} milder-site-gain", raster(out, cultivar, "milder-site-gain"), mildest(mean) - mean, 1e-4)


def check_shares(out, cultivar, winters, rule):
    for name, expected in zip(("autumn", "midwinter", "spring"), shares(winters, rule)):
        check(f"{rule} {cultivar} {name}-share", raster(out, cultivar, name + "-share"), expected, 1e-5)


def check_joined(out, cultivar, winters, rule):
    damage = np.array([w.joined(rule, slice(None)) for w in winters])
    check(f"{rule} {cultivar} damage", raster(out, cultivar, "winters", "damage"), damage, 1e-5)
    check(f"{rule} {cultivar} damage-mean", raster(out, cultivar, "damage-mean"), damage.mean(0), 1e-5)
    missing = np.where(np.isnan(damage[0]), np.nan, 1)
    for level in (10, 50, 90):
        assert np.nanmin(np.abs(damage - level / 100)) > 1e-5, "choose other weather: a damage lies on a level"
        check(f"{rule} {cultivar} damage-probability-{level}", raster(out, cultivar, f"damage-probability-{level}"),
              (damage >= level / 100).mean(0) * missing, 1e-6)


def main(jar, folder):
    os.makedirs(folder, exist_ok=True)
    days, values = weather()
    write_inputs(folder, days, values)
    uncertain = run(jar, folder, "uncertain", "uncertainty: {" + ", ".join(f"{k}: {v}" for k, v in SD.items()) + "}")
    independent = run(jar, folder, "independent", "nights: independent")
    correlated = run(jar, folder, "correlated", f"nights: {{rule: correlated, rho: {RHO}}}")
    of = {name: [Winter(days, values, 2000 + w, name == "ash") for w in range(WINTERS)] for name in ("oak", "ash")}
    for cultivar, winters in of.items():
        check_uncertain(uncertain, cultivar, winters, OFFSETS if cultivar == "oak" else None)
        check_shares(uncertain, cultivar, winters, "worst")
        for out, rule in ((independent, "independent"), (correlated, "correlated")):
            check_joined(out, cultivar, winters, rule)
            check_shares(out, cultivar, winters, rule)
    # The two cultivars have the same LT50, so all of the variance is between winters.
    margins = np.array([[w.margins[0] for w in winters] for winters in of.values()])
    check("variance-winter of all cultivars", raster(independent, "shared", "variance-winter"), np.where(np.isnan(margins[0, 0]), np.nan, 1), 1e-5)
    print(f"{passed} passed, {failed} failed")
    return failed != 0


if __name__ == "__main__":
    sys.exit(main(sys.argv[1], sys.argv[2]))
