// The laws that the library gives by themselves: one row each.
#pragma once

#include "rankstead.h"

#include <cstddef>
#include <string>
#include <vector>

namespace rankstead::client {

using Sizes = std::vector<std::size_t>;

struct SizeOption {
    const char* option;
    const char* help;
};

struct Law {
    const char* word;
    const char* help;
    std::vector<SizeOption> sizes;
    const char* statistic_help;
    double (*largest)(const Sizes&); // the largest value of the statistic
    rks_status (*tail)(const Sizes&, double statistic, std::int32_t side, double* p);
    rks_status (*critical)(const Sizes&, double alpha, std::int32_t side, double* critical);
};

const std::vector<Law>& laws();

std::vector<std::string> law_words();

// Throws a usage Failure, with the words there are, for an unknown law or side.
const Law& find_law(const std::string& word);
std::int32_t find_side(const std::string& word);

} // namespace rankstead::client
