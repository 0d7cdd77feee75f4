#include "counted_tails.h"

namespace rankstead::accuracy {

void CountedTails::add(const std::vector<std::uint64_t>& ways, std::int64_t lowest) {
    const std::uint64_t modulus = moduli_[through_.front().size()];
    std::vector<std::uint64_t> through(ways);
    for (std::size_t i = 1; i < through.size(); ++i) {
        through[i] = sum_modulo(through[i - 1], ways[i], modulus);
    }
    for (std::size_t i = 0; i < sums_.size(); ++i) {
        const auto index = static_cast<std::size_t>(sums_[i] - lowest);
        through_[i].push_back(through.at(index));
        at_[i].push_back(ways.at(index));
    }
}

std::vector<BigTails> CountedTails::tails() const {
    std::vector<BigTails> tails;
    for (std::size_t i = 0; i < sums_.size(); ++i) {
        const Big lower = integer_with(through_[i], moduli_);
        tails.push_back({lower, total_ - lower + integer_with(at_[i], moduli_), total_});
    }
    return tails;
}

} // namespace rankstead::accuracy
