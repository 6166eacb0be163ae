#!/usr/bin/env bash
# Hands the program one bad input after another (make_bad_inputs.py) and looks at how it refuses: exit code, words, no stack trace, nothing half written.
#   check_refusals.sh JAR [NAME...]
# With names only those cases. Ends with `N passed, N failed`; exits 1 on a failure.
set -uo pipefail
[ $# -ge 1 ] || { sed -n 2,4p "$0" >&2; exit 2; }
jar=$(realpath "$1"); shift
here=$(cd "$(dirname "$0")" && pwd)
work=$(mktemp -d)
trap 'rm -rf "$work"' EXIT
/usr/bin/python3 "$here/make_bad_inputs.py" "$work/cases" || exit 1
passed=0 failed=0
for place in "$work/cases"/*; do
  name=$(basename "$place")
  [ $# -eq 0 ] || [[ " $* " == *" $name "* ]] || continue
  codes=$(cut -f1 "$place/expect") pattern=$(cut -f2 "$place/expect")
  before=$(cd "$place" && find . -type f -exec sha256sum {} + | sort)
  more=()
  [ ! -f "$place/args" ] || read -r -a more < "$place/args"
  (cd "$place" && timeout 120 java -Xmx512m -jar "$jar" map run.yaml "${more[@]}" > "$work/stdout" 2> "$work/stderr")
  code=$?
  wrong=
  [[ "$code" =~ ^($codes)$ ]] || wrong+="exit code $code instead of $codes; "
  # The message may break its lines anywhere: the pattern is sought in the text as one line.
  tr '\n' ' ' < "$work/stderr" | grep -Eq -- "$pattern" || wrong+="message without /$pattern/; "
  grep -Eq '^[[:space:]]*at [a-z]+(\.[A-Za-z0-9_$]+)+\(|[A-Za-z]+(Exception|Error)\b' "$work/stderr" && wrong+="stack trace or exception name; "
  if [ "$code" -ne 0 ]; then
    [ -s "$work/stderr" ] || wrong+="no message; "
    [ -z "$(find "$place/out" "$place/plain" \( -name '*.tif' -o -name '*.gpkg' -o -name record.json -o -name '*.csv' \) 2> /dev/null | head -1)" ] || wrong+="files under a final name; "
    [ "$before" = "$(cd "$place" && find . -type f -exec sha256sum {} + | sort)" ] || wrong+="files changed or left behind; "
  fi
  if [ -z "$wrong" ]; then
    echo "ok     $name ($code)"; passed=$((passed + 1))
  else
    echo "FAILED $name: $wrong said: $(tail -c 300 "$work/stderr" | tr '\n' ' ')"; failed=$((failed + 1))
  fi
done
echo "$passed passed, $failed failed"
[ "$failed" -eq 0 ]
