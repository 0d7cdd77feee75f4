#include "untied_inversion.h"

#include "contour_sum.h"

#include <algorithm>
#include <cmath>
#include <limits>
#include <numbers>

namespace rankstead {

namespace {

constexpr double pi = std::numbers::pi;
constexpr double seconds_per_series = 0.4e-6;
constexpr double seconds_per_factor = 35e-9;
constexpr double seconds_per_sine = 40e-9;
constexpr double seconds_per_term = 60e-9;

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
        if (!(lattice_.alias_bound <= expected_value()) || !add_frequencies(seconds_allowed)) {
            return std::nullopt;
        }
        return sum_->result({lambda_, distance_, jet_.value, jet_.error, 0}, lattice_, need_);
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
        // Beyond the highest exactly, and no mass lies there.
        lattice_.alias_is_one = points > static_cast<double>(law_.highest() - w_);
        if (!lattice_.alias_is_one) {
            const Alias up = alias(1, points);
            lattice_.alias_is_one = up.tilt < 0;
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
        while (points < most && !((lattice_.alias_bound = aliases(points)) <= target)) {
            points = std::ceil(points * 1.07) + 1;
        }
        if (points >= most) {
            points = most;
            lattice_.alias_bound = aliases(points);
        }
        lattice_.sum_points = static_cast<std::int64_t>(points);
        need_ = {-std::log(target), lambda_};
    }

    [[nodiscard]] double angle(std::int64_t j) const { return lattice_.sum_angle(j); }

    bool add_frequencies(double seconds_allowed) {
        const UntiedLaw::Tilted tilted(law_, lambda_, w_, lattice_.sum_points);
        sum_.emplace(lambda_);
        constexpr double few_factors = 64;
        std::int64_t j = 0;
        for (; j <= lattice_.sum_points / 2; ++j) {
            const double t = angle(j);
            if (j > 0 && t > tilted.monotone_to()) {
                if (tilted.decay_from(t) >= need_.at(t)) {
                    return true;
                }
                if (law_.factors() <= few_factors) {
                    break;
                }
            }
            const std::optional<double> size = add(tilted, j, seconds_allowed);
            if (!size) {
                return false;
            }
            if (t < tilted.monotone_to() && *size <= std::exp(-need_.at(t))) {
                j = std::max(j, static_cast<std::int64_t>(tilted.monotone_to() / angle(1)));
            }
        }
        // Range by range, each a little wider than the one before.
        while (j <= lattice_.sum_points / 2) {
            const std::int64_t last = std::min(lattice_.sum_points / 2, j + j / 4);
            if (!prove_or_add(tilted, j, last, seconds_allowed)) {
                return false;
            }
            j = last + 1;
        }
        return true;
    }

    // Proves that frequencies first to last are negligible, half by half, and adds those that are not. False where the
    // work passes what is allowed.
    bool prove_or_add(const UntiedLaw::Tilted& tilted, std::int64_t first, std::int64_t last, double seconds_allowed) {
        work_ += law_.factors() * seconds_per_sine;
        if (tilted.decay_within(angle(first), angle(last)) >= need_.at(angle(first))) {
            return true;
        }
        if (last == first) {
            return add(tilted, first, seconds_allowed).has_value();
        }
        const std::int64_t middle = first + (last - first) / 2;
        return prove_or_add(tilted, first, middle, seconds_allowed) &&
               prove_or_add(tilted, middle + 1, last, seconds_allowed);
    }

    // Adds a frequency and says the most it can be in size; empty where the work passes what is allowed.
    std::optional<double> add(const UntiedLaw::Tilted& tilted, std::int64_t j, double seconds_allowed) {
        work_ += tilted.by_series(j) ? seconds_per_series : law_.factors() * seconds_per_factor;
        return work_ > seconds_allowed ? std::nullopt : std::optional(add(tilted.at(j), j, angle(j)));
    }

    // Adds a frequency; the most it can be in size.
    double add(const UntiedLaw::Point& point, std::int64_t j, double t) {
        const double multiple = j == 0 || 2 * j == lattice_.sum_points ? 1 : 2;
        sum_->add(t, multiple, point.value, point.error, 1);
        return std::abs(point.value) + point.error;
    }

    const UntiedLaw& law_;
    std::int64_t w_;
    double distance_;
    double lambda_ = 0;
    SumJet jet_;
    ContourLattice lattice_;
    Need need_;
    std::optional<ContourSum> sum_; // once the tilt is found
    double work_ = 0;               // seconds, counted
};

} // namespace

std::optional<CertifiedTail> UntiedInversion::at(std::int64_t w, double seconds_allowed) const {
    return UntiedContour(law_, w).evaluate(seconds_allowed);
}

} // namespace rankstead
