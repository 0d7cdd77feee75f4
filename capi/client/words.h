// Words and texts as the client shows and compares them.
#pragma once

#include <optional>
#include <string>
#include <string_view>
#include <vector>

namespace rankstead::client {

// Lower case, with hyphens and underscores as spaces: the form in which words are compared.
std::string folded(std::string_view word);

// The spelling of a word on the command line: "chance interval" is chance-interval.
std::string hyphenated(std::string_view word);

std::string upper_case(std::string_view word);

// In double quotes, on one line: line breaks inside a heading would break the message.
std::string in_quotes(std::string_view text);

std::string joined(const std::vector<std::string>& texts, std::string_view between);

// `"a", "b", "c"`, shortened after thirty.
std::string list_in_quotes(const std::vector<std::string>& texts);

// "1 row", "3 rows".
std::string counted(std::size_t count, std::string_view noun);

// A finite decimal with a point, in every locale; nothing else may follow it.
std::optional<double> decimal(std::string_view text);

// The shortest text that reads back as the same number.
std::string shortest(double number);

} // namespace rankstead::client
