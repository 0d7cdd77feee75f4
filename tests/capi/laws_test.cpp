// rks_signed_rank_tail, rks_rank_sum_tail and their critical values: bounds and refusals.
#include <rankstead.h>

#include <gtest/gtest.h>

#include <cmath>
#include <limits>

namespace rks_test {
namespace {

constexpr double nan = std::numeric_limits<double>::quiet_NaN();

rks_status signed_rank(std::size_t n, double statistic, int32_t side, double* p) {
    return rks_signed_rank_tail(n, statistic, side, p);
}

TEST(Laws, refuse_null_pointers) {
    EXPECT_EQ(rks_signed_rank_tail(5, 3, 0, nullptr), RKS_BAD_CALL);
    EXPECT_EQ(rks_rank_sum_tail(5, 5, 3, 0, nullptr), RKS_BAD_CALL);
    EXPECT_EQ(rks_signed_rank_critical(5, 0.05, 0, nullptr), RKS_BAD_CALL);
    EXPECT_EQ(rks_rank_sum_critical(5, 5, 0.05, 0, nullptr), RKS_BAD_CALL);
}

TEST(Laws, refuse_unknown_sides) {
    double out = 0;
    for (int32_t side : {-2, 2, 99, std::numeric_limits<int32_t>::min()}) {
        EXPECT_EQ(signed_rank(5, 3, side, &out), RKS_BAD_CALL);
        EXPECT_TRUE(std::isnan(out));
        EXPECT_EQ(rks_rank_sum_tail(5, 5, 3, side, &out), RKS_BAD_CALL);
        EXPECT_EQ(rks_signed_rank_critical(5, 0.05, side, &out), RKS_BAD_CALL);
        EXPECT_EQ(rks_rank_sum_critical(5, 5, 0.05, side, &out), RKS_BAD_CALL);
    }
}

TEST(Laws, refuse_statistics_out_of_range_or_not_whole) {
    double out = 0;
    for (double statistic : {-1.0, 16.0, 2.5, nan, HUGE_VAL, -HUGE_VAL, 1e300}) {
        out = 0;
        EXPECT_EQ(signed_rank(5, statistic, 0, &out), RKS_BAD_CALL) << statistic;
        EXPECT_TRUE(std::isnan(out)) << statistic;
        out = 0;
        EXPECT_EQ(rks_rank_sum_tail(5, 3, statistic, 0, &out), RKS_BAD_CALL) << statistic;
        EXPECT_TRUE(std::isnan(out)) << statistic;
    }
}

TEST(Laws, refuse_samples_of_nothing) {
    double out = 0;
    EXPECT_EQ(signed_rank(0, 0, 0, &out), RKS_NO_DATA);
    EXPECT_TRUE(std::isnan(out));
    EXPECT_EQ(rks_rank_sum_tail(0, 5, 0, 0, &out), RKS_NO_DATA);
    EXPECT_EQ(rks_rank_sum_tail(5, 0, 0, 0, &out), RKS_NO_DATA);
    EXPECT_EQ(rks_signed_rank_critical(0, 0.05, 0, &out), RKS_NO_DATA);
    EXPECT_EQ(rks_rank_sum_critical(0, 5, 0.05, 0, &out), RKS_NO_DATA);
}

TEST(Laws, refuse_levels_that_are_none) {
    double out = 0;
    for (double alpha : {0.0, 1.0, -0.1, 1.5, nan, HUGE_VAL}) {
        EXPECT_EQ(rks_signed_rank_critical(8, alpha, 0, &out), RKS_BAD_CALL) << alpha;
        EXPECT_EQ(rks_rank_sum_critical(8, 8, alpha, 0, &out), RKS_BAD_CALL) << alpha;
    }
}

TEST(Laws, give_up_on_sizes_that_would_take_too_long) {
    double out = 0;
    const std::size_t huge = std::numeric_limits<std::size_t>::max();
    for (std::size_t n : {std::size_t{4000000000}, huge / 2, huge}) {
        const rks_status one = signed_rank(n, 0, 0, &out);
        EXPECT_TRUE(one == RKS_TOO_LARGE || one == RKS_BAD_CALL) << one;
        const rks_status two = rks_rank_sum_tail(n, n, 0, 0, &out);
        EXPECT_TRUE(two == RKS_TOO_LARGE || two == RKS_BAD_CALL) << two;
        EXPECT_EQ(rks_rank_sum_critical(n, 3, 0.05, 0, &out), RKS_TOO_LARGE);
        EXPECT_EQ(rks_signed_rank_critical(n, 0.05, 0, &out), RKS_TOO_LARGE);
    }
}

// The centre of a symmetric law: p = 1 two-sided, and half of 1 and the mass one-sided; the mass is about
// 1 / sqrt(2 pi variance).
TEST(Laws, reach_a_thousand_million_values_a_side) {
    double p = 0;
    ASSERT_EQ(rks_rank_sum_tail(1000000000, 1000000000, 5e17, 0, &p), RKS_OK);
    EXPECT_EQ(p, 1);
    ASSERT_EQ(rks_rank_sum_tail(1000000000, 1000000000, 5e17, 1, &p), RKS_OK);
    EXPECT_NEAR(p, 0.5, 1e-10);
    ASSERT_EQ(rks_signed_rank_tail(1000000000, 250000000250000000.0, -1, &p), RKS_OK);
    EXPECT_NEAR(p, 0.5, 1e-10);
    ASSERT_EQ(rks_rank_sum_tail(20, 1000000000, 1e10, -1, &p), RKS_OK);
    EXPECT_NEAR(p, 0.5, 1e-7);
}

// The normal 5% point is 1.644854 (Abramowitz & Stegun 1964, table 26.1), exact to within 1/sqrt(N) of the spread.
TEST(Laws, critical_values_of_very_large_samples_are_close_to_the_normal_ones) {
    double critical = 0;
    ASSERT_EQ(rks_rank_sum_critical(100000000, 100000000, 0.05, -1, &critical), RKS_OK);
    const double spread = std::sqrt(1e16 * (2e8 + 1) / 12);
    EXPECT_NEAR((5e15 - critical) / spread, 1.644854, 1e-5);
}

TEST(Laws, ends_of_the_range_are_one_arrangement) {
    double p = 0;
    for (std::size_t n = 1; n <= 50; ++n) {
        const double largest = static_cast<double>(n * (n + 1) / 2), one = std::ldexp(1.0, -static_cast<int>(n));
        ASSERT_EQ(signed_rank(n, 0, -1, &p), RKS_OK);
        EXPECT_DOUBLE_EQ(p, one);
        ASSERT_EQ(signed_rank(n, largest, 1, &p), RKS_OK);
        EXPECT_DOUBLE_EQ(p, one);
        ASSERT_EQ(signed_rank(n, largest, -1, &p), RKS_OK);
        EXPECT_EQ(p, 1);
        ASSERT_EQ(signed_rank(n, 0, 0, &p), RKS_OK);
        EXPECT_DOUBLE_EQ(p, std::min(1.0, 2 * one));
    }
}

TEST(Laws, the_two_samples_are_mirrored) {
    for (std::size_t m = 1; m <= 7; ++m)
        for (std::size_t n = 1; n <= 9; ++n)
            for (std::size_t u = 0; u <= m * n; ++u) {
                double lower = 0, upper = 0;
                ASSERT_EQ(rks_rank_sum_tail(m, n, static_cast<double>(u), -1, &lower), RKS_OK);
                ASSERT_EQ(rks_rank_sum_tail(n, m, static_cast<double>(m * n - u), 1, &upper), RKS_OK);
                EXPECT_EQ(lower, upper) << m << ' ' << n << ' ' << u;
            }
}

// 2/20 is one tenth: the double 0.1 lies above it and 1 - 0.9 below, yet both stand for the decimal.
TEST(Laws, a_level_is_the_decimal_it_prints_to) {
    double critical = nan;
    ASSERT_EQ(rks_rank_sum_critical(3, 3, 0.1, 0, &critical), RKS_OK);
    EXPECT_EQ(critical, 0);
    ASSERT_EQ(rks_rank_sum_critical(3, 3, 0.05, -1, &critical), RKS_OK);
    EXPECT_EQ(critical, 0);
    ASSERT_EQ(rks_rank_sum_critical(3, 3, 1 - 0.9, 0, &critical), RKS_OK);
    EXPECT_EQ(critical, 0);
}

TEST(Laws, tiny_tails_are_summed_directly) {
    double p = 0;
    ASSERT_EQ(rks_rank_sum_tail(40, 40, 0, 0, &p), RKS_OK);
    EXPECT_NEAR(p, 1.8603403656036264e-23, 1e-13 * 1.86e-23) << "2 / C(80, 40)";
    ASSERT_EQ(rks_rank_sum_tail(40, 40, 1600, 1, &p), RKS_OK);
    EXPECT_NEAR(p, 1.8603403656036264e-23 / 2, 1e-13 * 0.93e-23);
    ASSERT_EQ(signed_rank(60, 1830, 0, &p), RKS_OK);
    EXPECT_DOUBLE_EQ(p, std::ldexp(1.0, -59));
}

} // namespace
} // namespace rks_test
