// refusal.h: why something cannot be done.
#include "refusal.h"

#include <gtest/gtest.h>

#include <set>

namespace rankstead {
namespace {

TEST(StatusText, has_its_own_sentence_for_every_status) {
    std::set<std::string_view> sentences;
    const std::vector<std::int32_t> pinned{0, 1, 10, 11, 12, 13, 14, 15, 16, 17, 30, 31, 32, 33, 50, 70, 71};
    for (const std::int32_t status : pinned) {
        sentences.insert(status_text(status));
        EXPECT_NE(status_text(status), status_text(-1)) << status;
        EXPECT_TRUE(status_text(status).ends_with('.')) << status;
    }
    EXPECT_EQ(sentences.size(), pinned.size());
}

TEST(StatusText, says_so_for_a_number_that_is_no_status) {
    EXPECT_EQ(status_text(999), "There is no such status number.");
    EXPECT_EQ(status_text(-5), "There is no such status number.");
}

TEST(Place, names_the_row_of_a_column) {
    EXPECT_EQ(in_words(Place{"after", 7, 1, 1}), "after, row 7");
}

TEST(Place, names_the_column_too_in_a_block) {
    EXPECT_EQ(in_words(Place{"after", 7, 2, 3}), "after, row 7, column 2");
}

TEST(Refusal, puts_the_place_before_the_reason) {
    const Refusal refusal(Status::bad_data, "this is infinite.", {"values", 2, 1, 1});
    EXPECT_EQ(refusal.message(), "values, row 2: this is infinite.");
    EXPECT_EQ(refusal.reason(), "this is infinite.");
    EXPECT_STREQ(refusal.what(), refusal.message().c_str());
}

TEST(Refusal, without_a_place_is_its_reason) {
    const Refusal refusal(Status::no_data, "nothing is there.");
    EXPECT_EQ(refusal.message(), "nothing is there.");
    EXPECT_FALSE(refusal.place());
    EXPECT_EQ(refusal.status(), Status::no_data);
}

} // namespace
} // namespace rankstead
