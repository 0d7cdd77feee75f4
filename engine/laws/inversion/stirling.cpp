#include "stirling.h"

#include <cmath>
#include <numbers>

namespace rankstead {

// The asymptotic series (Abramowitz & Stegun 1964, 6.1.41).
double stirling_error(double n) {
    if (n < 16) {
        int sign = 0;
        return ::lgamma_r(n + 1, &sign) - (n + 0.5) * std::log(n) + n - 0.5 * std::log(2 * std::numbers::pi);
    }
    const double x = 1 / (n * n);
    return (1.0 / 12 - x * (1.0 / 360 - x * (1.0 / 1260 - x * (1.0 / 1680 - x / 1188)))) / n;
}

double log_count_probability(double n, double m) {
    const double rest = n - m;
    return -0.5 * std::log(2 * std::numbers::pi * m * (rest / n)) + stirling_error(n) - stirling_error(m) -
           stirling_error(rest);
}

} // namespace rankstead
