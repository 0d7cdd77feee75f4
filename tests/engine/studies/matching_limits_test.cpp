// interval=matching: the limits of the studies against a scan of every gap.
#include "data.h"
#include "gap_scan.h"

#include <gtest/gtest.h>

#include <algorithm>

namespace rankstead {
namespace {

using Values = std::vector<std::int64_t>;

void expect_limit(const Figure& figure, const test::ScannedLimit& expected) {
    ASSERT_EQ(figure.value.has_value(), expected.value.has_value()) << figure.reason;
    if (expected.value) {
        EXPECT_EQ(*figure.value, *expected.value);
    }
}

void expect_limits(const Outcome& outcome, const test::Scan& scan) {
    const Fraction rate = tail_rate(outcome.settings);
    const test::ScannedLimit lower = test::scanned_lower_limit(scan, rate);
    const test::ScannedLimit upper = test::scanned_upper_limit(scan, rate);
    switch (outcome.settings.side) {
    case Side::higher:
        expect_limit(outcome.lower, lower);
        EXPECT_FALSE(outcome.upper.value);
        break;
    case Side::lower:
        expect_limit(outcome.upper, upper);
        EXPECT_FALSE(outcome.lower.value);
        break;
    case Side::two_sided:
        expect_limit(outcome.lower, lower);
        expect_limit(outcome.upper, upper);
        if (lower.value) {
            EXPECT_NEAR(outcome.confidence.value.value(), 1 - 2 * std::max(lower.outside, upper.outside), 1e-14);
        }
        break;
    }
}

class MatchingLimits : public ::testing::TestWithParam<const char*> {};

TEST_P(MatchingLimits, of_the_signed_rank_test_are_those_of_a_full_scan) {
    test::Random random(51);
    for (int i = 0; i < 40; ++i) {
        const Values changes = random.wholes(random.whole(1, 8), -5, random.whole(1, 12));
        const test::Scan scan = test::scan_signed_rank(changes);
        expect_limits(test::changes(test::doubles(changes), GetParam()), scan);
        expect_limits(test::changes(test::doubles(changes), std::string(GetParam()) + "; zeros=pratt"), scan);
    }
}

TEST_P(MatchingLimits, of_the_sign_test_are_those_of_a_full_scan) {
    test::Random random(52);
    for (int i = 0; i < 40; ++i) {
        const Values changes = random.wholes(random.whole(1, 11), -5, random.whole(1, 12));
        expect_limits(test::changes(test::doubles(changes), std::string(GetParam()) + "; test=sign"),
                      test::scan_sign(changes));
    }
}

TEST_P(MatchingLimits, of_the_rank_sum_test_are_those_of_a_full_scan) {
    test::Random random(53);
    for (int i = 0; i < 40; ++i) {
        const Values first = random.wholes(random.whole(1, 5), 0, random.whole(1, 12));
        const Values second = random.wholes(random.whole(1, 5), 0, 8);
        expect_limits(test::groups(test::doubles(first), test::doubles(second), GetParam()),
                      test::scan_rank_sum(first, second));
    }
}

INSTANTIATE_TEST_SUITE_P(settings, MatchingLimits,
                         ::testing::Values("level=0.95", "level=0.9", "level=0.8", "level=0.5",
                                           "level=0.95; side=higher", "level=0.9; side=lower"));

// 3 v 3 separated: 2/20 is 0.1 exactly, so limits exist at level 0.9 and are the extreme differences.
TEST(MatchingInterval, of_three_a_group_exist_at_level_0_9) {
    const Outcome outcome = test::groups({11, 12, 14}, {1, 2, 4}, "level=0.9");
    EXPECT_EQ(outcome.lower.value, 7.0);
    EXPECT_EQ(outcome.upper.value, 13.0);
    EXPECT_EQ(outcome.confidence.value, 0.9);
    EXPECT_FALSE(test::groups({11, 12, 14}, {1, 2, 4}, "level=0.9001").lower.value);
}

TEST(MatchingInterval, of_five_pairs_end_at_level_0_9375) {
    const std::vector<double> changes{1, 2, 3, 4, 5};
    EXPECT_EQ(test::changes(changes, "level=0.9375").lower.value, 1.0);
    const Outcome outcome = test::changes(changes);
    EXPECT_FALSE(outcome.lower.value);
    EXPECT_NE(outcome.lower.reason.find("the highest level that these sizes can reach is 93.75%"), std::string::npos);
    EXPECT_FALSE(outcome.confidence.value);
}

TEST(MatchingInterval, one_sided_name_the_other_limit_as_missing) {
    const Outcome outcome = test::changes({1, 2, 3, 4, 5}, "side=higher");
    EXPECT_EQ(outcome.lower.value, 1.0);
    EXPECT_EQ(outcome.upper.reason, "with side=higher the interval has only its other limit.");
    EXPECT_EQ(outcome.confidence.value, 1 - 1.0 / 32);
}

TEST(MatchingInterval, without_ties_are_the_table_limits) {
    test::Random random(56);
    for (int i = 0; i < 60; ++i) {
        std::vector<double> first;
        std::vector<double> second;
        for (std::int64_t k = 0; k < 9; ++k) {
            // Distinct parts in the last digits keep all values and all differences apart.
            first.push_back(static_cast<double>(random.whole(0, 50) * 1000 + (1 << k)));
            second.push_back(static_cast<double>(random.whole(0, 50) * 1000 + 3 * k));
        }
        const Outcome matching = test::groups(first, second);
        const Outcome table = test::groups(first, second, "interval=table");
        EXPECT_EQ(matching.lower.value, table.lower.value);
        EXPECT_EQ(matching.upper.value, table.upper.value);
        EXPECT_EQ(test::changes(first).lower.value, test::changes(first, "interval=table").lower.value);
        EXPECT_EQ(test::changes(first).upper.value, test::changes(first, "interval=table").upper.value);
    }
}

} // namespace
} // namespace rankstead
