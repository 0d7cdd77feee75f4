#include "chance.h"

#include <boost/math/distributions/normal.hpp>
#include <boost/math/distributions/students_t.hpp>
#include <boost/math/special_functions/beta.hpp>

#include <algorithm>
#include <cmath>

namespace rankstead {

namespace {

struct PlacementVariances {
    double of_first = 0; // variance of the mean placement of the first sample
    double of_second = 0;
};

// The placement of a value is the share of the other sample that it exceeds, ties counted half.
PlacementVariances placement_variances(const PooledRanking& ranking, double theta) {
    const auto m = static_cast<double>(ranking.first);
    const auto n = static_cast<double>(ranking.second);
    double first_squares = 0;
    double second_squares = 0;
    double first_below = 0;
    double second_below = 0;
    for (const PooledGroup& group : ranking.groups) {
        const auto in_first = static_cast<double>(group.first);
        const auto in_second = static_cast<double>(group.second);
        const double first_away = (second_below + in_second / 2) / n - theta;
        const double second_away = (m - first_below - in_first / 2) / m - theta;
        first_squares += in_first * first_away * first_away;
        second_squares += in_second * second_away * second_away;
        first_below += in_first;
        second_below += in_second;
    }
    return {first_squares / (m - 1) / m, second_squares / (n - 1) / n};
}

// V(t) of Newcombe (2006), method 5, after Hanley & McNeil (1982).
double hanley_mcneil_variance(double t, double m, double n) {
    const double s = (m + n) / 2 - 1;
    return t * (1 - t) * (1 + s * (1 - t) / (2 - t) + s * t / (1 + t)) / (m * n);
}

double satterthwaite_freedom(const PlacementVariances& variances, double m, double n) {
    const double sum = variances.of_first + variances.of_second;
    if (!(sum > 0)) {
        return std::max(1.0, std::min(m, n) - 1);
    }
    const double parts =
        variances.of_first * variances.of_first / (m - 1) + variances.of_second * variances.of_second / (n - 1);
    return std::max(1.0, sum * sum / parts);
}

// Where in [0, 1] a condition that does not hold below and holds above begins. The inverse beta function of Boost.Math
// gives up at some arguments; this never does.
template <class Condition>
double bisected(Condition holds) {
    double below = 0;
    double above = 1;
    for (double middle = 0.5; below < middle && middle < above; middle = below + (above - below) / 2) {
        (holds(middle) ? above : below) = middle;
    }
    return above;
}

double logistic(double x) {
    return 1 / (1 + std::exp(-x));
}

// The end of the interval on one side of theta: bisection until neighbouring doubles.
double newcombe_limit(double theta, double end, double m, double n, double z) {
    double inside = theta;
    double outside = end;
    for (int i = 0; i < 200; ++i) {
        const double middle = inside + (outside - inside) / 2;
        if (middle == inside || middle == outside) {
            break;
        }
        const double distance = middle - theta;
        const bool beyond = distance * distance > z * z * hanley_mcneil_variance(middle, m, n);
        (beyond ? outside : inside) = middle;
    }
    return inside;
}

} // namespace

double chance_of(const PooledRanking& ranking) {
    return static_cast<double>(ranking.doubled_u()) /
           (2 * static_cast<double>(ranking.first) * static_cast<double>(ranking.second));
}

std::optional<Interval> placement_interval(const PooledRanking& ranking, double rate) {
    if (ranking.first < 2 || ranking.second < 2) {
        return std::nullopt;
    }
    const auto m = static_cast<double>(ranking.first);
    const auto n = static_cast<double>(ranking.second);
    const double theta = chance_of(ranking);
    const double drawn_in = (m * n * theta + 0.5) / (m * n + 1);
    const PlacementVariances variances = placement_variances(ranking, theta);
    const double floor = hanley_mcneil_variance(drawn_in, m, n) / 4;
    const double error = std::sqrt(std::max(variances.of_first + variances.of_second, floor));
    const boost::math::students_t_distribution<double> student(satterthwaite_freedom(variances, m, n));
    const double reach = quantile(complement(student, rate)) * error / (drawn_in * (1 - drawn_in));
    const double centre = std::log(drawn_in / (1 - drawn_in));
    return Interval{logistic(centre - reach), logistic(centre + reach)};
}

Interval newcombe_interval(const PooledRanking& ranking, double rate) {
    const auto m = static_cast<double>(ranking.first);
    const auto n = static_cast<double>(ranking.second);
    const double theta = chance_of(ranking);
    const double z = quantile(complement(boost::math::normal_distribution<double>(), rate));
    return {newcombe_limit(theta, 0, m, n, z), newcombe_limit(theta, 1, m, n, z)};
}

Interval clopper_pearson_interval(double successes, double n, double rate) {
    Interval interval;
    if (successes > 0) {
        interval.lower =
            bisected([&](double p) { return boost::math::ibeta(successes, n - successes + 1, p) >= rate; });
    }
    if (successes < n) {
        interval.upper =
            bisected([&](double p) { return boost::math::ibetac(successes + 1, n - successes, p) <= rate; });
    }
    return interval;
}

} // namespace rankstead
