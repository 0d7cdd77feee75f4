// catalogue.h: settings, as they are read, shown and refused.
#include "catalogue.h"

#include "data.h"
#include "refusal.h"
#include "words.h"

#include <gtest/gtest.h>

namespace rankstead {
namespace {

const StudyRow& study(std::string_view word) {
    return *find_study(word);
}

Block settings_rows_of(std::vector<std::pair<const char*, const char*>> rows) {
    Block block{"settings", {}, rows.size(), 2};
    for (const auto& [name, value] : rows) {
        block.cells.push_back(Cell::of(std::string_view(name)));
        block.cells.push_back(Cell::of(std::string_view(value)));
    }
    return block;
}

template <class Act>
Refusal refusal_of(Act act) {
    try {
        act();
    } catch (const Refusal& refusal) {
        return refusal;
    }
    ADD_FAILURE() << "nothing was refused";
    return {Status::ok, ""};
}

Refusal setting_refusal(std::string_view word, std::string_view settings) {
    return refusal_of([&] { static_cast<void>(test::with(word, settings)); });
}

TEST(Settings, every_row_shows_its_default_and_takes_it_back) {
    const Settings standard;
    for (const SettingRow& row : settings_rows()) {
        EXPECT_EQ(row.show(standard, row), row.standard) << row.word;
        Settings again;
        const StudyRow& fitting = fits(row.fits, study("pairs")) ? study("pairs") : study("groups");
        apply_setting(again, fitting, row.word, row.standard);
        EXPECT_EQ(settings_in_force(again, fitting), settings_in_force(standard, fitting)) << row.word;
    }
}

TEST(Settings, every_listed_word_is_taken_and_shown_again) {
    for (const SettingRow& row : settings_rows()) {
        const auto words = split(row.values, ',');
        if (folded(words.front()) != folded(row.standard) || words.size() < 2) {
            continue; // described, not listed
        }
        for (const std::string_view word : words) {
            Settings settings;
            const StudyRow& fitting = fits(row.fits, study("pairs")) ? study("pairs") : study("groups");
            apply_setting(settings, fitting, row.word, word);
            EXPECT_EQ(folded(row.show(settings, row)), folded(word)) << row.word;
        }
    }
}

TEST(Settings, are_read_from_a_text) {
    const Settings settings = test::with("pairs", " side = Higher ; level=90% ;; margin=-2.5; missing=n/a, ND ;");
    EXPECT_EQ(settings.side, Side::higher);
    EXPECT_EQ(settings.level, (Decimal{9, -1}));
    EXPECT_EQ(settings.margin, (Decimal{-25, -1}));
    EXPECT_EQ(settings.missing, (std::vector<std::string>{"n/a", "ND"}));
}

TEST(Settings, are_read_from_two_columns_which_may_hold_those_of_other_studies) {
    Settings settings;
    apply_settings_block(settings, study("groups"),
                         settings_rows_of({{"level", "0.9"}, {"", ""}, {"zeros", "pratt"}, {"unit", "min"}}));
    EXPECT_EQ(settings.level, (Decimal{9, -1}));
    EXPECT_EQ(settings.unit, "min");
    EXPECT_EQ(settings.zeros, Zeros::drop);
}

TEST(Settings, of_other_studies_are_checked_too) {
    const Refusal refusal = refusal_of([] {
        Settings settings;
        apply_settings_block(settings, study("groups"), settings_rows_of({{"level", "0.9"}, {"zeros", "prat"}}));
    });
    EXPECT_EQ(refusal.status(), Status::bad_setting);
    EXPECT_EQ(refusal.message().rfind("settings, row 2: ", 0), 0U) << refusal.message();
}

TEST(Settings, of_another_study_are_refused_in_a_text) {
    const Refusal refusal = setting_refusal("groups", "zeros=pratt");
    EXPECT_EQ(refusal.status(), Status::unknown_setting);
    EXPECT_NE(refusal.message().find("does not fit groups. Its settings are side, level,"), std::string::npos)
        << refusal.message();
}

TEST(Settings, that_do_not_exist_are_refused_with_the_words_that_do) {
    const Refusal refusal = setting_refusal("pairs", "sied=higher");
    EXPECT_EQ(refusal.status(), Status::unknown_setting);
    EXPECT_NE(refusal.message().find("The settings of pairs are side, level, test, zeros,"), std::string::npos)
        << refusal.message();
}

TEST(Settings, refuse_a_value_with_the_values_that_they_take) {
    const Refusal refusal = setting_refusal("pairs", "side=up");
    EXPECT_EQ(refusal.status(), Status::bad_setting);
    EXPECT_EQ(refusal.message(), "the setting side does not take \"up\". It takes: two-sided, higher, lower.");
}

TEST(Settings, refuse_a_level_outside_0_5_to_0_9999) {
    for (const char* text : {"level=0.4999", "level=1", "level=0.99991", "level=95", "level=0,95", "level=high"}) {
        EXPECT_EQ(setting_refusal("pairs", text).status(), Status::bad_setting) << text;
    }
    EXPECT_EQ(test::with("pairs", "level=0.5").level, (Decimal{5, -1}));
    EXPECT_EQ(test::with("pairs", "level=99.99%").level, (Decimal{9999, -4}));
}

TEST(Settings, given_twice_are_refused) {
    EXPECT_NE(setting_refusal("pairs", "side=higher; Side=lower").message().find("given twice"), std::string::npos);
}

TEST(Settings, without_an_equals_sign_are_refused_with_an_example) {
    EXPECT_NE(setting_refusal("pairs", "higher").message().find("side=higher"), std::string::npos);
}

TEST(Settings, in_a_block_of_three_columns_are_refused) {
    const Block block{"settings", std::vector<Cell>(6), 2, 3};
    const Refusal refusal = refusal_of([&] {
        Settings settings;
        apply_settings_block(settings, study("pairs"), block);
    });
    EXPECT_EQ(refusal.status(), Status::bad_setting);
}

TEST(SettingsInForce, lists_those_of_the_study_only) {
    const std::string groups = settings_in_force({}, study("groups"));
    EXPECT_EQ(groups.rfind("side=two-sided; level=0.95; method=auto; interval=matching; ", 0), 0U) << groups;
    EXPECT_EQ(groups.find("zeros="), std::string::npos) << groups;
    EXPECT_EQ(settings_in_force({}, study("build")), "");
}

} // namespace
} // namespace rankstead
