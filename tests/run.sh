#!/usr/bin/env bash
# Builds Rankstead and runs every test. The last line is `N passed, N failed`, counted by ctest.
#
#     bash tests/run.sh               everything, in build-tests
#     bash tests/run.sh --sanitize    everything but Calc under AddressSanitizer and UndefinedBehaviorSanitizer
#     bash tests/run.sh --clang       everything, built by clang++ with warnings as errors
set -uo pipefail

top=$(cd "$(dirname "${BASH_SOURCE[0]}")/.." && pwd)
# shellcheck source=workbooks/packages.sh
source "$top/workbooks/packages.sh"

usage() {
    sed -n '2,6s/^# \{0,1\}//p' "${BASH_SOURCE[0]}" >&2
    exit 2
}

clang=(-DCMAKE_C_COMPILER=clang -DCMAKE_CXX_COMPILER=clang++)
case "${1:-}" in
"")
    build=$top/build-tests
    options=(-DCMAKE_BUILD_TYPE=Release)
    ;;
--sanitize)
    # By clang++: under UndefinedBehaviorSanitizer g++ 12 does not take addresses for constant expressions.
    build=$top/build-sanitize
    options=("${clang[@]}" -DCMAKE_BUILD_TYPE=RelWithDebInfo -DRANKSTEAD_ADDIN=OFF
        "-DRANKSTEAD_SANITIZE=address,undefined")
    export ASAN_OPTIONS=detect_leaks=1:detect_stack_use_after_return=1:strict_string_checks=1
    export UBSAN_OPTIONS=print_stacktrace=1:halt_on_error=1
    ;;
--clang)
    build=$top/build-clang
    options=("${clang[@]}" -DCMAKE_BUILD_TYPE=Release)
    ;;
*) usage ;;
esac
[ $# -le 1 ] || usage

give_up() {
    echo "$1" >&2
    echo "0 passed, 1 failed"
    exit 1
}

configure() {
    local folder=$1
    shift
    timeout 300 cmake -S "$top" -B "$folder" -G Ninja "$@" </dev/null
}

formatting_is_right() {
    (cd "$top" && find engine capi addin tests \( -name '*.c' -o -name '*.h' -o -name '*.cpp' \) -print0 |
        xargs -0 clang-format-14 --dry-run -Werror)
}

# Each half has to configure without what only the other half needs.
halves_configure() {
    configure "$build/without-tests" -DRANKSTEAD_TESTS=OFF >/dev/null &&
        configure "$build/without-addin" -DRANKSTEAD_ADDIN=OFF >/dev/null
}

# An attribute of the counts that ctest wrote.
counted() {
    grep -o "\b$1=\"[0-9]*\"" "$build/results.xml" | head -n 1 | tr -dc 0-9
}

# shellcheck disable=SC2046  # no word at all where an office from elsewhere is there
install_missing "${BUILD_PACKAGES[@]}" $(calc_package) "${OFFICE_PACKAGES[@]}" "${PICTURE_PACKAGES[@]}" \
    "${TEST_PACKAGES[@]}" || give_up "The packages that the tests need could not be installed."

checks_failed=0
if [ $# -eq 0 ]; then
    formatting_is_right || { echo "Some sources are not formatted: run clang-format-14 -i on them." >&2; checks_failed=1; }
    halves_configure || { echo "The build does not configure without its tests or its add-in." >&2; checks_failed=1; }
fi

configure "$build" "${options[@]}" || give_up "The build does not configure."
timeout 1500 cmake --build "$build" </dev/null || give_up "The build fails."

rm -f "$build/results.xml"
timeout 1500 ctest --test-dir "$build" --output-on-failure --no-tests=error --timeout 600 -j "$(nproc)" \
    --output-junit "$build/results.xml" </dev/null
status=$?
[ -s "$build/results.xml" ] || give_up "ctest wrote no results."

failed=$(counted failures)
skipped=$(($(counted skipped) + $(counted disabled)))
passed=$(($(counted tests) - failed - skipped))
failed=$((failed + checks_failed))
[ "$skipped" -eq 0 ] || echo "$skipped skipped or disabled"
echo "$passed passed, $failed failed"
[ "$status" -eq 0 ] && [ "$failed" -eq 0 ] && [ "$passed" -gt 0 ]
