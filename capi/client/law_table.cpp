#include "law_table.h"

#include "failure.h"
#include "words.h"

namespace rankstead::client {
namespace {

double signed_rank_largest(const Sizes& sizes) {
    const auto n = static_cast<double>(sizes[0]);
    return n * (n + 1) / 2;
}

rks_status signed_rank_tail(const Sizes& sizes, double statistic, std::int32_t side, double* p) {
    return rks_signed_rank_tail(sizes[0], statistic, side, p);
}

rks_status signed_rank_critical(const Sizes& sizes, double alpha, std::int32_t side, double* critical) {
    return rks_signed_rank_critical(sizes[0], alpha, side, critical);
}

double rank_sum_largest(const Sizes& sizes) {
    return static_cast<double>(sizes[0]) * static_cast<double>(sizes[1]);
}

rks_status rank_sum_tail(const Sizes& sizes, double statistic, std::int32_t side, double* p) {
    return rks_rank_sum_tail(sizes[0], sizes[1], statistic, side, p);
}

rks_status rank_sum_critical(const Sizes& sizes, double alpha, std::int32_t side, double* critical) {
    return rks_rank_sum_critical(sizes[0], sizes[1], alpha, side, critical);
}

struct SideWord {
    const char* word;
    std::int32_t side;
};

constexpr SideWord sides[] = {{"two-sided", 0}, {"higher", 1}, {"lower", -1}};

} // namespace

const std::vector<Law>& laws() {
    static const std::vector<Law> table{
        {"signed-rank",
         "T+, the rank sum of the positive differences",
         {{"n", "Number of differences that are not zero"}},
         "T+, from 0 to n(n+1)/2",
         signed_rank_largest,
         signed_rank_tail,
         signed_rank_critical},
        {"rank-sum",
         "U of the first sample, the number of pairs in which it is higher",
         {{"first-size", "Size of the first sample"}, {"second-size", "Size of the second sample"}},
         "U, from 0 to the product of the sizes m and n; U = W - m(m+1)/2 for the rank sum W of the first sample",
         rank_sum_largest,
         rank_sum_tail,
         rank_sum_critical},
    };
    return table;
}

std::vector<std::string> law_words() {
    std::vector<std::string> result;
    for (const Law& law : laws()) {
        result.emplace_back(law.word);
    }
    return result;
}

const Law& find_law(const std::string& word) {
    for (const Law& law : laws()) {
        if (folded(law.word) == folded(word)) {
            return law;
        }
    }
    throw usage_failure("There is no law " + in_quotes(word) + ". The laws are " + joined(law_words(), ", ") + '.');
}

std::int32_t find_side(const std::string& word) {
    std::vector<std::string> words;
    for (const SideWord& side : sides) {
        if (folded(side.word) == folded(word)) {
            return side.side;
        }
        words.emplace_back(side.word);
    }
    throw usage_failure("--side takes " + joined(words, ", ") + ", not " + in_quotes(word) + '.');
}

} // namespace rankstead::client
