#include "catalogue.h"

#include "catalogue_answers.h"
#include "catalogue_check.h"
#include "catalogue_settings.h"
#include "refusal.h"
#include "words.h"

#include <algorithm>
#include <array>

namespace rankstead {

namespace {

using rows::answer_table;
using rows::setting_table;

constexpr std::array single_arguments{
    ArgumentRow{"values", "The measurements of one group: a column, a row or a block. A heading may come first."},
    ArgumentRow{"reference",
                "The value to compare with, such as a target: one number. An empty cell given by itself counts as 0."},
};
constexpr std::array pairs_arguments{
    ArgumentRow{"before", "The first measurement of each person or item, one per row. A heading may come first."},
    ArgumentRow{"after", "The second measurement of the same person or item, in the same rows."},
};
constexpr std::array groups_arguments{
    ArgumentRow{"first", "The measurements of the first group: a column, a row or a block. A heading may come first."},
    ArgumentRow{"second", "The measurements of the second group, of other persons or items; any number of them."},
};

constexpr std::array study_table{
    StudyRow{StudyId::single, "single", "RKS.SINGLE",
             "Compares one group of measurements with a reference value (signed rank or sign test).", Form::study,
             single_arguments, "sentence", run_single},
    StudyRow{StudyId::pairs, "pairs", "RKS.PAIRS",
             "Compares two measurements of the same persons or items, row by row (signed rank or sign test on after - "
             "before).",
             Form::study, pairs_arguments, "sentence", run_pairs},
    StudyRow{StudyId::groups, "groups", "RKS.GROUPS", "Compares two separate groups of measurements (rank sum test).",
             Form::study, groups_arguments, "sentence", run_groups},
    StudyRow{StudyId::build,
             "build",
             "RKS.BUILD",
             "Gives the version and build of Rankstead.",
             Form::helper,
             {},
             "build",
             run_build},
};

consteval bool catalogue_is_sound() {
    return studies_are_sound(study_table, answer_table) && answers_are_sound(answer_table) &&
           settings_are_sound(setting_table);
}
static_assert(catalogue_is_sound());

template <class Row>
std::string words_fitting(std::span<const Row> rows, const StudyRow& study) {
    std::vector<std::string> words;
    for (const Row& row : rows) {
        if (fits(row.fits, study)) {
            words.emplace_back(row.word);
        }
    }
    return listed(words);
}

const SettingRow& setting_of(const StudyRow& study, std::string_view word) {
    const SettingRow* row = find_setting(word);
    if (row == nullptr) {
        throw Refusal(Status::unknown_setting, "there is no setting \"" + std::string(word) + "\". The settings of " +
                                                   study.word + " are " + words_fitting(settings_rows(), study) + ".");
    }
    return *row;
}

void set(Settings& settings, const SettingRow& row, std::string_view value) {
    const std::string_view given = trimmed(value);
    if (!row.apply(settings, row, given.empty() ? row.standard : given)) {
        throw Refusal(Status::bad_setting, "the setting " + std::string(row.word) + " does not take \"" +
                                               std::string(given) + "\". It takes: " + row.values + ".");
    }
}

// Settings given together: the same one twice is a mistake that must not be resolved in silence.
class SettingsReader {
public:
    SettingsReader(Settings& settings, const StudyRow& study, bool shared)
        : settings_(settings), study_(study), shared_(shared) {}

