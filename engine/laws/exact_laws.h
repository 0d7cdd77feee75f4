// Exact tails by whichever way is predicted to be quicker: dynamic programming for small laws, certified inversion for
// large ones. Predictions depend on the data alone, so that every machine chooses alike.
#pragma once

#include "rank_sum_law.h"
#include "signed_rank_law.h"
#include "tails.h"

#include <optional>

namespace rankstead {

// Thrown where no exact law is within the time allowed; a study then turns to the approximation and says so.
struct LawTooLong {};

// What one law may take: by itself, and as one of the dozen that a pair of limits needs. Half a second is the ceiling
// for anything automatic.
inline constexpr double seconds_for_p = 0.12;
inline constexpr double seconds_for_a_gap = 0.025;

// Throw LawTooLong.
[[nodiscard]] Tails exact_signed_rank_tails(const SignScores& scores, double seconds);
[[nodiscard]] Tails exact_rank_sum_tails(const ChoiceScores& scores, double seconds);

} // namespace rankstead
