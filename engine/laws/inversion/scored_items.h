// The items whose scores add up to a rank statistic: distinct integer scores with multiplicities.
#pragma once

#include <cstdint>
#include <vector>

namespace rankstead {

struct ScoredItems {
    std::vector<std::int64_t> scores; // distinct, ascending
    std::vector<std::int64_t> counts; // how many items have that score

    [[nodiscard]] std::int64_t size() const;
    [[nodiscard]] std::int64_t sum() const; // of all scores
    // Groups equal neighbours of an ascending list.
    [[nodiscard]] static ScoredItems of(const std::vector<std::int64_t>& sorted);
};

} // namespace rankstead
