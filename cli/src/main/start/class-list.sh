#!/bin/sh
# Writes WORK/classes.list: what a few commands load, reports and ledger included. The rest of the words start the program.
# class-list.sh WORK JAVA WORD...
set -e
work=$1
java=$2
shift 2

cat >"$work/spectrum.csv" <<'END'
wavelength_micron,flux,sigma
END
awk 'BEGIN { for (l = 0.8; l < 2.45; l += 0.004) printf "%.3f,%.4f,0.02\n", l, 1 + 0.4 * sin(7 * l) }' >>"$work/spectrum.csv"
printf 'name,spectrum,medium,resolution\nA,spectrum.csv,vacuum,120\n' >"$work/list.csv"

list() {
  list=$1
  shift
  "$java" -Xshare:auto -XX:DumpLoadedClassList="$work/$list" "$@" >"$work/$list.out" 2>&1
}
list place.classes "$@" place "$work/spectrum.csv" --medium vacuum --resolution 120
list report.classes "$@" report "$work/spectrum.csv" --medium vacuum --resolution 120 --out "$work/report"
list sort.classes "$@" sort "$work/list.csv" --out "$work/out"

# Classes of before Java 6 can be archived as long as nothing links them, which a lambda of theirs would.
awk '!seen[$0]++' "$work/place.classes" "$work/report.classes" "$work/sort.classes" |
  grep -vE '^@lambda-proxy .*(picocli/|commons/math3/)' >"$work/classes.list"
