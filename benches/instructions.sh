#!/bin/sh
# Instructions per call, counted by valgrind's callgrind: the same from run to run, so that a change of the code shows.
#
#     benches/instructions.sh [--write]
#
# Prints them beside those of instructions.csv; --write makes them the new ones. Nothing fails: compilers differ, and the file says
# with which it was made.
set -eu

cd "$(dirname "$0")/.."
committed=benches/instructions.csv
command -v valgrind >/dev/null || { echo "skipped: no valgrind"; exit 0; }

cargo build -q --release -p moistair-benches --bin calls
calls=${CARGO_TARGET_DIR:-target}/release/calls
work=$(mktemp -d)
trap 'rm -rf "$work"' EXIT

for formulation in ideal real helmholtz; do
    rows=$(valgrind -q --tool=callgrind --callgrind-out-file="$work/$formulation" --toggle-collect='*measured_*' \
        "$calls" "$formulation" 2>"$work/messages") || { cat "$work/messages" >&2; exit 1; }
    callgrind_annotate --inclusive=yes --threshold=100 --auto=no "$work/$formulation" |
        awk -v rows="$rows" -v formulation="$formulation" '
            match($0, /calls::measured_[a-z_]+/) {
                name = substr($0, RSTART + 16, RLENGTH - 16)
                gsub(",", "", $1)
                if (!(name in seen)) print formulation "," name "," int($1 / rows + 0.5)
                seen[name] = 1
            }' | sort
done >"$work/counted.csv"

awk -F, '
    /^#|^formulation/ { next }
    NR == FNR { before[$1 "," $2] = $3; next }
    !heading++ { printf "%-12s%-28s%14s%14s%10s\n", "", "", "instructions", "committed", "change" }
    {
        old = before[$1 "," $2]
        change = old > 0 ? sprintf("%+.1f %%", 100 * ($3 - old) / old) : ""
        printf "%-12s%-28s%14d%14s%10s\n", $1, $2, $3, old == "" ? "-" : old, change
    }' "$committed" "$work/counted.csv"

if [ "${1-}" = --write ]; then
    {
        echo "# Instructions per call, mean of the rows of benches/calls.rs; made by benches/instructions.sh --write with"
        echo "# $(rustc --version), $(rustc -vV | sed -n 's/^host: //p'), $(valgrind --version)"
        echo "formulation,call,instructions"
        cat "$work/counted.csv"
    } >"$committed"
fi
