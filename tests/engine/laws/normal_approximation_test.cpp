// laws/normal_approximation.h: moments against the enumerated law, deviates against hand arithmetic.
#include "laws/normal_approximation.h"

#include "enumeration.h"

#include <gtest/gtest.h>

#include <cmath>
#include <numeric>

namespace rankstead {
namespace {

using Scores = std::vector<std::int64_t>;

Scores to(std::int64_t n) {
    Scores values(static_cast<std::size_t>(n));
    std::iota(values.begin(), values.end(), std::int64_t{1});
    return values;
}

SignedRanking ranked(const Scores& sizes, std::int64_t zeros, bool rank_zeros) {
    Scores values(static_cast<std::size_t>(zeros), 0);
    values.insert(values.end(), sizes.begin(), sizes.end());
    return rank_signed(values, std::int64_t{0}, rank_zeros);
}

// Doubled scores have twice the mean and four times the variance.
void expect_moments(const Moments& moments, const test::Enumerated& doubled) {
    EXPECT_NEAR(moments.mean, doubled.mean() / 2, 1e-12 * (1 + moments.mean));
    EXPECT_NEAR(moments.variance, doubled.variance() / 4, 1e-12 * (1 + moments.variance));
}

TEST(SignedRankMoments, are_those_of_every_sign_for_every_tie_pattern) {
    for (std::int64_t n = 1; n <= 7; ++n) {
        for (const Scores& pattern : test::tie_patterns(n)) {
            const Scores sizes = test::values_of(pattern);
            expect_moments(signed_rank_moments(ranked(sizes, 0, false)),
                           test::every_sign(test::doubled_midranks(sizes)));
        }
    }
}

// Cureton (1967).
TEST(SignedRankMoments, with_ranked_zeros_are_those_of_every_sign) {
    for (std::int64_t zeros = 1; zeros <= 3; ++zeros) {
        for (const Scores& pattern : test::tie_patterns(6)) {
            const Scores sizes = test::values_of(pattern);
            Scores all(static_cast<std::size_t>(zeros), 0);
            all.insert(all.end(), sizes.begin(), sizes.end());
            const Scores ranks = test::doubled_midranks(all);
            expect_moments(signed_rank_moments(ranked(sizes, zeros, true)),
                           test::every_sign({ranks.begin() + zeros, ranks.end()}));
        }
    }
}

TEST(SignedRankMoments, do_not_count_zeros_that_were_dropped) {
    EXPECT_EQ(signed_rank_moments(ranked(to(5), 3, false)).mean, 7.5);
    EXPECT_EQ(signed_rank_moments(ranked(to(5), 3, false)).variance, 13.75);
}

TEST(RankSumMoments, are_those_of_every_choice_for_every_tie_pattern) {
    for (const Scores& pattern : test::tie_patterns(7)) {
        const Scores values = test::values_of(pattern);
        for (std::size_t m = 1; m < values.size(); ++m) {
            const Scores first(values.begin(), values.begin() + static_cast<std::ptrdiff_t>(m));
            const Scores second(values.begin() + static_cast<std::ptrdiff_t>(m), values.end());
            Moments moments = rank_sum_moments(rank_pooled(first, second, std::int64_t{0}));
            const auto size = static_cast<double>(m);
            moments.mean += size * (size + 1) / 2; // of the rank sum rather than U
            expect_moments(moments, test::every_choice(test::doubled_midranks(values), m));
        }
    }
}

// 1,800 answers on a scale of five: t^3 exceeds 32 bits; N = 2.1 million: N^3 exceeds 64 bits.
TEST(RankSumMoments, do_not_overflow) {
    PooledRanking ranking;
    ranking.first = ranking.second = 1'050'000;
    for (int level = 0; level < 5; ++level) {
        ranking.groups.push_back({0, 210'000, 210'000});
    }
    const double n = 2.1e6;
    const double t = 4.2e5;
    const double expected = 1.05e6 * 1.05e6 / 12 * ((n * n * n - n) - 5 * (t * t * t - t)) / (n * (n - 1));
    EXPECT_NEAR(rank_sum_moments(ranking).variance / expected, 1, 1e-12);
}

TEST(SignMoments, are_half_and_a_quarter) {
    EXPECT_EQ(sign_moments(30).mean, 15.0);
    EXPECT_EQ(sign_moments(30).variance, 7.5);
}

// Common practice: signed rank with n = 10 and T = 8 has z 1.99 without continuity correction.
TEST(SignedRankMoments, common_practice_t_8_of_n_10) {
    const Moments moments = signed_rank_moments(ranked(to(10), 0, false));
    EXPECT_EQ(moments.mean, 27.5);
    EXPECT_EQ(moments.variance, 96.25);
    EXPECT_NEAR((moments.mean - 8) / std::sqrt(moments.variance), 1.99, 0.005);
}

// Common practice: samples of 8 and 10; the expected rank sum of the smaller is 76, and a rank sum of 85 has z 0.8.
TEST(RankSumMoments, common_practice_8_and_10) {
    Scores second(10);
    std::iota(second.begin(), second.end(), std::int64_t{101});
    const Moments moments = rank_sum_moments(rank_pooled(to(8), second, std::int64_t{0}));
    constexpr double least = 8 * 9 / 2;
    EXPECT_EQ(moments.mean + least, 76.0);
    EXPECT_NEAR((85 - least - moments.mean) / std::sqrt(moments.variance), 0.8, 0.0005);
}

constexpr Moments easy{10, 25}; // standard deviation 5

TEST(NormalDeviate, takes_the_continuity_step_toward_the_mean) {
    EXPECT_EQ(normal_deviate(14, easy, Side::two_sided), 0.7);
    EXPECT_EQ(normal_deviate(6, easy, Side::two_sided), -0.7);
}

TEST(NormalDeviate, never_steps_past_the_mean) {
    EXPECT_EQ(normal_deviate(10.25, easy, Side::two_sided), 0.0);
    EXPECT_EQ(normal_deviate(10, easy, Side::two_sided), 0.0);
}

TEST(NormalDeviate, keeps_the_observed_value_in_the_tail_one_sided) {
    EXPECT_EQ(normal_deviate(14, easy, Side::higher), 0.7);
    EXPECT_EQ(normal_deviate(14, easy, Side::lower), 0.9);
}

TEST(NormalDeviate, does_not_exist_without_variance) {
    EXPECT_FALSE(normal_deviate(10, {10, 0}, Side::two_sided));
    EXPECT_EQ(normal_p(10, {10, 0}, Side::two_sided), 1.0);
    EXPECT_EQ(normal_p(10, {10, 0}, Side::higher), 1.0);
}

// P(0.7) = 0.758036347776927 and P(0.9) = 0.815939874653241 (Abramowitz & Stegun 1964, table 26.1).
TEST(NormalP, is_the_tail_beyond_the_deviate) {
    EXPECT_NEAR(normal_p(14, easy, Side::two_sided), 2 * (1 - 0.758036347776927), 1e-14);
    EXPECT_NEAR(normal_p(14, easy, Side::higher), 1 - 0.758036347776927, 1e-14);
    EXPECT_NEAR(normal_p(14, easy, Side::lower), 0.815939874653241, 1e-14);
}

TEST(NormalP, at_the_mean_is_one_two_sided) {
    EXPECT_EQ(normal_p(10, easy, Side::two_sided), 1.0);
}

TEST(NormalP, is_never_zero) {
    EXPECT_GT(normal_p(1e6, easy, Side::two_sided), 0.0);
    EXPECT_GT(normal_p(1e6, easy, Side::higher), 0.0);
}

TEST(NormalTails, contain_the_observed_value_both) {
    const Tails tails = normal_tails(10, easy);
    EXPECT_NEAR(tails.lower, 0.539827837277029, 1e-14); // P(0.1), Abramowitz & Stegun 1964, table 26.1
    EXPECT_EQ(tails.lower, tails.upper);
}

} // namespace
} // namespace rankstead
