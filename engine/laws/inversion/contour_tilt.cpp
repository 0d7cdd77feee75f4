#include "contour_tilt.h"

#include <algorithm>
#include <cmath>
#include <numbers>

namespace rankstead {

namespace {

constexpr double pi = std::numbers::pi;

// A Newton step, with lambda kept above its floor.
TiltStep step_from(const SoughtTail& tail, const ContourTilt& tilt, double floor) {
    const Jet& jet = tilt.jet;
    const double pole = 1 / std::expm1(tilt.lambda); // and its derivatives are those of -log(1 - e^-lambda)
    const double by_lambda = -jet.by_sum + tail.distance() - pole;
    const bool on_floor = tilt.lambda <= floor * 1.0000001 && by_lambda > 0;
    return newton_step(jet, {jet.by_count, by_lambda, jet.by_sum_twice + pole * (1 + pole)}, tail.count_is_fixed(),
                       !on_floor);
}

bool is_small(const TiltStep& step, const ContourTilt& tilt) {
    constexpr double small = 0.02;
    return std::fabs(step.lambda) <= small * tilt.lambda &&
           std::fabs(step.a) * std::sqrt(tilt.jet.by_count_twice) <= small;
}

// Far from the least a step is shortened, so that lambda changes by a bounded factor.
void advance(ContourTilt& tilt, const TiltStep& step, double floor) {
    const double next = std::clamp(tilt.lambda + step.lambda, std::max(floor, 0.4 * tilt.lambda), 2.5 * tilt.lambda);
    const double share = step.lambda == 0 ? 1 : std::clamp((next - tilt.lambda) / step.lambda, 0.0, 1.0);
    tilt.a += step.a * std::max(share, 0.05);
    tilt.lambda = next;
}

} // namespace

Jet jet_at(const Characteristic& law, double a, double lambda) {
    const double reach = std::fabs(a) + std::fabs(lambda) * law.largest_offset();
    return law.jet(a, -lambda, law.series_serves(reach));
}

TiltStep newton_step(const Jet& jet, const TiltSlope& slope, bool count_is_fixed, bool lambda_is_free) {
    if (!count_is_fixed) {
        return {0, lambda_is_free ? -slope.by_lambda / slope.by_lambda_twice : 0};
    }
    if (!lambda_is_free) {
        return {-slope.by_a / jet.by_count_twice, 0};
    }
    const double determinant = jet.by_count_twice * slope.by_lambda_twice - jet.by_both * jet.by_both;
    return {-(slope.by_lambda_twice * slope.by_a + jet.by_both * slope.by_lambda) / determinant,
            -(jet.by_count_twice * slope.by_lambda + jet.by_both * slope.by_a) / determinant};
}

ContourTilt find_tilt(const SoughtTail& tail) {
    const double spread = std::sqrt(tail.variance());
    const double z = -tail.distance() / spread;
    const double floor = 2 / spread;
    ContourTilt tilt;
    tilt.lambda = std::max(floor, (z + std::sqrt(z * z + 4)) / (2 * spread));
    tilt.jet = jet_at(tail.law(), tilt.a, tilt.lambda);
    constexpr int most_steps = 60;
    for (int steps = 0; steps < most_steps; ++steps) {
        if (log_chernoff_bound(tail, tilt) < log_smallest) {
            return tilt;
        }
        const TiltStep step = step_from(tail, tilt, floor);
        if (is_small(step, tilt)) {
            break;
        }
        advance(tilt, step, floor);
        tilt.jet = jet_at(tail.law(), tilt.a, tilt.lambda);
    }
    const Jet& jet = tilt.jet;
    tilt.count_variance = jet.by_count_twice;
    tilt.sum_variance =
        tail.count_is_fixed() ? jet.by_sum_twice - jet.by_both * jet.by_both / jet.by_count_twice : jet.by_sum_twice;
    return tilt;
}

double log_chernoff_bound(const SoughtTail& tail, const ContourTilt& tilt) {
    return tilt.jet.value + tilt.lambda * tail.distance() - tail.log_count();
}

bool is_sound(const SoughtTail& tail, const ContourTilt& tilt) {
    constexpr double least_spread = 0.05;
    return std::isfinite(tilt.a) && std::isfinite(tilt.lambda) && std::isfinite(tilt.jet.value) &&
           tilt.sum_variance > least_spread && (!tail.count_is_fixed() || tilt.count_variance > least_spread);
}

double expected_value(const SoughtTail& tail, const ContourTilt& tilt) {
    const double sum = 2 * pi * (tilt.sum_variance + 1 / (tilt.lambda * tilt.lambda));
    return tail.count_is_fixed() ? 1 / std::sqrt(sum * 2 * pi * tilt.count_variance) : 1 / std::sqrt(sum);
}

} // namespace rankstead
