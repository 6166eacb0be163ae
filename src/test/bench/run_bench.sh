#!/usr/bin/env bash
# Whole runs timed side by side: the program, a numpy peer on the same job, and the C library merely reading the file.
#   run_bench.sh JAR FOLDER SIZE [REPEATS]
# FOLDER keeps the grids (made when absent). SIZE: S (200 x 200, 10 years), M (400 x 400, 20 years) or XS (40 x 40, 4 years, to try the script).
# Contenders alternate, so that a busy machine troubles all alike; medians and ratios go to results/DATE-SIZE.md with machine, JDK, commit and command.
# Results are compared with the peer's before anything is timed. JAVA_OPTIONS is handed to java; JOBS names some of: day block classic dem state.
# dem: both write the peer's seven layers; the peer does the southern PEER_ROWS rows alone (default 100), and rates are compared. state: a thermal-time model; no peer.
set -euo pipefail
[ $# -ge 3 ] || { sed -n 2,7p "$0" >&2; exit 2; }
jar=$(realpath "$1") folder=$2 name=$3 repeats=${4:-5}
here=$(cd "$(dirname "$0")" && pwd)
case $name in
  XS) rows=40 years=4 ;;
  S) rows=200 years=10 ;;
  M) rows=400 years=20 ;;
  *) echo "SIZE is XS, S or M" >&2; exit 2 ;;
esac
mkdir -p "$folder"
folder=$(cd "$folder" && pwd)
[ -f "$folder/$name-run.yaml" ] && [ -f "$folder/$name-classic.nc" ] || /usr/bin/python3 "$here/make_bench_grids.py" "$folder" "$name" $rows $rows $years
work=$(mktemp -d)
trap 'rm -rf "$work"' EXIT
read -r -a java_options <<< "${JAVA_OPTIONS:-}"
timed() { /usr/bin/python3 "$here/timed.py" "$@" 2> "$work/stderr" || { tail -5 "$work/stderr" >&2; return 1; }; }

program() { # JOB
  rm -rf "$work/program"
  local inputs
  if [ "$1" = dem ]; then
    inputs=("$folder/$name-run.yaml" --set outputs.winters=false --set outputs.geopackage=false --set "outputs.layers=[margin-mean,margin-low,margin-worst,damage-probability-10,damage-probability-50,damage-probability-90,damage-mean]")
  elif [ "$1" = state ]; then
    inputs=("$folder/$name-state.yaml")
  else inputs=(--minimum "$folder/$name-$1.nc" --cultivars "$folder/cultivars.yaml")
  fi
  timed java "${java_options[@]}" -jar "$jar" map "${inputs[@]}" --out "$work/program" --quiet
}
peer() {
  rm -rf "$work/peer"
  if [ "$1" = dem ]; then
    timed /usr/bin/python3 "$here/peer_numpy_dem.py" "$folder/$name-day.nc" "$folder/$name-dem.tif" "$folder/$name-orog.nc" "$folder/cultivars.yaml" "$work/peer" "$peer_rows"
  else
    timed /usr/bin/python3 "$here/peer_numpy.py" "$folder/$name-$1.nc" "$folder/cultivars.yaml" "$work/peer"
  fi
}
reading() { timed /usr/bin/python3 "$here/read_c_library.py" "$folder/$name-$([ "$1" = dem ] || [ "$1" = state ] && echo day || echo "$1").nc"; }
peer_rows=${PEER_ROWS:-100}

jobs=(day block classic)
[ "$name" = M ] || jobs+=(dem)      # the peer holds every winter of the fine grid in memory
[ -z "${JOBS:-}" ] || read -r -a jobs <<< "$JOBS"
for job in "${jobs[@]}"; do
  contenders=(program peer reading)
  if [ "$job" = state ]; then
    contenders=(program reading)
    [ -f "$folder/$name-tmax.nc" ] || /usr/bin/python3 "$here/make_bench_maxima.py" "$folder" "$name"
  fi
  # The first round warms the file cache and is not counted.
  for contender in "${contenders[@]}"; do
    $contender "$job" > /dev/null
  done
  [ "$job" = state ] || /usr/bin/python3 "$here/compare_with_peer.py" "$work/program" "$work/peer"
  for ((k = 0; k < repeats; k++)); do
    for contender in "${contenders[@]}"; do
      echo "$job $contender $($contender "$job")" | tee -a "$work/rows"
    done
  done
