// How words from cells are compared: upper and lower case are the same, and so are spaces, hyphens and underscores.
#pragma once

#include <string>
#include <string_view>
#include <vector>

namespace rankstead {

// Lower case (ASCII), hyphens and underscores as spaces, single spaces, none at the ends.
[[nodiscard]] std::string folded(std::string_view word);

// Folded, after anything from the first `(` on and trailing colons are taken off: "Estimate (days):" is "estimate".
[[nodiscard]] std::string folded_label(std::string_view label);

[[nodiscard]] std::vector<std::string_view> split(std::string_view text, char at);

[[nodiscard]] bool is_utf8(std::string_view text);

// "a, b or c"
[[nodiscard]] std::string listed(const std::vector<std::string>& words);

} // namespace rankstead
