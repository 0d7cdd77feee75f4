// laws/exact_laws.h: which way is taken, and that both ways agree.
#include "laws/exact_laws.h"

#include "big_laws.h"
#include "data.h"

#include <gtest/gtest.h>

#include <cmath>

namespace rankstead {
namespace {

TEST(ExactSignedRank, agrees_with_the_dynamic_programme_where_both_serve) {
    for (const std::int64_t statistic : {400000, 350000, 460000}) {
        const SignScores scores = untied_sign_scores(1300, statistic);
        const Tails quick = exact_signed_rank_tails(scores, 1);
        const Tails slow = signed_rank_tails(scores);
        EXPECT_NEAR(quick.lower / slow.lower, 1, quick.relative_error + slow.relative_error + 1e-15) << statistic;
        EXPECT_NEAR(quick.upper / slow.upper, 1, 1e-11) << statistic;
    }
}

TEST(ExactSignedRank, mirrors_the_tails_exactly) {
    const std::int64_t n = 3000;
    const std::int64_t sum = n * (n + 1) / 2;
    const Tails one = exact_signed_rank_tails(untied_sign_scores(n, 2100000), 1);
    const Tails other = exact_signed_rank_tails(untied_sign_scores(n, sum - 2100000), 1);
    EXPECT_EQ(one.lower, other.upper);
    EXPECT_EQ(one.upper, other.lower);
}

TEST(ExactRankSum, agrees_with_the_dynamic_programme_where_both_serve) {
    for (const std::int64_t u : {8000, 10000, 11500, 14000}) {
        const ChoiceScores scores = untied_choice_scores(150, 150, u);
        const Tails quick = exact_rank_sum_tails(scores, 1);
        const Tails slow = rank_sum_tails(scores);
        EXPECT_NEAR(quick.lower / slow.lower, 1, 1e-11) << u;
        EXPECT_NEAR(quick.upper / slow.upper, 1, 1e-11) << u;
    }
}

TEST(ExactRankSum, swapping_the_samples_swaps_the_tails_exactly) {
    const Tails one = exact_rank_sum_tails(untied_choice_scores(700, 900, 300000), 1);
    const Tails other = exact_rank_sum_tails(untied_choice_scores(900, 700, 700 * 900 - 300000), 1);
    EXPECT_EQ(one.lower, other.upper);
    EXPECT_EQ(one.upper, other.lower);
}

// At the end of the range there is no saddlepoint: one arrangement of 2^n, or of C(m + n, m).
TEST(ExactLaws, reach_the_end_of_the_range) {
    EXPECT_DOUBLE_EQ(exact_signed_rank_tails(untied_sign_scores(900, 0), 1).lower, std::ldexp(1.0, -900));
    const Tails separated = exact_rank_sum_tails(untied_choice_scores(400, 400, 0), 1);
    EXPECT_LE(test::relative_error(separated.lower, 1, test::big_choose(800, 400)), separated.relative_error);
    EXPECT_LE(separated.relative_error, 1e-10);
}

TEST(ExactLaws, near_the_end_of_the_range_are_right_or_give_up) {
    for (const std::int64_t u : {1, 2, 5, 20, 100}) {
        const Tails tails = exact_rank_sum_tails(untied_choice_scores(300, 300, u), 1);
        const Tails truth = rank_sum_tails(untied_choice_scores(300, 300, u));
        EXPECT_NEAR(tails.lower / truth.lower, 1, 1e-11) << u;
    }
}

TEST(ExactLaws, give_up_where_the_time_allowed_is_too_short) {
    test::Random random(34);
    const SignScores signs = sign_scores(rank_signed(random.sorted(3000, -50, 60), std::int64_t{0}, false));
    EXPECT_THROW(static_cast<void>(exact_signed_rank_tails(signs, 1e-9)), LawTooLong);
    const ChoiceScores choice =
        choice_scores(rank_pooled(random.sorted(700, 0, 50), random.sorted(900, 0, 50), std::int64_t{0}));
    EXPECT_THROW(static_cast<void>(exact_rank_sum_tails(choice, 1e-9)), LawTooLong);
}

TEST(BestLaws, are_the_saddlepoint_approximation_where_the_time_allowed_is_too_short) {
    test::Random random(35);
    const ChoiceScores choice =
        choice_scores(rank_pooled(random.sorted(700, 0, 50), random.sorted(900, 0, 50), std::int64_t{0}));
    EXPECT_EQ(best_rank_sum_tails(choice, 1e-9).law, LawKind::saddlepoint);
    EXPECT_EQ(best_rank_sum_tails(choice, 0.5).law, LawKind::inverted);
    const SignScores signs = sign_scores(rank_signed(random.sorted(3000, -50, 60), std::int64_t{0}, false));
    EXPECT_EQ(best_signed_rank_tails(signs, 1e-9).law, LawKind::saddlepoint);
    EXPECT_EQ(best_signed_rank_tails(signs, 0.5).law, LawKind::inverted);
}

TEST(ExactLaws, count_pairs_of_values_as_the_programme_does) {
    test::Random random(36);
    for (const std::int64_t levels : {3, 40, 1000}) {
        const ChoiceScores scores =
            choice_scores(rank_pooled(random.sorted(2, 0, levels), random.sorted(60, 0, levels), std::int64_t{0}));
        const Tails tails = exact_rank_sum_tails(scores, 1);
        const auto exact = test::big_choice_tails(scores.scores, 2, scores.statistic);
        EXPECT_EQ(test::Big(tails.counts->lower), exact.lower);
        EXPECT_EQ(test::Big(tails.counts->upper), exact.upper);
        EXPECT_EQ(tails.counts->total, 62U * 61 / 2);
    }
}

// One value is the lowest of N with probability 1/N, whatever N is.
TEST(ExactLaws, count_the_place_of_a_single_value_among_a_million) {
    ChoiceScores scores = untied_choice_scores(1, 1'000'000, 2);
    scores.scores[1] = 2; // a tie
    const Tails tails = exact_rank_sum_tails(scores, 0.1);
    EXPECT_EQ(tails.lower, 3.0 / 1'000'001);
    EXPECT_EQ(tails.counts->upper, 1'000'000U);
}

} // namespace
} // namespace rankstead
