#!/usr/bin/env bash
# Builds Rankstead and shows it at work: every sample workbook is opened in a headless LibreOffice Calc with a profile
# of its own, recalculated, printed here and written as PDF and PNG. Your own LibreOffice profile is not touched.
#
#     bash workbooks/try.sh
set -euo pipefail

top=$(cd "$(dirname "${BASH_SOURCE[0]}")/.." && pwd)
build=$top/build
output=$build/workbooks-out
extension=$build/addin/rankstead.oxt

# shellcheck source=workbooks/packages.sh
source "$top/workbooks/packages.sh"
# shellcheck disable=SC2046  # no word at all where an office from elsewhere is there
install_missing "${BUILD_PACKAGES[@]}" $(calc_package) "${OFFICE_PACKAGES[@]}" "${PICTURE_PACKAGES[@]}"

echo "Building the extension in $build"
timeout 300 cmake -S "$top" -B "$build" -G Ninja -DCMAKE_BUILD_TYPE=Release -DRANKSTEAD_TESTS=OFF </dev/null
timeout 1800 cmake --build "$build" </dev/null

timeout 600 /usr/bin/python3 "$top/workbooks/show.py" "$extension" "$output" "$top"/workbooks/*.fods </dev/null

cat <<END
(A LibreOffice with windows is needed for that, such as: apt-get install libreoffice-calc)

To install the extension for good: close LibreOffice and run, as yourself,
    unopkg add "$extension"
or choose Tools > Extensions > Add in Calc and pick that file. It needs no network and no account.
END
