#!/usr/bin/python3
"""Daily maxima and a cultivar with a thermal-time model, for timing the models that follow temperatures. Invented, like the minima that they are made from.

  make_bench_maxima.py FOLDER NAME

Reads NAME-day.nc as made by make_bench_grids.py; writes NAME-tmax.nc in the same layout, NAME-state.yaml for the run, and thermal.yaml with one cultivar.
"""
import os
import sys

import netCDF4
import numpy as np

CULTIVAR = """# Invented, for timing only.
cultivars:
  - id: fell
    name: Fell (invented)
    species: grapevine
    organ: primary bud
    model: thermal-time
    source: invented
    status: invented
    initial: -10
    hardy-limit: -25
    tender-limit: -1.2
    endodormancy: {threshold: 13, acclimation: 0.12, deacclimation: 0.08}
    ecodormancy: {threshold: 5, acclimation: 0.1, deacclimation: 0.1, power: 7}
    chilling: -700
    budbreak: -2.2
"""
RUN = """title: timing run of a thermal-time model on invented grids
temperature: {minimum: %(name)s-day.nc, maximum: %(name)s-tmax.nc}
cultivars: {files: [thermal.yaml]}
outputs: {folder: out, winters: false, geopackage: false}
"""


def main(folder, name):
    with open(os.path.join(folder, "thermal.yaml"), "w") as f:
        f.write(CULTIVAR)
    with open(os.path.join(folder, name + "-state.yaml"), "w") as f:
        f.write(RUN % {"name": name})
    with netCDF4.Dataset(os.path.join(folder, name + "-day.nc")) as day, netCDF4.Dataset(os.path.join(folder, name + "-tmax.nc"), "w") as nc:
        nc.Conventions = day.Conventions
        for key, dimension in day.dimensions.items():
            nc.createDimension(key, None if dimension.isunlimited() else dimension.size)
        for key in ("time", "lat", "lon"):
            v = nc.createVariable(key, "f8", (key,))
            v.setncatts({k: day[key].getncattr(k) for k in day[key].ncattrs() if k != "_FillValue"})
            v[:] = day[key][:]
        low = day["tmin"]
        low.set_auto_maskandscale(False)
        v = nc.createVariable("tmax", "f4", low.dimensions, fill_value=np.float32(-9999), zlib=True, complevel=1, shuffle=True, chunksizes=(1,) + low.shape[1:])
        v.setncatts({"units": "degC", "standard_name": "air_temperature", "cell_methods": "time: maximum"})
        v.set_auto_maskandscale(False)
        for k in range(low.shape[0]):
            t = low[k]
            v[k] = np.where(t == -9999, t, np.round(t + 8 + 3 * np.sin(0.7 * k), 2).astype(np.float32))


if __name__ == "__main__":
    if len(sys.argv) != 3:
        sys.exit(__doc__)
    main(*sys.argv[1:])
