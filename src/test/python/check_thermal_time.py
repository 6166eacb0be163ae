#!/usr/bin/env python3
"""A public daily series through the thermal-time model by the program, against this script, which follows the definition itself.

    check_thermal_time.py JAR FOLDER

Weather: src/test/resources/weather/new_york.csv (source beside it), on a grid of five cells that are 0, 1.3, 2.6 ... K colder than the
station. Parameters: the invented Demo-A of checks/hardiness_params.csv with EDB -600, as in checks/weather_new_york.json, and from memory
(unverified) the row of Concord. The program reads a netCDF file of both extremes; `explain --json` gives its nights. Ends with
`N passed, M failed`."""
import csv, datetime, json, math, os, subprocess, sys
import netCDF4
import numpy as np

HERE = os.path.dirname(os.path.abspath(__file__))
RESOURCES = os.path.join(HERE, "..", "resources")
CELLS = 5
STEP = 1.3
BUDBREAK = {"demo": -2.2, "concord": -6.4}
TO_LT10, TO_LT90 = 2.0, 3.0
passed = failed = 0


def check(name, good, detail=""):
    global passed, failed
    passed, failed = passed + bool(good), failed + (not good)
    print(("ok     " if good else "FAILED ") + name + ("" if good or not detail else ": " + str(detail)))


def weather():
    with open(os.path.join(RESOURCES, "weather", "new_york.csv")) as f:
        return [(datetime.date.fromisoformat(r["date"]), float(r["temp_min"]), float(r["temp_max"])) for r in csv.DictReader(f)]


def parameters():
    with open(os.path.join(RESOURCES, "checks", "hardiness_params.csv")) as f:
        rows = {r["cultivar"]: r for r in csv.DictReader(f)}
    chosen = {"demo": rows["Demo-A (invented)"], "concord": rows["Concord"]}
    chosen["demo"]["EDB_Cd"] = "-600"
    return {name: {k: float(v) for k, v in row.items() if k.endswith(("_C", "_Cd", "endo", "eco"))} for name, row in chosen.items()}


def model(p, budbreak, days):
    """LT50 for the night of each day, from the state at the end of the day before; days: (date, tmin, tmean) from the start date on."""
    h, phase, chill, cooling, out = p["H_initial_C"], "endo", 0.0, 0.0, None
    lower, upper = p["H_max_C"], p["H_min_C"]
    nights, switched = {}, None
    for date, tmin, mean in days:
        nights[date] = upper if out else h
        power = 1 if phase == "endo" else p["theta_eco"]
        above = max(0.0, mean - p["T_%s_C" % phase])
        below = min(0.0, mean - p["T_%s_C" % phase])
        loss = p["kd_" + phase] * above * (1 - ((h - lower) / (upper - lower)) ** power) if cooling != 0 else 0.0
        gain = p["ka_" + phase] * below * (1 - (upper - h) / (upper - lower))
        before, h = h, min(upper, max(lower, h + loss + gain))
        cooling += below
        chill += min(0.0, mean - 10)
        if phase == "endo" and chill <= p["EDB_Cd"]:
            phase, switched = "eco", date
        if out is None and before < budbreak <= h:
            out = date
    return nights, switched, out


def write_grid(path, days):
    with netCDF4.Dataset(path, "w", format="NETCDF4_CLASSIC") as f:
        for name, size in (("time", len(days)), ("lat", 1), ("lon", CELLS)):
            f.createDimension(name, size)
        for name, unit, values in (("time", "days since 2012-01-01", range(len(days))), ("lat", "degrees_north", [40.7]),
                                   ("lon", "degrees_east", [-74 + 0.1 * i for i in range(CELLS)])):
            v = f.createVariable(name, "f8", (name,))
            v.units, v[:] = unit, list(values)
        for name, method, column in (("tasmin", "minimum", 1), ("tasmax", "maximum", 2)):
            v = f.createVariable(name, "f8", ("time", "lat", "lon"))
            v.standard_name, v.units, v.cell_methods = "air_temperature", "degC", "time: " + method
            v[:] = np.array([[[d[column] - STEP * i for i in range(CELLS)]] for d in days])


