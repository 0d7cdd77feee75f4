// What the invented data must give. Sources: data/README.md.
#pragma once

namespace rankstead::client_tests {

// groups.csv: 8 against 7 values, U = 48.
constexpr double groups_p = 132.0 / 6435; // SciPy: 0.020512820512820513
constexpr double groups_p_higher = 66.0 / 6435;
constexpr double groups_estimate = 4.75;
constexpr double groups_lower = 1.0;
constexpr double groups_upper = 10.5;

// pairs.csv: 10 pairs, T+ = 6.
constexpr double pairs_p = 28.0 / 1024; // SciPy: 0.02734375
constexpr double pairs_estimate = -5.25;
constexpr double pairs_lower = -9.25;
constexpr double pairs_upper = -1.0;

// single.csv against 10: the differences of pairs.csv with the other sign.
constexpr double single_estimate = 15.25;
constexpr double single_lower = 11.0;
constexpr double single_upper = 19.25;

} // namespace rankstead::client_tests
