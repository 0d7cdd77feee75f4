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

// The tails in every gap; `rough` may be empty, or finds the neighbourhood of a limit more quickly than exact laws do.
struct GapLaw {
    GapTails tails;
    GapTails rough;
};

// The smallest k in 0..last whose upper tail exceeds a rate (the gap `last` always does), and the tails just outside.
struct FirstInside {
    std::int64_t k = 0;
    std::optional<Tails> outside; // none where k is 0
};

// `guess` and `spread` only save steps.
[[nodiscard]] FirstInside first_gap_inside(const GapLaw& law, std::int64_t last, const Fraction& rate,
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
[[nodiscard]] LowerLimit<Int> matching_lower_limit(const OrderedSums<Int>& breakpoints, const GapLaw& law,
                                                   const Fraction& rate, double spread) {
    const std::int64_t last = breakpoints.size();
    const FirstInside found = first_gap_inside(law, last, rate, guessed_gap(last, spread, rate), spread);
    if (!found.outside) {
        return {};
    }
    const auto place = breakpoints.place(found.k);
    const bool known = place.below == found.k - 1;
    return {place.value, known ? found.outside->upper : law.tails(place.below).tails.upper};
}

// `interval=table`: the closed order-statistic interval of the law without ties, V(k) with V(M+1-k) above it.
template <class Int>
[[nodiscard]] LowerLimit<Int> table_lower_limit(const OrderedSums<Int>& breakpoints, const GapLaw& untied,
                                                const Fraction& rate, double spread) {
    const std::int64_t last = breakpoints.size();
    const FirstInside found = first_gap_inside(untied, last, rate, guessed_gap(last, spread, rate), spread);
    if (!found.outside) {
        return {};
    }
    return {breakpoints.at(found.k), found.outside->upper};
}

} // namespace rankstead
