#include "catalogue.h"

#include "words.h"

#include <algorithm>

namespace rankstead::client {
namespace {

std::vector<Argument> arguments_of(std::size_t study) {
    std::vector<Argument> result;
    for (std::size_t i = 0; i < rks_argument_count(study); ++i) {
        result.push_back({rks_argument_word(study, i), rks_argument_help(study, i)});
    }
    return result;
}

Study study_at(std::size_t i) {
    return {rks_study_word(i),
            rks_study_function(i),
            rks_study_help(i),
            rks_study_default_answer(i),
            rks_study_form(i) == RKS_FORM_HELPER,
            arguments_of(i)};
}

template <class Fits>
std::vector<std::string> studies_where(Fits fits) {
    std::vector<std::string> result;
    for (std::size_t study = 0; study < rks_study_count(); ++study) {
        if (fits(study)) {
            result.emplace_back(rks_study_word(study));
        }
    }
    return result;
}

Answer answer_at(std::size_t i) {
    return {rks_answer_word(i), rks_answer_help(i), rks_answer_kind(i),
            studies_where([i](std::size_t study) { return rks_answer_fits(i, study) != 0; })};
}

Setting setting_at(std::size_t i) {
    return {rks_setting_word(i), rks_setting_help(i), rks_setting_values(i), rks_setting_default(i),
            studies_where([i](std::size_t study) { return rks_setting_fits(i, study) != 0; })};
}

template <class Row>
std::vector<Row> rows(std::size_t count, Row (*at)(std::size_t)) {
    std::vector<Row> result;
    for (std::size_t i = 0; i < count; ++i) {
        result.push_back(at(i));
    }
    return result;
}

template <class Row>
std::vector<Row> fitting(std::vector<Row> all, const Study& study) {
    std::erase_if(all, [&](const Row& row) {
        return std::find(row.studies.begin(), row.studies.end(), study.word) == row.studies.end();
    });
    return all;
}

template <class Row>
std::vector<std::string> words(const std::vector<Row>& rows) {
    std::vector<std::string> result;
    result.reserve(rows.size());
    for (const Row& row : rows) {
        result.push_back(row.word);
    }
    return result;
}

} // namespace

std::vector<Study> studies() {
    return rows(rks_study_count(), study_at);
}
std::vector<Answer> answers() {
    return rows(rks_answer_count(), answer_at);
}
std::vector<Setting> settings() {
    return rows(rks_setting_count(), setting_at);
}

std::vector<Answer> answers_of(const Study& study) {
    return fitting(answers(), study);
}
std::vector<Setting> settings_of(const Study& study) {
    return fitting(settings(), study);
}

std::optional<Study> find_study(std::string_view word) {
    for (Study& study : studies()) {
        if (folded(study.word) == folded(word)) {
            return std::move(study);
        }
    }
    return std::nullopt;
}

std::optional<Answer> find_answer(const Study& study, const std::string& word) {
    const std::int32_t index = rks_answer_find(word.c_str());
    if (index < 0) {
        return std::nullopt;
    }
    const Answer found = answer_at(static_cast<std::size_t>(index));
    const std::vector<Answer> given = fitting(std::vector{found}, study);
    return given.empty() ? std::nullopt : std::optional(given.front());
}

std::optional<Answer> report_of(const Study& study) {
    for (Answer& answer : answers_of(study)) {
        if (answer.kind == RKS_ANSWER_TABLE) {
            return std::move(answer);
        }
    }
    return std::nullopt;
}

std::vector<std::string> words_of(const std::vector<Argument>& arguments) {
    return words(arguments);
}
std::vector<std::string> words_of(const std::vector<Setting>& settings) {
    return words(settings);
}
std::vector<std::string> words_of(const std::vector<Answer>& answers) {
    return words(answers);
}

} // namespace rankstead::client
