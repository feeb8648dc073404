#!/bin/sh
# The balcony with a general-purpose finite-element program, FreeFem++, and with Coldseam, in the
# same run on the same machine: wall times, memory and their ratios, medians of several turns.
# A benchmark, not a test. Needs FreeFem++ and GNU time (packages freefem++ and time).
#
#   solver/src/jmh/sh/compare.sh [TURNS [UNKNOWNS]]
#
# 1. A uniform mesh of about a million unknowns, quadratic elements. FreeFem++ assembles and solves
#    (CHOLMOD, its fastest direct solver, as the distribution installs it); Coldseam solves and
#    certifies. Both clocks start with the mesh in memory. Each turn is a new process.
# 2. End to end, start of the program and mesh included. FreeFem++ adapts meshes until L2D is within
#    0.1 %, which it is told beforehand, and once more without being told; Coldseam solves the demo
#    case, certified to the default accuracy, ψ and surface temperatures included.
set -eu
turns=${1:-5}
unknowns=${2:-1000000}
heap=${HEAP:-2600m}
here=$(cd "$(dirname "$0")" && pwd -P)
home=$(cd "$here/../../../.." && pwd -P)
work=$(mktemp -d)
trap 'rm -rf "$work"' EXIT
java=${JAVA_HOME:+$JAVA_HOME/bin/}java
command -v FreeFem++ > /dev/null || { echo "compare.sh: needs FreeFem++" >&2; exit 2; }
[ -x /usr/bin/time ] || { echo "compare.sh: needs GNU time in /usr/bin" >&2; exit 2; }

(cd "$home" && mvn -B -ntp -q -Pbench -pl solver -am test-compile dependency:build-classpath \
  -Dmdep.outputFile=target/bench.classpath)
classpath=$home/solver/target/test-classes:$home/solver/target/classes:$(cat "$home/solver/target/bench.classpath")
"$home/cli/coldseam" solve "$home/cases/demo/balcony.yaml" --json > "$work/case.json"
side=$(awk -v n="$unknowns" 'BEGIN { printf "%.6f", 0.0028 * sqrt(1e6 / n) }')

cd "$here" # FreeFem++ looks for what a script includes in the working directory

load() { cut -d ' ' -f 1-3 /proc/loadavg; }
cpus=$(getconf _NPROCESSORS_ONLN)
echo "processors $cpus, load before $(load), Java heap -Xmx$heap, turns $turns"

# Runs a command and adds wall time (s) and peak memory (MB) as a line to a file.
whole() {
  to=$1
  shift
  /usr/bin/time -q -f '%e %M' -o "$work/time" "$@" > "$work/out" 2>&1 || {
    cat "$work/out" >&2
    exit 1
  }
  awk '{ printf "%s %.0f\n", $1, $2 / 1024 }' "$work/time" >> "$work/$to"
}

stamp() {
  while IFS= read -r line; do echo "$(date +%s%N) $line"; done
}

uniform() {
  /usr/bin/time -q -f '%M' -o "$work/time" FreeFem++ -nw -v 0 uniform.edp -h "$side" \
    | stamp > "$work/stamped"
  awk 'NR == FNR { memory = $1 / 1024; next }
    $2 == "meshed" { from = $1 } $2 == "solved" { to = $1 }
    END { printf "%.2f %.0f\n", (to - from) / 1e9, memory }' "$work/time" "$work/stamped" >> "$work/ff"
  tail -n 1 "$work/stamped" | cut -d ' ' -f 2- > "$work/ff-said"
}

certified() {
  /usr/bin/time -q -f '%M' -o "$work/time" "$java" "-Xmx$heap" -cp "$classpath" \
    coldseam.solver.conduction.SolveAndCertify "$unknowns" > "$work/certified-said"
  awk 'NR == FNR { memory = $1 / 1024; next }
    { printf "%s %.0f\n", $8, memory }' "$work/time" "$work/certified-said" >> "$work/certified"
}

value() {
  sed 's/[{,]/\n/g' "$work/case.json" | sed -n "s/^\"$1\": *//p" | sed -n 1p
}
known=$(value value_W_per_mK)

turn=1
while [ "$turn" -le "$turns" ]; do
  uniform
  certified
  whole p1 FreeFem++ -nw -v 0 adaptive-p1.edp -L2D "$known"
  tail -n 1 "$work/out" > "$work/p1-said"
  whole p2 FreeFem++ -nw -v 0 adaptive-p2.edp -L2D "$known"
  tail -n 1 "$work/out" > "$work/p2-said"
  whole p1u FreeFem++ -nw -v 0 adaptive-p1.edp
  tail -n 1 "$work/out" > "$work/p1u-said"
  whole p2u FreeFem++ -nw -v 0 adaptive-p2.edp
  tail -n 1 "$work/out" > "$work/p2u-said"
  whole case "$home/cli/coldseam" solve "$home/cases/demo/balcony.yaml" --json
  turn=$((turn + 1))
done

median() {
  cut -d ' ' -f "$2" "$work/$1" | sort -n | awk '{ v[NR] = $1 } END { print v[int((NR + 1) / 2)] }'
}
row() {
  printf '%-52s %8s s %6s MB' "$1" "$(median "$2" 1)" "$(median "$2" 2)"
  if [ -n "${3:-}" ]; then
    awk -v a="$(median "$2" 1)" -v b="$(median "$3" 1)" -v c="$(median "$2" 2)" \
      -v d="$(median "$3" 2)" 'BEGIN { printf "   time x %.2f, memory x %.2f", a / b, c / d }'
  fi
  echo
}

echo "load after $(load)"
echo
echo "Uniform mesh, quadratic elements, from the mesh on"
row "FreeFem++ assembles and solves (CHOLMOD)" ff
row "Coldseam solves and certifies" certified ff
echo "  FreeFem++: $(cat "$work/ff-said")"
echo "  Coldseam:  $(cat "$work/certified-said")"
echo
echo "End to end, from the command on"
row "FreeFem++ adaptive, linear, stops when told" p1
row "FreeFem++ adaptive, quadratic, stops when told" p2
row "FreeFem++ adaptive, linear, stops by itself" p1u
row "FreeFem++ adaptive, quadratic, stops by itself" p2u
row "Coldseam solve balcony.yaml --json, over linear" case p1
row "  the same over quadratic, told" case p2
row "  the same over quadratic, by itself" case p2u
for said in p1 p2 p1u p2u; do echo "  FreeFem++ $said: $(cat "$work/$said-said")"; done
echo "  Coldseam: L2D $(value lower_W_per_mK) to $(value upper_W_per_mK) W/(m K), certified"
