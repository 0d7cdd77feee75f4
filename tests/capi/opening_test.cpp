// rks_inquiry_new, _numbers, _cells: what they take and what they refuse.
#include "inquiry.h"

#include <gtest/gtest.h>

#include <cmath>
#include <cstdint>

namespace rks_test {
namespace {

constexpr const char* not_utf8 = "p\xff\xfe";

TEST(Opening, knows_the_three_studies) {
    for (const char* study : {"single", "pairs", "groups"})
        EXPECT_NO_THROW(Inquiry{study}) << study;
}

TEST(Opening, refuses_null_pointers) {
    rks_inquiry* out = reinterpret_cast<rks_inquiry*>(&out);
    EXPECT_EQ(rks_inquiry_new(nullptr, &out), RKS_BAD_CALL);
    EXPECT_EQ(out, nullptr);
    EXPECT_EQ(rks_inquiry_new("pairs", nullptr), RKS_BAD_CALL);
    EXPECT_EQ(rks_inquiry_new(nullptr, nullptr), RKS_BAD_CALL);
}

TEST(Opening, an_unknown_study_gives_no_handle) {
    for (const char* study : {"", "triplets", "pairs!", "RKS.PAIRS.X"}) {
        rks_inquiry* out = reinterpret_cast<rks_inquiry*>(&out);
        EXPECT_EQ(rks_inquiry_new(study, &out), RKS_UNKNOWN_STUDY) << study;
        EXPECT_EQ(out, nullptr) << study;
    }
}

TEST(Opening, a_study_that_is_not_utf8_is_refused) {
    rks_inquiry* out = nullptr;
    EXPECT_EQ(rks_inquiry_new(not_utf8, &out), RKS_BAD_CALL);
    EXPECT_EQ(out, nullptr);
}

TEST(Opening, study_words_fold_case) {
    for (const char* study : {"Pairs", "GROUPS", " single "})
        EXPECT_NO_THROW(Inquiry{study}) << study;
}

TEST(Opening, releasing_nothing_is_fine) {
    rks_inquiry_free(nullptr);
}

TEST(Opening, every_call_refuses_a_null_handle) {
    const double value = 1;
    const rks_cell cell = number_cell(1);
    double number = 0;
    const char* text = nullptr;
    const rks_cell* cells = nullptr;
    std::size_t rows = 0, columns = 0;
    EXPECT_EQ(rks_inquiry_numbers(nullptr, "values", &value, 1, 1), RKS_BAD_CALL);
    EXPECT_EQ(rks_inquiry_cells(nullptr, "values", &cell, 1, 1), RKS_BAD_CALL);
    EXPECT_EQ(rks_inquiry_set(nullptr, "side", "lower"), RKS_BAD_CALL);
    EXPECT_EQ(rks_inquiry_run(nullptr), RKS_BAD_CALL);
    EXPECT_EQ(rks_inquiry_number(nullptr, "p", &number), RKS_BAD_CALL);
    EXPECT_TRUE(std::isnan(number));
    EXPECT_EQ(rks_inquiry_text(nullptr, "p", &text, nullptr), RKS_BAD_CALL);
    EXPECT_EQ(rks_inquiry_table(nullptr, "report", &cells, &rows, &columns), RKS_BAD_CALL);
    EXPECT_NE(rks_inquiry_message(nullptr), nullptr);
    EXPECT_NE(rks_inquiry_where(nullptr, nullptr, nullptr, nullptr, nullptr), RKS_OK);
}

TEST(Opening, every_call_refuses_null_pointers) {
    Inquiry inquiry("single");
    const double value = 1;
    const rks_cell cell = number_cell(1);
    EXPECT_EQ(rks_inquiry_numbers(inquiry.handle(), nullptr, &value, 1, 1), RKS_BAD_CALL);
    EXPECT_EQ(rks_inquiry_numbers(inquiry.handle(), "values", nullptr, 1, 1), RKS_BAD_CALL);
    EXPECT_EQ(rks_inquiry_cells(inquiry.handle(), nullptr, &cell, 1, 1), RKS_BAD_CALL);
    EXPECT_EQ(rks_inquiry_cells(inquiry.handle(), "values", nullptr, 1, 1), RKS_BAD_CALL);
    EXPECT_EQ(rks_inquiry_cells(inquiry.handle(), "settings", nullptr, 1, 1), RKS_BAD_CALL);
    EXPECT_EQ(rks_inquiry_set(inquiry.handle(), nullptr, "lower"), RKS_BAD_CALL);
    EXPECT_EQ(rks_inquiry_set(inquiry.handle(), "side", nullptr), RKS_BAD_CALL);
    EXPECT_FALSE(inquiry.message().empty());
}

TEST(Opening, answers_refuse_null_pointers) {
    const auto inquiry = single({1, 2, 3}, 0);
    const char* text = nullptr;
    const rks_cell* cells = nullptr;
    std::size_t rows = 0, columns = 0;
    double number = 0;
    EXPECT_EQ(rks_inquiry_number(inquiry.handle(), "p", nullptr), RKS_BAD_CALL);
    EXPECT_EQ(rks_inquiry_number(inquiry.handle(), nullptr, &number), RKS_BAD_CALL);
    EXPECT_EQ(rks_inquiry_text(inquiry.handle(), "p", nullptr, nullptr), RKS_BAD_CALL);
    EXPECT_EQ(rks_inquiry_text(inquiry.handle(), "p", &text, nullptr), RKS_OK);
    EXPECT_EQ(rks_inquiry_table(inquiry.handle(), "report", nullptr, &rows, &columns), RKS_BAD_CALL);
    EXPECT_EQ(rks_inquiry_table(inquiry.handle(), "report", &cells, nullptr, &columns), RKS_BAD_CALL);
    EXPECT_EQ(rks_inquiry_table(inquiry.handle(), "report", &cells, &rows, nullptr), RKS_BAD_CALL);
}

TEST(Opening, refuses_sizes_that_cannot_be) {
    Inquiry inquiry("single");
    const double value = 1;
    const rks_cell cell = number_cell(1);
    EXPECT_EQ(rks_inquiry_numbers(inquiry.handle(), "values", &value, SIZE_MAX, 2), RKS_BAD_CALL);
    EXPECT_EQ(rks_inquiry_numbers(inquiry.handle(), "values", &value, 2, SIZE_MAX), RKS_BAD_CALL);
    EXPECT_EQ(rks_inquiry_numbers(inquiry.handle(), "values", &value, SIZE_MAX / 2 + 1, 2), RKS_BAD_CALL);
    EXPECT_EQ(rks_inquiry_cells(inquiry.handle(), "values", &cell, SIZE_MAX, SIZE_MAX), RKS_BAD_CALL);
    EXPECT_EQ(rks_inquiry_cells(inquiry.handle(), "settings", &cell, SIZE_MAX, 2), RKS_BAD_CALL);
}

// No memory holds that many values, so the call cannot be meant.
TEST(Opening, refuses_more_bytes_than_there_are_addresses) {
    Inquiry inquiry("single");
    const double value = 1;
    const rks_cell cell = number_cell(1);
    EXPECT_NE(rks_inquiry_numbers(inquiry.handle(), "values", &value, SIZE_MAX / sizeof(double) + 1, 1), RKS_OK);
    EXPECT_NE(rks_inquiry_cells(inquiry.handle(), "values", &cell, SIZE_MAX / sizeof(rks_cell) + 1, 1), RKS_OK);
}

TEST(Opening, an_unknown_argument_is_named_with_the_valid_words) {
    Inquiry inquiry("pairs");
    EXPECT_EQ(inquiry.numbers("first", {1, 2}), RKS_UNKNOWN_ARGUMENT);
    for (const char* word : {"before", "after"})
        EXPECT_NE(inquiry.message().find(word), std::string::npos) << inquiry.message();
}

TEST(Opening, no_values_at_all_may_be_given) {
    Inquiry inquiry("groups");
    EXPECT_EQ(rks_inquiry_numbers(inquiry.handle(), "first", nullptr, 0, 0), RKS_OK);
    EXPECT_EQ(rks_inquiry_cells(inquiry.handle(), "second", nullptr, 0, 1), RKS_OK);
    EXPECT_EQ(inquiry.run(), RKS_NO_DATA);
}

TEST(Opening, giving_an_argument_again_replaces_it) {
    auto inquiry = groups({1, 2, 3}, {4, 5, 6});
    EXPECT_EQ(inquiry.number("statistic"), 0);
    ASSERT_EQ(inquiry.numbers("first", {7, 8, 9}), RKS_OK);
    EXPECT_EQ(inquiry.status("statistic"), RKS_NOT_RUN) << "a change discards the outcome";
    ASSERT_EQ(inquiry.run(), RKS_OK);
    EXPECT_EQ(inquiry.number("statistic"), 9);
}

TEST(Opening, a_message_is_gone_after_a_success) {
    Inquiry inquiry("pairs");
    EXPECT_EQ(inquiry.set("side", "sideways"), RKS_BAD_SETTING);
    EXPECT_FALSE(inquiry.message().empty());
    EXPECT_EQ(inquiry.set("side", "lower"), RKS_OK);
    EXPECT_EQ(inquiry.message(), "");
}

TEST(Opening, columns_rows_and_blocks_are_read_row_by_row) {
    const std::vector<double> six = {3, 1, 4, 1, 5, 9};
    const auto as_column = single(six, 2);
    for (const auto& [rows, columns] : {std::pair{1U, 6U}, {2U, 3U}, {3U, 2U}}) {
        Inquiry block("single");
        ASSERT_EQ(rks_inquiry_numbers(block.handle(), "values", six.data(), rows, columns), RKS_OK);
        ASSERT_EQ(block.numbers("reference", {2}), RKS_OK);
        ASSERT_EQ(block.run(), RKS_OK);
        EXPECT_EQ(block.number("p"), as_column.number("p"));
        EXPECT_EQ(block.number("estimate"), as_column.number("estimate"));
    }
}

TEST(Opening, a_text_in_a_cell_that_is_not_utf8_is_refused) {
    Inquiry inquiry("single");
    inquiry.numbers("reference", {0});
    ASSERT_EQ(inquiry.cells("values", {number_cell(1), text_cell("\xc3\x28"), number_cell(2)}), RKS_OK);
    ASSERT_EQ(inquiry.run(), RKS_BAD_DATA) << "like any cell that cannot be used";
    ASSERT_TRUE(inquiry.where().has_value());
    EXPECT_EQ(inquiry.where()->row, 2U);
    EXPECT_EQ(inquiry.message().find('\xc3'), std::string::npos) << "messages are UTF-8";
}

TEST(Opening, cells_that_cannot_be_are_refused) {
    for (const rks_cell& cell :
         {rks_cell{99, 0, 0, nullptr, 0}, rks_cell{-1, 0, 0, nullptr, 0}, rks_cell{RKS_CELL_STATUS, 0, 30, nullptr, 0},
          rks_cell{RKS_CELL_TEXT, 0, 0, nullptr, 5}, rks_cell{RKS_CELL_NUMBER, 7, 1, nullptr, 0}}) {
        Inquiry inquiry("single");
        inquiry.numbers("reference", {0});
        const rks_status given = inquiry.cells("values", {number_cell(1), cell, number_cell(2)});
        EXPECT_EQ(given == RKS_OK ? inquiry.run() : given, RKS_BAD_CALL) << cell.kind << ' ' << cell.reserved;
    }
}

TEST(Opening, a_text_of_length_0_is_a_blank) {
    Inquiry inquiry("single");
    ASSERT_EQ(
        inquiry.cells("values", {number_cell(1), text_cell(""), {RKS_CELL_TEXT, 0, 0, nullptr, 0}, number_cell(2)}),
        RKS_OK);
    ASSERT_EQ(inquiry.numbers("reference", {0}), RKS_OK);
    ASSERT_EQ(inquiry.run(), RKS_OK) << inquiry.message();
    EXPECT_EQ(inquiry.number("n"), 2);
}

} // namespace
} // namespace rks_test
