// The JSON object for programs.
#include "command.h"
#include "expected.h"

#include <rankstead.h>

#include <gtest/gtest.h>
#include <nlohmann/json.hpp>

namespace rankstead::client_tests {
namespace {

using nlohmann::json;

json parsed(const Outcome& outcome) {
    return json::parse(outcome.out);
}

Outcome groups(const std::string& file, std::vector<std::string> more = {}) {
    std::vector<std::string> words{"groups", file, "--first", "old", "--second", "new", "--json"};
    words.insert(words.end(), more.begin(), more.end());
    return rankstead(words);
}

TEST(JsonOutput, NumbersAreNumbers) {
    const json object = parsed(groups("groups.csv"));
    EXPECT_EQ(object["study"], "groups");
    EXPECT_NEAR(object["answers"]["p"].get<double>(), groups_p, 1e-15);
    EXPECT_EQ(object["answers"]["estimate"].get<double>(), groups_estimate);
    EXPECT_TRUE(object["answers"]["n"].is_number_integer());
    EXPECT_EQ(object["answers"]["n"], 15);
    EXPECT_TRUE(object["answers"]["sentence"].is_string());
    EXPECT_EQ(object["caution"], rks_caution_line());
    EXPECT_EQ(object["build"], rks_build());
}

TEST(JsonOutput, BlankIsNull) {
    const Outcome outcome = groups("groups.csv");
    EXPECT_EQ(outcome.status, 0);
    EXPECT_TRUE(parsed(outcome)["answers"].at("z").is_null());
}

TEST(JsonOutput, HasEveryAnswerOfTheStudyButTheTable) {
    const json answers = parsed(groups("groups.csv"))["answers"];
    const auto study = [] {
        for (std::size_t i = 0; i < rks_study_count(); ++i) {
            if (std::string(rks_study_word(i)) == "groups") {
                return i;
            }
        }
        return rks_study_count();
    }();
    std::size_t count = 0;
    for (std::size_t i = 0; i < rks_answer_count(); ++i) {
        if (rks_answer_fits(i, study) == 1 && rks_answer_kind(i) != RKS_ANSWER_TABLE) {
            EXPECT_TRUE(answers.contains(rks_answer_word(i))) << rks_answer_word(i);
            ++count;
        }
    }
    EXPECT_EQ(answers.size(), count);
    EXPECT_GT(count, 20U);
}

TEST(JsonOutput, OnlyTheAnswersAskedFor) {
    const json object = parsed(groups("groups.csv", {"--answer", "p", "--answer", "method"}));
    EXPECT_EQ(object["answers"].size(), 2U);
    EXPECT_TRUE(object["answers"]["p"].is_number());
    EXPECT_TRUE(object["answers"]["method"].is_string());
}

TEST(JsonOutput, ANumberThatDoesNotExistIsNullWithItsReason) {
    const Outcome outcome = groups("few.csv");
    EXPECT_EQ(outcome.status, 0);
    EXPECT_TRUE(parsed(outcome)["answers"].at("lower").is_null());
    EXPECT_TRUE(contains(parsed(outcome)["messages"].dump(), "lower: Not computed: "));
}

TEST(JsonOutput, ANumberAskedForThatDoesNotExistIsAFailure) {
    const Outcome outcome = groups("few.csv", {"--answer", "lower"});
    EXPECT_EQ(outcome.status, 3);
    EXPECT_TRUE(parsed(outcome)["answers"].at("lower").is_null());
    EXPECT_TRUE(contains(outcome.err, "rankstead: lower: "));
}

TEST(JsonOutput, BadDataAreAMessage) {
    const Outcome outcome = groups("limit.csv");
    EXPECT_EQ(outcome.status, 3);
    EXPECT_TRUE(parsed(outcome)["answers"].at("p").is_null());
    EXPECT_TRUE(contains(parsed(outcome)["messages"].at(0).get<std::string>(), "limit.csv, column \"old\", row 3"));
    EXPECT_TRUE(contains(outcome.err, "limit.csv, column \"old\", row 3"));
}

TEST(JsonOutput, RowsLeftOutAreAMessage) {
    const Outcome outcome = rankstead({"pairs", "pairs_long.csv", "--values", "minutes", "--labels", "period", "--id",
                                       "patient", "--before", "before", "--after", "after", "--json"});
    EXPECT_TRUE(contains(parsed(outcome)["messages"].dump(), "2 rows left out"));
}

TEST(JsonOutput, TheTableOnlyWhenAskedFor) {
    const json table = parsed(groups("groups.csv", {"--answer", "report"}))["answers"]["report"];
    ASSERT_TRUE(table.is_array());
    ASSERT_GT(table.size(), 5U);
    EXPECT_EQ(table[0].size(), 2U);
}

} // namespace
} // namespace rankstead::client_tests
