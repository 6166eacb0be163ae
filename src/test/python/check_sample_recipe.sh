#!/usr/bin/env bash
# Makes the sample grids anew and compares every value with the committed files.
#   check_sample_recipe.sh
set -euo pipefail
here=$(cd "$(dirname "$0")" && pwd)
committed=$(cd "$here/../../../sample-grids" && pwd)
made=$(mktemp -d)
trap 'rm -rf "$made"' EXIT
/usr/bin/python3 "$here/make_sample_grids.py" "$made"
(cd "$here/../../.." && /usr/bin/python3 "$here/make_sample_field.py" "$made")
/usr/bin/python3 "$here/make_scenario_grids.py" "$made/scenario"
/usr/bin/python3 - "$committed" "$made" <<'PY'
import os
import sys

import netCDF4
import numpy as np
from osgeo import gdal, ogr

gdal.UseExceptions()
ogr.UseExceptions()
old, new = sys.argv[1:]
tally = [0, 0]


def say(name, wrong):
    tally[bool(wrong)] += 1
    print("FAILED %s: %s" % (name, wrong) if wrong else "ok     %s" % name)


def netcdf(a, b):
    with netCDF4.Dataset(a) as x, netCDF4.Dataset(b) as y:
        if list(x.variables) != list(y.variables):
            return "other variables"
        for n in x.variables:
            u, v = x[n], y[n]
            u.set_auto_maskandscale(False)
            v.set_auto_maskandscale(False)
            if not np.array_equal(u[:], v[:]) or {k: str(u.getncattr(k)) for k in u.ncattrs()} != {k: str(v.getncattr(k)) for k in v.ncattrs()}:
                return "variable " + n


def tiff(a, b):
    x, y = gdal.Open(a), gdal.Open(b)
    if x.GetGeoTransform() != y.GetGeoTransform() or not x.GetSpatialRef().IsSame(y.GetSpatialRef()):
        return "another georeference"
    if not np.array_equal(x.ReadAsArray(), y.ReadAsArray()):
        return "other values"
    names = lambda d: [d.GetRasterBand(k + 1).GetDescription() for k in range(d.RasterCount)]
    return None if names(x) == names(y) else "other band descriptions"


def parcels(a, b):
    # The data sources are held until the comparison is over: layers and features die with them.
    x, y = ogr.Open(a), ogr.Open(b)
    rows = lambda d: [f.ExportToJson() for f in d.GetLayer(0)]
    return None if rows(x) == rows(y) else "other rows"


def table(a, b):
    with open(a) as x, open(b) as y:
        return None if x.read() == y.read() else "other text"


kinds = {".nc": netcdf, ".tif": tiff, ".gpkg": parcels, ".csv": table}


def data(folder):
    found = (os.path.relpath(os.path.join(at, n), folder) for at, _, names in os.walk(folder) for n in names)
    return {n for n in found if os.path.splitext(n)[1] in kinds and not n.startswith(("out", os.path.join("scenario", "out")))}


for name in sorted(data(new)):
    ending = os.path.splitext(name)[1]
    path = os.path.join(old, name)
    say(name, "not committed" if not os.path.exists(path) else kinds[ending](path, os.path.join(new, name)))
say("no other data file", ", ".join(sorted(data(old) - data(new))))
print("%d passed, %d failed" % tuple(tally))
sys.exit(1 if tally[1] else 0)
PY
