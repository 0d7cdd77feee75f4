#include "product_rows.h"

#include <algorithm>
#include <cmath>

namespace rankstead {

namespace {

constexpr double seconds_per_point = 40e-9;
constexpr double seconds_per_factor = 15e-9;
constexpr double seconds_per_doubling = 20e-9;

// A factor q + p e^(is) e^(itr): the phase, and 20 for the rest.
constexpr double factor_roundings = GroupPhases::roundings + 20;

} // namespace

ProductRows::ProductRows(const Contour& contour, ContourPhases& phases) : contour_(contour), phases_(phases) {
    const Characteristic& law = contour.law();
    for (const std::int64_t count : law.items().counts) {
        seconds_of_factors_ += seconds_per_factor + seconds_per_doubling * std::log2(static_cast<double>(count));
    }
    for (const double offset : law.offsets()) {
        const double odds = law.p() / (1 - law.p()) * std::exp(contour.tilt.a - contour.tilt.lambda * offset);
        taken_.push_back(odds / (1 + odds));
    }
    real_.resize(taken_.size());
    imaginary_.resize(taken_.size());
}

double ProductRows::seconds(std::size_t points) const {
    const auto count = static_cast<double>(points);
    return count * seconds_per_point + std::ceil(count / lanes) * seconds_of_factors_ + phases_.seconds_per_row();
}

RowSum ProductRows::at(std::int64_t j, const std::vector<std::int64_t>& points) {
    fill_factors(j);
    const Complex back = phases_.turned_back(j);
    RowSum sum;
    Product product;
    for (std::size_t begin = 0; begin < points.size(); begin += lanes) {
        const std::size_t used = std::min(lanes, points.size() - begin);
        multiply_factors(turns_at(&points[begin], used, back), product);
        for (std::size_t lane = 0; lane < used; ++lane) {
            const Complex value = product.value.get(lane);
            sum.value += times(value, phases_.count_phase_of(points[begin + lane]));
            sum.rounding += rounding_of(value, product.smallest[lane]);
        }
    }
    sum.value = times(sum.value, times(phases_.sum_phase(j), phases_.turned_forth(j)));
    return sum;
}

void ProductRows::fill_factors(std::int64_t j) {
    const GroupPhases& phases = phases_.groups_at(j);
    for (std::size_t g = 0; g < taken_.size(); ++g) {
        real_[g] = taken_[g] * phases.re()[g];
        imaginary_[g] = taken_[g] * phases.im()[g];
    }
}

// e^(is) of the points, about the mean; 1 in lanes that are not used.
FactorLanes ProductRows::turns_at(const std::int64_t* points, std::size_t used, Complex back) const {
    FactorLanes turns;
    for (std::size_t lane = 0; lane < lanes; ++lane) {
        turns.put(lane, lane < used ? times(phases_.turn_of(points[lane]), back) : 1);
    }
    return turns;
}

// The product of (q + p e^(is) e^(itr))^count, for each turn e^(is).
void ProductRows::multiply_factors(const FactorLanes& turns, Product& product) const {
    product.value.re.fill(1);
    product.value.im.fill(0);
    product.smallest.fill(1);
    for (std::size_t g = 0; g < taken_.size(); ++g) {
        FactorLanes factor;
        for (std::size_t lane = 0; lane < lanes; ++lane) {
            factor.re[lane] = 1 - taken_[g] + real_[g] * turns.re[lane] - imaginary_[g] * turns.im[lane];
            factor.im[lane] = real_[g] * turns.im[lane] + imaginary_[g] * turns.re[lane];
            const double size = factor.re[lane] * factor.re[lane] + factor.im[lane] * factor.im[lane];
            product.smallest[lane] = size < product.smallest[lane] ? size : product.smallest[lane];
        }
        for (std::int64_t power = contour_.law().items().counts[g];;) {
            if (power % 2 == 1) {
                product.value.multiply(factor);
            }
            power /= 2;
            if (power == 0) {
                break;
            }
            factor.square();
        }
    }
}

double ProductRows::rounding_of(Complex value, double smallest) const {
    return std::sqrt(std::norm(value)) * (contour_.law().size() * (factor_roundings / std::sqrt(smallest) + 3) + 40) *
           unit_roundoff * bound_slack;
}

} // namespace rankstead
