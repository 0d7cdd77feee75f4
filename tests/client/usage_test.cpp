// Commands that have to be changed, and help.
#include "command.h"

#include <rankstead.h>

#include <gtest/gtest.h>

namespace rankstead::client_tests {
namespace {

using Words = std::vector<std::string>;

Words groups() {
    return {"groups", "groups.csv", "--first", "old", "--second", "new"};
}

Outcome groups_with(const Words& more) {
    Words words = groups();
    words.insert(words.end(), more.begin(), more.end());
    return rankstead(words);
}

TEST(Usage, NoSubCommand) {
    EXPECT_TRUE(refused(rankstead({}), 2, {"rankstead --help"}));
}

TEST(Usage, UnknownSubCommandListsThoseThereAre) {
    EXPECT_TRUE(refused(rankstead({"group"}), 2, {"\"group\"", "groups", "pairs", "single", "reference", "tail"}));
}

TEST(Usage, UnknownOption) {
    EXPECT_TRUE(refused(groups_with({"--third", "x"}), 2, {"third", "See: rankstead groups --help"}));
    EXPECT_TRUE(refused(groups_with({"-x"}), 2, {"See: rankstead groups --help"}));
}

TEST(Usage, NoFile) {
    EXPECT_TRUE(refused(rankstead({"groups", "--first", "old"}), 2, {"Name the CSV file"}));
}

TEST(Usage, TwoFiles) {
    EXPECT_TRUE(refused(groups_with({"more.csv"}), 2, {"\"more.csv\" is neither"}));
}

TEST(Usage, NoColumns) {
    EXPECT_TRUE(
        refused(rankstead({"groups", "groups.csv"}), 2, {"rankstead groups FILE --first COLUMN --second COLUMN"}));
}

TEST(Usage, OneColumnOfTwo) {
    EXPECT_TRUE(refused(rankstead({"groups", "groups.csv", "--first", "old"}), 2, {"Add --second COLUMN"}));
}

TEST(Usage, AnOptionWithoutValue) {
    EXPECT_TRUE(refused(rankstead({"groups", "groups.csv", "--second", "new", "--first"}), 2, {"first"}));
    EXPECT_TRUE(refused(rankstead({"groups", "groups.csv", "--first", "--second", "new"}), 2,
                        {"--first needs a value, but \"--second\" follows it"}));
}

TEST(Usage, AnOptionTwice) {
    EXPECT_TRUE(refused(groups_with({"--first", "new"}), 2, {"--first is given 2 times"}));
    EXPECT_TRUE(refused(groups_with({"--side", "higher", "--side", "lower"}), 2, {"--side is given 2 times"}));
}

TEST(Usage, UnknownAnswerListsThoseThereAre) {
    EXPECT_TRUE(refused(groups_with({"--answer", "t"}), 2, {"no answer \"t\"", "estimate", "chance lower"}));
}

TEST(Usage, UnknownValueOfASettingListsThoseThereAre) {
    EXPECT_TRUE(refused(groups_with({"--side", "left"}), 2, {"--side left: ", "higher", "lower"}));
    EXPECT_TRUE(refused(groups_with({"--level", "2"}), 2, {"--level 2: "}));
}

TEST(Usage, ASettingOfAnotherStudy) {
    EXPECT_TRUE(refused(groups_with({"--zeros", "pratt"}), 2, {"zeros", "See: rankstead groups --help"}));
}

TEST(Usage, Separator) {
    for (const char* separator : {"", "::", "\"", "\n", "\xC3\xA9"}) {
        EXPECT_TRUE(refused(groups_with({"--separator", separator}), 2, {"--separator takes one character"}));
    }
}

TEST(Usage, LongLayoutOnlyForSeveralArguments) {
    EXPECT_TRUE(refused(rankstead({"single", "single.csv", "--values", "minutes", "--labels", "visit"}), 2,
                        {"labels", "See: rankstead single --help"}));
}

TEST(Usage, HelperTakesNoFile) {
    EXPECT_TRUE(refused(rankstead({"build", "groups.csv"}), 2, {"\"groups.csv\" is neither"}));
}

TEST(Usage, Help) {
    const Outcome outcome = rankstead({"--help"});
    EXPECT_EQ(outcome.status, 0);
    EXPECT_TRUE(contains(outcome.out, "rankstead groups FILE --first COLUMN --second COLUMN"));
    EXPECT_TRUE(contains(outcome.out, "rankstead critical"));
    EXPECT_TRUE(contains(outcome.out, "Exit status: "));
    EXPECT_TRUE(contains(outcome.out, rks_caution_line()));
}

TEST(Usage, HelpOfAStudyNamesEveryArgumentAndSetting) {
    for (std::size_t study = 0; study < rks_study_count(); ++study) {
        const Outcome outcome = rankstead({rks_study_word(study), "--help"});
        EXPECT_EQ(outcome.status, 0) << outcome.err;
        EXPECT_TRUE(contains(outcome.out, rks_study_help(study)));
        for (std::size_t i = 0; i < rks_argument_count(study); ++i) {
            EXPECT_TRUE(contains(outcome.out, std::string("--") + rks_argument_word(study, i)));
        }
    }
    EXPECT_TRUE(contains(rankstead({"groups", "--help"}).out, "--chance-interval VALUE"));
    EXPECT_FALSE(contains(rankstead({"single", "--help"}).out, "--labels"));
}

TEST(Usage, Version) {
    const Outcome outcome = rankstead({"--version"});
    EXPECT_EQ(outcome.status, 0);
    EXPECT_EQ(outcome.out, std::string(rks_build()) + '\n');
}

TEST(Usage, AVeryLongArgument) {
    EXPECT_TRUE(refused(rankstead({"groups", "groups.csv", "--first", std::string(100000, 'x')}), 2, {"no column"}));
}

} // namespace
} // namespace rankstead::client_tests
