#include "untied_inversion.h"

#include "../compensated_sum.h"
#include "contour_parts.h"
#include "frequency_screen.h"

#include <algorithm>
#include <cmath>
#include <limits>
#include <numbers>

namespace rankstead {

namespace {

constexpr double pi = std::numbers::pi;
constexpr double seconds_per_series = 0.4e-6;
constexpr double seconds_per_factor = 15e-9;
constexpr double seconds_per_term = 60e-9;
constexpr double log_smallest = -760; // exp of it is 0

class UntiedContour {
public:
    UntiedContour(const UntiedLaw& law, std::int64_t w)
        : law_(law), w_(w), distance_(static_cast<double>(2 * w - law.highest()) / 2) {}

    std::optional<CertifiedTail> evaluate(double seconds_allowed) {
        if (!find_tilt(seconds_allowed)) {
            return std::nullopt;
        }
        if (jet_.value + lambda_ * distance_ - log_kernel() < log_smallest) {
            return CertifiedTail{};
        }
        choose_lattice();
        if (!(alias_bound_ <= expected_value()) || !add_frequencies(seconds_allowed)) {
            return std::nullopt;
        }
        return result();
    }

private:
    [[nodiscard]] double log_kernel() const { return std::log(-std::expm1(-lambda_)); }

    SumJet jet_at(double h) {
        if (!law_.series_serves(std::fabs(h))) {
            work_ += law_.factors() * seconds_per_term;
        }
        return law_.jet(h);
    }

    // Solves K'(lambda) + distance - 1 / (e^lambda - 1) = 0 (K is even) above two reciprocal standard deviations.
    bool find_tilt(double seconds_allowed) {
        const double spread = std::sqrt(law_.variance());
        const double z = -distance_ / spread;
        const double floor = 2 / spread;
        lambda_ = std::max(floor, (z + std::sqrt(z * z + 4)) / (2 * spread));
        constexpr int most_steps = 60;
        for (int step = 0; step < most_steps && work_ <= seconds_allowed; ++step) {
            jet_ = jet_at(lambda_);
            const double pole = 1 / std::expm1(lambda_);
            const double slope = jet_.first + distance_ - pole;
            if (lambda_ <= floor * 1.0000001 && slope > 0) {
                return true;
            }
            // Any tilt bounds the tail (Chernoff): beyond the range of a double it is not looked into.
            if (jet_.value + lambda_ * distance_ < log_smallest) {
                return true;
            }
            const double change = -slope / (jet_.second + pole * (1 + pole));
            if (std::fabs(change) <= 0.02 * lambda_) {
                return jet_.second > 0.05;
            }
            lambda_ = std::clamp(lambda_ + change, std::max(floor, 0.4 * lambda_), 2.5 * lambda_);
        }
        return false;
    }

    // The tail relative to the contour's height is about this; it is checked at the end.
    [[nodiscard]] double expected_value() const {
        return 1 / std::sqrt(2 * pi * (jet_.second + 1 / (lambda_ * lambda_)));
    }

    // Chernoff's bound on the aliases at points, 2 points, ... on one side, at the better of a few tilts around the one
    // that a normal law would take; sign 1 is above.
    struct Alias {
        double tilt = 0;
        double bound = 0;
    };
    [[nodiscard]] Alias alias(double sign, double points) {
        const double target = distance_ + sign * points;
        Alias best{lambda_, std::numeric_limits<double>::infinity()};
        double tilt = lambda_ - sign * points / jet_.second;
        constexpr int most_steps = 6;
        for (int step = 0; step < most_steps; ++step) {
            const SumJet jet = jet_at(tilt);
            const double away = std::fabs(tilt - lambda_) * points;
            const double bound =
                std::exp(jet.value + jet.error - jet_.value + jet_.error + (tilt - lambda_) * distance_ - away) /
                -std::expm1(-away);
            const bool better = bound < best.bound && (tilt < lambda_) == (sign > 0);
            if (!better || bound > 0.7 * best.bound) {
                best = better ? Alias{tilt, bound} : best;
                break;
            }
            best = {tilt, bound};
            tilt -= (jet.first + target) / jet.second;
        }
        return best;
    }

    // Above, where the tilt would be negative, aliases are nearly 1: they are subtracted in the result, and what they
    // lack of 1 is bounded.
    [[nodiscard]] double aliases(double points) {
        double sum = 0;
        alias_is_one_ = points > static_cast<double>(law_.highest() - w_); // then exactly, and no mass lies there
        if (!alias_is_one_) {
            const Alias up = alias(1, points);
            alias_is_one_ = up.tilt < 0;
            sum += up.bound;
        }
        if (points <= static_cast<double>(w_)) {
            sum += alias(-1, points).bound;
        }
        return bound_slack * -std::expm1(-lambda_) * sum;
    }

