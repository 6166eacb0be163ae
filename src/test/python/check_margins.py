#!/usr/bin/python3
"""Computes the layers of a run anew, in double precision and from the files alone, and compares them with a finished output folder.

  check_margins.py RUN_FOLDER OUT_FOLDER    compare; exits 1 when a layer differs
  check_margins.py --self-test              check the functions below against src/test/resources/checks

RUN_FOLDER holds run.yaml: one NetCDF minimum in degC or K on a geographic grid, a terrain model and a source height (or neither), `dated` cultivars.
Tolerances: margins and temperatures 1e-4 K, probabilities 1e-5, whole numbers equal, missing cells the same. Where a count or a date hangs on a margin
closer to its limit than 1e-4 K either answer is accepted, and the number of such cells is printed.
"""
import csv
import datetime as dt
import glob
import json
import math
import os
import sys
from dataclasses import dataclass

import numpy as np
from scipy.stats import beta
from scipy.special import erfc

MARGIN_TOLERANCE = 1e-4
PROBABILITY_TOLERANCE = 1e-5
LN9 = math.log(9.0)
FEWEST_WINTERS_FOR_CLASS = 5
CLASS_NAMES = ("secure", "workable", "marginal", "unfit")


# ---- equations -------------------------------------------------------------------------------------------------------------------------

def death_probability(t, lt10, lt50, lt90):
    """Split logistic through the three points: share of buds dead after temperature t."""
    scale = np.where(t > lt50, (lt10 - lt50) / LN9, (lt50 - lt90) / LN9)
    a = (t - lt50) / scale
    small = np.exp(-np.abs(a))
    return np.where(a >= 0, small / (1 + small), 1 / (1 + small))


def normal_above(x):
    """P(standard normal > x)."""
    return 0.5 * erfc(x / math.sqrt(2))


def expected_death(t, lt10, lt50, lt90, sd, points=32):
    """Mean of the split logistic over a normal error of t."""
    if sd == 0:
        return death_probability(t, lt10, lt50, lt90)
    node, weight = np.polynomial.hermite_e.hermegauss(points)
    return sum(w * death_probability(t - sd * e, lt10, lt50, lt90) for e, w in zip(node, weight)) / weight.sum()


def jeffreys(k, n, interval):
    """Two-sided bounds of a probability after k of n (k need not be whole)."""
    k, n = np.asarray(k, float), np.asarray(n, float)
    tail = (1 - interval) / 2
    lower = np.where(k <= 0, 0.0, beta.ppf(tail, k + 0.5, n - k + 0.5))
    upper = np.where(k >= n, 1.0, beta.ppf(1 - tail, k + 0.5, n - k + 0.5))
    return lower, upper


def month_counts(missing, longest):
    """Whether a month with so many missing days, and such a longest run of them, counts."""
    return (missing <= 10) & (longest < 5)


def quantile7(values, share):
    """Type-7 quantile over the first axis, missing values left out."""
    ordered = np.sort(values, axis=0)                         # NaN goes last
    n = np.isfinite(values).sum(0)
    place = (n - 1) * share
    low = np.clip(np.floor(place), 0, None).astype(int)
    high = np.minimum(low + 1, np.maximum(n - 1, 0))
    a, b = (np.take_along_axis(ordered, i[None], 0)[0] for i in (low, high))
    return np.where(n > 0, a + (place - low) * (b - a), np.nan)


def needed_hardiness(margins, target):
    """Shift of the curve so that the share `target` of the winters at most stays below zero margin; negative is spare."""
    ordered = np.sort(margins, axis=0)
    n = np.isfinite(margins).sum(0)
    k = np.minimum(np.floor(target * n + 1e-9).astype(int), np.maximum(n - 1, 0))
    return np.where(n > 0, -np.take_along_axis(ordered, k[None], 0)[0], np.nan)


def bilinear_plan(target, centres, step):
    """For each target coordinate: containing index (-1 outside), the two neighbours and the weight of the second."""
    place = (target - centres[0]) / step
    containing = np.floor(place + 0.5).astype(int)
    outside = (containing < 0) | (containing >= centres.size)
    held = np.clip(place, 0, centres.size - 1)
    first = np.minimum(np.floor(held).astype(int), max(centres.size - 2, 0))
    second = np.minimum(first + 1, centres.size - 1)
    return np.where(outside, -1, containing), first, second, held - first


