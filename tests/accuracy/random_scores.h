// Random tie patterns, the same in every run and on every machine, and the midranks they give.
#pragma once

#include "data.h"
#include "tilt.h"

#include <cstdint>

namespace rankstead::accuracy {

using test::Random;

enum class Ties {
    none,
    light,       // a scale of twenty times as many levels as there are values
    even_levels, // so many levels, equally likely
    skew_levels, // so many levels, each half as likely as the one before
    one_heavy,   // half to nearly all values at one level, the others distinct
};

// A multiple of 2^-20 in [0, 1).
[[nodiscard]] double fraction(Random& random);
// Whole numbers whose logarithms are equally spread; both limits included.
[[nodiscard]] std::int64_t log_whole(Random& random, std::int64_t lowest, std::int64_t highest);

// Sizes of the groups of equal values among `n`, in ascending order of value.
[[nodiscard]] Scores random_group_sizes(Random& random, std::int64_t n, Ties ties, std::int64_t levels);

// Doubled midranks of groups that follow `before` smaller values, one for each value, divided by their common divisor.
[[nodiscard]] Scores midranks(const Scores& group_sizes, std::int64_t before);
// The same less the lowest of them.
[[nodiscard]] Scores midranks_from_zero(const Scores& group_sizes);

} // namespace rankstead::accuracy
