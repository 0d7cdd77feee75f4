// words.h: how words from cells are compared.
#include "words.h"

#include <gtest/gtest.h>

namespace rankstead {
namespace {

TEST(Folded, makes_case_hyphens_underscores_and_runs_of_spaces_the_same) {
    EXPECT_EQ(folded("Two-Sided"), "two sided");
    EXPECT_EQ(folded("two_sided"), "two sided");
    EXPECT_EQ(folded("  TWO \t sided - "), "two sided");
}

TEST(Folded, leaves_letters_beyond_ascii_alone) {
    EXPECT_EQ(folded("\xC3\x84rzte"), "\xC3\x84rzte");
}

TEST(FoldedLabel, drops_a_parenthesis_and_trailing_colons) {
    EXPECT_EQ(folded_label("Estimate (days):"), "estimate");
    EXPECT_EQ(folded_label("P-value :: "), "p value");
    EXPECT_EQ(folded_label("chance lower:"), "chance lower");
}

TEST(FoldedLabel, is_empty_for_a_mere_parenthesis) {
    EXPECT_EQ(folded_label("(p)"), "");
}

TEST(Split, keeps_empty_parts) {
    EXPECT_EQ(split("a;;b;", ';'), (std::vector<std::string_view>{"a", "", "b", ""}));
    EXPECT_EQ(split("", ';'), (std::vector<std::string_view>{""}));
}

// Well-formed and ill-formed sequences of the Unicode Standard 15.0, table 3-7.
TEST(IsUtf8, accepts_every_well_formed_length) {
    for (const char* words : {"", "plain", "\xC2\x80", "\xDF\xBF", "\xE0\xA0\x80", "\xED\x9F\xBF", "\xEF\xBF\xBD",
                              "\xF0\x90\x80\x80", "\xF4\x8F\xBF\xBF"}) {
        EXPECT_TRUE(is_utf8(words)) << words;
    }
}

TEST(IsUtf8, refuses_overlong_forms_surrogates_and_broken_sequences) {
    for (const char* words : {"\x80", "\xC0\x80", "\xC1\xBF", "\xE0\x9F\xBF", "\xED\xA0\x80", "\xF0\x8F\xBF\xBF",
                              "\xF4\x90\x80\x80", "\xF5\x80\x80\x80", "\xFF", "a\xC3", "\xE2\x82", "\xE2\x28\xA1"}) {
        EXPECT_FALSE(is_utf8(words)) << words;
    }
}

TEST(Listed, joins_with_commas_and_or) {
    EXPECT_EQ(listed({}), "");
    EXPECT_EQ(listed({"a"}), "a");
    EXPECT_EQ(listed({"a", "b"}), "a or b");
    EXPECT_EQ(listed({"a", "b", "c"}), "a, b or c");
}

} // namespace
} // namespace rankstead