def interpolate(field, rows, columns):
    """Bilinear on the plans of rows and columns; missing corners left out, missing where the containing source cell is missing."""
    (inside_r, r0, r1, wr), (inside_c, c0, c1, wc) = rows, columns
    total, weight = 0.0, 0.0
    for r, vr in ((r0, 1 - wr), (r1, wr)):
        for c, vc in ((c0, 1 - wc), (c1, wc)):
            corner = field[np.ix_(r, c)]
            w = np.outer(vr, vc) * np.isfinite(corner)
            total = total + w * np.where(np.isfinite(corner), corner, 0)
            weight = weight + w
    home = field[np.ix_(np.maximum(inside_r, 0), np.maximum(inside_c, 0))]
    seen = np.isfinite(home) & np.outer(inside_r >= 0, inside_c >= 0)
    with np.errstate(invalid="ignore", divide="ignore"):
        return np.where(seen, total / weight, np.nan)


# ---- inputs ----------------------------------------------------------------------------------------------------------------------------

@dataclass
class Minima:
    lat: np.ndarray
    lon: np.ndarray
    dates: list            # ascending
    values: np.ndarray     # [day, row, column] degC, NaN missing, north-west first


def unpack(v):
    """Values of a NetCDF variable, raw fill compared before unpacking."""
    v.set_auto_maskandscale(False)
    raw = v[:]
    gone = np.zeros(raw.shape, bool)
    for name in ("_FillValue", "missing_value"):
        if name in v.ncattrs():
            gone |= raw == v.getncattr(name)
    scale = float(v.getncattr("scale_factor")) if "scale_factor" in v.ncattrs() else 1.0
    offset = float(v.getncattr("add_offset")) if "add_offset" in v.ncattrs() else 0.0
    # A float scale such as 0.1f means the decimal 0.1: it is taken at its shortest decimal.
    if "scale_factor" in v.ncattrs():
        scale = float(str(v.getncattr("scale_factor")))
    out = raw.astype(float) * scale + offset
    out[gone] = np.nan
    return out


def read_minima(paths, variable=None):
    import cftime
    import netCDF4
    parts = []
    for path in sorted(paths):
        with netCDF4.Dataset(path) as nc:
            names = [k for k, v in nc.variables.items() if "minimum" in getattr(v, "cell_methods", "") and v.ndim == 3]
            v = nc[variable or names[0]]
            t = nc["time"]
            if getattr(t, "calendar", "standard") not in ("standard", "gregorian", "proleptic_gregorian"):
                sys.exit("this check knows the civil calendar only: " + path)
            stamp = nc[t.bounds][:].mean(1) if "bounds" in t.ncattrs() else t[:]
            when = cftime.num2date(np.asarray(stamp), t.units, "standard")
            dates = [dt.date(w.year, w.month, w.day) for w in when]
            values = unpack(v)
            if v.units in ("K", "kelvin"):
                values -= 273.15
            lat, lon = np.asarray(nc[v.dimensions[1]][:], float), np.asarray(nc[v.dimensions[2]][:], float)
            if lat[0] < lat[-1]:
                lat, values = lat[::-1], values[:, ::-1]
            parts.append((lat, lon, dates, values))
    parts.sort(key=lambda p: p[2][0])
    lat, lon = parts[0][:2]
    return Minima(lat, lon, [d for p in parts for d in p[2]], np.concatenate([p[3] for p in parts]))


def read_height(path):
    import netCDF4
    with netCDF4.Dataset(path) as nc:
        v = next(v for v in nc.variables.values() if getattr(v, "standard_name", "") == "surface_altitude")
        z = unpack(v)
        lat = nc[v.dimensions[0]][:]
        return z if lat[0] > lat[-1] else z[::-1]


def read_dem(path):
    from osgeo import gdal
    gdal.UseExceptions()
    ds = gdal.Open(path)
    z = ds.ReadAsArray().astype(float)
    fill = ds.GetRasterBand(1).GetNoDataValue()
    if fill is not None:
        z[z == fill] = np.nan
    g = ds.GetGeoTransform()
    return g[3] + g[5] * (np.arange(z.shape[0]) + 0.5), g[0] + g[1] * (np.arange(z.shape[1]) + 0.5), z


