// notes.h: each warning by the condition that calls for it, and by the neighbouring one that does not.
#include "notes.h"

#include "data.h"
#include "outcome.h"

#include <gtest/gtest.h>

namespace rankstead {
namespace {

// Two groups of eight without ties, equally spread, of which nothing needs to be said.
Outcome quiet_groups(std::string_view settings = "") {
    return test::groups({1, 3, 5, 7, 9, 11, 13, 15}, {2, 4, 6, 8, 10, 12, 14, 16}, settings);
}

// Ten changes without ties or zeros, about evenly spread.
const std::vector<double> quiet_changes{-4, -3, -1.5, 1, 2, 3.5, 5, 6, 7.5, 9};

std::string joined(const Outcome& outcome) {
    std::string all;
    for (const std::string& note : notes(outcome)) {
        all += note + "\n";
    }
    return all;
}

void expect_only(const Outcome& outcome, const std::string& note) {
    EXPECT_EQ(joined(outcome), note + "\n");
}

TEST(Notes, are_empty_when_nothing_needs_to_be_said) {
    EXPECT_EQ(joined(quiet_groups()), "");
    EXPECT_EQ(joined(test::changes(quiet_changes)), "");
    EXPECT_EQ(joined(test::single(quiet_changes, 0.25)), "");
}

TEST(Notes, left_out_lists_every_kind_of_cell_that_was_left_out) {
    Outcome outcome = quiet_groups();
    outcome.ledgers[0].blank = 1;
    outcome.ledgers[0].missing_words = 2;
    outcome.ledgers[1].blank = 3;
    outcome.ledgers[1].unpaired = 1;
    expect_only(outcome, "Left out: first 1 blank cell, 2 cells with a word for missing; second 3 blank cells, 1 value "
                         "without a partner. Check that they are missing for reasons unrelated to the result.");
}

TEST(Notes, a_heading_is_not_left_out) {
    Outcome outcome = quiet_groups();
    outcome.ledgers[0].heading = 1;
    EXPECT_EQ(joined(outcome), "");
}

TEST(Notes, all_pairs_unchanged) {
    const std::string all = joined(test::changes(std::vector<double>(8, 0.0)));
    EXPECT_NE(all.find("No pair changed, so there is nothing to test: p is 1."), std::string::npos) << all;
}

TEST(Notes, all_values_at_the_reference) {
    const std::string all = joined(test::single(std::vector<double>(8, 5.0), 5));
    EXPECT_NE(all.find("Every value equals the tested value, so there is nothing to test: p is 1."), std::string::npos)
        << all;
}

TEST(Notes, all_values_of_both_groups_equal) {
    const std::string all = joined(test::groups({5, 5, 5, 5}, {5, 5, 5, 5}));
    EXPECT_NE(all.find("All values are equal, so the groups cannot be told apart: p is 1."), std::string::npos) << all;
    EXPECT_EQ(all.find("So few values"), std::string::npos) << all;
}

TEST(Notes, all_values_of_both_groups_equal_once_the_margin_is_taken_off) {
    const std::string all = joined(test::groups({7, 7, 7, 7}, {5, 5, 5, 5}, "margin=2"));
    EXPECT_NE(
        all.find("All values are equal once the margin is taken off, so the groups cannot be told apart: p is 1."),
        std::string::npos)
        << all;
}

// Equal as they stand, but the margin lowers all of the first group below the second.
TEST(Notes, equal_values_that_the_margin_parts) {
    const Outcome outcome = test::groups({5, 5, 5, 5}, {5, 5, 5, 5}, "margin=2");
    EXPECT_NE(outcome.p, 1);
    EXPECT_EQ(joined(outcome).find("All values are equal"), std::string::npos);
}

// Equal quartiles and medians, every value tied, yet not one tie group.
TEST(Notes, values_that_are_tied_in_more_than_one_group) {
    const Outcome outcome = test::groups({1, 1, 5, 5, 5, 5, 5, 5}, {5, 5, 5, 5});
    EXPECT_EQ(joined(outcome).find("All values are equal"), std::string::npos);
}

// 3 v 3: the smallest two-sided p is 2/20.
TEST(Notes, too_few_values_for_a_p_below_0_05) {
    expect_only(test::groups({1, 3, 5}, {2, 4, 6}, "level=0.9"),
                "So few values can never give a p below 0.1, whatever they are. Collect more before concluding "
                "anything.");
}

// 4 v 4: the smallest two-sided p is 2/70.
TEST(Notes, four_a_group_are_not_too_few) {
    EXPECT_EQ(joined(test::groups({1, 3, 5, 7}, {2, 4, 6, 8})), "");
}

// Five changes: the smallest two-sided p is 2/32, so limits exist up to 93.75%.
TEST(Notes, no_limits_at_this_level) {
    const std::string all = joined(test::changes({-1, 2, 3, 4, 5.5}));
    EXPECT_NE(all.find("Limits: no finite 95% interval exists with so few values; the highest level that these sizes "
                       "can reach is 93.75%. Ask for a lower level, or collect more."),
              std::string::npos)
        << all;
}

TEST(Notes, limits_at_a_level_that_exists_need_no_note) {
    const std::string all = joined(test::changes({-1, 2, 3, 4, 5.5}, "level=0.9375"));
    EXPECT_EQ(all.find("Limits:"), std::string::npos) << all;
}

TEST(Notes, exact_law_too_long) {
    Outcome outcome = quiet_groups();
    outcome.observations.exact_wanted_but_too_long = true;
    outcome.observations.approximation_error = 0.001;
    expect_only(outcome,
                "The exact law of so many values would take too long, so p and the limits come from the saddlepoint "
                "approximation. Wherever it was compared with the exact p, it was within 0.1% of it for p above "
                "0.0001.");
}

TEST(Notes, exact_laws_of_the_limits_too_long) {
    Outcome outcome = quiet_groups();
    outcome.observations.limits_approximate = true;
    outcome.observations.approximation_error = 2;
    expect_only(outcome,
                "The exact law of so many values would take too long, so the limits come, unlike p, from the "
                "saddlepoint approximation. With so few values in the smaller group, or on so few different ones, it "
                "may be off by a factor of two or three.");
}

TEST(Notes, approximation_asked_for) {
    expect_only(quiet_groups("method=approximate"),
                "The normal approximation was asked for. It can be far off with few values or many ties; leave the "
                "setting method out for the exact p.");
}

TEST(Notes, zeros_dropped) {
    expect_only(test::changes({0, -4, -3, -1.5, 1, 2, 3.5, 5, 6, 7.5, 9}),
                "1 pair did not change: it was dropped before ranking (zeros=drop); zeros=pratt ranks it first.");
}

TEST(Notes, zeros_ranked) {
    expect_only(test::changes({0, 0, -4, -3, -1.5, 1, 2, 3.5, 5, 6, 7.5, 9}, "zeros=pratt"),
                "2 pairs did not change: they were ranked and then set aside (zeros=pratt).");
}

TEST(Notes, zeros_under_the_sign_test_of_single_values) {
    expect_only(test::single({5, -4, -3, -1.5, 1, 2, 3.5, 6, 7.5, 9}, 5, "test=sign"),
                "1 value equals the tested value: the sign test sets it aside.");
}

TEST(Notes, half_of_the_pairs_unchanged) {
    const std::string all = joined(test::changes({0, 0, 0, 0, 0, 0, 1, 2, 3, 4, -5, -6}, "zeros=pratt"));
    EXPECT_NE(all.find("That is half of them or more, so p speaks of the minority that changed: report the count too."),
              std::string::npos)
        << all;
}

TEST(Notes, fewer_than_half_of_the_pairs_unchanged) {
    const std::string all = joined(test::changes({0, 0, 0, 0, 0, 1, 2, 3, 4, -5, -6}, "zeros=pratt"));
    EXPECT_EQ(all.find("half of them"), std::string::npos) << all;
}

TEST(Notes, heavy_ties_under_the_exact_law) {
    const std::string all = joined(test::groups({1, 1, 2, 2, 3, 9}, {1, 2, 3, 4, 5, 6}));
    EXPECT_NE(all.find("8 of 12 values are tied. The exact p allows for that; the estimate and its limits can only be "
                       "as fine as the measurement."),
              std::string::npos)
        << all;
}

TEST(Notes, heavy_ties_under_the_approximation) {
    const std::string all = joined(test::groups({1, 1, 2, 2, 3, 9}, {1, 2, 3, 4, 5, 6}, "method=approximate"));
    EXPECT_NE(all.find("8 of 12 values are tied. The approximation corrects for that;"), std::string::npos) << all;
}

TEST(Notes, half_tied_is_not_heavy) {
    const std::string all = joined(test::groups({1, 1, 2, 2, 8, 9}, {1, 2, 10, 4, 5, 7}));
    EXPECT_EQ(all.find("are tied"), std::string::npos) << all;
}

TEST(Notes, ties_do_not_matter_to_the_sign_test) {
    const std::string all = joined(test::changes({1, 1, 1, 1, 1, 1, 1}, "test=sign"));
    EXPECT_EQ(all.find("are tied"), std::string::npos) << all;
}

// Median 4 in both groups, yet almost all the other values of the first lie above those of the second.
TEST(Notes, equal_medians_with_a_small_p) {
    Outcome outcome = quiet_groups();
    outcome.p = 0.049;
    outcome.second->description.median = outcome.first.description.median;
    expect_only(outcome, "The two medians are equal although p is small: the test compares whole sets of values, not "
                         "their medians. Report the estimate and the chance instead.");
    outcome.p = 0.05;
    EXPECT_EQ(joined(outcome), "");
}

TEST(Notes, an_estimate_of_zero_with_a_small_p) {
    Outcome outcome = quiet_groups();
    outcome.p = 0.01;
    outcome.estimate = 0;
    expect_only(outcome, "The estimate is 0 although p is small, because many values are equal: the direction shows in "
                         "the chance, so report that.");
    outcome.estimate = 0.5;
    EXPECT_EQ(joined(outcome), "");
}

// Quartiles 2.25, 3.5 and 18: the upper half is more than three times as wide as the lower.
TEST(Notes, lopsided_changes_under_the_signed_rank_test) {
    const std::vector<double> changes{1, 2, 2.2, 2.4, 3, 4, 10, 20, 30, 40, -1.5};
    const std::string all = joined(test::changes(changes));
    EXPECT_NE(all.find("The changes are lopsided. The signed rank test expects them to spread about evenly to both "
                       "sides of their centre; test=sign does not."),
              std::string::npos)
        << all;
    EXPECT_EQ(joined(test::changes(changes, "test=sign")).find("lopsided"), std::string::npos);
}

TEST(Notes, one_group_spread_much_wider) {
    const std::string all = joined(test::groups({1, 11, 21, 31, 41, 51}, {20, 21.5, 22, 23, 24, 25}));
    EXPECT_NE(all.find("One group is spread much wider than the other, so a single shift does not describe the "
                       "difference well, and a small p may come from the spread. Show a picture and report the "
                       "chance."),
              std::string::npos)
        << all;
}

TEST(Notes, spreads_up_to_threefold_need_no_note) {
    // Interquartile ranges 2 and 6.
    EXPECT_EQ(joined(test::groups({1, 2, 3, 4, 5}, {0.5, 3.5, 6.5, 9.5, 12.5})).find("spread"), std::string::npos);
}

TEST(Notes, margins_at_which_dropping_a_zero_turns_p_around) {
    Outcome outcome = test::changes(quiet_changes);
    outcome.observations.exceptional_margins = {-1.5, 7.5};
    expect_only(outcome,
                "With zeros=drop, p and the limits disagree at exactly −1.5, 7.5, because a value there becomes "
                "a zero and is dropped. zeros=pratt has no such exception.");
}

TEST(Notes, the_classical_interval_of_tied_data) {
    const std::string all = joined(test::groups({1, 3, 5, 7, 7}, {2, 4, 6, 8, 10}, "interval=table"));
    EXPECT_NE(all.find("interval=table gives the classical closed interval, made for data without ties: its limits can "
                       "contradict p. interval=matching cannot."),
              std::string::npos)
        << all;
}

TEST(Notes, the_classical_interval_of_data_without_ties) {
    EXPECT_EQ(joined(quiet_groups("interval=table")), "");
}

TEST(Notes, pairs_equal_at_fifteen_digits) {
    Outcome outcome = test::changes(quiet_changes);
    outcome.observations.equal_at_fifteen_digits = 1;
    expect_only(outcome, "1 pair differs only beyond the 15th digit and was taken as equal.");
    outcome.observations.equal_at_fifteen_digits = 2;
    expect_only(outcome, "2 pairs differ only beyond the 15th digit and were taken as equal.");
}

TEST(Notes, write_numbers_with_the_decimal_sign_asked_for) {
    const std::string all = joined(test::groups({1, 3, 5}, {2, 4, 6}, "decimal sign=comma"));
    EXPECT_NE(all.find("never give a p below 0,1,"), std::string::npos) << all;
}

} // namespace
} // namespace rankstead
