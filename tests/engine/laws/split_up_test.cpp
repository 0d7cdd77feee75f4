// laws/split_up.h: the halves and the ranges of the split-up recursion. The whole is tested with rank_sum_law.
#include "laws/split_up.h"

#include "enumeration.h"

#include <gtest/gtest.h>

#include <cmath>
#include <map>

namespace rankstead {
namespace {

using Scores = std::vector<std::int64_t>;

TEST(LeastSums, are_the_sums_of_the_smallest_scores) {
    EXPECT_EQ(least_sums(Scores{0, 1, 1, 5}), (Scores{0, 0, 1, 2, 7}));
}

TEST(UpTo, reads_a_cumulative_row_at_and_beyond_its_ends) {
    const std::vector<std::uint64_t> row{1, 3, 6};
    const std::span<const std::uint64_t> view(row);
    EXPECT_EQ(up_to(view, -1), 0U);
    EXPECT_EQ(up_to(view, 1), 3U);
    EXPECT_EQ(up_to(view, 99), 6U);
    EXPECT_EQ(up_to(std::span<const std::uint64_t>(), 5), 0U);
}

// With a statistic that excludes nothing, each row holds every choice of so many scores of the half.
TEST(HalfDistribution, holds_every_choice_of_its_scores) {
    const Scores half{0, 1, 1, 3, 6};
    const Scores other{7, 8, 9};
    HalfDistribution<std::uint64_t> distribution(half, sum_ranges(half, 4, least_sums(other), 1000));
    for (std::int64_t c = 1; c <= 4; ++c) {
        const auto choices = test::every_choice(half, static_cast<std::size_t>(c));
        const auto row = distribution.row(c);
        for (std::size_t i = 0; i < row.size(); ++i) {
            const std::int64_t sum = distribution.range(c).low + static_cast<std::int64_t>(i);
            const auto ways = choices.ways.find(sum);
            EXPECT_EQ(row[i], ways == choices.ways.end() ? 0 : ways->second) << c << " scores, sum " << sum;
        }
    }
}

TEST(SumRanges, leave_out_sums_that_would_exceed_the_statistic_whatever_follows) {
    const Scores half{0, 1, 2, 3};
    const Scores other{4, 5, 6, 7};
    // 2 chosen, sum at most 3: none may come from the other half, and one score of 3 still leaves room for the 0.
    const auto ranges = sum_ranges(half, 2, least_sums(other), 3);
    ASSERT_EQ(ranges.size(), 3U);
    EXPECT_EQ(ranges[1].low, 0);
    EXPECT_EQ(ranges[1].high, 3);
    EXPECT_EQ(ranges[2].high, 3);
}

TEST(SplitUpTail, splits_the_tail_into_below_and_at_the_statistic) {
    const Scores scores{0, 1, 1, 2, 4, 4, 7};
    const auto law = test::every_choice(scores, 3);
    for (const auto& [sum, ways] : law.ways) {
        const auto mass = split_up_tail<std::uint64_t>({scores, 3, sum});
        EXPECT_EQ(mass.at, ways) << sum;
        EXPECT_EQ(mass.below, law.at_most(sum - 1)) << sum;
        const auto rounded = split_up_tail<double>({scores, 3, sum});
        EXPECT_EQ(rounded.at, static_cast<double>(ways)) << sum;
    }
}

TEST(SplitUpSeconds, is_infinite_beyond_the_work_space) {
    Scores scores(4000);
    for (std::size_t i = 0; i < scores.size(); ++i) {
        scores[i] = static_cast<std::int64_t>(i);
    }
    EXPECT_TRUE(std::isinf(split_up_seconds({scores, 2000, 4000000})));
}

} // namespace
} // namespace rankstead
