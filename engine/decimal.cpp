#include "decimal.h"

#include <array>
#include <charconv>
#include <cmath>
#include <cstdlib>

namespace rankstead {

namespace {

constexpr int significant_digits = 15;
constexpr double largest_coefficient = 999999999999999.0;

Decimal canonical(std::int64_t coefficient, std::int32_t exponent) {
    if (coefficient == 0) {
        return {};
    }
    while (coefficient % 10 == 0) {
        coefficient /= 10;
        ++exponent;
    }
    return {coefficient, exponent};
}

// Most measurements have few decimals. If r / 10^k, both exact doubles, rounds to the value, then r * 10^-k is a
// decimal of at most 15 digits that the value prints to, and there is only one such (Clinger 1990).
std::optional<Decimal> few_decimals(double value) {
    constexpr std::array powers{1.0, 10.0, 100.0, 1000.0, 10000.0, 100000.0, 1000000.0};
    for (std::size_t k = 0; k < powers.size(); ++k) {
        const double scaled = std::nearbyint(value * powers[k]);
        if (std::fabs(scaled) > largest_coefficient) {
            return std::nullopt;
        }
        if (scaled / powers[k] == value) {
            return canonical(static_cast<std::int64_t>(scaled), -static_cast<std::int32_t>(k));
        }
    }
    return std::nullopt;
}

Decimal printed(double value) {
    std::array<char, 40> buffer{};
    const auto end = std::to_chars(buffer.data(), buffer.data() + buffer.size(), value, std::chars_format::scientific,
                                   significant_digits - 1);
    std::int64_t coefficient = 0;
    const char* at = buffer.data();
    const bool negative = *at == '-';
    for (at += negative ? 1 : 0; *at != 'e'; ++at) {
        if (*at != '.') {
            coefficient = coefficient * 10 + (*at - '0');
        }
    }
    std::int32_t exponent = 0;
    ++at;
    std::from_chars(at + (*at == '+' ? 1 : 0), end.ptr, exponent);
    return canonical(negative ? -coefficient : coefficient, exponent - (significant_digits - 1));
}

bool is_digit(char c) {
    return c >= '0' && c <= '9';
}

std::size_t skip_digits(std::string_view text, std::size_t at) {
    while (at < text.size() && is_digit(text[at])) {
        ++at;
    }
    return at;
}

// The grammar of a plain number; from_chars alone would also take "inf" and "nan".
bool looks_like_number(std::string_view text) {
    std::size_t at = !text.empty() && (text[0] == '-' || text[0] == '+') ? 1 : 0;
    const std::size_t whole = skip_digits(text, at);
    std::size_t digits = whole - at;
    at = whole;
    if (at < text.size() && text[at] == '.') {
        const std::size_t part = skip_digits(text, at + 1);
        digits += part - at - 1;
        at = part;
    }
    if (digits > 0 && at < text.size() && (text[at] == 'e' || text[at] == 'E')) {
        const std::size_t sign = at + 1 < text.size() && (text[at + 1] == '-' || text[at + 1] == '+') ? 2 : 1;
        const std::size_t end = skip_digits(text, at + sign);
        return end == text.size() && end > at + sign;
    }
    return digits > 0 && at == text.size();
}

} // namespace

int digit_count(std::int64_t coefficient) {
    int digits = 1;
    for (std::int64_t rest = std::abs(coefficient) / 10; rest != 0; rest /= 10) {
        ++digits;
    }
    return digits;
}

std::string_view trimmed(std::string_view text) {
    constexpr std::string_view no_break_space = "\xC2\xA0";
    for (bool again = true; again;) {
        again = false;
        if (!text.empty() && (text.front() == ' ' || (text.front() >= '\t' && text.front() <= '\r'))) {
            text.remove_prefix(1);
            again = true;
        } else if (text.starts_with(no_break_space)) {
            text.remove_prefix(no_break_space.size());
            again = true;
        }
        if (!text.empty() && (text.back() == ' ' || (text.back() >= '\t' && text.back() <= '\r'))) {
            text.remove_suffix(1);
            again = true;
        } else if (text.ends_with(no_break_space)) {
            text.remove_suffix(no_break_space.size());
            again = true;
        }
    }
    return text;
}

Decimal Decimal::from_double(double value) {
    if (const auto quick = few_decimals(value)) {
        return *quick;
    }
    return printed(value);
}

std::optional<Decimal> Decimal::from_text(std::string_view text, char sign) {
    std::string plain(trimmed(text));
    for (char& c : plain) {
        if (c == sign) {
            c = '.';
        } else if (c == '.') {
            return std::nullopt;
        }
    }
    if (!looks_like_number(plain)) {
        return std::nullopt;
    }
    const char* begin = plain.data() + (plain[0] == '+' ? 1 : 0);
    double value = 0;
    const auto read = std::from_chars(begin, plain.data() + plain.size(), value);
    if (read.ec != std::errc{} || !std::isfinite(value)) {
        return std::nullopt;
    }
    return from_double(value);
}

double nearest_double(const std::string& digits, int exponent) {
    const std::string text = digits + "e" + std::to_string(exponent);
    double value = 0;
    const auto read = std::from_chars(text.data(), text.data() + text.size(), value);
    // Beyond the largest double from_chars leaves the value alone; below the smallest, 0 is right.
    if (read.ec == std::errc::result_out_of_range && static_cast<int>(digits.size()) + exponent > 0) {
        return digits.front() == '-' ? -HUGE_VAL : HUGE_VAL;
    }
    return value;
}

double Decimal::to_double() const {
    return nearest_double(std::to_string(coefficient), exponent);
}

std::string Decimal::to_text() const {
    return shortest_text(to_double());
}

std::string shortest_text(double value) {
    std::array<char, 40> buffer{};
    const auto end = std::to_chars(buffer.data(), buffer.data() + buffer.size(), value == 0 ? 0.0 : value);
    return {buffer.data(), end.ptr};
}

} // namespace rankstead
