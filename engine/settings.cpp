#include "settings.h"

#include <algorithm>

namespace rankstead {

Fraction as_fraction(const Decimal& alpha) {
    constexpr std::int32_t finest = -18;
    Fraction fraction{alpha.coefficient, 1};
    for (std::int32_t e = alpha.exponent; e < finest; ++e) {
        fraction.numerator /= 10;
    }
    for (std::int32_t e = std::max(alpha.exponent, finest); e < 0; ++e) {
        fraction.denominator *= 10;
    }
    return fraction;
}

Fraction error_rate(const Settings& settings) {
    const Fraction level = as_fraction(settings.level);
    return {level.denominator - level.numerator, level.denominator};
}

Fraction tail_rate(const Settings& settings) {
    Fraction rate = error_rate(settings);
    if (settings.side == Side::two_sided) {
        rate.denominator *= 2;
    }
    return rate;
}

} // namespace rankstead
