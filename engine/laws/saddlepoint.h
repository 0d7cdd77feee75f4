// The saddlepoint approximation to the null laws, for where no exact law is within the time allowed and for finding the
// neighbourhood in which exact laws are then looked at: Lugannani & Rice (1980); for the rank sum, given the number of
// values taken, its double saddlepoint form (Skovgaard 1987; Butler 2007, chapter 4). Lattice correction: the statistic
// plus a uniform variable of width 1 is continuous, K*(b) = K(b) - log(sinh(b/2) / (b/2)), taken at w + 1/2.
#pragma once

#include "rank_sum_law.h"
#include "signed_rank_law.h"
#include "tails.h"

#include <cstdint>

namespace rankstead {

class UntiedLaw;

// Both tails, the observed value in each. Tails::relative_error is what was measured against exact laws of such sizes
// (saddlepoint_error), not a bound.
[[nodiscard]] Tails saddlepoint_tails(const SignScores& scores);
[[nodiscard]] Tails saddlepoint_tails(const ChoiceScores& scores);
[[nodiscard]] Tails saddlepoint_tails(const UntiedLaw& law, std::int64_t statistic);

// The largest relative error to expect of a p of 1e-4 and more: at least what was met against exact laws, in samples of
// many shapes, for so many values in the smaller sample (or so many differences) on so many distinct ranks. On few
// ranks the sums that can occur are no even lattice, which the correction takes them for.
//
// clang-format off
// | smaller sample  | 20 or more | 100 | 300  | 1000 | 3000 |
// |-----------------|------------|-----|------|------|------|
// | 13 or more ranks| 5 %        |0.1 %|0.01 %|0.001%|0.001%|
// | fewer ranks     | 200 %      | 30 %| 10 % | 5 %  | 1 %  |
// clang-format on
[[nodiscard]] double saddlepoint_error(std::int64_t smaller, std::size_t ranks);

} // namespace rankstead
