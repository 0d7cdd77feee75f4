// The laws side by side at sizes around those where the choice between them changes. Predicted seconds are a counter.
// `chosen` is the law that a study gets: its time beside the quickest says what the choice costs.
#include "benchmarks.h"
#include "sampled_data.h"

#include "laws/exact_laws.h"
#include "laws/inversion/certified_inversion.h"
#include "laws/inversion/untied_inversion.h"

#include <memory>

namespace rankstead::bench {

namespace {

constexpr double slowest = 1; // seconds: what would take longer is not timed

std::string name_of(const std::string& shape, std::int64_t values, const char* law) {
    return "crossover/" + shape + "/" + std::to_string(values) + "/" + law;
}

void add(const std::string& name, double predicted, const std::function<Tails()>& tails) {
    benchmark::RegisterBenchmark(name.c_str(), [=](benchmark::State& state) {
        if (predicted > 0) {
            state.counters["predicted"] = predicted;
        }
        time_law(state, tails);
    });
}

Tails tails_of(const std::optional<CertifiedTail>& tail, LawKind law) {
    if (!tail) {
        throw LawTooLong();
    }
    Tails tails;
    tails.lower = tail->lower;
    tails.relative_error = tail->relative_error;
    tails.law = law;
    return tails;
}

Tails sign_inversion(const SignScores& scores) {
    const auto inversion = CertifiedInversion::of_signs(ScoredItems::of(scores.scores));
    return tails_of(inversion.at(std::min(scores.statistic, scores.sum - scores.statistic), slowest),
                    LawKind::inverted);
}

Tails choice_inversion(const ChoiceScores& scores) {
    const ChoiceScores law = canonical(scores).scores;
    const auto inversion = CertifiedInversion::of_choice(ScoredItems::of(law.scores), law.chosen);
    return tails_of(inversion.at(law.statistic, slowest), LawKind::inverted);
}

void add_signed_rank(const std::string& shape, std::int64_t n, std::int64_t levels) {
    const auto scores =
        std::make_shared<const SignScores>(sign_scores(rank_signed(changes(n, levels), std::int64_t{0}, false)));
    const double programme = signed_rank_cost(*scores);
    if (programme < slowest) {
        add(name_of(shape, n, "dynamic programming"), programme, [scores] { return signed_rank_tails(*scores); });
    }
    add(name_of(shape, n, "inversion"), 0, [scores] { return sign_inversion(*scores); });
    add(name_of(shape, n, "chosen"), 0, [scores] { return exact_signed_rank_tails(*scores, seconds_for_p); });
}

void add_rank_sum(const std::string& shape, std::int64_t first, std::int64_t second, std::int64_t levels) {
    const auto scores =
        std::make_shared<const ChoiceScores>(choice_scores(two_samples(first, second, levels).ranking()));
    const std::int64_t n = first + second;
    const double programme = rank_sum_cost(*scores);
    if (programme < slowest) {
        add(name_of(shape, n, "dynamic programming"), programme, [scores] { return rank_sum_tails(*scores); });
    }
    add(name_of(shape, n, "inversion"), 0, [scores] { return choice_inversion(*scores); });
    add(name_of(shape, n, "chosen"), 0, [scores] { return exact_rank_sum_tails(*scores, seconds_for_p); });
}

// T+ two standard deviations below its mean.
void add_untied_signed_rank(std::int64_t n) {
    const std::string shape = "signed rank, no ties";
    const auto scores =
        std::make_shared<const SignScores>(sign_scores(rank_signed(changes(n, all_distinct), std::int64_t{0}, false)));
    const std::int64_t t = scores->statistic;
    const double programme = signed_rank_cost(*scores);
    if (programme < slowest) {
        add(name_of(shape, n, "dynamic programming"), programme, [scores] { return signed_rank_tails(*scores); });
    }
    add(name_of(shape, n, "inversion"), 0, [scores] { return sign_inversion(*scores); });
    add(name_of(shape, n, "closed form"), 0,
        [=] { return tails_of(UntiedInversion::of_signed_rank(n).at(t, slowest), LawKind::closed); });
    add(name_of(shape, n, "chosen"), 0, [=] { return UntiedSignedRankLaw(n).at(t); });
}

void add_untied_rank_sum(const std::string& shape, std::int64_t first, std::int64_t second) {
    const std::int64_t u = two_samples(first, second, all_distinct).ranking().doubled_u() / 2;
    const auto scores = std::make_shared<const ChoiceScores>(untied_choice_scores(first, second, u));
    const std::int64_t n = first + second;
    const double programme = rank_sum_cost(*scores);
    if (programme < slowest) {
        add(name_of(shape, n, "dynamic programming"), programme, [scores] { return rank_sum_tails(*scores); });
    }
    add(name_of(shape, n, "inversion"), 0, [scores] { return choice_inversion(*scores); });
    add(name_of(shape, n, "closed form"), 0,
        [=] { return tails_of(UntiedInversion::of_rank_sum(first, second).at(u, slowest), LawKind::closed); });
    add(name_of(shape, n, "chosen"), 0, [=] { return UntiedRankSumLaw(first, second).at(u); });
}

} // namespace

void register_crossovers() {
    for (const std::int64_t n : {25, 50, 62, 63, 100, 200, 400}) {
        add_untied_signed_rank(n);
    }
    for (const std::int64_t n : {50, 100, 200, 300, 400, 600}) {
        add_signed_rank("signed rank, n/3 levels", n, n / 3);
    }
    for (const std::int64_t n : {100, 200, 400, 800, 1600}) {
        add_signed_rank("signed rank, 12 levels", n, 12);
    }
    for (const std::int64_t half : {10, 20, 30, 40, 60, 100, 200}) {
        add_untied_rank_sum("rank sum, no ties, equal sizes", half, half);
    }
    for (const std::int64_t few : {2, 4, 7, 10, 20, 50}) {
        add_untied_rank_sum("rank sum, no ties, sizes 1:20", few, 20 * few);
    }
    for (const std::int64_t half : {20, 30, 40, 50, 60, 80, 100}) {
        add_rank_sum("rank sum, N/3 levels, equal sizes", half, half, 2 * half / 3);
    }
    for (const std::int64_t half : {20, 30, 40, 60, 80, 100, 150}) {
        add_rank_sum("rank sum, 13 levels, equal sizes", half, half, 13);
    }
    for (const std::int64_t few : {5, 10, 15, 20, 30, 50}) {
        add_rank_sum("rank sum, N/3 levels, sizes 1:20", few, 20 * few, 7 * few);
    }
    for (const std::int64_t few : {5, 10, 20, 35, 50}) {
        add_rank_sum("rank sum, 5 levels, sizes 1:20", few, 20 * few, 5);
    }
}

} // namespace rankstead::bench
