// Binomial probabilities of large numbers to a few roundings (Loader 2000), by Stirling's series.
#pragma once

namespace rankstead {

// log n! - (n + 1/2) log n + n - log sqrt(2 pi).
[[nodiscard]] double stirling_error(double n);

// log P(count = m) where each of n items is taken with probability m/n, 0 < m < n.
[[nodiscard]] double log_count_probability(double n, double m);

} // namespace rankstead
