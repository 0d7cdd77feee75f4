// laws/low_end_law.h: against exact integers, and the partition numbers.
#include "laws/low_end_law.h"

#include "big_laws.h"
#include "data.h"

#include <gtest/gtest.h>

#include <cmath>
#include <limits>
#include <numeric>

namespace rankstead {
namespace {

std::int64_t lowest_sum(const ChoiceScores& scores) {
    return std::accumulate(scores.scores.begin(), scores.scores.begin() + scores.chosen, std::int64_t{0});
}

TEST(LowEndLaw, agrees_with_exact_integers_near_the_end_with_ties) {
    test::Random random(91);
    for (const std::int64_t levels : {3, 12, 200}) {
        ChoiceScores scores =
            choice_scores(rank_pooled(random.sorted(50, 0, levels), random.sorted(55, 0, levels), std::int64_t{0}));
        for (const std::int64_t excess : {0, 1, 40, 400}) {
            scores.statistic = lowest_sum(scores) + excess;
            const auto exact = test::big_choice_tails(scores.scores, 50, scores.statistic);
            const auto tails = low_end_tails(scores);
            ASSERT_TRUE(tails);
            EXPECT_LE(test::relative_error(tails->lower, exact.lower, exact.total), tails->relative_error);
            EXPECT_LE(tails->relative_error, 1e-10);
        }
    }
}

// Without ties P(U <= 100) C(2000, 1000) is the number of partitions of 0 to 100: 1,642,992,568 by adding the partition
// numbers (Abramowitz & Stegun 1964, table 24.5; the sum is recomputed here by Euler's recurrence).
TEST(LowEndLaw, counts_partitions_without_ties) {
    std::vector<std::int64_t> partitions(101, 0);
    partitions[0] = 1;
    for (std::size_t part = 1; part <= 100; ++part) {
        for (std::size_t k = part; k <= 100; ++k) {
            partitions[k] += partitions[k - part];
        }
    }
    ASSERT_EQ(partitions[100], 190'569'292);
    const test::Big count = std::accumulate(partitions.begin(), partitions.end(), std::int64_t{0});
    const auto tails = low_end_tails(untied_choice_scores(400, 400, 100));
    ASSERT_TRUE(tails);
    EXPECT_LE(test::relative_error(tails->lower, count, test::big_choose(800, 400)), tails->relative_error);
}

// C(2000, 1000) is beyond 2^1900: a bound stated for a tail that a double cannot hold would be broken.
TEST(LowEndLaw, states_no_bound_for_a_tail_below_the_range_of_a_double) {
    const auto tails = low_end_tails(untied_choice_scores(1000, 1000, 3));
    ASSERT_TRUE(tails);
    EXPECT_LT(tails->lower, smallest_positive_p);
    EXPECT_TRUE(std::isinf(tails->relative_error));
}

TEST(LowEndLaw, predicts_more_than_any_time_allowed_in_the_middle_of_a_large_law) {
    EXPECT_EQ(low_end_seconds(untied_choice_scores(500, 500, 125'000)), std::numeric_limits<double>::infinity());
    EXPECT_LT(low_end_seconds(untied_choice_scores(500, 500, 300)), 0.01);
}

} // namespace
} // namespace rankstead