def write_run(folder, params):
    with open(os.path.join(folder, "cultivars.yaml"), "w") as f:
        f.write("cultivars:\n")
        for name, p in params.items():
            f.write("- {id: %s, name: %s, species: grapevine, organ: primary bud, model: thermal-time, source: see the check, "
                    "status: %s, initial: %g, hardy-limit: %g, tender-limit: %g, chilling: %g, budbreak: %g, lt10-above: %g, lt90-below: %g,\n"
                    "   endodormancy: {threshold: %g, acclimation: %g, deacclimation: %g},\n"
                    "   ecodormancy: {threshold: %g, acclimation: %g, deacclimation: %g, power: %g}}\n"
                    % (name, name, "invented" if name == "demo" else "from memory", p["H_initial_C"], p["H_max_C"], p["H_min_C"],
                       p["EDB_Cd"], BUDBREAK[name], TO_LT10, TO_LT90, p["T_endo_C"], p["ka_endo"], p["kd_endo"], p["T_eco_C"],
                       p["ka_eco"], p["kd_eco"], p["theta_eco"]))
    with open(os.path.join(folder, "run.yaml"), "w") as f:
        f.write("temperature: {minimum: {files: new-york.nc, variable: tasmin}, maximum: {files: new-york.nc, variable: tasmax}}\n"
                "cultivars: cultivars.yaml\noutputs: {folder: out}\n")


def compare(cell, name, winter, days, p, published):
    nights, switched, out = model(p, BUDBREAK[name], days)
    worst, most, rows = {}, 0.0, {n["date"]: n for n in winter["nights"]}
    for date, tmin, mean in days:
        row, lt50 = rows[date.isoformat()], nights[date]
        margin = tmin - lt50
        spread = (TO_LT10 if margin > 0 else TO_LT90) / math.log(9)
        damage = 1 / (1 + math.exp(margin / spread))
        most = max(most, damage)
        for key, value in (("lt50", lt50), ("lt10", lt50 + TO_LT10), ("lt90", lt50 - TO_LT90), ("tmin", tmin), ("tmean", mean),
                           ("margin", margin), ("damage", damage)):
            worst[key] = max(worst.get(key, 0), abs(row[key] - value))
    label = "cell %d, %s, %s" % (cell, name, winter["winter"])
    check(label + ": nights", max(worst.values()) < 2e-5, worst)
    margin, date = min((tmin - nights[date], date) for date, tmin, mean in days)
    check(label + ": margin, damage, worst night", abs(winter["margin"] - margin) < 2e-5 and abs(winter["damage"] - most) < 2e-6
          and winter["worst-night"] == date.isoformat(), (winter["margin"], margin, winter["damage"], most, winter["worst-night"], date))
    before = [n for n in winter["nights"] if n["date"] < days[0][0].isoformat()]
    check(label + ": nothing before the start", len(before) == 6 and all(n["lt50"] is None and n["margin"] is None for n in before))
    spring = [n["date"] for n in winter["nights"] if n["phase"] == "spring"]
    first = (switched + datetime.timedelta(1)).isoformat() if switched and switched.month < 6 else None
    if first and first > "%d-12-01" % (days[0][0].year):
        check(label + ": spring", spring and spring[0] == first, (spring[:1], first))
    if cell == 0 and name == "demo":
        check(label + ": published values", abs(winter["margin"] - published["worst_margin"][1]) < 2e-5
              and winter["worst-night"] == published["worst_margin"][0] and switched.isoformat() == published["phase_switch_end_of"]
              and out.isoformat() == published["budbreak"])


def main(jar, folder):
    os.makedirs(folder, exist_ok=True)
    days, params = weather(), parameters()
    write_grid(os.path.join(folder, "new-york.nc"), days)
    write_run(folder, params)
    with open(os.path.join(RESOURCES, "checks", "weather_new_york.json")) as f:
        published = json.load(f)["dynamic"]["winters"]
    for cell in range(CELLS):
        ended = subprocess.run(["java", "-jar", jar, "explain", os.path.join(folder, "run.yaml"), "--at", "%.2f,40.7" % (-74 + 0.1 * cell),
                                "--json"], capture_output=True, text=True)
        if ended.returncode != 0:
            check("explain cell %d" % cell, False, ended.stderr[-400:])
            continue
        for cultivar in json.loads(ended.stdout)["cultivars"]:
            check("cell %d, %s: winters" % (cell, cultivar["id"]), [w["winter"] for w in cultivar["winters"]] == ["2012-13", "2013-14", "2014-15"])
            for winter in cultivar["winters"]:
                year = int(winter["winter"][:4])
                span = [(d, lo - STEP * cell, (lo + hi) / 2 - STEP * cell) for d, lo, hi in days
                        if datetime.date(year, 9, 7) <= d <= datetime.date(year + 1, 5, 31)]
                compare(cell, cultivar["id"], winter, span, params[cultivar["id"]], published[str(year + 1)])
    print("%d passed, %d failed" % (passed, failed))
    return failed > 0


if __name__ == "__main__":
    if len(sys.argv) != 3:
        sys.exit(__doc__)
    sys.exit(main(sys.argv[1], sys.argv[2]))
