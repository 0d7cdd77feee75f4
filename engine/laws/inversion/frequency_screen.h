// Which frequencies of a characteristic function can matter. With tilted weights w_g = count p_g (1 - p_g),
//     log |characteristic(s, t)| <= - sum of w_g (1 - cos(s + t r_g)),
// because |q + p e^{ix}|^2 = 1 - 2pq(1 - cos x) and log(1 - y) <= -y. Minimised over the phase s the sum is
// V - |C(t)|, V the sum of the weights and C their Fourier transform. Any subset of the groups bounds it from below.
//   - within blocks of neighbouring groups of range at most pi / t:  1 - cos x >= 2 x^2 / pi^2, hence
//     V - |C(t)| >= (2 / pi^2) t^2 * (the weighted variance within the blocks, times their weights);
//   - elsewhere by a Fourier transform of the weights in a window of scores, with the Lipschitz constant of C between
//     its points.
// What neither proves negligible is returned and must be evaluated, so that the peaks which ties cause are not missed.
#pragma once

#include <cstdint>
#include <optional>
#include <vector>

namespace rankstead {

struct FrequencyRange {
    double low = 0;
    double high = 0;
};

// Ranges of t in [0, pi], ascending, outside of which V - |C(t)| >= need. Empty optional where the transform would be
// too large.
[[nodiscard]] std::optional<std::vector<FrequencyRange>>
frequencies_that_matter(const std::vector<std::int64_t>& scores, const std::vector<double>& weights, double need);

} // namespace rankstead
