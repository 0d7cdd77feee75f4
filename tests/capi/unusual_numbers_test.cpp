// Numbers that are not ordinary. Row numbers as in degenerate_samples_test.cpp.
#include "inquiry.h"
#include "random_data.h"

#include <gtest/gtest.h>

#include <cmath>
#include <limits>

#if defined(__SSE2__)
#include <xmmintrin.h>
#endif

namespace rks_test {
namespace {

constexpr double huge = 1e308;
constexpr double smallest_denormal = std::numeric_limits<double>::denorm_min();

// #14448, #4067, #17731: ranked as the largest value.
TEST(UnusualNumbers, B13_not_a_number_is_refused) {
    Inquiry inquiry("groups");
    inquiry.numbers("first", {1, 2, std::nan(""), 4});
    inquiry.numbers("second", {1, 2});
    EXPECT_EQ(inquiry.run(), RKS_BAD_DATA);
    ASSERT_TRUE(inquiry.where().has_value());
    EXPECT_EQ(inquiry.where()->row, 3U);
}

// #20386: a check by summing misses +inf together with -inf.
TEST(UnusualNumbers, B14_infinities_are_refused) {
    Inquiry inquiry("groups");
    inquiry.numbers("first", {1, HUGE_VAL});
    inquiry.numbers("second", {2, -HUGE_VAL, 3});
    EXPECT_EQ(inquiry.run(), RKS_BAD_DATA);
    ASSERT_TRUE(inquiry.where().has_value());
    EXPECT_EQ(inquiry.where()->argument, "first");
    EXPECT_EQ(inquiry.where()->row, 2U);
}

// Differences of 2e308 and 1.9e308 overflow: they must neither tie nor be infinite.
TEST(UnusualNumbers, B15_differences_that_overflow) {
    Inquiry inquiry("pairs");
    inquiry.numbers("before", {-huge, -0.9e308, 1, 5});
    inquiry.numbers("after", {huge, huge, 2, 1});
    const rks_status status = inquiry.run();
    if (status == RKS_OK) {
        EXPECT_EQ(inquiry.number("statistic"), 8) << "ranks 4, 3 and 1 rise, rank 2 falls";
        EXPECT_DOUBLE_EQ(inquiry.number("p"), 6.0 / 16);
    } else {
        EXPECT_EQ(status, RKS_BAD_DATA) << inquiry.message();
        EXPECT_TRUE(inquiry.where().has_value());
    }
}

TEST(UnusualNumbers, B15_the_mean_of_two_huge_values) {
    EXPECT_EQ(groups({1.7e308, 1.7e308}, {0, 0}).number("estimate"), 1.7e308);
    EXPECT_EQ(groups({1.6e308, 1.7e308}, {0}).number("estimate"), 1.65e308);
    EXPECT_EQ(groups({1.6e308, 1.7e308}, {0}).number("median first"), 1.65e308);
}

void expect_denormals_are_numbers() {
    const auto inquiry = single({smallest_denormal, 2 * smallest_denormal, -3 * smallest_denormal}, 0);
    EXPECT_EQ(inquiry.number("zeros"), 0);
    EXPECT_EQ(inquiry.number("statistic"), 3) << "ranks 1 and 2 are positive";
    EXPECT_EQ(inquiry.number("p"), 1);
    EXPECT_EQ(inquiry.number("tied"), 0);
}

TEST(UnusualNumbers, B16_denormals_are_distinct_and_not_zero) {
    expect_denormals_are_numbers();
}

#if defined(__SSE2__)
// A host may set the processor to take denormals for zeros.
TEST(UnusualNumbers, B16_denormals_under_a_host_that_flushes_them) {
    const unsigned before = _mm_getcsr();
    constexpr unsigned flush_to_zero = 0x8000, denormals_are_zeros = 0x0040;
    _mm_setcsr(before | flush_to_zero | denormals_are_zeros);
    const auto statistic = single({smallest_denormal, 2 * smallest_denormal, -3 * smallest_denormal}, 0);
    _mm_setcsr(before);
    EXPECT_EQ(statistic.number("zeros"), 0);
    EXPECT_EQ(statistic.number("statistic"), 3);
}
#endif

TEST(UnusualNumbers, B17_minus_zero_is_zero) {
    const auto inquiry = single({-0.0, 0.0, 1, 2}, 0);
    EXPECT_EQ(inquiry.number("zeros"), 2);
    const auto tied = groups({-0.0, 1, 2}, {0.0, 0.0, 5});
    EXPECT_EQ(tied.number("statistic"), 5) << "1 + 2 + 2 * 1 above, two halves for the ties of the zeros";
    EXPECT_EQ(groups({-0.0, -0.0}, {0.0, 0.0}).text("median first"), "0");
    EXPECT_EQ(single({-0.0}, 0.0).text("estimate"), "0");
}

// Naive binary differences give T- = 2 and p = .625.
TEST(UnusualNumbers, B18_decimals_that_tie_on_paper) {
    const auto inquiry = pairs({.1, .7, .9, .1}, {.3, .9, .7, .4});
    EXPECT_EQ(inquiry.number("statistic"), 8);
    EXPECT_EQ(inquiry.number("p"), 0.5);
    EXPECT_EQ(inquiry.number("tied"), 3);
}

// #17667: ranks 1 3 3 3, T+ = 6 and p = .5; measured 5 and .5625.
TEST(UnusualNumbers, B18_differences_of_fortieths) {
    const auto inquiry = pairs({.525, .775, .325, .55}, {.5, .825, .375, .5}, {{"side", "higher"}});
    EXPECT_EQ(inquiry.number("statistic"), 6);
    EXPECT_EQ(inquiry.number("p"), 0.5);
}

TEST(UnusualNumbers, B19_equal_on_paper_but_not_in_binary) {
    const auto inquiry = pairs({0.3, 1, 2}, {0.1 + 0.2, 2, 4});
    EXPECT_EQ(inquiry.number("zeros"), 1);
    const auto two = groups({0.1 + 0.2, 1.1 + 2.2}, {0.3, 3.3});
    EXPECT_EQ(two.number("p"), 1);
    EXPECT_EQ(two.number("statistic"), 2);
    EXPECT_EQ(two.number("estimate"), 0);
}

// A digit beyond the fifteenth cannot be told apart: no guess, a tie.
TEST(UnusualNumbers, B20_differences_below_the_precision_of_the_values) {
    const auto inquiry = groups({1e15 + 0.25, 1e15 + 1}, {1e15, 1e15 + 2});
    EXPECT_EQ(inquiry.number("chance"), 0.5);
    EXPECT_EQ(inquiry.number("p"), 1);
}

// 1,800 Likert answers: sums of t^3 pass 2^31, and a factor turned negative (#4017, #3611).
TEST(UnusualNumbers, B21_tie_sums_beyond_32_bits) {
    std::vector<double> first, second;
    for (std::size_t i = 0; i < 1800; ++i) {
        first.push_back(static_cast<double>(i % 5));
        second.push_back(static_cast<double>(i % 3));
    }
    const auto inquiry = groups(first, second, {{"method", "approximate"}});
    const double ties = 3 * (960.0 * 960 * 960 - 960) + 2 * (360.0 * 360 * 360 - 360);
    const double sd = std::sqrt(1800.0 * 1800 / 12 * (3601 - ties / (3600.0 * 3599)));
    const double u = 360.0 * (300 + 900 + 1500 + 1800 + 1800), mean = 1800.0 * 1800 / 2;
    EXPECT_EQ(inquiry.number("statistic"), u);
    EXPECT_NEAR(inquiry.number("z"), (u - mean - 0.5) / sd, 1e-12 * (u - mean) / sd);
}

// #14622, #19692: recursion limit and memory.
TEST(UnusualNumbers, B22_very_unbalanced_sizes_are_exact) {
    std::vector<double> second;
    for (int i = 1; i <= 500; ++i)
        second.push_back(i);
    const auto inquiry = groups({501, 502, 503, 504, 505}, second, {{"method", "exact"}});
    const double total = 505.0 * 504 * 503 * 502 * 501 / 120;
    EXPECT_NEAR(inquiry.number("p"), 2 / total, 1e-13 * 2 / total);
    double p = 0;
    const rks_status status = rks_rank_sum_tail(5, 5000, 0, -1, &p);
    const double larger = 5005.0 * 5004 * 5003 * 5002 * 5001 / 120;
    if (status != RKS_TOO_LARGE) {
        EXPECT_EQ(status, RKS_OK);
        EXPECT_NEAR(p, 1 / larger, 1e-13 / larger);
    }
}

std::vector<double> run_of(double start, int count) {
    std::vector<double> values;
    for (int i = 0; i < count; ++i)
        values.push_back(start + i);
    return values;
}

// #26026: p = 0 for a true 8.1e-17.
TEST(UnusualNumbers, B23_tiny_p_is_summed_from_its_own_tail) {
    EXPECT_DOUBLE_EQ(single(run_of(1, 60), 0).number("p"), std::ldexp(1.0, -59));
    const double separated = 1.8603403656036264e-23; // 2 / C(80, 40)
    EXPECT_NEAR(groups(run_of(1, 40), run_of(101, 40)).number("p"), separated, 1e-13 * separated);
}

// PR #26030: 1.0000000000000002.
TEST(UnusualNumbers, B24_p_is_never_above_1) {
    RandomData random(31);
    for (int round = 0; round < 500; ++round) {
        const auto size = static_cast<std::size_t>(random.between(1, 20));
        const auto values = doubles(random.tied(size)), others = doubles(random.tied(size));
        for (const char* method : {"exact", "approximate"})
            for (const char* side : {"two-sided", "higher", "lower"}) {
                const Settings settings = {{"method", method}, {"side", side}};
                for (const double p :
                     {groups(values, others, settings).number("p"), pairs(values, others, settings).number("p")})
                    EXPECT_TRUE(p > 0 && p <= 1) << p;
            }
    }
}

} // namespace
} // namespace rks_test
