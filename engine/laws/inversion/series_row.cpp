#include "series_row.h"

#include <algorithm>
#include <cmath>

namespace rankstead {

namespace {

constexpr double seconds_per_point = 400e-9;
constexpr double seconds_per_row = 15e-6;

// |a + is| + |lambda - it| * largest offset, which the series must reach.
double reach(const Contour& contour, double s, double t) {
    return std::hypot(contour.tilt.a, s) + std::hypot(contour.tilt.lambda, t) * contour.law().largest_offset();
}

} // namespace

bool series_serves(const Contour& contour, std::int64_t j, const std::vector<std::int64_t>& points) {
    double widest = 0;
    for (const std::int64_t k : points) {
        widest = std::max(widest, std::fabs(contour.lattice.count_angle(k)));
    }
    return contour.law().series_serves(reach(contour, widest, contour.lattice.sum_angle(j)));
}

double series_row_seconds(std::size_t points) {
    return seconds_per_row + static_cast<double>(points) * seconds_per_point;
}

RowSum series_row(const Contour& contour, std::int64_t j, const std::vector<std::int64_t>& points) {
    const double t = contour.lattice.sum_angle(j);
    const double a = contour.tilt.a;
    const double turned = t * contour.tail.distance();
    const Characteristic::Row row = contour.law().row(Complex(-contour.tilt.lambda, t), contour.tail.count_is_fixed());
    RowSum sum;
    for (const std::int64_t k : points) {
        const double s = contour.lattice.count_angle(k);
        const Complex exponent = row.at({a, s}) - contour.tilt.jet.value;
        const double height = std::exp(exponent.real());
        sum.value += height * unit(exponent.imag() - turned);
        const double off = row.error_at(std::hypot(a, s)) + contour.law().truncation(reach(contour, s, t)) +
                           (4 * std::fabs(turned) + std::fabs(exponent.real()) + 12) * unit_roundoff;
        sum.rounding += height * off * bound_slack;
    }
    return sum;
}

} // namespace rankstead
