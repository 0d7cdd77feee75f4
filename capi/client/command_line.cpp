#include "command_line.h"

#include "failure.h"
#include "words.h"

#include <algorithm>
#include <charconv>

namespace rankstead::client {
namespace {

// cxxopts knows one-letter options by one hyphen only: --n 10 and --n=10 become -n 10.
void append_for_cxxopts(const std::string& argument, std::vector<std::string>& out) {
    const bool one_letter = argument.size() > 2 && argument.starts_with("--") && argument[2] != '-';
    if (one_letter && argument.size() == 3) {
        out.push_back(argument.substr(1));
    } else if (one_letter && argument[3] == '=') {
        out.push_back(argument.substr(1, 2));
        out.push_back(argument.substr(4));
    } else {
        out.push_back(argument);
    }
}

std::vector<std::string> for_cxxopts(const std::vector<std::string>& arguments) {
    std::vector<std::string> result{"rankstead"};
    for (const std::string& argument : arguments) {
        append_for_cxxopts(argument, result);
    }
    return result;
}

cxxopts::ParseResult parsed(cxxopts::Options& options, const std::vector<std::string>& arguments) {
    std::vector<const char*> pointers;
    pointers.reserve(arguments.size());
    for (const std::string& argument : arguments) {
        pointers.push_back(argument.c_str());
    }
    return options.parse(static_cast<int>(pointers.size()), pointers.data());
}

} // namespace

CommandLine::CommandLine(cxxopts::Options& options, const std::vector<std::string>& arguments, std::string help)
    : help_(std::move(help)) {
    try {
        const cxxopts::ParseResult result = parsed(options, for_cxxopts(arguments));
        for (const cxxopts::KeyValue& given : result.arguments()) {
            given_.emplace_back(given.key(), given.value());
        }
        rest_ = result.unmatched();
    } catch (const cxxopts::exceptions::exception& refusal) {
        throw usage_failure(refusal.what() + std::string(".") + see_help());
    }
    refuse_options_as_values(arguments);
}

// `--first --second new` would otherwise look for a column called "--second".
void CommandLine::refuse_options_as_values(const std::vector<std::string>& arguments) const {
    for (const auto& [option, value] : given_) {
        if (value.starts_with("--") && std::find(arguments.begin(), arguments.end(), value) != arguments.end()) {
            throw usage_failure(
                joined({"--", option, " needs a value, but ", in_quotes(value),
                        " follows it. (A value that begins with -- is written --", option, "=VALUE.)", see_help()},
                       ""));
        }
    }
}

std::vector<std::string> CommandLine::all(const std::string& option) const {
    std::vector<std::string> result;
    for (const auto& [name, value] : given_) {
        if (name == option) {
            result.push_back(value);
        }
    }
    return result;
}

std::optional<std::string> CommandLine::one(const std::string& option) const {
    const std::vector<std::string> values = all(option);
    if (values.size() > 1) {
        throw usage_failure("--" + option + " is given " + std::to_string(values.size()) + " times: give it once.");
    }
    return values.empty() ? std::nullopt : std::optional(values.front());
}

std::string CommandLine::needed(const std::string& option) const {
    const std::optional<std::string> value = one(option);
    if (!value) {
        throw usage_failure("--" + option + " is missing." + see_help());
    }
    return *value;
}

std::size_t CommandLine::count(const std::string& option) const {
    const std::string text = needed(option);
    std::size_t count = 0;
    const auto [end, error] = std::from_chars(text.data(), text.data() + text.size(), count);
    if (error != std::errc{} || end != text.data() + text.size()) {
        throw usage_failure("--" + option + " takes a whole number, not " + in_quotes(text) + '.');
    }
    return count;
}

double CommandLine::number(const std::string& option) const {
    const std::string text = needed(option);
    const std::optional<double> number = decimal(text);
    if (!number) {
        throw usage_failure("--" + option + " takes a number with a decimal point, not " + in_quotes(text) + '.');
    }
    return *number;
}

} // namespace rankstead::client
