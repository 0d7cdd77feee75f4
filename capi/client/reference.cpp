#include "reference.h"

#include "catalogue.h"
#include "study_options.h"
#include "words.h"

#include <algorithm>
#include <array>
#include <string>

namespace rankstead::client {
namespace {

// A vertical bar would end the cell of a Markdown table; a line break would end the table.
std::string cell(const std::string& text) {
    std::string result;
    for (const char c : text) {
        result += c == '|' ? "\\|" : c == '\n' ? " " : std::string(1, c);
    }
    return result;
}

template <std::size_t Columns>
void print_row(const std::array<std::string, Columns>& cells, std::ostream& out) {
    for (const std::string& text : cells) {
        out << "| " << cell(text) << ' ';
    }
    out << "|\n";
}

template <std::size_t Columns>
void print_head(const std::array<std::string, Columns>& headings, std::ostream& out) {
    print_row(headings, out);
    for (std::size_t i = 0; i < Columns; ++i) {
        out << "|---";
    }
    out << "|\n";
}

std::string code(const std::string& text) {
    return text.empty() ? "" : '`' + text + '`';
}

std::string formula(const Study& study) {
    std::vector<std::string> parts = words_of(study.arguments);
    if (!study.helper) {
        parts.insert(parts.end(), {"answer", "settings"});
    }
    return '=' + study.function + '(' + joined(parts, "; ") + ')';
}

std::string kind(const Answer& answer) {
    return answer.kind == RKS_ANSWER_NUMBER ? "number" : answer.kind == RKS_ANSWER_TABLE ? "table" : "text";
}

void print_study(const Study& study, std::ostream& out) {
    const OptionNames names = option_names_of(study);
    out << "\n### " << study.word << "\n\n" << study.help << "\n\n";
    out << "In a cell: " << code(formula(study)) << "  \n";
    out << "On the command line: " << code("rankstead " + synopsis(study, names)) << '\n';
    if (study.arguments.empty()) {
        return;
    }
    out << '\n';
    print_head<3>({"argument", "option", "meaning"}, out);
    for (std::size_t i = 0; i < study.arguments.size(); ++i) {
        print_row<3>({study.arguments[i].word, code("--" + names.data[i].option), study.arguments[i].help}, out);
    }
}

void print_studies(std::ostream& out) {
    out << "\n## Studies\n\n";
    print_head<3>({"study", "cell function", "what it does"}, out);
    for (const Study& study : studies()) {
        print_row<3>({study.word, code(study.function), study.help}, out);
    }
    for (const Study& study : studies()) {
        print_study(study, out);
    }
}

void print_answers(std::ostream& out) {
    out << "\n## Answers\n\n";
    print_head<4>({"answer", "kind", "studies", "meaning"}, out);
    for (const Answer& answer : answers()) {
        print_row<4>({answer.word, kind(answer), joined(answer.studies, ", "), answer.help}, out);
    }
}

// The option of a setting in the first study that has it.
std::string setting_option(const Setting& setting) {
    for (const Study& study : studies()) {
        for (const OptionName& name : option_names_of(study).settings) {
            if (name.word == setting.word) {
                return "--" + name.option;
            }
        }
    }
    return "";
}

void print_settings(std::ostream& out) {
    out << "\n## Settings\n\n";
    print_head<6>({"setting", "option", "values", "default", "studies", "meaning"}, out);
    for (const Setting& setting : settings()) {
        print_row<6>({setting.word, code(setting_option(setting)), setting.values, setting.default_value,
                      joined(setting.studies, ", "), setting.help},
                     out);
    }
}

} // namespace

void print_reference(std::ostream& out) {
    out << "# Rankstead reference\n";
    print_studies(out);
    print_answers(out);
    print_settings(out);
    out << "\n## Caution\n\n" << rks_caution() << '\n';
}

} // namespace rankstead::client
