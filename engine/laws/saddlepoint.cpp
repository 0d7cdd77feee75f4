#include "saddlepoint.h"

#include "inversion/characteristic.h"
#include "inversion/untied_law.h"

#include <algorithm>
#include <array>
#include <cmath>
#include <functional>
#include <limits>
#include <numbers>

namespace rankstead {

namespace {

// K*(b) less b times the distance, at its minimum.
struct Saddle {
    double b = 0;
    double exponent = 0;
    double curvature = 1; // the determinant of second derivatives over that of the count at b = 0
};

// log(sinh(b/2) / (b/2)) with two derivatives.
SumJet uniform_jet(double b) {
    constexpr double small = 0.1;
    const double y = b * b;
    if (std::fabs(b) < small) {
        return {y * (1.0 / 24 - y * (1.0 / 2880 - y / 181440)), b * (1.0 / 12 - y * (1.0 / 720 - y / 30240)),
                1.0 / 12 - y * (1.0 / 240 - y / 6048), 0};
    }
    const double x = std::fabs(b) / 2;
    const double rest = -std::expm1(-2 * x);
    const double inverse_sinh = 2 * std::exp(-x) / rest;
    const double first = (2 / rest - 1) / 2 - 1 / (2 * x);
    return {x + std::log(rest / (2 * x)), b < 0 ? -first : first, 0.25 / (x * x) - inverse_sinh * inverse_sinh / 4, 0};
}

constexpr int most_steps = 100;
constexpr double close_enough = 1e-10;

// One step of Newton's method, never more than twice as far out again.
double damped(double change, double from, double spread) {
    const double most = std::fabs(from) + 1 / spread;
    return std::clamp(change, -most, most);
}

Saddle saddle_of_sum(const std::function<SumJet(double)>& jet_at, double distance, double variance) {
    Saddle saddle;
    const double spread = std::sqrt(variance);
    saddle.b = std::clamp(distance / variance, -8 / spread, 8 / spread);
    for (int step = 0; step < most_steps; ++step) {
        const SumJet law = jet_at(saddle.b);
        const SumJet uniform = uniform_jet(saddle.b);
        saddle.curvature = law.second - uniform.second;
        saddle.exponent = law.value - uniform.value - saddle.b * distance;
        const double change = -(law.first - uniform.first - distance) / saddle.curvature;
        if (std::fabs(change) * spread <= close_enough || !std::isfinite(change)) {
            break;
        }
        saddle.b += damped(change, saddle.b, spread);
    }
    return saddle;
}

// The same for a sum given that the count is at its mean.
Saddle saddle_given_count(const Characteristic& law, double distance, double variance) {
    Saddle saddle;
    const double spread = std::sqrt(variance);
    const double count_variance = law.size() * law.p() * (1 - law.p());
    double a = 0;
    saddle.b = std::clamp(distance / variance, -8 / spread, 8 / spread);
    for (int step = 0; step < most_steps; ++step) {
        const double reach = std::fabs(a) + std::fabs(saddle.b) * law.largest_offset();
        const Jet jet = law.jet(a, saddle.b, law.series_serves(reach));
        const SumJet uniform = uniform_jet(saddle.b);
        const double sum_curvature = jet.by_sum_twice - uniform.second;
        const double determinant = jet.by_count_twice * sum_curvature - jet.by_both * jet.by_both;
        saddle.curvature = determinant / count_variance;
        saddle.exponent = jet.value - uniform.value - saddle.b * distance;
        const double by_sum = jet.by_sum - uniform.first - distance;
        const double db = -(jet.by_count_twice * by_sum - jet.by_both * jet.by_count) / determinant;
        const double da = -(sum_curvature * jet.by_count - jet.by_both * by_sum) / determinant;
        if ((std::fabs(db) * spread <= close_enough && std::fabs(da) * std::sqrt(count_variance) <= close_enough) ||
            !std::isfinite(da + db)) {
            break;
        }
        const double taken = damped(db, saddle.b, spread);
        a += db == 0 ? da : da * (taken / db);
        saddle.b += taken;
    }
    return saddle;
}

// P(continuous sum <= distance), or the upper tail, from its saddle.
double tail(const Saddle& saddle, bool lower) {
    const double w = std::copysign(std::sqrt(std::max(0.0, -2 * saddle.exponent)), saddle.b);
    const double u = saddle.b * std::sqrt(std::max(saddle.curvature, 1e-300));
    const double density = std::exp(-w * w / 2) / std::sqrt(2 * std::numbers::pi);
    const double correction = density * (1 / w - 1 / u);
    const double sign = lower ? 1 : -1;
    return std::clamp(0.5 * std::erfc(-sign * w / std::numbers::sqrt2) + sign * correction, 0.0, 1.0);
}

// At the mean both 1/w and 1/u are infinite: the tail there lies between its neighbours.
double tail_at(const std::function<Saddle(double)>& saddle_at, double distance, double variance, bool lower) {
    const double near = 0.02 * std::sqrt(variance);
    if (std::fabs(distance) >= near) {
        return tail(saddle_at(distance), lower);
    }
    const double below = tail(saddle_at(-near), lower);
    const double above = tail(saddle_at(near), lower);
    return below + (above - below) * (distance + near) / (2 * near);
}

Tails both_tails(const std::function<Saddle(double)>& saddle_at, double distance, double variance, double error) {
    Tails tails;
    tails.law = LawKind::saddlepoint;
    tails.lower = tail_at(saddle_at, distance + 0.5, variance, true);
    tails.upper = tail_at(saddle_at, distance - 0.5, variance, false);
    tails.relative_error = error;
    return tails;
}

} // namespace

Tails saddlepoint_tails(const SignScores& scores) {
    const Characteristic law(ScoredItems::of(scores.scores), 0.5, false);
    const double distance = static_cast<double>(2 * scores.statistic - scores.sum) / 2;
    const double variance = law.sum_of_squares() / 4;
    const auto jet_at = [&](double b) {
        const Jet jet = law.jet(0, b, law.series_serves(std::fabs(b) * law.largest_offset()));
        return SumJet{jet.value, jet.by_sum, jet.by_sum_twice, 0};
    };
    return both_tails([&](double d) { return saddle_of_sum(jet_at, d, variance); }, distance, variance,
                      saddlepoint_error(static_cast<std::int64_t>(scores.scores.size()), law.items().scores.size()));
}

Tails saddlepoint_tails(const ChoiceScores& scores) {
    const auto n = static_cast<std::int64_t>(scores.scores.size());
    const double p = static_cast<double>(scores.chosen) / static_cast<double>(n);
    const Characteristic law(ScoredItems::of(scores.scores), p, true);
    const Wide sum = law.items().sum();
    const double distance =
        static_cast<double>(static_cast<Wide>(scores.statistic) * n - scores.chosen * sum) / static_cast<double>(n);
    const double variance = p * (1 - p) * law.sum_of_squares() * law.size() / (law.size() - 1);
    return both_tails([&](double d) { return saddle_given_count(law, d, variance); }, distance, variance,
                      saddlepoint_error(std::min(scores.chosen, n - scores.chosen), law.items().scores.size()));
}

Tails saddlepoint_tails(const UntiedLaw& law, std::int64_t statistic) {
    const double distance = static_cast<double>(2 * static_cast<Wide>(statistic) - law.highest()) / 2;
    const auto jet_at = [&](double b) { return law.jet(b); };
    return both_tails(
        [&](double d) { return saddle_of_sum(jet_at, d, law.variance()); }, distance, law.variance(),
        saddlepoint_error(static_cast<std::int64_t>(law.factors()), std::numeric_limits<std::size_t>::max()));
}

double saddlepoint_error(std::int64_t smaller, std::size_t ranks) {
    struct Row {
        std::int64_t smaller;
        double many_ranks;
        double few_ranks;
    };
    constexpr std::array<Row, 5> rows{
        {{3000, 0.00001, 0.01}, {1000, 0.00001, 0.05}, {300, 0.0001, 0.1}, {100, 0.001, 0.3}, {20, 0.05, 2}}};
    constexpr std::size_t many = 13;
    for (const Row& row : rows) {
        if (smaller >= row.smaller) {
            return ranks >= many ? row.many_ranks : row.few_ranks;
        }
    }
    return 2;
}

} // namespace rankstead
