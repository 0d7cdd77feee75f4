// Time against the number of values, all of them counted, for the curves of the picture. A curve ends where no exact
// law is given any more.
#include "benchmarks.h"
#include "sampled_data.h"
#include "shift_limits.h"

#include "laws/exact_laws.h"

#include <algorithm>
#include <cmath>

namespace rankstead::bench {

namespace {

constexpr std::int64_t least_values = 10;
constexpr std::int64_t most_values = 1'000'000;
constexpr std::int64_t values_a_level = 3; // on average
constexpr std::int64_t imbalance = 20;

// 10, 20, 50, 100, ...
std::vector<std::int64_t> sizes() {
    std::vector<std::int64_t> result;
    for (std::int64_t decade = least_values; decade <= most_values; decade *= 10) {
        for (const std::int64_t step : {1, 2, 5}) {
            if (decade * step <= most_values) {
                result.push_back(decade * step);
            }
        }
    }
    return result;
}

std::int64_t levels_of(std::int64_t values) {
    return std::max<std::int64_t>(3, values / values_a_level);
}

void time_signed_rank(benchmark::State& state, std::int64_t n) {
    const SignedRanking ranking = rank_signed(changes(n, levels_of(n)), std::int64_t{0}, false);
    time_law(state, [&] { return exact_signed_rank_tails(sign_scores(ranking), seconds_for_p); });
}

void time_untied(benchmark::State& state, std::int64_t n) {
    const std::int64_t u = two_samples(n / 2, n / 2, all_distinct).ranking().doubled_u() / 2;
    time_law(state, [&] { return UntiedRankSumLaw(n / 2, n / 2).at(u); });
}

void time_tied(benchmark::State& state, std::int64_t first, std::int64_t second) {
    const PooledRanking ranking = two_samples(first, second, levels_of(first + second)).ranking();
    time_law(state, [&] { return exact_rank_sum_tails(choice_scores(ranking), seconds_for_p); });
}

void time_balanced(benchmark::State& state, std::int64_t n) {
    time_tied(state, n / 2, n / 2);
}

void time_unbalanced(benchmark::State& state, std::int64_t n) {
    const std::int64_t first = std::max<std::int64_t>(1, n / (imbalance + 1));
    time_tied(state, first, n - first);
}

void time_limits(benchmark::State& state, std::int64_t n) {
    const TwoSamples samples = two_samples(n / 2, n / 2, levels_of(n));
    try {
        for (auto _ : state) {
            benchmark::DoNotOptimize(shift_limits(samples));
        }
    } catch (const LawTooLong&) {
        state.SkipWithError("no exact law in its time");
    }
}

using Timed = void (*)(benchmark::State&, std::int64_t);

void add_curve(const std::string& curve, Timed timed) {
    for (const std::int64_t n : sizes()) {
        benchmark::RegisterBenchmark(("growth/" + curve + "/" + std::to_string(n)).c_str(),
                                     [timed, n](benchmark::State& state) { timed(state, n); });
    }
}

} // namespace

void register_growth() {
    add_curve("signed rank p, ties", time_signed_rank);
    add_curve("rank sum p, no ties", time_untied);
    add_curve("rank sum p, ties, equal sizes", time_balanced);
    add_curve("rank sum p, ties, sizes 1:20", time_unbalanced);
    add_curve("estimate and table limits, ties", time_limits);
}

} // namespace rankstead::bench
