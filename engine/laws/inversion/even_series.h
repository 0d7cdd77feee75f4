// Sums of log(sinh x / x) or log(cosh x) over many x = i h / 2, as one power series in h: the cost of a law without
// ties does not depend on its size.
//     log(sinh x / x) = sum over k >= 1 of (-1)^(k+1) zeta(2k) / (k pi^(2k)) x^(2k),           |x| < pi,
//     log(cosh x)     = the same with (4^k - 1) zeta(2k) in place of zeta(2k),                   |x| < pi / 2
// (from the products of sinh and cosh, Abramowitz & Stegun 1964, 4.5.68 and 4.5.69), and the sums over i are sums of
// even powers, by the Euler-Maclaurin formula, which ends for powers (Faulhaber; Graham, Knuth & Patashnik 1994, 9.5).
#pragma once

#include "jet.h"

#include <complex>
#include <cstdint>
#include <vector>

namespace rankstead {

// K(h) = sum over k of c[k] y^k with y = (scale h)^2; it converges for |scale h| < radius.
class EvenSeries {
public:
    // Sum over i = 1 to m of log sinhc((n + i) h / 2) - log sinhc(i h / 2), m <= n: U of m against n values.
    static EvenSeries of_rank_sum(std::int64_t m, std::int64_t n);
    // Sum over i = 1 to n of log cosh(i h / 2): the signed rank statistic of n values.
    static EvenSeries of_signed_rank(std::int64_t n);

    // Whether |h| is within reach, the truncation then being at most 1e-14.
    [[nodiscard]] bool serves(double size_of_h) const;

    // At a real h; and at a complex one, with a bound on the error of the value.
    [[nodiscard]] SumJet jet(double h) const;
    struct Value {
        std::complex<double> value;
        double error = 0;
    };
    [[nodiscard]] Value at(std::complex<double> h) const;

private:
    EvenSeries(double scale, double radius, double most_items, std::vector<double> c)
        : scale_(scale), radius_(radius), most_items_(most_items), c_(std::move(c)) {}

    [[nodiscard]] std::size_t terms_for(double reach) const;
    [[nodiscard]] double truncation(double reach, std::size_t terms) const;

    double scale_;
    double radius_;
    double most_items_; // |c[k]| radius^(2k) is at most this
    std::vector<double> c_;
};

} // namespace rankstead
