#include "sampled_data.h"

#include <algorithm>
#include <cmath>
#include <numeric>
#include <random>

namespace rankstead::bench {

namespace {

using Random = std::mt19937_64; // the standard fixes its numbers; those of its distributions it does not

std::size_t below(Random& random, std::size_t bound) {
    return static_cast<std::size_t>(random() % bound);
}

void shuffle(std::vector<std::int64_t>& values, Random& random) {
    for (std::size_t i = values.size(); i > 1; --i) {
        std::swap(values[i - 1], values[below(random, i)]);
    }
}

// 1 to n, or n values on the scale 1 to `levels`.
std::vector<std::int64_t> drawn(std::int64_t n, std::int64_t levels, Random& random) {
    std::vector<std::int64_t> values(static_cast<std::size_t>(n));
    if (levels == all_distinct) {
        std::iota(values.begin(), values.end(), std::int64_t{1});
        shuffle(values, random);
        return values;
    }
    for (std::int64_t& value : values) {
        value = 1 + static_cast<std::int64_t>(random() % static_cast<std::uint64_t>(levels));
    }
    return values;
}

// Doubled midranks by value, of values that are at least 0.
std::vector<double> doubled_ranks(const std::vector<std::int64_t>& values) {
    std::vector<double> counts(static_cast<std::size_t>(*std::max_element(values.begin(), values.end()) + 1));
    for (const std::int64_t value : values) {
        counts[static_cast<std::size_t>(value)] += 1;
    }
    double below = 0;
    for (double& count : counts) {
        const double here = count;
        count = 2 * below + here + 1;
        below += here;
    }
    return counts;
}

} // namespace

TwoSamples two_samples(std::int64_t first, std::int64_t second, std::int64_t levels, double deviations) {
    Random random(20);
    std::vector<std::int64_t> pooled = drawn(first + second, levels, random);
    const std::vector<double> ranks = doubled_ranks(pooled);
    const auto rank = [&](std::size_t i) { return ranks[static_cast<std::size_t>(pooled[i])]; };
    const auto m = static_cast<std::size_t>(first);
    const auto n = static_cast<double>(pooled.size());
    double squares = 0;
    for (std::size_t i = 0; i < pooled.size(); ++i) {
        squares += (rank(i) - (n + 1)) * (rank(i) - (n + 1));
    }
    const double variance = static_cast<double>(first) * static_cast<double>(second) * squares / (n * (n - 1));
    const double wanted = static_cast<double>(first) * (n + 1) - deviations * std::sqrt(variance);
    double sum = 0;
    for (std::size_t i = 0; i < m; ++i) {
        sum += rank(i);
    }
    // Samples too small to lie as low as that are left as they are after so many attempts.
    for (std::size_t attempts = 100 * pooled.size(); sum > wanted && attempts > 0; --attempts) {
        const std::size_t mine = below(random, m);
        const std::size_t other = m + below(random, pooled.size() - m);
        if (rank(mine) > rank(other)) {
            sum -= rank(mine) - rank(other);
            std::swap(pooled[mine], pooled[other]);
        }
    }
    TwoSamples samples{{pooled.begin(), pooled.begin() + first}, {pooled.begin() + first, pooled.end()}};
    std::sort(samples.first.begin(), samples.first.end());
    std::sort(samples.second.begin(), samples.second.end());
    return samples;
}

std::vector<std::int64_t> changes(std::int64_t n, std::int64_t levels, std::int64_t zeros, double deviations) {
    Random random(21);
    std::vector<std::int64_t> sizes = drawn(n - zeros, levels, random);
    const std::vector<double> ranks = doubled_ranks(sizes);
    const auto rank = [&](std::int64_t size) { return ranks[static_cast<std::size_t>(size)]; };
    double sum = 0;
    double squares = 0;
    for (const std::int64_t size : sizes) {
        sum += rank(size);
        squares += rank(size) * rank(size);
    }
    const double wanted = sum / 2 - deviations * std::sqrt(squares) / 2;
    std::size_t falls = 0; // the first so many of the sizes, which are in random order
    for (; falls < sizes.size() && sum > wanted; ++falls) {
        sum -= rank(sizes[falls]);
        sizes[falls] = -sizes[falls];
    }
    sizes.resize(static_cast<std::size_t>(n), 0);
    std::sort(sizes.begin(), sizes.end());
    return sizes;
}

std::vector<double> as_doubles(const std::vector<std::int64_t>& values) {
    return {values.begin(), values.end()};
}

} // namespace rankstead::bench
