#!/usr/bin/python3
"""Reads all of variable tmin with the netCDF C library on one thread and does nothing with it: the cost of the input alone.

  read_c_library.py FILE.nc

Calls the shared library directly, in the file's own type and in slabs of whole chunks, so that nothing but the library is timed.
"""
import ctypes
import ctypes.util
import sys


def main(path):
    lib = ctypes.CDLL(ctypes.util.find_library("netcdf") or "libnetcdf.so.19")
    size = ctypes.c_size_t

    def call(name, *arguments):
        status = getattr(lib, name)(*arguments)
        if status:
            lib.nc_strerror.restype = ctypes.c_char_p
            sys.exit("%s: %s" % (name, lib.nc_strerror(status).decode()))

    nc, v, kind, storage, fmt = (ctypes.c_int() for _ in range(5))
    dims, chunk, shape = (ctypes.c_int * 3)(), (size * 3)(), (size * 3)()
    call("nc_open", path.encode(), 0, ctypes.byref(nc))
    call("nc_inq_varid", nc, b"tmin", ctypes.byref(v))
    call("nc_inq_vardimid", nc, v, dims)
    call("nc_inq_vartype", nc, v, ctypes.byref(kind))
    call("nc_inq_format", nc, ctypes.byref(fmt))
    for k in range(3):
        length = size()
        call("nc_inq_dimlen", nc, dims[k], ctypes.byref(length))
        shape[k] = length.value
    chunk[0] = 1
    if fmt.value in (3, 4):
        call("nc_inq_var_chunking", nc, v, ctypes.byref(storage), chunk)
    width = {1: 1, 3: 2, 4: 4, 5: 4, 6: 8}[kind.value]
    step = max(1, chunk[0])
    buffer = ctypes.create_string_buffer(step * shape[1] * shape[2] * width)
    for first in range(0, shape[0], step):
        start = (size * 3)(first, 0, 0)
        count = (size * 3)(min(step, shape[0] - first), shape[1], shape[2])
        call("nc_get_vara", nc, v, start, count, buffer)
    call("nc_close", nc)


if __name__ == "__main__":
    if len(sys.argv) != 2:
        sys.exit(__doc__)
    main(sys.argv[1])
