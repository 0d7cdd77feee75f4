// Sizes up to five million: right, or said why not. Expected values from closed formulas written beside them.
#include "inquiry.h"
#include "random_data.h"

#include <gtest/gtest.h>

#include <cmath>
#include <string>

namespace rks_test {
namespace {

// 0, 1, ... levels - 1 over and over, moved.
std::vector<double> in_turn(std::size_t count, std::size_t levels, double first = 0) {
    std::vector<double> values;
    values.reserve(count);
    for (std::size_t i = 0; i < count; ++i)
        values.push_back(first + static_cast<double>(i % levels));
    return values;
}

// t^3 - t, which passes 2^63 at t = 2.1 million.
double cubed_less_self(double t) {
    return t * t * t - t;
}

// Levels 0 to 4, 200,000 of each, against 0 to 3, 250,000 of each: a value v exceeds 250,000 v of the others and ties
// with 250,000 unless it is 4.
TEST(MillionsOfValues, likert_answers_by_the_tie_corrected_normal_law) {
    const auto inquiry = groups(in_turn(million, 5), in_turn(million, 4), {{"method", "approximate"}});
    const double u = 200'000 * (250'000.0 * (0 + 1 + 2 + 3 + 4) + 125'000.0 * 4);
    const double n = 1e6, all = 2e6;
    const double ties = 4 * cubed_less_self(450'000) + cubed_less_self(200'000);
    const double variance = n * n / 12 * (all + 1 - ties / (all * (all - 1)));
    EXPECT_EQ(inquiry.number("statistic"), u);
    EXPECT_NEAR(inquiry.number("z"), (u - n * n / 2 - 0.5) / std::sqrt(variance), 1e-8);
    EXPECT_EQ(inquiry.number("tied"), all);
    EXPECT_DOUBLE_EQ(inquiry.number("chance"), 0.6);
}

// -1 to 3, 200,000 of each: sizes 1, 2 and 3 have 400,000, 200,000 and 200,000 members.
TEST(MillionsOfValues, signed_ranks_by_the_tie_corrected_normal_law) {
    const auto inquiry = single(in_turn(million, 5, -1), 0, {{"method", "approximate"}});
    const double ranks = 200'000.5 + (400'000 + 100'000.5) + (600'000 + 100'000.5);
    const double n = 800'000;
    const double ties = cubed_less_self(400'000) + 2 * cubed_less_self(200'000);
    const double variance = n * (n + 1) * (2 * n + 1) / 24 - ties / 48;
    EXPECT_EQ(inquiry.number("statistic"), 200'000 * ranks);
    EXPECT_EQ(inquiry.number("zeros"), 200'000);
    EXPECT_NEAR(inquiry.number("z"), (200'000 * ranks - n * (n + 1) / 4 - 0.5) / std::sqrt(variance), 1e-8);
    EXPECT_EQ(inquiry.number("estimate"), 1);
}

// One tie group of three million: t^3 is 2.7e19, beyond 64 bits, and the variance exactly 0.
TEST(MillionsOfValues, all_equal_in_both_groups) {
    for (const char* method : {"auto", "approximate"}) {
        const std::vector<double> equal(1'500'000, 7.25);
        const auto inquiry = groups(equal, equal, {{"method", method}});
        EXPECT_EQ(inquiry.number("p"), 1) << method;
        EXPECT_EQ(inquiry.text("z"), "") << method;
        EXPECT_EQ(inquiry.number("chance"), 0.5) << method;
        EXPECT_EQ(inquiry.number("tied"), 3e6) << method;
        EXPECT_EQ(inquiry.number("estimate"), 0) << method;
        EXPECT_EQ(inquiry.number("lower"), 0) << method;
        EXPECT_EQ(inquiry.number("upper"), 0) << method;
        EXPECT_NE(inquiry.text("notes").find("All values are equal"), std::string::npos) << method;
    }
}

TEST(MillionsOfValues, all_equal_to_the_reference) {
    const auto inquiry = single(std::vector<double>(million, 7.25), 7.25);
    EXPECT_EQ(inquiry.number("p"), 1);
    EXPECT_EQ(inquiry.number("zeros"), 1e6);
    EXPECT_EQ(inquiry.number("estimate"), 7.25);
    EXPECT_EQ(inquiry.number("lower"), 7.25);
    EXPECT_EQ(inquiry.number("upper"), 7.25);
}

TEST(MillionsOfValues, no_pair_changed) {
    const auto same = in_turn(million, 1000);
    const auto inquiry = pairs(same, same);
    EXPECT_EQ(inquiry.number("p"), 1);
    EXPECT_EQ(inquiry.number("zeros"), 1e6);
    EXPECT_EQ(inquiry.number("upper"), 0);
}

// x between the 250,000th and the next of 1 to 10^6: under the null hypothesis its place is any of 1,000,001. At most
// 25,000 differences may be cut off at either end, for 25,000 / 1,000,001 is below 0.025 and 25,001 / 1,000,001 is not.
TEST(MillionsOfValues, one_value_against_a_million) {
    const auto inquiry = groups({250'000.5}, in_turn(million, million, 1));
    EXPECT_EQ(inquiry.number("statistic"), 250'000);
    EXPECT_NEAR(inquiry.number("p"), 2 * 250'001.0 / 1'000'001, 1e-10);
    EXPECT_EQ(inquiry.number("estimate"), -250'000);
    EXPECT_EQ(inquiry.number("lower"), 250'000.5 - 975'001);
    EXPECT_EQ(inquiry.number("upper"), 250'000.5 - 25'000);
    EXPECT_NEAR(inquiry.number("smallest p"), 2 / 1'000'001.0, 1e-16);
}

TEST(MillionsOfValues, a_million_against_one_value_turns_everything_around) {
    const auto inquiry = groups(in_turn(million, million, 1), {250'000.5});
    EXPECT_EQ(inquiry.number("statistic"), 750'000);
    EXPECT_NEAR(inquiry.number("p"), 2 * 250'001.0 / 1'000'001, 1e-10);
    EXPECT_EQ(inquiry.number("lower"), 25'000 - 250'000.5);
    EXPECT_EQ(inquiry.number("upper"), 975'001 - 250'000.5);
}

// 3 among 200,000 each of 0 to 4: it shares its rank with 200,000 and 200,000 are above, out of 1,000,001 places.
TEST(MillionsOfValues, one_value_against_a_million_with_ties) {
    const auto inquiry = groups({3}, in_turn(million, 5));
    EXPECT_EQ(inquiry.number("statistic"), 700'000);
    EXPECT_NEAR(inquiry.number("p"), 2 * 400'001.0 / 1'000'001, 1e-9);
    EXPECT_EQ(inquiry.number("estimate"), 1);
}

// The variance of the normal law of one against many is that of an even spread, whose ends are sqrt(3) deviations out:
// no 95% limits, and 1 - 2 * (1 - Phi(sqrt(3))) = 0.9167 is as far as it goes.
TEST(MillionsOfValues, limits_that_the_normal_law_cannot_give_name_the_level_that_it_can) {
    const auto inquiry = groups({250'000.5}, in_turn(million, million, 1), {{"method", "approximate"}});
    EXPECT_EQ(inquiry.status("lower"), RKS_NO_ANSWER);
    EXPECT_NE(inquiry.text("check").find("91.67%"), std::string::npos) << inquiry.text("check");
    const auto lower_level =
        groups({250'000.5}, in_turn(million, million, 1), {{"method", "approximate"}, {"level", "0.9"}});
    EXPECT_EQ(lower_level.status("lower"), RKS_OK);
}

// 0 to n - 1 moved by 1,000 against 0 to n - 1: the middle difference is 1,000, and U = #(d < 1000) + half of #(d = 0).
TEST(MillionsOfValues, five_million_a_side) {
    constexpr std::size_t n = 5'000'000;
    const auto inquiry = groups(in_turn(n, n, 1'000), in_turn(n, n), {{"method", "approximate"}});
    const double size = n;
    const double above =
        size * size - (size - 1'000) * (size - 1'001) / 2 - (size - 1'000); // x <= y: n - 1,000 - k ways
    EXPECT_EQ(inquiry.number("statistic"), above + (size - 1'000) / 2);
    EXPECT_EQ(inquiry.number("estimate"), 1'000);
    EXPECT_EQ(inquiry.number("upper") - 1'000, 1'000 - inquiry.number("lower"));
    const double variance = size * size / 12 * (2 * size + 1 - (size - 1'000) * 6 / (2 * size * (2 * size - 1)));
    const double distance = inquiry.number("statistic") - size * size / 2;
    EXPECT_NEAR(inquiry.number("z"), (distance - 0.5) / std::sqrt(variance), 1e-9);
}

// Of n values 0 to n - 1 the middle Walsh average is (n - 1) / 2; all but the first exceed the reference 0.
TEST(MillionsOfValues, five_million_single_values) {
    constexpr std::size_t n = 5'000'000;
    const auto inquiry = single(in_turn(n, n), 0, {{"method", "approximate"}, {"zeros", "pratt"}});
    EXPECT_EQ(inquiry.number("statistic"), (n + 1.0) * n / 2 - 1) << "all ranks but that of the zero";
    EXPECT_EQ(inquiry.number("estimate"), (n - 1.0) / 2);
    EXPECT_EQ(inquiry.number("upper") - (n - 1.0) / 2, (n - 1.0) / 2 - inquiry.number("lower"));
    EXPECT_LT(inquiry.number("p"), 1e-300);
    EXPECT_GT(inquiry.number("p"), 0);
}

} // namespace
} // namespace rks_test