def read_yaml(path):
    import yaml
    with open(path, encoding="utf-8") as f:
        return yaml.load(f, yaml.BaseLoader)          # every scalar a text: 09-01 stays 09-01


def curve_days(rows, dates):
    """LT10, LT50, LT90 [3][night] of one winter: linear in days between the listed month-days."""
    first, last = dates[0], dates[-1]
    knots = []
    for row in rows:
        month, day = (int(x) for x in row["date"].split("-"))
        for year in range(first.year - 1, last.year + 2):
            knots.append(((dt.date(year, month, day) - first).days, [float(row[k]) for k in ("lt10", "lt50", "lt90")]))
    knots.sort(key=lambda k: k[0])
    # A curve says nothing between its last row in spring and its first in autumn: both ends of the window must be rows or lie between rows.
    x = np.array([k[0] for k in knots], float)
    y = np.array([k[1] for k in knots])
    nights = np.arange((last - first).days + 1)
    return np.array([np.interp(nights, x, y[:, j]) for j in range(3)])


# ---- the chain -------------------------------------------------------------------------------------------------------------------------

def winter_windows(dates):
    """(label, number, all dates of the window) of each winter that the record touches, northern hemisphere."""
    for year in range(dates[0].year - 1, dates[-1].year + 1):
        start, end = dt.date(year, 9, 1), dt.date(year + 1, 5, 31)
        if end >= dates[0] and start <= dates[-1]:
            yield "%d-%02d" % (year, (year + 1) % 100), year + 1, [start + dt.timedelta(k) for k in range((end - start).days + 1)]


def complete(present, window):
    """[row, column]: every month from November to April counts. `present` is [day of window, row, column]."""
    ok = np.ones(present.shape[1:], bool)
    for month in (11, 12, 1, 2, 3, 4):
        days = [k for k, d in enumerate(window) if d.month == month]
        run = longest = missing = np.zeros(present.shape[1:], int)
        for k in days:
            gone = ~present[k]
            run = np.where(gone, run + 1, 0)
            longest = np.maximum(longest, run)
            missing = missing + gone
        ok &= month_counts(missing, longest)
    return ok


@dataclass
class Result:
    lat: np.ndarray
    lon: np.ndarray
    labels: list           # winters in order
    numbers: list
    valid: np.ndarray      # [winter, row, column]
    minimum: np.ndarray    # [winter, row, column]
    height_change: np.ndarray
    elevation: np.ndarray
    cultivars: dict        # id -> dict of [winter, row, column] arrays: margin (per level too), damage, night, expected


def levels_of(run):
    return [int(x) for x in run.get("damage", {}).get("levels", ["10", "50", "90"])]


