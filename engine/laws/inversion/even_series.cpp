#include "even_series.h"

#include "characteristic.h"
#include "power_sums.h"

#include <algorithm>
#include <cmath>
#include <numbers>

namespace rankstead {

namespace {

constexpr int most_terms = 80;
constexpr double farthest_reach = 0.85; // of the radius
constexpr double least_truncation = 1e-17;
constexpr double largest_truncation = 1e-14;

// What a term k passes through, in units of roundoff of its own size: powers of the ratio of the sizes and their sums
// 4k, the difference of two power sums 1.4 times that, powers of pi k, powers of y 6k (each a complex product, sqrt(5)
// roundings and an addition; Brent, Percival & Zimmermann 2007), and fewer than 64 others.
double operations(std::size_t k) {
    return 16 * static_cast<double>(k) + 64;
}

} // namespace

EvenSeries EvenSeries::of_rank_sum(std::int64_t m, std::int64_t n) {
    std::vector<double> c = even_power_differences(m, n, most_terms);
    double pi_power = 1;
    for (std::size_t k = 1; k <= c.size(); ++k) {
        pi_power *= std::numbers::pi * std::numbers::pi;
        c[k - 1] *= (k % 2 == 1 ? 1 : -1) * even_zeta()[k] / (static_cast<double>(k) * pi_power);
    }
    return {static_cast<double>(m + n) / 2, std::numbers::pi, static_cast<double>(m) * even_zeta()[1], std::move(c)};
}

EvenSeries EvenSeries::of_signed_rank(std::int64_t n) {
    std::vector<double> c = even_power_sums(n, most_terms);
    double power = 1;
    double quarter = 1;
    for (std::size_t k = 1; k <= c.size(); ++k) {
        power *= std::numbers::pi * std::numbers::pi / 4;
        quarter /= 4;
        c[k - 1] *= (k % 2 == 1 ? 1 : -1) * (1 - quarter) * even_zeta()[k] / (static_cast<double>(k) * power);
    }
    return {static_cast<double>(n) / 2, std::numbers::pi / 2, static_cast<double>(n) * even_zeta()[1], std::move(c)};
}

double EvenSeries::truncation(double reach, std::size_t terms) const {
    const auto next = static_cast<double>(terms + 1);
    return most_items_ / next * std::pow(reach, 2 * next) / (1 - reach * reach);
}

std::size_t EvenSeries::terms_for(double reach) const {
    // reach^(2k) most_items below the least truncation.
    const double wanted = std::log(least_truncation / most_items_) / (2 * std::log(std::max(reach, 1e-100)));
    return static_cast<std::size_t>(std::clamp(std::ceil(wanted), 1.0, static_cast<double>(c_.size())));
}

bool EvenSeries::serves(double size_of_h) const {
    const double reach = scale_ * size_of_h / radius_;
    return reach <= farthest_reach && truncation(reach, c_.size()) <= largest_truncation;
}

SumJet EvenSeries::jet(double h) const {
    const double x = scale_ * h;
    const double y = x * x;
    const double reach = std::fabs(x) / radius_;
    SumJet jet;
    // In powers of y: the value, h times the first derivative, h^2 times the second.
    double first = 0;
    double second = 0;
    for (std::size_t k = terms_for(reach); k >= 1; --k) {
        const auto degree = 2 * static_cast<double>(k);
        const double c = c_[k - 1];
        jet.value = (jet.value + c) * y;
        jet.error = (jet.error + std::fabs(c) * operations(k)) * y;
        first = first * y + degree * c;
        second = second * y + degree * (degree - 1) * c;
    }
    jet.first = first * x * scale_;
    jet.second = second * scale_ * scale_;
    jet.error = jet.error * unit_roundoff + truncation(reach, terms_for(reach));
    return jet;
}

EvenSeries::Value EvenSeries::at(std::complex<double> h) const {
    const double re = scale_ * h.real();
    const double im = scale_ * h.imag();
    const double yr = (re - im) * (re + im);
    const double yi = 2 * re * im;
    const double size = re * re + im * im;
    const double reach = std::sqrt(size) / radius_;
    const std::size_t terms = terms_for(reach);
    double vr = 0;
    double vi = 0;
    double error = 0;
    for (std::size_t k = terms; k >= 1; --k) {
        const double c = c_[k - 1];
        const double sum = vr + c;
        vr = sum * yr - vi * yi;
        vi = sum * yi + vi * yr;
        error = (error + std::fabs(c) * operations(k)) * size;
    }
    return {{vr, vi}, error * unit_roundoff + truncation(reach, terms)};
}

} // namespace rankstead
