// Split-up dynamic programming for the sum of m of N scores (van de Wiel 2001): the distribution of the number and the
// sum taken from the lower half of the scores and from the upper half, each by itself, then both merged.
#pragma once

#include "compensated_sum.h"
#include "rank_sum_law.h"

#include <algorithm>
#include <cstdint>
#include <span>
#include <type_traits>
#include <vector>

namespace rankstead {

// Arrangements with a sum below the statistic and exactly at it.
template <class Count>
struct TailMass {
    Count below{};
    Count at{};
};

// Which sums of some number of scores of one half can occur and matter: none that would exceed the statistic whatever
// follows.
struct SumRange {
    std::int64_t low = 0;
    std::int64_t high = -1;
    [[nodiscard]] std::int64_t size() const { return std::max<std::int64_t>(0, high - low + 1); }
};

// Ranges by count, 0 to `most` taken from `half`. `least_other[c]` is the smallest sum of c scores of the other half.
[[nodiscard]] std::vector<SumRange> sum_ranges(std::span<const std::int64_t> half, std::int64_t chosen,
                                               const std::vector<std::int64_t>& least_other, std::int64_t statistic);

// Sums of the c smallest scores, c = 0 to all.
[[nodiscard]] std::vector<std::int64_t> least_sums(std::span<const std::int64_t> scores);

// Predicted seconds; infinity where the work space would exceed its limit.
[[nodiscard]] double split_up_seconds(const ChoiceScores& scores);

// The distribution for one half: for each count a row of arrangements by sum, from ranges[count].low on.
template <class Count>
class HalfDistribution {
public:
    HalfDistribution(std::span<const std::int64_t> half, std::vector<SumRange> ranges) : ranges_(std::move(ranges)) {
        std::int64_t cells = 0;
        for (const SumRange& range : ranges_) {
            begins_.push_back(cells);
            cells += range.size();
        }
        cells_.assign(static_cast<std::size_t>(cells), Count(0));
        if (ranges_[0].size() > 0) {
            cells_[0] = 1;
        }
        least_ = least_sums(half);
        for (std::size_t j = 0; j < half.size(); ++j) {
            add(half, static_cast<std::int64_t>(j));
        }
    }

    [[nodiscard]] const SumRange& range(std::int64_t count) const { return ranges_[static_cast<std::size_t>(count)]; }
    [[nodiscard]] std::span<Count> row(std::int64_t count) {
        return {cells_.data() + begins_[static_cast<std::size_t>(count)],
                static_cast<std::size_t>(range(count).size())};
    }
    [[nodiscard]] std::int64_t most() const { return static_cast<std::int64_t>(ranges_.size()) - 1; }

private:
    // Takes score j or leaves it. Among the first j scores, c of them sum to least_[c] at least and to the sum of the
    // c largest at most.
    void add(std::span<const std::int64_t> half, std::int64_t j) {
        const std::int64_t score = half[static_cast<std::size_t>(j)];
        for (std::int64_t c = std::min(most(), j + 1); c >= 1; --c) {
            const SumRange& to = range(c);
            const std::int64_t low = least_[static_cast<std::size_t>(c - 1)];
            const std::int64_t largest =
                least_[static_cast<std::size_t>(j)] - least_[static_cast<std::size_t>(j - c + 1)];
            const std::int64_t high = std::min({largest, range(c - 1).high, to.high - score});
            if (high < low) {
                continue;
            }
            Count* __restrict target = row(c).data() + (low + score - to.low);
            const Count* __restrict source = row(c - 1).data() + (low - range(c - 1).low);
            const std::int64_t length = high - low + 1;
            for (std::int64_t i = 0; i < length; ++i) {
                target[i] += source[i];
            }
        }
    }

    std::vector<SumRange> ranges_;
    std::vector<std::int64_t> begins_;
    std::vector<std::int64_t> least_;
    std::vector<Count> cells_;
};

template <class Count>
struct Sum {
    Count total{};
    void add(Count term) { total += term; }
    [[nodiscard]] Count value() const { return total; }
};
template <>
struct Sum<double> : CompensatedSum {};

// Turns a row into its cumulative sums.
template <class Count>
void accumulate_row(std::span<Count> row) {
    Sum<Count> sum;
    for (Count& cell : row) {
        sum.add(cell);
        cell = sum.value();
    }
}

// Arrangements of `row` at or below index i; none below it, all of them beyond it.
template <class Count>
Count up_to(std::span<const Count> row, std::int64_t i) {
    if (i < 0 || row.empty()) {
        return Count(0);
    }
    return row[static_cast<std::size_t>(std::min(i, static_cast<std::int64_t>(row.size()) - 1))];
}

// Needs chosen <= N/2 and a statistic that can occur.
template <class Count>
TailMass<Count> split_up_tail(const ChoiceScores& scores) {
    const std::span<const std::int64_t> all(scores.scores);
    const auto lower_half = all.first(all.size() / 2);
    const auto upper_half = all.subspan(all.size() / 2);
    HalfDistribution<Count> lower(lower_half,
                                  sum_ranges(lower_half, scores.chosen, least_sums(upper_half), scores.statistic));
    HalfDistribution<Count> upper(upper_half,
                                  sum_ranges(upper_half, scores.chosen, least_sums(lower_half), scores.statistic));
    Sum<Count> below;
    Sum<Count> through;
    for (std::int64_t c = 0; c <= lower.most(); ++c) {
        const std::int64_t rest = scores.chosen - c;
        if (rest < 0 || rest > upper.most()) {
            continue;
        }
        accumulate_row(upper.row(rest));
        const std::span<const Count> cumulative = upper.row(rest);
        const std::span<const Count> row = lower.row(c);
        std::int64_t left = scores.statistic - lower.range(c).low - upper.range(rest).low;
        for (const Count& count : row) {
            below.add(count * up_to(cumulative, left - 1));
            through.add(count * up_to(cumulative, left));
            --left;
        }
    }
    if constexpr (std::is_same_v<Count, double>) {
        return {below.value(), std::max(0.0, through.value() - below.value())};
    } else {
        return {below.value(), through.value() - below.value()};
    }
}

} // namespace rankstead
