#include "enumeration.h"

#include <bit>

namespace rankstead::test {

namespace {

std::int64_t sum_of_members(const std::vector<std::int64_t>& scores, std::uint64_t members) {
    std::int64_t sum = 0;
    for (std::size_t i = 0; i < scores.size(); ++i) {
        sum += (members >> i & 1U) != 0 ? scores[i] : 0;
    }
    return sum;
}

template <class Wanted>
Enumerated every_subset(const std::vector<std::int64_t>& scores, Wanted wanted) {
    Enumerated law;
    for (std::uint64_t members = 0; members < std::uint64_t{1} << scores.size(); ++members) {
        if (wanted(members)) {
            ++law.ways[sum_of_members(scores, members)];
            ++law.total;
        }
    }
    return law;
}

void extend(std::vector<std::vector<std::int64_t>>& patterns, std::vector<std::int64_t>& begun, std::int64_t rest) {
    if (rest == 0) {
        patterns.push_back(begun);
    }
    for (std::int64_t size = 1; size <= rest; ++size) {
        begun.push_back(size);
        extend(patterns, begun, rest - size);
        begun.pop_back();
    }
}

} // namespace

std::uint64_t Enumerated::at_most(std::int64_t sum) const {
    std::uint64_t count = 0;
    for (const auto& [value, number] : ways) {
        count += value <= sum ? number : 0;
    }
    return count;
}

std::uint64_t Enumerated::at_least(std::int64_t sum) const {
    return total - at_most(sum - 1);
}

double Enumerated::lower(std::int64_t sum) const {
    return static_cast<double>(at_most(sum)) / static_cast<double>(total);
}

double Enumerated::upper(std::int64_t sum) const {
    return static_cast<double>(at_least(sum)) / static_cast<double>(total);
}

double Enumerated::mean() const {
    double sum = 0;
    for (const auto& [value, number] : ways) {
        sum += static_cast<double>(value) * static_cast<double>(number);
    }
    return sum / static_cast<double>(total);
}

double Enumerated::variance() const {
    double sum = 0;
    for (const auto& [value, number] : ways) {
        const double away = static_cast<double>(value) - mean();
        sum += away * away * static_cast<double>(number);
    }
    return sum / static_cast<double>(total);
}

Enumerated every_sign(const std::vector<std::int64_t>& scores) {
    return every_subset(scores, [](std::uint64_t) { return true; });
}

Enumerated every_choice(const std::vector<std::int64_t>& scores, std::size_t m) {
    return every_subset(scores,
                        [m](std::uint64_t members) { return static_cast<std::size_t>(std::popcount(members)) == m; });
}

std::vector<std::int64_t> doubled_midranks(const std::vector<std::int64_t>& values) {
    std::vector<std::int64_t> ranks;
    for (const std::int64_t value : values) {
        std::int64_t rank = 1;
        for (const std::int64_t other : values) {
            rank += other < value ? 2 : other == value ? 1 : 0;
        }
        ranks.push_back(rank);
    }
    return ranks;
}

std::vector<std::vector<std::int64_t>> tie_patterns(std::int64_t n) {
    std::vector<std::vector<std::int64_t>> patterns;
    std::vector<std::int64_t> begun;
    extend(patterns, begun, n);
    return patterns;
}

std::vector<std::int64_t> values_of(const std::vector<std::int64_t>& pattern) {
    std::vector<std::int64_t> values;
    std::int64_t value = 0;
    for (const std::int64_t size : pattern) {
        values.insert(values.end(), static_cast<std::size_t>(size), ++value);
    }
    return values;
}

} // namespace rankstead::test
