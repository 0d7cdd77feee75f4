// What cells may hold, and how a cell that cannot be used is named.
#include "inquiry.h"

#include <gtest/gtest.h>

#include <cmath>
#include <limits>

namespace rks_test {
namespace {

constexpr double nan = std::numeric_limits<double>::quiet_NaN();
constexpr double infinity = std::numeric_limits<double>::infinity();

void expect_bad_cell(Inquiry& inquiry, const std::string& argument, std::size_t row, std::size_t column = 1) {
    ASSERT_EQ(inquiry.run(), RKS_BAD_DATA) << inquiry.message();
    const auto where = inquiry.where();
    ASSERT_TRUE(where.has_value());
    EXPECT_EQ(where->argument, argument);
    EXPECT_EQ(where->row, row);
    EXPECT_EQ(where->column, column);
    EXPECT_FALSE(where->reason.empty());
    const auto check = inquiry.text("check");
    EXPECT_NE(check.find(argument), std::string::npos) << check;
    EXPECT_NE(check.find(std::to_string(row)), std::string::npos) << check;
    EXPECT_EQ(inquiry.status("p"), RKS_BAD_DATA);
}

TEST(Data, not_a_number_and_infinities_are_refused_with_their_position) {
    for (const double bad : {nan, -nan, infinity, -infinity}) {
        Inquiry inquiry("pairs");
        inquiry.numbers("before", {1, 2, 3, 4});
        inquiry.numbers("after", {2, 3, bad, 1});
        expect_bad_cell(inquiry, "after", 3);
    }
}

TEST(Data, the_position_counts_rows_and_columns_of_a_block) {
    Inquiry inquiry("groups");
    const std::vector<double> block = {1, 2, 3, 4, 5, nan};
    ASSERT_EQ(rks_inquiry_numbers(inquiry.handle(), "first", block.data(), 2, 3), RKS_OK);
    inquiry.numbers("second", {1, 2, 3});
    expect_bad_cell(inquiry, "first", 2, 3);
}

TEST(Data, infinities_in_number_cells_are_refused_too) {
    Inquiry inquiry("single");
    inquiry.cells("values", {number_cell(1), number_cell(infinity)});
    inquiry.numbers("reference", {0});
    expect_bad_cell(inquiry, "values", 2);
}

TEST(Data, a_reference_that_is_not_a_number_is_refused) {
    Inquiry inquiry("single");
    inquiry.numbers("values", {1, 2, 3});
    inquiry.numbers("reference", {nan});
    expect_bad_cell(inquiry, "reference", 1);
}

TEST(Data, a_run_that_failed_elsewhere_names_no_cell) {
    Inquiry inquiry("pairs");
    inquiry.numbers("before", {1, 2});
    inquiry.numbers("after", {1});
    EXPECT_EQ(inquiry.run(), RKS_UNEQUAL_LENGTHS);
    EXPECT_FALSE(inquiry.where().has_value());
    EXPECT_FALSE(pairs({1, 2}, {2, 4}).where().has_value());
}

TEST(Data, every_part_of_where_may_be_left_out) {
    Inquiry inquiry("single");
    inquiry.numbers("values", {1, nan});
    inquiry.numbers("reference", {0});
    ASSERT_EQ(inquiry.run(), RKS_BAD_DATA);
    EXPECT_EQ(rks_inquiry_where(inquiry.handle(), nullptr, nullptr, nullptr, nullptr), RKS_OK);
}

TEST(Data, a_missing_argument_is_named) {
    Inquiry inquiry("groups");
    inquiry.numbers("first", {1, 2});
    EXPECT_EQ(inquiry.run(), RKS_NO_DATA);
    EXPECT_NE(inquiry.text("check").find("second"), std::string::npos) << inquiry.text("check");
}

TEST(Data, an_argument_of_blanks_only_has_no_data) {
    Inquiry inquiry("groups");
    inquiry.numbers("first", {1, 2});
    inquiry.cells("second", {blank_cell(), blank_cell()});
    EXPECT_EQ(inquiry.run(), RKS_NO_DATA);
    EXPECT_NE(inquiry.text("check").find("second"), std::string::npos) << inquiry.text("check");
}

TEST(Data, a_heading_names_the_group) {
    Inquiry inquiry("groups");
    inquiry.cells("first", {text_cell("Alder ward"), number_cell(4), number_cell(6), number_cell(7)});
    inquiry.cells("second", {text_cell("Birch ward"), number_cell(1), number_cell(2), number_cell(3)});
    ASSERT_EQ(inquiry.run(), RKS_OK) << inquiry.message();
    EXPECT_EQ(inquiry.number("n first"), 3);
    EXPECT_EQ(inquiry.number("statistic"), 9);
    const auto sentence = inquiry.text("sentence");
    EXPECT_NE(sentence.find("Alder ward"), std::string::npos) << sentence;
    EXPECT_NE(sentence.find("Birch ward"), std::string::npos) << sentence;
}

TEST(Data, headings_of_pairs_stand_beside_each_other) {
    Inquiry inquiry("pairs");
    inquiry.cells("before", {text_cell("March"), number_cell(4), number_cell(6), number_cell(7)});
    inquiry.cells("after", {text_cell("June"), number_cell(5), number_cell(8), number_cell(10)});
    ASSERT_EQ(inquiry.run(), RKS_OK) << inquiry.message();
    EXPECT_EQ(inquiry.number("n"), 3);
    EXPECT_EQ(inquiry.number("estimate"), 2);
}

TEST(Data, a_text_below_the_first_cell_is_no_heading) {
    Inquiry inquiry("groups");
    inquiry.cells("first", {number_cell(4), text_cell("lost"), number_cell(7)});
    inquiry.numbers("second", {1, 2, 3});
    expect_bad_cell(inquiry, "first", 2);
    EXPECT_NE(inquiry.text("check").find("lost"), std::string::npos) << "the text is quoted";
}

TEST(Data, declared_words_are_missing) {
    Inquiry inquiry("groups");
    inquiry.cells("first", {number_cell(4), text_cell("n/a"), number_cell(7), text_cell(" ND "), text_cell("nd")});
    inquiry.numbers("second", {1, 2, 3});
    ASSERT_EQ(inquiry.set("missing", "n/a, ND"), RKS_OK) << inquiry.message();
    ASSERT_EQ(inquiry.run(), RKS_OK) << inquiry.message();
    EXPECT_EQ(inquiry.number("n first"), 2);
    EXPECT_EQ(inquiry.number("missing"), 3);
}

TEST(Data, a_declared_word_leaves_other_texts_refused) {
    Inquiry inquiry("groups");
    inquiry.cells("first", {number_cell(4), text_cell("n/a"), text_cell("refused"), number_cell(7)});
    inquiry.numbers("second", {1, 2, 3});
    ASSERT_EQ(inquiry.set("missing", "n/a"), RKS_OK);
    expect_bad_cell(inquiry, "first", 3);
}

TEST(Data, a_declared_word_in_the_first_cell_is_missing_and_no_heading) {
    Inquiry inquiry("pairs");
    inquiry.cells("before", {text_cell("n/a"), number_cell(6), number_cell(7)});
    inquiry.numbers("after", {1, 8, 10});
    ASSERT_EQ(inquiry.set("missing", "n/a"), RKS_OK);
    ASSERT_EQ(inquiry.run(), RKS_OK) << inquiry.message();
    EXPECT_EQ(inquiry.number("n"), 2);
    EXPECT_EQ(inquiry.number("estimate"), 2.5);
}

Inquiry with_text_numbers(const char* text, const char* numbers) {
    Inquiry inquiry("single");
    inquiry.cells("values", {number_cell(1), text_cell(text), number_cell(10)});
    inquiry.numbers("reference", {0});
    if (numbers != nullptr) {
        EXPECT_EQ(inquiry.set("numbers", numbers), RKS_OK) << inquiry.message();
    }
    return inquiry;
}

TEST(Data, numbers_stored_as_text_are_never_guessed) {
    for (const char* text : {"3", "3.5", "3,5", " 3 "}) {
        auto inquiry = with_text_numbers(text, nullptr);
        expect_bad_cell(inquiry, "values", 2);
    }
}

TEST(Data, numbers_with_a_point_are_read_on_request) {
    for (const auto& [text, value] : {std::pair{"3.5", 3.5}, {" 4 ", 4.0}, {"1.25", 1.25}, {"9e0", 9.0}}) {
        auto inquiry = with_text_numbers(text, "point");
        ASSERT_EQ(inquiry.run(), RKS_OK) << text << inquiry.message();
        EXPECT_EQ(inquiry.number("median first"), value);
    }
    for (const char* text : {"3,5", "1,234", "3.5 mg", "1.2.3", "nan", "inf", "0x10", "--3"}) {
        auto inquiry = with_text_numbers(text, "point");
        expect_bad_cell(inquiry, "values", 2);
    }
}

TEST(Data, numbers_with_a_comma_are_read_on_request) {
    auto inquiry = with_text_numbers(" 3,5 ", "comma");
    ASSERT_EQ(inquiry.run(), RKS_OK) << inquiry.message();
    EXPECT_EQ(inquiry.number("median first"), 3.5);
    for (const char* text : {"3.5", "1.234,5", "3,5,1"}) {
        auto other = with_text_numbers(text, "comma");
        expect_bad_cell(other, "values", 2);
    }
}

TEST(Data, a_number_that_no_double_holds_is_refused) {
    auto inquiry = with_text_numbers("1e999", "point");
    expect_bad_cell(inquiry, "values", 2);
}

TEST(Data, more_than_one_reference_is_refused) {
    Inquiry inquiry("single");
    inquiry.numbers("values", {1, 2, 3});
    inquiry.numbers("reference", {1, 2});
    EXPECT_NE(inquiry.run(), RKS_OK);
    EXPECT_NE(inquiry.text("check").find("reference"), std::string::npos) << inquiry.text("check");
}

} // namespace
} // namespace rks_test
