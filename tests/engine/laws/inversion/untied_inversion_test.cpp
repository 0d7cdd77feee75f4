// laws/inversion/untied_inversion.h: against exact integers where they can be counted; what must hold at any size.
#include "laws/inversion/untied_inversion.h"

#include "big_laws.h"
#include "laws/rank_sum_law.h"
#include "laws/signed_rank_law.h"

#include <gtest/gtest.h>

#include <cmath>

namespace rankstead {
namespace {

constexpr double seconds = 0.5;

void expect_within_bound(const std::optional<CertifiedTail>& tail, const test::BigTails& exact) {
    ASSERT_TRUE(tail);
    EXPECT_LE(test::relative_error(tail->lower, exact.lower, exact.total), tail->relative_error);
    EXPECT_LE(tail->relative_error, 1e-10);
    const test::Big mass = exact.lower + exact.upper - exact.total;
    EXPECT_LE(test::relative_error(tail->mass, mass, exact.total) * tail->mass, 1.001 * tail->mass_error);
}

TEST(UntiedInversion, of_signed_rank_is_within_its_bound_of_unbounded_integers) {
    for (const std::int64_t n : {5, 60, 150, 250}) {
        const auto inversion = UntiedInversion::of_signed_rank(n);
        const std::int64_t sum = n * (n + 1) / 2;
        for (const std::int64_t w : {sum / 5, sum / 3, (sum - 1) / 2, sum / 2}) {
            SCOPED_TRACE(std::to_string(n) + " differences, statistic " + std::to_string(w));
            expect_within_bound(inversion.at(w, seconds), test::big_sign_tails(untied_sign_scores(n, 0).scores, w));
        }
    }
}

TEST(UntiedInversion, of_rank_sum_is_within_its_bound_of_exact_integers) {
    const std::pair<std::int64_t, std::int64_t> sizes[] = {{4, 5}, {10, 60}, {40, 40}, {60, 62}};
    for (const auto& [m, n] : sizes) {
        const auto inversion = UntiedInversion::of_rank_sum(m, n);
        for (const std::int64_t u : {m * n / 6, m * n / 3, (m * n - 1) / 2, m * n / 2}) {
            SCOPED_TRACE(std::to_string(m) + " v " + std::to_string(n) + ", U " + std::to_string(u));
            const ChoiceScores scores = untied_choice_scores(m, n, u);
            expect_within_bound(inversion.at(u, seconds),
                                test::big_choice_tails(scores.scores, static_cast<std::size_t>(m), scores.statistic));
        }
    }
}

// At the centre of a symmetric law each tail is (1 + mass) / 2.
TEST(UntiedInversion, at_the_centre_gives_half_of_one_and_the_mass_at_any_size) {
    for (const std::int64_t n : {400, 1'000'000, 2'000'000'000}) {
        const auto tail = UntiedInversion::of_rank_sum(n, n).at(n * n / 2, seconds);
        ASSERT_TRUE(tail) << n;
        EXPECT_NEAR(tail->lower, (1 + tail->mass) / 2, tail->lower * tail->relative_error + tail->mass_error) << n;
    }
}

// Berry-Esseen: at 1e9 a side the law is the normal one to within 1/sqrt(N). Phi(-2) = 0.022750132 (Abramowitz & Stegun
// 1964, table 26.1).
TEST(UntiedInversion, of_very_large_samples_is_close_to_the_normal_law) {
    const std::int64_t n = 1'000'000'000;
    const double spread = std::sqrt(1e18 * (2e9 + 1) / 12);
    const auto u = static_cast<std::int64_t>(5e17 - 2 * spread);
    EXPECT_NEAR(UntiedInversion::of_rank_sum(n, n).at(u, seconds).value().lower, 0.022750132, 1e-6);
    const double signed_spread = std::sqrt(1e9 * (1e9 + 1) * (2e9 + 1) / 24);
    const auto t = static_cast<std::int64_t>(1e9 * (1e9 + 1) / 4 - 2 * signed_spread);
    EXPECT_NEAR(UntiedInversion::of_signed_rank(n).at(t, seconds).value().lower, 0.022750132, 1e-6);
}

TEST(UntiedInversion, gives_differences_of_tails_as_masses) {
    const auto inversion = UntiedInversion::of_rank_sum(300, 500);
    const std::int64_t u = 300 * 500 / 2 - 12'000;
    const auto below = inversion.at(u - 1, seconds).value();
    const auto here = inversion.at(u, seconds).value();
    EXPECT_NEAR(here.lower - below.lower, here.mass, 2 * here.lower * here.relative_error + here.mass_error);
}

TEST(UntiedInversion, says_zero_for_a_tail_below_the_range_of_a_double) {
    const auto tail = UntiedInversion::of_rank_sum(5000, 5000).at(1'000'000, seconds);
    ASSERT_TRUE(tail);
    EXPECT_EQ(tail->lower, 0);
}

// Not even one frequency of this corner fits a tenth of a microsecond.
TEST(UntiedInversion, gives_none_rather_than_take_longer_than_allowed) {
    EXPECT_FALSE(UntiedInversion::of_rank_sum(10, 10'000'000).at(30'000'000, 1e-7));
}

} // namespace
} // namespace rankstead
