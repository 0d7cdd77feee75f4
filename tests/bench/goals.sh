#!/usr/bin/env bash
# Measures the goals: builds the benchmarks, runs them and SciPy beside them, measures cells in a real Calc, and prints
# the tables as Markdown. Writes goals.md, ratios.md (for README) and growth.png, with the numbers that they are made of.
# Nothing passes or fails.
#
#     bash tests/bench/goals.sh [--quick] [OUTPUT_FOLDER]      build-bench/goals without one
#
# Without --quick there are more repetitions, and more rows have their error measured. RANKSTEAD_BENCH_BUILD may name
# another build folder than build-bench.
set -euo pipefail

top=$(cd "$(dirname "${BASH_SOURCE[0]}")/../.." && pwd)
here=$top/tests/bench
build=${RANKSTEAD_BENCH_BUILD:-$top/build-bench}
# shellcheck source=workbooks/packages.sh
source "$top/workbooks/packages.sh"

quick=()
repetitions=7
least_seconds=0.1
most_additions=1e11
if [ "${1:-}" = --quick ]; then
    quick=(--quick)
    repetitions=3
    least_seconds=0.02
    most_additions=6e9
    shift
fi
if [ $# -gt 1 ] || [[ "${1:-}" == -* ]]; then
    sed -n '2,9s/^# \{0,1\}//p' "${BASH_SOURCE[0]}" >&2
    exit 2
fi
output=$(realpath -m "${1:-$build/goals}")
mkdir -p "$output"

python() {
    timeout 1800 /usr/bin/python3 -B "$@" </dev/null
}

# Everything but the tables themselves goes to the standard error.
measure() {
    # shellcheck disable=SC2046  # no word at all where an office from elsewhere is there
    install_missing "${BUILD_PACKAGES[@]}" $(calc_package) "${OFFICE_PACKAGES[@]}" "${BENCH_PACKAGES[@]}"
    timeout 300 cmake -S "$top" -B "$build" -G Ninja -DCMAKE_BUILD_TYPE=Release -DRANKSTEAD_BENCH=ON \
        -DRANKSTEAD_TESTS=OFF </dev/null
    timeout 1800 cmake --build "$build" </dev/null
    load=$(cut -d ' ' -f 1 /proc/loadavg)
    echo "Rankstead"
    timeout 3000 "$build/tests/bench/rankstead_bench" --benchmark_repetitions="$repetitions" \
        --benchmark_min_time="$least_seconds" --benchmark_enable_random_interleaving=true \
        --benchmark_out="$output/bench.json" --benchmark_out_format=json </dev/null >"$output/bench.log" 2>&1
    echo "Its errors, against whole numbers"
    timeout 3000 "$build/tests/bench/rankstead_true_errors" "$most_additions" </dev/null >"$output/errors.tsv"
    echo "SciPy"
    python "$here/scipy_times.py" "$output/scipy.json" "${quick[@]}"
    rm -f "$output/calc.json"
    if command -v soffice >/dev/null; then
        echo "Calc"
        python "$here/calc_cells.py" "$build/addin/rankstead.oxt" "$build/office" "$output/calc.json" "${quick[@]}"
    fi
    python "$here/growth_picture.py" "$output"
}

measure >&2
python "$here/ratios.py" "$build" "$output" "$load"
python "$here/goals.py" "$build" "$output" "$load"
