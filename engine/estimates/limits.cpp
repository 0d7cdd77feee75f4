#include "limits.h"

#include "../laws/normal_approximation.h"

#include <boost/math/distributions/normal.hpp>

#include <algorithm>
#include <cmath>

namespace rankstead {

std::int64_t guessed_gap(std::int64_t breakpoints, double spread, const Fraction& rate) {
    const double z = quantile(complement(boost::math::normal_distribution<double>(), rate.value()));
    const double guess = static_cast<double>(breakpoints) / 2 - z * spread - 0.5;
    return static_cast<std::int64_t>(std::clamp(std::ceil(guess), 0.0, static_cast<double>(breakpoints)));
}

std::int64_t first_gap_inside(const GapTails& tails, std::int64_t last, const Fraction& rate, std::int64_t guess,
                              double spread) {
    std::int64_t outside = -1;
    std::int64_t within = last;
    // Takes one step: narrows the bracket to what the gap of k says.
    const auto look = [&](std::int64_t k) {
        const Gap gap = tails(k);
        const bool inside = !upper_at_most(gap.tails, rate);
        (inside ? within : outside) = inside ? std::min(within, gap.first) : std::max(outside, gap.last);
        return inside;
    };
    std::int64_t step = std::max<std::int64_t>(1, static_cast<std::int64_t>(spread / 64));
    for (std::int64_t k = std::clamp<std::int64_t>(guess, 0, last); outside < k && k < within; step *= 2) {
        k = look(k) ? within - step : outside + step;
    }
    while (outside + 1 < within) {
        look(outside + (within - outside) / 2);
    }
    return within;
}

} // namespace rankstead
