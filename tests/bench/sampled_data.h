// Invented samples for the benchmarks, the same in every run: whole numbers on a scale of so many levels, with a
// statistic so many standard deviations below its mean under the null hypothesis.
#pragma once

#include "ranks.h"

#include <cstdint>
#include <vector>

namespace rankstead::bench {

// No two values are equal.
inline constexpr std::int64_t all_distinct = 0;

// One-sided p about 0.02: where a p is looked at twice, and where a tail is not yet quick to sum.
inline constexpr double usual_deviations = 2;

struct TwoSamples {
    std::vector<std::int64_t> first;  // ascending
    std::vector<std::int64_t> second; // ascending

    [[nodiscard]] PooledRanking ranking() const { return rank_pooled(first, second, std::int64_t{0}); }
};

// The rank sum of the first sample is low.
[[nodiscard]] TwoSamples two_samples(std::int64_t first, std::int64_t second, std::int64_t levels,
                                     double deviations = usual_deviations);

// `zeros` of the `n` changes are 0; the sizes of the others lie on the scale, and the rank sum of the rises is low.
[[nodiscard]] std::vector<std::int64_t> changes(std::int64_t n, std::int64_t levels, std::int64_t zeros = 0,
                                                double deviations = usual_deviations);

[[nodiscard]] std::vector<double> as_doubles(const std::vector<std::int64_t>& values);

} // namespace rankstead::bench
