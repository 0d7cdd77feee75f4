// Median and quartiles of a sample, exact until the last step.
#pragma once

#include "../grid.h"

#include <cstdint>
#include <vector>

namespace rankstead {

struct Description {
    double lower_quartile = 0;
    double median = 0;
    double upper_quartile = 0;
};

// Quartiles as the spreadsheet's own QUARTILE: at (n - 1) q from the lowest, straight between neighbours (Hyndman &
// Fan 1996, definition 7). `sorted` ascending, not empty.
template <class Int>
[[nodiscard]] Description describe(const std::vector<Int>& sorted, const Grid& grid) {
    const auto quarter = [&](std::size_t quarters) {
        const std::size_t place = (sorted.size() - 1) * quarters;
        const Int& below = sorted[place / 4];
        const Int& above = sorted[place / 4 + (place % 4 != 0 ? 1 : 0)];
        const Int four_times = Int(below * 4 + (above - below) * static_cast<int>(place % 4));
        return off_grid(four_times, 2, grid);
    };
    return {quarter(1), quarter(2), quarter(3)};
}

} // namespace rankstead
