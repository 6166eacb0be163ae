"""Copies a netCDF file of packed daily minima to netCDF-4 with given chunks, shuffle and deflate.

Use: rechunk_netcdf.py SOURCE TARGET DAYS,ROWS,COLUMNS
"""
import sys

import netCDF4


def main(source, target, chunks):
    days, rows, columns = (int(part) for part in chunks.split(","))
    with netCDF4.Dataset(source) as old, netCDF4.Dataset(target, "w", format="NETCDF4") as new:
        old.set_auto_maskandscale(False)
        new.set_auto_maskandscale(False)
        for name, dimension in old.dimensions.items():
            new.createDimension(name, len(dimension))
        for name, variable in old.variables.items():
            attributes = {key: variable.getncattr(key) for key in variable.ncattrs()}
            fill = attributes.pop("_FillValue", None)
            shape = tuple(min(a, b) for a, b in zip((days, rows, columns), variable.shape)) if variable.ndim == 3 else None
            copy = new.createVariable(name, variable.dtype, variable.dimensions, zlib=True, shuffle=True, complevel=4,
                                      fill_value=fill, chunksizes=shape)
            copy.set_auto_maskandscale(False)
            copy.setncatts(attributes)
            copy[:] = variable[:]


if __name__ == "__main__":
    main(*sys.argv[1:])
