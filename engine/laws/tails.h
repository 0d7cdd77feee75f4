// What every null law gives: both tails of a statistic, each with the observed value in it.
#pragma once

#include "../settings.h"

#include <cstdint>
#include <limits>
#include <optional>

namespace rankstead {

// A p value is never 0: below the range of a double it is this, the smallest normal one.
inline constexpr double smallest_positive_p = std::numeric_limits<double>::min();

// The number of equally likely arrangements in each tail, where all of them fit 63 bits.
struct Counts {
    std::uint64_t lower = 0;
    std::uint64_t upper = 0;
    std::uint64_t total = 1;
};

// How a law was found.
enum class LawKind {
    counted,     // arrangements in whole numbers
    summed,      // dynamic programming in floating point
    closed,      // inversion of a characteristic function known in closed form
    inverted,    // inversion of the characteristic function of the scores observed
    binomial,    // the binomial law
    saddlepoint, // not exact: the saddlepoint approximation
    normal,      // not exact: the normal approximation
};

struct Tails {
    double lower = 1;
    double upper = 1;
    std::optional<Counts> counts;
    // Bound on the relative error of the smaller tail; infinite for a tail below the range of a double.
    double relative_error = 0;
    LawKind law = LawKind::counted;

    [[nodiscard]] Tails swapped() const;
};

[[nodiscard]] Tails from_counts(const Counts& counts);

// Of a law in floating point, from the lower tail and the bound on its relative error, which no longer holds for what a
// double cannot hold.
[[nodiscard]] Tails from_lower(LawKind law, double lower, double upper, double relative_error);

// At the centre of a symmetric law both tails are equal.
[[nodiscard]] Tails levelled(Tails tails, bool at_centre);

// Two-sided: twice the smaller tail, at most 1.
[[nodiscard]] double p_value(const Tails& tails, Side side);

// p as a number of arrangements, out of counts.total. Needs counts.
[[nodiscard]] std::uint64_t p_count(const Tails& tails, Side side);

// Whether the upper tail is at most `rate`: in integers where the law is counted, so that 2/20 is 0.1 exactly.
[[nodiscard]] bool upper_at_most(const Tails& tails, const Fraction& rate);
[[nodiscard]] bool lower_at_most(const Tails& tails, const Fraction& rate);

} // namespace rankstead
