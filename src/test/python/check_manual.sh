#!/usr/bin/env bash
# The man page by mandoc's own checker, the completion scripts by the shells they are for.
#   check_manual.sh JAR
set -u
jar=$1
folder=$(mktemp -d)
trap 'rm -rf "$folder"' EXIT
passed=0 failed=0
check() {
  local name=$1; shift
  if "$@" > "$folder/said" 2>&1 && [ ! -s "$folder/said" ]; then echo "ok     $name"; passed=$((passed + 1))
  else echo "FAILED $name: $(head -3 "$folder/said" | tr '\n' ' ')"; failed=$((failed + 1)); fi
}
java -jar "$jar" manual > "$folder/wintersill.1"
check "man page, mandoc -Tlint" mandoc -Tlint "$folder/wintersill.1"
for command in map plan inspect explain; do
  check "man page names $command" sh -c "mandoc -Tascii '$folder/wintersill.1' | col -b | grep -q '^   $command'"
done
for shell in bash zsh fish; do
  java -jar "$jar" manual --completion $shell > "$folder/$shell"
  check "completion of $shell" $shell -n "$folder/$shell"
done
completed=$(bash -c "source '$folder/bash'; COMP_WORDS=(wintersill pl); COMP_CWORD=1; _complete_wintersill; echo \"\${COMPREPLY[*]}\"")
check "bash completes pl to plan" test "$completed" = plan
completed=$(fish -c "source '$folder/fish'; complete -C 'wintersill map --over'" | cut -f1)
check "fish completes --over to --overwrite" test "$completed" = --overwrite
echo "$passed passed, $failed failed"
[ $failed -eq 0 ]