    void choose_lattice() {
        const double target = wanted_accuracy * expected_value() / 4;
        const double most = static_cast<double>(law_.highest()) + 2;
        double points = std::ceil(std::sqrt(2 * std::log(1 / target) * jet_.second));
        while (points < most && !((alias_bound_ = aliases(points)) <= target)) {
            points = std::ceil(points * 1.07) + 1;
        }
        if (points >= most) {
            points = most;
            alias_bound_ = aliases(points);
        }
        points_ = static_cast<std::int64_t>(points);
        need_ = {-std::log(target), lambda_};
    }

    bool add_frequencies(double seconds_allowed) {
        const UntiedLaw::Tilted tilted(law_, lambda_, w_, points_);
        const double step = 2 * pi / static_cast<double>(points_);
        for (std::int64_t j = 0; j <= points_ / 2; ++j) {
            const double t = step * static_cast<double>(j);
            if (j > 0 && t > tilted.monotone_to() && tilted.decay_from(t) >= need_.at(t)) {
                return true;
            }
            work_ += tilted.by_series(j) ? seconds_per_series : law_.factors() * seconds_per_factor;
            if (work_ > seconds_allowed) {
                return false;
            }
            const double size = add(tilted.at(j), j, t);
            if (t < tilted.monotone_to() && size <= std::exp(-need_.at(t))) {
                j = std::max(j, static_cast<std::int64_t>(tilted.monotone_to() / step));
            }
        }
        return true;
    }

    // Adds a frequency; the most it can be in size.
    double add(const UntiedLaw::Point& point, std::int64_t j, double t) {
        const double multiple = j == 0 || 2 * j == points_ ? 1 : 2;
        const Complex kernel = cumulative_kernel(lambda_, t);
        cumulative_.add(multiple * (point.value.real() * kernel.real() - point.value.imag() * kernel.imag()));
        mass_.add(multiple * point.value.real());
        const double off = point.error + 12 * unit_roundoff * std::abs(point.value);
        rounding_ += multiple * off * std::abs(kernel);
        mass_rounding_ += multiple * off;
        ++frequencies_;
        return std::abs(point.value) + point.error;
    }

    [[nodiscard]] std::optional<CertifiedTail> result() const {
        const auto points = static_cast<double>(points_);
        const double left_out = std::exp(-need_.base) * bound_slack;
        const double span = lambda_ * points;
        const double log_height = jet_.value + lambda_ * distance_ - log_kernel();
        const double height_error =
            jet_.error + (4 * (std::fabs(jet_.value) + std::fabs(lambda_ * distance_) + std::fabs(log_kernel())) + 40) *
                             unit_roundoff;
        const double known_alias = alias_is_one_ ? std::exp(-log_height - span) / -std::expm1(-span) : 0;
        const double value = cumulative_.value() / points - known_alias;
        const double absolute =
            alias_bound_ + left_out + rounding_ / points + known_alias * (height_error + 4 * span * unit_roundoff);
        if (!(value > 2 * absolute)) {
            return std::nullopt;
        }
        CertifiedTail tail;
        tail.lower = std::exp(log_height) * value;
        const double scale = std::exp(log_height + log_kernel());
        tail.mass = std::max(0.0, scale * mass_.value() / points);
        tail.relative_error = (absolute / (value - absolute) + height_error) * bound_slack;
        tail.mass_error = scale * (alias_bound_ / -std::expm1(-lambda_) +
                                   left_out / std::abs(cumulative_kernel(lambda_, pi)) + mass_rounding_ / points) +
                          tail.mass * height_error;
        tail.frequencies = frequencies_;
        return tail.relative_error <= useful_accuracy ? std::optional(tail) : std::nullopt;
    }

    const UntiedLaw& law_;
    std::int64_t w_;
    double distance_;
    double lambda_ = 0;
    SumJet jet_;
    std::int64_t points_ = 1;
    bool alias_is_one_ = false;
    double alias_bound_ = 0;
    Need need_;
    CompensatedSum cumulative_;
    CompensatedSum mass_;
    double rounding_ = 0;
    double mass_rounding_ = 0;
    std::int64_t frequencies_ = 0;
    double work_ = 0; // seconds, counted
};

} // namespace

std::optional<CertifiedTail> UntiedInversion::at(std::int64_t w, double seconds_allowed) const {
    return UntiedContour(law_, w).evaluate(seconds_allowed);
}

} // namespace rankstead
