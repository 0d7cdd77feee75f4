#include "alias_tilt.h"

#include <cmath>

namespace rankstead {

AliasTilt best_tilt(const SoughtTail& tail, const ContourTilt& contour, AliasTilt start, const AliasPlace& place,
                    bool lambda_is_free) {
    constexpr int most_steps = 12;
    constexpr double enough_gain = 0.5;
    AliasTilt best;
    Jet at_best;
    AliasTilt at = start;
    double damping = 1;
    for (int steps = 0; steps < most_steps; ++steps) {
        const Jet jet = jet_at(tail.law(), at.a, at.lambda);
        at.log_bound = jet.value + jet.error - contour.jet.value + contour.jet.error +
                       (at.lambda - contour.lambda) * place.sum - (at.a - contour.a) * place.count;
        const bool better = at.log_bound < best.log_bound;
        const double gain = best.log_bound - at.log_bound;
        if (better) {
            best = at;
            at_best = jet;
        }
        if (steps == 0 ? !better : better && gain < enough_gain) {
            break;
        }
        damping = better ? 1 : damping / 4;
        const TiltSlope slope{at_best.by_count - place.count, place.sum - at_best.by_sum, at_best.by_sum_twice};
        const TiltStep step = newton_step(at_best, slope, tail.count_is_fixed(), lambda_is_free);
        if (!std::isfinite(step.a) || !std::isfinite(step.lambda)) {
            break;
        }
        at.a = best.a + damping * step.a;
        at.lambda = best.lambda + damping * step.lambda;
    }
    return best;
}

} // namespace rankstead
