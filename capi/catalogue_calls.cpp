// The catalogue accessors of the C interface.
#include "rankstead.h"

#include "catalogue.h"
#include "guard.h"
#include "wording.h"

using namespace rankstead;

namespace {

template <class Row>
const Row* row_at(std::span<const Row> rows, std::size_t index) noexcept {
    return index < rows.size() ? &rows[index] : nullptr;
}

const StudyRow* study_at(std::size_t index) noexcept {
    return row_at(studies(), index);
}
const AnswerRow* answer_at(std::size_t index) noexcept {
    return row_at(answers(), index);
}
const SettingRow* setting_at(std::size_t index) noexcept {
    return row_at(settings_rows(), index);
}

const ArgumentRow* argument_at(std::size_t study, std::size_t argument) noexcept {
    const StudyRow* row = study_at(study);
    return row == nullptr ? nullptr : row_at(row->arguments, argument);
}

template <class Row>
std::int32_t row_fits(const Row* row, std::size_t study) noexcept {
    const StudyRow* of = study_at(study);
    return row != nullptr && of != nullptr && fits(row->fits, *of) ? 1 : 0;
}

} // namespace

size_t rks_study_count(void) {
    return studies().size();
}
const char* rks_study_word(size_t study) {
    return study_at(study) != nullptr ? study_at(study)->word : nullptr;
}
const char* rks_study_function(size_t study) {
    return study_at(study) != nullptr ? study_at(study)->function : nullptr;
}
const char* rks_study_help(size_t study) {
    return study_at(study) != nullptr ? study_at(study)->help : nullptr;
}
int32_t rks_study_form(size_t study) {
    return study_at(study) != nullptr ? static_cast<int32_t>(study_at(study)->form) : 0;
}
const char* rks_study_default_answer(size_t study) {
    return study_at(study) != nullptr ? study_at(study)->default_answer : nullptr;
}

size_t rks_argument_count(size_t study) {
    return study_at(study) != nullptr ? study_at(study)->arguments.size() : 0;
}
const char* rks_argument_word(size_t study, size_t argument) {
    const ArgumentRow* row = argument_at(study, argument);
    return row != nullptr ? row->word : nullptr;
}
const char* rks_argument_help(size_t study, size_t argument) {
    const ArgumentRow* row = argument_at(study, argument);
    return row != nullptr ? row->help : nullptr;
}

size_t rks_answer_count(void) {
    return answers().size();
}
const char* rks_answer_word(size_t answer) {
    return answer_at(answer) != nullptr ? answer_at(answer)->word : nullptr;
}
const char* rks_answer_help(size_t answer) {
    return answer_at(answer) != nullptr ? answer_at(answer)->help : nullptr;
}
int32_t rks_answer_kind(size_t answer) {
    return answer_at(answer) != nullptr ? static_cast<int32_t>(answer_at(answer)->kind) : 0;
}
int32_t rks_answer_fits(size_t answer, size_t study) {
    return row_fits(answer_at(answer), study);
}

int32_t rks_answer_find(const char* answer) {
    return guarded_value<int32_t>(-1, [&] {
        const AnswerRow* row = answer == nullptr ? nullptr : find_answer(answer);
        return row == nullptr ? -1 : static_cast<int32_t>(row - answers().data());
    });
}

size_t rks_setting_count(void) {
    return settings_rows().size();
}
const char* rks_setting_word(size_t setting) {
    return setting_at(setting) != nullptr ? setting_at(setting)->word : nullptr;
}
const char* rks_setting_help(size_t setting) {
    return setting_at(setting) != nullptr ? setting_at(setting)->help : nullptr;
}
const char* rks_setting_values(size_t setting) {
    return setting_at(setting) != nullptr ? setting_at(setting)->values : nullptr;
}
const char* rks_setting_default(size_t setting) {
    return setting_at(setting) != nullptr ? setting_at(setting)->standard : nullptr;
}
int32_t rks_setting_fits(size_t setting, size_t study) {
    return row_fits(setting_at(setting), study);
}

const char* rks_caution_line(void) {
    return caution_line().data();
}
const char* rks_caution(void) {
    return caution().data();
}
