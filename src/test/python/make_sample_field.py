#!/usr/bin/env python3
"""Makes sample-grids/series.csv and sample-grids/field.csv; everything is invented.

The series is one cell of the sample grids. The samples are states of the thermal-time model (science: order of operations of Ferguson
et al. 2011 as the project defines it, written here anew) with the parameters of TRUTH and a normal error of 0.5 K, so that a trial fit
has something to find. Usage, from the repository's root: /usr/bin/python3 src/test/python/make_sample_field.py [FOLDER]
"""
import csv
import datetime
import glob
import sys

import netCDF4
import numpy

ROW, COLUMN = 10, 13
FIRST, LAST = datetime.date(2008, 8, 15), datetime.date(2014, 6, 15)
ERROR = 0.5
# initial, tender, hardy, (threshold, ka, kd) endo, the same eco, power, chilling
TRUTH = {
    "Ember (invented)": (-10, -1.5, -24, (12, 0.10, 0.06), (4, 0.05, 0.12), 5, -600),
    "Reed (invented)": (-10, -1.5, -20, (13, 0.07, 0.08), (3, 0.04, 0.10), 5, -450),
}


def series(folder):
    days = {}
    for name in ("tmin", "tmax"):
        for path in sorted(glob.glob(f"{folder}/{name}-*.nc")):
            with netCDF4.Dataset(path) as data:
                variable = next(v for v in data.variables.values() if v.ndim == 3)
                time = data.variables[variable.dimensions[0]]
                dates = netCDF4.num2date(time[:], time.units, time.calendar)
                for date, value in zip(dates, variable[:, ROW, COLUMN]):
                    day = datetime.date(date.year, date.month, date.day)
                    if FIRST <= day <= LAST:
                        days.setdefault(day, {})[name] = None if numpy.ma.is_masked(value) else round(float(value), 1)
    return days


def winter(days, year, parameters):
    """State at the end of the day before each day, from 7 September on; None from a gap of more than three days on."""
    initial, tender, hardy, endo, eco, power, chilling = parameters
    h, chill, cooled, phase, states, means = initial, 0.0, False, endo, {}, {}
    day, end = datetime.date(year, 9, 7), datetime.date(year + 1, 5, 31)
    while day <= end:
        values = days.get(day, {})
        if values.get("tmin") is not None and values.get("tmax") is not None:
            means[day] = (values["tmin"] + values["tmax"]) / 2
        day += datetime.timedelta(1)
    known = sorted(means)
    for before, after in zip(known, known[1:]):
        gap = (after - before).days - 1
        for i in range(1, gap + 1 if gap <= 3 else 0):
            means[before + datetime.timedelta(i)] = means[before] + (means[after] - means[before]) * i / (gap + 1)
    day = datetime.date(year, 9, 7)
    while day <= end and day in means:
        states[day] = h
        threshold, ka, kd = phase
        warm, cold = max(0, means[day] - threshold), min(0, means[day] - threshold)
        exponent = 1 if phase is endo else power
        loss = kd * warm * (1 - ((h - hardy) / (tender - hardy)) ** exponent) if cooled else 0
        gain = ka * cold * (1 - (tender - h) / (tender - hardy))
        h = min(tender, max(hardy, h + loss + gain))
        cooled = cooled or cold < 0
        chill += min(0, means[day] - 10)
        if chill <= chilling:
            phase = eco
        day += datetime.timedelta(1)
    return states


def main():
    folder = sys.argv[1] if len(sys.argv) > 1 else "sample-grids"
    days = series("sample-grids")
    with open(f"{folder}/series.csv", "w", newline="") as out:
        rows = csv.writer(out, lineterminator="\n")
        rows.writerow(["date", "tmin", "tmax"])
        for day in sorted(days):
            values = days[day]
            rows.writerow([day.isoformat()] + ["" if values.get(k) is None else values[k] for k in ("tmin", "tmax")])
    random = numpy.random.default_rng(20)
    with open(f"{folder}/field.csv", "w", newline="") as out:
        rows = csv.writer(out, lineterminator="\n")
        rows.writerow(["cultivar", "date", "lt10", "lt50", "lt90", "n"])
        for name, parameters in TRUTH.items():
            for year in range(2008, 2014):
                states = winter(days, year, parameters)
                day = datetime.date(year, 10, 6)
                while day < datetime.date(year + 1, 4, 25):
                    if day in states:
                        lt50 = states[day] + random.normal(0, ERROR)
                        above, below = 2.4 + random.normal(0, 0.2), 2.0 + random.normal(0, 0.2)
                        rows.writerow([name, day.isoformat()] + [f"{v:.1f}" for v in (lt50 + above, lt50, lt50 - below)]
                                      + [int(random.integers(20, 41))])
                    day += datetime.timedelta(int(random.integers(11, 18)))


main()
