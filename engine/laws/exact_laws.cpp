#include "exact_laws.h"

#include "binomial_coefficient.h"
#include "inversion/certified_inversion.h"

#include <algorithm>
#include <cmath>
#include <numeric>

namespace rankstead {

namespace {

// Below this the dynamic programme is taken without a look at the alternative.
constexpr double quick_seconds = 0.013;
// Setting up an inversion: power sums and tilted weights, for each distinct score.
constexpr double setup_seconds_per_score = 250e-9;

Tails tails_of(const CertifiedTail& tail) {
    Tails tails;
    tails.lower = tail.lower;
    tails.upper = std::min(1.0, 1 - tail.lower + tail.mass);
    // The upper tail is the larger one here, or both are near one half: its absolute error over one half.
    tails.relative_error = std::max(tail.relative_error, 2 * (tail.relative_error * tail.lower + tail.mass_error));
    return tails;
}

std::optional<Tails> by_inversion(const CertifiedInversion& inversion, std::int64_t statistic, double seconds) {
    const auto tail = inversion.at(statistic, seconds);
    return tail ? std::optional(tails_of(*tail)) : std::nullopt;
}

// The lowest sum there is: the ways to fill the last tie group that is not taken whole, out of all choices.
std::optional<Tails> lowest_sum_tails(const ChoiceScores& law) {
    const auto m = static_cast<std::size_t>(law.chosen);
    if (law.statistic != std::accumulate(law.scores.begin(), law.scores.begin() + law.chosen, std::int64_t{0})) {
        return std::nullopt;
    }
    const auto [begin, end] = std::equal_range(law.scores.begin(), law.scores.end(), law.scores[m - 1]);
    const std::int64_t wanted = law.scores.begin() + law.chosen - begin;
    const auto n = static_cast<std::int64_t>(law.scores.size());
    Tails tails;
    tails.lower = std::exp2(log2_choose(end - begin, wanted) - log2_choose(n, law.chosen));
    // log n! is right to a few units in the last place of n log n.
    tails.relative_error = 16 * unit_roundoff * static_cast<double>(n) * (std::log(static_cast<double>(n)) + 1);
    return tails.relative_error <= 1e-10 ? std::optional(tails) : std::nullopt;
}

bool setup_fits(const ScoredItems& items, double seconds) {
    return setup_seconds_per_score * static_cast<double>(items.scores.size()) <= seconds;
}

} // namespace

Tails exact_signed_rank_tails(const SignScores& scores, double seconds) {
    const double by_programme = signed_rank_cost(scores);
    if (by_programme <= std::min(quick_seconds, seconds)) {
        return signed_rank_tails(scores);
    }
    const bool above = 2 * scores.statistic > scores.sum;
    const ScoredItems items = ScoredItems::of(scores.scores);
    if (setup_fits(items, seconds)) {
        const std::int64_t low = above ? scores.sum - scores.statistic : scores.statistic;
        if (auto tails = by_inversion(CertifiedInversion::of_signs(items), low, seconds)) {
            if (2 * low == scores.sum) {
                tails->upper = tails->lower;
            }
            return above ? tails->swapped() : *tails;
        }
    }
    if (by_programme > seconds) {
        throw LawTooLong();
    }
    return signed_rank_tails(scores);
}

Tails exact_rank_sum_tails(const ChoiceScores& scores, double seconds) {
    const double by_programme = rank_sum_cost(scores);
    if (by_programme <= std::min(quick_seconds, seconds)) {
        return rank_sum_tails(scores);
    }
    const CanonicalChoice law = canonical(scores);
    const ScoredItems items = ScoredItems::of(law.scores.scores);
    if (setup_fits(items, seconds) && items.scores.size() > 1) {
        const auto inversion = CertifiedInversion::of_choice(items, law.scores.chosen);
        if (auto tails = by_inversion(inversion, law.scores.statistic, seconds)) {
            if (law.centred) {
                tails->upper = tails->lower;
            }
            return law.swaps ? tails->swapped() : *tails;
        }
    }
    if (by_programme <= seconds) {
        return rank_sum_tails(scores);
    }
    if (const auto tails = lowest_sum_tails(law.scores)) {
        return law.swaps ? tails->swapped() : *tails;
    }
    throw LawTooLong();
}

} // namespace rankstead
