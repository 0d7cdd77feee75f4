// Words, UTF-8, aligned output.
#include "aligned.h"
#include "utf8.h"
#include "words.h"

#include <gtest/gtest.h>

#include <sstream>

namespace rankstead::client {
namespace {

TEST(Words, FoldedAndHyphenated) {
    EXPECT_EQ(folded("Chance-Interval"), "chance interval");
    EXPECT_EQ(folded("n_first"), "n first");
    EXPECT_EQ(hyphenated("Chance interval"), "chance-interval");
}

TEST(Words, InQuotesOnOneLine) {
    EXPECT_EQ(in_quotes("a\nb"), "\"a b\"");
    EXPECT_EQ(list_in_quotes({"a", "b"}), "\"a\", \"b\"");
}

TEST(Words, ALongListIsShortened) {
    const std::string list = list_in_quotes(std::vector<std::string>(33, "x"));
    EXPECT_TRUE(list.ends_with("\"x\", and 3 more")) << list;
}

TEST(Words, Decimal) {
    EXPECT_EQ(decimal("10"), 10.0);
    EXPECT_EQ(decimal("-2.5"), -2.5);
    EXPECT_EQ(decimal("+2.5"), 2.5);
    EXPECT_EQ(decimal("1e3"), 1000.0);
    for (const char* text : {"", "+", "+-1", "1,5", "1 ", "inf", "nan", "ten", "1e999"}) {
        EXPECT_FALSE(decimal(text).has_value()) << text;
    }
}

TEST(Words, Shortest) {
    EXPECT_EQ(shortest(0.1), "0.1");
    EXPECT_EQ(shortest(-5.25), "-5.25");
    EXPECT_EQ(shortest(10), "10");
}

TEST(Words, Counted) {
    EXPECT_EQ(counted(1, "row"), "1 row");
    EXPECT_EQ(counted(0, "row"), "0 rows");
}

TEST(Utf8, Valid) {
    for (const char* text :
         {"", "plain", "\xC3\xA9", "\xE2\x89\xA4", "\xF0\x9F\x98\x80", "\xEF\xBF\xBF", "\xF4\x8F\xBF\xBF"}) {
        EXPECT_TRUE(is_utf8_text(text)) << text;
    }
}

TEST(Utf8, Invalid) {
    const std::string_view with_zero("a\0b", 3);
    EXPECT_FALSE(is_utf8_text(with_zero));
    for (const char* text : {"\x80", "\xC3", "\xC0\xAF", "\xE0\x80\xAF", "\xED\xA0\x80", "\xF0\x80\x80\xAF",
                             "\xF4\x90\x80\x80", "\xF5\x80\x80\x80", "\xE2\x89", "\xC3(", "\xFF\xFE"}) {
        EXPECT_FALSE(is_utf8_text(text)) << text;
    }
}

TEST(Utf8, CountsCharacters) {
    EXPECT_EQ(character_count("a\xC3\xA9\xE2\x89\xA4"), 3U);
}

std::string aligned(const std::vector<Line>& lines, std::size_t width) {
    std::ostringstream out;
    print_aligned(lines, width, out);
    return out.str();
}

TEST(Aligned, ValuesBeginInOneColumn) {
    EXPECT_EQ(aligned({{"p", "0.5"}, {"estimate", "2"}}, 40), "p         0.5\nestimate  2\n");
}

TEST(Aligned, AccentsCountOnce) {
    EXPECT_EQ(aligned({{"\xC3\xA9", "1"}, {"ab", "2"}}, 40), "\xC3\xA9   1\nab  2\n");
}

TEST(Aligned, LongValuesAreBrokenBetweenWords) {
    EXPECT_EQ(aligned({{"ab", "one two three"}}, 11), "ab  one two\n    three\n");
    EXPECT_EQ(aligned({{"ab", "incomprehensibilities x"}}, 11), "ab  incomprehensibilities\n    x\n");
}

TEST(Aligned, EmptyValue) {
    EXPECT_EQ(aligned({{"z", ""}, {"p", "1"}}, 40), "z\np  1\n");
}

} // namespace
} // namespace rankstead::client
