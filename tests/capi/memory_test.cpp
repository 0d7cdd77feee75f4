// How much memory a call takes, and what becomes of it when there is none. Built without sanitizers only: their own
// bookkeeping would be measured.
#include "inquiry.h"
#include "random_data.h"

#include <gtest/gtest.h>

#include <malloc.h>
#include <sys/resource.h>
#include <sys/wait.h>
#include <unistd.h>

#include <algorithm>
#include <fstream>
#include <string>
#include <utility>
#include <vector>

namespace rks_test {
namespace {

// The highest resident memory since the last reset, in bytes.
std::size_t peak_memory() {
    std::ifstream status("/proc/self/status");
    for (std::string word; status >> word;)
        if (word == "VmHWM:") {
            std::size_t kilobytes = 0;
            status >> kilobytes;
            return 1024 * kilobytes;
        }
    return 0;
}

void reset_peak_memory() {
    std::ofstream("/proc/self/clear_refs") << 5;
}

std::size_t peak_of(Inquiry& inquiry) {
    malloc_trim(0); // else memory of an earlier call, kept for reuse, hides what this one takes
    reset_peak_memory();
    const auto before = peak_memory();
    EXPECT_GT(before, 0U);
    inquiry.run();
    const auto after = peak_memory();
    return after > before ? after - before : 0; // the kernel counts pages in batches
}

TEST(Memory, a_thousand_values_a_side_take_less_than_64_megabytes) {
    for (const std::int64_t levels : {std::int64_t{3}, std::int64_t{60}, std::int64_t{100000000}})
        for (const char* method : {"auto", "exact"}) {
            Inquiry groups("groups"), pairs("pairs");
            groups.numbers("first", random_tenths(7, 1000, levels));
            groups.numbers("second", random_tenths(8, 1000, levels));
            groups.set("method", method);
            pairs.numbers("before", random_tenths(7, 1000, levels));
            pairs.numbers("after", random_tenths(8, 1000, levels));
            pairs.set("method", method);
            EXPECT_LT(peak_of(groups), std::size_t{64} << 20) << levels << ' ' << method;
            EXPECT_LT(peak_of(pairs), std::size_t{64} << 20) << levels << ' ' << method;
        }
}

// Numbers with no ties, with some and with hardly anything else.
std::vector<double> a_million(std::uint64_t seed, std::int64_t levels) {
    return random_tenths(seed, million, levels);
}

// The highest memory, in megabytes, of a process that asks one question about a million values a side, everything in it
// counted, the caller's data too.
int megabytes_for(const std::string& study, std::int64_t levels, bool as_cells) {
    const pid_t child = fork();
    if (child == 0) {
        malloc_trim(0);
        reset_peak_memory();
        Inquiry inquiry(study);
        const bool two = study != "single";
        const std::vector<const char*> arguments = study == "groups"  ? std::vector{"first", "second"}
                                                   : study == "pairs" ? std::vector{"before", "after"}
                                                                      : std::vector{"values"};
        for (std::size_t i = 0; i < (two ? 2U : 1U); ++i) {
            const auto values = a_million(i + 1, levels);
            if (as_cells) {
                std::vector<rks_cell> cells;
                cells.reserve(values.size());
                for (const double value : values)
                    cells.push_back(number_cell(value));
                inquiry.cells(arguments[i], std::move(cells));
            } else {
                inquiry.numbers(arguments[i], values);
            }
        }
        if (!two)
            inquiry.numbers("reference", {5});
        const bool answered = inquiry.run() == RKS_OK && inquiry.status("upper") == RKS_OK;
        _exit(answered ? static_cast<int>(std::min<std::size_t>(peak_memory() >> 20, 255)) : 255);
    }
    int ended = 0;
    waitpid(child, &ended, 0);
    return WIFEXITED(ended) ? WEXITSTATUS(ended) : -1;
}

TEST(Memory, a_million_values_a_side_take_less_than_200_megabytes) {
    constexpr std::int64_t few = 5, many = 100'000, all_different = 100'000'000'000'000;
    const auto expect_below_200 = [](const char* study, std::int64_t levels, bool as_cells) {
        const int megabytes = megabytes_for(study, levels, as_cells);
        EXPECT_GT(megabytes, 0);
        EXPECT_LT(megabytes, 200) << study << ", " << levels << " levels" << (as_cells ? ", cells" : "");
    };
    for (const std::int64_t levels : {few, many, all_different})
        expect_below_200("groups", levels, false);
    expect_below_200("pairs", many, false);
    expect_below_200("pairs", all_different, false);
    expect_below_200("single", all_different, false);
    expect_below_200("groups", all_different, true); // the cells themselves take 64 megabytes
}

// Runs in a child process with hardly any memory left; its exit status is the status of the run.
int status_with_little_memory(std::size_t spare) {
    const pid_t child = fork();
    if (child == 0) {
        Inquiry inquiry("groups");
        inquiry.numbers("first", random_tenths(1, million, 100000));
        inquiry.numbers("second", random_tenths(2, million, 100000));
        std::ifstream size("/proc/self/statm");
        std::size_t pages = 0;
        size >> pages;
        const rlim_t bytes = pages * static_cast<std::size_t>(sysconf(_SC_PAGESIZE)) + spare;
        const rlimit limit = {bytes, bytes};
        setrlimit(RLIMIT_AS, &limit);
        _exit(inquiry.run());
    }
    int ended = 0;
    waitpid(child, &ended, 0);
    return WIFEXITED(ended) ? WEXITSTATUS(ended) : -1;
}

TEST(Memory, without_memory_there_is_a_status_and_no_crash) {
    EXPECT_EQ(status_with_little_memory(std::size_t{1} << 20), RKS_OUT_OF_MEMORY);
    for (const std::size_t megabytes : {8U, 32U, 64U, 1024U}) {
        const int status = status_with_little_memory(megabytes << 20);
        EXPECT_TRUE(status == RKS_OUT_OF_MEMORY || status == RKS_OK || status == RKS_TOO_LARGE) << status;
    }
}

} // namespace
} // namespace rks_test
