// Estimates and limits, and whole studies inside the engine: cells in, every answer found.
#include "benchmarks.h"
#include "sampled_data.h"
#include "shift_limits.h"

#include "laws/exact_laws.h"
#include "studies/studies.h"

#include <memory>

namespace rankstead::bench {

namespace {

Block block(const char* argument, const std::vector<std::int64_t>& values) {
    Block result{argument, {}, values.size(), 1};
    for (const double number : as_doubles(values)) {
        result.cells.push_back(Cell::of(number));
    }
    return result;
}

void time_limits(benchmark::State& state, std::int64_t a_side, std::int64_t levels) {
    const TwoSamples samples = two_samples(a_side, a_side, levels);
    try {
        for (auto _ : state) {
            benchmark::DoNotOptimize(shift_limits(samples));
        }
    } catch (const LawTooLong&) {
        state.SkipWithError("no exact law in its time");
    }
}

void time_study(benchmark::State& state, std::int64_t a_side, std::int64_t levels, IntervalRule rule) {
    const TwoSamples samples = two_samples(a_side, a_side, levels);
    const Block first = block("first", samples.first);
    const Block second = block("second", samples.second);
    Settings settings;
    settings.interval = rule;
    state.SetLabel(run_groups({&first, &second}, settings).exact ? "exact p" : "approximate p");
    for (auto _ : state) {
        benchmark::DoNotOptimize(run_groups({&first, &second}, settings));
    }
}

void add_limits(std::int64_t a_side, const std::string& words, double goal) {
    const std::string size = ", " + words + " a side";
    register_goal("estimate and table limits, no ties" + size, goal,
                  [=](benchmark::State& state) { time_limits(state, a_side, all_distinct); });
    register_goal("estimate and table limits, 13 levels" + size, goal,
                  [=](benchmark::State& state) { time_limits(state, a_side, 13); });
}

void add_study(const std::string& what, std::int64_t a_side, std::int64_t levels, IntervalRule rule, double goal) {
    const std::string size = std::to_string(levels) + " levels, " + std::to_string(a_side) + " a side";
    register_goal(what + ", " + size, goal, [=](benchmark::State& state) { time_study(state, a_side, levels, rule); });
}

} // namespace

void register_study_goals() {
    add_limits(1000, "1e3", 0.5e-3);
    add_limits(100'000, "1e5", 20e-3);
    add_limits(1'000'000, "1e6", 300e-3);
    for (const std::int64_t a_side : {25, 100}) {
        const double goal = a_side == 25 ? 1e-3 : 10e-3;
        add_study("matching limits, the whole study", a_side, 13, IntervalRule::matching, goal);
        add_study("matching limits, the whole study", a_side, 2 * a_side / 3, IntervalRule::matching, goal);
    }
}

} // namespace rankstead::bench
