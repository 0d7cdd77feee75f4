#include "contour_sum.h"

#include <algorithm>
#include <cmath>
#include <numbers>

namespace rankstead {

double ContourHeight::log_kernel() const {
    return std::log(-std::expm1(-lambda));
}

double ContourHeight::log() const {
    return cumulant + lambda * distance - log_kernel() - log_count;
}

double ContourHeight::error() const {
    const double sizes = std::fabs(cumulant) + std::fabs(lambda * distance) + std::fabs(log_kernel());
    return cumulant_error + (4 * (sizes + 4 * std::fabs(log_count)) + 40) * unit_roundoff;
}

void ContourSum::add(double t, double multiple, Complex value, double rounding, std::int64_t frequencies) {
    const Complex kernel = cumulative_kernel(lambda_, t);
    cumulative_.add(multiple * (value.real() * kernel.real() - value.imag() * kernel.imag()));
    mass_.add(multiple * value.real());
    const double own_rounding = 12 * unit_roundoff * multiple * std::abs(value);
    rounding_ += multiple * rounding * std::abs(kernel) + own_rounding;
    mass_rounding_ += multiple * rounding + own_rounding;
    frequencies_ += frequencies;
}

// In the mass, without the kernel, what is left out is at most exp(-need) over the least kernel.
std::optional<CertifiedTail> ContourSum::result(const ContourHeight& height, const ContourLattice& lattice,
                                                const Need& need) const {
    const double points = static_cast<double>(lattice.sum_points) * static_cast<double>(lattice.count_points);
    const double left_out = std::exp(-need.base) * bound_slack;
    const double span = lambda_ * static_cast<double>(lattice.sum_points);
    const double log_height = height.log();
    const double height_error = height.error();
    const double known_alias = lattice.alias_is_one ? std::exp(-log_height - span) / -std::expm1(-span) : 0;
    const double value = cumulative_.value() / points - known_alias;
    const double absolute =
        lattice.alias_bound + left_out + rounding_ / points + known_alias * (height_error + 4 * span * unit_roundoff);
    if (!(value > 2 * absolute)) {
        return std::nullopt;
    }
    const double scale = std::exp(log_height + height.log_kernel());
    const double least_kernel = std::abs(cumulative_kernel(lambda_, std::numbers::pi));
    CertifiedTail tail;
    tail.lower = std::exp(log_height) * value;
    tail.mass = std::max(0.0, scale * mass_.value() / points);
    tail.relative_error = (absolute / (value - absolute) + height_error) * bound_slack;
    tail.mass_error =
        scale * (lattice.alias_bound / -std::expm1(-lambda_) + left_out / least_kernel + mass_rounding_ / points) +
        tail.mass * height_error;
    tail.frequencies = frequencies_;
    return tail.relative_error <= useful_accuracy ? std::optional(tail) : std::nullopt;
}

} // namespace rankstead
