// Values of a cumulant generating function with its derivatives.
#pragma once

namespace rankstead {

// log E exp(h (S - mean)) of one variable at a real h, with a bound on the error of the value.
struct SumJet {
    double value = 0;
    double first = 0;
    double second = 0;
    double error = 0;
};

} // namespace rankstead
