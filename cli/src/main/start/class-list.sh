#!/bin/sh
# Writes WORK/classes.list: what a few commands load for some objects of a survey, ledger and reports included. The words after
# the survey start the program.
# class-list.sh WORK SURVEY JAVA WORD...
set -e
work=$1
survey=$2
java=$3
shift 3

list() {
  list=$1
  shift
  "$java" -XX:TieredStopAtLevel=1 -XX:+UseSerialGC -Xshare:auto -XX:DumpLoadedClassList="$work/$list" "$@" >"$work/$list.out" 2>&1
}
# A file of each format; among them a spectrum with a velocity, a T dwarf, and two of low gravity.
spectra=$survey/spectra
list place.classes "$@" place "$spectra/tamarisk-0217+0635.fits" "$spectra/tamarisk-0353+0408.fits" \
  "$spectra/tamarisk-0246+0411.vot" "$spectra/tamarisk-0308+0256.ecsv" "$spectra/tamarisk-0722+0105.csv" \
  "$spectra/tamarisk-0131-0207.txt"
list report.classes "$@" report "$spectra/tamarisk-0714-0352.fits" --out "$work/report"
ln -s "$spectra" "$work/spectra"
head -n 5 "$survey/candidates.csv" >"$work/list.csv"
list sort.classes "$@" sort "$work/list.csv" --out "$work/out"

# Classes of before Java 6 can be archived as long as nothing links them, which a lambda of theirs would.
awk '!seen[$0]++' "$work/place.classes" "$work/report.classes" "$work/sort.classes" |
  grep -vE '^@lambda-proxy .*(picocli/|commons/math3/)' >"$work/classes.list"
