// The law of a sum of scores with random signs, in exact integers: the plain recursion, score by score, modulo several
// words.
#pragma once

#include "big_laws.h"
#include "tilt.h"

#include <vector>

namespace rankstead::accuracy {

using test::BigTails;

// Additions that exact_sign_tails needs up to a sum, for a count of so many bits.
[[nodiscard]] double sign_work(const Scores& scores, std::int64_t sum, double bits);

// Both tails at each of the sums. No more than 2^bits arrangements have a sum up to the largest of them. A partial sum
// that exceeds it can be forgotten, for scores are positive.
[[nodiscard]] std::vector<BigTails> exact_sign_tails(const Scores& scores, const std::vector<std::int64_t>& sums,
                                                     double bits);

} // namespace rankstead::accuracy
