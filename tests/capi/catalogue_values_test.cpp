// Every study x answer and every study x setting value of the catalogue, on ordinary data.
#include "inquiry.h"

#include <gtest/gtest.h>

#include <algorithm>
#include <set>
#include <sstream>

namespace rks_test {
namespace {

Inquiry ordinary(const std::string& study) {
    Inquiry inquiry(study);
    const auto index = study_index(study);
    const std::vector<std::vector<double>> data = {{5.1, 7, 8.2, 9, 12, 14, 6, 7.7, 15}, {4, 6, 8, 9, 7, 11, 2, 5, 11}};
    for (std::size_t i = 0; i < rks_argument_count(index); ++i) {
        const std::string argument = rks_argument_word(index, i);
        EXPECT_EQ(inquiry.numbers(argument, argument == "reference" ? std::vector<double>{7} : data.at(i)), RKS_OK);
    }
    return inquiry;
}

void expect_answer(const Inquiry& inquiry, std::size_t answer, bool fits) {
    const std::string word = rks_answer_word(answer);
    const bool is_number = rks_answer_kind(answer) == RKS_ANSWER_NUMBER;
    const auto status = is_number ? inquiry.status(word) : inquiry.text_status(word);
    if (!fits)
        EXPECT_EQ(status, RKS_UNKNOWN_ANSWER) << word;
    else if (rks_answer_kind(answer) == RKS_ANSWER_TABLE)
        EXPECT_EQ(status, RKS_WRONG_KIND) << word;
    else
        EXPECT_TRUE(status == RKS_OK || status == RKS_BLANK) << word << ": " << inquiry.message();
}

TEST(CatalogueValues, every_study_gives_every_answer_that_fits) {
    for (std::size_t study = 0; study < rks_study_count(); ++study) {
        SCOPED_TRACE(rks_study_word(study));
        auto inquiry = ordinary(rks_study_word(study));
        ASSERT_EQ(inquiry.run(), RKS_OK) << inquiry.message();
        EXPECT_EQ(inquiry.text_status(rks_study_default_answer(study)), RKS_OK);
        for (std::size_t answer = 0; answer < rks_answer_count(); ++answer)
            expect_answer(inquiry, answer, rks_answer_fits(answer, study) == 1);
    }
}

std::vector<std::string> listed_values(std::size_t setting) {
    std::vector<std::string> values;
    std::istringstream list(rks_setting_values(setting));
    for (std::string value; std::getline(list, value, ',');)
        values.push_back(value.substr(std::min(value.find_first_not_of(' '), value.size())));
    return values;
}

bool takes_words(const std::string& setting) {
    static const std::set<std::string> open = {"level", "margin", "missing", "unit", "first name", "second name"};
    return open.count(setting) == 0;
}

TEST(CatalogueValues, every_listed_value_is_taken_and_answered) {
    for (const char* study : {"single", "pairs", "groups"})
        for (std::size_t setting = 0; setting < rks_setting_count(); ++setting) {
            const std::string word = rks_setting_word(setting);
            if (rks_setting_fits(setting, study_index(study)) == 0 || !takes_words(word))
                continue;
            for (const auto& value : listed_values(setting)) {
                auto inquiry = ordinary(study);
                EXPECT_EQ(inquiry.set(word, value), RKS_OK) << word << '=' << value << ": " << inquiry.message();
                EXPECT_EQ(inquiry.run(), RKS_OK) << word << '=' << value;
                const double p = inquiry.number("p");
                EXPECT_TRUE(p > 0 && p <= 1) << word << '=' << value << ": " << p;
            }
        }
}

TEST(CatalogueValues, every_default_is_taken) {
    for (const char* study : {"single", "pairs", "groups"})
        for (std::size_t setting = 0; setting < rks_setting_count(); ++setting) {
            const bool fits = rks_setting_fits(setting, study_index(study)) == 1;
            auto inquiry = ordinary(study);
            EXPECT_EQ(inquiry.set(rks_setting_word(setting), rks_setting_default(setting)),
                      fits ? RKS_OK : RKS_UNKNOWN_SETTING)
                << study << ' ' << rks_setting_word(setting);
        }
}

TEST(CatalogueValues, the_default_is_the_first_listed_value) {
    for (std::size_t setting = 0; setting < rks_setting_count(); ++setting)
        if (takes_words(rks_setting_word(setting)) && !std::string(rks_setting_default(setting)).empty()) {
            EXPECT_EQ(listed_values(setting).front(), rks_setting_default(setting)) << rks_setting_word(setting);
        }
}

} // namespace
} // namespace rks_test
