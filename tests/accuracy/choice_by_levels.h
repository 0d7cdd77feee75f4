// Choices counted by how many are taken from each level of equal scores: a product of binomial coefficients for every
// way to divide the number chosen among the levels.
#pragma once

#include "big_laws.h"
#include "exact_choice_law.h"

#include <vector>

namespace rankstead::accuracy {

// How many ways there are to divide, at most.
[[nodiscard]] double divisions_among_levels(const Choice& choice);

[[nodiscard]] std::vector<BigTails> choice_tails_by_levels(const Choice& choice, const std::vector<std::int64_t>& sums);

} // namespace rankstead::accuracy
