// Which frequencies of a characteristic function can matter. With tilted weights w_g = count p_g (1 - p_g),
//     log |characteristic(s, t)| <= - sum of w_g (1 - cos(s + t r_g)),
// because |q + p e^{ix}|^2 = 1 - 2pq(1 - cos x) and log(1 - y) <= -y. Minimised over the phase s the sum is
// V - |C(t)|, V the sum of the weights and C their Fourier transform. Any subset of the groups bounds it from below.
//   - within blocks of neighbouring groups of range at most pi / t:  1 - cos x >= 2 x^2 / pi^2, hence
//     V - |C(t)| >= (2 / pi^2) t^2 * (the weighted variance within the blocks, times their weights);
//   - elsewhere by the Fourier transform of the weights in a window of scores, at once or step by step, with the
//     Lipschitz constant of C between its points.
// What neither proves negligible is returned and must be evaluated, so that the peaks which ties cause are not missed.
#pragma once

#include <cstdint>
#include <limits>
#include <vector>

namespace rankstead {

struct FrequencyRange {
    double low = 0;
    double high = 0;
};

// How much decay makes a frequency negligible: the same everywhere, or less where the factor
//     (1 - e^-lambda) / (1 - e^-(lambda - it)),
// which turns masses into their sum, is small itself: the further from 0, the less.
struct Need {
    double base = 0;
    double lambda = std::numeric_limits<double>::infinity();

    [[nodiscard]] double at(double t) const;
};

// Ranges of t in [0, pi], ascending, outside of which V - |C(t)| >= need, and the work done, as counted.
struct Screened {
    std::vector<FrequencyRange> ranges;
    double seconds = 0;
};

// What is not looked into within the work allowed counts as a range.
[[nodiscard]] Screened frequencies_that_matter(const std::vector<std::int64_t>& scores,
                                               const std::vector<double>& weights, const Need& need,
                                               double seconds_allowed);

} // namespace rankstead
