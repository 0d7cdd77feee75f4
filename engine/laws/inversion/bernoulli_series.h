// The logarithm of the characteristic function of a centred Bernoulli variable, as a power series:
//     log(q + p e^y) - p y = sum over k >= 2 of c[k] y^k,      |y| < R = |log(p/q) + i pi|.
// The derivative is a logistic function, whose partial fractions give every coefficient and the bound
//     |c[k]| <= b[k] = 2 L / (k R^k),   L = sum over odd j of j^-k <= pi^2 / 8.
// (Abramowitz & Stegun 1964, 4.5.67 for the partial fractions of tanh.)
#pragma once

#include <vector>

namespace rankstead {

struct BernoulliSeries {
    BernoulliSeries(double p, int terms);

    double p;
    double radius;            // R
    std::vector<double> c;    // c[0] = c[1] = 0
    std::vector<double> size; // at least |c[k]|; a few roundings of it bound the error of c[k]

    // Bound on what the terms beyond the last add up to, for one item with |y| <= reach * R, reach < 1.
    [[nodiscard]] double tail(double reach) const;
};

} // namespace rankstead
