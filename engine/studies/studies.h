// The studies: each takes its arguments, in the order of the catalogue, and gives an outcome. Throws Refusal.
#pragma once

#include "../cell.h"
#include "../outcome.h"

#include <vector>

namespace rankstead {

using Arguments = std::vector<const Block*>; // none of them null

[[nodiscard]] Outcome run_single(const Arguments& arguments, const Settings& settings);
[[nodiscard]] Outcome run_pairs(const Arguments& arguments, const Settings& settings);
[[nodiscard]] Outcome run_groups(const Arguments& arguments, const Settings& settings);
[[nodiscard]] Outcome run_build(const Arguments& arguments, const Settings& settings);

} // namespace rankstead
