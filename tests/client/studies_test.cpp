// The studies from a file to single answers.
#include "command.h"
#include "expected.h"

#include <gtest/gtest.h>

namespace rankstead::client_tests {
namespace {

using Words = std::vector<std::string>;

// One number answer of a run that must succeed without a message.
double number(Words words, const std::string& answer, const std::string& input = "") {
    words.insert(words.end(), {"--answer", answer});
    const Outcome outcome = rankstead(words, input);
    EXPECT_EQ(outcome.status, 0) << outcome.err;
    EXPECT_EQ(outcome.err, "");
    return as_number(outcome.out);
}

std::string text(Words words, const std::string& answer) {
    words.insert(words.end(), {"--answer", answer});
    const Outcome outcome = rankstead(words);
    EXPECT_EQ(outcome.status, 0) << outcome.err;
    return outcome.out;
}

Words groups() {
    return {"groups", "groups.csv", "--first", "old", "--second", "new"};
}
Words pairs() {
    return {"pairs", "pairs.csv", "--before", "before", "--after", "after"};
}
Words single() {
    return {"single", "single.csv", "--values", "minutes", "--reference", "10"};
}

Words with(Words words, const Words& more) {
    words.insert(words.end(), more.begin(), more.end());
    return words;
}

TEST(Studies, TwoGroups) {
    EXPECT_NEAR(number(groups(), "p"), groups_p, 1e-15);
    EXPECT_EQ(number(groups(), "estimate"), groups_estimate);
    EXPECT_EQ(number(groups(), "lower"), groups_lower);
    EXPECT_EQ(number(groups(), "upper"), groups_upper);
    EXPECT_EQ(number(groups(), "n second"), 7);
}

TEST(Studies, Pairs) {
    EXPECT_NEAR(number(pairs(), "p"), pairs_p, 1e-15);
    EXPECT_EQ(number(pairs(), "estimate"), pairs_estimate);
    EXPECT_EQ(number(pairs(), "lower"), pairs_lower);
    EXPECT_EQ(number(pairs(), "upper"), pairs_upper);
}

TEST(Studies, OneGroupAgainstANumber) {
    EXPECT_NEAR(number(single(), "p"), pairs_p, 1e-15);
    EXPECT_EQ(number(single(), "estimate"), single_estimate);
    EXPECT_EQ(number(single(), "lower"), single_lower);
    EXPECT_EQ(number(single(), "upper"), single_upper);
}

TEST(Studies, OneGroupAgainstTheNumberOfAColumn) {
    const Words words{"single", "single.csv", "--values", "minutes", "--reference", "target"};
    EXPECT_NEAR(number(words, "p"), pairs_p, 1e-15);
}

TEST(Studies, NegativeNumbersAreValuesOfOptions) {
    const Words words{"single", "single.csv", "--values", "minutes", "--reference", "-2.5"};
    EXPECT_NEAR(number(words, "p"), 2.0 / 1024, 1e-15);
    EXPECT_NEAR(number(with(pairs(), {"--margin", "-60"}), "p"), 2.0 / 1024, 1e-15);
    EXPECT_NEAR(number(with(pairs(), {"--margin=-60"}), "p"), 2.0 / 1024, 1e-15);
}

TEST(Studies, AColumnMayHaveANumberAsHeading) {
    EXPECT_NEAR(number({"groups", "years.csv", "--first", "2019", "--second", "2020"}, "p"), groups_p, 1e-15);
}

TEST(Studies, SettingsAreOptions) {
    EXPECT_NEAR(number(with(groups(), {"--side", "higher"}), "p"), groups_p_higher, 1e-15);
    EXPECT_NE(number(with(groups(), {"--chance-interval", "newcombe"}), "chance lower"),
              number(groups(), "chance lower"));
    EXPECT_TRUE(contains(text(with(groups(), {"--unit", "minutes"}), "sentence"), "minutes"));
}

TEST(Studies, HeadingsNameTheGroups) {
    const std::string sentence = text(groups(), "sentence");
    EXPECT_TRUE(contains(sentence, "old"));
    EXPECT_TRUE(contains(sentence, "new"));
}

TEST(Studies, NamesOnTheCommandLineComeFirst) {
    const std::string sentence =
        text(with(groups(), {"--first-name", "paper form", "--second-name=tablet"}), "sentence");
    EXPECT_TRUE(contains(sentence, "paper form"));
    EXPECT_TRUE(contains(sentence, "tablet"));
}

TEST(Studies, SeveralAnswersInTheOrderAsked) {
    const Outcome outcome = rankstead(with(groups(), {"--answer", "estimate", "--answer", "n first", "--answer", "n"}));
    EXPECT_EQ(outcome.out, "4.75\n8\n15\n");
}

TEST(Studies, AnswersByOtherSpellings) {
    EXPECT_EQ(text(groups(), "P value"), text(groups(), "p"));
    EXPECT_EQ(text(groups(), "chance-lower"), text(groups(), "chance lower"));
}

TEST(Studies, AnAnswerThatIsBlankOnPurposeIsAnEmptyLine) {
    const Outcome outcome = rankstead(with(groups(), {"--answer", "z"}));
    EXPECT_EQ(outcome.status, 0);
    EXPECT_EQ(outcome.out, "\n");
    EXPECT_EQ(outcome.err, "");
}

TEST(Studies, ANumberThatDoesNotExist) {
    const Outcome outcome =
        rankstead({"groups", "few.csv", "--first", "old", "--second", "new", "--answer", "lower", "--answer", "n"});
    EXPECT_EQ(outcome.status, 3);
    EXPECT_EQ(outcome.out, "\n4\n");
    EXPECT_TRUE(contains(outcome.err, "rankstead: lower: Not computed: "));
}

TEST(Studies, StandardInput) {
    EXPECT_EQ(number({"groups", "-", "--first", "a", "--second", "b"}, "estimate", "a,b\n3,1\n5,2\n"), 2.5);
}

TEST(Studies, HelperGivesItsAnswer) {
    const Outcome outcome = rankstead({"build"});
    EXPECT_EQ(outcome.status, 0) << outcome.err;
    EXPECT_TRUE(contains(outcome.out, "ankstead"));
}

} // namespace
} // namespace rankstead::client_tests
