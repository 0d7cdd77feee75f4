// The laws against exact integers, shape by shape: the stated bound is never exceeded and is at most 1e-10, there is a
// law for every case, and inversion stays within its bound even where something else is quicker.
#include "shapes.h"
#include "trial_effort.h"

#include <gtest/gtest.h>

#include <iostream>
#include <numeric>

namespace rankstead::accuracy {

// What GoogleTest prints of a shape.
static void PrintTo(const SignShape& shape, std::ostream* out) {
    *out << shape.name;
}
static void PrintTo(const ChoiceShape& shape, std::ostream* out) {
    *out << shape.name;
}

namespace {

template <class Shape>
void expect_every_case_within_its_bound(const Shape& shape) {
    const Tally tally = trial(shape, trial_effort());
    std::cout << table_head << '\n' << tally.row() << '\n';
    for (const std::string& one : tally.wrong) {
        ADD_FAILURE() << "wrong: " << one;
    }
    for (const std::string& one : tally.without_law) {
        ADD_FAILURE() << "without law: " << one;
    }
    // A few fall above the mean, where the tail is no longer the smaller one, and are not taken.
    EXPECT_GE(tally.cases + tally.below_doubles, trial_effort().share_of_laws * shape.laws * sums_per_law / 2);
}

class SignedRankAccuracy : public ::testing::TestWithParam<SignShape> {};
class RankSumAccuracy : public ::testing::TestWithParam<ChoiceShape> {};

TEST_P(SignedRankAccuracy, is_as_stated) {
    expect_every_case_within_its_bound(GetParam());
}

TEST_P(RankSumAccuracy, is_as_stated) {
    expect_every_case_within_its_bound(GetParam());
}

const auto name_of_shape = [](const auto& tested) { return tested.param.name; };
INSTANTIATE_TEST_SUITE_P(of, SignedRankAccuracy, ::testing::ValuesIn(sign_shapes()), name_of_shape);
INSTANTIATE_TEST_SUITE_P(of, RankSumAccuracy, ::testing::ValuesIn(choice_shapes()), name_of_shape);

TEST(AccuracyTrial, asks_for_more_than_two_thousand_cases) {
    const auto laws_of_all = [](const auto& shapes) {
        return std::accumulate(shapes.begin(), shapes.end(), 0,
                               [](int sum, const auto& shape) { return sum + shape.laws; });
    };
    EXPECT_GT(sums_per_law * laws_of_all(sign_shapes()), 1200);
    EXPECT_GT(sums_per_law * laws_of_all(choice_shapes()), 1200);
}

} // namespace
} // namespace rankstead::accuracy
