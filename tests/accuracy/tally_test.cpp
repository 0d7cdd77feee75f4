// That a broken bound would not pass unnoticed.
#include "tally.h"

#include <gtest/gtest.h>

#include <cmath>
#include <limits>

namespace rankstead::accuracy {
namespace {

const BigTails exact{3, 13, 16}; // tails 3/16 and 13/16

Tails stated(double lower, double upper, double bound) {
    Tails tails;
    tails.lower = lower;
    tails.upper = upper;
    tails.relative_error = bound;
    return tails;
}

std::size_t wrong_of(const Tails& tails, const BigTails& truth) {
    Tally tally;
    tally.compare(tails, truth, "a case");
    return tally.wrong.size();
}

TEST(Tally, takes_an_error_within_its_bound) {
    EXPECT_EQ(wrong_of(stated(0.1875, 0.8125, 0), exact), 0U);
    EXPECT_EQ(wrong_of(stated(0.1875 * (1 + 1e-12), 0.8125, 2e-12), exact), 0U);
    EXPECT_EQ(wrong_of(stated(0.8125, 0.1875, 0), swapped(exact)), 0U);
}

TEST(Tally, finds_an_error_beyond_its_bound_in_either_tail) {
    EXPECT_EQ(wrong_of(stated(0.1875 * (1 + 2e-12), 0.8125, 1e-12), exact), 1U);
    EXPECT_EQ(wrong_of(stated(0.8125, 0.1875 * (1 - 2e-12), 1e-12), swapped(exact)), 1U);
    EXPECT_EQ(wrong_of(stated(0.1875, 0.8125 + 2e-13, 1e-12), exact), 1U);
}

TEST(Tally, finds_a_bound_that_is_of_no_use) {
    EXPECT_EQ(wrong_of(stated(0.1875, 0.8125, 2e-10), exact), 1U);
    EXPECT_EQ(wrong_of(stated(0.1875, 0.8125, std::numeric_limits<double>::infinity()), exact), 1U);
    EXPECT_EQ(wrong_of(stated(std::nan(""), 0.8125, 1e-12), exact), 1U);
    EXPECT_EQ(wrong_of(stated(0.1875, 0.8125, std::nan("")), exact), 1U);
}

// 1 / 2^1100 is below the smallest double.
TEST(Tally, lets_a_tail_that_no_double_holds_have_no_useful_bound) {
    BigTails tiny{1, 1, 1};
    tiny.total <<= 1100;
    tiny.upper = tiny.total;
    EXPECT_EQ(wrong_of(stated(0, 1, std::numeric_limits<double>::infinity()), tiny), 0U);
    EXPECT_EQ(wrong_of(stated(0, 1, 1e-11), tiny), 1U);
    Tally tally;
    tally.count_case(tiny);
    EXPECT_EQ(tally.cases, 0);
    EXPECT_EQ(tally.below_doubles, 1);
}

} // namespace
} // namespace rankstead::accuracy
