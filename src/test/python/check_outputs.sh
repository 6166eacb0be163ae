#!/usr/bin/env bash
# Checks a finished output folder with public programs: GDAL, SQLite, xmllint, QGIS, cdo, nco, ncdump, xarray.
#   check_outputs.sh OUT_FOLDER [PICTURE_FOLDER]
# One line a check, `ok name` or `FAILED name: reason`; ends with `N passed, N failed`; exits 1 on a failure.
# A program that is not installed makes its checks `skipped`, which is printed and does not fail.
set -uo pipefail
[ $# -ge 1 ] || { sed -n 2,5p "$0" >&2; exit 2; }
out=$(cd "$1" && pwd) || exit 2
here=$(cd "$(dirname "$0")" && pwd)
work=$(mktemp -d)
trap 'rm -rf "$work"' EXIT
pictures=${2:-$work/pictures}
lines=$work/lines
: > "$lines"

ok() { echo "ok     $1" | tee -a "$lines"; }
bad() { echo "FAILED $1: $2" | tee -a "$lines"; }
# say NAME REASON: failed when a reason is given.
say() { if [ -n "$2" ]; then bad "$1" "$(echo "$2" | tr '\n' ' ' | cut -c1-400)"; else ok "$1"; fi; }
have() { command -v "$1" > /dev/null || { echo "skipped: $1 is not installed"; return 1; }; }
python() { /usr/bin/python3 "$@"; }

# GeoTIFF
if [ -n "$(find "$out" -name '*.tif' -print -quit)" ]; then
  python "$here/check_rasters.py" "$out" 2>&1 | tee -a "$lines"
fi

# XML beside them
if have xmllint; then
  while IFS= read -r -d '' f; do
    say "well-formed ${f#"$out"/}" "$(xmllint --noout --nonet "$f" 2>&1)"
  done < <(find "$out" \( -name '*.qml' -o -name '*.aux.xml' -o -name '*.sld' \) -print0 | sort -z)
fi
say "no half-written files" "$(find "$out" \( -name '*.part' -o -name '*.tmp' -o -name '*-journal' -o -name '*-wal' -o -name '*-shm' \) | head -3)"

# GeoPackage
while IFS= read -r -d '' f; do
  name=${f#"$out"/}
  say "GeoPackage rules $name" "$(python -m osgeo_utils.samples.validate_gpkg --extra "$f" 2>&1)"
  say "ogrinfo is silent $name" "$(ogrinfo -ro -so -al "$f" 2>&1 > /dev/null)"
  if have sqlite3; then
    got=$(sqlite3 -readonly "$f" 'PRAGMA application_id; PRAGMA user_version; PRAGMA integrity_check; PRAGMA foreign_key_check;' 2>&1 | tr '\n' ' ')
    case "$got" in "1196444487 10300 ok "|"1196444487 10400 ok ") ok "SQLite $name" ;; *) bad "SQLite $name" "$got" ;; esac
  fi
  say "layers of $name" "$(python "$here/check_feature_layers.py" "$f" 2>&1)"
done < <(find "$out" -name '*.gpkg' -print0 | sort -z)

# Record and tables
if [ -f "$out/record.json" ]; then
  say "record.json names the digest of every file" "$(python - "$out" <<'PY' 2>&1
import hashlib, json, os, sys
out = sys.argv[1]
with open(os.path.join(out, "record.json"), encoding="utf-8") as f:
    text = json.dumps(json.load(f)).lower()
for folder, _, names in sorted(os.walk(out)):
    for name in sorted(names):
        path = os.path.join(folder, name)
        if name.endswith((".tif", ".gpkg", ".csv", ".nc", ".aux.xml", ".qml")) or name == "summary.json":
            with open(path, "rb") as f:
                if hashlib.sha256(f.read()).hexdigest() not in text:
                    print("not the digest of", os.path.relpath(path, out))
PY
)"
else
  bad "record.json" "there is none: the folder is not complete"
fi
while IFS= read -r -d '' f; do
  say "table ${f#"$out"/}" "$(python - "$f" <<'PY' 2>&1
import csv, sys
with open(sys.argv[1], encoding="utf-8", newline="") as f:
    rows = list(csv.reader(f, strict=True))
if len(rows) < 2 or not all(rows[0]) or len(set(rows[0])) != len(rows[0]):
    print("no header or no rows")
for k, row in enumerate(rows):
    if len(row) != len(rows[0]):
        print("line", k + 1, "has", len(row), "cells instead of", len(rows[0]))
    for cell in row:
        if cell.strip().lower() in ("nan", "-9999", "-9999.0", "infinity", "null"):
            print("line", k + 1, "says", cell)
        if cell[:1] in "=+@" and cell[:1]:
            print("line", k + 1, "begins a cell with", cell[0])
PY
)"
done < <(find "$out" -name '*.csv' -print0 | sort -z)
while IFS= read -r -d '' f; do
  say "JSON ${f#"$out"/}" "$(python -c 'import json, sys; json.load(open(sys.argv[1], encoding="utf-8"), parse_constant=lambda c: print("says", c))' "$f" 2>&1)"
done < <(find "$out" -name '*.json' -print0 | sort -z)

# NetCDF
while IFS= read -r -d '' f; do
  name=${f#"$out"/}
  have ncdump && { say "ncdump $name" "$(ncdump -h "$f" 2>&1 > /dev/null)"; }
  have cdo && { say "cdo $name" "$(cdo -s sinfon "$f" 2>&1 > /dev/null)"; }
  have ncks && { say "ncks $name" "$(ncks -m "$f" 2>&1 > /dev/null)"; }
  say "CF and ACDD $name" "$(python "$here/check_cf.py" "$f" 2>&1)"
done < <(find "$out" -name '*.nc' -print0 | sort -z)

# QGIS
if python -c 'import qgis.core' 2> /dev/null; then
  find "$out" \( -name '*.tif' -o -name '*.gpkg' \) -print0 | sort -z | xargs -0 -r /usr/bin/python3 "$here/open_in_qgis.py" "$pictures" 2> "$work/qgis" | tee -a "$lines"
  grep -q 'QGIS ' "$lines" || bad QGIS "$(tail -3 "$work/qgis" | tr '\n' ' ')"
else
  echo "skipped: QGIS is not installed"
fi

passed=$(grep -c '^ok ' "$lines")
failed=$(grep -c '^FAILED ' "$lines")
echo "$passed passed, $failed failed"
[ "$failed" -eq 0 ]
