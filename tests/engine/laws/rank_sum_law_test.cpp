// laws/rank_sum_law.h: against plain enumeration.
#include "laws/rank_sum_law.h"

#include "enumeration.h"

#include <gtest/gtest.h>

#include <numeric>

namespace rankstead {
namespace {

using Scores = std::vector<std::int64_t>;

void expect_counts(const Tails& tails, const test::Enumerated& law, std::int64_t statistic) {
    ASSERT_TRUE(tails.counts);
    ASSERT_EQ(tails.counts->lower, law.at_most(statistic)) << statistic;
    ASSERT_EQ(tails.counts->upper, law.at_least(statistic)) << statistic;
    ASSERT_EQ(tails.counts->total, law.total);
    ASSERT_EQ(tails.lower, law.lower(statistic)) << statistic;
    ASSERT_EQ(tails.upper, law.upper(statistic)) << statistic;
}

// U of m of the ranks 1 to N is their sum less m(m+1)/2.
test::Enumerated untied_law(std::int64_t m, std::int64_t n) {
    Scores ranks(static_cast<std::size_t>(m + n));
    std::iota(ranks.begin(), ranks.end(), std::int64_t{1});
    test::Enumerated law;
    const test::Enumerated sums = test::every_choice(ranks, static_cast<std::size_t>(m));
    law.total = sums.total;
    for (const auto& [sum, ways] : sums.ways) {
        law.ways[sum - m * (m + 1) / 2] = ways;
    }
    return law;
}

class UntiedRankSum : public ::testing::TestWithParam<std::int64_t> {};

TEST_P(UntiedRankSum, agrees_with_every_choice_at_every_statistic) {
    const std::int64_t size = GetParam();
    for (std::int64_t m = 1; m < size; ++m) {
        const std::int64_t n = size - m;
        const auto law = untied_law(m, n);
        const UntiedRankSumLaw table(m, n);
        for (std::int64_t u = 0; u <= m * n; ++u) {
            expect_counts(rank_sum_tails(untied_choice_scores(m, n, u)), law, u);
            expect_counts(table.at(u), law, u);
        }
    }
}

INSTANTIATE_TEST_SUITE_P(pooled, UntiedRankSum, ::testing::Range<std::int64_t>(2, 15));

// ------------------------------------------------------------------------------------------------ ties

struct Split {
    Scores first;
    Scores second;
    std::int64_t doubled_sum = 0; // twice the rank sum of the first
};

Split split(const Scores& values, const Scores& ranks, std::uint64_t members) {
    Split result;
    for (std::size_t i = 0; i < values.size(); ++i) {
        const bool in_first = (members >> i & 1U) != 0;
        (in_first ? result.first : result.second).push_back(values[i]);
        result.doubled_sum += in_first ? ranks[i] : 0;
    }
    return result;
}

class RankSumTies : public ::testing::TestWithParam<std::int64_t> {};

TEST_P(RankSumTies, agree_with_every_choice_for_every_tie_pattern) {
    const auto size = static_cast<std::size_t>(GetParam());
    for (const Scores& pattern : test::tie_patterns(GetParam())) {
        const Scores values = test::values_of(pattern);
        const Scores ranks = test::doubled_midranks(values);
        std::vector<test::Enumerated> laws;
        for (std::size_t m = 0; m <= size; ++m) {
            laws.push_back(test::every_choice(ranks, m));
        }
        for (std::uint64_t members = 1; members + 1 < std::uint64_t{1} << size; ++members) {
            const Split samples = split(values, ranks, members);
            const auto ranking = rank_pooled(samples.first, samples.second, std::int64_t{0});
            expect_counts(rank_sum_tails(choice_scores(ranking)), laws[samples.first.size()], samples.doubled_sum);
        }
    }
}

INSTANTIATE_TEST_SUITE_P(pooled, RankSumTies, ::testing::Range<std::int64_t>(2, 10));

TEST(ChoiceScores, start_at_zero_and_are_divided_by_the_common_divisor) {
    // Doubled midranks 2, 5, 5, 8 become 0, 1, 1, 2.
    const ChoiceScores scores = choice_scores(rank_pooled(Scores{2, 3}, Scores{1, 2}, std::int64_t{0}));
    EXPECT_EQ(scores.scores, (Scores{0, 1, 1, 2}));
    EXPECT_EQ(scores.chosen, 2);
    EXPECT_EQ(scores.statistic, 3);
}

TEST(RankSumLaw, of_equal_values_has_p_one) {
    const Tails tails = rank_sum_tails(choice_scores(rank_pooled(Scores{4, 4, 4}, Scores{4, 4}, std::int64_t{0})));
    EXPECT_EQ(tails.lower, 1.0);
    EXPECT_EQ(tails.upper, 1.0);
}

// Common practice: 8 and 10, the two-sided 5 % limits of the rank sum of the smaller sample are 53 and 99.
TEST(UntiedRankSumLaw, common_practice_limits_of_8_and_10) {
    const UntiedRankSumLaw law(8, 10);
    constexpr std::int64_t least = 8 * 9 / 2;
    EXPECT_LE(2 * law.at(53 - least).lower, 0.05);
    EXPECT_GT(2 * law.at(54 - least).lower, 0.05);
    EXPECT_LE(2 * law.at(99 - least).upper, 0.05);
    EXPECT_GT(2 * law.at(98 - least).upper, 0.05);
}

} // namespace
} // namespace rankstead
