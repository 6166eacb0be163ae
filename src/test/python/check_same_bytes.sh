#!/usr/bin/env bash
# Runs the sample job again and again with other threads, locales and time zones and compares the digest of every output file.
# record.json tells the number of threads asked for, so it is compared between runs of the same number only.
#   check_same_bytes.sh JAR
# Ends with `N passed, N failed`; exits 1 on a failure.
set -uo pipefail
[ $# -eq 1 ] || { sed -n 2,5p "$0" >&2; exit 2; }
jar=$(realpath "$1")
samples=$(cd "$(dirname "$0")/../../../sample-grids" && pwd)
work=$(mktemp -d)
trap 'rm -rf "$work"' EXIT
# The same relative folder name each time, so that a record which names it stays the same.
digest() { (cd "$1" && find . -type f ! -name record.json -print0 | sort -z | xargs -0 sha256sum); }
passed=0 failed=0 base=
trial() { # NAME THREADS LANGUAGE ZONE
  local place=$work/trial
  rm -rf "$place"
  mkdir -p "$place"
  if ! (cd "$place" && LC_ALL=$5 TZ=$4 java -Duser.language="${3%_*}" -Duser.country="${3#*_}" -Duser.timezone="$4" -jar "$jar" map "$samples/run.yaml" --out out --threads "$2") \
      > "$work/stdout" 2> "$work/stderr"; then
    echo "FAILED $1: $(grep -v -e "^note:" -e "Layers:" "$work/stderr" | head -5 | tr "\n" " " | cut -c1-300)"; failed=$((failed + 1)); return
  fi
  digest "$place/out" > "$work/now"
  if [ -z "$base" ]; then
    base=$work/base; mv "$work/now" "$base"; cp "$place/out/record.json" "$work/record-$2"; echo "ok     $1: $(wc -l < "$base") files"; passed=$((passed + 1)); return
  fi
  local differs
  # The command line stands in the record and is the same for the same number of threads.
  if [ -f "$work/record-$2" ]; then
    cmp -s "$work/record-$2" "$place/out/record.json" || { echo "FAILED $1: another record.json"; failed=$((failed + 1)); return; }
  else
    cp "$place/out/record.json" "$work/record-$2"
  fi
  differs=$(diff "$base" "$work/now" | sed -n 's/^[<>] [0-9a-f]* *//p' | sort -u | head -5 | tr '\n' ' ')
  if [ -z "$differs" ]; then echo "ok     $1"; passed=$((passed + 1)); else echo "FAILED $1: other bytes in $differs"; failed=$((failed + 1)); fi
}
trial "one thread" 1 en_GB UTC C
trial "two threads" 2 en_GB UTC C
trial "eight threads" 8 en_GB UTC C
trial "Turkish, Auckland" 2 tr_TR Pacific/Auckland C.UTF-8
trial "German, Los Angeles" 3 de_DE America/Los_Angeles POSIX
trial "Arabic, Kathmandu" 1 ar_EG Asia/Kathmandu C
trial "repeat" 2 en_GB UTC C
echo "$passed passed, $failed failed"
[ "$failed" -eq 0 ]
