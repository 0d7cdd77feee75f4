// The report for people, which is what a sub-command prints by default.
#include "command.h"

#include "utf8.h"

#include <rankstead.h>

#include <gtest/gtest.h>

#include <sstream>

namespace rankstead::client_tests {
namespace {

std::vector<std::string> lines(const std::string& text) {
    std::vector<std::string> result;
    std::istringstream in(text);
    for (std::string line; std::getline(in, line);) {
        result.push_back(line);
    }
    return result;
}

std::vector<std::string> groups() {
    return {"groups", "groups.csv", "--first", "old", "--second", "new"};
}

TEST(Report, HoldsLabelsAndValues) {
    const Outcome outcome = rankstead(groups());
    EXPECT_EQ(outcome.status, 0);
    EXPECT_EQ(outcome.err, "");
    EXPECT_TRUE(contains(outcome.out, "\nestimate "));
    EXPECT_TRUE(contains(outcome.out, " 4.75\n"));
    EXPECT_TRUE(contains(outcome.out, " 10.5\n"));
}

// Where the value of a line begins; a line without value is its label alone.
std::size_t value_column(const std::string& line) {
    const std::size_t gap = line.find("  ");
    return gap == std::string::npos ? gap : line.find_first_not_of(' ', gap);
}

TEST(Report, ValuesBeginInOneColumn) {
    std::vector<std::size_t> columns;
    for (const std::string& line : lines(rankstead(groups()).out)) {
        if (line.empty()) {
            break;
        }
        if (const std::size_t column = value_column(line); column != std::string::npos) {
            columns.push_back(column);
        }
    }
    ASSERT_GT(columns.size(), 20U);
    EXPECT_EQ(columns, std::vector<std::size_t>(columns.size(), columns.front()));
}

TEST(Report, NoLineEndsInBlanks) {
    for (const std::string& line : lines(rankstead(groups()).out)) {
        EXPECT_FALSE(line.ends_with(' ')) << line;
    }
}

TEST(Report, LinesFitAPage) {
    for (const std::string& line : lines(rankstead(groups()).out)) {
        if (line != rks_caution_line()) {
            EXPECT_LE(client::character_count(line), 100U) << line;
        }
    }
}

TEST(Report, EndsWithTheCaution) {
    EXPECT_EQ(lines(rankstead(groups()).out).back(), rks_caution_line());
}

TEST(Report, GivesTheReasonWhereANumberDoesNotExist) {
    const Outcome outcome = rankstead({"groups", "few.csv", "--first", "old", "--second", "new"});
    EXPECT_EQ(outcome.status, 0) << outcome.err;
    EXPECT_TRUE(contains(outcome.out, "Not computed: "));
}

TEST(Report, TellsWhichRowsWereLeftOut) {
    const Outcome outcome = rankstead({"pairs", "pairs_long.csv", "--values", "minutes", "--labels", "period", "--id",
                                       "patient", "--before", "before", "--after", "after"});
    EXPECT_EQ(outcome.status, 0) << outcome.err;
    EXPECT_TRUE(contains(outcome.out, "2 rows left out"));
}

TEST(Report, AsATableAnswer) {
    std::vector<std::string> words = groups();
    words.insert(words.end(), {"--answer", "report"});
    const Outcome outcome = rankstead(words);
    EXPECT_EQ(outcome.status, 0) << outcome.err;
    EXPECT_TRUE(contains(outcome.out, " 4.75\n"));
    EXPECT_FALSE(contains(outcome.out, rks_caution_line()));
}

} // namespace
} // namespace rankstead::client_tests
