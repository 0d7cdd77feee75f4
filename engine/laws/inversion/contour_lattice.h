// The lattice of frequencies (s, t) on which the contour is summed: how many points it needs so that the aliases, which
// repeat every Ns counts and Nt sums, are negligible.
#pragma once

#include "contour_tilt.h"

#include <cstdint>

namespace rankstead {

struct ContourLattice {
    std::int64_t sum_points = 1;   // Nt
    std::int64_t count_points = 1; // Ns; 1 where the count is free
    double alias_bound = 0;        // relative to the contour's height
    // Whether the aliases above w are nearly 1 each. Then they are subtracted, and `alias_bound` has what they lack
    // of 1.
    bool alias_is_one = false;

    // t of row j, and how many rows lie within a step of t.
    [[nodiscard]] double sum_angle(std::int64_t j) const;
    [[nodiscard]] std::int64_t rows_within(double step) const;
    // s at the k-th of the points of a row, which are spread about 0.
    [[nodiscard]] double count_angle(std::int64_t k) const;
    [[nodiscard]] std::int64_t first_count() const { return count_points / 2 + 1 - count_points; }
    [[nodiscard]] std::int64_t last_count() const { return count_points / 2; }
};

[[nodiscard]] ContourLattice choose_lattice(const SoughtTail& tail, const ContourTilt& tilt);

// What may be left out, or come from the aliases of sum and of count each, relative to the contour's height.
[[nodiscard]] double negligible(const SoughtTail& tail, const ContourTilt& tilt);

} // namespace rankstead
