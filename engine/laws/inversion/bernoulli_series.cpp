#include "bernoulli_series.h"

#include <cmath>
#include <complex>
#include <numbers>

namespace rankstead {

namespace {

constexpr int first_summed = 7; // below, the cumulants are short polynomials
constexpr double odd_zeta = std::numbers::pi * std::numbers::pi / 8;

void set_polynomials(std::vector<double>& c, double p) {
    const double q = 1 - p;
    const double v = p * q;
    const double skew = q - p;
    const double cumulants[] = {
        0, 0, v, v * skew, v * (1 - 6 * v), v * skew * (1 - 12 * v), v * (1 - 30 * v + 120 * v * v)};
    double factorial = 1;
    for (int k = 2; k < first_summed && k < static_cast<int>(c.size()); ++k) {
        factorial *= k;
        c[static_cast<std::size_t>(k)] = cumulants[k] / factorial;
    }
}

// c[k] = (-1)^(k-1) (2/k) Re sum over l of (log(p/q) - i (2l-1) pi)^-k, summed until a term no longer counts.
void add_partial_fractions(std::vector<double>& c, double log_odds) {
    constexpr double negligible = 1e-19;
    const double first = std::hypot(log_odds, std::numbers::pi);
    for (int l = 1; l < 1000; ++l) {
        const std::complex<double> inverse = 1.0 / std::complex<double>(log_odds, -(2 * l - 1) * std::numbers::pi);
        std::complex<double> power = std::pow(inverse, first_summed);
        double share = std::pow(std::abs(inverse) * first, first_summed);
        for (std::size_t k = first_summed; k < c.size() && share > negligible; ++k) {
            c[k] += (k % 2 == 0 ? -2.0 : 2.0) / static_cast<double>(k) * power.real();
            power *= inverse;
            share *= std::abs(inverse) * first;
        }
        if (std::pow(std::abs(inverse) * first, first_summed) < negligible) {
            return;
        }
    }
}

} // namespace

BernoulliSeries::BernoulliSeries(double probability, int terms)
    : p(probability), radius(std::hypot(std::log(p / (1 - p)), std::numbers::pi)),
      c(static_cast<std::size_t>(terms + 1), 0.0), size(c.size(), 0.0) {
    set_polynomials(c, p);
    add_partial_fractions(c, std::log(p / (1 - p)));
    const double v = p * (1 - p);
    const double polynomial_sizes[] = {
        0, 0, v / 2, v / 6, v * (1 + 6 * v) / 24, v * (1 + 12 * v) / 120, v * (1 + 30 * v + 120 * v * v) / 720};
    for (std::size_t k = 2; k < c.size(); ++k) {
        size[k] = k < first_summed ? polynomial_sizes[k]
                                   : 2 * odd_zeta / (static_cast<double>(k) * std::pow(radius, static_cast<double>(k)));
    }
}

double BernoulliSeries::tail(double reach) const {
    const auto next = static_cast<double>(c.size());
    return 2 * odd_zeta / next * std::pow(reach, next) / (1 - reach);
}

} // namespace rankstead
