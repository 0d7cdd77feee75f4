// rks_inquiry_number, _text, _table: statuses, words, and what a failed run leaves behind.
#include "inquiry.h"

#include <gtest/gtest.h>

#include <cmath>

namespace rks_test {
namespace {

Inquiry small() {
    return groups({5, 7, 8, 9, 12, 14}, {1, 3, 7, 4, 2, 6, 5});
}

bool begins_with(const std::string& text, std::string_view start) {
    return text.rfind(start, 0) == 0;
}

TEST(Answers, nothing_is_answered_before_a_run) {
    Inquiry inquiry("groups");
    EXPECT_EQ(inquiry.status("p"), RKS_NOT_RUN);
    EXPECT_TRUE(std::isnan(inquiry.number("p")));
    EXPECT_EQ(inquiry.text_status("sentence"), RKS_NOT_RUN);
    EXPECT_FALSE(inquiry.message().empty());
    const rks_cell* cells = nullptr;
    std::size_t rows = 0, columns = 0;
    EXPECT_EQ(rks_inquiry_table(inquiry.handle(), "report", &cells, &rows, &columns), RKS_NOT_RUN);
}

TEST(Answers, an_unknown_answer_lists_the_valid_words) {
    const auto inquiry = small();
    double number = 0;
    EXPECT_EQ(rks_inquiry_number(inquiry.handle(), "p-valeu", &number), RKS_UNKNOWN_ANSWER);
    EXPECT_TRUE(std::isnan(number));
    for (const char* word : {"p", "estimate", "lower", "upper", "chance", "sentence"})
        EXPECT_NE(inquiry.message().find(word), std::string::npos) << inquiry.message();
    EXPECT_EQ(inquiry.text_status("p-valeu"), RKS_UNKNOWN_ANSWER);
}

TEST(Answers, words_that_are_not_utf8_are_refused) {
    EXPECT_EQ(small().status("p\xff"), RKS_BAD_CALL);
    EXPECT_EQ(small().text_status("p\xff"), RKS_BAD_CALL);
}

TEST(Answers, words_fold_case_hyphens_spaces_colon_and_parenthesis) {
    const auto inquiry = small();
    for (const char* word : {"p", "P", " p ", "p:", "P value", "p-value", "p_value:", "P-VALUE (two-sided):", "p ("})
        EXPECT_EQ(inquiry.number(word), inquiry.number("p")) << word;
    for (const char* word : {"Estimate (days):", "ESTIMATE", "estimate:", "estimate : "})
        EXPECT_EQ(inquiry.number(word), inquiry.number("estimate")) << word;
    for (const char* word : {"Median first", "median-first", "MEDIAN_FIRST:", "median   first"})
        EXPECT_EQ(inquiry.number(word), inquiry.number("median first")) << word;
}

TEST(Answers, the_default_is_the_sentence) {
    const auto inquiry = small();
    const char* text = nullptr;
    std::size_t length = 0;
    ASSERT_EQ(rks_inquiry_text(inquiry.handle(), nullptr, &text, &length), RKS_OK);
    EXPECT_EQ(std::string(text, length), inquiry.text("sentence"));
    EXPECT_EQ(inquiry.text(""), inquiry.text("sentence"));
    EXPECT_FALSE(inquiry.text("").empty());
}

TEST(Answers, a_text_is_no_number_and_a_table_is_neither) {
    const auto inquiry = small();
    for (const char* word : {"sentence", "methods", "notes", "ledger", "check", "stamp", "arrangements", "report", ""})
        EXPECT_EQ(inquiry.status(word), RKS_WRONG_KIND) << word;
    EXPECT_TRUE(std::isnan(inquiry.number("sentence")));
    EXPECT_EQ(inquiry.text_status("report"), RKS_WRONG_KIND);
}

TEST(Answers, a_number_as_text_is_shortest_and_unrounded) {
    const auto inquiry = small();
    for (const char* word : {"p", "estimate", "lower", "upper", "chance", "statistic"})
        EXPECT_EQ(std::strtod(inquiry.text(word).c_str(), nullptr), inquiry.number(word)) << word;
    EXPECT_EQ(groups({3}, {1}).text("estimate"), "2");
    EXPECT_EQ(groups({0.3}, {0.1}).text("estimate"), "0.2");
}

TEST(Answers, a_blank_answer_is_empty) {
    const auto inquiry = small();
    EXPECT_EQ(inquiry.status("z"), RKS_BLANK) << "the exact law was used";
    EXPECT_TRUE(std::isnan(inquiry.number("z")));
    EXPECT_EQ(inquiry.text_status("z"), RKS_BLANK);
    EXPECT_EQ(inquiry.text("z"), "");
}

TEST(Answers, a_limit_that_no_data_has_says_why) {
    const auto inquiry = groups({1, 2, 3}, {4, 5, 6});
    EXPECT_EQ(inquiry.status("p"), RKS_OK);
    for (const char* limit : {"lower", "upper"}) {
        EXPECT_EQ(inquiry.status(limit), RKS_NO_ANSWER);
        EXPECT_TRUE(std::isnan(inquiry.number(limit)));
        EXPECT_TRUE(begins_with(inquiry.text(limit), "Not computed: ")) << inquiry.text(limit);
        EXPECT_NE(inquiry.text(limit).find("90"), std::string::npos) << "the largest level: " << inquiry.text(limit);
    }
    EXPECT_NE(inquiry.text("notes").find("90"), std::string::npos) << inquiry.text("notes");
    EXPECT_NE(inquiry.text("check"), "ok");
}

TEST(Answers, a_one_sided_test_has_one_limit_and_says_so) {
    const auto higher = groups({11, 12, 13, 14}, {1, 2, 3, 4, 5}, {{"side", "higher"}});
    EXPECT_EQ(higher.status("lower"), RKS_OK);
    EXPECT_EQ(higher.status("upper"), RKS_NO_ANSWER);
    EXPECT_NE(higher.text("upper").find("side"), std::string::npos) << higher.text("upper");
    const auto lower = groups({11, 12, 13, 14}, {1, 2, 3, 4, 5}, {{"side", "lower"}});
    EXPECT_EQ(lower.status("lower"), RKS_NO_ANSWER);
    EXPECT_EQ(lower.status("upper"), RKS_OK);
}

TEST(Answers, after_a_failed_run_texts_say_why) {
    Inquiry inquiry("pairs");
    ASSERT_EQ(inquiry.numbers("before", {1, 2, 3}), RKS_OK);
    ASSERT_EQ(inquiry.numbers("after", {1, 2}), RKS_OK);
    ASSERT_EQ(inquiry.run(), RKS_UNEQUAL_LENGTHS);
    EXPECT_EQ(inquiry.status("p"), RKS_UNEQUAL_LENGTHS);
    EXPECT_TRUE(std::isnan(inquiry.number("p")));
    const auto reason = inquiry.text("check");
    EXPECT_FALSE(reason.empty());
    EXPECT_FALSE(begins_with(reason, "Not computed")) << reason;
    for (const char* word : {"sentence", "notes", "ledger", "method", "p", "estimate", ""}) {
        EXPECT_EQ(inquiry.text_status(word), RKS_UNEQUAL_LENGTHS) << word;
        EXPECT_EQ(inquiry.text(word), "Not computed: " + reason) << word;
    }
}

TEST(Answers, after_a_failed_run_an_unknown_word_is_still_unknown) {
    Inquiry inquiry("pairs");
    ASSERT_EQ(inquiry.run(), RKS_NO_DATA);
    EXPECT_EQ(inquiry.status("p-valeu"), RKS_UNKNOWN_ANSWER);
}

TEST(Answers, check_is_ok_when_all_went_well) {
    EXPECT_EQ(small().text("check"), "ok");
}

TEST(Answers, the_report_has_two_columns_in_the_order_of_the_catalogue) {
    const auto inquiry = small();
    const rks_cell* cells = nullptr;
    std::size_t rows = 0, columns = 0;
    ASSERT_EQ(rks_inquiry_table(inquiry.handle(), "report", &cells, &rows, &columns), RKS_OK);
    ASSERT_EQ(columns, 2U);
    ASSERT_GT(rows, 10U);
    int32_t last = -1;
    for (std::size_t row = 0; row < rows; ++row) {
        const rks_cell& label = cells[2 * row];
        const rks_cell& value = cells[2 * row + 1];
        ASSERT_EQ(label.kind, RKS_CELL_TEXT);
        const std::string word(label.text, label.length);
        const int32_t answer = rks_answer_find(word.c_str());
        EXPECT_GT(answer, last) << word;
        last = answer;
        if (value.kind == RKS_CELL_NUMBER)
            EXPECT_EQ(value.number, inquiry.number(word)) << word;
        else if (value.kind == RKS_CELL_TEXT)
            EXPECT_EQ(std::string(value.text, value.length), inquiry.text(word)) << word;
        else if (value.kind == RKS_CELL_STATUS)
            EXPECT_EQ(value.number, inquiry.status(word)) << word;
        else
            EXPECT_EQ(inquiry.text(word), "") << word;
    }
}

TEST(Answers, any_answer_is_a_table_of_one_cell) {
    const auto inquiry = small();
    const rks_cell* cells = nullptr;
    std::size_t rows = 0, columns = 0;
    ASSERT_EQ(rks_inquiry_table(inquiry.handle(), "p", &cells, &rows, &columns), RKS_OK);
    EXPECT_EQ(rows * columns, 1U);
    EXPECT_EQ(cells[0].kind, RKS_CELL_NUMBER);
    EXPECT_EQ(cells[0].number, inquiry.number("p"));
    ASSERT_EQ(rks_inquiry_table(inquiry.handle(), "sentence", &cells, &rows, &columns), RKS_OK);
    EXPECT_EQ(std::string(cells[0].text, cells[0].length), inquiry.text("sentence"));
}

TEST(Answers, a_number_that_cannot_be_given_is_a_status_in_tables) {
    const auto inquiry = groups({1, 2, 3}, {4, 5, 6});
    const rks_cell* cells = nullptr;
    std::size_t rows = 0, columns = 0;
    rks_inquiry_table(inquiry.handle(), "lower", &cells, &rows, &columns);
    ASSERT_EQ(rows * columns, 1U);
    EXPECT_EQ(cells[0].kind, RKS_CELL_STATUS);
    EXPECT_EQ(cells[0].number, RKS_NO_ANSWER);
}

TEST(Answers, pointers_live_until_the_next_run) {
    const auto inquiry = small();
    const char* sentence = nullptr;
    ASSERT_EQ(rks_inquiry_text(inquiry.handle(), "sentence", &sentence, nullptr), RKS_OK);
    const std::string copy = sentence;
    for (std::size_t answer = 0; answer < rks_answer_count(); ++answer)
        inquiry.text(rks_answer_word(answer));
    inquiry.text("no such answer");
    EXPECT_EQ(copy, sentence);
}

TEST(Answers, status_texts_exist_for_any_number) {
    for (rks_status status = -5; status < 100; ++status) {
        ASSERT_NE(rks_status_text(status), nullptr);
        EXPECT_FALSE(std::string(rks_status_text(status)).empty()) << status;
    }
    EXPECT_STRNE(rks_status_text(RKS_OK), rks_status_text(RKS_BAD_DATA));
    EXPECT_STRNE(rks_status_text(RKS_NO_DATA), rks_status_text(RKS_BAD_DATA));
}

TEST(Answers, version_and_build_are_given) {
    EXPECT_EQ(rks_abi_version() / 1000, 1U);
    const std::string build = rks_build();
    EXPECT_FALSE(build.empty());
    EXPECT_EQ(build.find('\n'), std::string::npos);
}

} // namespace
} // namespace rks_test
