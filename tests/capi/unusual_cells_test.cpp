// What stands in cells besides numbers. Row numbers as in degenerate_samples_test.cpp. Booleans (29), dates (30) and
// hidden rows (34) cannot be told apart from numbers here; error cells (31) are the spreadsheet's.
#include "inquiry.h"

#include <gtest/gtest.h>

namespace rks_test {
namespace {

Inquiry with_cell(const rks_cell& cell, const Settings& settings = {}) {
    Inquiry inquiry("groups");
    inquiry.cells("first", {number_cell(1), number_cell(0.3), cell, number_cell(2)});
    inquiry.numbers("second", {2, 3, 4});
    for (const auto& [name, value] : settings)
        EXPECT_EQ(inquiry.set(name, value), RKS_OK) << inquiry.message();
    return inquiry;
}

void expect_refused(Inquiry inquiry, const std::string& text) {
    SCOPED_TRACE(text);
    EXPECT_EQ(inquiry.run(), RKS_BAD_DATA);
    const auto where = inquiry.where();
    ASSERT_TRUE(where.has_value());
    EXPECT_EQ(where->argument, "first");
    EXPECT_EQ(where->row, 3U);
    EXPECT_EQ(where->column, 1U);
    EXPECT_NE(inquiry.text("check").find(text), std::string::npos) << inquiry.text("check");
    EXPECT_EQ(inquiry.text("sentence"), "Not computed: " + inquiry.text("check"));
}

TEST(UnusualCells, C25_values_beyond_a_limit_are_neither_numbers_nor_missing) {
    for (const char* text : {"<0.5", ">100", "< 0.5"}) {
        expect_refused(with_cell(text_cell(text)), text);
        expect_refused(with_cell(text_cell(text), {{"numbers", "point"}}), text);
        expect_refused(with_cell(text_cell(text), {{"missing", "n/a"}}), text);
    }
}

TEST(UnusualCells, C26_a_comma_is_not_guessed) {
    expect_refused(with_cell(text_cell(" 3,5 ")), "3,5");
    expect_refused(with_cell(text_cell("1,234")), "1,234");
    expect_refused(with_cell(text_cell("1,234"), {{"numbers", "point"}}), "1,234");
    auto comma = with_cell(text_cell(" 3,5 "), {{"numbers", "comma"}});
    ASSERT_EQ(comma.run(), RKS_OK) << comma.message();
    EXPECT_EQ(comma.number("upper quartile first"), 2.375) << "of 0.3, 1, 2 and 3.5";
}

TEST(UnusualCells, C27_words_for_missing_count_only_if_declared) {
    for (const char* word : {"n/a", "NA", ".", "-", "ND"}) {
        expect_refused(with_cell(text_cell(word)), word);
        auto declared = with_cell(text_cell(word), {{"missing", "n/a, NA, ., -, ND"}});
        ASSERT_EQ(declared.run(), RKS_OK) << word << ": " << declared.message();
        EXPECT_EQ(declared.number("n first"), 3);
        EXPECT_EQ(declared.number("missing"), 1);
        EXPECT_NE(declared.text("notes"), "") << "the count left out is reported";
    }
}

TEST(UnusualCells, C27_an_empty_text_is_a_blank_and_never_0) {
    auto inquiry = with_cell(text_cell(""));
    ASSERT_EQ(inquiry.run(), RKS_OK) << inquiry.message();
    EXPECT_EQ(inquiry.number("n first"), 3);
}

// Spreadsheets take a blank for 0 in arithmetic; here it would be a zero change.
TEST(UnusualCells, C28_a_blank_is_never_a_zero) {
    Inquiry inquiry("pairs");
    inquiry.cells("before", {number_cell(5), blank_cell(), number_cell(0), number_cell(7), blank_cell()});
    inquiry.cells("after", {number_cell(6), blank_cell(), number_cell(0), number_cell(9), number_cell(0)});
    ASSERT_EQ(inquiry.run(), RKS_OK) << inquiry.message();
    EXPECT_EQ(inquiry.number("zeros"), 1) << "only the pair 0 and 0";
    EXPECT_EQ(inquiry.number("statistic"), 3);
    EXPECT_EQ(inquiry.number("p"), 0.5);
}

TEST(UnusualCells, C31_an_error_cell_is_not_skipped) {
    auto inquiry = with_cell({RKS_CELL_STATUS, 0, 32767, nullptr, 0});
    EXPECT_NE(inquiry.run(), RKS_OK);
}

TEST(UnusualCells, C32_unequal_lengths_are_stated_and_never_cut) {
    Inquiry inquiry("pairs");
    inquiry.numbers("before", {1, 2, 3, 4, 5, 6, 7});
    inquiry.numbers("after", {2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12});
    ASSERT_EQ(inquiry.run(), RKS_UNEQUAL_LENGTHS);
    for (const char* part : {"7", "11", "before", "after"})
        EXPECT_NE(inquiry.text("check").find(part), std::string::npos) << inquiry.text("check");
}

TEST(UnusualCells, C33_half_a_pair_takes_the_whole_pair_out) {
    Inquiry inquiry("pairs");
    inquiry.cells("before", {number_cell(1), number_cell(2), blank_cell(), number_cell(4), number_cell(5)});
    inquiry.cells("after", {number_cell(2), blank_cell(), number_cell(9), number_cell(8), number_cell(7)});
    ASSERT_EQ(inquiry.run(), RKS_OK) << inquiry.message();
    const auto complete = pairs({1, 4, 5}, {2, 8, 7});
    for (const char* answer : {"p", "estimate", "statistic", "n"})
        EXPECT_EQ(inquiry.number(answer), complete.number(answer)) << answer;
    EXPECT_NE(inquiry.text("notes").find("2"), std::string::npos) << inquiry.text("notes");
}

TEST(UnusualCells, C33_pairs_without_one_complete_pair_have_no_data) {
    Inquiry inquiry("pairs");
    inquiry.cells("before", {number_cell(1), blank_cell()});
    inquiry.cells("after", {blank_cell(), number_cell(2)});
    EXPECT_EQ(inquiry.run(), RKS_NO_DATA);
}

TEST(UnusualCells, C34_a_text_is_a_heading_only_in_the_first_cell) {
    Inquiry heading("single");
    heading.cells("values", {text_cell("minutes"), number_cell(3), number_cell(5)});
    heading.numbers("reference", {1});
    ASSERT_EQ(heading.run(), RKS_OK) << heading.message();
    EXPECT_EQ(heading.number("n"), 2);
    expect_refused(with_cell(text_cell("Total")), "Total");
}

TEST(UnusualCells, C34_the_sentence_states_how_many_values_were_used) {
    const auto sentence =
        groups({1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12, 13}, {4, 5, 6, 7, 8, 9, 10, 11, 12, 13, 14}).text("sentence");
    for (const char* count : {"13", "11"})
        EXPECT_NE(sentence.find(count), std::string::npos) << sentence;
}

TEST(UnusualCells, C35_spaces_around_a_heading_are_trimmed) {
    Inquiry inquiry("groups");
    inquiry.cells("first", {text_cell("  A\xc2\xa0"), number_cell(3), number_cell(5)});
    inquiry.cells("second", {text_cell("B "), number_cell(1), number_cell(2)});
    ASSERT_EQ(inquiry.run(), RKS_OK) << inquiry.message();
    EXPECT_EQ(inquiry.text("sentence").find("\xc2\xa0"), std::string::npos) << inquiry.text("sentence");
}

TEST(UnusualCells, C36_numbers_stored_as_text_are_refused_unless_asked_for) {
    expect_refused(with_cell(text_cell("12")), "12");
    auto asked = with_cell(text_cell("12"), {{"numbers", "point"}});
    ASSERT_EQ(asked.run(), RKS_OK) << asked.message();
    EXPECT_EQ(asked.number("n first"), 4);
}

} // namespace
} // namespace rks_test
