#include "split_up.h"

#include <limits>

namespace rankstead {

namespace {

constexpr double seconds_per_addition = 0.2e-9;
constexpr double seconds_per_merge = 2e-9;
constexpr double most_cells = 5.5e6; // 44 MB of 64-bit counts

// Additions that a half needs: every group of equal scores adds each row once for each number that can be taken of it,
// about half of them on average, over what can have been reached by then, about half of the cells.
double additions(const std::vector<SumRange>& ranges, std::span<const std::int64_t> half) {
    const auto most = static_cast<std::int64_t>(ranges.size()) - 1;
    double cells = 0;
    for (const SumRange& range : ranges) {
        cells += static_cast<double>(range.size());
    }
    double times = 0;
    for (auto begin = half.begin(); begin != half.end();) {
        const auto end = std::upper_bound(begin, half.end(), *begin);
        times += static_cast<double>(std::min<std::int64_t>(end - begin, std::max<std::int64_t>(1, most / 2)));
        begin = end;
    }
    return cells * times / 2;
}

double cells_of(const std::vector<SumRange>& ranges) {
    double cells = 0;
    for (const SumRange& range : ranges) {
        cells += static_cast<double>(range.size());
    }
    return cells;
}

} // namespace

std::vector<std::int64_t> least_sums(std::span<const std::int64_t> scores) {
    std::vector<std::int64_t> sums{0};
    sums.reserve(scores.size() + 1);
    for (const std::int64_t score : scores) {
        sums.push_back(sums.back() + score);
    }
    return sums;
}

std::vector<SumRange> sum_ranges(std::span<const std::int64_t> half, std::int64_t chosen,
                                 const std::vector<std::int64_t>& least_other, std::int64_t statistic) {
    const auto size = static_cast<std::int64_t>(half.size());
    const auto other = static_cast<std::int64_t>(least_other.size()) - 1;
    const std::int64_t most = std::min(size, chosen);
    const std::vector<std::int64_t> least = least_sums(half);
    const auto at = [](const std::vector<std::int64_t>& sums, std::int64_t i) {
        return sums[static_cast<std::size_t>(i)];
    };
    std::vector<SumRange> ranges;
    for (std::int64_t c = 0; c <= most; ++c) {
        // A sum of c scores is of use if, for some final number, the scores still to come from this half and the rest
        // from the other, all at their least, keep the total within the statistic.
        std::int64_t high = -1;
        for (std::int64_t final = std::max(c, chosen - other); final <= most; ++final) {
            high = std::max(high, statistic - at(least_other, chosen - final) - at(least, final - c));
        }
        ranges.push_back({at(least, c), std::min(high, at(least, size) - at(least, size - c))});
    }
    return ranges;
}

double split_up_seconds(const ChoiceScores& scores) {
    const std::span<const std::int64_t> all(scores.scores);
    const auto lower_half = all.first(all.size() / 2);
    const auto upper_half = all.subspan(all.size() / 2);
    const auto lower = sum_ranges(lower_half, scores.chosen, least_sums(upper_half), scores.statistic);
    const auto upper = sum_ranges(upper_half, scores.chosen, least_sums(lower_half), scores.statistic);
    const double cells = cells_of(lower) + cells_of(upper);
    if (cells > most_cells) {
        return std::numeric_limits<double>::infinity();
    }
    return seconds_per_addition * (additions(lower, lower_half) + additions(upper, upper_half)) +
           seconds_per_merge * cells_of(lower);
}

} // namespace rankstead
