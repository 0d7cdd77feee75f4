// A row of the contour from the power series of the law: near the tilt, at a cost that does not depend on the size.
#pragma once

#include "contour.h"
#include "row_sum.h"

#include <cstddef>
#include <cstdint>
#include <vector>

namespace rankstead {

// Whether the series reaches all points of row j, and the predicted work.
[[nodiscard]] bool series_serves(const Contour& contour, std::int64_t j, const std::vector<std::int64_t>& points);
[[nodiscard]] double series_row_seconds(std::size_t points);

[[nodiscard]] RowSum series_row(const Contour& contour, std::int64_t j, const std::vector<std::int64_t>& points);

} // namespace rankstead
