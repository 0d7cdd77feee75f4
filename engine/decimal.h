// Decimals as people write them. A double stands for the decimal that it prints to at 15 significant digits, so that
// 0.1 + 0.2 is 0.3 and 0.3 - 0.1 ties with 0.9 - 0.7, as on paper.
#pragma once

#include <cstdint>
#include <optional>
#include <string>
#include <string_view>

namespace rankstead {

// coefficient * 10^exponent, without trailing zeros in the coefficient; zero is {0, 0}. At most 15 digits.
struct Decimal {
    std::int64_t coefficient = 0;
    std::int32_t exponent = 0;

    friend bool operator==(const Decimal&, const Decimal&) = default;

    // `value` must be finite.
    [[nodiscard]] static Decimal from_double(double value);

    // Reads `12`, `-3.5`, `+1e-3`, with `sign` as decimal sign; spaces around it are ignored. Empty if the text is
    // anything else or beyond the range of a double.
    [[nodiscard]] static std::optional<Decimal> from_text(std::string_view text, char sign = '.');

    [[nodiscard]] double to_double() const;

    // Plain or scientific, shortest, with a point: "0.95", "-12", "1e300".
    [[nodiscard]] std::string to_text() const;
};

// Digits in |coefficient|; 1 for zero.
[[nodiscard]] int digit_count(std::int64_t coefficient);

// `coefficient` digits (with sign) times 10^exponent, rounded once to the nearest double; infinite beyond the largest.
[[nodiscard]] double nearest_double(const std::string& digits, int exponent);

// The shortest text that reads back as this double; "-0" is "0".
[[nodiscard]] std::string shortest_text(double value);

// Text without spaces, tabs and no-break spaces at either end.
[[nodiscard]] std::string_view trimmed(std::string_view text);

} // namespace rankstead