def compute(folder, run, progress=lambda text: None):
    """The winter quantities of every cultivar on the target grid."""
    pattern = run["temperature"]["minimum"]
    paths = [p for one in ([pattern] if isinstance(pattern, str) else pattern) for p in glob.glob(os.path.join(folder, one))]
    source = read_minima(paths, run["temperature"].get("variable"))
    index = {d: k for k, d in enumerate(source.dates)}
    if "elevation" in run:
        z_source = read_height(os.path.join(folder, run["elevation"]["source-height"]))
        lat, lon, z = read_dem(os.path.join(folder, run["elevation"]["dem"]))
        lapse = float(run["elevation"]["lapse-rate"])
    else:
        lat, lon, z, z_source, lapse = source.lat, source.lon, np.zeros((source.lat.size, source.lon.size)), 0.0, 0.0
    step_lat = (source.lat[-1] - source.lat[0]) / (source.lat.size - 1)
    step_lon = (source.lon[-1] - source.lon[0]) / (source.lon.size - 1)
    rows, columns = bilinear_plan(lat, source.lat, step_lat), bilinear_plan(lon, source.lon, step_lon)
    outside = ~np.outer(rows[0] >= 0, columns[0] >= 0)
    sd = math.sqrt(sum(float(v) ** 2 for v in run.get("damage", {}).get("uncertainty", {}).values()))
    entries = [c for name in run["cultivars"]["files"] for c in read_yaml(os.path.join(folder, name))["cultivars"]]
    use = run["cultivars"].get("use") or [c["id"] for c in entries]
    entries = [c for c in entries if c["id"] in use]
    levels = sorted(set(levels_of(run)) | {50})
    labels, numbers, valid, minima = [], [], [], []
    folds = {c["id"]: {k: [] for k in ["margin", "damage", "night", "expected"] + ["level-%d" % q for q in levels]} for c in entries}
    for label, number, window in winter_windows(source.dates):
        progress(label)
        blank = np.full(source.values.shape[1:], np.nan)
        field = np.stack([source.values[index[d]] if d in index else blank for d in window])
        judged = complete(np.isfinite(field), window)
        good = judged[np.ix_(np.maximum(rows[0], 0), np.maximum(columns[0], 0))] & ~outside & np.isfinite(z)
        state = {c["id"]: fresh(z.shape, levels) for c in entries}
        lowest = np.full(z.shape, np.inf)
        curves = {c["id"]: curve_days(c["curve"], window) for c in entries}
        for k, date in enumerate(window):
            if date not in index:
                continue
            if "elevation" in run:
                t = interpolate(field[k] + lapse * z_source / 1000, rows, columns) - lapse * z / 1000
            else:
                t = field[k]
            lowest = np.fmin(lowest, t)
            for c in entries:
                fold(state[c["id"]], t, k, *curves[c["id"]][:, k], levels)
        gone = ~good
        labels.append(label)
        numbers.append(number)
        valid.append(good)
        minima.append(np.where(gone, np.nan, lowest))
        for c in entries:
            s, out = state[c["id"]], folds[c["id"]]
            out["margin"].append(np.where(gone, np.nan, s["level-50"]))
            out["damage"].append(np.where(gone, np.nan, s["damage"]))
            out["night"].append(np.where(gone, np.nan, s["night"]))
            lt = curves[c["id"]][:, s["greatest"]]
            out["expected"].append(np.where(gone, np.nan, expected_death(s["at"], *lt, sd)))
            for q in levels:
                out["level-%d" % q].append(np.where(gone, np.nan, s["level-%d" % q]))
    cultivars = {i: {k: np.stack(v) for k, v in d.items()} for i, d in folds.items()}
    change = z - interpolate(np.broadcast_to(z_source, source.values.shape[1:]).astype(float), rows, columns)
    return Result(lat, lon, labels, numbers, np.stack(valid), np.stack(minima), change, z, cultivars)


def fresh(shape, levels):
    s = {"level-%d" % q: np.full(shape, np.inf) for q in levels}
    return dict(s, damage=np.full(shape, -1.0), night=np.zeros(shape, int), greatest=np.zeros(shape, int), at=np.full(shape, np.nan))


def fold(s, t, night, lt10, lt50, lt90, levels):
    """Takes one night into the state of a winter; strict comparisons keep the earliest of equals."""
    lower = t - lt50 < s["level-50"]
    s["night"][lower] = night
    for q in levels:
        at = {10: lt10, 50: lt50, 90: lt90}.get(q)
        if at is None:
            side = lt10 - lt50 if q < 50 else lt50 - lt90
            at = lt50 - side / LN9 * math.log(q / (100 - q))
        s["level-%d" % q] = np.fmin(s["level-%d" % q], t - at)
    p = death_probability(t, lt10, lt50, lt90)
    more = p > s["damage"]
    s["damage"][more] = p[more]
    s["greatest"][more] = night
    s["at"][more] = t[more]


