// Sums of even powers of whole numbers, relative to a power of the largest: right to a few roundings at any size.
#pragma once

#include <cstdint>
#include <vector>

namespace rankstead {

// Element k - 1: the sum over i = 1 to n of (i / n)^(2k), for k = 1 to `terms`.
[[nodiscard]] std::vector<double> even_power_sums(std::int64_t n, int terms);

// Element k - 1: the sum over i = 1 to m of ((n + i) / N)^(2k) - (i / N)^(2k), N = m + n, m <= n.
[[nodiscard]] std::vector<double> even_power_differences(std::int64_t m, std::int64_t n, int terms);

// zeta(2k) for k = 1 to 100; element 0 is not used.
[[nodiscard]] const std::vector<double>& even_zeta();

} // namespace rankstead
