// Integers of any size by their remainders modulo enough numbers that have no common divisor (Knuth 1997,
// section 4.3.2), so that a recursion runs on words and its result is nevertheless the integer.
#pragma once

#include "big_laws.h"

#include <cstddef>
#include <cstdint>
#include <vector>

namespace rankstead::accuracy {

using test::Big;

// Pairwise coprime numbers just below 2^63 whose product exceeds 2^bits.
[[nodiscard]] std::vector<std::uint64_t> coprime_moduli(double bits);

// Both by masks: a branch would be taken at random.
[[nodiscard]] inline std::uint64_t sum_modulo(std::uint64_t a, std::uint64_t b, std::uint64_t modulus) {
    const std::uint64_t sum = a + b;
    return sum - (modulus & (0 - static_cast<std::uint64_t>(sum >= modulus)));
}

[[nodiscard]] inline std::uint64_t difference_modulo(std::uint64_t a, std::uint64_t b, std::uint64_t modulus) {
    return a - b + (modulus & (0 - static_cast<std::uint64_t>(a < b)));
}

// The integer below the product of the moduli that leaves these remainders.
[[nodiscard]] Big integer_with(const std::vector<std::uint64_t>& remainders, const std::vector<std::uint64_t>& moduli);

} // namespace rankstead::accuracy
