#include "asking.h"

#include "failure.h"
#include "words.h"

#include <algorithm>
#include <iterator>

namespace rankstead::client {
namespace {

// The settings that mean something to a program that reads files. A study that lacks one goes without.
constexpr const char* numbers_setting = "numbers";
constexpr const char* name_settings[] = {"first name", "second name"};

const OptionName* find(const std::vector<OptionName>& names, const std::string& word) {
    const auto found =
        std::find_if(names.begin(), names.end(), [&](const OptionName& name) { return name.word == word; });
    return found == names.end() ? nullptr : &*found;
}

// The value of a setting on the command line, empty where it is not given or the study has no such setting.
std::string given(const std::string& word, const OptionNames& names, const CommandLine& line) {
    const OptionName* name = find(names.settings, word);
    return name == nullptr ? "" : line.one(name->option).value_or("");
}

bool is_open(const std::string& word, const OptionNames& names, const CommandLine& line) {
    const OptionName* name = find(names.settings, word);
    return name != nullptr && !line.has(name->option);
}

// A heading that cannot be a name leaves the group with its usual one.
void give_name(Inquiry& inquiry, const std::string& setting, const Series& series) {
    if (!series.number && !series.given.empty()) {
        inquiry.set(setting, series.given);
    }
}

std::string row_text(const Series& series, std::size_t cell) {
    const bool known = cell >= 1 && cell <= series.rows.size() && series.rows[cell - 1] != 0;
    return known ? ", row " + std::to_string(series.rows[cell - 1]) : "";
}

std::string place_text(const Place& place, const std::string& source, const std::vector<Series>& data) {
    for (const Series& series : data) {
        if (folded(series.argument) == folded(place.argument)) {
            return series.number ? "--" + series.option + ' ' + series.given
                                 : source + ", column " + in_quotes(series.heading) + row_text(series, place.row);
        }
    }
    return source + ", " + place.argument;
}

bool is_given(const std::vector<Series>& data, const std::string& word) {
    return std::any_of(data.begin(), data.end(), [&](const Series& series) { return series.argument == word; });
}

// "--second COLUMN" for each argument that the command leaves out.
std::vector<std::string> options_not_given(const OptionNames& names, const std::vector<Series>& data) {
    std::vector<std::string> result;
    for (const OptionName& name : names.data) {
        if (!is_given(data, name.word)) {
            result.push_back("--" + name.option + " COLUMN");
        }
    }
    return result;
}

} // namespace

void give_settings(Inquiry& inquiry, const OptionNames& names, const CommandLine& line) {
    for (const OptionName& name : names.settings) {
        if (const std::optional<std::string> value = line.one(name.option)) {
            if (const rks_status status = inquiry.set(name.word, *value); status != RKS_OK) {
                throw Failure(exit_for(status), "--" + name.option + ' ' + *value + ": " + inquiry.message());
            }
        }
    }
}

void give_settings_of_file(Inquiry& inquiry, const OptionNames& names, const CommandLine& line,
                           const std::vector<Series>& data) {
    if (is_open(numbers_setting, names, line)) {
        inquiry.set(numbers_setting, "point");
    }
    for (std::size_t i = 0; i < std::min(data.size(), std::size(name_settings)); ++i) {
        if (is_open(name_settings[i], names, line)) {
            give_name(inquiry, name_settings[i], data[i]);
        }
    }
}

char decimal_sign_of(const OptionNames& names, const CommandLine& line) {
    return folded(given(numbers_setting, names, line)) == "comma" ? ',' : '.';
}

void give_data(Inquiry& inquiry, const std::vector<Series>& data) {
    for (const Series& series : data) {
        if (const rks_status status = inquiry.give(series.argument, library_cells(series)); status != RKS_OK) {
            throw Failure(exit_for(status), "--" + series.option + ": " + inquiry.message());
        }
    }
}

Failure run_failure(const Inquiry& inquiry, rks_status status, const std::string& source, const OptionNames& names,
                    const std::vector<Series>& data) {
    const Place place = inquiry.place();
    if (place.row != 0) {
        return {exit_for(status), place_text(place, source, data) + ": " + place.reason};
    }
    const std::vector<std::string> absent = options_not_given(names, data);
    if (status == RKS_NO_DATA && !absent.empty()) {
        return usage_failure(inquiry.message() + " Add " + joined(absent, " and ") + '.');
    }
    return {exit_for(status), source + ": " + inquiry.message()};
}

} // namespace rankstead::client
