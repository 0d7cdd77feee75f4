# The Debian packages that Rankstead needs, in one list, and their installation. Sourced by workbooks/try.sh and
# tests/run.sh; nothing happens here by itself.
# shellcheck shell=bash disable=SC2034

BUILD_PACKAGES=(g++ cmake ninja-build pkg-config libboost-dev libcxxopts-dev nlohmann-json3-dev libcsv-dev)
OFFICE_PACKAGES=(libreoffice-dev python3-uno)
PICTURE_PACKAGES=(poppler-utils fonts-liberation)
TEST_PACKAGES=(libgtest-dev libbenchmark-dev python3-scipy clang libclang-rt-14-dev clang-format-14 clang-tidy-14)
BENCH_PACKAGES=(libbenchmark-dev python3-scipy python3-matplotlib) # tests/bench/goals.sh alone

package_is_installed() {
    [ "$(dpkg-query -W -f='${db:Status-Status}' "$1" 2>/dev/null)" = installed ]
}

# Calc for an office that is there already; the small one, without windows, only where there is no office at all: the
# two exclude each other, and nobody's office is to be replaced.
calc_package() {
    if package_is_installed libreoffice-core; then
        echo libreoffice-calc
    elif package_is_installed libreoffice-core-nogui || ! command -v soffice >/dev/null; then
        echo libreoffice-calc-nogui
    fi
}

# Installs those of the packages named that are missing; asks for nothing when none is.
install_missing() {
    local package missing=() as_root=()
    for package in "$@"; do
        package_is_installed "$package" || missing+=("$package")
    done
    [ ${#missing[@]} -gt 0 ] || return 0
    if ! command -v apt-get >/dev/null; then
        echo "These Debian packages are needed, and there is no apt-get here to install them: ${missing[*]}" >&2
        return 1
    fi
    if [ "$(id -u)" -ne 0 ]; then
        if ! command -v sudo >/dev/null; then
            echo "Run as root, or install these packages first: ${missing[*]}" >&2
            return 1
        fi
        as_root=(sudo)
    fi
    echo "Installing: ${missing[*]}"
    "${as_root[@]}" timeout 600 apt-get -q update </dev/null || return 1
    "${as_root[@]}" env DEBIAN_FRONTEND=noninteractive timeout 1800 \
        apt-get -q -y --no-install-recommends install "${missing[@]}" </dev/null
}
