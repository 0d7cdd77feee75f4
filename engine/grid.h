// A set of decimals on one power of ten: from here on they are integers, so that differences, sums and ties are exact.
// Three integer types serve: 64 bits for almost all data, 128 bits for many decimals, unbounded for mixtures such as
// 1e308 with 5e-324.
#pragma once

#include "decimal.h"
#include "refusal.h"

#include <boost/multiprecision/cpp_int.hpp>

#include <algorithm>
#include <cstdint>
#include <span>
#include <string>
#include <vector>

namespace rankstead {

__extension__ typedef __int128 Int128; // a compiler extension; g++ and clang have it
using BigInt = boost::multiprecision::cpp_int;

// The power of ten that makes all of them integers, and how many decimal digits the largest then has.
struct Grid {
    std::int32_t exponent = 0;
    int digits = 1;

    void cover(const Decimal& value) {
        if (value.coefficient == 0) {
            return;
        }
        const int top = value.exponent + digit_count(value.coefficient);
        lowest_ = empty_ ? value.exponent : std::min(lowest_, value.exponent);
        highest_ = empty_ ? top : std::max(highest_, top);
        empty_ = false;
        exponent = lowest_;
        digits = highest_ - lowest_;
    }
    void cover(std::span<const Decimal> values) {
        for (const Decimal& value : values) {
            cover(value);
        }
    }

    // Sums of up to eight values, each scaled by up to four, must fit; hence the distance from the type's limit.
    [[nodiscard]] bool fits64() const { return digits <= 17; }
    [[nodiscard]] bool fits128() const { return digits <= 36; }

private:
    bool empty_ = true;
    std::int32_t lowest_ = 0;
    int highest_ = 0;
};

// Puts decimals on a grid; keeps the powers of ten that it needs.
template <class Int>
class Scale {
public:
    explicit Scale(const Grid& grid) : exponent_(grid.exponent) {}

    [[nodiscard]] Int of(const Decimal& value) {
        if (value.coefficient == 0) {
            return Int(0);
        }
        const auto power = static_cast<std::size_t>(value.exponent - exponent_);
        while (powers_.size() <= power) {
            powers_.push_back(Int(powers_.back() * 10));
        }
        return Int(Int(value.coefficient) * powers_[power]);
    }

private:
    std::int32_t exponent_;
    std::vector<Int> powers_{Int(1)};
};

template <class Int>
[[nodiscard]] Int on_grid(const Decimal& value, const Grid& grid) {
    return Scale<Int>(grid).of(value);
}

template <class Int>
[[nodiscard]] std::vector<Int> on_grid(std::span<const Decimal> values, const Grid& grid) {
    Scale<Int> scale(grid);
    std::vector<Int> scaled;
    scaled.reserve(values.size());
    for (const Decimal& value : values) {
        scaled.push_back(scale.of(value));
    }
    return scaled;
}

// The same, and gives the decimals' memory back.
template <class Int>
[[nodiscard]] std::vector<Int> moved_on_grid(std::vector<Decimal>&& values, const Grid& grid) {
    std::vector<Int> scaled = on_grid<Int>(values, grid);
    std::vector<Decimal>().swap(values);
    return scaled;
}

// numerator / 2^halvings on the grid, rounded once to the nearest double.
template <class Int>
[[nodiscard]] double off_grid(const Int& numerator, int halvings, const Grid& grid) {
    BigInt digits(numerator);
    for (int i = 0; i < halvings; ++i) {
        digits *= 5;
    }
    return nearest_double(digits.str(), grid.exponent - halvings);
}

// Integers of hundreds of digits take their time: throws Refusal where there would be too many of them.
inline void require_practicable(const Grid& grid, std::size_t values) {
    constexpr std::size_t most = 200'000;
    if (!grid.fits128() && values > most) {
        throw Refusal(Status::too_large, "from the largest value to the last decimal of the smallest there are " +
                                             std::to_string(grid.digits) +
                                             " digits. So wide a range can be computed for up to 200000 values, and "
                                             "here are " +
                                             std::to_string(values) + ". Look for a value that is a slip.");
    }
}

// Calls work.template operator()<Int>() with the narrowest type that the grid fits.
template <class Work>
auto with_integers(const Grid& grid, Work&& work) {
    if (grid.fits64()) {
        return work.template operator()<std::int64_t>();
    }
    if (grid.fits128()) {
        return work.template operator()<Int128>();
    }
    return work.template operator()<BigInt>();
}

} // namespace rankstead
