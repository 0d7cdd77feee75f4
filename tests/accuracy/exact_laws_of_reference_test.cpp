// The exact integers that the trial compares with, against plain enumeration where that is possible and against one
// another where it is not.
#include "choice_by_levels.h"
#include "exact_choice_law.h"
#include "exact_sign_law.h"

#include "data.h"
#include "enumeration.h"
#include "random_scores.h"

#include <gtest/gtest.h>

#include <numeric>

namespace rankstead::accuracy {
namespace {

std::vector<std::int64_t> every_sum_from(std::int64_t least, std::int64_t most) {
    std::vector<std::int64_t> sums(static_cast<std::size_t>(most - least + 1));
    std::iota(sums.begin(), sums.end(), least);
    return sums;
}

void expect_same(const std::vector<BigTails>& exact, const test::Enumerated& truth,
                 const std::vector<std::int64_t>& sums) {
    ASSERT_EQ(exact.size(), sums.size());
    for (std::size_t i = 0; i < sums.size(); ++i) {
        EXPECT_EQ(exact[i].lower, truth.at_most(sums[i])) << sums[i];
        EXPECT_EQ(exact[i].upper, truth.at_least(sums[i])) << sums[i];
        EXPECT_EQ(exact[i].total, truth.total) << sums[i];
    }
}

void expect_same(const std::vector<BigTails>& one, const std::vector<BigTails>& other) {
    ASSERT_EQ(one.size(), other.size());
    for (std::size_t i = 0; i < one.size(); ++i) {
        EXPECT_EQ(one[i].lower, other[i].lower) << i;
        EXPECT_EQ(one[i].upper, other[i].upper) << i;
    }
}

TEST(ExactSignLaw, of_every_tie_pattern_of_seven_values_is_that_of_enumeration) {
    for (const Scores& pattern : test::tie_patterns(7)) {
        for (const std::int64_t zeros : {0, 3}) {
            const Scores scores = midranks(pattern, zeros);
            const auto sums = every_sum_from(0, std::accumulate(scores.begin(), scores.end(), std::int64_t{0}));
            expect_same(exact_sign_tails(scores, sums, 7), test::every_sign(scores), sums);
        }
    }
}

// Counts of up to 2^200 need several moduli.
TEST(ExactSignLaw, of_two_hundred_values_is_that_of_large_integers) {
    Random random(31);
    const Scores scores = midranks(random_group_sizes(random, 200, Ties::even_levels, 12), 0);
    for (const std::int64_t sum : {4000, 12000, 20100}) {
        const auto exact = exact_sign_tails(scores, {sum}, 200);
        const BigTails truth = test::big_sign_tails(scores, sum);
        EXPECT_EQ(exact.front().lower, truth.lower);
        EXPECT_EQ(exact.front().upper, truth.upper);
        EXPECT_EQ(exact.front().total, truth.total);
    }
}

TEST(ExactChoiceLaw, of_every_tie_pattern_of_seven_values_is_that_of_enumeration_in_every_way) {
    for (const Scores& pattern : test::tie_patterns(7)) {
        for (const std::int64_t chosen : {1, 3, 6}) {
            const Choice choice{midranks_from_zero(pattern), chosen};
            const auto least = std::accumulate(choice.scores.begin(), choice.scores.begin() + chosen, std::int64_t{0});
            const auto sums =
                every_sum_from(least, std::accumulate(choice.scores.begin(), choice.scores.end(), std::int64_t{0}));
            const auto truth = test::every_choice(choice.scores, static_cast<std::size_t>(chosen));
            expect_same(exact_choice_tails(choice, sums, 7, Counting::by_levels), truth, sums);
            expect_same(exact_choice_tails(choice, sums, 7, Counting::by_score), truth, sums);
        }
    }
}

TEST(ExactChoiceLaw, without_ties_is_the_same_by_partitions_and_by_score) {
    Choice choice{Scores(150), 60};
    std::iota(choice.scores.begin(), choice.scores.end(), std::int64_t{0});
    const std::vector<std::int64_t> sums{1770, 1800, 2500, 4470, 7000};
    expect_same(exact_choice_tails(choice, sums, 150, Counting::by_partitions),
                exact_choice_tails(choice, sums, 150, Counting::by_score));
}

TEST(ExactChoiceLaw, on_few_levels_is_the_same_by_levels_and_by_score) {
    Random random(32);
    for (const Ties ties : {Ties::even_levels, Ties::skew_levels}) {
        const Choice choice{midranks_from_zero(random_group_sizes(random, 130, ties, 4)), 50};
        const std::int64_t mean =
            50 * std::accumulate(choice.scores.begin(), choice.scores.end(), std::int64_t{0}) / 130;
        const std::vector<std::int64_t> sums{mean - mean / 5, mean};
        expect_same(exact_choice_tails(choice, sums, 130, Counting::by_levels),
                    exact_choice_tails(choice, sums, 130, Counting::by_score));
    }
}

TEST(ExactChoiceLaw, of_one_against_many_counts_the_scores_up_to_the_sum) {
    const Choice choice{midranks_from_zero({2, 1, 1, 3, 1}), 1}; // doubled midranks 3 3 6 8 12 12 12 16, less 3
    ASSERT_EQ(choice.scores, (Scores{0, 0, 3, 5, 9, 9, 9, 13}));
    const auto exact = exact_choice_tails(choice, {0, 5, 9}, 3, Counting::by_score);
    EXPECT_EQ(exact[0].lower, 2);
    EXPECT_EQ(exact[1].lower, 4);
    EXPECT_EQ(exact[2].lower, 7);
    EXPECT_EQ(exact[2].upper, 4);
}

} // namespace
} // namespace rankstead::accuracy
