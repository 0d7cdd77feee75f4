// studies/single.cpp
#include "data.h"
#include "refusal.h"
#include "studies/studies.h"

#include <gtest/gtest.h>

namespace rankstead {
namespace {

// Common practice in the teaching of the sign test: 7 of 10 below the reference, one-sided p 0.172; 8 of 10, 0.055.
TEST(Single, common_practice_sign_test_of_ten) {
    EXPECT_NEAR(test::single({1, 2, 3, 4, 5, 6, 7, 18, 19, 20}, 10, "test=sign; side=lower").p, 0.172, 0.0005);
    EXPECT_NEAR(test::single({1, 2, 3, 4, 5, 6, 7, 8, 19, 20}, 10, "test=sign; side=lower").p, 0.055, 0.0005);
}

TEST(Single, compares_with_the_reference) {
    const Outcome outcome = test::single({11, 12, 13, 14, 15, 16}, 10);
    EXPECT_EQ(outcome.statistic, 21.0);
    EXPECT_EQ(outcome.p, 2.0 / 64);
    EXPECT_EQ(outcome.reference, 10.0);
}

TEST(Single, estimates_the_centre_of_the_values_themselves) {
    const Outcome outcome = test::single({11, 12, 13, 14, 15, 16}, 10);
    EXPECT_EQ(outcome.estimate, 13.5);
    EXPECT_EQ(outcome.lower.value, 11.0);
    EXPECT_EQ(outcome.upper.value, 16.0);
}

TEST(Single, adds_the_margin_to_the_reference) {
    EXPECT_EQ(test::single({1, 2, 4, 8, 9, 12}, 3, "margin=2").p, test::single({1, 2, 4, 8, 9, 12}, 5).p);
    EXPECT_EQ(test::single({1, 2, 4, 8, 9, 12}, 3, "margin=2").reference, 3.0);
}

// The chance is that of exceeding the reference, whatever the margin.
TEST(Single, counts_the_chance_from_the_reference) {
    EXPECT_EQ(test::single({1, 2, 4, 8}, 4, "margin=2").chance, 1.5 / 4);
}

TEST(Single, has_no_second_sample) {
    EXPECT_FALSE(test::single({1, 2}, 1).second);
}

TEST(Single, takes_a_reference_with_more_decimals_than_the_values) {
    const Outcome outcome = test::single({1, 2, 3}, 1.75);
    EXPECT_EQ(outcome.zeros, 0U);
    EXPECT_EQ(outcome.statistic, 1 + 3); // sizes 0.75, 0.25, 1.25: ranks 2, 1, 3; the last two are above
}

TEST(Single, takes_its_name_from_the_heading) {
    const Block values = test::cells("values", {test::text("Waits"), test::number(3), test::number(4)});
    const Block reference = test::column("reference", {2});
    EXPECT_EQ(run_single({&values, &reference}, {}).first.name, "Waits");
}

TEST(Single, fingerprint_covers_the_reference) {
    EXPECT_NE(test::single({1, 2}, 1).fingerprint, test::single({1, 2}, 2).fingerprint);
}

TEST(Single, refuses_a_reference_of_two_numbers) {
    const Block values = test::column("values", {3, 4});
    const Block reference = test::column("reference", {2, 3});
    EXPECT_THROW(static_cast<void>(run_single({&values, &reference}, {})), Refusal);
}

} // namespace
} // namespace rankstead
