// The rank sum near the low end of its range, where few arrangements lie below it. Every choice differs from the one
// with the lowest sum by leaving out some of its values and taking as many of the others; what that adds to the sum is
// counted by dynamic programming on both sides of the boundary (in the manner of van de Wiel 2001), up to the sum
// observed.
#pragma once

#include "rank_sum_law.h"
#include "tails.h"

#include <optional>

namespace rankstead {

// Predicted seconds; infinity where it would need too much memory.
[[nodiscard]] double low_end_seconds(const ChoiceScores& scores);

// Both tails. Empty where the counts leave the range of a double.
[[nodiscard]] std::optional<Tails> low_end_tails(const ChoiceScores& scores);

} // namespace rankstead
