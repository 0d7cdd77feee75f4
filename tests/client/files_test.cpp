// CSV files as spreadsheets write them, and files that cannot be used.
#include "command.h"
#include "expected.h"

#include <gtest/gtest.h>

namespace rankstead::client_tests {
namespace {

Outcome groups(const std::string& file, std::vector<std::string> more = {}) {
    std::vector<std::string> words{"groups", file, "--first", "old", "--second", "new", "--answer", "p"};
    words.insert(words.end(), more.begin(), more.end());
    return rankstead(words);
}

TEST(Files, ByteOrderMarkQuotationMarksLineBreaksEmptyLines) {
    EXPECT_NEAR(as_number(groups("spreadsheet.csv").out), groups_p, 1e-15);
}

TEST(Files, RowsAreCountedAsASpreadsheetShowsThem) {
    EXPECT_TRUE(
        refused(groups("spreadsheet_bad.csv"), 3, {"spreadsheet_bad.csv, column \"old\", row 10: ", "\"about 10\""}));
}

TEST(Files, SemicolonsAndDecimalCommas) {
    EXPECT_NEAR(as_number(groups("semicolon.csv", {"--separator", ";", "--numbers", "comma"}).out), groups_p, 1e-15);
}

TEST(Files, Tabs) {
    for (const char* tab : {"tab", "\t", "\\t"}) {
        EXPECT_NEAR(as_number(groups("tabs.csv", {"--separator", tab, "--numbers", "comma"}).out), groups_p, 1e-15);
    }
}

TEST(Files, ADecimalCommaIsNotGuessed) {
    EXPECT_TRUE(refused(groups("semicolon.csv", {"--separator", ";"}), 3,
                        {"semicolon.csv, column \"old\", row 2: ", "\"12,0\"", "comma"}));
}

TEST(Files, AnotherSeparatorIsSuggested) {
    EXPECT_TRUE(refused(rankstead({"groups", "-", "--first", "old", "--second", "new"}, "old;new\n1;2\n"), 2,
                        {"standard input has no column \"old\"", "--separator ';'"}));
    EXPECT_TRUE(refused(rankstead({"groups", "-", "--first", "old", "--second", "new"}, "old\tnew\n1\t2\n"), 2,
                        {"--separator tab"}));
}

TEST(Files, UnknownColumn) {
    EXPECT_TRUE(refused(rankstead({"groups", "groups.csv", "--first", "Old", "--second", "new"}), 2,
                        {"groups.csv has no column \"Old\" (--first)", "\"room\", \"old\", \"new\""}));
}

TEST(Files, OnlyNumbersInsteadOfColumns) {
    EXPECT_TRUE(refused(rankstead({"groups", "groups.csv", "--first", "3", "--second", "4"}), 2,
                        {"groups.csv has no column \"3\" (--first)"}));
}

TEST(Files, RaggedRows) {
    EXPECT_TRUE(refused(groups("ragged.csv"), 3, {"ragged.csv, row 3: 3 cells where the headings in row 1 have 2"}));
    EXPECT_TRUE(refused(groups("ragged_short.csv"), 3, {"ragged_short.csv, row 3: 1 cell where"}));
}

TEST(Files, Empty) {
    EXPECT_TRUE(refused(groups("empty.csv"), 3, {"empty.csv is empty"}));
    EXPECT_TRUE(refused(groups("headings_only.csv"), 3, {"headings_only.csv has no rows below its headings"}));
}

TEST(Files, HeadingTwice) {
    EXPECT_TRUE(refused(groups("twice.csv"), 3, {"twice.csv, row 1: the heading \"old\" stands over columns 1 and 3"}));
}

TEST(Files, Missing) {
    EXPECT_TRUE(refused(groups("nowhere.csv"), 2, {"nowhere.csv cannot be opened: No such file"}));
}

TEST(Files, Folder) {
    EXPECT_TRUE(refused(groups("."), 2, {". is a folder"}));
}

TEST(Files, NotUtf8) {
    EXPECT_TRUE(refused(groups("latin1.csv"), 3, {"latin1.csv, row 4, column 2: this is not UTF-8 text"}));
    EXPECT_TRUE(refused(groups("utf16.csv"), 3, {"utf16.csv, row 1, column 1: this is not UTF-8 text"}));
}

TEST(Files, QuotationMarkAlone) {
    EXPECT_TRUE(refused(groups("stray_quote.csv"), 3, {"stray_quote.csv, row 3: a quotation mark stands alone"}));
}

TEST(Files, ATextInTheFirstRowIsNoHeading) {
    EXPECT_TRUE(refused(groups("first_text.csv"), 3, {"first_text.csv, column \"old\", row 2: ", "\"lost\""}));
    EXPECT_TRUE(refused(rankstead({"pairs", "first_text.csv", "--before", "old", "--after", "new"}), 3,
                        {"first_text.csv, column \"old\", row 2: ", "\"lost\""}));
}

TEST(Files, MissingWords) {
    EXPECT_TRUE(refused(groups("missing_words.csv"), 3, {"missing_words.csv, column \"old\", row 2: ", "\"n/a\""}));
    const Outcome outcome = rankstead({"groups", "missing_words.csv", "--first", "old", "--second", "new", "--missing",
                                       "n/a, ND", "--answer", "n first", "--answer", "n second"});
    EXPECT_EQ(outcome.status, 0) << outcome.err;
    EXPECT_EQ(outcome.out, "4\n4\n");
}

TEST(Files, AValueBeyondALimit) {
    EXPECT_TRUE(refused(groups("limit.csv"), 3, {"limit.csv, column \"old\", row 3: ", "\"<0.5\""}));
}

TEST(Files, AColumnOfBlanks) {
    EXPECT_TRUE(refused(groups("blank_column.csv"), 3, {"blank_column.csv", "second"}));
}

TEST(Files, ANumberOnTheCommandLineIsNamedAsSuch) {
    EXPECT_TRUE(refused(rankstead({"pairs", "few.csv", "--before", "old", "--after", "3"}), 3, {"few.csv: "}));
}

TEST(Files, ANameThatIsNotUtf8) {
    const Outcome outcome = rankstead({"groups", "no\xFFsuch.csv", "--first", "a", "--second", "b", "--json"});
    EXPECT_TRUE(refused(outcome, 2, {"cannot be opened"}));
}

} // namespace
} // namespace rankstead::client_tests
