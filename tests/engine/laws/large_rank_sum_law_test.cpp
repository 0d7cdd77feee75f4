// laws/rank_sum_law.h where enumeration is too much: against large integers, to 1e-13 relative.
#include "laws/rank_sum_law.h"

#include "big_laws.h"
#include "data.h"

#include <gtest/gtest.h>

#include <cmath>
#include <numeric>

namespace rankstead {
namespace {

using Scores = std::vector<std::int64_t>;

void expect_close(const Tails& tails, const ChoiceScores& scores) {
    const auto exact = test::big_choice_tails(scores.scores, static_cast<std::size_t>(scores.chosen), scores.statistic);
    const bool low = exact.lower <= exact.upper;
    const double error = low ? test::relative_error(tails.lower, exact.lower, exact.total)
                             : test::relative_error(tails.upper, exact.upper, exact.total);
    EXPECT_LE(error, 1e-13) << scores.chosen << " of " << scores.scores.size() << ", statistic " << scores.statistic;
    EXPECT_LE(error, tails.relative_error) << "beyond the stated bound";
}

struct Sizes {
    std::int64_t first;
    std::int64_t second;
    std::int64_t levels;
};

class LargeRankSum : public ::testing::TestWithParam<Sizes> {};

TEST_P(LargeRankSum, with_ties_agrees_with_large_integers_to_1e_13) {
    const auto [first, second, levels] = GetParam();
    test::Random random(static_cast<std::uint64_t>(first * 1000 + second));
    for (const std::int64_t lead : {std::int64_t{0}, levels / 3, levels}) {
        const auto ranking =
            rank_pooled(random.sorted(first, lead, levels + lead), random.sorted(second, 0, levels), std::int64_t{0});
        const ChoiceScores scores = choice_scores(ranking);
        expect_close(rank_sum_tails(scores), scores);
    }
}

INSTANTIATE_TEST_SUITE_P(sizes, LargeRankSum,
                         ::testing::Values(Sizes{33, 33, 12}, Sizes{34, 34, 12}, Sizes{40, 40, 5}, Sizes{25, 60, 30},
                                           Sizes{60, 25, 30}, Sizes{5, 200, 12}, Sizes{200, 5, 12}, Sizes{1, 300, 4},
                                           Sizes{60, 60, 8}, Sizes{60, 60, 40}),
                         [](const auto& tested) {
                             return std::to_string(tested.param.first) + "_v_" + std::to_string(tested.param.second) +
                                    "_levels_" + std::to_string(tested.param.levels);
                         });

TEST(RankSumLaw, without_ties_agrees_with_large_integers) {
    const UntiedRankSumLaw table(45, 50);
    for (const std::int64_t u : {0, 300, 700, 1000, 1125, 1126, 1600, 2250}) {
        const ChoiceScores scores = untied_choice_scores(45, 50, u);
        expect_close(rank_sum_tails(scores), scores);
        expect_close(table.at(u), scores);
    }
}

// Separated samples of 40: one arrangement of C(80, 40) = 1.0750720873333166e23.
TEST(RankSumLaw, of_forty_above_forty_is_one_in_c_80_40) {
    Scores low(40);
    Scores high(40);
    std::iota(low.begin(), low.end(), std::int64_t{1});
    std::iota(high.begin(), high.end(), std::int64_t{101});
    high[39] = high[38]; // a tie, so that the law for tied data answers
    const auto scores = choice_scores(rank_pooled(high, low, std::int64_t{0}));
    const Tails tails = rank_sum_tails(scores);
    EXPECT_LT(test::relative_error(tails.upper, 1, test::big_choose(80, 40)), 1e-13);
    EXPECT_LT(test::relative_error(UntiedRankSumLaw(40, 40).at(1600).upper, 1, test::big_choose(80, 40)), 1e-13);
    EXPECT_EQ(tails.lower, 1.0);
}

TEST(RankSumLaw, swapping_the_samples_swaps_the_tails_bit_for_bit) {
    test::Random random(5);
    for (const auto& [first, second] : {std::pair{3, 4}, {6, 6}, {20, 31}, {40, 40}, {7, 90}, {60, 60}}) {
        for (const std::int64_t lead : {0, 1, 4}) {
            const Scores x = random.sorted(first, lead, 9 + lead);
            const Scores y = random.sorted(second, 0, 9);
            const Tails tails = rank_sum_tails(choice_scores(rank_pooled(x, y, std::int64_t{0})));
            const Tails swapped = rank_sum_tails(choice_scores(rank_pooled(y, x, std::int64_t{0})));
            EXPECT_EQ(tails.lower, swapped.upper) << first << " v " << second;
            EXPECT_EQ(tails.upper, swapped.lower) << first << " v " << second;
        }
    }
}

TEST(UntiedRankSumLaw, swapping_the_samples_swaps_the_tails_bit_for_bit) {
    for (const auto& [first, second] : {std::pair{3, 8}, {30, 41}, {70, 70}, {90, 75}}) {
        const std::int64_t pairs = std::int64_t{first} * second;
        const UntiedRankSumLaw one(first, second);
        const UntiedRankSumLaw other(second, first);
        for (std::int64_t u = 0; u <= pairs; u += 1 + pairs / 11) {
            EXPECT_EQ(one.at(u).lower, other.at(pairs - u).upper) << first << " v " << second << " at " << u;
            EXPECT_EQ(one.at(u).upper, other.at(pairs - u).lower) << first << " v " << second << " at " << u;
        }
    }
}

TEST(RankSumCost, grows_with_the_samples_until_the_doubles_cannot_hold_the_law) {
    EXPECT_LT(rank_sum_cost(untied_choice_scores(10, 10, 50)), rank_sum_cost(untied_choice_scores(50, 50, 1250)));
    EXPECT_TRUE(std::isinf(rank_sum_cost(untied_choice_scores(600, 600, 180000))));
}

// Wilcoxon (1945), two fly sprays, 8 and 8: rank totals 91 and 45. Exact conditional p by enumeration of C(16, 8).
TEST(RankSumLaw, published_fly_sprays) {
    const Scores a{59, 64, 67, 68, 68, 70, 72, 74};
    const Scores b{56, 58, 60, 61, 62, 63, 67, 67};
    const auto ranking = rank_pooled(a, b, std::int64_t{0});
    EXPECT_EQ(ranking.doubled_first_sum, 2 * 91);
    EXPECT_EQ(ranking.doubled_u(), 2 * (91 - 36));
    const double p = 2 * rank_sum_tails(choice_scores(ranking)).upper;
    EXPECT_GT(p, 0.0104); // the bracket that Wilcoxon gives
    EXPECT_LT(p, 0.021);
}

} // namespace
} // namespace rankstead