    void take(std::string_view word, std::string_view value) {
        const SettingRow& row = setting_of(study_, word);
        if (std::find(seen_.begin(), seen_.end(), &row) != seen_.end()) {
            throw Refusal(Status::bad_setting, "the setting " + std::string(row.word) + " is given twice. Keep one.");
        }
        seen_.push_back(&row);
        if (shared_ && !fits(row.fits, study_)) {
            Settings unused;
            set(unused, row, value);
            return;
        }
        apply_setting(settings_, study_, word, value);
    }

private:
    Settings& settings_;
    const StudyRow& study_;
    bool shared_;
    std::vector<const SettingRow*> seen_;
};

std::string cell_text(const Cell& cell) {
    switch (cell.kind) {
    case Cell::Kind::number:
        return shortest_text(cell.number);
    case Cell::Kind::text:
        return std::string(trimmed(cell.text));
    case Cell::Kind::blank:
        break;
    }
    return "";
}

void apply_settings_text(Settings& settings, const StudyRow& study, std::string_view text) {
    SettingsReader reader(settings, study, false);
    for (const std::string_view part : split(text, ';')) {
        if (trimmed(part).empty()) {
            continue;
        }
        const std::size_t equals = part.find('=');
        if (equals == std::string_view::npos) {
            throw Refusal(Status::bad_setting, "settings: \"" + std::string(trimmed(part)) +
                                                   "\" is not of the form name=value, such as side=higher.");
        }
        reader.take(trimmed(part.substr(0, equals)), part.substr(equals + 1));
    }
}

void apply_settings_rows(Settings& settings, const StudyRow& study, const Block& block) {
    SettingsReader reader(settings, study, true);
    for (std::size_t row = 0; row < block.rows; ++row) {
        const std::string word = cell_text(block.cells[row * 2]);
        const std::string value = cell_text(block.cells[row * 2 + 1]);
        if (word.empty() && value.empty()) {
            continue;
        }
        try {
            reader.take(word, value);
        } catch (const Refusal& refusal) {
            throw Refusal(refusal.status(), refusal.reason(), {block.argument, row + 1, 1, 1});
        }
    }
}

} // namespace

std::span<const StudyRow> studies() {
    return study_table;
}
std::span<const AnswerRow> answers() {
    return answer_table;
}
std::span<const SettingRow> settings_rows() {
    return setting_table;
}

bool fits(Studies studies, const StudyRow& study) {
    return (studies & only(study.id)) != 0;
}

const StudyRow* find_study(std::string_view word) {
    const std::string wanted = folded(word);
    const auto row = std::find_if(study_table.begin(), study_table.end(),
                                  [&](const StudyRow& study) { return wanted == study.word; });
    return row == study_table.end() ? nullptr : &*row;
}

const SettingRow* find_setting(std::string_view word) {
    const std::string wanted = folded(word);
    const auto row = std::find_if(setting_table.begin(), setting_table.end(),
                                  [&](const SettingRow& setting) { return wanted == setting.word; });
    return row == setting_table.end() ? nullptr : &*row;
}

const AnswerRow* find_answer(std::string_view label) {
    const std::string wanted = folded_label(label);
    const auto row = std::find_if(answer_table.begin(), answer_table.end(), [&](const AnswerRow& answer) {
        return !wanted.empty() && (wanted == answer.word || wanted == answer.alias);
    });
    return row == answer_table.end() ? nullptr : &*row;
}

const AnswerRow& answer_of(const StudyRow& study, std::string_view label) {
    const AnswerRow* row = find_answer(trimmed(label).empty() ? study.default_answer : label);
    if (row == nullptr || !fits(row->fits, study)) {
        throw Refusal(Status::unknown_answer, "there is no answer \"" + std::string(trimmed(label)) + "\"" +
                                                  (row == nullptr ? "" : " of " + std::string(study.word)) +
                                                  ". The answers are " + words_fitting(answers(), study) + ".");
    }
    return *row;
}

void apply_setting(Settings& settings, const StudyRow& study, std::string_view word, std::string_view value) {
    const SettingRow& row = setting_of(study, word);
    if (!fits(row.fits, study)) {
        throw Refusal(Status::unknown_setting, "the setting " + std::string(row.word) + " does not fit " + study.word +
                                                   ". Its settings are " + words_fitting(settings_rows(), study) + ".");
    }
    set(settings, row, value);
}

void apply_settings_block(Settings& settings, const StudyRow& study, const Block& block) {
    if (block.cells.size() == 1) {
        apply_settings_text(settings, study, cell_text(block.cells[0]));
    } else if (block.columns == 2) {
        apply_settings_rows(settings, study, block);
    } else if (!block.cells.empty()) {
        throw Refusal(Status::bad_setting,
                      "settings must be one text such as \"side=higher; level=0.9\", or a range of two columns, name "
                      "and value.");
    }
}

std::string settings_in_force(const Settings& settings, const StudyRow& study) {
    std::string text;
    for (const SettingRow& row : setting_table) {
        const std::string value = fits(row.fits, study) ? row.show(settings, row) : "";
        if (!value.empty()) {
            text += (text.empty() ? "" : "; ") + std::string(row.word) + "=" + value;
        }
    }
    return text;
}

const StudyRow& study_of(const Outcome& outcome) {
    return *std::find_if(study_table.begin(), study_table.end(),
                         [&](const StudyRow& study) { return study.id == outcome.study; });
}

} // namespace rankstead