def summaries(result, run):
    """{cultivar: {layer: array}} and {shared layer: array or list of bands}."""
    killing = int(run.get("damage", {}).get("killing", 50))
    statistics = run.get("statistics", {})
    interval, target = float(statistics.get("interval", 0.90)), float(statistics.get("target", 0.10))
    limits = [float(x) for x in run.get("classes", (0.05, 0.10, 0.20))]
    sd = math.sqrt(sum(float(v) ** 2 for v in run.get("damage", {}).get("uncertainty", {}).values()))
    n = result.valid.sum(0)
    none = n == 0
    out = {}
    import warnings
    with warnings.catch_warnings(), np.errstate(all="ignore"):
        warnings.simplefilter("ignore")
        for name, w in result.cultivars.items():
            m = w["margin"]
            s = {"margin-mean": np.nanmean(m, 0), "margin-low": quantile7(m, 0.1), "margin-worst": np.nanmin(m, 0),
                 "damage-mean": np.nanmean(w["expected"], 0)}
            first = np.argmin(np.where(np.isnan(m), np.inf, m), 0)
            s["worst-winter"] = np.where(none, np.nan, np.array(result.numbers, float)[first])
            for q in levels_of(run):
                p = frequency(w["level-%d" % q], sd)
                lower, upper = jeffreys(n * np.where(none, 0, p), np.maximum(n, 1), interval)
                s["damage-probability-%d" % q] = p
                s["damage-probability-%d-lower" % q] = np.where(none, np.nan, lower)
                s["damage-probability-%d-upper" % q] = np.where(none, np.nan, upper)
            kill = frequency(w["level-%d" % killing], sd)
            s["killing-winter-return"] = np.where(kill > 0, 1 / kill, np.nan)
            s["suitability"] = np.where(n < FEWEST_WINTERS_FOR_CLASS, np.nan, class_of(kill, limits))
            s["required-hardiness"] = needed_hardiness(w["level-%d" % killing], target)
            s["(killing)"] = kill
            out[name] = s
        meets = sum((s["(killing)"] <= target + 1e-12).astype(int) for s in out.values())
        best = np.max([s["margin-low"] for s in out.values()], 0)
        shared = {"valid-winters": n.astype(float), "mean-minimum": np.nanmean(result.minimum, 0), "height-change": result.height_change,
                  "elevation": result.elevation,
                  "choice": [np.where(none, np.nan, meets), best]}
    return out, shared


def frequency(margins, sd):
    """Mean over valid winters of the probability that the level is reached."""
    hit = np.where(np.isnan(margins), np.nan, (margins <= 0) if sd == 0 else normal_above(margins / sd))
    return np.nanmean(hit, 0)


def class_of(frequency_, limits):
    """0 secure .. 3 unfit; a frequency on a limit belongs to the better class."""
    return np.where(np.isnan(frequency_), np.nan, sum((frequency_ > x + 1e-12).astype(int) for x in limits))


# ---- comparison ------------------------------------------------------------------------------------------------------------------------

class Tally:
    def __init__(self):
        self.passed = self.failed = 0

    def say(self, ok, name, text):
        self.passed, self.failed = self.passed + bool(ok), self.failed + (not ok)
        print("%s %s: %s" % ("ok    " if ok else "FAILED", name, text))


def read_bands(path):
    """Bands as float with NaN for missing, their descriptions, category names of the first."""
    from osgeo import gdal
    gdal.UseExceptions()
    ds = gdal.Open(path)
    bands, words = [], []
    for k in range(1, ds.RasterCount + 1):
        b = ds.GetRasterBand(k)
        a = b.ReadAsArray().astype(float)
        if b.GetNoDataValue() is not None:
            a[a == b.GetNoDataValue()] = np.nan
        bands.append(a)
        words.append(b.GetDescription())
    return bands, words, ds.GetRasterBand(1).GetCategoryNames(), ds.GetGeoTransform()


def difference(mine, theirs, tolerance, relative=False, excused=None):
    """None when equal within the tolerance and missing in the same cells, else what differs."""
    if mine.shape != theirs.shape:
        return "%s cells instead of %s" % (theirs.shape, mine.shape)
    odd = np.isnan(mine) != np.isnan(theirs)
    if excused is not None:
        odd &= ~excused
    if odd.any():
        r, c = np.argwhere(odd)[0]
        return "%d cells missing on one side only, first at row %d column %d (here %s, there %s)" % (odd.sum(), r, c, mine[r, c], theirs[r, c])
    gap = np.abs(mine - theirs)
    if relative:
        gap = gap / np.maximum(1, np.abs(mine))
    if excused is not None:
        gap = np.where(excused, 0, gap)
    gap = np.where(np.isnan(gap), 0, gap)
    if gap.max() > tolerance:
        r, c = np.unravel_index(np.argmax(gap), gap.shape)
        return "%d cells beyond %g, worst at row %d column %d: here %.9g, there %.9g" % ((gap > tolerance).sum(), tolerance, r, c, mine[r, c], theirs[r, c])
    return None


