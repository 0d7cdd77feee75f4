// Choices counted score by score. A row holds, for the number of scores taken so far, the ways by the excess of their
// sum over the least such sum. Whatever could not be brought within the largest sum by taking the next scores is
// forgotten, which leaves little to do far out in the tail.
#pragma once

#include "exact_choice_law.h"

#include <cstdint>
#include <vector>

namespace rankstead::accuracy {

class ChoiceByScore {
public:
    ChoiceByScore(const Choice& choice, std::int64_t largest_sum);

    [[nodiscard]] double additions() const; // for one modulus
    [[nodiscard]] std::int64_t least_sum() const { return least(chosen_); }
    // By sum, from the least sum on.
    [[nodiscard]] std::vector<std::uint64_t> ways(std::uint64_t modulus) const;

private:
    // The sum of the lowest `count` scores.
    [[nodiscard]] std::int64_t least(std::int64_t count) const { return sums_[static_cast<std::size_t>(count)]; }
    [[nodiscard]] std::int64_t score(std::int64_t i) const { return scores_[static_cast<std::size_t>(i)]; }
    // Excesses of `count` of the first `seen` scores that are possible and of use; negative where there are none.
    [[nodiscard]] std::int64_t highest_excess(std::int64_t seen, std::int64_t count) const;
    template <class Step>
    void for_each_step(Step step) const;

    const Scores& scores_;
    std::int64_t chosen_;
    std::int64_t largest_sum_;
    Scores sums_;
};

} // namespace rankstead::accuracy
