// Every warning: its condition and its wording, in the order of importance.
#pragma once

#include <string>
#include <vector>

namespace rankstead {

struct Outcome;

[[nodiscard]] std::vector<std::string> notes(const Outcome& outcome);

} // namespace rankstead
