#include "frequency_screen.h"

#include "fourier.h"

#include <algorithm>
#include <bit>
#include <cmath>
#include <numbers>

namespace rankstead {

namespace {

constexpr double pi = std::numbers::pi;
constexpr std::int64_t largest_transform = std::int64_t{1} << 21;
constexpr double rounding_slack = 1e-6; // of the weights: far above the rounding of sums and transform

// The weighted sum of squares about the mean of each block of neighbouring groups whose scores span at most `range`.
double variance_within_blocks(const std::vector<std::int64_t>& scores, const std::vector<double>& weights,
                              double range) {
    double total = 0;
    for (std::size_t begin = 0; begin < scores.size();) {
        double weight = 0;
        double mean = 0;
        double squares = 0;
        std::size_t end = begin;
        for (; end < scores.size() && static_cast<double>(scores[end] - scores[begin]) <= range; ++end) {
            // Updating formula of West (1979).
            const double x = static_cast<double>(scores[end] - scores[begin]);
            weight += weights[end];
            const double away = x - mean;
            mean += weight > 0 ? away * weights[end] / weight : 0;
            squares += weights[end] * away * (x - mean);
        }
        total += squares;
        begin = end;
    }
    return total * (1 - rounding_slack);
}

// Whether blocks of range pi / high prove all of [low, high].
bool blocks_prove(const std::vector<std::int64_t>& scores, const std::vector<double>& weights, double low, double high,
                  double need) {
    return 2 / (pi * pi) * low * low * variance_within_blocks(scores, weights, pi / high) >= need;
}

struct Window {
    std::size_t begin = 0;
    std::size_t end = 0; // past the last group
    double weight = 0;
    std::int64_t range = 0;
};

// The window of groups with at least the weight `wanted` that spans the fewest scores; all groups if there is none.
Window narrowest_window(const std::vector<std::int64_t>& scores, const std::vector<double>& weights, double wanted) {
    double total = 0;
    for (const double weight : weights) {
        total += weight;
    }
    Window best{0, scores.size(), total, scores.back() - scores.front()};
    double weight = 0;
    std::size_t begin = 0;
    for (std::size_t end = 0; end < scores.size(); ++end) {
        weight += weights[end];
        while (weight - weights[begin] >= wanted) {
            weight -= weights[begin];
            ++begin;
        }
        const std::int64_t range = scores[end] - scores[begin];
        if (weight >= wanted && range < best.range) {
            best = {begin, end + 1, weight, range};
        }
    }
    return best;
}

// The cells of the transform that are not proven, as ranges of t.
std::vector<FrequencyRange> unproven_cells(const std::vector<std::int64_t>& scores, const std::vector<double>& weights,
                                           const Window& window, double need, double from) {
    const auto size = std::bit_ceil(static_cast<std::uint64_t>(std::max<std::int64_t>(512, 8 * (window.range + 1))));
    std::vector<std::complex<double>> transform(size, 0.0);
    const std::int64_t centre = scores[window.begin] + window.range / 2;
    double lipschitz = 0;
    for (std::size_t g = window.begin; g < window.end; ++g) {
        transform[static_cast<std::size_t>(scores[g] - scores[window.begin])] += weights[g];
        lipschitz += weights[g] * std::fabs(static_cast<double>(scores[g] - centre));
    }
    fourier_transform(transform);
    const double half_cell = pi / static_cast<double>(size);
    const double provable = window.weight * (1 - rounding_slack) - need - half_cell * lipschitz;
    std::vector<FrequencyRange> ranges;
    for (std::size_t k = 0; k <= size / 2; ++k) {
        const double t = 2 * half_cell * static_cast<double>(k);
        const FrequencyRange cell{std::max(from, t - half_cell), std::min(pi, t + half_cell)};
        if (cell.high < from || std::abs(transform[k]) <= provable) {
            continue;
        }
        if (!ranges.empty() && ranges.back().high >= cell.low) {
            ranges.back().high = cell.high;
        } else {
            ranges.push_back(cell);
        }
    }
    return ranges;
}

} // namespace

std::optional<std::vector<FrequencyRange>> frequencies_that_matter(const std::vector<std::int64_t>& scores,
                                                                   const std::vector<double>& weights, double need) {
    const double range = static_cast<double>(scores.back() - scores.front());
    if (range <= 0) {
        return std::vector<FrequencyRange>{{0, pi}};
    }
    // From here on blocks serve, step by step, until they no longer do.
    const double variance = variance_within_blocks(scores, weights, range);
    const double first = std::sqrt(need / variance) * pi / std::sqrt(2.0);
    double proven_to = first;
    if (first < pi / range) {
        proven_to = pi / range;
    }
    constexpr double step = 1.3;
    while (proven_to < pi && blocks_prove(scores, weights, proven_to, std::min(pi, proven_to * step), need)) {
        proven_to = std::min(pi, proven_to * step);
    }
    std::vector<FrequencyRange> ranges{{0, std::min(first, pi)}};
    if (proven_to >= pi) {
        return ranges;
    }
    constexpr double ample = 5;
    const Window window = narrowest_window(scores, weights, ample * need);
    if (8 * window.range > largest_transform) {
        return std::nullopt;
    }
    for (const FrequencyRange& cell : unproven_cells(scores, weights, window, need, proven_to)) {
        if (ranges.back().high >= cell.low) {
            ranges.back().high = std::max(ranges.back().high, cell.high);
        } else {
            ranges.push_back(cell);
        }
    }
    return ranges;
}

} // namespace rankstead
