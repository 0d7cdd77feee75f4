// studies/common.h: steps that the studies share.
#include "studies/common.h"

#include <gtest/gtest.h>

namespace rankstead {
namespace {

using Values = std::vector<std::int64_t>;

TEST(TakeExact, writes_arrangements_as_counts) {
    Outcome outcome;
    take_tails(outcome, from_counts({43, 1000, 1024}));
    EXPECT_EQ(outcome.arrangements, "86 of 1,024");
    EXPECT_EQ(outcome.p, 86.0 / 1024);
    EXPECT_TRUE(outcome.exact);
}

TEST(TakeExact, has_no_arrangements_where_nothing_was_counted) {
    Outcome outcome;
    take_tails(outcome, Tails{0.25, 0.8, std::nullopt, 1e-14});
    EXPECT_EQ(outcome.arrangements, "");
    EXPECT_EQ(outcome.p, 0.5);
    EXPECT_EQ(outcome.relative_error, 1e-14);
}

TEST(ChosenName, prefers_the_setting_then_the_heading) {
    EXPECT_EQ(chosen_name("New", "Heading", "first"), "New");
    EXPECT_EQ(chosen_name("", "Heading", "first"), "Heading");
    EXPECT_EQ(chosen_name("", "", "first"), "first");
}

TEST(NoLimitsReason, names_the_highest_level_that_can_be_reached) {
    Settings settings;
    EXPECT_NE(no_limits_reason(settings, 1.0 / 32).find("reach is 93.75%"), std::string::npos);
    settings.side = Side::higher;
    EXPECT_NE(no_limits_reason(settings, 1.0 / 16).find("reach is 93.75%"), std::string::npos);
    settings.side = Side::two_sided;
    EXPECT_NE(no_limits_reason(settings, 1.0).find("reach is 0%"), std::string::npos);
}

TEST(TakeChance, keeps_the_limit_of_the_side_asked_for) {
    Outcome outcome;
    outcome.settings.side = Side::higher;
    take_chance(outcome, 0.7, Interval{0.4, 0.9}, "");
    EXPECT_EQ(outcome.chance, 0.7);
    EXPECT_EQ(outcome.chance_lower.value, 0.4);
    EXPECT_FALSE(outcome.chance_upper.value);
    EXPECT_EQ(outcome.chance_upper.reason, "with side=higher the interval has only its other limit.");
}

TEST(TakeChance, says_why_there_is_no_interval) {
    Outcome outcome;
    take_chance(outcome, 0.7, std::nullopt, "one value only");
    EXPECT_EQ(outcome.chance_lower.reason, "one value only");
    EXPECT_EQ(outcome.chance_upper.reason, "one value only");
}

TEST(Negated, stays_ascending) {
    EXPECT_EQ(negated(Values{-3, 0, 5}), (Values{-5, 0, 3}));
}

TEST(HasEqualNeighbours, sees_a_tie) {
    EXPECT_TRUE(has_equal_neighbours(Values{1, 2, 2}));
    EXPECT_FALSE(has_equal_neighbours(Values{1, 2, 3}));
    EXPECT_FALSE(has_equal_neighbours(Values{1}));
}

TEST(GapAbove, is_the_same_for_equal_breakpoints) {
    const auto sums = OrderedSums<std::int64_t>::values({10, 20, 20, 31});
    EXPECT_EQ(gap_above(sums, 1).floor, 10);
    EXPECT_EQ(gap_above(sums, 2).floor, 20);
    EXPECT_EQ(gap_above(sums, 2).first, 2);
    EXPECT_EQ(gap_above(sums, 2).last, 3);
    EXPECT_EQ(gap_above(sums, 3).floor, 20);
    EXPECT_EQ(gap_above(sums, 4).floor, 31);
}

TEST(GapAbove, begins_below_the_lowest_breakpoint) {
    const auto gap = gap_above(OrderedSums<std::int64_t>::values({10, 20}), 0);
    EXPECT_LT(gap.floor, 10);
    EXPECT_EQ(gap.last, 0);
}

TEST(MedianBreakpoint, is_the_mean_of_the_two_in_the_middle) {
    Grid grid;
    grid.cover(Decimal{1, -1});
    EXPECT_EQ(median_breakpoint(OrderedSums<std::int64_t>::values({1, 2, 9}), 0, grid), 0.2);
    EXPECT_EQ(median_breakpoint(OrderedSums<std::int64_t>::values({1, 2, 3, 9}), 0, grid), 0.25);
    EXPECT_EQ(median_breakpoint(OrderedSums<std::int64_t>::values({1, 2, 3, 9}), 1, grid), 0.125);
}

} // namespace
} // namespace rankstead
