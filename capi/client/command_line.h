// What was given on the command line, read by cxxopts and checked for what cxxopts lets pass.
#pragma once

#include <cxxopts.hpp>

#include <cstddef>
#include <optional>
#include <string>
#include <utility>
#include <vector>

namespace rankstead::client {

class CommandLine {
public:
    // `help` is the command that explains the options, for messages.
    CommandLine(cxxopts::Options& options, const std::vector<std::string>& arguments, std::string help);

    bool has(const std::string& option) const { return !all(option).empty(); }
    std::vector<std::string> all(const std::string& option) const;

    // The value of an option that may be given once.
    std::optional<std::string> one(const std::string& option) const;
    std::string needed(const std::string& option) const;

    // The same, as a whole number or a decimal with a point.
    std::size_t count(const std::string& option) const;
    double number(const std::string& option) const;

    // Everything that is neither an option nor the value of one.
    const std::vector<std::string>& rest() const { return rest_; }

    // Where to look up the options, as the last sentence of a message.
    std::string see_help() const { return " See: " + help_; }

private:
    void refuse_options_as_values(const std::vector<std::string>& arguments) const;

    std::vector<std::pair<std::string, std::string>> given_;
    std::vector<std::string> rest_;
    std::string help_;
};

} // namespace rankstead::client
