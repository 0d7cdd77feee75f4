#include "untied_law.h"

#include "characteristic.h"
#include "contour_parts.h"

#include <algorithm>
#include <cmath>
#include <numbers>

namespace rankstead {

namespace {

constexpr double pi = std::numbers::pi;

// log(sinh x / x) and log cosh x with two derivatives in x, x >= 0.
struct Term {
    double value = 0;
    double first = 0;
    double second = 0;
};

Term log_sinhc(double x) {
    constexpr double small = 0.05;
    if (x < small) {
        const double y = x * x;
        return {y * (1.0 / 6 - y * (1.0 / 180 - y * (1.0 / 2835 - y / 37800))),
                x * (1.0 / 3 - y * (1.0 / 45 - y * (2.0 / 945 - y / 4725))),
                1.0 / 3 - y * (1.0 / 15 - y * (2.0 / 189 - y / 675))};
    }
    const double rest = -std::expm1(-2 * x); // 1 - e^(-2x)
    const double inverse_sinh = 2 * std::exp(-x) / rest;
    return {x + std::log(rest / (2 * x)), 2 / rest - 1 - 1 / x, 1 / (x * x) - inverse_sinh * inverse_sinh};
}

Term log_cosh(double x) {
    const double e = std::exp(-2 * x);
    const double tanh = (1 - e) / (1 + e);
    return {x + std::log1p((e - 1) / 2), tanh, 1 - tanh * tanh};
}

// log(1 - e^-x), x > 0.
double log_rest(double x) {
    return std::log(-std::expm1(-x));
}

double logistic(double x) {
    return 1 / (1 + std::exp(-x));
}

double weight(double p) {
    return p * (1 - p);
}

} // namespace

UntiedLaw UntiedLaw::signed_rank(std::int64_t n) {
    return {Kind::signed_rank, n, 0, EvenSeries::of_signed_rank(n)};
}

UntiedLaw UntiedLaw::rank_sum(std::int64_t m, std::int64_t n) {
    return {Kind::rank_sum, std::min(m, n), std::max(m, n), EvenSeries::of_rank_sum(std::min(m, n), std::max(m, n))};
}

UntiedLaw::UntiedLaw(Kind kind, std::int64_t m, std::int64_t n, EvenSeries series)
    : kind_(kind), m_(m), n_(n), highest_(kind == Kind::signed_rank ? m * (m + 1) / 2 : m * n),
      variance_(series.jet(0).second), series_(std::move(series)) {}

SumJet UntiedLaw::jet(double h) const {
    return series_.serves(std::fabs(h)) ? series_.jet(h) : summed_jet(h);
}

SumJet UntiedLaw::summed_jet(double h) const {
    SumJet jet;
    double size = 0;
    const double sign = h < 0 ? -1 : 1;
    const auto add = [&](double item, double times, Term (*function)(double)) {
        const double x = item * std::fabs(h) / 2;
        const Term term = function(x);
        jet.value += times * term.value;
        jet.first += times * sign * item / 2 * term.first;
        jet.second += times * item * item / 4 * term.second;
        size += x + 1;
    };
    for (std::int64_t i = 1; i <= m_; ++i) {
        if (kind_ == Kind::signed_rank) {
            add(static_cast<double>(i), 1, log_cosh);
        } else {
            add(static_cast<double>(n_ + i), 1, log_sinhc);
            add(static_cast<double>(i), -1, log_sinhc);
        }
    }
    // Each term is off by a few roundings of x or of 1, each addition by one of what has been added up to then.
    jet.error = unit_roundoff * size * (8 + 2 * std::sqrt(static_cast<double>(m_)));
    return jet;
}

// ------------------------------------------------------------------------------------------------ at one tilt

UntiedLaw::Tilted::Tilted(const UntiedLaw& law, double lambda, std::int64_t w, std::int64_t points)
    : law_(law), lambda_(lambda), w_(w), points_(points), distance_(static_cast<double>(2 * w - law.highest_) / 2),
      jet_(law.jet(lambda)) {
    const auto m = static_cast<double>(law.m_);
    const auto n = static_cast<double>(law.n_);
    if (law.kind_ == Kind::signed_rank) {
        monotone_to_ = pi / m;
        largest_weight_ = weight(logistic(-lambda)) / 2;
        total_weight_ = (logistic(-lambda) - logistic(-lambda * (m + 1))) / lambda;
        return;
    }
    const double all = m + n;
    monotone_to_ = std::sqrt(std::max(0.0, 4 * pi * pi / 3 / (all * all) - lambda * lambda)) * (1 - 1e-9);
    // Items 0 to N - 1 are taken with logit p = centre - lambda (item + 1/2), where the integral of p is m; the sum of
    // p differs from it by less than lambda / 48, which the slack allows for.
    const double centre = lambda * m + log_rest(lambda * m) - log_rest(lambda * n);
    const double first = logistic(centre - lambda / 2);
    const double last = logistic(centre - lambda * (all - 0.5));
    constexpr double slack = 0.01;
    const double most = first >= 0.5 && last <= 0.5 ? 0.25 : std::max(weight(first), weight(last));
    total_weight_ = (1 - slack) * ((first - last) / lambda - most);
    largest_weight_ = (1 + slack) * most;
    const double most_variance = (1 + slack) * ((first - last) / lambda + most);
    log_condition_ = std::log((4 * std::sqrt(most_variance) + 1) / 0.75);
}

double UntiedLaw::Tilted::decay_from(double t) const {
    // The weight bound needs a mean within reach of the slack.
    return lambda_ > 0.9 || total_weight_ < 10 ? 0 : total_weight_ - largest_weight_ / std::sin(t / 2) - log_condition_;
}

double UntiedLaw::Tilted::decay_within(double t1, double t2) const {
    if (law_.kind_ != Kind::rank_sum) {
        return 0;
    }
    double decay = 0;
    double product = 1; // of the squares, so that one logarithm serves several factors
    for (std::int64_t i = 1; i <= law_.m_; ++i) {
        const auto item = static_cast<double>(i);
        const double other = lambda_ * (item + static_cast<double>(law_.n_));
        const bool turns = std::floor(item * t1 / (2 * pi)) != std::floor(item * t2 / (2 * pi));
        const double sine =
            turns ? 0 : std::min(std::fabs(std::sin(item * t1 / 2)), std::fabs(std::sin(item * t2 / 2)));
        const double rest = -std::expm1(-lambda_ * item);
        product *= 1 + 4 * (1 - rest) * sine * sine / (rest * rest);
        const double above = std::tanh(other / 2); // (1 - r^b) / (1 + r^b)
        product *= above * above;
        if (product > 1e200 || product < 1e-200 || i == law_.m_) {
            decay += std::log(product) / 2;
            product = 1;
        }
    }
    return decay - 1e-9 * std::fabs(decay);
}

double UntiedLaw::Tilted::angle(std::int64_t j) const {
    return 2 * pi * static_cast<double>(j) / static_cast<double>(points_);
}

bool UntiedLaw::Tilted::by_series(std::int64_t j) const {
    return law_.series_.serves(std::hypot(lambda_, angle(j)));
}

UntiedLaw::Point UntiedLaw::Tilted::at(std::int64_t j) const {
    return by_series(j) ? from_series(j) : from_product(j);
}

UntiedLaw::Point UntiedLaw::Tilted::from_series(std::int64_t j) const {
    const double t = angle(j);
    const EvenSeries::Value k = law_.series_.at({lambda_, -t});
    const double height = std::exp(k.value.real() - jet_.value);
    const double phase = k.value.imag() - t * distance_;
    const double off =
        k.error + (4 * std::fabs(t * distance_) + std::fabs(k.value.real() - jet_.value) + 12) * unit_roundoff;
    return {{height * std::cos(phase), height * std::sin(phase)}, height * off * 1.0001};
}

void UntiedLaw::Tilted::fill_denominators() const {
    for (std::int64_t i = 1; i <= law_.m_; ++i) {
        const auto item = static_cast<double>(i);
        real_.push_back(law_.kind_ == Kind::signed_rank
                            ? 1 / (1 + std::exp(-lambda_ * item))
                            : std::expm1(-lambda_ * item) /
                                  std::expm1(-lambda_ * (item + static_cast<double>(law_.n_))));
    }
}

// z^a and 1 - z^a for a = first, first + 1, ...: by multiplying with z and by adding z^a (1 - z), where nothing cancels
// that does not belong to the result, renewed every so often. z^a is then off by fewer than 60 roundings of its size,
// 1 - z^a by fewer than 60 of its size and of 16 times |1 - z|.
class PowersOfZ {
public:
    PowersOfZ(double lambda, std::int64_t j, std::int64_t points, std::int64_t first)
        : lambda_(lambda), j_(j), points_(points), next_(first), step_(std::exp(-lambda) * exact_unit(j, 1, points)),
          first_rest_(rest_of(1)) {}

