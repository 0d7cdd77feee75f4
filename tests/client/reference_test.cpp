// The reference in Markdown.
#include "command.h"

#include <rankstead.h>

#include <gtest/gtest.h>

#include <algorithm>
#include <sstream>

namespace rankstead::client_tests {
namespace {

const std::string& reference() {
    static const std::string text = rankstead({"reference"}).out;
    return text;
}

std::string escaped(std::string text) {
    for (std::size_t at = text.find('|'); at != std::string::npos; at = text.find('|', at + 2)) {
        text.insert(at, 1, '\\');
    }
    return text;
}

TEST(Reference, HasEveryStudyAndArgument) {
    for (std::size_t study = 0; study < rks_study_count(); ++study) {
        EXPECT_TRUE(contains(reference(), std::string("\n### ") + rks_study_word(study) + '\n'));
        EXPECT_TRUE(contains(reference(), '`' + std::string(rks_study_function(study)) + '`'));
        for (std::size_t i = 0; i < rks_argument_count(study); ++i) {
            EXPECT_TRUE(contains(reference(), escaped(rks_argument_help(study, i))));
        }
    }
    EXPECT_TRUE(contains(reference(), "`=RKS.GROUPS(first; second; answer; settings)`"));
    EXPECT_TRUE(contains(reference(), "`rankstead groups FILE --first COLUMN --second COLUMN`"));
}

TEST(Reference, HasEveryAnswer) {
    for (std::size_t i = 0; i < rks_answer_count(); ++i) {
        EXPECT_TRUE(contains(reference(), std::string("\n| ") + rks_answer_word(i) + " | "));
        EXPECT_TRUE(contains(reference(), escaped(rks_answer_help(i))));
    }
}

TEST(Reference, HasEverySetting) {
    for (std::size_t i = 0; i < rks_setting_count(); ++i) {
        EXPECT_TRUE(contains(reference(), std::string("\n| ") + rks_setting_word(i) + " | `--"));
        EXPECT_TRUE(contains(reference(), escaped(rks_setting_values(i))));
    }
}

TEST(Reference, EndsWithTheCaution) {
    EXPECT_TRUE(reference().ends_with(rks_caution() + std::string("\n")));
}

// Every row of a table has as many cells as its head.
TEST(Reference, TablesAreRectangular) {
    std::istringstream in(reference());
    std::ptrdiff_t bars = 0;
    std::size_t rows = 0;
    for (std::string line; std::getline(in, line);) {
        if (!line.starts_with('|')) {
            bars = 0;
            continue;
        }
        for (std::size_t at = line.find("\\|"); at != std::string::npos; at = line.find("\\|")) {
            line.erase(at, 2);
        }
        const std::ptrdiff_t count = std::count(line.begin(), line.end(), '|');
        bars = bars == 0 ? count : bars;
        EXPECT_EQ(count, bars) << line;
        ++rows;
    }
    EXPECT_GT(rows, 30U);
}

TEST(Reference, TakesNoArguments) {
    EXPECT_TRUE(refused(rankstead({"reference", "groups"}), 2, {"takes no arguments"}));
    EXPECT_EQ(rankstead({"reference", "--help"}).status, 0);
}

} // namespace
} // namespace rankstead::client_tests
