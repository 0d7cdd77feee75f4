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
    log_condition_ = std::log((4 * std::sqrt(std::max(0.0, total_weight_) + 1) + 1) / 0.75);
}

double UntiedLaw::Tilted::decay_from(double t) const {
    // The weight bound needs a mean within reach of the slack.
    return lambda_ > 0.9 || total_weight_ < 10 ? 0 : total_weight_ - largest_weight_ / std::sin(t / 2) - log_condition_;
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

// z^a for a = first, first + 1, ..., renewed every so often: each is then off by fewer than 60 roundings.
class PowersOfZ {
public:
    PowersOfZ(double lambda, std::int64_t j, std::int64_t points, std::int64_t first)
        : lambda_(lambda), j_(j), points_(points), next_(first), step_(std::exp(-lambda) * exact_unit(j, 1, points)) {}

    std::complex<double> take() {
        constexpr int renewal = 16;
        if (taken_ % renewal == 0) {
            power_ = std::exp(-lambda_ * static_cast<double>(next_)) * exact_unit(j_, next_, points_);
        }
        const std::complex<double> result = power_;
        power_ = times(power_, step_);
        ++taken_;
        ++next_;
        return result;
    }

private:
    double lambda_;
    std::int64_t j_;
    std::int64_t points_;
    std::int64_t next_;
    int taken_ = 0;
    std::complex<double> step_;
    std::complex<double> power_;
};

UntiedLaw::Point UntiedLaw::Tilted::from_product(std::int64_t j) const {
    if (real_.empty()) {
        fill_denominators();
    }
    constexpr double roundings = 60;
    PowersOfZ low(lambda_, j, points_, 1);
    PowersOfZ high(lambda_, j, points_, law_.n_ + 1);
    std::complex<double> product = 1;
    double off = 0;
    for (std::int64_t i = 1; i <= law_.m_; ++i) {
        const double real = real_[static_cast<std::size_t>(i - 1)];
        const std::complex<double> z = low.take();
        if (law_.kind_ == Kind::signed_rank) {
            const std::complex<double> factor = 1.0 + z;
            product = times(product, factor) * real;
            off += roundings * std::sqrt(std::norm(z) / std::max(std::norm(factor), 1e-100));
        } else {
            const std::complex<double> y = high.take();
            const std::complex<double> above = 1.0 - y;
            const std::complex<double> below = std::conj(1.0 - z);
            const double size = std::norm(below);
            product = times(product, times(above, below)) * (real / size);
            off += roundings *
                   (std::sqrt(std::norm(z) / size) + std::sqrt(std::norm(y) / std::max(std::norm(above), 1e-100)));
        }
        off += 16 + 2 * lambda_ * static_cast<double>(i + law_.n_);
    }
    product = times(product, std::conj(exact_unit(j, w_, points_)));
    return {product, std::abs(product) * off * unit_roundoff * 1.0001};
}

} // namespace rankstead
