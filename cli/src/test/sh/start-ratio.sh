#!/bin/sh
# Wall time of a whole solve over that of a one-line Java program, both run in turn in the same
# minutes: median of 7 and its ratio. A benchmark, not a test.
#
#   cli/src/test/sh/start-ratio.sh [CASE]
set -eu
home=$(cd "$(dirname "$0")/../../../.." && pwd -P)
case=${1:-$home/cases/demo/balcony.yaml}
work=$(mktemp -d)
trap 'rm -rf "$work"' EXIT
java=${JAVA_HOME:+$JAVA_HOME/bin/}java

cat > "$work/One.java" <<'JAVA'
public class One { public static void main(String[] args) { System.out.println("one"); } }
JAVA
"${java}c" -d "$work" "$work/One.java"

ms() {
  start=$(date +%s%N)
  "$@" > /dev/null 2>&1
  end=$(date +%s%N)
  echo $(((end - start) / 1000))
}
median() { sort -n "$1" | sed -n 4p; }

"$home/cli/coldseam" solve "$case" --out "$work/warm" > /dev/null
for turn in 1 2 3 4 5 6 7; do
  ms "$java" -cp "$work" One >> "$work/one"
  ms "$home/cli/coldseam" solve "$case" --json >> "$work/json"
  ms "$home/cli/coldseam" solve "$case" --out "$work/out" >> "$work/plots"
done

one=$(median "$work/one")
for what in json plots; do
  took=$(median "$work/$what")
  awk -v what="$what" -v took="$took" -v one="$one" \
    'BEGIN { printf "%-6s %6.0f ms, one line %4.0f ms, ratio %.2f\n", what, took / 1000, one / 1000, took / one }'
done
