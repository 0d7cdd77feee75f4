// Complex numbers side by side, so many at a time that no multiplication waits for another.
#pragma once

#include "contour_parts.h"

#include <array>
#include <cstddef>

namespace rankstead {

struct FactorLanes {
    static constexpr std::size_t lanes = 8;

    std::array<double, lanes> re{};
    std::array<double, lanes> im{};

    void put(std::size_t lane, Complex value) {
        re[lane] = value.real();
        im[lane] = value.imag();
    }
    [[nodiscard]] Complex get(std::size_t lane) const { return {re[lane], im[lane]}; }

    void square() {
        for (std::size_t lane = 0; lane < lanes; ++lane) {
            const double x = re[lane];
            const double y = im[lane];
            re[lane] = x * x - y * y;
            im[lane] = 2 * x * y;
        }
    }

    void multiply(const FactorLanes& by) {
        for (std::size_t lane = 0; lane < lanes; ++lane) {
            const double x = re[lane];
            const double y = im[lane];
            re[lane] = x * by.re[lane] - y * by.im[lane];
            im[lane] = x * by.im[lane] + y * by.re[lane];
        }
    }
};

} // namespace rankstead
