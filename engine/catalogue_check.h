// What makes the catalogue sound, checked when it is compiled.
#pragma once

#include "catalogue.h"

#include <string_view>

namespace rankstead {

constexpr bool is_filled(const char* text) {
    return text != nullptr && *text != '\0';
}

// Lower case, single spaces: as words are folded before they are looked up.
constexpr bool is_folded(std::string_view word) {
    for (std::size_t i = 0; i < word.size(); ++i) {
        const bool plain = (word[i] >= 'a' && word[i] <= 'z') || (word[i] == ' ' && i > 0 && word[i - 1] != ' ');
        if (!plain) {
            return false;
        }
    }
    return !word.empty() && word.back() != ' ';
}

template <class Rows>
constexpr bool words_are_sound(const Rows& rows) {
    for (std::size_t i = 0; i < rows.size(); ++i) {
        if (!is_folded(rows[i].word) || !is_filled(rows[i].help)) {
            return false;
        }
        for (std::size_t j = 0; j < i; ++j) {
            if (std::string_view(rows[i].word) == rows[j].word) {
                return false;
            }
        }
    }
    return true;
}

template <class Answers>
constexpr const AnswerRow* find_row(const Answers& answers, std::string_view word) {
    for (const AnswerRow& row : answers) {
        if (word == row.word) {
            return &row;
        }
    }
    return nullptr;
}

template <class Study, class Answers>
constexpr bool studies_are_sound(const Study& studies, const Answers& answers) {
    for (const StudyRow& study : studies) {
        const AnswerRow* standard = find_row(answers, study.default_answer);
        if (!is_filled(study.function) || standard == nullptr || (standard->fits & only(study.id)) == 0 ||
            !words_are_sound(study.arguments)) {
            return false;
        }
    }
    return words_are_sound(studies);
}

template <class Answers>
constexpr bool answers_are_sound(const Answers& answers) {
    for (const AnswerRow& row : answers) {
        const bool alias_taken = is_filled(row.alias) && find_row(answers, row.alias) != nullptr;
        if (row.fits == 0 || alias_taken) {
            return false;
        }
    }
    return words_are_sound(answers);
}

template <class Rows>
constexpr bool settings_are_sound(const Rows& settings) {
    for (const SettingRow& row : settings) {
        if (row.fits == 0 || !is_filled(row.values) || row.standard == nullptr) {
            return false;
        }
    }
    return words_are_sound(settings);
}

} // namespace rankstead
