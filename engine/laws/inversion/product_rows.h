// Rows of the contour as products over the items, whose angles are reduced exactly: where the series does not reach.
#pragma once

#include "contour_phases.h"
#include "factor_lanes.h"
#include "row_sum.h"

#include <array>
#include <cstddef>
#include <cstdint>
#include <vector>

namespace rankstead {

class ProductRows {
public:
    // Both must outlive this.
    ProductRows(const Contour& contour, ContourPhases& phases);

    // Predicted: phases once, then powers of every factor, some points at a time.
    [[nodiscard]] double seconds(std::size_t points) const;

    [[nodiscard]] RowSum at(std::int64_t j, const std::vector<std::int64_t>& points);

private:
    static constexpr std::size_t lanes = FactorLanes::lanes;
    struct Product {
        FactorLanes value;
        std::array<double, lanes> smallest{}; // least |factor|^2
    };

    void fill_factors(std::int64_t j);
    [[nodiscard]] FactorLanes turns_at(const std::int64_t* points, std::size_t used, Complex back) const;
    void multiply_factors(const FactorLanes& turns, Product& product) const;
    [[nodiscard]] double rounding_of(Complex value, double smallest) const;

    const Contour& contour_;
    ContourPhases& phases_;
    double seconds_of_factors_ = 0;
    std::vector<double> taken_; // p_g at the tilt
    std::vector<double> real_;  // p_g e^(itr_g)
    std::vector<double> imaginary_;
};

} // namespace rankstead
