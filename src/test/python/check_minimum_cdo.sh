#!/usr/bin/env bash
# Lowest minimum of each winter by cdo, and by numpy, against shared/winters/minimum.tif of a run without a terrain model on the same files.
#   check_minimum_cdo.sh RUN_FOLDER OUT_FOLDER
# RUN_FOLDER holds tmin-*.nc; OUT_FOLDER comes from `map --minimum 'RUN_FOLDER/tmin-*.nc' --cultivars ... --out OUT_FOLDER`.
# Ends with `N passed, N failed`; exits 1 on a failure. Without cdo only numpy's part is done.
set -uo pipefail
[ $# -eq 2 ] || { sed -n 2,5p "$0" >&2; exit 2; }
here=$(cd "$(dirname "$0")" && pwd)
work=$(mktemp -d)
trap 'rm -rf "$work"' EXIT
if command -v cdo > /dev/null; then
  cdo -s -b F64 mergetime "$1"/tmin-*.nc "$work/all.nc" || exit 1
  first=$(cdo -s showdate "$work/all.nc" | tr -s ' ' '\n' | sed -n 2p | cut -c1-4)
  last=$(cdo -s showdate "$work/all.nc" | tr -s ' ' '\n' | sed '/^$/d' | tail -1 | cut -c1-4)
  for ((year = first; year < last; year++)); do
    # Dates, not months: a month filter would join December to the January before it.
    cdo -s timmin -seldate,"$year-09-01","$((year + 1))-05-31T23:59:59" "$work/all.nc" "$work/$(printf '%d-%02d' "$year" $(((year + 1) % 100))).nc" || exit 1
  done
else
  echo "skipped: cdo is not installed"
fi
/usr/bin/python3 - "$here" "$1" "$2" "$work" <<'PY'
import glob
import os
import sys

import netCDF4
import numpy as np

here, run, out, work = sys.argv[1:]
sys.path.insert(0, here)
import check_margins as chain

tally = chain.Tally()
source = chain.read_minima(glob.glob(os.path.join(run, "tmin-*.nc")))
index = {d: k for k, d in enumerate(source.dates)}
bands, labels, _, _ = chain.read_bands(os.path.join(out, "shared", "winters", "minimum.tif"))
got = dict(zip(labels, bands))
count = np.zeros(source.values.shape[1:], int)
for label, _, window in chain.winter_windows(source.dates):
    blank = np.full(source.values.shape[1:], np.nan)
    field = np.stack([source.values[index[d]] if d in index else blank for d in window])
    good = chain.complete(np.isfinite(field), window)
    count += good
    if label not in got:
        tally.say(not good.any(), "winter " + label, "left out" if not good.any() else "no such band")
        continue
    lowest = np.where(good, np.fmin.reduce(field), np.nan)
    wrong = chain.difference(lowest, got[label], chain.MARGIN_TOLERANCE)
    tally.say(not wrong, "numpy minimum " + label, wrong or "%d cells" % good.sum())
    path = os.path.join(work, label + ".nc")
    if os.path.exists(path):
        with netCDF4.Dataset(path) as nc:
            v = next(v for v in nc.variables.values() if v.ndim == 3)
            lowest = np.ma.filled(v[0].astype(float), np.nan)
            if nc["lat"][0] < nc["lat"][-1]:
                lowest = lowest[::-1]
        wrong = chain.difference(np.where(good, lowest, np.nan), got[label], chain.MARGIN_TOLERANCE)
        tally.say(not wrong, "cdo minimum " + label, wrong or "%d cells" % good.sum())
theirs = chain.read_bands(os.path.join(out, "shared", "valid-winters.tif"))[0][0]
wrong = chain.difference(count.astype(float), np.where(np.isnan(theirs) & (count == 0), 0, theirs), 0)
tally.say(not wrong, "valid winters", wrong or "%d to %d" % (count.min(), count.max()))
print("%d passed, %d failed" % (tally.passed, tally.failed))
sys.exit(1 if tally.failed else 0)
PY
