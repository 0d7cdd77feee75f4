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

namespace {

double deviate(double upper_tail) {
    constexpr double nearly = 1e-300;
    const double p = std::clamp(upper_tail, nearly, 1 - 1e-16);
    return quantile(complement(boost::math::normal_distribution<double>(), p));
}

// Where a normal law of this spread would next be looked at: the laws are close to normal ones, so that a step or two
// lead to the limit. After those the bracket is halved.
FirstInside search(const GapTails& tails, std::int64_t last, const Fraction& rate, std::int64_t guess, double spread) {
    constexpr int most_leaps = 6;
    const double wanted = deviate(rate.value());
    std::int64_t outside = -1;
    FirstInside found{last, std::nullopt};
    std::int64_t next = guess;
    for (int looks = 0; outside + 1 < found.k; ++looks) {
        const std::int64_t k =
            looks <= most_leaps ? std::clamp(next, outside + 1, found.k - 1) : outside + (found.k - outside) / 2;
        const Gap gap = tails(k);
        if (upper_at_most(gap.tails, rate)) {
            if (gap.last > outside) {
                outside = gap.last;
                found.outside = gap.tails;
            }
        } else {
            found.k = std::min(found.k, gap.first);
        }
        const double leap = std::ceil((deviate(gap.tails.upper) - wanted) * spread);
        next = k + static_cast<std::int64_t>(std::clamp(leap, -static_cast<double>(last), static_cast<double>(last)));
    }
    return found;
}

} // namespace

FirstInside first_gap_inside(const GapLaw& law, std::int64_t last, const Fraction& rate, std::int64_t guess,
                             double spread) {
    const std::int64_t near = law.rough ? search(law.rough, last, rate, guess, spread).k : guess;
    return search(law.tails, last, rate, near, spread);
}

} // namespace rankstead
