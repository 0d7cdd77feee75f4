// rks_inquiry_set and the argument "settings".
#include "inquiry.h"

#include <gtest/gtest.h>

namespace rks_test {
namespace {

const std::vector<double> first = {5, 7, 7, 9, 12, 4}, second = {1, 3, 7, 4, 2, 6, 5};

Inquiry with_data() {
    Inquiry inquiry("groups");
    inquiry.numbers("first", first);
    inquiry.numbers("second", second);
    return inquiry;
}

double p_with(const Settings& settings) {
    return groups(first, second, settings).number("p");
}

void expect_lists(const Inquiry& inquiry, std::initializer_list<const char*> words) {
    for (const char* word : words)
        EXPECT_NE(inquiry.message().find(word), std::string::npos) << word << " is not in: " << inquiry.message();
}

TEST(Settings, an_unknown_name_lists_the_valid_names) {
    auto inquiry = with_data();
    EXPECT_EQ(inquiry.set("confidence level", "0.9"), RKS_UNKNOWN_SETTING);
    expect_lists(inquiry, {"side", "level", "margin", "interval"});
    EXPECT_EQ(inquiry.set("", "0.9"), RKS_UNKNOWN_SETTING);
}

TEST(Settings, a_bad_value_lists_the_valid_values) {
    auto inquiry = with_data();
    EXPECT_EQ(inquiry.set("side", "upwards"), RKS_BAD_SETTING);
    expect_lists(inquiry, {"two-sided", "higher", "lower"});
    EXPECT_EQ(inquiry.set("interval", "narrow"), RKS_BAD_SETTING);
    expect_lists(inquiry, {"matching", "table"});
    EXPECT_EQ(inquiry.set("method", "guess"), RKS_BAD_SETTING);
    expect_lists(inquiry, {"auto", "exact", "approximate"});
}

TEST(Settings, a_setting_of_another_study_is_refused) {
    auto inquiry = with_data();
    EXPECT_EQ(inquiry.set("zeros", "pratt"), RKS_UNKNOWN_SETTING) << "two groups have no zeros to rank";
    EXPECT_EQ(Inquiry("single").set("chance interval", "newcombe"), RKS_UNKNOWN_SETTING) << "one sample has no chance";
}

TEST(Settings, levels_have_bounds) {
    auto inquiry = with_data();
    for (const char* good : {"0.5", "0.9999", "0.95", "95%", "95 %", "0.90", "50%", "99.9%"})
        EXPECT_EQ(inquiry.set("level", good), RKS_OK) << good << ": " << inquiry.message();
    for (const char* bad : {"0.4999", "1", "0", "-0.95", "95", "101%", "0,95", "nan", "inf", "high", "0.95x", "0x1p-1"})
        EXPECT_EQ(inquiry.set("level", bad), RKS_BAD_SETTING) << bad;
}

TEST(Settings, a_percentage_is_the_same_level) {
    const auto as_part = groups(first, second, {{"level", "0.9"}}),
               as_percent = groups(first, second, {{"level", "90%"}});
    EXPECT_EQ(as_part.number("lower"), as_percent.number("lower"));
    EXPECT_EQ(as_part.number("upper"), as_percent.number("upper"));
    EXPECT_NE(as_part.number("lower"), groups(first, second, {{"level", "0.999"}}).number("lower"));
}

TEST(Settings, margins_are_decimals_with_a_point) {
    auto inquiry = with_data();
    for (const char* good : {"0", "-0", "1.5", "-2", "+3", "1e-3", "0.1"})
        EXPECT_EQ(inquiry.set("margin", good), RKS_OK) << good << ": " << inquiry.message();
    for (const char* bad : {"1,5", "nan", "inf", "-inf", "1e999", "two", "1.5 days", "1 5"})
        EXPECT_EQ(inquiry.set("margin", bad), RKS_BAD_SETTING) << bad;
}

TEST(Settings, a_refused_setting_changes_nothing) {
    auto inquiry = with_data();
    ASSERT_EQ(inquiry.set("side", "higher"), RKS_OK);
    ASSERT_EQ(inquiry.set("side", "up"), RKS_BAD_SETTING);
    ASSERT_EQ(inquiry.run(), RKS_OK);
    EXPECT_EQ(inquiry.number("p"), p_with({{"side", "higher"}}));
}

TEST(Settings, an_empty_value_restores_the_default) {
    EXPECT_EQ(p_with({{"side", "higher"}, {"side", ""}}), p_with({}));
    EXPECT_NE(p_with({{"side", "higher"}}), p_with({}));
}

TEST(Settings, names_and_values_fold_case_spaces_hyphens_and_underscores) {
    for (const char* value : {"Two-Sided", "two sided", "TWO_SIDED", " two-sided "})
        EXPECT_EQ(p_with({{"side", "higher"}, {"side", value}}), p_with({})) << value;
    for (const char* name : {"Side", "SIDE", " side"})
        EXPECT_EQ(p_with({{name, "Higher"}}), p_with({{"side", "higher"}})) << name;
    auto pairs = Inquiry("groups");
    for (const char* name : {"chance interval", "Chance-Interval", "CHANCE_INTERVAL"})
        EXPECT_EQ(pairs.set(name, "newcombe"), RKS_OK) << name;
}

TEST(Settings, a_change_discards_the_outcome) {
    auto inquiry = groups(first, second);
    EXPECT_EQ(inquiry.set("side", "lower"), RKS_OK);
    EXPECT_EQ(inquiry.status("p"), RKS_NOT_RUN);
}

double p_with_cells(std::vector<rks_cell> cells, std::size_t columns) {
    auto inquiry = with_data();
    EXPECT_EQ(inquiry.cells("settings", std::move(cells), columns), RKS_OK) << inquiry.message();
    EXPECT_EQ(inquiry.run(), RKS_OK) << inquiry.message();
    return inquiry.number("p");
}

TEST(Settings, one_text_holds_several) {
    const double wanted = p_with({{"side", "higher"}, {"margin", "1.5"}});
    for (const char* text : {"side=higher; margin=1.5", "side=higher;margin=1.5", " SIDE = Higher ;  Margin = 1.5 ; ",
                             "margin=1.5; side=higher"})
        EXPECT_EQ(p_with_cells({text_cell(text)}, 1), wanted) << text;
    EXPECT_EQ(p_with_cells({text_cell("")}, 1), p_with({}));
    EXPECT_EQ(p_with_cells({blank_cell()}, 1), p_with({}));
}

TEST(Settings, a_two_column_block_holds_several) {
    const double wanted = p_with({{"side", "higher"}, {"margin", "1.5"}});
    EXPECT_EQ(p_with_cells({text_cell("side"), text_cell("higher"), text_cell("margin"), number_cell(1.5)}, 2), wanted);
    EXPECT_EQ(p_with_cells({text_cell("Side"), text_cell("Higher"), blank_cell(), blank_cell(), text_cell("margin"),
                            text_cell("1.5")},
                           2),
              wanted)
        << "blank rows are no settings";
}

TEST(Settings, a_blank_value_in_a_block_is_the_default) {
    EXPECT_EQ(p_with_cells({text_cell("side"), blank_cell(), text_cell("level"), number_cell(0.9)}, 2), p_with({}));
}

TEST(Settings, a_block_may_hold_settings_of_other_studies) {
    EXPECT_EQ(p_with_cells({text_cell("zeros"), text_cell("pratt"), text_cell("side"), text_cell("higher")}, 2),
              p_with({{"side", "higher"}}));
}

TEST(Settings, a_text_may_not_hold_settings_of_other_studies) {
    auto inquiry = with_data();
    EXPECT_EQ(inquiry.cells("settings", {text_cell("zeros=pratt")}), RKS_UNKNOWN_SETTING);
}

TEST(Settings, mistakes_in_a_block_or_text_are_refused) {
    auto inquiry = with_data();
    EXPECT_EQ(inquiry.cells("settings", {text_cell("sides"), text_cell("higher")}, 2), RKS_UNKNOWN_SETTING);
    expect_lists(inquiry, {"sides", "side", "level"});
    EXPECT_EQ(inquiry.cells("settings", {text_cell("side"), text_cell("up")}, 2), RKS_BAD_SETTING);
    expect_lists(inquiry, {"two-sided", "higher", "lower"});
    EXPECT_EQ(inquiry.cells("settings", {text_cell("sides=higher")}), RKS_UNKNOWN_SETTING);
    EXPECT_EQ(inquiry.cells("settings", {text_cell("side=up")}), RKS_BAD_SETTING);
    EXPECT_NE(inquiry.cells("settings", {text_cell("higher")}), RKS_OK) << "no name";
    EXPECT_NE(inquiry.cells("settings", {text_cell("side"), text_cell("lower"), number_cell(1)}, 3), RKS_OK);
}

TEST(Settings, cells_of_settings_are_read_at_once) {
    auto inquiry = with_data();
    std::string text = "side=higher";
    ASSERT_EQ(inquiry.cells("settings", {text_cell(text)}), RKS_OK);
    text.assign("xxxxxxxxxxx");
    ASSERT_EQ(inquiry.run(), RKS_OK);
    EXPECT_EQ(inquiry.number("p"), p_with({{"side", "higher"}}));
}

TEST(Settings, a_text_that_is_not_utf8_is_refused) {
    auto inquiry = with_data();
    EXPECT_EQ(inquiry.set("unit", "\xff"), RKS_BAD_CALL);
    EXPECT_EQ(inquiry.set("\xff", "x"), RKS_BAD_CALL);
    EXPECT_EQ(inquiry.cells("settings", {text_cell("unit=\xc3\x28")}), RKS_BAD_CALL);
}

TEST(Settings, words_of_the_user_appear_in_the_sentence) {
    const auto inquiry =
        groups(first, second, {{"unit", "minutes"}, {"first name", "Ward Ä"}, {"second name", "Ward B"}});
    const auto sentence = inquiry.text("sentence");
    for (const char* word : {"minutes", "Ward Ä", "Ward B"})
        EXPECT_NE(sentence.find(word), std::string::npos) << sentence;
}

TEST(Settings, a_decimal_comma_in_texts_leaves_numbers_alone) {
    const auto point = groups(first, second), comma = groups(first, second, {{"decimal sign", "comma"}});
    EXPECT_EQ(point.number("p"), comma.number("p"));
    EXPECT_NE(point.text("sentence"), comma.text("sentence"));
}

} // namespace
} // namespace rks_test
