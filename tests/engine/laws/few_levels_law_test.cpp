// laws/few_levels_law.h: against exact integers, and against the inversion where those cannot be counted.
#include "laws/few_levels_law.h"

#include "big_laws.h"
#include "data.h"
#include "laws/rank_sum_law.h"
#include "laws/signed_rank_law.h"

#include <gtest/gtest.h>

#include <cmath>

namespace rankstead {
namespace {

void expect_within_bound(const std::optional<CertifiedTail>& tail, const test::BigTails& exact) {
    ASSERT_TRUE(tail);
    EXPECT_LE(test::relative_error(tail->lower, exact.lower, exact.total), tail->relative_error);
    EXPECT_LE(tail->relative_error, 1e-11);
    const double mass =
        static_cast<double>(test::Big(exact.lower + exact.upper - exact.total)) / static_cast<double>(exact.total);
    EXPECT_NEAR(tail->mass, mass, tail->mass_error + 1e-15 * mass);
}

ChoiceScores canonical_scores(test::Random& random, std::int64_t first, std::int64_t second, std::int64_t levels,
                              std::int64_t lead) {
    return canonical(choice_scores(rank_pooled(random.sorted(first, lead, levels - 1),
                                               random.sorted(second, 0, levels - 1), std::int64_t{0})))
        .scores;
}

TEST(FewLevelsLaw, of_the_rank_sum_is_within_its_bound_of_exact_integers) {
    test::Random random(51);
    for (const std::int64_t levels : {2, 3, 4, 6}) {
        for (const auto& [first, second] : {std::pair<std::int64_t, std::int64_t>{30, 40}, {10, 90}, {60, 60}}) {
            for (const std::int64_t lead : {std::int64_t{0}, levels / 2}) {
                const ChoiceScores scores = canonical_scores(random, first, second, levels, lead);
                SCOPED_TRACE(std::to_string(scores.chosen) + " of " + std::to_string(scores.scores.size()) + " on " +
                             std::to_string(levels) + ", sum " + std::to_string(scores.statistic));
                expect_within_bound(
                    FewLevelsLaw::of_choice(ScoredItems::of(scores.scores), scores.chosen, scores.statistic).evaluate(),
                    test::big_choice_tails(scores.scores, static_cast<std::size_t>(scores.chosen), scores.statistic));
            }
        }
    }
}

TEST(FewLevelsLaw, of_the_signed_rank_is_within_its_bound_of_unbounded_integers) {
    test::Random random(52);
    for (const std::int64_t levels : {2, 3, 4}) {
        for (const std::int64_t n : {40, 200}) {
            SignScores scores = sign_scores(rank_signed(random.sorted(n, -levels, levels), std::int64_t{0}, true));
            for (const std::int64_t low : {scores.sum / 2, scores.sum / 3, scores.sum / 6}) {
                SCOPED_TRACE(std::to_string(n) + " on " + std::to_string(levels) + ", sum " + std::to_string(low));
                expect_within_bound(FewLevelsLaw::of_signs(ScoredItems::of(scores.scores), low).evaluate(),
                                    test::big_sign_tails(scores.scores, low));
            }
        }
    }
}

// Two ways that share nothing but the saddlepoint's formula.
TEST(FewLevelsLaw, agrees_with_the_inversion_in_large_samples_far_into_the_tail) {
    test::Random random(53);
    const ChoiceScores scores = canonical_scores(random, 3000, 4000, 4, 0);
    const ScoredItems items = ScoredItems::of(scores.scores);
    const std::int64_t mean = scores.chosen * items.sum() / items.size();
    for (const std::int64_t part : {0, 100, 20, 5}) {
        const std::int64_t w = part == 0 ? mean : mean - mean / part;
        const auto levels = FewLevelsLaw::of_choice(items, scores.chosen, w).evaluate();
        const auto inverted = CertifiedInversion::of_choice(items, scores.chosen).at(w, 1);
        ASSERT_TRUE(levels && inverted) << part;
        EXPECT_NEAR(levels->lower / inverted->lower, 1, levels->relative_error + inverted->relative_error) << part;
    }
}

// Weights and sums there span more than a double does: right within the bound, or none.
TEST(FewLevelsLaw, near_the_end_of_a_large_law_is_right_or_gives_none) {
    const ScoredItems items{{0, 40'001, 90'007}, {40'000, 50'000, 45'000}};
    const CertifiedInversion inversion = CertifiedInversion::of_choice(items, 60'000);
    const std::int64_t mean = 60'000 * items.sum() / items.size();
    for (const std::int64_t part : {40, 20, 14, 8, 4, 3, 2}) {
        const std::int64_t w = mean - mean / part;
        const auto levels = FewLevelsLaw::of_choice(items, 60'000, w).evaluate();
        const auto inverted = inversion.at(w, 1);
        ASSERT_TRUE(!levels || std::isfinite(levels->lower)) << part;
        if (levels && inverted && inverted->lower > 1e-300) {
            EXPECT_NEAR(levels->lower / inverted->lower, 1, levels->relative_error + inverted->relative_error) << part;
        }
    }
    EXPECT_TRUE(FewLevelsLaw::of_choice(items, 60'000, mean - mean / 40).evaluate());
}

TEST(FewLevelsLaw, predicts_little_for_three_levels_of_a_million_and_much_for_six) {
    const ScoredItems three{{0, 5, 11}, {700'000, 700'000, 600'000}};
    EXPECT_LT(FewLevelsLaw::of_choice(three, 1'000'000, 5'000'000).seconds(), 0.2);
    const ScoredItems six{{0, 5, 11, 20, 31, 40}, {300'000, 300'000, 300'000, 300'000, 300'000, 300'000}};
    EXPECT_GT(FewLevelsLaw::of_choice(six, 900'000, 15'000'000).seconds(), 10);
}

} // namespace
} // namespace rankstead
