#include "contour_parts.h"

#include <cmath>
#include <numbers>

namespace rankstead {

Complex unit(double angle) {
    return {std::cos(angle), std::sin(angle)};
}

Complex exact_unit(std::int64_t j, Wide k, std::int64_t n) {
    const Wide product = static_cast<Wide>(j) * (k % n);
    auto rest = static_cast<std::int64_t>(product % n);
    rest += rest < 0 ? n : 0;
    rest -= 2 * static_cast<Wide>(rest) > n ? n : 0;
    return unit(2 * std::numbers::pi * static_cast<double>(rest) / static_cast<double>(n));
}

Complex cumulative_kernel(double lambda, double t) {
    const double below = -std::expm1(-lambda);
    const double decay = std::exp(-lambda);
    const double half = std::sin(t / 2);
    return below / Complex(below + decay * 2 * half * half, -decay * std::sin(t));
}

} // namespace rankstead
