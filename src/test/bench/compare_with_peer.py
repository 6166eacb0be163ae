#!/usr/bin/python3
"""Compares the product's layers with the numpy peer's before anything is timed.

  compare_with_peer.py PRODUCT_OUT PEER_OUT

Margins within 2e-3 K, damage within 1e-3; a probability may differ in one cell of ten thousand, where a margin lies on zero (both work in float32). A peer of fewer rows has done the southern ones. Exits 1 otherwise.
"""
import glob
import os
import sys

import numpy as np
from osgeo import gdal

gdal.UseExceptions()


def main(product, peer):
    failed = 0
    for path in sorted(glob.glob(os.path.join(peer, "*.tif"))):
        name = os.path.basename(path)[:-4]
        ds = gdal.Open(path)
        for k in range(ds.RasterCount):
            band = ds.GetRasterBand(k + 1)
            layer = band.GetDescription()
            a = band.ReadAsArray().astype(float)
            b = gdal.Open(os.path.join(product, name, layer + ".tif")).ReadAsArray().astype(float)[-a.shape[0]:]
            gap = np.abs(a - b)
            share = (gap > (2e-3 if layer.startswith("margin") else 1e-3)).mean()
            if share > (1e-4 if "probability" in layer else 0):
                failed += 1
                print("%s/%s: %.4f %% of the cells differ, by %g at most" % (name, layer, 100 * share, gap.max()))
    print("product and peer agree" if not failed else "%d layers differ" % failed)
    return failed


if __name__ == "__main__":
    if len(sys.argv) != 3:
        sys.exit(__doc__)
    sys.exit(1 if main(*sys.argv[1:]) else 0)
