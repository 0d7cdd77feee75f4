#include "normal_approximation.h"

#include <algorithm>
#include <cmath>

namespace rankstead {

namespace {

__extension__ typedef __int128 Int128Sum;

constexpr double continuity_step = 0.5;

double upper_normal_tail(double z) {
    return 0.5 * std::erfc(z / std::sqrt(2.0));
}

Int128Sum cube_less_self(std::int64_t t) {
    return static_cast<Int128Sum>(t) * t * t - t;
}

// n(n+1)(2n+1)
Int128Sum square_sum_times_six(std::int64_t n) {
    return static_cast<Int128Sum>(n) * (n + 1) * (2 * n + 1);
}

} // namespace

Moments signed_rank_moments(const SignedRanking& ranking) {
    const std::int64_t z = ranking.zeros_ranked ? ranking.zeros : 0;
    const std::int64_t n = ranking.used + z;
    Int128Sum ties = 0;
    for (const SignedGroup& group : ranking.groups) {
        ties += cube_less_self(group.count);
    }
    const Int128Sum squares = square_sum_times_six(n) - square_sum_times_six(z);
    return {static_cast<double>(static_cast<Int128Sum>(n) * (n + 1) - static_cast<Int128Sum>(z) * (z + 1)) / 4,
            static_cast<double>(2 * squares - ties) / 48};
}

Moments rank_sum_moments(const PooledRanking& ranking) {
    const auto m = static_cast<double>(ranking.first);
    const auto n = static_cast<double>(ranking.second);
    const std::int64_t size = ranking.first + ranking.second;
    Int128Sum ties = 0;
    for (const PooledGroup& group : ranking.groups) {
        ties += cube_less_self(group.count());
    }
    // mn/12 * [(N^3 - N) - sum(t^3 - t)] / (N(N-1)); the bracket is 0 exactly where all values are equal.
    const auto bracket = static_cast<double>(cube_less_self(size) - ties);
    const auto total = static_cast<double>(size);
    return {m * n / 2, bracket == 0 ? 0 : m * n / 12 * bracket / (total * (total - 1))};
}

Moments sign_moments(std::int64_t n) {
    return {static_cast<double>(n) / 2, static_cast<double>(n) / 4};
}

std::optional<double> normal_deviate(double statistic, const Moments& moments, Side side) {
    if (!(moments.variance > 0)) {
        return std::nullopt;
    }
    const double distance = statistic - moments.mean;
    const double spread = std::sqrt(moments.variance);
    switch (side) {
    case Side::higher:
        return (distance - continuity_step) / spread;
    case Side::lower:
        return (distance + continuity_step) / spread;
    case Side::two_sided:
        break;
    }
    return std::copysign(std::max(0.0, std::fabs(distance) - continuity_step), distance) / spread;
}

Tails normal_tails(double statistic, const Moments& moments) {
    Tails tails;
    if (const auto z = normal_deviate(statistic, moments, Side::higher)) {
        tails.upper = upper_normal_tail(*z);
        tails.lower = upper_normal_tail(-*normal_deviate(statistic, moments, Side::lower));
    }
    return tails;
}

double normal_p(double statistic, const Moments& moments, Side side) {
    if (side != Side::two_sided) {
        return p_value(normal_tails(statistic, moments), side);
    }
    const auto z = normal_deviate(statistic, moments, side);
    return z ? std::max(smallest_positive_p, std::min(1.0, 2 * upper_normal_tail(std::fabs(*z)))) : 1.0;
}

} // namespace rankstead