    struct Taken {
        Complex power;
        Complex rest; // 1 - power
    };

    Taken take() {
        constexpr int renewal = 16;
        if (taken_ % renewal == 0) {
            current_ = {std::exp(-lambda_ * static_cast<double>(next_)) * exact_unit(j_, next_, points_),
                        rest_of(next_)};
        }
        const Taken result = current_;
        current_.rest += times(current_.power, first_rest_);
        current_.power = times(current_.power, step_);
        ++taken_;
        ++next_;
        return result;
    }

    [[nodiscard]] double size_of_first_rest() const { return std::sqrt(std::norm(first_rest_)); }

private:
    [[nodiscard]] Complex rest_of(std::int64_t a) const {
        const double x = lambda_ * static_cast<double>(a);
        const Complex turn = exact_unit(j_, a, points_);
        const Complex half = exact_unit(j_, a, 2 * points_);
        return {-std::expm1(-x) + std::exp(-x) * 2 * half.imag() * half.imag(), -std::exp(-x) * turn.imag()};
    }

    double lambda_;
    std::int64_t j_;
    std::int64_t points_;
    std::int64_t next_;
    int taken_ = 0;
    Complex step_;
    Complex first_rest_;
    Taken current_;
};

UntiedLaw::Point UntiedLaw::Tilted::from_product(std::int64_t j) const {
    if (real_.empty()) {
        fill_denominators();
    }
    constexpr double roundings = 60;
    PowersOfZ low(lambda_, j, points_, 1);
    PowersOfZ high(lambda_, j, points_, law_.n_ + 1);
    const double step = 16 * low.size_of_first_rest();
    Complex product = 1;
    double off = 0;
    for (std::int64_t i = 1; i <= law_.m_; ++i) {
        const double real = real_[static_cast<std::size_t>(i - 1)];
        const PowersOfZ::Taken z = low.take();
        if (law_.kind_ == Kind::signed_rank) {
            const Complex factor = 1.0 + z.power;
            product = times(product, factor) * real;
            off += roundings * std::sqrt(std::norm(z.power) / std::max(std::norm(factor), 1e-100));
        } else {
            const Complex above = high.take().rest;
            const double size = std::norm(z.rest);
            product = times(product, times(above, std::conj(z.rest))) * (real / size);
            off += roundings * (2 + step / std::sqrt(size) + step / std::sqrt(std::max(std::norm(above), 1e-100)));
        }
        off += 16 + 2 * lambda_ * static_cast<double>(i + law_.n_);
    }
    product = times(product, std::conj(exact_unit(j, w_, points_)));
    return {product, std::abs(product) * off * unit_roundoff * 1.0001};
}

} // namespace rankstead
