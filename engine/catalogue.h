// The catalogue: studies, answers and settings, each described once. Everything that lists, offers, parses or documents
// them reads these tables: the C interface, the spreadsheet functions, the command-line client and its reference.
#pragma once

#include "cell.h"
#include "outcome.h"
#include "settings.h"
#include "studies/studies.h"

#include <cstddef>
#include <cstdint>
#include <optional>
#include <span>
#include <string>
#include <string_view>
#include <variant>
#include <vector>

namespace rankstead {

// ------------------------------------------------------------------------------------------------ what an answer gives

struct Blank {};
struct NoAnswer {
    std::string reason;
};
struct Table;
using Reading = std::variant<Blank, NoAnswer, double, std::string, Table>;
struct Table {
    std::vector<Reading> cells; // row by row
    std::size_t columns = 1;
};

// ------------------------------------------------------------------------------------------------ rows

// A set of studies, one bit each.
using Studies = std::uint32_t;
[[nodiscard]] constexpr Studies only(StudyId id) {
    return Studies{1} << static_cast<unsigned>(id);
}

struct ArgumentRow {
    const char* word;
    const char* help;
};

enum class Form { study = 1, helper = 2 };

struct StudyRow {
    StudyId id;
    const char* word;
    const char* function;
    const char* help;
    Form form;
    std::span<const ArgumentRow> arguments;
    const char* default_answer;
    Outcome (*run)(const Arguments&, const Settings&);
};

enum class AnswerKind { number = 1, text = 2, table = 3 };

struct AnswerRow {
    const char* word;
    const char* alias; // another word for it, or ""
    AnswerKind kind;
    const char* help;
    Studies fits;
    Reading (*read)(const Outcome&);
};

struct SettingRow {
    const char* word;
    const char* values;   // the words it takes, default first, or a description of what it takes
    const char* standard; // the default
    const char* help;
    Studies fits;
    bool (*apply)(Settings&, const SettingRow&, std::string_view); // false: not a value it takes
    std::string (*show)(const Settings&, const SettingRow&);
};

[[nodiscard]] std::span<const StudyRow> studies();
[[nodiscard]] std::span<const AnswerRow> answers();
[[nodiscard]] std::span<const SettingRow> settings_rows();

// ------------------------------------------------------------------------------------------------ use

// Null if there is none of that word; words are folded first.
[[nodiscard]] const StudyRow* find_study(std::string_view word);
[[nodiscard]] const SettingRow* find_setting(std::string_view word);
[[nodiscard]] const AnswerRow* find_answer(std::string_view label);

[[nodiscard]] bool fits(Studies studies, const StudyRow& study);

// The answer of that label for that study, the default for an empty one. Throws Refusal (unknown_answer).
[[nodiscard]] const AnswerRow& answer_of(const StudyRow& study, std::string_view label);

// Throws Refusal (unknown_setting, bad_setting). An empty value restores the default.
void apply_setting(Settings& settings, const StudyRow& study, std::string_view word, std::string_view value);

// The argument "settings": one cell with `name=value; name=value`, or a block of two columns, which may hold settings
// of other studies. Throws Refusal.
void apply_settings_block(Settings& settings, const StudyRow& study, const Block& block);

// "side=two-sided; level=0.95; ...": the settings in force for that study.
[[nodiscard]] std::string settings_in_force(const Settings& settings, const StudyRow& study);

[[nodiscard]] const StudyRow& study_of(const Outcome& outcome);

} // namespace rankstead
