// Normal approximations of the null laws: moments conditional on ties and zeros, a continuity step of one half.
#pragma once

#include "../ranks.h"
#include "../settings.h"
#include "tails.h"

namespace rankstead {

struct Moments {
    double mean = 0;
    double variance = 0;
};

// T+ (Lehmann 1975; with ranked zeros Cureton 1967).
[[nodiscard]] Moments signed_rank_moments(const SignedRanking& ranking);

// U of the first sample, tie-corrected (Lehmann 1975).
[[nodiscard]] Moments rank_sum_moments(const PooledRanking& ranking);

// The number above out of n, with probability one half.
[[nodiscard]] Moments sign_moments(std::int64_t n);

// The normal deviate with the continuity step: two-sided toward the mean and never past it, one-sided so that the
// observed value is part of the tail. Empty where the variance is 0.
[[nodiscard]] std::optional<double> normal_deviate(double statistic, const Moments& moments, Side side);

// Both tails, the observed value in each.
[[nodiscard]] Tails normal_tails(double statistic, const Moments& moments);

// p for a side: two-sided from the deviate that never passes the mean.
[[nodiscard]] double normal_p(double statistic, const Moments& moments, Side side);

} // namespace rankstead
