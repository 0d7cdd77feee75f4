// Summation with the rounding errors carried along (Neumaier 1974): the result is right to about one rounding.
#pragma once

#include <cmath>

namespace rankstead {

class CompensatedSum {
public:
    void add(double term) {
        const double sum = sum_ + term;
        carried_ += std::fabs(sum_) >= std::fabs(term) ? (sum_ - sum) + term : (term - sum) + sum_;
        sum_ = sum;
    }
    [[nodiscard]] double value() const { return sum_ + carried_; }

private:
    double sum_ = 0;
    double carried_ = 0;
};

} // namespace rankstead
