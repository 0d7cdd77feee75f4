// Lower bounds on the decay of the characteristic function at the frequencies (s, t) of a contour,
//     -log |characteristic(s, t)| >= sum of w_g (1 - cos(s + t r_g)),
// w_g the tilted weights (see frequency_screen.h): which points of a row matter, and which rows can be passed over.
#pragma once

#include "contour_phases.h"
#include "counted_work.h"
#include "proven_step.h"

#include <cstdint>
#include <optional>
#include <vector>

namespace rankstead {

class FrequencyDecay {
public:
    // All must outlive this, and the weights are those at the contour's tilt.
    FrequencyDecay(const Contour& contour, const std::vector<double>& weights, ContourPhases& phases,
                   CountedWork& work);

    using Look = BlocksOfGroups::Look;
    // Near t = 0 there is no need to look. Where the step is positive, the transform may be missing.
    [[nodiscard]] std::optional<Look> look_at(std::int64_t j);

    // Those k of row j at which the decay falls short of the need, as written to `points`.
    void find_points(std::int64_t j, const std::optional<Look>& look, std::vector<std::int64_t>& points);

private:
    [[nodiscard]] double decay_near(double s, double t) const;
    [[nodiscard]] double decay_looked_at(std::int64_t k, const Look& look) const;
    [[nodiscard]] double proven_by_part(double t);

    const Contour& contour_;
    const std::vector<double>& weights_;
    ContourPhases& phases_;
    CountedWork& work_;
    std::optional<PartOfGroups> part_; // both are made when first needed
    std::optional<BlocksOfGroups> blocks_;
};

} // namespace rankstead
