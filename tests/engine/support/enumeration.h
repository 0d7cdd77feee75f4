// Null laws by plain enumeration: every arrangement is visited and counted. Nothing here is taken from the engine.
#pragma once

#include <cstddef>
#include <cstdint>
#include <map>
#include <vector>

namespace rankstead::test {

// How many arrangements give each sum.
struct Enumerated {
    std::map<std::int64_t, std::uint64_t> ways;
    std::uint64_t total = 0;

    [[nodiscard]] std::uint64_t at_most(std::int64_t sum) const;
    [[nodiscard]] std::uint64_t at_least(std::int64_t sum) const;
    [[nodiscard]] double lower(std::int64_t sum) const;
    [[nodiscard]] double upper(std::int64_t sum) const;
    [[nodiscard]] double mean() const;
    [[nodiscard]] double variance() const;
};

// The sum of the positive scores over all 2^n signs.
[[nodiscard]] Enumerated every_sign(const std::vector<std::int64_t>& scores);

// The sum of m scores over all choices of m of them.
[[nodiscard]] Enumerated every_choice(const std::vector<std::int64_t>& scores, std::size_t m);

// Twice the midrank of each value: twice the number below it, plus the number equal to it, plus one.
[[nodiscard]] std::vector<std::int64_t> doubled_midranks(const std::vector<std::int64_t>& values);

// Every way to split n in order: the sizes of the tie groups from the lowest value up.
[[nodiscard]] std::vector<std::vector<std::int64_t>> tie_patterns(std::int64_t n);

// Values 1, 2, 3, ..., each as many times as the pattern says.
[[nodiscard]] std::vector<std::int64_t> values_of(const std::vector<std::int64_t>& pattern);

} // namespace rankstead::test
