// Chernoff's bound on the aliases of an inversion: what lies at another count and sum, as the contour sees it, is
// bounded at any other tilt; the better the tilt, the closer.
#pragma once

#include "contour_tilt.h"

#include <limits>

namespace rankstead {

struct AliasTilt {
    double a = 0;
    double lambda = 0;
    double log_bound = std::numeric_limits<double>::infinity();
};

// A count and a sum, both less their mean.
struct AliasPlace {
    double count = 0;
    double sum = 0;
};

// Lowers T(a, -lambda) + lambda * sum - a * count over the tilts, from a start, by damped Newton steps. Every tilt
// gives a valid bound, so the best one met is kept.
[[nodiscard]] AliasTilt best_tilt(const SoughtTail& tail, const ContourTilt& contour, AliasTilt start,
                                  const AliasPlace& place, bool lambda_is_free);

} // namespace rankstead
