#include "words.h"

#include <algorithm>
#include <charconv>
#include <cmath>

namespace rankstead::client {
namespace {

// The words of the catalogue are English; the C library's tolower would depend on the locale.
char lower(char c) {
    return c >= 'A' && c <= 'Z' ? static_cast<char>(c - 'A' + 'a') : c;
}
char upper(char c) {
    return c >= 'a' && c <= 'z' ? static_cast<char>(c - 'a' + 'A') : c;
}
char spaced(char c) {
    return c == '-' || c == '_' ? ' ' : lower(c);
}
char visible(char c) {
    return static_cast<unsigned char>(c) < 0x20 ? ' ' : c;
}

template <class Change>
std::string changed(std::string_view text, Change change) {
    std::string result(text);
    std::transform(result.begin(), result.end(), result.begin(), change);
    return result;
}

} // namespace

std::string folded(std::string_view word) {
    return changed(word, spaced);
}

std::string hyphenated(std::string_view word) {
    return changed(folded(word), [](char c) { return c == ' ' ? '-' : c; });
}

std::string upper_case(std::string_view word) {
    return changed(word, upper);
}

std::string in_quotes(std::string_view text) {
    return '"' + changed(text, visible) + '"';
}

std::string joined(const std::vector<std::string>& texts, std::string_view between) {
    std::string result;
    for (const std::string& text : texts) {
        result += result.empty() ? "" : between;
        result += text;
    }
    return result;
}

std::string list_in_quotes(const std::vector<std::string>& texts) {
    constexpr std::size_t most = 30;
    std::vector<std::string> shown;
    for (std::size_t i = 0; i < std::min(texts.size(), most); ++i) {
        shown.push_back(in_quotes(texts[i]));
    }
    if (texts.size() > most) {
        shown.push_back("and " + std::to_string(texts.size() - most) + " more");
    }
    return joined(shown, ", ");
}

std::string counted(std::size_t count, std::string_view noun) {
    return std::to_string(count) + ' ' + std::string(noun) + (count == 1 ? "" : "s");
}

std::optional<double> decimal(std::string_view text) {
    if (text.starts_with('+') && !text.starts_with("+-")) {
        text.remove_prefix(1);
    }
    double number = 0;
    const auto [end, error] = std::from_chars(text.data(), text.data() + text.size(), number);
    const bool whole = error == std::errc{} && end == text.data() + text.size();
    return whole && std::isfinite(number) ? std::optional(number) : std::nullopt;
}

std::string shortest(double number) {
    char buffer[40];
    const auto [end, error] = std::to_chars(buffer, buffer + sizeof buffer, number);
    return error == std::errc{} ? std::string(buffer, end) : std::string();
}

} // namespace rankstead::client
