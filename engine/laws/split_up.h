// Split-up dynamic programming for the sum of m of N scores (van de Wiel 2001): the distribution of the number and the
// sum taken from the lower half of the scores and from the upper half, each by itself, then both merged.
#pragma once

#include "binomial_coefficient.h"
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

// C(size, j) for j = 0 to `last`. A whole number too large for its type belongs to no choice that there is, as all of
// them fit.
template <class Count>
[[nodiscard]] std::vector<Count> choices(std::int64_t size, std::int64_t last) {
    std::vector<Count> ways;
    for (std::int64_t j = 0; j <= last; ++j) {
        if constexpr (std::is_same_v<Count, double>) {
            ways.push_back(double_choose(size, j));
        } else {
            ways.push_back(static_cast<Count>(exact_choose(size, j).value_or(0)));
        }
    }
    return ways;
}

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
        for (std::size_t begin = 0; begin < half.size();) {
            const auto end =
                std::upper_bound(half.begin() + static_cast<std::ptrdiff_t>(begin), half.end(), half[begin]);
            const auto size = static_cast<std::size_t>(end - half.begin()) - begin;
            add(half[begin], static_cast<std::int64_t>(begin), static_cast<std::int64_t>(size));
            begin += size;
        }
    }

    [[nodiscard]] const SumRange& range(std::int64_t count) const { return ranges_[static_cast<std::size_t>(count)]; }
    [[nodiscard]] std::span<Count> row(std::int64_t count) {
        return {cells_.data() + begins_[static_cast<std::size_t>(count)],
                static_cast<std::size_t>(range(count).size())};
    }
    [[nodiscard]] std::int64_t most() const { return static_cast<std::int64_t>(ranges_.size()) - 1; }

private:
    // Takes some of `size` equal scores, after `seen` others. Among those, c sum to least_[c] at least and to the sum
    // of the c largest at most. From the largest count down, so that what is read has not yet been added to.
    void add(std::int64_t score, std::int64_t seen, std::int64_t size) {
        const std::vector<Count> ways = choices<Count>(size, std::min(size, most()));
        for (std::int64_t c = std::min(most(), seen + size); c >= 1; --c) {
            const SumRange& to = range(c);
            for (std::int64_t taken = std::max<std::int64_t>(1, c - seen); taken <= std::min(size, c); ++taken) {
                const std::int64_t before = c - taken;
                const std::int64_t low = least_[static_cast<std::size_t>(before)];
                const std::int64_t largest =
                    least_[static_cast<std::size_t>(seen)] - least_[static_cast<std::size_t>(seen - before)];
                const std::int64_t high = std::min({largest, range(before).high, to.high - taken * score});
                if (high < low) {
                    continue;
                }
                Count* __restrict target = row(c).data() + (low + taken * score - to.low);
                const Count* __restrict source = row(before).data() + (low - range(before).low);
                const Count factor = ways[static_cast<std::size_t>(taken)];
                const std::int64_t length = high - low + 1;
                for (std::int64_t i = 0; i < length; ++i) {
                    target[i] += factor * source[i];
                }
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
