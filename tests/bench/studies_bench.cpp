// Whole studies inside the engine: cells in, every answer found. `limits` is what the matching interval adds: the same
// study once with limits that invert the conditional law gap by gap, once with the classical table.
#include "bench_data.h"

#include "studies/studies.h"

namespace rankstead::bench {
namespace {

Block block(const char* argument, const std::vector<double>& numbers) {
    Block result{argument, {}, numbers.size(), 1};
    for (const double number : numbers) {
        result.cells.push_back(Cell::of(number));
    }
    return result;
}

Settings with(IntervalRule rule) {
    Settings settings;
    settings.interval = rule;
    return settings;
}

void groups_study(benchmark::State& state, bool tied, IntervalRule rule) {
    const Block first = block("first", values(state.range(0), tied, 0));
    const Block second = block("second", values(state.range(0), tied, 1));
    const Settings settings = with(rule);
    for (auto _ : state) {
        benchmark::DoNotOptimize(run_groups({&first, &second}, settings));
    }
}

void pairs_study(benchmark::State& state, bool tied, IntervalRule rule) {
    const Block before = block("before", values(state.range(0), tied, 0));
    const Block after = block("after", values(state.range(0), tied, 1));
    const Settings settings = with(rule);
    for (auto _ : state) {
        benchmark::DoNotOptimize(run_pairs({&before, &after}, settings));
    }
}

#define RANKSTEAD_STUDY(study)                                                                                         \
    BENCHMARK_CAPTURE(study, untied_matching, false, IntervalRule::matching)->Arg(25)->Arg(100)->Apply(report_least);  \
    BENCHMARK_CAPTURE(study, tied_matching, true, IntervalRule::matching)->Arg(25)->Arg(100)->Apply(report_least);     \
    BENCHMARK_CAPTURE(study, tied_table, true, IntervalRule::table)->Arg(25)->Arg(100)->Apply(report_least)

RANKSTEAD_STUDY(groups_study);
RANKSTEAD_STUDY(pairs_study);

} // namespace
} // namespace rankstead::bench
