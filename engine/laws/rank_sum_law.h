// The null law of the rank sum, conditional on the ties observed: every choice of m of the N pooled values equally
// likely. With ties by split-up dynamic programming (van de Wiel 2001): each half of the pooled values by itself,
// merged with cumulative sums. Without ties by the Gaussian binomial (Andrews 1976) in exact integers, modulo a power
// of two that the result is known to stay below.
#pragma once

#include "../ranks.h"
#include "tails.h"

#include <cstdint>
#include <memory>
#include <vector>

namespace rankstead {

// The scores of the pooled values, lowest 0, divided by their common divisor; the law is that of the sum of `chosen` of
// them, `statistic` the observed sum.
struct ChoiceScores {
    std::vector<std::int64_t> scores; // ascending
    std::int64_t chosen = 0;
    std::int64_t statistic = 0;
};

[[nodiscard]] ChoiceScores choice_scores(const PooledRanking& ranking);

// 0, 1, ..., first + second - 1, with U of the first sample.
[[nodiscard]] ChoiceScores untied_choice_scores(std::int64_t first, std::int64_t second, std::int64_t u);

// A law brought to the smaller sample and to the lower half, so that equal questions are one computation and the tail
// that is summed is the smaller one.
struct CanonicalChoice {
    ChoiceScores scores;
    bool swaps = false;   // whether the tails change places
    bool centred = false; // symmetric and at its centre: both tails are equal
};
[[nodiscard]] CanonicalChoice canonical(const ChoiceScores& scores);

// Predicted seconds for one law; infinity where it would need too much memory or overflow a double.
[[nodiscard]] double rank_sum_cost(const ChoiceScores& scores);

// Both tails. Swapping the samples swaps the tails exactly.
[[nodiscard]] Tails rank_sum_tails(const ChoiceScores& scores);

class UntiedInversion;

// Both tails at any statistic, without ties: counted once in exact integers while that is quick, else by inversion in
// closed form.
class UntiedRankSumLaw {
public:
    UntiedRankSumLaw(std::int64_t first, std::int64_t second); // first * second below 2^62
    ~UntiedRankSumLaw();
    UntiedRankSumLaw(const UntiedRankSumLaw&) = delete;
    UntiedRankSumLaw& operator=(const UntiedRankSumLaw&) = delete;

    // Both tails at U = k, 0 <= k <= first * second. Throws LawTooLong.
    [[nodiscard]] Tails at(std::int64_t k) const;
    // The same, from the saddlepoint approximation where the exact law would take too long.
    [[nodiscard]] Tails best_at(std::int64_t k) const;

private:
    [[nodiscard]] Tails lower_half_at(std::int64_t low) const;

    class Cumulative;
    std::int64_t first_;
    std::int64_t second_;
    std::unique_ptr<Cumulative> cumulative_;
    std::unique_ptr<const UntiedInversion> inversion_;
};

} // namespace rankstead
