// Random sums in the lower half of a law, each that of some arrangement, with p spread from one half to 1e-300.
#pragma once

#include "random_scores.h"
#include "tilt.h"

#include <functional>
#include <vector>

namespace rankstead::accuracy {

struct RandomSums {
    std::vector<std::int64_t> sums;
    double bits = 0; // at least log2 of the number of arrangements up to the largest of them
};

// What exact counting takes for all sums up to the one given, whose arrangements take so many bits.
using WorkUpTo = std::function<double(std::int64_t sum, double bits)>;

// Half of the sums have the logarithm of p evenly spread over the law, half are up to five standard deviations from the
// mean. Where counting would take more than `most_work`, they stay further out in the tail.
[[nodiscard]] RandomSums random_sign_sums(Random& random, const Scores& scores, int wanted, const WorkUpTo& work,
                                          double most_work);
[[nodiscard]] RandomSums random_choice_sums(Random& random, const Scores& scores, std::int64_t chosen, int wanted,
                                            const WorkUpTo& work, double most_work);

} // namespace rankstead::accuracy
