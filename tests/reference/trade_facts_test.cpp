// Facts every practitioner checks a new tool with. Source of all of them: common practice.
#include "inquiry.h"

#include <gtest/gtest.h>

#include <cmath>

namespace rks_test {
namespace {

std::vector<double> signs(std::size_t above, std::size_t below) {
    std::vector<double> values(above, 1.0);
    values.insert(values.end(), below, -1.0);
    return values;
}

double below_of_ten(std::size_t below) {
    return single(signs(10 - below, below), 0, {{"test", "sign"}, {"side", "lower"}}).number("p");
}

TEST(TradeFacts, sign_test_of_ten) {
    EXPECT_NEAR(below_of_ten(7), 0.172, 0.0005);
    EXPECT_NEAR(below_of_ten(8), 0.055, 0.0005);
}

TEST(TradeFacts, critical_T_of_ten_differences) {
    double critical = 0;
    ASSERT_EQ(rks_signed_rank_critical(10, 0.05, -1, &critical), RKS_OK);
    EXPECT_EQ(critical, 10);
    ASSERT_EQ(rks_signed_rank_critical(10, 0.01, -1, &critical), RKS_OK);
    EXPECT_EQ(critical, 5);
}

// T = 8: ranks 1, 3 and 4 are positive. z 1.99 is without the continuity step of 1/2, which the library takes.
TEST(TradeFacts, z_of_T_8_in_ten_differences) {
    const auto ten = single({1, -2, 3, 4, -5, -6, -7, -8, -9, -10}, 0, {{"method", "approximate"}});
    EXPECT_EQ(ten.number("statistic"), 8);
    const double step = 0.5 / std::sqrt(10.0 * 11 * 21 / 24);
    EXPECT_NEAR(std::fabs(ten.number("z")) + step, 1.99, 0.005);
}

TEST(TradeFacts, rank_sum_limits_of_8_and_10) {
    double critical = 0;
    ASSERT_EQ(rks_rank_sum_critical(8, 10, 0.05, 0, &critical), RKS_OK);
    const double ranks_of_eight = 36;
    EXPECT_EQ(critical + ranks_of_eight, 53);
    EXPECT_EQ(80 - critical + ranks_of_eight, 99);
}

// Rank sum 85 of the smaller sample, expected 76: ranks 3 5 8 10 12 14 16 17.
TEST(TradeFacts, z_of_rank_sum_85_in_8_and_10) {
    const auto inquiry =
        groups({3, 5, 8, 10, 12, 14, 16, 17}, {1, 2, 4, 6, 7, 9, 11, 13, 15, 18}, {{"method", "approximate"}});
    EXPECT_EQ(inquiry.number("statistic") + 36, 85);
    const double sd = std::sqrt(8.0 * 10 * 19 / 12);
    EXPECT_NEAR(inquiry.number("z") + 0.5 / sd, 0.8, 0.0005);
    EXPECT_NEAR(36 + inquiry.number("statistic") - (inquiry.number("z") * sd + 0.5), 76, 1e-9);
}

} // namespace
} // namespace rks_test
