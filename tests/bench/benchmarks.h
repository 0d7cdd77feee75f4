// What the benchmark program holds. Each name is `table/row`, a row's figures are counters, and its law is the label:
// goals.py reads all of them from the JSON that Google Benchmark writes.
#pragma once

#include <benchmark/benchmark.h>

#include "laws/tails.h"

#include <functional>
#include <string>

namespace rankstead::bench {

void register_law_goals();   // goal/seconds/...: one p
void register_study_goals(); // goal/seconds/...: estimates, limits, whole studies
void register_inquiries();   // goal/0/... and calc/...: through the C interface
void register_growth();      // growth/curve/values
void register_crossovers();  // crossover/shape/values/law

// A row of the table of goals; 0 seconds where none is set. The goal is part of the name: a benchmark that gives no
// result keeps no counters.
void register_goal(const std::string& what, double seconds, std::function<void(benchmark::State&)> time);

[[nodiscard]] std::string law_words(LawKind law);

// Times `tails`, once it is known that the law is given; its p and bound are counters and its law the label.
void time_law(benchmark::State& state, const std::function<Tails()>& tails);

} // namespace rankstead::bench
