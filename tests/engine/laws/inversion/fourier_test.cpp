// laws/inversion/fourier.h against the sum that defines the transform.
#include "laws/inversion/fourier.h"

#include <gtest/gtest.h>

#include <cmath>
#include <numbers>

namespace rankstead {
namespace {

TEST(FourierTransform, is_the_defining_sum) {
    constexpr std::size_t size = 64;
    std::vector<std::complex<double>> values(size);
    for (std::size_t r = 0; r < size; ++r) {
        values[r] = static_cast<double>((r * 37) % 11) / 3;
    }
    std::vector<std::complex<double>> transform = values;
    fourier_transform(transform);
    for (std::size_t k = 0; k < size; ++k) {
        std::complex<double> sum = 0;
        for (std::size_t r = 0; r < size; ++r) {
            sum += values[r] * std::polar(1.0, 2 * std::numbers::pi * static_cast<double>(k * r) / size);
        }
        EXPECT_LT(std::abs(transform[k] - sum), 1e-12) << k;
    }
}

} // namespace
} // namespace rankstead
