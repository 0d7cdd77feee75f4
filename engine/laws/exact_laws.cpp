#include "exact_laws.h"

#include "inversion/certified_inversion.h"

#include <algorithm>

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
    if (by_programme > seconds) {
        throw LawTooLong();
    }
    return rank_sum_tails(scores);
}

} // namespace rankstead
