#include "exact_sign_law.h"

#include "counted_tails.h"

#include <algorithm>

namespace rankstead::accuracy {

namespace {

std::vector<std::uint64_t> ways_by_sum(const Scores& scores, std::int64_t top, std::uint64_t modulus) {
    std::vector<std::uint64_t> ways(static_cast<std::size_t>(top) + 1, 0);
    ways[0] = 1;
    std::int64_t reach = 0;
    for (const std::int64_t score : scores) {
        reach = std::min(reach + score, top);
        const auto step = static_cast<std::size_t>(score);
        for (auto s = static_cast<std::size_t>(reach); s >= step; --s) {
            ways[s] = sum_modulo(ways[s], ways[s - step], modulus);
        }
    }
    return ways;
}

} // namespace

double sign_work(const Scores& scores, std::int64_t sum, double bits) {
    double work = 0;
    std::int64_t reach = 0;
    for (const std::int64_t score : scores) {
        reach = std::min(reach + score, sum);
        work += static_cast<double>(reach);
    }
    return work * static_cast<double>(coprime_moduli(bits).size());
}

std::vector<BigTails> exact_sign_tails(const Scores& scores, const std::vector<std::int64_t>& sums, double bits) {
    Big total = 1;
    total <<= scores.size();
    CountedTails counted(sums, bits, total);
    for (const std::uint64_t modulus : counted.moduli()) {
        counted.add(ways_by_sum(scores, *std::max_element(sums.begin(), sums.end()), modulus), 0);
    }
    return counted.tails();
}

} // namespace rankstead::accuracy
