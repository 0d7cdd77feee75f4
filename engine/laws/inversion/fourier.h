// The discrete Fourier transform of real weights, for bounds only: radix 2 (Cooley & Tukey 1965).
#pragma once

#include <complex>
#include <vector>

namespace rankstead {

// values.size() must be a power of two; replaced by sum over r of values[r] exp(2 pi i k r / size).
void fourier_transform(std::vector<std::complex<double>>& values);

} // namespace rankstead
