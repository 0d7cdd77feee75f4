#include "fourier.h"

#include <cmath>
#include <cstddef>
#include <numbers>
#include <utility>

namespace rankstead {

namespace {

using Complex = std::complex<double>;

void reverse_bits(std::vector<Complex>& values) {
    for (std::size_t i = 1, j = 0; i < values.size(); ++i) {
        std::size_t bit = values.size() / 2;
        for (; (j & bit) != 0; bit /= 2) {
            j ^= bit;
        }
        j ^= bit;
        if (i < j) {
            std::swap(values[i], values[j]);
        }
    }
}

std::vector<Complex> roots_of_unity(std::size_t size) {
    std::vector<Complex> roots(size / 2);
    for (std::size_t k = 0; k < roots.size(); ++k) {
        const double angle = 2 * std::numbers::pi * static_cast<double>(k) / static_cast<double>(size);
        roots[k] = {std::cos(angle), std::sin(angle)};
    }
    return roots;
}

} // namespace

void fourier_transform(std::vector<Complex>& values) {
    reverse_bits(values);
    const std::vector<Complex> roots = roots_of_unity(values.size());
    for (std::size_t half = 1; half < values.size(); half *= 2) {
        const std::size_t stride = values.size() / (2 * half);
        for (std::size_t begin = 0; begin < values.size(); begin += 2 * half) {
            for (std::size_t k = 0; k < half; ++k) {
                const Complex root = roots[k * stride];
                Complex& low = values[begin + k];
                Complex& high = values[begin + k + half];
                const Complex turned{high.real() * root.real() - high.imag() * root.imag(),
                                     high.real() * root.imag() + high.imag() * root.real()};
                high = low - turned;
                low += turned;
            }
        }
    }
}

} // namespace rankstead
