// The catalogue through its accessors.
#include "inquiry.h"

#include <gtest/gtest.h>

#include <functional>
#include <set>
#include <string>

namespace rks_test {
namespace {

std::string text_or_empty(const char* text) {
    return text == nullptr ? "" : text;
}

void expect_distinct(std::size_t count, const std::function<const char*(std::size_t)>& word) {
    std::set<std::string> seen;
    for (std::size_t i = 0; i < count; ++i) {
        ASSERT_NE(word(i), nullptr);
        EXPECT_FALSE(std::string(word(i)).empty());
        EXPECT_TRUE(seen.insert(word(i)).second) << word(i) << " is there twice";
    }
    for (std::size_t i : {count, count + 1, SIZE_MAX})
        EXPECT_EQ(word(i), nullptr);
}

TEST(Catalogue, words_are_distinct_and_indices_bounded) {
    expect_distinct(rks_study_count(), rks_study_word);
    expect_distinct(rks_study_count(), rks_study_function);
    expect_distinct(rks_answer_count(), rks_answer_word);
    expect_distinct(rks_setting_count(), rks_setting_word);
    for (std::size_t study = 0; study < rks_study_count(); ++study) {
        expect_distinct(rks_argument_count(study), [=](std::size_t i) { return rks_argument_word(study, i); });
    }
}

void expect_texts(std::size_t count, const std::function<const char*(std::size_t)>& text) {
    for (std::size_t i = 0; i < count; ++i)
        EXPECT_FALSE(text_or_empty(text(i)).empty()) << i;
    EXPECT_EQ(text(count), nullptr);
}

TEST(Catalogue, everything_has_help) {
    expect_texts(rks_study_count(), rks_study_help);
    expect_texts(rks_answer_count(), rks_answer_help);
    expect_texts(rks_setting_count(), rks_setting_help);
    expect_texts(rks_setting_count(), rks_setting_values);
    for (std::size_t study = 0; study < rks_study_count(); ++study)
        expect_texts(rks_argument_count(study), [=](std::size_t i) { return rks_argument_help(study, i); });
}

TEST(Catalogue, indices_out_of_range_give_nothing) {
    const std::size_t studies = rks_study_count(), answers = rks_answer_count(), settings = rks_setting_count();
    EXPECT_EQ(rks_study_form(studies), 0);
    EXPECT_EQ(rks_study_default_answer(studies), nullptr);
    EXPECT_EQ(rks_argument_count(studies), 0U);
    EXPECT_EQ(rks_argument_word(studies, 0), nullptr);
    EXPECT_EQ(rks_argument_help(SIZE_MAX, SIZE_MAX), nullptr);
    EXPECT_EQ(rks_answer_kind(answers), 0);
    EXPECT_EQ(rks_answer_fits(answers, 0), 0);
    EXPECT_EQ(rks_answer_fits(0, studies), 0);
    EXPECT_EQ(rks_setting_values(settings), nullptr);
    EXPECT_EQ(rks_setting_default(settings), nullptr);
    EXPECT_EQ(rks_setting_fits(settings, 0), 0);
    EXPECT_EQ(rks_setting_fits(0, studies), 0);
}

TEST(Catalogue, studies_are_the_ones_promised) {
    const std::vector<std::pair<std::string, std::vector<std::string>>> promised = {
        {"single", {"values", "reference"}}, {"pairs", {"before", "after"}}, {"groups", {"first", "second"}}};
    for (const auto& [word, arguments] : promised) {
        const auto study = study_index(word);
        EXPECT_EQ(rks_study_form(study), RKS_FORM_STUDY);
        EXPECT_STREQ(rks_study_default_answer(study), "sentence");
        ASSERT_EQ(rks_argument_count(study), arguments.size());
        for (std::size_t i = 0; i < arguments.size(); ++i)
            EXPECT_EQ(rks_argument_word(study, i), arguments[i]);
    }
    EXPECT_STREQ(rks_study_function(study_index("groups")), "RKS.GROUPS");
    EXPECT_EQ(rks_study_form(study_index("build")), RKS_FORM_HELPER);
    EXPECT_STREQ(rks_study_function(study_index("build")), "RKS.BUILD");
}

TEST(Catalogue, answers_are_the_ones_promised) {
    for (const char* word : {"p",
                             "estimate",
                             "lower",
                             "upper",
                             "confidence",
                             "chance",
                             "chance lower",
                             "chance upper",
                             "statistic",
                             "z",
                             "arrangements",
                             "method",
                             "accuracy",
                             "smallest p",
                             "n",
                             "n first",
                             "n second",
                             "zeros",
                             "tied",
                             "missing",
                             "censored",
                             "median first",
                             "lower quartile first",
                             "upper quartile first",
                             "median second",
                             "lower quartile second",
                             "upper quartile second",
                             "sentence",
                             "methods",
                             "notes",
                             "ledger",
                             "check",
                             "stamp",
                             "report"}) {
        const int32_t answer = rks_answer_find(word);
        ASSERT_GE(answer, 0) << word;
        EXPECT_STREQ(rks_answer_word(static_cast<std::size_t>(answer)), word);
        EXPECT_EQ(rks_answer_fits(static_cast<std::size_t>(answer), study_index("groups")),
                  std::string(word) != "zeros")
            << word;
    }
    EXPECT_EQ(rks_answer_find("P-value:"), rks_answer_find("p"));
    EXPECT_EQ(rks_answer_find("no such answer"), -1);
    EXPECT_EQ(rks_answer_find(nullptr), -1);
}

TEST(Catalogue, settings_are_the_ones_promised) {
    const std::vector<std::pair<const char*, const char*>> promised = {
        {"side", "two-sided"},    {"level", "0.95"},        {"test", "signed rank"}, {"zeros", "drop"},
        {"method", "auto"},       {"interval", "matching"}, {"margin", "0"},         {"chance interval", "placement"},
        {"decimal sign", "point"}};
    for (const auto& [word, usual] : promised)
        EXPECT_STREQ(rks_setting_default(setting_index(word)), usual) << word;
    for (const char* word : {"missing", "numbers", "unit", "first name", "second name"})
        EXPECT_NE(rks_setting_values(setting_index(word)), nullptr) << word;
}

TEST(Catalogue, the_caution_is_given) {
    EXPECT_FALSE(text_or_empty(rks_caution_line()).empty());
    EXPECT_NE(text_or_empty(rks_caution()).find("diagnosis"), std::string::npos);
    EXPECT_GT(text_or_empty(rks_caution()).size(), text_or_empty(rks_caution_line()).size());
}

TEST(Catalogue, the_helper_gives_the_build) {
    Inquiry build("build");
    ASSERT_EQ(build.run(), RKS_OK);
    EXPECT_EQ(build.text(""), rks_build());
    EXPECT_EQ(build.status("p"), RKS_UNKNOWN_ANSWER);
}

} // namespace
} // namespace rks_test
