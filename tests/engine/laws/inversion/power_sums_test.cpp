// laws/inversion/power_sums.h: against sums written out, and Faulhaber's formulas for small powers at any size.
#include "laws/inversion/power_sums.h"

#include <gtest/gtest.h>

#include <cmath>

namespace rankstead {
namespace {

long double summed(std::int64_t from, std::int64_t to, long double scale, int power) {
    long double sum = 0;
    for (std::int64_t i = from; i <= to; ++i) {
        sum += std::pow(static_cast<long double>(i) / scale, static_cast<long double>(power));
    }
    return sum;
}

TEST(EvenPowerSums, are_the_sums_written_out) {
    constexpr int terms = 60;
    for (const std::int64_t n : {1, 7, 40, 41, 300, 5000}) {
        const std::vector<double> sums = even_power_sums(n, terms);
        for (int k = 1; k <= terms; ++k) {
            const double expected = static_cast<double>(summed(1, n, static_cast<long double>(n), 2 * k));
            EXPECT_NEAR(sums[static_cast<std::size_t>(k - 1)] / expected, 1, 3e-15) << n << ", power " << 2 * k;
        }
    }
}

TEST(EvenPowerDifferences, are_the_sums_written_out) {
    constexpr int terms = 60;
    const std::pair<std::int64_t, std::int64_t> sizes[] = {{1, 1}, {3, 50}, {40, 41}, {41, 41}, {50, 4000}, {900, 900}};
    for (const auto& [m, n] : sizes) {
        const std::vector<double> sums = even_power_differences(m, n, terms);
        const auto all = static_cast<long double>(m + n);
        for (int k = 1; k <= terms; ++k) {
            const double expected = static_cast<double>(summed(n + 1, n + m, all, 2 * k) - summed(1, m, all, 2 * k));
            EXPECT_NEAR(sums[static_cast<std::size_t>(k - 1)] / expected, 1, 5e-15) << m << ", " << n << ", " << 2 * k;
        }
    }
}

// Sum of i^2 = n (n + 1) (2n + 1) / 6, of i^4 = n (n + 1) (2n + 1) (3n^2 + 3n - 1) / 30 (Graham, Knuth & Patashnik
// 1994).
TEST(EvenPowerSums, hold_for_thousands_of_millions) {
    const long double n = 2e9L;
    const std::vector<double> sums = even_power_sums(2'000'000'000, 2);
    const long double squares = (n + 1) * (2 * n + 1) / (6 * n);
    EXPECT_NEAR(sums[0] / static_cast<double>(squares), 1, 1e-15);
    EXPECT_NEAR(sums[1] / static_cast<double>(squares * (3 * n * n + 3 * n - 1) / (5 * n * n)), 1, 1e-15);
}

// One value against a thousand million: only the largest power is left, N^e - 1.
TEST(EvenPowerDifferences, keep_what_little_is_left_of_two_large_sums) {
    const std::vector<double> one = even_power_differences(1, 999'999'999, 3);
    EXPECT_NEAR(one[0], 1, 1e-15);
    EXPECT_NEAR(one[2], 1, 1e-15);
}

// zeta(2) = pi^2 / 6, zeta(4) = pi^4 / 90 (Euler; Abramowitz & Stegun 1964, 23.2.24 and 23.2.25).
TEST(EvenZeta, has_the_values_of_euler) {
    const double pi = std::acos(-1.0);
    EXPECT_NEAR(even_zeta()[1], pi * pi / 6, 1e-15);
    EXPECT_NEAR(even_zeta()[2], std::pow(pi, 4) / 90, 1e-15);
}

} // namespace
} // namespace rankstead
