// Confidence limits by inverting a test of the margin m. Between two neighbouring breakpoints (Walsh averages,
// differences or values) the test is constant, and its upper tail only rises with m: so the lower limit is the
// breakpoint at which the upper tail first exceeds its rate, found by galloping and bisecting over the gaps.
#pragma once

#include "../laws/tails.h"
#include "ordered_sums.h"

#include <cstdint>
#include <functional>
#include <optional>

namespace rankstead {

// The tails of the test at a margin in a gap, and all the k, first to last, whose k-th smallest breakpoint is the one
// just below that gap: equal breakpoints share a gap.
struct Gap {
    Tails tails;
    std::int64_t first = 0;
    std::int64_t last = 0;
};

// The gap just above the k-th smallest breakpoint; k = 0 is below all of them. A law that is the same in every gap may
// answer for each k by itself.
using GapTails = std::function<Gap(std::int64_t k)>;

// The smallest k in 0..last whose upper tail exceeds `rate`; the gap `last` always does. `guess` and `spread` only save
// steps.
[[nodiscard]] std::int64_t first_gap_inside(const GapTails& tails, std::int64_t last, const Fraction& rate,
                                            std::int64_t guess, double spread);

// Where to start: the normal approximation to the critical number of breakpoints.
[[nodiscard]] std::int64_t guessed_gap(std::int64_t breakpoints, double spread, const Fraction& rate);

template <class Int>
struct LowerLimit {
    std::optional<Int> value; // none: no finite limit exists
    double outside = 0;       // the upper tail in the gap just outside
};

// `interval=matching`: the outside gap is the nearest one with another breakpoint below.
template <class Int>
[[nodiscard]] LowerLimit<Int> matching_lower_limit(const OrderedSums<Int>& breakpoints, const GapTails& tails,
                                                   const Fraction& rate, double spread) {
    const std::int64_t last = breakpoints.size();
    const std::int64_t k = first_gap_inside(tails, last, rate, guessed_gap(last, spread, rate), spread);
    if (k == 0) {
        return {};
    }
    const Int value = breakpoints.at(k);
    return {value, tails(breakpoints.count_below(value)).tails.upper};
}

// `interval=table`: the closed order-statistic interval of the law without ties, V(k) with V(M+1-k) above it.
template <class Int>
[[nodiscard]] LowerLimit<Int> table_lower_limit(const OrderedSums<Int>& breakpoints, const GapTails& untied,
                                                const Fraction& rate, double spread) {
    const std::int64_t last = breakpoints.size();
    const std::int64_t k = first_gap_inside(untied, last, rate, guessed_gap(last, spread, rate), spread);
    if (k == 0) {
        return {};
    }
    return {breakpoints.at(k), untied(k - 1).tails.upper};
}

} // namespace rankstead
