// The law of the sum of `chosen` out of all scores, in exact integers, by one of three plain ways: partitions in a box
// where the scores are 0, 1, 2, ...; how many are taken from each level where there are few; else score by score.
#pragma once

#include "big_laws.h"
#include "tilt.h"

#include <vector>

namespace rankstead::accuracy {

using test::BigTails;

struct Choice {
    Scores scores; // ascending, lowest 0
    std::int64_t chosen = 0;
};

enum class Counting { by_partitions, by_levels, by_score };

// The one that takes fewest operations up to a sum, for a count of so many bits, and how many these are.
struct CountingPlan {
    Counting way = Counting::by_score;
    double work = 0;
};
[[nodiscard]] CountingPlan plan_of(const Choice& choice, std::int64_t sum, double bits);

// Both tails at each of the sums. No more than 2^bits arrangements have a sum up to the largest of them, and none of
// the sums is below the least that can occur.
[[nodiscard]] std::vector<BigTails> exact_choice_tails(const Choice& choice, const std::vector<std::int64_t>& sums,
                                                       double bits, Counting way);

} // namespace rankstead::accuracy
