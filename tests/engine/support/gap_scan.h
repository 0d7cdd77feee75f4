// Confidence limits by looking at every gap between breakpoints, each with its law by plain enumeration.
#pragma once

#include "settings.h"

#include <cstdint>
#include <optional>
#include <vector>

namespace rankstead::test {

// Tails in every gap, from below all breakpoints to above them; gap i lies above the i-th different breakpoint.
struct Scan {
    std::vector<double> breakpoints;  // different, ascending
    std::vector<std::uint64_t> upper; // arrangements, one more than breakpoints
    std::vector<std::uint64_t> lower;
    std::uint64_t total = 1;
};

// The tests of changes, and of two samples of whole numbers.
[[nodiscard]] Scan scan_signed_rank(const std::vector<std::int64_t>& changes);
[[nodiscard]] Scan scan_sign(const std::vector<std::int64_t>& changes);
[[nodiscard]] Scan scan_rank_sum(const std::vector<std::int64_t>& first, const std::vector<std::int64_t>& second);

struct ScannedLimit {
    std::optional<double> value; // none: even the outermost gap is inside
    double outside = 0;          // the tail in the gap just outside
};

// The infimum of the margins whose upper tail exceeds the rate, and the supremum of those whose lower tail does.
[[nodiscard]] ScannedLimit scanned_lower_limit(const Scan& scan, const Fraction& rate);
[[nodiscard]] ScannedLimit scanned_upper_limit(const Scan& scan, const Fraction& rate);

// count / total > rate, for integers small enough for doubles to be exact.
[[nodiscard]] bool exceeds(std::uint64_t count, std::uint64_t total, const Fraction& rate);

} // namespace rankstead::test
