// Invented data for the benchmarks: the same in every run.
#pragma once

#include <benchmark/benchmark.h>

#include <cstdint>
#include <vector>

namespace rankstead::bench {

// Tied data are whole numbers on a scale of so many steps; untied data are all different.
constexpr std::int64_t scale_steps = 12;

// `count` values, not in order. The second sample of a comparison takes another `stream`.
[[nodiscard]] std::vector<double> values(std::int64_t count, bool tied, std::uint64_t stream);

[[nodiscard]] std::vector<std::int64_t> sorted_integers(std::int64_t count, bool tied, std::uint64_t stream);

// Also reports the least of the repetitions: the machine may be busy.
void report_least(benchmark::internal::Benchmark* benchmark);

} // namespace rankstead::bench
