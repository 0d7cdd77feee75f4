// Labels on the left, values on the right, long values over several lines.
#pragma once

#include <ostream>
#include <string>
#include <utility>
#include <vector>

namespace rankstead::client {

using Line = std::pair<std::string, std::string>; // label and value

// Values are broken between words so that no line is longer than `width` characters, where that is possible.
void print_aligned(const std::vector<Line>& lines, std::size_t width, std::ostream& out);

} // namespace rankstead::client
