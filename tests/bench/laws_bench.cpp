// One exact p: ranked data in, both tails out.
#include "bench_data.h"

#include "laws/rank_sum_law.h"
#include "laws/signed_rank_law.h"

namespace rankstead::bench {
namespace {

void signed_rank_p(benchmark::State& state, bool tied) {
    const auto sorted = sorted_integers(state.range(0), tied, 0);
    const SignedRanking ranking = rank_signed(sorted, std::int64_t{0}, false);
    for (auto _ : state) {
        benchmark::DoNotOptimize(signed_rank_tails(sign_scores(ranking)));
    }
}

void rank_sum_p(benchmark::State& state, bool tied) {
    const auto first = sorted_integers(state.range(0), tied, 0);
    const auto second = sorted_integers(state.range(0), tied, 1);
    const PooledRanking ranking = rank_pooled(first, second, std::int64_t{0});
    for (auto _ : state) {
        benchmark::DoNotOptimize(rank_sum_tails(choice_scores(ranking)));
    }
}

// As the study does it without ties: the law of all statistics, then one of them.
void rank_sum_table(benchmark::State& state) {
    const std::int64_t n = state.range(0);
    for (auto _ : state) {
        const UntiedRankSumLaw law(n, n);
        benchmark::DoNotOptimize(law.at(n * n / 3));
    }
}

BENCHMARK_CAPTURE(signed_rank_p, untied, false)
    ->Arg(10)
    ->Arg(25)
    ->Arg(50)
    ->Arg(100)
    ->Arg(200)
    ->Arg(1000)
    ->Apply(report_least);
BENCHMARK_CAPTURE(signed_rank_p, tied, true)
    ->Arg(10)
    ->Arg(25)
    ->Arg(50)
    ->Arg(100)
    ->Arg(200)
    ->Arg(1000)
    ->Apply(report_least);
BENCHMARK(rank_sum_table)->Arg(10)->Arg(25)->Arg(50)->Arg(100)->Apply(report_least);
BENCHMARK_CAPTURE(rank_sum_p, untied, false)->Arg(10)->Arg(25)->Arg(50)->Arg(100)->Apply(report_least);
BENCHMARK_CAPTURE(rank_sum_p, tied, true)->Arg(10)->Arg(25)->Arg(50)->Arg(100)->Apply(report_least);

} // namespace
} // namespace rankstead::bench
