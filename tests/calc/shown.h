// What a cell shows: a number, a text or an error.
#ifndef RANKSTEAD_TESTS_CALC_SHOWN_H
#define RANKSTEAD_TESTS_CALC_SHOWN_H

#include <stdexcept>
#include <string>
#include <variant>

namespace calc_tests {

// Calc's numbers of cell errors.
enum class CellError { invalid_argument = 502, parameter_list = 504, no_value = 519, not_available = 32767 };

using Shown = std::variant<double, std::string, CellError>;

std::string in_words(const Shown& shown);

// The number, text or error; throws if it is something else. `what` says of which cell or formula.
template <typename Kind>
Kind expected_kind(const std::string& what, const Shown& shown, const char* kind) {
    if (const Kind* value = std::get_if<Kind>(&shown))
        return *value;
    throw std::runtime_error(what + " should show " + kind + " but shows " + in_words(shown));
}

} // namespace calc_tests

#endif
