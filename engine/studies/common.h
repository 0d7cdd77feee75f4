// Steps that several studies share.
#pragma once

#include "../estimates/limits.h"
#include "../grid.h"
#include "../laws/exact_laws.h"
#include "../laws/normal_approximation.h"
#include "../laws/saddlepoint.h"
#include "../laws/tails.h"
#include "../outcome.h"

#include <algorithm>
#include <cmath>
#include <memory>
#include <string>
#include <vector>

namespace rankstead {

// Fills p, arrangements and accuracy from an exact law, or p from the saddlepoint approximation that took its place.
void take_tails(Outcome& outcome, const Tails& tails);

// Fills p and z from the normal approximation at outcome.statistic.
void take_approximate(Outcome& outcome, const Moments& moments);

// The laws that a pair of limits needs: exact, until one of them would take too long; saddlepoint approximations from
// then on, which is remembered. Copies share what they remember.
class GapLaws {
public:
    template <class Scores>
    [[nodiscard]] Tails tails(const Scores& scores, Tails (*best)(const Scores&, double)) const {
        return remembered(*error_ > 0 ? saddlepoint_tails(scores) : best(scores, seconds_for_a_gap));
    }
    template <class Law>
    [[nodiscard]] Tails at(const Law& law, std::int64_t k) const {
        return remembered(law.best_at(k));
    }
    // The largest error that is to be expected of the approximations; 0 if all laws were exact.
    [[nodiscard]] double error() const { return *error_; }

private:
    [[nodiscard]] Tails remembered(const Tails& tails) const {
        *error_ = is_exact(tails.law) ? *error_ : std::max(*error_, tails.relative_error);
        return tails;
    }

    std::shared_ptr<double> error_ = std::make_shared<double>(0);
};

// Notes whether the limits needed approximations.
void take_laws(Outcome& outcome, const GapLaws& laws);

// The name for sentences: the setting, else the heading, else `otherwise`.
[[nodiscard]] std::string chosen_name(const std::string& setting, const std::string& heading,
                                      const std::string& otherwise);

// Why no finite limits exist, for `smallest_tail`, the smallest tail probability that the sizes can give.
[[nodiscard]] std::string no_limits_reason(const Settings& settings, double smallest_tail);

template <class Int>
[[nodiscard]] std::vector<Int> negated(const std::vector<Int>& sorted) {
    std::vector<Int> result(sorted.rbegin(), sorted.rend());
    for (Int& value : result) {
        value = -value;
    }
    return result;
}

template <class Int>
[[nodiscard]] bool has_equal_neighbours(const std::vector<Int>& sorted) {
    return std::adjacent_find(sorted.begin(), sorted.end()) != sorted.end();
}

// The gap just above the k-th smallest breakpoint, which is `floor`; k = 0 is below all of them.
template <class Int>
struct GapPlace {
    Int floor;
    std::int64_t first = 0;
    std::int64_t last = 0;
};

template <class Int>
[[nodiscard]] GapPlace<Int> gap_above(const OrderedSums<Int>& breakpoints, std::int64_t k) {
    if (k == 0) {
        return {Int(breakpoints.at(1) - 1), 0, 0};
    }
    const auto place = breakpoints.place(k);
    return {place.value, place.below + 1, place.through};
}

// A law that is the same in every gap: the statistic there is the number of breakpoints above.
template <class Law>
[[nodiscard]] GapTails one_law_gaps(std::int64_t breakpoints, Law law) {
    return [breakpoints, law = std::move(law)](std::int64_t k) { return Gap{law(breakpoints - k), k, k}; };
}

// The median of the breakpoints; each is a multiple of 2^-halvings on the grid.
template <class Int>
[[nodiscard]] double median_breakpoint(const OrderedSums<Int>& breakpoints, int halvings, const Grid& grid) {
    const std::int64_t size = breakpoints.size();
    if (size % 2 == 1) {
        return off_grid(breakpoints.at((size + 1) / 2), halvings, grid);
    }
    const auto [low, high] = breakpoints.pair_at(size / 2);
    return off_grid(Int(low + high), halvings + 1, grid);
}

// One inverted test: its breakpoints as they are and mirrored, with the tails in the gaps of each.
template <class Int>
struct Inversion {
    OrderedSums<Int> breakpoints;
    GapLaw law;
    OrderedSums<Int> mirrored;
    GapLaw mirrored_law;
    double spread = 0; // standard deviation of the statistic
    int halvings = 0;  // breakpoints are multiples of 2^-halvings on the grid
    double smallest_tail = 0;
};

template <class Int>
[[nodiscard]] LowerLimit<Int> lower_limit(const OrderedSums<Int>& breakpoints, const GapLaw& law,
                                          const Settings& settings, double spread) {
    const Fraction rate = tail_rate(settings);
    return settings.interval == IntervalRule::matching ? matching_lower_limit(breakpoints, law, rate, spread)
                                                       : table_lower_limit(breakpoints, law, rate, spread);
}

// Fills lower, upper and confidence.
template <class Int>
void take_limits(Outcome& outcome, const Inversion<Int>& inversion, const Grid& grid) {
    const Settings& settings = outcome.settings;
    const std::string other_side = "with side=" + std::string(settings.side == Side::higher ? "higher" : "lower") +
                                   " the interval has only its other limit.";
    double outside = 0;
    const auto take = [&](Figure& limit, const LowerLimit<Int>& found, bool mirror) {
        if (!found.value) {
            limit = Figure::none(no_limits_reason(settings, inversion.smallest_tail));
            outcome.observations.interval_reason = limit.reason;
            return;
        }
        outside = std::max(outside, found.outside);
        limit = Figure::of(off_grid(mirror ? Int(-*found.value) : *found.value, inversion.halvings, grid));
    };
    outcome.lower = outcome.upper = Figure::none(other_side);
    if (settings.side != Side::lower) {
        take(outcome.lower, lower_limit(inversion.breakpoints, inversion.law, settings, inversion.spread), false);
    }
    if (settings.side != Side::higher) {
        take(outcome.upper, lower_limit(inversion.mirrored, inversion.mirrored_law, settings, inversion.spread), true);
    }
    const std::string& reason = outcome.observations.interval_reason;
    const double missed = settings.side == Side::two_sided ? 2 * outside : outside;
    outcome.confidence = reason.empty() ? Figure::of(1 - missed) : Figure::none(reason);
}

// Keeps the limit that the side asks for; the other has none.
void take_chance(Outcome& outcome, double chance, const std::optional<Interval>& interval, const std::string& reason);

} // namespace rankstead
