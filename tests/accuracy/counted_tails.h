// From the numbers of arrangements by sum, one modulus at a time, to both tails.
#pragma once

#include "big_laws.h"
#include "moduli.h"

#include <cstdint>
#include <vector>

namespace rankstead::accuracy {

using test::BigTails;

class CountedTails {
public:
    // No more than 2^bits arrangements have a sum up to the largest of `sums`; `total` have any sum.
    CountedTails(std::vector<std::int64_t> sums, double bits, Big total)
        : sums_(std::move(sums)), moduli_(coprime_moduli(bits)), total_(std::move(total)), through_(sums_.size()),
          at_(sums_.size()) {}

    [[nodiscard]] const std::vector<std::uint64_t>& moduli() const { return moduli_; }

    // ways[s - lowest] arrangements have the sum s, modulo the next modulus.
    void add(const std::vector<std::uint64_t>& ways, std::int64_t lowest);

    [[nodiscard]] std::vector<BigTails> tails() const;

private:
    std::vector<std::int64_t> sums_;
    std::vector<std::uint64_t> moduli_;
    Big total_;
    std::vector<std::vector<std::uint64_t>> through_; // by sum, by modulus
    std::vector<std::vector<std::uint64_t>> at_;
};

} // namespace rankstead::accuracy
