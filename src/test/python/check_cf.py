#!/usr/bin/python3
"""Prints what is wrong with a NetCDF output by CF 1.8 and ACDD 1.3; silent when nothing is.

  check_cf.py FILE.nc

Also opens the file with xarray.
"""
import subprocess
import sys

import netCDF4
import numpy as np
import xarray

GLOBALS = ("title", "summary", "keywords", "id", "naming_authority", "history", "source", "institution", "license", "creator_name", "date_created",
           "geospatial_lat_min", "geospatial_lat_max", "geospatial_lon_min", "geospatial_lon_max", "time_coverage_start", "time_coverage_end")


def main(path):
    with netCDF4.Dataset(path) as nc:
        words = getattr(nc, "Conventions", "")
        if "CF-1.8" not in words or "ACDD-1.3" not in words:
            print("N1 Conventions", words)
        for name in GLOBALS:
            if name not in nc.ncattrs():
                print("N1 no global", name)
        for name, v in nc.variables.items():
            check_variable(nc, name, v)
    with xarray.open_dataset(path, decode_timedelta=False) as ds:
        ds.load()


def check_variable(nc, name, v):
    told = v.ncattrs()
    if v.ndim == 1 and v.dimensions[0] == name and v.dtype.kind == "f":          # a coordinate
        for need in ("units", "standard_name", "axis"):
            if need not in told:
                print("N2 %s: no %s" % (name, need))
        if "_FillValue" in told:
            print("N2 %s: a coordinate with _FillValue" % name)
        steps = np.diff(v[:].data)
        if v.dtype != np.float64 or not ((steps > 0).all() or (steps < 0).all()):
            print("N2 %s: not float64 and strictly monotonic" % name)
        if name == "time" and (getattr(v, "bounds", None) not in nc.variables or "calendar" not in told):
            print("N3 time without bounds or calendar")
        return
    if v.ndim < 2 or name.endswith(("_bnds", "_bounds")):
        return
    for need in ("long_name", "grid_mapping"):
        if need not in told:
            print("N5 %s: no %s" % (name, need))
    if getattr(v, "grid_mapping", None) in nc.variables:
        mapping = nc[v.grid_mapping]
        if not {"grid_mapping_name", "crs_wkt"} <= set(mapping.ncattrs()):
            print("N4 %s: grid mapping without name or crs_wkt" % name)
    if "flag_values" in told:
        if len(np.atleast_1d(v.flag_values)) != len(v.flag_meanings.split()):
            print("N5 %s: flag_values and flag_meanings differ in number" % name)
    elif "units" not in told:
        print("N5 %s: no units" % name)
    elif subprocess.run(["udunits2", "-H", v.units, "-W", {"K": "K", "degC": "K"}.get(v.units, v.units)], capture_output=True).returncode:
        print("N5 %s: udunits does not read %r" % (name, v.units))
    if "_FillValue" not in told or np.asarray(v._FillValue).dtype != v.dtype:
        print("N5 %s: no _FillValue of its own type" % name)
    if "coverage_content_type" not in told:
        print("N5 %s: no coverage_content_type" % name)


if __name__ == "__main__":
    if len(sys.argv) != 2:
        sys.exit(__doc__)
    main(sys.argv[1])
