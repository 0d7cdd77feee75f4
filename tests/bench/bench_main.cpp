// How long things take; nothing here passes or fails. goals.sh runs it and makes a table of it; by hand, read the
// minimum of the repetitions:
//     rankstead_bench --benchmark_repetitions=5 --benchmark_enable_random_interleaving=true
#include "benchmarks.h"

#include <sys/resource.h>

int main(int count, char** arguments) {
    using namespace rankstead::bench;
    // A law that would fill the machine's memory shall fail by itself.
    constexpr rlim_t most_bytes = rlim_t{3} << 30;
    const rlimit memory{most_bytes, most_bytes};
    setrlimit(RLIMIT_AS, &memory);
    benchmark::Initialize(&count, arguments);
    if (benchmark::ReportUnrecognizedArguments(count, arguments)) {
        return 2;
    }
    register_law_goals();
    register_study_goals();
    register_inquiries();
    register_growth();
    register_crossovers();
    benchmark::RunSpecifiedBenchmarks();
    benchmark::Shutdown();
}
