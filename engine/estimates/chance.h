// The chance that a value of the first group exceeds one of the second, ties counted half, with limits.
#pragma once

#include "../ranks.h"
#include "../settings.h"

#include <optional>

namespace rankstead {

struct Interval {
    double lower = 0;
    double upper = 1;
};

// U / (mn).
[[nodiscard]] double chance_of(const PooledRanking& ranking);

// Logit interval with placement variances (DeLong et al. 1988; Brunner & Munzel 2000), small-sample: the chance drawn
// in by half a pair, the variance floored at a quarter of Hanley & McNeil's, Student t with Satterthwaite degrees of
// freedom. Each limit misses with probability `rate`. Empty where a group has a single value: no variance exists.
[[nodiscard]] std::optional<Interval> placement_interval(const PooledRanking& ranking, double rate);

// Newcombe (2006), method 5: the limits solve |t - chance| = z sqrt(V(t)).
[[nodiscard]] Interval newcombe_interval(const PooledRanking& ranking, double rate);

// Clopper & Pearson (1934) for a share out of n, `successes` a multiple of one half: it never contradicts the sign
// test.
[[nodiscard]] Interval clopper_pearson_interval(double successes, double n, double rate);

} // namespace rankstead
