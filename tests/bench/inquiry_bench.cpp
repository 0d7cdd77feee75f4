// One cell through the C interface: an inquiry of 20 v 20 opened, given its data, run, asked for p and released.
#include "bench_data.h"

#include "rankstead.h"

namespace rankstead::bench {
namespace {

constexpr std::int64_t a_side = 20;

double p_of(const std::vector<double>& first, const std::vector<double>& second) {
    rks_inquiry* inquiry = nullptr;
    double p = 0;
    rks_inquiry_new("groups", &inquiry);
    rks_inquiry_numbers(inquiry, "first", first.data(), first.size(), 1);
    rks_inquiry_numbers(inquiry, "second", second.data(), second.size(), 1);
    rks_inquiry_run(inquiry);
    rks_inquiry_number(inquiry, "p", &p);
    rks_inquiry_free(inquiry);
    return p;
}

// The memo knows the data from the second round on, as for the other cells of a report block.
void inquiry_known(benchmark::State& state, bool tied) {
    const auto first = values(a_side, tied, 0);
    const auto second = values(a_side, tied, 1);
    for (auto _ : state) {
        benchmark::DoNotOptimize(p_of(first, second));
    }
}

// Different data each time, so that the memo never helps: the data move together, and nothing else changes. The count
// goes on from one repetition to the next, or the memo would know its data again.
void inquiry_new(benchmark::State& state, bool tied) {
    const auto first = values(a_side, tied, 0);
    const auto second = values(a_side, tied, 1);
    std::vector<double> moved_first(first);
    std::vector<double> moved_second(second);
    static double moved = 0;
    for (auto _ : state) {
        moved += 1;
        for (std::size_t i = 0; i < first.size(); ++i) {
            moved_first[i] = first[i] + moved;
            moved_second[i] = second[i] + moved;
        }
        benchmark::DoNotOptimize(p_of(moved_first, moved_second));
    }
}

BENCHMARK_CAPTURE(inquiry_known, untied, false)->Apply(report_least);
BENCHMARK_CAPTURE(inquiry_known, tied, true)->Apply(report_least);
BENCHMARK_CAPTURE(inquiry_new, untied, false)->Apply(report_least);
BENCHMARK_CAPTURE(inquiry_new, tied, true)->Apply(report_least);

} // namespace
} // namespace rankstead::bench
