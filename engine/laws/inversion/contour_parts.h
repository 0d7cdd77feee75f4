// What the inversions of laws with and without ties share.
#pragma once

#include <complex>
#include <cstdint>

namespace rankstead {

__extension__ typedef __int128 Wide;

using Complex = std::complex<double>;

inline constexpr double wanted_accuracy = 1e-11; // relative size of aliases and of what is left out
inline constexpr double useful_accuracy = 1e-10; // a larger bound is not given
inline constexpr double bound_slack = 1 + 1e-9;  // for the rounding of the bounds themselves

// Written out: the operator of std::complex also looks for infinities.
[[nodiscard]] inline Complex times(Complex a, Complex b) {
    return {a.real() * b.real() - a.imag() * b.imag(), a.real() * b.imag() + a.imag() * b.real()};
}

[[nodiscard]] Complex unit(double angle);

// exp(2 pi i (j * k mod n) / n): the product is reduced exactly.
[[nodiscard]] Complex exact_unit(std::int64_t j, Wide k, std::int64_t n);

// (1 - e^-lambda) / (1 - e^-(lambda - it)): the sum over all values up to w, as a factor.
[[nodiscard]] Complex cumulative_kernel(double lambda, double t);

} // namespace rankstead
