// The rows of the settings table, and how their values are read and shown. Only catalogue.cpp includes this.
#pragma once

#include "catalogue.h"
#include "words.h"

#include <algorithm>
#include <array>

namespace rankstead::rows {

inline constexpr Studies one_sample_studies = only(StudyId::single) | only(StudyId::pairs);
inline constexpr Studies data_studies = one_sample_studies | only(StudyId::groups);
inline constexpr Studies named_second = only(StudyId::pairs) | only(StudyId::groups);

// Words in the order of the enumeration, as listed in the row.
template <auto Member>
bool apply_choice(Settings& settings, const SettingRow& row, std::string_view value) {
    int index = 0;
    for (const std::string_view word : split(row.values, ',')) {
        if (folded(word) == folded(value)) {
            using Choice = std::remove_reference_t<decltype(settings.*Member)>;
            settings.*Member = static_cast<Choice>(index);
            return true;
        }
        ++index;
    }
    return false;
}

template <auto Member>
std::string show_choice(const Settings& settings, const SettingRow& row) {
    return std::string(trimmed(split(row.values, ',')[static_cast<std::size_t>(settings.*Member)]));
}

// A share such as 0.95, also written 95%.
inline bool apply_level(Settings& settings, const SettingRow& /*row*/, std::string_view value) {
    const bool percent = value.ends_with('%');
    auto level = Decimal::from_text(percent ? value.substr(0, value.size() - 1) : value);
    if (!level) {
        return false;
    }
    if (percent && level->coefficient != 0) {
        level->exponent -= 2;
    }
    constexpr std::int32_t finest = -15; // decimals, so that it is a fraction of exact integers
    const double share = level->to_double();
    if (!(share >= 0.5 && share <= 0.9999) || level->exponent < finest) {
        return false;
    }
    settings.level = *level;
    return true;
}

inline bool apply_margin(Settings& settings, const SettingRow& /*row*/, std::string_view value) {
    const auto margin = Decimal::from_text(value);
    settings.margin = margin.value_or(settings.margin);
    return margin.has_value();
}

// Words with commas between them.
inline bool apply_missing(Settings& settings, const SettingRow& /*row*/, std::string_view value) {
    settings.missing.clear();
    for (const std::string_view word : split(value, ',')) {
        if (!trimmed(word).empty()) {
            settings.missing.emplace_back(trimmed(word));
        }
    }
    return is_utf8(value);
}

inline std::string show_missing(const Settings& settings, const SettingRow& /*row*/) {
    std::string text;
    for (const std::string& word : settings.missing) {
        text += (text.empty() ? "" : ", ") + word;
    }
    return text;
}

template <auto Member>
bool apply_text(Settings& settings, const SettingRow& /*row*/, std::string_view value) {
    settings.*Member = value;
    return is_utf8(value);
}

template <auto Member>
std::string show_text(const Settings& settings, const SettingRow& /*row*/) {
    return settings.*Member;
}

template <auto Member>
std::string show_decimal(const Settings& settings, const SettingRow& /*row*/) {
    return (settings.*Member).to_text();
}

inline constexpr std::array setting_table{
    SettingRow{
        "side", "two-sided, higher, lower", "two-sided",
        "The question: either way, or only whether the first is higher than the second, after higher than before, "
        "values higher than the reference (higher), or lower. Decide before seeing the data.",
        data_studies, apply_choice<&Settings::side>, show_choice<&Settings::side>},
    SettingRow{"level", "0.5 to 0.9999, such as 0.95 or 95%", "0.95", "The confidence level of the limits.",
               data_studies, apply_level, show_decimal<&Settings::level>},
    SettingRow{"test", "signed rank, sign", "signed rank",
               "signed rank uses the sizes of the changes, sign only their direction.", one_sample_studies,
               apply_choice<&Settings::test>, show_choice<&Settings::test>},
    SettingRow{
        "zeros", "drop, pratt", "drop",
        "Changes of zero in the signed rank test: dropped before ranking (Wilcoxon 1945), or ranked and then set "
        "aside (Pratt 1959).",
        one_sample_studies, apply_choice<&Settings::zeros>, show_choice<&Settings::zeros>},
    SettingRow{"method", "auto, exact, approximate", "auto",
               "How p is obtained. auto and exact use the exact law; where that would take more than half a second, "
               "the saddlepoint approximation, and say so. approximate always uses the normal approximation.",
               data_studies, apply_choice<&Settings::method>, show_choice<&Settings::method>},
    SettingRow{"interval", "matching, table", "matching",
               "matching gives limits that never contradict p; table the classical order statistics of the law without "
               "ties.",
               data_studies, apply_choice<&Settings::interval>, show_choice<&Settings::interval>},
    SettingRow{"chance interval", "placement, newcombe", "placement",
               "Limits of the chance for two groups: logit with placement variances, or Newcombe (2006), method 5.",
               only(StudyId::groups), apply_choice<&Settings::chance_interval>,
               show_choice<&Settings::chance_interval>},
    SettingRow{"margin", "a number, such as 0 or -2.5", "0",
               "The shift or change under the null hypothesis, in the unit of the data.", data_studies, apply_margin,
               show_decimal<&Settings::margin>},
    SettingRow{"limits", "refuse", "refuse",
               "What a text such as <0.5 or >100 means: refuse gives an error that names the cell.", data_studies,
               apply_choice<&Settings::limits>, show_choice<&Settings::limits>},
    SettingRow{"missing", "words with commas between them, such as n/a, ND", "",
               "Words that mean that a value is missing; blank cells always do.", data_studies, apply_missing,
               show_missing},
    SettingRow{
        "numbers", "refused, point, comma", "refused",
        "How numbers stored as text are read: with a decimal point (3.5) or a decimal comma (3,5). Without it they "
        "are an error, never guessed.",
        data_studies, apply_choice<&Settings::numbers>, show_choice<&Settings::numbers>},
    SettingRow{"decimal sign", "point, comma", "point", "The decimal sign in the texts that Rankstead writes.",
               data_studies, apply_choice<&Settings::decimal_sign>, show_choice<&Settings::decimal_sign>},
    SettingRow{"unit", "a word, such as min", "", "The unit of the data, for the sentence.", data_studies,
               apply_text<&Settings::unit>, show_text<&Settings::unit>},
    SettingRow{"first name", "a name", "", "What to call the first group, before, or the values; else their heading.",
               data_studies, apply_text<&Settings::first_name>, show_text<&Settings::first_name>},
    SettingRow{"second name", "a name", "", "What to call the second group, or after; else its heading.", named_second,
               apply_text<&Settings::second_name>, show_text<&Settings::second_name>},
};

} // namespace rankstead::rows
