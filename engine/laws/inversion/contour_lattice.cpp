#include "contour_lattice.h"

#include "alias_tilt.h"

#include <cmath>
#include <limits>
#include <numbers>

namespace rankstead {

namespace {

constexpr double pi = std::numbers::pi;
constexpr double infinity = std::numeric_limits<double>::infinity();

struct Aliases {
    double bound = 0;
    bool above_is_one = false;
};

// Aliases of the sum beyond Nt points: a geometric series on either side, by Chernoff's inequality at another tilt.
class SumAliases {
public:
    SumAliases(const SoughtTail& tail, const ContourTilt& tilt)
        : tail_(tail), tilt_(tilt), lowest_(tail.lowest()), highest_(tail.highest()) {}

    // Above, where that tilt would be negative, the aliases are nearly 1: they are subtracted in the result and what
    // they lack of 1 is bounded in the same way.
    [[nodiscard]] Aliases operator()(double points) const {
        double up = 0;
        bool above_is_one = points > highest_; // then exactly, and no mass lies there
        if (!above_is_one) {
            const AliasTilt other = tilt_beyond(1, points);
            above_is_one = other.lambda < 0;
            up = other.lambda < tilt_.lambda ? series(other, points) : infinity;
        }
        double down = 0;
        if (-lowest_ >= points) {
            const AliasTilt other = tilt_beyond(-1, points);
            down = other.lambda > tilt_.lambda ? series(other, points) : infinity;
        }
        const double below = -std::expm1(-tilt_.lambda);
        return {bound_slack * below * (up + down), above_is_one};
    }

private:
    // The start is the tilt that a normal law would take.
    [[nodiscard]] AliasTilt tilt_beyond(double sign, double points) const {
        const double slope = tail_.count_is_fixed() ? tilt_.jet.by_both / tilt_.jet.by_count_twice : 0;
        const double lambda = tilt_.lambda - sign * (points / tilt_.sum_variance);
        const AliasTilt start{tilt_.a + (lambda - tilt_.lambda) * slope, lambda};
        return best_tilt(tail_, tilt_, start, {0, tail_.distance() + sign * points}, true);
    }

    [[nodiscard]] double series(const AliasTilt& other, double points) const {
        return std::exp(other.log_bound) / -std::expm1(-std::fabs(other.lambda - tilt_.lambda) * points);
    }

    const SoughtTail& tail_;
    const ContourTilt& tilt_;
    double lowest_;
    double highest_;
};

// Aliases of the count beyond Ns points.
Aliases count_aliases(const SoughtTail& tail, const ContourTilt& tilt, double points) {
    double sum = 0;
    for (const double sign : {-1.0, 1.0}) {
        const auto chosen = static_cast<double>(tail.chosen());
        if (points > (sign > 0 ? tail.law().size() - chosen : chosen)) {
            continue; // there is no such count
        }
        // As for a Poisson count, whose upper tail is the heavier one.
        const double step = std::log1p(points / tilt.count_variance);
        const AliasTilt other =
            best_tilt(tail, tilt, {tilt.a + sign * step, tilt.lambda}, {sign * points, tail.distance()}, false);
        const double away = (other.a - tilt.a) * sign;
        sum += away > 0 ? std::exp(other.log_bound) / -std::expm1(-away * points) : infinity;
    }
    return {bound_slack * sum, false};
}

// Few points whose aliases are at most `target`; `most` are always enough.
struct EnoughPoints {
    std::int64_t points = 1;
    Aliases aliases;
};
template <class AliasesOf>
EnoughPoints enough_points(double start, double most, double target, const AliasesOf& aliases_of) {
    for (double points = std::ceil(start); points < most; points = std::ceil(points * 1.07) + 1) {
        const Aliases aliases = aliases_of(points);
        if (aliases.bound <= target) {
            return {static_cast<std::int64_t>(points), aliases};
        }
    }
    return {static_cast<std::int64_t>(most), aliases_of(most)};
}

} // namespace

double ContourLattice::sum_angle(std::int64_t j) const {
    return 2 * pi * static_cast<double>(j) / static_cast<double>(sum_points);
}

std::int64_t ContourLattice::rows_within(double step) const {
    return static_cast<std::int64_t>(step * static_cast<double>(sum_points) / (2 * pi));
}

double ContourLattice::count_angle(std::int64_t k) const {
    return 2 * pi * static_cast<double>(k) / static_cast<double>(count_points);
}

ContourLattice choose_lattice(const SoughtTail& tail, const ContourTilt& tilt) {
    const Characteristic& law = tail.law();
    const double target = negligible(tail, tilt);
    const double start = std::sqrt(2 * std::log(1 / target)); // where a normal law is down to the target
    const EnoughPoints of_sum =
        enough_points(start * std::sqrt(tilt.sum_variance), static_cast<double>(law.items().sum()) + 2, target,
                      SumAliases(tail, tilt));
    ContourLattice lattice;
    lattice.sum_points = of_sum.points;
    lattice.alias_bound = of_sum.aliases.bound;
    lattice.alias_is_one = of_sum.aliases.above_is_one;
    if (tail.count_is_fixed()) {
        const EnoughPoints of_count = enough_points(start * std::sqrt(tilt.count_variance) + 1, law.size() + 1, target,
                                                    [&](double points) { return count_aliases(tail, tilt, points); });
        lattice.count_points = of_count.points;
        lattice.alias_bound += of_count.aliases.bound;
    }
    return lattice;
}

double negligible(const SoughtTail& tail, const ContourTilt& tilt) {
    return wanted_accuracy * expected_value(tail, tilt) / 4;
}

} // namespace rankstead
