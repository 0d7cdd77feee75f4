#include "random_scores.h"

#include <algorithm>
#include <cmath>
#include <map>
#include <numeric>

namespace rankstead::accuracy {

namespace {

std::int64_t random_level(Random& random, Ties ties, std::int64_t levels) {
    if (ties != Ties::skew_levels) {
        return random.whole(1, levels);
    }
    std::int64_t level = 1;
    while (level < levels && random.whole(0, 1) == 1) {
        ++level;
    }
    return level;
}

Scores one_heavy_group(Random& random, std::int64_t n) {
    const std::int64_t heavy = random.whole((n + 1) / 2, std::max((n + 1) / 2, n - 2));
    Scores sizes(static_cast<std::size_t>(n - heavy), 1);
    const auto place = random.whole(0, 2) * (n - heavy) / 2; // lowest, in the middle, highest
    sizes.insert(sizes.begin() + place, heavy);
    return sizes;
}

void divide_by_common_divisor(Scores& scores) {
    std::int64_t divisor = 0;
    for (const std::int64_t score : scores) {
        divisor = std::gcd(divisor, score);
    }
    for (std::int64_t& score : scores) {
        score /= std::max<std::int64_t>(divisor, 1);
    }
}

Scores doubled_midranks(const Scores& group_sizes, std::int64_t before) {
    Scores scores;
    for (const std::int64_t size : group_sizes) {
        scores.insert(scores.end(), static_cast<std::size_t>(size), 2 * before + size + 1);
        before += size;
    }
    return scores;
}

} // namespace

double fraction(Random& random) {
    return std::ldexp(static_cast<double>(random.whole(0, (1 << 20) - 1)), -20);
}

std::int64_t log_whole(Random& random, std::int64_t lowest, std::int64_t highest) {
    const double ratio = static_cast<double>(highest + 1) / static_cast<double>(lowest);
    const double drawn = static_cast<double>(lowest) * std::pow(ratio, fraction(random));
    return std::clamp(static_cast<std::int64_t>(drawn), lowest, highest);
}

Scores random_group_sizes(Random& random, std::int64_t n, Ties ties, std::int64_t levels) {
    if (ties == Ties::none) {
        return Scores(static_cast<std::size_t>(n), 1);
    }
    if (ties == Ties::one_heavy) {
        return one_heavy_group(random, n);
    }
    std::map<std::int64_t, std::int64_t> size_by_level;
    for (std::int64_t i = 0; i < n; ++i) {
        ++size_by_level[random_level(random, ties, ties == Ties::light ? 20 * n : levels)];
    }
    Scores sizes;
    for (const auto& [level, size] : size_by_level) {
        sizes.push_back(size);
    }
    return sizes;
}

Scores midranks(const Scores& group_sizes, std::int64_t before) {
    Scores scores = doubled_midranks(group_sizes, before);
    divide_by_common_divisor(scores);
    return scores;
}

Scores midranks_from_zero(const Scores& group_sizes) {
    Scores scores = doubled_midranks(group_sizes, 0);
    const std::int64_t lowest = scores.front();
    for (std::int64_t& score : scores) {
        score -= lowest;
    }
    divide_by_common_divisor(scores);
    return scores;
}

} // namespace rankstead::accuracy
