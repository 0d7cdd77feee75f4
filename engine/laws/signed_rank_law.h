// The null law of the signed rank statistic, conditional on the ties and zeros observed: every sign equally likely.
// Additive dynamic programming over integer scores (Streitberg & Roehmel 1986), the smaller half only.
#pragma once

#include "../ranks.h"
#include "tails.h"

#include <cstdint>
#include <vector>

namespace rankstead {

// Scores with multiplicities, divided by their common divisor.
struct SignScores {
    std::vector<std::int64_t> scores; // one for each non-zero difference, ascending
    std::int64_t sum = 0;
    std::int64_t statistic = 0; // sum of the scores of the positive differences
};

[[nodiscard]] SignScores sign_scores(const SignedRanking& ranking);

// 1, 2, ..., n: no ties, no zeros.
[[nodiscard]] SignScores untied_sign_scores(std::int64_t n, std::int64_t statistic);

// Predicted seconds for one law, and whether the doubles of the law can hold it at all.
[[nodiscard]] double signed_rank_cost(const SignScores& scores);

[[nodiscard]] Tails signed_rank_tails(const SignScores& scores);

// P(T <= k) for all k up to half the range, without ties, computed once while that is quick, else for each k.
class UntiedSignedRankLaw {
public:
    explicit UntiedSignedRankLaw(std::int64_t n);
    // Both tails at T = k, 0 <= k <= n(n+1)/2. Throws LawTooLong.
    [[nodiscard]] Tails at(std::int64_t k) const;

private:
    std::int64_t n_;
    std::int64_t sum_;
    std::vector<std::uint64_t> counted_; // cumulative counts, where 2^n fits
    std::vector<double> summed_;         // else cumulative probabilities
};

} // namespace rankstead