done

day=$(date -u +%F)
result=$here/results/$day-$name${JOBS:+-${JOBS// /-}}.md
mkdir -p "$here/results"
commit=$(git -C "$here" rev-parse --short HEAD 2> /dev/null || echo unknown)
[ -z "$(git -C "$here" status --porcelain -- src/main pom.xml 2> /dev/null)" ] || commit="$commit with changes"
/usr/bin/python3 - "$work/rows" > "$result" <<PY
import statistics, sys
rows = [l.split() for l in open(sys.argv[1])]
print("""# Whole runs, grid $name, $day

- machine: $(sed -n 's/^model name[^:]*: //p' /proc/cpuinfo | head -1), $(nproc) cores, $(awk '/MemTotal/ {printf "%.0f", $2 / 1048576}' /proc/meminfo) GB
- JDK: $(java -version 2>&1 | sed -n '2p' | tr -d '"'), Python $(/usr/bin/python3 -c 'import platform, numpy; print(platform.python_version() + ", numpy " + numpy.__version__)')
- load before the last line was written: $(cut -d' ' -f1-3 /proc/loadavg)
- commit: $commit
- command: \`run_bench.sh JAR FOLDER $name $repeats\`, JOBS "${JOBS:-all}", JAVA_OPTIONS "${JAVA_OPTIONS:-}"
- grid: $rows x $rows cells, $years years, five cultivars; dem: ten times finer

Median (least to greatest) wall seconds of $repeats alternating runs, file cache warm. The program writes all its default layers (dem: the peer's seven), the peer seven a cultivar; the last contender only
reads every value with the netCDF C library on one thread. Results of program and peer were compared first.

Rates are those of the whole run, start of the JVM and writing included: cell-nights of winters times cultivars (state: cell-days), billions a second.

| job | contender | wall s | processor s | peak MB | wall, program = 1 | G a second |
|---|---|---|---|---|---|---|""")
rows_, years_, finer = $rows, $years, 10
winters = years_ - 1
def work(job, contender):
    """Cell-nights (273 a winter, 1 September to 31 May) times cultivars."""
    if contender == "reading":
        return None
    cells = rows_ * rows_
    if job == "dem":
        cells *= finer * finer
        if contender == "peer":
            cells = min($peer_rows, rows_ * finer) * rows_ * finer
    return cells * winters * 273 * (1 if job == "state" else 5)
for job in dict.fromkeys(r[0] for r in rows):
    wall = {c: [float(r[2]) for r in rows if r[:2] == [job, c]] for c in ("program", "peer", "reading")}
    wall = {c: w for c, w in wall.items() if w}
    for c, w in wall.items():
        mine = [r for r in rows if r[:2] == [job, c]]
        print("| %s | %s | %.2f (%.2f to %.2f) | %.2f | %.0f | %s | %s |" % (job, {"peer": "numpy peer", "reading": "C library, reading only"}.get(c, c), statistics.median(w), min(w), max(w),
              statistics.median(float(r[3]) for r in mine), max(float(r[4]) for r in mine), 
              "-" if job == "dem" and c == "peer" else "%.2f" % (statistics.median(w) / statistics.median(wall["program"])),
              "%.3f" % (work(job, c) / statistics.median(w) / 1e9) if work(job, c) else "-"))
print("\nRaw rows (job, contender, wall s, processor s, peak MB):\n\n\`\`\`")
print("".join(" ".join(r) + "\n" for r in rows), end="")
print("\`\`\`")
PY
cat "$result"
