#include "exact_laws.h"

#include "binomial_coefficient.h"
#include "few_levels_law.h"
#include "inversion/certified_inversion.h"
#include "low_end_law.h"
#include "saddlepoint.h"
#include "sign_law.h"

#include <algorithm>
#include <cmath>
#include <limits>
#include <numeric>
#include <optional>

namespace rankstead {

namespace {

// Below this the dynamic programme is taken without a look at the alternative.
constexpr double quick_signs = 0.0008;
constexpr double quick_choices = 0.0025;
constexpr double quick_levels = 0.005;
// Variance of the number taken, m (N - m) / N, below which few frequencies are negligible: unbalanced samples.
constexpr double least_spread_of_counts = 35;
// Setting up an inversion: power sums and tilted weights, for each distinct score.
constexpr double setup_seconds_per_score = 60e-9;

Tails tails_of(const CertifiedTail& tail, LawKind law) {
    // The upper tail is the larger one here, or both are near one half: its absolute error over one half.
    const double error = std::max(tail.relative_error, 2 * (tail.relative_error * tail.lower + tail.mass_error));
    return from_lower(law, tail.lower, 1 - tail.lower + tail.mass, error);
}

std::optional<Tails> by_inversion(const CertifiedInversion& inversion, std::int64_t statistic, double seconds) {
    const auto tail = inversion.at(statistic, seconds);
    return tail ? std::optional(tails_of(*tail, LawKind::inverted)) : std::nullopt;
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
    // log n! is right to a few units in the last place of n log n.
    const double error = 16 * unit_roundoff * static_cast<double>(n) * (std::log(static_cast<double>(n)) + 1);
    const double lower = std::exp2(log2_choose(end - begin, wanted) - log2_choose(n, law.chosen));
    return error <= useful_accuracy ? std::optional(from_lower(LawKind::summed, lower, 1, error)) : std::nullopt;
}

bool setup_fits(const ScoredItems& items, double seconds) {
    return setup_seconds_per_score * static_cast<double>(items.scores.size()) <= seconds;
}

// In the corners where the closed form has to multiply factor by factor.
constexpr double seconds_for_closed_form = 0.06;
constexpr std::int64_t most_listed = 4'000'000; // scores that are written down
constexpr std::size_t least_closed = 130;       // values from which on frequencies are negligible without ties

// Scores first, first + 1, ...: no ties.
bool is_run(const std::vector<std::int64_t>& scores, std::int64_t first) {
    return scores.back() - scores.front() + 1 == static_cast<std::int64_t>(scores.size()) && scores.front() == first &&
           std::adjacent_find(scores.begin(), scores.end()) == scores.end();
}

std::optional<Tails> closed_form(const UntiedInversion& inversion, std::int64_t low) {
    const auto tail = inversion.at(low, seconds_for_closed_form);
    return tail ? std::optional(tails_of(*tail, LawKind::closed)) : std::nullopt;
}

// On few levels, within the time allowed.
template <class MakeLaw>
std::optional<Tails> by_levels(const ScoredItems& items, const MakeLaw& make_law, double seconds) {
    if (items.scores.size() < 2 || items.scores.size() > FewLevelsLaw::most_levels) {
        return std::nullopt;
    }
    const FewLevelsLaw law = make_law();
    if (law.seconds() > seconds) {
        return std::nullopt;
    }
    const auto tail = law.evaluate();
    return tail ? std::optional(tails_of(*tail, LawKind::summed)) : std::nullopt;
}

// The statistic in the lower half of the law.
std::optional<Tails> signed_rank_tails_at(const SignScores& scores, std::int64_t low, double seconds) {
    if (is_run(scores.scores, 1)) {
        const auto n = static_cast<std::int64_t>(scores.scores.size());
        if (auto tails = closed_form(UntiedInversion::of_signed_rank(n), low)) {
            return tails;
        }
    }
    const ScoredItems items = ScoredItems::of(scores.scores);
    const auto levels = [&] { return FewLevelsLaw::of_signs(items, low); };
    if (auto tails = by_levels(items, levels, std::min(quick_levels, seconds))) {
        return tails;
    }
    if (setup_fits(items, seconds)) {
        if (auto tails = by_inversion(CertifiedInversion::of_signs(items), low, seconds)) {
            return tails;
        }
    }
    return by_levels(items, levels, seconds);
}

std::optional<Tails> closed_form(const ChoiceScores& law) {
    if (law.scores.size() < least_closed || !is_run(law.scores, 0)) {
        return std::nullopt;
    }
    const auto rest = static_cast<std::int64_t>(law.scores.size()) - law.chosen;
    const std::int64_t u = law.statistic - law.chosen * (law.chosen - 1) / 2;
    return closed_form(UntiedInversion::of_rank_sum(law.chosen, rest), u);
}

// Whether the number of all choices fits 63 bits, so that arrangements are counted.
bool is_countable(const ChoiceScores& scores) {
    return log2_choose(static_cast<std::int64_t>(scores.scores.size()), scores.chosen) < 62.9;
}

// The smaller sample so small beside the other that few frequencies are negligible.
bool is_unbalanced(const ChoiceScores& scores) {
    const auto n = static_cast<double>(scores.scores.size());
    const auto m = static_cast<double>(scores.chosen);
    return m * (n - m) < least_spread_of_counts * n;
}

// Choices of one or two values with a sum of at most w, from both ends of the list.
std::uint64_t choices_at_most(const std::vector<std::int64_t>& scores, std::int64_t chosen, std::int64_t w) {
    if (chosen == 1) {
        return static_cast<std::uint64_t>(std::upper_bound(scores.begin(), scores.end(), w) - scores.begin());
    }
    std::uint64_t count = 0;
    std::size_t high = scores.size();
    for (std::size_t low = 0; low < high; ++low) {
        while (high > low + 1 && scores[low] + scores[high - 1] > w) {
            --high;
        }
        count += high - low - 1;
    }
    return count;
}

// One or two values against all others.
std::optional<Tails> one_or_two_values_tails(const ChoiceScores& law) {
    if (law.chosen > 2) {
        return std::nullopt;
    }
    const auto n = static_cast<std::uint64_t>(law.scores.size());
    const std::uint64_t total = law.chosen == 1 ? n : n * (n - 1) / 2;
    return from_counts({choices_at_most(law.scores, law.chosen, law.statistic),
                        total - choices_at_most(law.scores, law.chosen, law.statistic - 1), total});
}

// Canonical scores.
std::optional<Tails> rank_sum_tails_of(const ChoiceScores& law, double seconds) {
    if (law.scores.front() == law.scores.back()) {
        return Tails(); // all equal: every choice has the same sum
    }
    if (auto tails = one_or_two_values_tails(law)) {
        return tails;
    }
    const double by_programme = rank_sum_cost(law);
    const bool quick = by_programme <= std::min(quick_choices, seconds);
    if (quick && is_countable(law)) {
        return rank_sum_tails(law);
    }
    const ScoredItems items = ScoredItems::of(law.scores);
    const auto levels = [&] { return FewLevelsLaw::of_choice(items, law.chosen, law.statistic); };
    if (auto tails = by_levels(items, levels, std::min({quick_levels, seconds, by_programme}))) {
        return tails;
    }
    if (quick) {
        return rank_sum_tails(law);
    }
    if (auto tails = closed_form(law)) {
        return tails;
    }
    if (by_programme <= seconds && is_unbalanced(law)) {
        return rank_sum_tails(law);
    }
    const double at_low_end = low_end_seconds(law);
    if (at_low_end <= std::min(quick_choices, seconds)) {
        if (auto tails = low_end_tails(law)) {
            return tails;
        }
    }
    const double for_inversion = std::min({seconds, by_programme, at_low_end});
    if (setup_fits(items, for_inversion)) {
        const auto inversion = CertifiedInversion::of_choice(items, law.chosen);
        if (auto tails = by_inversion(inversion, law.statistic, for_inversion)) {
            return tails;
        }
    }
    if (auto tails = by_levels(items, levels, for_inversion)) {
        return tails;
    }
    if (std::min(by_programme, at_low_end) <= seconds) {
        const auto tails = at_low_end < by_programme ? low_end_tails(law) : std::nullopt;
        return tails || by_programme > seconds ? tails : rank_sum_tails(law);
    }
    return lowest_sum_tails(law);
}

} // namespace

Tails exact_signed_rank_tails(const SignScores& scores, double seconds) {
    if (!scores.scores.empty() && scores.scores.front() == scores.scores.back()) {
        return sign_tails(static_cast<std::int64_t>(scores.scores.size()), scores.statistic / scores.scores.front());
    }
    const double by_programme = signed_rank_cost(scores);
    if (by_programme <= std::min(quick_signs, seconds)) {
        return signed_rank_tails(scores);
    }
    const bool above = scores.statistic > scores.sum - scores.statistic;
    const std::int64_t low = above ? scores.sum - scores.statistic : scores.statistic;
    if (const auto found = signed_rank_tails_at(scores, low, std::min(seconds, by_programme))) {
        const Tails tails = levelled(*found, low == scores.sum - low);
        return above ? tails.swapped() : tails;
    }
    if (by_programme > seconds) {
        throw LawTooLong();
    }
    return signed_rank_tails(scores);
}

Tails exact_rank_sum_tails(const ChoiceScores& scores, double seconds) {
    const CanonicalChoice law = canonical(scores);
    const auto found = rank_sum_tails_of(law.scores, seconds);
    if (!found) {
        throw LawTooLong();
    }
    const Tails tails = levelled(*found, law.centred);
    return law.swaps ? tails.swapped() : tails;
}

Tails untied_signed_rank_tails(std::int64_t n, std::int64_t low, const UntiedInversion& inversion) {
    if (const auto tails = closed_form(inversion, low)) {
        return *tails;
    }
    if (n > most_listed) {
        throw LawTooLong();
    }
    return exact_signed_rank_tails(untied_sign_scores(n, low), seconds_for_a_gap);
}

Tails untied_rank_sum_tails(std::int64_t first, std::int64_t second, std::int64_t low,
                            const UntiedInversion& inversion) {
    if (const auto tails = closed_form(inversion, low)) {
        return *tails;
    }
    if (first + second > most_listed) {
        throw LawTooLong();
    }
    return exact_rank_sum_tails(untied_choice_scores(first, second, low), seconds_for_a_gap);
}

Tails best_signed_rank_tails(const SignScores& scores, double seconds) {
    try {
        return exact_signed_rank_tails(scores, seconds);
    } catch (const LawTooLong&) {
        return saddlepoint_tails(scores);
    }
}

Tails best_rank_sum_tails(const ChoiceScores& scores, double seconds) {
    try {
        return exact_rank_sum_tails(scores, seconds);
    } catch (const LawTooLong&) {
        return saddlepoint_tails(scores);
    }
}

} // namespace rankstead