class Comparison:
    def __init__(self, out, tally):
        self.out, self.tally = out, tally

    def load(self, *parts):
        path = os.path.join(self.out, *parts) + ".tif"
        if not os.path.exists(path):
            self.tally.say(False, "/".join(parts), "no such file")
            return None
        return read_bands(path)

    def layer(self, name, mine, theirs, tolerance, relative=False, excused=None, note=""):
        wrong = difference(mine, theirs, tolerance, relative, excused)
        close = "" if excused is None or not excused.any() else ", %d cells too close to a limit to judge" % excused.sum()
        text = wrong or "%d cells, greatest difference %.2g%s" % (np.isfinite(mine).sum(), np.nanmax(np.append(np.abs(mine - theirs)[
            ~excused if excused is not None else np.ones(mine.shape, bool)], 0)), close)
        self.tally.say(not wrong, name, text + note)

    def winters(self, result, parts, mine, tolerance, excused=None):
        """One band a winter, matched by its label; a winter that is valid nowhere may be left out."""
        got = self.load(*parts)
        if not got:
            return
        bands, words = got[0], got[1]
        theirs = dict(zip(words, bands))
        name = "/".join(parts)
        strange = [w for w in words if w not in result.labels]
        if strange or len(theirs) != len(bands):
            self.tally.say(False, name, "band descriptions %s" % words)
            return
        wrong, worst = [], 0.0
        for k, label in enumerate(result.labels):
            if label not in theirs:
                if result.valid[k].any():
                    wrong.append(label + ": no such band")
                continue
            text = difference(mine[k], theirs[label], tolerance, False, None if excused is None else excused(k, theirs[label]))
            if text:
                wrong.append(label + ": " + text)
            else:
                gap = np.abs(mine[k] - theirs[label])
                if excused is None and np.isfinite(gap).any():
                    worst = max(worst, np.nanmax(gap))
        self.tally.say(not wrong, name, "; ".join(wrong) or "%d winters, greatest difference %.2g" % (len(bands), worst))


