#include "tails.h"

#include <algorithm>
#include <limits>
#include <utility>

namespace rankstead {

namespace {

__extension__ typedef unsigned __int128 Wide;

bool at_most(double probability, std::optional<std::pair<std::uint64_t, std::uint64_t>> count, const Fraction& rate) {
    if (count) {
        return static_cast<Wide>(count->first) * static_cast<Wide>(rate.denominator) <=
               static_cast<Wide>(rate.numerator) * count->second;
    }
    return probability <= rate.value();
}

} // namespace

Tails Tails::swapped() const {
    Tails other = *this;
    std::swap(other.lower, other.upper);
    if (other.counts) {
        std::swap(other.counts->lower, other.counts->upper);
    }
    return other;
}

Tails from_lower(LawKind law, double lower, double upper, double relative_error) {
    Tails tails;
    tails.law = law;
    tails.lower = lower;
    tails.upper = std::min(1.0, upper);
    tails.relative_error = lower < smallest_positive_p ? std::numeric_limits<double>::infinity() : relative_error;
    return tails;
}

Tails levelled(Tails tails, bool at_centre) {
    tails.upper = at_centre ? tails.lower : tails.upper;
    return tails;
}

Tails from_counts(const Counts& counts) {
    const auto total = static_cast<double>(counts.total);
    Tails tails{static_cast<double>(counts.lower) / total, static_cast<double>(counts.upper) / total, counts, 0};
    // Three roundings: numerator, denominator, quotient.
    tails.relative_error = 1.5 * std::numeric_limits<double>::epsilon();
    return tails;
}

double p_value(const Tails& tails, Side side) {
    const double tail = side == Side::higher  ? tails.upper
                        : side == Side::lower ? tails.lower
                                              : 2 * std::min(tails.lower, tails.upper);
    return std::clamp(tail, smallest_positive_p, 1.0);
}

std::uint64_t p_count(const Tails& tails, Side side) {
    const Counts& counts = tails.counts.value();
    switch (side) {
    case Side::higher:
        return counts.upper;
    case Side::lower:
        return counts.lower;
    case Side::two_sided:
        break;
    }
    return std::min(counts.total, 2 * std::min(counts.lower, counts.upper));
}

bool upper_at_most(const Tails& tails, const Fraction& rate) {
    using Pair = std::pair<std::uint64_t, std::uint64_t>;
    return at_most(tails.upper,
                   tails.counts ? std::optional<Pair>({tails.counts->upper, tails.counts->total}) : std::nullopt, rate);
}

bool lower_at_most(const Tails& tails, const Fraction& rate) {
    return upper_at_most(tails.swapped(), rate);
}

} // namespace rankstead
