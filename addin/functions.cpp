#include "functions.h"

#include <rankstead.h>

#include <algorithm>

namespace rankstead::calc {
namespace {

// Without regard to the locale: the names are ASCII, and some locales have other capitals for i.
char lowered(char c) {
    return c >= 'A' && c <= 'Z' ? static_cast<char>(c - 'A' + 'a') : c;
}
char raised(char c) {
    return c >= 'a' && c <= 'z' ? static_cast<char>(c - 'a' + 'A') : c;
}
bool in_identifier(char c) {
    return (lowered(c) >= 'a' && lowered(c) <= 'z') || (c >= '0' && c <= '9');
}

// "other ids" becomes "otherIds": UNO identifiers have no spaces.
std::string identifier(const std::string& words) {
    std::string name;
    bool start = false;
    for (char c : words) {
        if (in_identifier(c))
            name += start && !name.empty() ? raised(c) : c;
        start = !in_identifier(c);
    }
    return name;
}

Parameter parameter(const std::string& word, const std::string& help) {
    return {identifier(word), word, help};
}

std::string answers_of(std::size_t study) {
    std::string words;
    for (std::size_t i = 0; i < rks_answer_count(); ++i)
        if (rks_answer_fits(i, study) != 0)
            words += (words.empty() ? "" : ", ") + std::string(rks_answer_word(i));
    return words;
}

std::string settings_of(std::size_t study) {
    std::string words;
    for (std::size_t i = 0; i < rks_setting_count(); ++i)
        if (rks_setting_fits(i, study) != 0)
            words += (words.empty() ? "" : ", ") + std::string(rks_setting_word(i));
    return words;
}

Parameter answer_parameter(std::size_t study) {
    return parameter("answer", "What is asked: one word, or a cell that holds it. Left out: " +
                                   std::string(rks_study_default_answer(study)) + ". Words: " + answers_of(study) +
                                   ".");
}

Parameter settings_parameter(std::size_t study) {
    return parameter("settings", "How it is asked: a text \"name=value; name=value\", or a range of two columns, name "
                                 "and value. May be left out. Names: " +
                                     settings_of(study) + ".");
}

} // namespace

std::string service_of(std::size_t study) {
    const std::string function = rks_study_function(study);
    return function.substr(0, function.find('.'));
}

std::string method_of(std::size_t study) {
    const std::string function = rks_study_function(study);
    std::string method = function.substr(std::min(function.size(), function.find('.') + 1));
    std::transform(method.begin(), method.end(), method.begin(), lowered);
    return method;
}

std::vector<Parameter> parameters_of(std::size_t study) {
    std::vector<Parameter> parameters;
    for (std::size_t i = 0; i < rks_argument_count(study); ++i)
        parameters.push_back(parameter(rks_argument_word(study, i), rks_argument_help(study, i)));
    if (rks_study_form(study) == RKS_FORM_STUDY) {
        parameters.push_back(answer_parameter(study));
        parameters.push_back(settings_parameter(study));
    }
    return parameters;
}

} // namespace rankstead::calc
