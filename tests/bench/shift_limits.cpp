#include "shift_limits.h"

#include "studies/common.h"

#include <cmath>
#include <memory>

namespace rankstead::bench {

ShiftLimits shift_limits(const TwoSamples& samples) {
    const auto m = static_cast<std::int64_t>(samples.first.size());
    const auto n = static_cast<std::int64_t>(samples.second.size());
    const auto differences = OrderedSums<std::int64_t>::differences(samples.first, samples.second);
    const auto mirrored = OrderedSums<std::int64_t>::differences(samples.second, samples.first);
    const auto law = std::make_shared<const UntiedRankSumLaw>(m, n);
    const GapLaw tails{one_law_gaps(m * n, [law](std::int64_t above) { return law->at(above); }), {}};
    const double spread =
        std::sqrt(static_cast<double>(m) * static_cast<double>(n) * static_cast<double>(m + n + 1) / 12);
    const Settings settings;
    ShiftLimits limits;
    limits.twice_estimate = differences.at((m * n + 1) / 2) + differences.at(m * n / 2 + 1);
    limits.lower = table_lower_limit(differences, tails, tail_rate(settings), spread).value.value();
    limits.upper = -table_lower_limit(mirrored, tails, tail_rate(settings), spread).value.value();
    return limits;
}

} // namespace rankstead::bench
