#include "benchmarks.h"

#include "laws/exact_laws.h"

#include <algorithm>
#include <new>
#include <sstream>
#include <utility>

namespace rankstead::bench {

void register_goal(const std::string& what, double seconds, std::function<void(benchmark::State&)> time) {
    std::ostringstream name;
    name << "goal/" << seconds << '/' << what;
    benchmark::RegisterBenchmark(name.str().c_str(), std::move(time));
}

std::string law_words(LawKind law) {
    switch (law) {
    case LawKind::counted:
        return "whole numbers";
    case LawKind::summed:
        return "dynamic programming";
    case LawKind::closed:
        return "closed form";
    case LawKind::inverted:
        return "inversion";
    case LawKind::binomial:
        return "binomial";
    case LawKind::saddlepoint:
        return "saddlepoint, not exact";
    case LawKind::normal:
        return "normal, not exact";
    }
    return "";
}

void time_law(benchmark::State& state, const std::function<Tails()>& tails) {
    try {
        const Tails once = tails();
        state.SetLabel(law_words(once.law));
        state.counters["p"] = std::min(once.lower, once.upper);
        state.counters["bound"] = once.relative_error;
        for (auto _ : state) {
            benchmark::DoNotOptimize(tails());
        }
    } catch (const LawTooLong&) {
        state.SkipWithError("no exact law in its time");
    } catch (const std::bad_alloc&) {
        state.SkipWithError("out of memory");
    }
}

} // namespace rankstead::bench