def compare(folder, out):
    run = read_yaml(os.path.join(folder, "run.yaml"))
    result = compute(folder, run)
    per_cultivar, shared = summaries(result, run)
    tally = Tally()
    c = Comparison(out, tally)
    none = ~result.valid.any(0)
    killing = "level-%d" % int(run.get("damage", {}).get("killing", 50))
    target = float(run.get("statistics", {}).get("target", 0.10))
    limits = [float(x) for x in run.get("classes", (0.05, 0.10, 0.20))]
    with np.errstate(invalid="ignore"):
        undecided_choice = np.zeros(none.shape, bool)
        for name, w in result.cultivars.items():
            s = per_cultivar[name]
            c.winters(result, (name, "winters", "margin"), w["margin"], MARGIN_TOLERANCE)
            c.winters(result, (name, "winters", "damage"), w["damage"], PROBABILITY_TOLERANCE)
            check_nights(c, result, name, w, folder, run)
            for layer in ("margin-mean", "margin-low", "margin-worst", "required-hardiness"):
                got = c.load(name, layer)
                if got:
                    c.layer("%s/%s" % (name, layer), s[layer], got[0][0], MARGIN_TOLERANCE)
            got = c.load(name, "worst-winter")
            if got:
                ordered = np.sort(np.where(np.isnan(w["margin"]), np.inf, w["margin"]), 0)
                c.layer(name + "/worst-winter", s["worst-winter"], got[0][0], 0, excused=ordered[1] - ordered[0] < MARGIN_TOLERANCE)
            got = c.load(name, "damage-mean")
            if got:
                c.layer(name + "/damage-mean", s["damage-mean"], got[0][0], PROBABILITY_TOLERANCE)
            for q in levels_of(run):
                near = (np.abs(w["level-%d" % q]) < MARGIN_TOLERANCE).any(0)
                for end in ("", "-lower", "-upper"):
                    layer = "damage-probability-%d%s" % (q, end)
                    got = c.load(name, layer)
                    if got:
                        c.layer("%s/%s" % (name, layer), s[layer], got[0][0], PROBABILITY_TOLERANCE, excused=near)
            near = (np.abs(w[killing]) < MARGIN_TOLERANCE).any(0)
            undecided_choice |= near
            got = c.load(name, "killing-winter-return")
            if got:
                c.layer(name + "/killing-winter-return", s["killing-winter-return"], got[0][0], PROBABILITY_TOLERANCE, True, near)
            got = c.load(name, "suitability")
            if got:
                c.layer(name + "/suitability", class_values(s["suitability"], got[2]), got[0][0], 0, excused=near)
            if len(limits) != 3:
                tally.say(False, name, "this check expects three class limits")
        c.winters(result, ("shared", "winters", "minimum"), result.minimum, MARGIN_TOLERANCE)
        got = c.load("shared", "valid-winters")
        if got:       # a cell without any valid winter may say 0 or stay missing
            c.layer("shared/valid-winters", np.where(none, 0, shared["valid-winters"]), np.where(none & np.isnan(got[0][0]), 0, got[0][0]), 0)
        got = c.load("shared", "mean-minimum")
        if got:
            c.layer("shared/mean-minimum", shared["mean-minimum"], got[0][0], MARGIN_TOLERANCE)
        if "elevation" in run:
            got = c.load("shared", "height-change")
            if got:   # metres; where no winter is valid the layer may be missing
                c.layer("shared/height-change", shared["height-change"], got[0][0], 1e-3, excused=none)
            got = c.load("shared", "elevation")
            if got:
                c.layer("shared/elevation", shared["elevation"], got[0][0], 1e-3)
        got = c.load("shared", "choice")
        if got:
            c.layer("shared/choice band 1", shared["choice"][0], got[0][0], 0, excused=undecided_choice)
            if len(got[0]) > 1:
                c.layer("shared/choice band 2", shared["choice"][1], got[0][1], MARGIN_TOLERANCE)
            else:
                tally.say(False, "shared/choice band 2", "no such band")
        got = c.load("shared", "valid-winters")
        if got:
            step = result.lon[1] - result.lon[0]
            corner = (result.lon[0] - step / 2, result.lat[0] - (result.lat[1] - result.lat[0]) / 2)
            gap = max(abs(got[3][0] - corner[0]), abs(got[3][3] - corner[1]), abs(got[3][1] - step))
            tally.say(gap < 1e-9, "grid", "north-west corner %s, off by %.1g degrees" % (corner, gap))
    print("%d passed, %d failed" % (tally.passed, tally.failed))
    return tally.failed == 0


def class_values(classes, names):
    """Classes 0..3 as the values that the file's category names give them; 1..4 where it names none."""
    values = []
    for k, word in enumerate(CLASS_NAMES):
        hits = [i for i, text in enumerate(names or []) if word in text.lower()]
        values.append(hits[0] if hits else k + 1)
    return np.where(np.isnan(classes), np.nan, np.array(values, float)[np.where(np.isnan(classes), 0, classes).astype(int)])


def check_nights(c, result, name, w, folder, run):
    """The night that the file names must be the one found here, or reach the winter's margin within the tolerance."""
    def excused(k, theirs):
        differs = (w["night"][k] != theirs) & np.isfinite(w["night"][k]) & np.isfinite(theirs)
        out = np.zeros(differs.shape, bool)
        if differs.any():
            at = margin_of_night(result, folder, run, name, k, np.where(differs, theirs, np.nan))
            out = differs & (np.abs(at - w["margin"][k]) < MARGIN_TOLERANCE)
        return out
    c.winters(result, (name, "winters", "worst-night"), w["night"], 0, excused)


