// studies/one_sample.h: everything but p, which one_sample_p_test.cpp enumerates.
#include "data.h"
#include "studies/studies.h"

#include <gtest/gtest.h>

#include <algorithm>
#include <cmath>

namespace rankstead {
namespace {

using Values = std::vector<std::int64_t>;

TEST(SignedRankTest, estimates_the_median_of_all_walsh_averages_zeros_included) {
    test::Random random(63);
    for (int i = 0; i < 100; ++i) {
        const Values tenths = random.wholes(random.whole(1, 11), -20, 40);
        Values sums;
        std::vector<double> changes;
        for (std::size_t a = 0; a < tenths.size(); ++a) {
            changes.push_back(static_cast<double>(tenths[a]) / 10);
            for (std::size_t b = a; b < tenths.size(); ++b) {
                sums.push_back(tenths[a] + tenths[b]);
            }
        }
        std::sort(sums.begin(), sums.end());
        // Twice the median of the sums is four times that of the averages, in tenths; one division rounds once.
        const std::int64_t doubled = sums[(sums.size() - 1) / 2] + sums[sums.size() / 2];
        EXPECT_EQ(test::changes(changes).estimate, static_cast<double>(doubled) / 40);
    }
}

TEST(SignTest, estimates_the_sample_median) {
    EXPECT_EQ(test::changes({0.1, 0.2, 0.4, 7}, "test=sign").estimate, 0.3);
    EXPECT_EQ(test::changes({0.1, 0.2, 7}, "test=sign").estimate, 0.2);
}

// 0.3 - 0.1 and 0.9 - 0.7 differ in binary; in decimal both are 0.2 and tie (pathology of binary subtraction).
TEST(SignedRankTest, ties_equal_decimal_differences) {
    const Block before = test::column("before", {0.1, 0.7, 1, 1});
    const Block after = test::column("after", {0.3, 0.9, 0.5, 2});
    ASSERT_NE(0.3 - 0.1, 0.9 - 0.7);
    const Outcome outcome = run_pairs({&before, &after}, {});
    EXPECT_EQ(outcome.tied, 2U);
    EXPECT_EQ(outcome.statistic, 1.5 + 1.5 + 4);
}

TEST(SignedRankTest, counts_zeros_ties_and_values) {
    const Outcome outcome = test::changes({0, 0, 1, -1, 2, 3, 3});
    EXPECT_EQ(outcome.n, 7U);
    EXPECT_EQ(outcome.zeros, 2U);
    EXPECT_EQ(outcome.tied, 4U);
}

TEST(SignedRankTest, smallest_p_is_two_in_two_to_the_n_of_the_values_that_are_not_zero) {
    EXPECT_EQ(test::changes({0, 1, 2, 3, -4, 5}).smallest_p, 2.0 / 32);
    EXPECT_EQ(test::changes({0, 0}).smallest_p, 1.0);
    EXPECT_EQ(test::changes({7}).smallest_p, 1.0);
}

TEST(SignedRankTest, arrangements_count_the_signs_at_least_as_extreme) {
    // n = 10, T- = 8: 25 sign patterns have a sum of at most 8 (the partitions of 0 to 8 into different parts).
    const std::vector<double> changes{1, 2, -3, 4, -5, 6, 7, 8, 9, 10};
    EXPECT_EQ(test::changes(changes, "side=higher").arrangements, "25 of 1,024");
    EXPECT_EQ(test::changes(changes).arrangements, "50 of 1,024");
    EXPECT_EQ(test::changes(changes).p, 50.0 / 1024);
}

TEST(SignedRankTest, of_changes_that_are_all_zero_has_p_one) {
    for (const char* settings : {"zeros=drop", "zeros=pratt", "test=sign"}) {
        const Outcome outcome = test::changes({0, 0, 0}, settings);
        EXPECT_EQ(outcome.p, 1.0) << settings;
        EXPECT_EQ(outcome.estimate, 0.0) << settings;
        EXPECT_EQ(outcome.chance, 0.5) << settings;
    }
}

// 15 rises, 40 unchanged and 15 equal falls: nothing points either way.
TEST(SignedRankTest, under_pratt_is_not_misled_by_many_zeros) {
    std::vector<double> changes(40, 0.0);
    changes.insert(changes.end(), 15, 1.0);
    changes.insert(changes.end(), 15, -1.0);
    EXPECT_EQ(test::changes(changes, "zeros=pratt").p, 1.0);
}

TEST(SignedRankTest, tests_the_margin) {
    const std::vector<double> changes{2.5, 3.5, 4.5, 5.5, 6.5, 7.5};
    const std::vector<double> lowered{-0.5, 0.5, 1.5, 2.5, 3.5, 4.5};
    EXPECT_EQ(test::changes(changes, "margin=3").p, test::changes(lowered).p);
    EXPECT_EQ(test::changes(changes, "margin=3").estimate, test::changes(changes).estimate);
}

TEST(SignedRankTest, exact_p_has_an_accuracy_and_no_z) {
    const Outcome outcome = test::changes({1, 2, 3, -4});
    EXPECT_TRUE(outcome.exact);
    EXPECT_FALSE(outcome.z);
    EXPECT_LT(outcome.relative_error.value(), 1e-13);
}

// n = 10, T+ = 47: z = (47 - 27.5 - 0.5) / sqrt(96.25).
TEST(SignedRankTest, approximate_p_comes_from_the_deviate) {
    const Outcome outcome = test::changes({1, 2, -3, 4, -5, 6, 7, 8, 9, 10}, "method=approximate");
    EXPECT_FALSE(outcome.exact);
    EXPECT_NEAR(outcome.z.value(), 19 / std::sqrt(96.25), 1e-15);
    EXPECT_NEAR(outcome.p, std::erfc(19 / std::sqrt(96.25) / std::sqrt(2.0)), 1e-15);
    EXPECT_FALSE(outcome.relative_error);
}

TEST(SignTest, approximate_p_comes_from_the_deviate) {
    const Outcome outcome = test::changes({1, 1, 1, 1, 1, 1, 1, -1, -1}, "test=sign; method=approximate");
    EXPECT_NEAR(outcome.z.value(), 2.0 / 1.5, 1e-15); // (7 - 4.5 - 0.5) / (3 / 2)
}

TEST(SignedRankTest, is_exact_with_a_hundred_and_fifty_thousand_differences) {
    test::Random random(64);
    const Outcome outcome = test::changes(random.numbers(150000, -900000000, 1000000000));
    EXPECT_TRUE(outcome.exact);
    EXPECT_LE(outcome.relative_error.value(), 1e-10);
    EXPECT_LT(*outcome.lower.value, outcome.estimate);
    EXPECT_GT(*outcome.upper.value, outcome.estimate);
}

TEST(SignedRankTest, falls_back_to_the_saddlepoint_where_the_exact_law_would_take_too_long) {
    test::Random random(65);
    const Outcome outcome = test::changes(random.numbers(1000000, -5, 5));
    EXPECT_FALSE(outcome.exact);
    EXPECT_EQ(outcome.law, LawKind::saddlepoint);
    EXPECT_TRUE(outcome.observations.exact_wanted_but_too_long);
}

TEST(SignTest, is_exact_at_any_size) {
    std::vector<double> changes(5000, 1.0);
    std::fill(changes.begin(), changes.begin() + 2400, -1.0);
    EXPECT_TRUE(test::changes(changes, "test=sign").exact);
}

TEST(SignedRankTest, of_sixty_rises_is_two_to_the_minus_fifty_nine) {
    std::vector<double> changes;
    for (int i = 1; i <= 60; ++i) {
        changes.push_back(i);
    }
    EXPECT_EQ(test::changes(changes).p, std::ldexp(1.0, -59));
}

// The chance of a rise: 4 of 6, and one zero counted half.
TEST(Chance, counts_rises_and_half_of_the_zeros) {
    EXPECT_EQ(test::changes({1, 2, 3, 4, -1, 0}).chance, 4.5 / 6);
}

// Clopper & Pearson (1934), 0 of 6: the upper limit is 1 - 0.025^(1/6).
TEST(Chance, has_clopper_pearson_limits) {
    const Outcome outcome = test::changes({-1, -2, -3, -4, -5, -6});
    EXPECT_EQ(outcome.chance_lower.value, 0.0);
    EXPECT_NEAR(outcome.chance_upper.value.value(), 1 - std::pow(0.025, 1.0 / 6), 1e-14);
}

// Reversing every sign swaps the sides and mirrors the limits.
TEST(OneSample, reversed_is_mirrored_exactly) {
    test::Random random(65);
    for (int i = 0; i < 40; ++i) {
        const Values changes = random.wholes(random.whole(6, 30), -6, 9);
        Values reversed;
        for (const std::int64_t change : changes) {
            reversed.push_back(-change);
        }
        for (const std::string settings : {"zeros=pratt", "zeros=drop", "test=sign"}) {
            const Outcome one = test::changes(test::doubles(changes), settings);
            const Outcome other = test::changes(test::doubles(reversed), settings);
            EXPECT_EQ(one.p, other.p);
            EXPECT_EQ(one.estimate, -other.estimate);
            EXPECT_EQ(one.lower.value.value(), -other.upper.value.value());
            EXPECT_EQ(one.upper.value.value(), -other.lower.value.value());
            EXPECT_EQ(test::changes(test::doubles(changes), settings + "; side=higher").p,
                      test::changes(test::doubles(reversed), settings + "; side=lower").p);
        }
    }
}

TEST(OneSample, of_1e308_beside_5e_324_keeps_every_value_apart) {
    const Outcome outcome = test::single({1e308, -1e308, 5e-324}, 0);
    EXPECT_EQ(outcome.zeros, 0U);
    EXPECT_EQ(outcome.tied, 2U);
    EXPECT_EQ(outcome.statistic, 1 + 2.5);
    EXPECT_EQ(outcome.first.description.median, 5e-324);
    EXPECT_EQ(outcome.first.description.lower_quartile, -5e307);
}

// Twenty-four digits between the largest and the finest: beyond 64 bits.
TEST(OneSample, of_many_decimals_is_exact) {
    const Outcome outcome = test::single({1e9, 1e-15, 2e-15, 3e-15}, 0, "test=sign");
    EXPECT_EQ(outcome.estimate, 2.5e-15);
    const Outcome ranked = test::single({1e9, -1e9, 1e-15, 2e-15}, 0);
    EXPECT_EQ(ranked.statistic, 3.5 + 1 + 2);
    // The ten averages: of +-1e9, 0 with each other; the middle two of all are 1e-15 and 1.5e-15.
    EXPECT_EQ(ranked.estimate, 1.25e-15);
}

} // namespace
} // namespace rankstead
