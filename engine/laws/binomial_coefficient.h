// Binomial coefficients, exact while they fit, and their size.
#pragma once

#include <algorithm>
#include <cmath>
#include <cstdint>
#include <optional>

namespace rankstead {

__extension__ typedef unsigned __int128 UInt128;

// log2 C(n, k).
[[nodiscard]] inline double log2_choose(std::int64_t n, std::int64_t k) {
    const auto log_factorial = [](std::int64_t i) {
        int sign = 0;
        return ::lgamma_r(static_cast<double>(i) + 1, &sign); // std::lgamma writes a global
    };
    return (log_factorial(n) - log_factorial(k) - log_factorial(n - k)) / std::log(2.0);
}

// C(n, k) if it is below 2^127.
[[nodiscard]] inline std::optional<UInt128> exact_choose(std::int64_t n, std::int64_t k) {
    constexpr UInt128 limit = UInt128{1} << 127;
    k = std::min(k, n - k);
    UInt128 result = 1;
    for (std::int64_t i = 1; i <= k; ++i) {
        const auto factor = static_cast<UInt128>(n - k + i);
        // result * factor is divisible by i; split so that the product cannot overflow.
        const auto divisor = static_cast<UInt128>(i);
        const UInt128 quotient = result / divisor;
        const UInt128 rest = result % divisor;
        if (quotient >= limit / factor) {
            return std::nullopt;
        }
        result = quotient * factor + rest * factor / divisor;
        if (result >= limit) {
            return std::nullopt;
        }
    }
    return result;
}

// C(n, k) as a double, each of k products and quotients rounded.
[[nodiscard]] inline double double_choose(std::int64_t n, std::int64_t k) {
    if (const auto exact = exact_choose(n, k)) {
        return static_cast<double>(*exact);
    }
    long double result = 1;
    k = std::min(k, n - k);
    for (std::int64_t i = 1; i <= k; ++i) {
        result *= static_cast<long double>(n - k + i) / static_cast<long double>(i);
    }
    return static_cast<double>(result);
}

} // namespace rankstead
