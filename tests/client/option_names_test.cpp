// Names of options when words clash, which no study of today's catalogue shows.
#include "option_names.h"

#include <gtest/gtest.h>

namespace rankstead::client {
namespace {

std::vector<std::string> options(const std::vector<OptionName>& names) {
    std::vector<std::string> result;
    result.reserve(names.size());
    for (const OptionName& name : names) {
        result.push_back(name.option);
    }
    return result;
}

using Words = std::vector<std::string>;

TEST(OptionNames, AreTheWordsWithHyphens) {
    const OptionNames names = option_names({"first", "second"}, {"side", "chance interval"});
    EXPECT_EQ(options(names.data), (Words{"first", "second"}));
    EXPECT_EQ(options(names.settings), (Words{"side", "chance-interval"}));
    EXPECT_EQ(names.settings[1].word, "chance interval");
    EXPECT_TRUE(names.long_layout);
}

TEST(OptionNames, ASettingWithTheNameOfAnArgument) {
    EXPECT_EQ(options(option_names({"order"}, {"order"}).settings), Words{"setting-order"});
}

TEST(OptionNames, WordsOfTheClientItself) {
    EXPECT_EQ(options(option_names({"answer"}, {}).data), Words{"data-answer"});
    EXPECT_EQ(options(option_names({}, {"separator"}).settings), Words{"setting-separator"});
}

TEST(OptionNames, WordsOfTheLongLayout) {
    EXPECT_EQ(options(option_names({"first", "second"}, {"labels"}).settings), Words{"setting-labels"});
    EXPECT_EQ(options(option_names({"one"}, {"labels"}).settings), Words{"labels"});
}

TEST(OptionNames, NoLongLayoutForAStudyThatTakesLabels) {
    const OptionNames names = option_names({"values", "labels"}, {});
    EXPECT_FALSE(names.long_layout);
    EXPECT_EQ(options(names.data), (Words{"values", "labels"}));
}

TEST(OptionNames, NoLongLayoutForOneArgument) {
    EXPECT_FALSE(option_names({"table"}, {}).long_layout);
}

TEST(OptionNames, APrefixThatClashesToo) {
    EXPECT_EQ(options(option_names({"answer", "data answer"}, {}).data), (Words{"data-answer", "data-data-answer"}));
}

} // namespace
} // namespace rankstead::client
