// studies/groups.cpp: the rank sum test against plain enumeration of the same definition.
#include "data.h"
#include "enumeration.h"
#include "studies/studies.h"

#include <gtest/gtest.h>

#include <algorithm>
#include <cmath>

namespace rankstead {
namespace {

using Values = std::vector<std::int64_t>;

struct PlainRankSum {
    test::Enumerated law;
    std::int64_t observed = 0;
};

PlainRankSum plain_rank_sum(const Values& first, const Values& second) {
    Values pooled(first);
    pooled.insert(pooled.end(), second.begin(), second.end());
    const Values ranks = test::doubled_midranks(pooled);
    PlainRankSum plain{test::every_choice(ranks, first.size()), 0};
    for (std::size_t i = 0; i < first.size(); ++i) {
        plain.observed += ranks[i];
    }
    return plain;
}

TEST(Groups, have_the_p_of_every_choice) {
    test::Random random(71);
    for (int i = 0; i < 150; ++i) {
        const Values first = random.wholes(random.whole(1, 6), 0, random.whole(1, 12));
        const Values second = random.wholes(random.whole(1, 6), 0, 8);
        const auto [law, observed] = plain_rank_sum(first, second);
        const double higher = law.upper(observed);
        const double lower = law.lower(observed);
        EXPECT_EQ(test::groups(test::doubles(first), test::doubles(second)).p,
                  std::min(1.0, 2 * std::min(higher, lower)));
        EXPECT_EQ(test::groups(test::doubles(first), test::doubles(second), "side=higher").p, higher);
        EXPECT_EQ(test::groups(test::doubles(first), test::doubles(second), "side=lower").p, lower);
    }
}

TEST(Groups, smallest_p_is_that_of_the_most_extreme_choice_these_ties_allow) {
    test::Random random(72);
    for (int i = 0; i < 150; ++i) {
        const Values first = random.wholes(random.whole(1, 6), 0, random.whole(0, 5));
        const Values second = random.wholes(random.whole(1, 6), 0, 3);
        const auto law = plain_rank_sum(first, second).law;
        const std::uint64_t rarest = std::min(law.ways.begin()->second, law.ways.rbegin()->second);
        EXPECT_NEAR(test::groups(test::doubles(first), test::doubles(second)).smallest_p,
                    std::min(1.0, 2 * static_cast<double>(rarest) / static_cast<double>(law.total)), 1e-15);
    }
}

TEST(Groups, estimate_the_median_of_all_differences) {
    test::Random random(73);
    for (int i = 0; i < 100; ++i) {
        const Values first = random.wholes(random.whole(1, 9), 0, 40);
        const Values second = random.wholes(random.whole(1, 9), 0, 40);
        Values differences;
        std::vector<double> x;
        std::vector<double> y;
        for (const std::int64_t a : first) {
            x.push_back(static_cast<double>(a) / 10);
            for (const std::int64_t b : second) {
                differences.push_back(a - b);
            }
        }
        for (const std::int64_t b : second) {
            y.push_back(static_cast<double>(b) / 10);
        }
        std::sort(differences.begin(), differences.end());
        const std::int64_t doubled = differences[(differences.size() - 1) / 2] + differences[differences.size() / 2];
        EXPECT_EQ(test::groups(x, y).estimate, static_cast<double>(doubled) / 20);
    }
}

TEST(Groups, statistic_is_u_of_the_first) {
    // Pairs in which the first is higher: 5 over 2 and 4, 7 over all three; 4 ties once.
    EXPECT_EQ(test::groups({4, 5, 7}, {2, 4, 6}).statistic, 1.5 + 2 + 3);
}

// Wilcoxon (1945), two fly sprays, 8 and 8: rank totals 91 and 45, p between 0.0104 and 0.021; by enumeration of all
// C(16, 8) = 12,870 choices 174 of them.
TEST(Groups, published_fly_sprays) {
    const Outcome outcome = test::groups({68, 68, 59, 72, 64, 67, 70, 74}, {60, 67, 61, 62, 67, 63, 56, 58});
    EXPECT_EQ(outcome.statistic, 91 - 36);
    EXPECT_EQ(outcome.arrangements, "174 of 12,870");
}

// Shier (2004), age at diagnosis of diabetes: U 17, exact two-sided p 1/9.
TEST(Groups, published_ages_at_diagnosis) {
    const Outcome outcome = test::groups({19, 22, 16, 29, 24}, {20, 11, 17, 12});
    EXPECT_EQ(outcome.statistic, 17.0);
    EXPECT_EQ(outcome.p, 1.0 / 9);
}

TEST(Groups, swapped_are_mirrored_exactly) {
    test::Random random(74);
    for (int i = 0; i < 40; ++i) {
        const auto first = test::doubles(random.wholes(random.whole(4, 25), 0, random.whole(5, 30)));
        const auto second = test::doubles(random.wholes(random.whole(4, 25), 0, 20));
        const Outcome one = test::groups(first, second);
        const Outcome other = test::groups(second, first);
        EXPECT_EQ(one.p, other.p);
        EXPECT_EQ(one.estimate, -other.estimate);
        EXPECT_EQ(*one.lower.value, -*other.upper.value);
        EXPECT_EQ(*one.upper.value, -*other.lower.value);
        EXPECT_EQ(one.statistic + other.statistic, static_cast<double>(first.size() * second.size()));
        EXPECT_EQ(test::groups(first, second, "side=higher").p, test::groups(second, first, "side=lower").p);
    }
}

TEST(Groups, test_the_margin) {
    EXPECT_EQ(test::groups({4.5, 5.5, 7.5}, {2, 4, 6}, "margin=1.5").p, test::groups({3, 4, 6}, {2, 4, 6}).p);
}

TEST(Groups, count_the_chance_without_the_margin) {
    EXPECT_EQ(test::groups({4, 5, 7}, {2, 4, 6}, "margin=100").chance, 6.5 / 9);
}

TEST(Groups, of_equal_values_have_p_one_and_no_spread) {
    const Outcome outcome = test::groups({5, 5, 5}, {5, 5, 5, 5});
    EXPECT_EQ(outcome.p, 1.0);
    EXPECT_EQ(outcome.smallest_p, 1.0);
    EXPECT_EQ(outcome.chance, 0.5);
    EXPECT_EQ(outcome.tied, 7U);
}

TEST(Groups, of_one_value_each_have_p_one_and_no_limits) {
    const Outcome outcome = test::groups({3}, {1});
    EXPECT_EQ(outcome.p, 1.0);
    EXPECT_EQ(outcome.estimate, 2.0);
    EXPECT_FALSE(outcome.lower.value);
    EXPECT_FALSE(outcome.chance_lower.value);
    EXPECT_NE(outcome.chance_lower.reason.find("chance interval=newcombe"), std::string::npos);
    EXPECT_TRUE(test::groups({3}, {1}, "chance interval=newcombe").chance_lower.value);
}

// 8 and 10, rank sum 85: z = (85 - 76 - 0.5) / sqrt(8 * 10 * 19 / 12) with the continuity step.
TEST(Groups, approximate_p_comes_from_the_deviate) {
    const std::vector<double> first{1, 5, 7, 9, 13, 15, 17, 18};
    const std::vector<double> second{2, 3, 4, 6, 8, 10, 11, 12, 14, 16};
    const Outcome outcome = test::groups(first, second, "method=approximate");
    ASSERT_EQ(outcome.statistic, 85 - 36);
    EXPECT_NEAR(outcome.z.value(), 8.5 / std::sqrt(8 * 10 * 19 / 12.0), 1e-15);
    EXPECT_FALSE(outcome.relative_error);
}

TEST(Groups, are_exact_with_ninety_thousand_a_side_with_their_limits) {
    test::Random random(75);
    const Outcome outcome = test::groups(random.numbers(90000, 0, 100000), random.numbers(90000, 0, 99900));
    EXPECT_TRUE(outcome.exact);
    EXPECT_LE(outcome.relative_error.value(), 1e-10);
    EXPECT_FALSE(outcome.observations.limits_approximate);
}

TEST(Groups, fall_back_to_the_saddlepoint_where_the_exact_law_would_take_too_long) {
    test::Random random(75);
    const Outcome outcome = test::groups(random.numbers(20, 0, 1000), random.numbers(60000, 0, 990));
    EXPECT_FALSE(outcome.exact);
    EXPECT_EQ(outcome.law, LawKind::saddlepoint);
    EXPECT_TRUE(outcome.observations.exact_wanted_but_too_long);
    EXPECT_TRUE(outcome.observations.limits_approximate);
    EXPECT_LE(*outcome.lower.value, outcome.estimate);
    EXPECT_GE(*outcome.upper.value, outcome.estimate);
}

TEST(Groups, are_exact_at_fifty_a_side_with_ties) {
    test::Random random(76);
    EXPECT_TRUE(test::groups(random.numbers(50, 0, 9), random.numbers(50, 0, 8)).exact);
}

// 40 above 40: two arrangements of C(80, 40) = 107507208733336176461620.
TEST(Groups, separated_have_the_smallest_p_to_thirteen_digits) {
    std::vector<double> low;
    std::vector<double> high;
    for (int i = 0; i < 40; ++i) {
        low.push_back(i);
        high.push_back(100 + i);
    }
    const Outcome outcome = test::groups(high, low);
    EXPECT_NEAR(outcome.p / (2 / 107507208733336176461620.0), 1, 1e-13);
    EXPECT_NEAR(outcome.smallest_p / outcome.p, 1, 1e-13);
    EXPECT_EQ(outcome.arrangements, "");
}

TEST(Groups, notice_spreads_that_differ_more_than_threefold) {
    EXPECT_TRUE(test::groups({1, 11, 21, 31, 41}, {20, 21, 22, 23, 24}).observations.spreads_differ);
    EXPECT_FALSE(test::groups({1, 4, 7, 10, 13}, {20, 21, 22, 23, 24}).observations.spreads_differ);
    EXPECT_FALSE(test::groups({1, 11, 21, 31}, {20, 21, 22, 23}).observations.spreads_differ) << "too few to say";
}

TEST(Groups, of_1e308_beside_5e_324_keep_every_value_apart) {
    const Outcome outcome = test::groups({1e308, 5e-324}, {-1e308, 0});
    EXPECT_EQ(outcome.statistic, 4.0);
    EXPECT_EQ(outcome.tied, 0U);
    EXPECT_EQ(outcome.estimate, 1e308); // differences 5e-324, 1e308, 1e308, 2e308
}

TEST(Groups, of_many_decimals_are_exact) {
    const Outcome outcome = test::groups({1e9, 3e-15}, {1e-15, 2e-15});
    EXPECT_EQ(outcome.statistic, 4.0);
    // Differences 1e-15, 2e-15 and two just below 1e9.
    EXPECT_EQ(outcome.tied, 0U);
}

TEST(Groups, take_samples_of_any_size_each) {
    const Outcome outcome = test::groups({5}, {1, 2, 3, 4, 6, 7, 8, 9, 10, 11});
    EXPECT_EQ(outcome.n, 11U);
    EXPECT_EQ(outcome.first.n, 1U);
    EXPECT_EQ(outcome.second->n, 10U);
    EXPECT_EQ(outcome.p, 10.0 / 11);
}

} // namespace
} // namespace rankstead
