// laws/signed_rank_law.h where enumeration is too much: against large integers, to 1e-13 relative.
#include "laws/signed_rank_law.h"

#include "big_laws.h"
#include "data.h"

#include <gtest/gtest.h>

#include <algorithm>
#include <cmath>

namespace rankstead {
namespace {

using Scores = std::vector<std::int64_t>;

SignScores random_tied_scores(test::Random& random, std::int64_t n, std::int64_t levels, std::int64_t zeros) {
    Scores values(static_cast<std::size_t>(zeros), 0);
    // More rises than falls, so that the statistic wanders into the tails.
    const std::int64_t lowest = -random.whole(1, levels);
    while (static_cast<std::int64_t>(values.size()) < n) {
        values.push_back(random.whole(lowest, levels));
    }
    std::sort(values.begin(), values.end());
    return sign_scores(rank_signed(values, std::int64_t{0}, random.whole(0, 1) == 1));
}

void expect_close(const Tails& tails, const SignScores& scores) {
    const auto exact = test::big_sign_tails(scores.scores, scores.statistic);
    const bool low = exact.lower <= exact.upper;
    const double error = low ? test::relative_error(tails.lower, exact.lower, exact.total)
                             : test::relative_error(tails.upper, exact.upper, exact.total);
    EXPECT_LE(error, 1e-13) << scores.scores.size() << " scores, statistic " << scores.statistic;
    EXPECT_LE(error, tails.relative_error) << "beyond the stated bound";
}

class LargeSignedRank : public ::testing::TestWithParam<std::int64_t> {};

TEST_P(LargeSignedRank, with_ties_agrees_with_unbounded_integers_to_1e_13) {
    test::Random random(static_cast<std::uint64_t>(GetParam()));
    for (const std::int64_t levels : {3, 12, 60}) {
        for (int i = 0; i < 3; ++i) {
            const SignScores scores = random_tied_scores(random, GetParam(), levels, random.whole(0, 3));
            expect_close(signed_rank_tails(scores), scores);
        }
    }
}

INSTANTIATE_TEST_SUITE_P(n, LargeSignedRank, ::testing::Values(20, 50, 62, 63, 64, 100, 200));

TEST(SignedRankLaw, without_ties_agrees_with_unbounded_integers_from_the_centre_to_the_end) {
    for (const std::int64_t n : {62, 63, 180}) {
        const UntiedSignedRankLaw table(n);
        const std::int64_t sum = n * (n + 1) / 2;
        for (const std::int64_t statistic :
             {std::int64_t{0}, sum / 20, sum / 3, sum / 2, sum - sum / 5, sum - 1, sum}) {
            const SignScores scores = untied_sign_scores(n, statistic);
            expect_close(signed_rank_tails(scores), scores);
            expect_close(table.at(statistic), scores);
        }
    }
}

TEST(SignedRankLaw, of_sixty_rises_out_of_sixty_is_two_to_the_minus_sixty) {
    EXPECT_EQ(signed_rank_tails(untied_sign_scores(60, 60 * 61 / 2)).upper, std::ldexp(1.0, -60));
}

TEST(SignedRankLaw, reversing_every_sign_swaps_the_tails_bit_for_bit) {
    test::Random random(77);
    for (const std::int64_t n : {5, 17, 62, 63, 120}) {
        SignScores scores = random_tied_scores(random, n, 9, 0);
        const Tails tails = signed_rank_tails(scores);
        scores.statistic = scores.sum - scores.statistic;
        const Tails reversed = signed_rank_tails(scores);
        EXPECT_EQ(tails.lower, reversed.upper) << n;
        EXPECT_EQ(tails.upper, reversed.lower) << n;
    }
}

TEST(SignedRankLaw, of_two_thousand_values_is_still_a_probability) {
    const std::int64_t n = 2000;
    const Tails tails = signed_rank_tails(untied_sign_scores(n, n * (n + 1) / 8));
    EXPECT_GT(tails.lower, 0.0);
    EXPECT_LT(tails.lower, 1e-40);
    EXPECT_EQ(tails.upper, 1.0);
}

TEST(SignedRankCost, is_infinite_where_the_doubles_could_not_hold_the_law) {
    EXPECT_TRUE(std::isfinite(signed_rank_cost(untied_sign_scores(2000, 2001))));
    EXPECT_TRUE(std::isinf(signed_rank_cost(untied_sign_scores(2001, 2001))));
    // Scores beyond the statistic do not count.
    EXPECT_TRUE(std::isfinite(signed_rank_cost(untied_sign_scores(1'000'000, 2000))));
}

// Wilcoxon (1945), Darwin's maize: 15 pairs, rank total of the negative differences 24; exact two-sided p
// 0.041259765625 (also in the documentation of scipy.stats.wilcoxon).
TEST(SignedRankLaw, published_darwins_maize) {
    EXPECT_EQ(2 * signed_rank_tails(untied_sign_scores(15, 24)).lower, 0.041259765625);
}

} // namespace
} // namespace rankstead
