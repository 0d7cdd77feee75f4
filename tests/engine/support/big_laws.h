// Null laws in unbounded or provably sufficient integers, by the plainest recursions: too slow to ship, right by
// construction.
#pragma once

#include <boost/multiprecision/cpp_int.hpp>

#include <cstddef>
#include <cstdint>
#include <vector>

namespace rankstead::test {

using Big = boost::multiprecision::cpp_int;

// Arrangements with a sum at most, and at least, the one asked for, out of `total`.
struct BigTails {
    Big lower;
    Big upper;
    Big total;
};

// The sum of the positive scores over all signs of up to 250 scores.
[[nodiscard]] BigTails big_sign_tails(const std::vector<std::int64_t>& scores, std::int64_t sum);

// The sum of m of the scores over all choices; C(N, m) must be below 2^127.
[[nodiscard]] BigTails big_choice_tails(const std::vector<std::int64_t>& scores, std::size_t m, std::int64_t sum);

[[nodiscard]] Big big_choose(std::size_t n, std::size_t k);

// |value - numerator / denominator| over the latter, itself right to 1e-18.
[[nodiscard]] double relative_error(double value, const Big& numerator, const Big& denominator);

} // namespace rankstead::test
