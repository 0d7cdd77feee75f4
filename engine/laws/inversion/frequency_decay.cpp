#include "frequency_decay.h"

#include <algorithm>
#include <cmath>

namespace rankstead {

namespace {

constexpr double seconds_per_look = 3e-9;
constexpr double near_reach = 2; // where t r goes beyond this, the decay is found from the transform of the weights
constexpr double rounding_slack = 1e-9;

} // namespace

FrequencyDecay::FrequencyDecay(const Contour& contour, const std::vector<double>& weights, ContourPhases& phases,
                               CountedWork& work)
    : contour_(contour), weights_(weights), phases_(phases), work_(work) {}

std::optional<FrequencyDecay::Look> FrequencyDecay::look_at(std::int64_t j) {
    const double t = contour_.lattice.sum_angle(j);
    if (t * contour_.law().largest_offset() <= near_reach) {
        return std::nullopt;
    }
    if (const double proven = proven_by_part(t); proven > 0) {
        return Look{0, proven};
    }
    work_.add(phases_.seconds_per_row());
    if (!blocks_) {
        blocks_.emplace(contour_.law().offsets(), weights_);
    }
    return blocks_->look(phases_.groups_at(j), phases_.turned_back(j), contour_.need.at(t));
}

double FrequencyDecay::proven_by_part(double t) {
    constexpr std::size_t many = 4096;
    if (weights_.size() < many) {
        return 0;
    }
    if (!part_) {
        part_.emplace(contour_.law().offsets(), weights_, contour_.need.base);
    }
    work_.add(static_cast<double>(part_->size()) * ContourPhases::seconds_per_angle);
    return part_->proven_step(t, contour_.need.at(t));
}

void FrequencyDecay::find_points(std::int64_t j, const std::optional<Look>& look, std::vector<std::int64_t>& points) {
    const ContourLattice& lattice = contour_.lattice;
    const double t = lattice.sum_angle(j);
    const double need = contour_.need.at(t);
    points.clear();
    for (std::int64_t k = lattice.first_count(); k <= lattice.last_count(); ++k) {
        const double decay = look ? decay_looked_at(k, *look) : decay_near(lattice.count_angle(k), t);
        if (decay < need) {
            points.push_back(k);
        }
    }
    work_.add(static_cast<double>(lattice.count_points) * seconds_per_look);
}

// V - Re(e^(is) C(t)).
double FrequencyDecay::decay_looked_at(std::int64_t k, const Look& look) const {
    return blocks_->total_weight() * (1 - rounding_slack) - times(look.transform, phases_.turn_of(k)).real();
}

// For t >= 0: by 1 - cos x >= x^2/2 - x^4/24 near 0, and by the nearest that s + t r can come to 2 pi elsewhere.
double FrequencyDecay::decay_near(double s, double t) const {
    const Jet& jet = contour_.tilt.jet;
    const double reach = t * contour_.law().largest_offset();
    const double quadratic = jet.by_count_twice * s * s + 2 * s * t * jet.by_both + jet.by_sum_twice * t * t;
    const double farthest = std::fabs(s) + reach;
    const double near = quadratic * (0.5 - farthest * farthest / 24);
    const double away = std::fabs(s) - reach;
    return std::max(near, away > 0 ? jet.by_count_twice * (1 - std::cos(away)) : 0.0) * (1 - rounding_slack);
}

} // namespace rankstead
