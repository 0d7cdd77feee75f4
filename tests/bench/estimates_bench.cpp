// Hodges-Lehmann estimates: the middle one or two of all differences, or of all Walsh averages, never written down.
#include "bench_data.h"

#include "estimates/ordered_sums.h"

namespace rankstead::bench {
namespace {

void shift_estimate(benchmark::State& state, bool tied) {
    const auto first = sorted_integers(state.range(0), tied, 0);
    const auto second = sorted_integers(state.range(0), tied, 1);
    for (auto _ : state) {
        const auto differences = OrderedSums<std::int64_t>::differences(first, second);
        benchmark::DoNotOptimize(differences.at(differences.size() / 2));
        benchmark::DoNotOptimize(differences.at(differences.size() / 2 + 1));
    }
}

void centre_estimate(benchmark::State& state, bool tied) {
    const auto changes = sorted_integers(state.range(0), tied, 0);
    for (auto _ : state) {
        const auto sums = OrderedSums<std::int64_t>::walsh(changes);
        benchmark::DoNotOptimize(sums.at(sums.size() / 2));
        benchmark::DoNotOptimize(sums.at(sums.size() / 2 + 1));
    }
}

BENCHMARK_CAPTURE(shift_estimate, untied, false)
    ->Arg(1000)
    ->Arg(100'000)
    ->Arg(1'000'000)
    ->Apply(report_least)
    ->Unit(benchmark::kMillisecond);
BENCHMARK_CAPTURE(shift_estimate, tied, true)
    ->Arg(1000)
    ->Arg(100'000)
    ->Arg(1'000'000)
    ->Apply(report_least)
    ->Unit(benchmark::kMillisecond);
BENCHMARK_CAPTURE(centre_estimate, untied, false)
    ->Arg(1000)
    ->Arg(100'000)
    ->Arg(1'000'000)
    ->Apply(report_least)
    ->Unit(benchmark::kMillisecond);

} // namespace
} // namespace rankstead::bench
