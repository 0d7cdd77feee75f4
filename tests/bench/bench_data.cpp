#include "bench_data.h"

#include <algorithm>
#include <random>

namespace rankstead::bench {

std::vector<double> values(std::int64_t count, bool tied, std::uint64_t stream) {
    std::mt19937_64 random(1000 + stream);
    std::vector<double> result;
    for (std::int64_t i = 0; i < count; ++i) {
        // The second stream lies a little higher, and half of each scale lies below zero for the one-sample tests.
        const auto lead = static_cast<std::int64_t>(stream);
        const auto drawn = static_cast<std::int64_t>(random() % 1'000'000'000);
        const std::int64_t step = drawn % scale_steps - scale_steps / 3 + lead;
        // Untied: the place in the list fills the low digits, so no two are equal, in size either.
        const std::int64_t spread = (drawn - 400'000'000) / 1000 * 4'000'000 + 2 * i + lead % 2;
        result.push_back(static_cast<double>(tied ? step : spread));
    }
    return result;
}

std::vector<std::int64_t> sorted_integers(std::int64_t count, bool tied, std::uint64_t stream) {
    const std::vector<double> drawn = values(count, tied, stream);
    std::vector<std::int64_t> result(drawn.begin(), drawn.end());
    std::sort(result.begin(), result.end());
    return result;
}

void report_least(benchmark::internal::Benchmark* benchmark) {
    benchmark->ComputeStatistics(
        "min", [](const std::vector<double>& times) { return *std::min_element(times.begin(), times.end()); });
}

} // namespace rankstead::bench
