// Exact tails by whichever way is predicted to be quicker: dynamic programming for small laws, certified inversion for
// large ones. Predictions depend on the data alone, so that every machine chooses alike.
//
// clang-format off
// | law                                          | predicted cost                              | taken                      |
// |----------------------------------------------|---------------------------------------------|----------------------------|
// | signed rank: additive programme              | 0.2 ns x scores x statistic                 | up to 0.8 ms               |
// | signed rank without ties: table of the law   | the same, for all statistics at once        | n up to 180                |
// | rank sum without ties: Gaussian binomial     | 1 ns x m x mn                               | up to 4 ms, if it is exact |
// | rank sum without ties: few arrangements      | 2 ns x m x U, where 126 bits hold them      | up to 1 ms                 |
// | rank sum: split-up programme                 | 0.2 ns an addition, 2 ns a merge            | up to 2.5 ms               |
// | rank sum near its low end: changes           | 0.5 ns x values x changes x excess          | up to 2.5 ms               |
// | up to 6 levels: sum over the numbers taken   | 5 ns a sum, 0.7 ns a product                | up to 5 ms                 |
// | no ties: inversion in closed form            | 10 us at any size, more in the far corners  | otherwise                  |
// | ties: inversion                              | 1 to 100 ms, counted as it goes             | otherwise                  |
// clang-format on
//
// Measured by tests/bench/goals.sh, which times both sides of each crossover. A slower way is taken when the quicker
// one cannot bound its error, as long as it is within the time allowed.
#pragma once

#include "inversion/untied_inversion.h"
#include "rank_sum_law.h"
#include "signed_rank_law.h"
#include "tails.h"

namespace rankstead {

// Thrown where no exact law is within the time allowed.
struct LawTooLong {};

// What one law may take: by itself, and as one of the several that a pair of limits needs. Half a second is the ceiling
// for anything automatic.
inline constexpr double seconds_for_p = 0.2;
inline constexpr double seconds_for_a_gap = 0.07;

// All throw LawTooLong.
[[nodiscard]] Tails exact_signed_rank_tails(const SignScores& scores, double seconds);
[[nodiscard]] Tails exact_rank_sum_tails(const ChoiceScores& scores, double seconds);

// Exact where that is within the time allowed, else the saddlepoint approximation, as Tails::law says.
[[nodiscard]] Tails best_signed_rank_tails(const SignScores& scores, double seconds);
[[nodiscard]] Tails best_rank_sum_tails(const ChoiceScores& scores, double seconds);

[[nodiscard]] constexpr bool is_exact(LawKind law) {
    return law != LawKind::saddlepoint && law != LawKind::normal;
}

// Without ties, at a statistic in the lower half, with the inversion prepared for the sizes.
[[nodiscard]] Tails untied_signed_rank_tails(std::int64_t n, std::int64_t low, const UntiedInversion& inversion);
[[nodiscard]] Tails untied_rank_sum_tails(std::int64_t first, std::int64_t second, std::int64_t low,
                                          const UntiedInversion& inversion);

} // namespace rankstead
