#include "exact_choice_law.h"

#include "choice_by_levels.h"
#include "choice_by_score.h"
#include "counted_tails.h"

#include <algorithm>

namespace rankstead::accuracy {

namespace {

constexpr double work_of_a_division = 100; // products of large integers, in additions of words

bool are_successive(const Scores& scores) {
    for (std::size_t i = 0; i < scores.size(); ++i) {
        if (scores[i] != static_cast<std::int64_t>(i)) {
            return false;
        }
    }
    return true;
}

// Choices of m of 0, ..., m + n - 1 with an excess of u over the least sum are the partitions of u into at most m parts
// of at most n, whose generating function is the product of (1 - q^(n+i)) / (1 - q^i) (Andrews 1976, theorem 3.1).
std::vector<std::uint64_t> partitions(const Choice& choice, std::int64_t top, std::uint64_t modulus) {
    const auto m = static_cast<std::size_t>(choice.chosen);
    const std::size_t n = choice.scores.size() - m;
    std::vector<std::uint64_t> ways(static_cast<std::size_t>(top) + 1, 0);
    ways[0] = 1;
    for (std::size_t i = 1; i <= m; ++i) {
        for (std::size_t u = ways.size(); u-- > n + i;) {
            ways[u] = difference_modulo(ways[u], ways[u - n - i], modulus);
        }
        for (std::size_t u = i; u < ways.size(); ++u) {
            ways[u] = sum_modulo(ways[u], ways[u - i], modulus);
        }
    }
    return ways;
}

std::int64_t least_sum(const Choice& choice) {
    return ChoiceByScore(choice, 0).least_sum();
}

} // namespace

CountingPlan plan_of(const Choice& choice, std::int64_t sum, double bits) {
    const auto moduli = static_cast<double>(coprime_moduli(bits).size());
    if (are_successive(choice.scores)) {
        const auto cells = static_cast<double>(sum - least_sum(choice));
        return {Counting::by_partitions, 2 * static_cast<double>(choice.chosen) * cells * moduli};
    }
    const CountingPlan by_levels{Counting::by_levels, work_of_a_division * divisions_among_levels(choice)};
    const CountingPlan by_score{Counting::by_score, moduli * ChoiceByScore(choice, sum).additions()};
    return by_levels.work < by_score.work ? by_levels : by_score;
}

std::vector<BigTails> exact_choice_tails(const Choice& choice, const std::vector<std::int64_t>& sums, double bits,
                                         Counting way) {
    if (way == Counting::by_levels) {
        return choice_tails_by_levels(choice, sums);
    }
    const std::int64_t largest = *std::max_element(sums.begin(), sums.end());
    const ChoiceByScore by_score(choice, largest);
    const Big total = test::big_choose(choice.scores.size(), static_cast<std::size_t>(choice.chosen));
    CountedTails counted(sums, bits, total);
    for (const std::uint64_t modulus : counted.moduli()) {
        counted.add(way == Counting::by_score ? by_score.ways(modulus)
                                              : partitions(choice, largest - by_score.least_sum(), modulus),
                    by_score.least_sum());
    }
    return counted.tails();
}

} // namespace rankstead::accuracy
