// laws/tails.h: what every law gives.
#include "laws/tails.h"

#include <gtest/gtest.h>

#include <cmath>

namespace rankstead {
namespace {

Tails of(double lower, double upper) {
    Tails tails;
    tails.lower = lower;
    tails.upper = upper;
    return tails;
}

TEST(PValue, is_the_tail_of_its_side) {
    EXPECT_EQ(p_value(of(0.3, 0.8), Side::lower), 0.3);
    EXPECT_EQ(p_value(of(0.3, 0.8), Side::higher), 0.8);
}

TEST(PValue, is_twice_the_smaller_tail_two_sided_and_never_above_one) {
    EXPECT_EQ(p_value(of(0.3, 0.8), Side::two_sided), 0.6);
    EXPECT_EQ(p_value(of(0.8, 0.25), Side::two_sided), 0.5);
    EXPECT_EQ(p_value(of(0.515, 0.6), Side::two_sided), 1.0);
}

TEST(PValue, is_never_zero) {
    EXPECT_GT(p_value(of(0, 1), Side::two_sided), 0.0);
    EXPECT_GT(p_value(of(1, 0), Side::higher), 0.0);
}

TEST(PCount, counts_the_arrangements_of_its_side) {
    const Tails tails = from_counts({3, 19, 20});
    EXPECT_EQ(p_count(tails, Side::lower), 3U);
    EXPECT_EQ(p_count(tails, Side::higher), 19U);
    EXPECT_EQ(p_count(tails, Side::two_sided), 6U);
    EXPECT_EQ(p_count(from_counts({12, 12, 20}), Side::two_sided), 20U);
}

TEST(FromCounts, divides) {
    const Tails tails = from_counts({43, 1000, 1024});
    EXPECT_EQ(tails.lower, 43.0 / 1024);
    EXPECT_EQ(tails.upper, 1000.0 / 1024);
}

TEST(Swapped, exchanges_the_tails_and_their_counts) {
    const Tails tails = from_counts({1, 19, 20}).swapped();
    EXPECT_EQ(tails.lower, 0.95);
    EXPECT_EQ(tails.upper, 0.05);
    EXPECT_EQ(tails.counts->upper, 1U);
}

// 1/20 is at most 1/20 but 0.05000000000000001 as a quotient of doubles might not be: the comparison is in integers.
TEST(AtMost, compares_counts_as_integers) {
    for (std::uint64_t k = 1; k <= 20; ++k) {
        const Tails tails = from_counts({k, 20, 20 * k});
        EXPECT_TRUE(lower_at_most(tails, {5, 100})) << k;
        EXPECT_FALSE(lower_at_most(tails, {49'999'999'999'999'999, 1'000'000'000'000'000'000})) << k;
    }
}

TEST(AtMost, does_not_overflow_with_counts_of_63_bits) {
    const std::uint64_t total = std::uint64_t{1} << 62;
    EXPECT_TRUE(upper_at_most(from_counts({0, total / 4, total}), {25, 100}));
    EXPECT_FALSE(upper_at_most(from_counts({0, total / 4 + 1, total}), {25, 100}));
    EXPECT_TRUE(upper_at_most(from_counts({0, total, total}), {999'999'999'999'999, 999'999'999'999'999}));
}

TEST(AtMost, compares_probabilities_where_nothing_was_counted) {
    EXPECT_TRUE(upper_at_most(of(1, 0.025), {25, 1000}));
    EXPECT_FALSE(upper_at_most(of(1, 0.0251), {25, 1000}));
    EXPECT_TRUE(lower_at_most(of(0.01, 1), {25, 1000}));
}

TEST(FromLower, states_a_bound_only_for_what_a_double_can_hold) {
    EXPECT_EQ(from_lower(LawKind::summed, 0.1, 0.95, 1e-12).relative_error, 1e-12);
    EXPECT_TRUE(std::isinf(from_lower(LawKind::summed, 1e-310, 1, 1e-12).relative_error));
    EXPECT_EQ(from_lower(LawKind::closed, 0.1, 1 + 1e-15, 0).upper, 1);
}

TEST(Levelled, has_equal_tails_at_the_centre_only) {
    const Tails tails = from_lower(LawKind::summed, 0.5078125, 0.5078126, 1e-12);
    EXPECT_EQ(levelled(tails, true).upper, tails.lower);
    EXPECT_EQ(levelled(tails, false).upper, tails.upper);
}

} // namespace
} // namespace rankstead
