// The catalogue of the library as plain values. The client has no list of studies, answers or settings of its own.
#pragma once

#include "rankstead.h"

#include <optional>
#include <string>
#include <string_view>
#include <vector>

namespace rankstead::client {

struct Argument {
    std::string word, help;
};

struct Answer {
    std::string word, help;
    std::int32_t kind;
    std::vector<std::string> studies; // those that give it
};

struct Setting {
    std::string word, help, values, default_value;
    std::vector<std::string> studies; // those that it fits
};

struct Study {
    std::string word, function, help, default_answer;
    bool helper; // gives its default answer only
    std::vector<Argument> arguments;
};

std::vector<Study> studies();
std::vector<Answer> answers();
std::vector<Setting> settings();

std::vector<Answer> answers_of(const Study& study);
std::vector<Setting> settings_of(const Study& study);

std::optional<Study> find_study(std::string_view word);

// The answer of this study that `word` means, aliases included.
std::optional<Answer> find_answer(const Study& study, const std::string& word);

// The first answer of this study that is a table: the whole report.
std::optional<Answer> report_of(const Study& study);

std::vector<std::string> words_of(const std::vector<Argument>& arguments);
std::vector<std::string> words_of(const std::vector<Setting>& settings);
std::vector<std::string> words_of(const std::vector<Answer>& answers);

} // namespace rankstead::client