def margin_of_night(result, folder, run, name, k, nights):
    """Margin of winter k on the given night of each cell; computed only where a file disagrees."""
    entry = next(e for f in run["cultivars"]["files"] for e in read_yaml(os.path.join(folder, f))["cultivars"] if e["id"] == name)
    pattern = run["temperature"]["minimum"]
    paths = [p for one in ([pattern] if isinstance(pattern, str) else pattern) for p in glob.glob(os.path.join(folder, one))]
    source = read_minima(paths, run["temperature"].get("variable"))
    window = next(days for label, _, days in winter_windows(source.dates) if label == result.labels[k])
    lt50 = curve_days(entry["curve"], window)[1]
    out = np.full(nights.shape, np.nan)
    for night in np.unique(nights[np.isfinite(nights)]).astype(int):
        if not 0 <= night < len(window) or window[night] not in source.dates:
            continue
        field = source.values[source.dates.index(window[night])]
        if "elevation" in run:
            z_source = read_height(os.path.join(folder, run["elevation"]["source-height"]))
            lat, lon, z = read_dem(os.path.join(folder, run["elevation"]["dem"]))
            lapse = float(run["elevation"]["lapse-rate"])
            plans = [bilinear_plan(a, b, (b[-1] - b[0]) / (b.size - 1)) for a, b in ((lat, source.lat), (lon, source.lon))]
            field = interpolate(field + lapse * z_source / 1000, *plans) - lapse * z / 1000
        here = nights == night
        out[here] = (field - lt50[night])[here]
    return out


# ---- self-test -------------------------------------------------------------------------------------------------------------------------

def self_test():
    folder = os.path.join(os.path.dirname(os.path.abspath(__file__)), "..", "resources", "checks")
    tally = Tally()

    def near(name, got, wanted, tolerance=1e-9):
        tally.say(abs(got - wanted) <= tolerance * max(1, abs(wanted)), name, "%.10g, wanted %.10g" % (got, wanted))

    with open(os.path.join(folder, "tolerance_distributions.json")) as f:
        for case in json.load(f)["split_cases"]:
            for point in case["split_logistic"]["points"]:
                got = float(death_probability(np.float64(point["T"]), case["LT10"], case["LT50"], case["LT90"]))
                near("%s at %.4g" % (case["name"], point["T"]), got, point["p"], 2e-9)
    with open(os.path.join(folder, "binomial_intervals.csv")) as f:
        for row in csv.DictReader(f):
            lower, upper = jeffreys(float(row["k"]), float(row["n"]), 0.95)
            near("Jeffreys %s of %s, lower" % (row["k"], row["n"]), float(lower), float(row["jeffreys_lo"]))
            near("Jeffreys %s of %s, upper" % (row["k"], row["n"]), float(upper), float(row["jeffreys_hi"]))
    with open(os.path.join(folder, "completeness.csv")) as f:
        for row in csv.DictReader(f):
            got = bool(month_counts(int(row["missing"]), int(row["longest_run"])))
            tally.say(got == (row["ok_wmo1203"] == "1"), "month with %s missing, %s in a row" % (row["missing"], row["longest_run"]), str(got))
    with open(os.path.join(folder, "elevation.json")) as f:
        height = json.load(f)
    for case in height["constant_lapse"]:
        near("constant lapse", case["T_src"] + case["lapse_K_per_km"] * (case["z_src"] - case["z_dem"]) / 1000, case["T"])
    two = height["reduce_interpolate_restore"]
    sea = np.array(two["T"]) + two["lapse"] * np.array(two["z"]) / 1000
    plan_r = bilinear_plan(np.array([two["fy"]]), np.array([0.0, 1.0]), 1.0)
    plan_c = bilinear_plan(np.array([two["fx"]]), np.array([0.0, 1.0]), 1.0)
    at = float(interpolate(sea, plan_r, plan_c)[0, 0])
    near("reduced to sea level", at, two["T_sea"])
    near("restored", at - two["lapse"] * two["z_dem"] / 1000, two["T_out"])
    with open(os.path.join(folder, "required_hardiness.json")) as f:
        need = json.load(f)
    margins = np.array(need["margins_C"])[:, None]
    for case in need["frequency_rule"]["values"]:
        got = float(needed_hardiness(margins, case["k"] / need["frequency_rule"]["n"])[0])
        near("required hardiness, k = %d, floored at zero" % case["k"], max(0, got), case["d"])
    for case in need["quantile_rule_type7"]:
        near("type-7 quantile %g" % case["target"], float(quantile7(margins, case["target"])[0]), case["quantile"])
    print("%d passed, %d failed" % (tally.passed, tally.failed))
    return tally.failed == 0


if __name__ == "__main__":
    if sys.argv[1:] == ["--self-test"]:
        sys.exit(0 if self_test() else 1)
    if len(sys.argv) != 3:
        sys.exit(__doc__)
    sys.exit(0 if compare(sys.argv[1], sys.argv[2]) else 1)
