// The shapes of data on which every law has to stay within its bound, and the trial of one shape.
#pragma once

#include "random_scores.h"
#include "tally.h"

#include <cstdint>
#include <string>
#include <vector>

namespace rankstead::accuracy {

// How much of the whole trial is run, and how many word operations the exact counting of one law may take.
struct Effort {
    double share_of_laws = 1;
    double work = 5e8;
};

struct SignShape {
    std::string name;
    std::int64_t least_n;
    std::int64_t most_n;
    Ties ties;
    std::int64_t levels;
    bool zeros; // that are ranked and then set aside (Pratt 1959)
    int laws;
    std::uint64_t seed;
};

struct ChoiceShape {
    std::string name;
    std::int64_t least_first;
    std::int64_t most_first;
    std::int64_t least_ratio; // second sample / first sample
    std::int64_t most_ratio;
    Ties ties;
    std::int64_t levels;
    int laws;
    std::uint64_t seed;
    double work = 1; // times that of the trial
};

[[nodiscard]] const std::vector<SignShape>& sign_shapes();
[[nodiscard]] const std::vector<ChoiceShape>& choice_shapes();

inline constexpr int sums_per_law = 5;

// Every law of the shape at several sums, by all that answer for it: the chooser, the tables without ties, and
// inversion where the chooser would not take it.
[[nodiscard]] Tally trial(const SignShape& shape, const Effort& effort);
[[nodiscard]] Tally trial(const ChoiceShape& shape, const Effort& effort);

} // namespace rankstead::accuracy
