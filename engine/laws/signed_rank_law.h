// The null law of the signed rank statistic, conditional on the ties and zeros observed: every sign equally likely.
// Additive dynamic programming over integer scores (Streitberg & Roehmel 1986), the smaller half only.
#pragma once

#include "../ranks.h"
#include "tails.h"

#include <cstdint>
#include <memory>
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

class UntiedInversion;

// Both tails at any statistic, without ties: one table for all of them while that is quick, else by inversion in closed
// form.
class UntiedSignedRankLaw {
public:
    explicit UntiedSignedRankLaw(std::int64_t n); // 1 to 2e9
    ~UntiedSignedRankLaw();
    UntiedSignedRankLaw(const UntiedSignedRankLaw&) = delete;
    UntiedSignedRankLaw& operator=(const UntiedSignedRankLaw&) = delete;

    // Both tails at T = k, 0 <= k <= n(n+1)/2. Throws LawTooLong.
    [[nodiscard]] Tails at(std::int64_t k) const;
    // The same, from the saddlepoint approximation where the exact law would take too long.
    [[nodiscard]] Tails best_at(std::int64_t k) const;

private:
    [[nodiscard]] Tails tabled(std::size_t low) const;

    std::int64_t n_;
    std::int64_t sum_;
    std::vector<std::uint64_t> counted_; // cumulative counts up to half the range, while 2^n fits
    std::vector<double> summed_;         // else cumulative probabilities, while that is quick
    std::unique_ptr<const UntiedInversion> inversion_;
};

} // namespace rankstead
