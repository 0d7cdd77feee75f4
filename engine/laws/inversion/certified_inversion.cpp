#include "certified_inversion.h"

#include "../compensated_sum.h"
#include "contour_parts.h"
#include "frequency_screen.h"
#include "group_phases.h"

#include <algorithm>
#include <array>
#include <cmath>
#include <limits>
#include <numbers>
#include <numeric>

namespace rankstead {

namespace {

constexpr double pi = std::numbers::pi;
constexpr double wanted = wanted_accuracy;
constexpr double useful = useful_accuracy;
constexpr double slack = bound_slack;
constexpr double log_smallest = -760; // exp of it is 0
constexpr double seconds_per_point = 40e-9;
constexpr double seconds_per_factor = 15e-9;
constexpr double seconds_per_doubling = 20e-9;
constexpr double seconds_per_series_point = 400e-9;
constexpr double seconds_per_series_row = 15e-6;
constexpr double seconds_per_angle = 60e-9;
constexpr double seconds_per_rotation = 6e-9;
constexpr double seconds_per_look = 3e-9;

// log n! - (n + 1/2) log n + n - log sqrt(2 pi), by its asymptotic series (Abramowitz & Stegun 1964, 6.1.41).
double stirling_error(double n) {
    if (n < 16) {
        int sign = 0;
        return ::lgamma_r(n + 1, &sign) - (n + 0.5) * std::log(n) + n - 0.5 * std::log(2 * pi);
    }
    const double x = 1 / (n * n);
    return (1.0 / 12 - x * (1.0 / 360 - x * (1.0 / 1260 - x * (1.0 / 1680 - x / 1188)))) / n;
}

// log P(count = m) where each of n items is taken with probability m/n.
double log_count_probability(double n, double m) {
    const double rest = n - m;
    return -0.5 * std::log(2 * pi * m * (rest / n)) + stirling_error(n) - stirling_error(m) - stirling_error(rest);
}

struct Tilt {
    double a = 0;
    double lambda = 0;
    Jet jet;
    bool by_series = false;
    double count_variance = 0;
    double sum_variance = 0; // given the count, if that is fixed
};

// Finite, and with enough spread left that the law is not all but a single point.
bool is_sound(const Tilt& tilt, bool fixed_count) {
    constexpr double least_spread = 0.05;
    return std::isfinite(tilt.a) && std::isfinite(tilt.lambda) && std::isfinite(tilt.jet.value) &&
           tilt.sum_variance > least_spread && (!fixed_count || tilt.count_variance > least_spread);
}

// One inversion at one w.
class Contour {
public:
    Contour(const Characteristic& law, Count count, std::int64_t chosen, std::int64_t w)
        : law_(law), fixed_(count == Count::fixed), chosen_(chosen), w_(w), distance_(distance_from_mean()) {}

    std::optional<CertifiedTail> evaluate(double seconds_allowed) {
        const double spread = std::sqrt(null_variance());
        if (!(spread > 0)) {
            return std::nullopt;
        }
        find_tilt(spread);
        if (tilt_.jet.value + tilt_.lambda * distance_ - log_count() < log_smallest) {
            return CertifiedTail{}; // below the range of a double
        }
        if (!is_sound(tilt_, fixed_)) {
            return std::nullopt; // at the very end of the range the saddlepoint runs away
        }
        find_range();
        choose_lattice();
        if (!(alias_bound_ <= expected_value())) {
            return std::nullopt;
        }
        const Screened screened = frequencies_that_matter(law_.items().scores, weights(), need_, seconds_allowed);
        work_ += screened.seconds;
        for (const FrequencyRange& range : screened.ranges) {
            if (!add_range(range, seconds_allowed)) {
                return std::nullopt;
            }
        }
        return result();
    }

private:
    // w minus the mean of the sum; exact but for one rounding.
    [[nodiscard]] double distance_from_mean() const {
        const std::int64_t sum = law_.items().sum();
        if (!fixed_) {
            return static_cast<double>(2 * static_cast<Wide>(w_) - sum) / 2;
        }
        const std::int64_t n = law_.items().size();
        return static_cast<double>(static_cast<Wide>(w_) * n - static_cast<Wide>(chosen_) * sum) /
               static_cast<double>(n);
    }

    [[nodiscard]] double null_variance() const {
        if (!fixed_) {
            return law_.sum_of_squares() / 4;
        }
        const double n = law_.size();
        return law_.p() * (1 - law_.p()) * law_.sum_of_squares() * n / (n - 1);
    }

    [[nodiscard]] double log_count() const {
        return fixed_ ? log_count_probability(law_.size(), static_cast<double>(chosen_)) : 0;
    }

    // Solves d/da = 0 and, above its floor, d/dlambda = 0 of T(a, -lambda) + lambda * distance - log(1 - e^-lambda).
    void find_tilt(double spread) {
        const double z = -distance_ / spread;
        const double floor = 2 / spread;
        tilt_.lambda = std::max(floor, (z + std::sqrt(z * z + 4)) / (2 * spread));
        constexpr int most_steps = 60;
        for (int step = 0; step < most_steps; ++step) {
            take_jet();
            const Jet& jet = tilt_.jet;
            // Any tilt bounds the tail (Chernoff): one beyond the range of a double is not looked into.
            if (jet.value + tilt_.lambda * distance_ - log_count() < log_smallest) {
                return;
            }
            const double pole = 1 / std::expm1(tilt_.lambda);
            const double by_lambda = -jet.by_sum + distance_ - pole;
            const double curvature = jet.by_sum_twice + pole * (1 + pole);
            const bool on_floor = tilt_.lambda <= floor * 1.0000001 && by_lambda > 0;
            double da = fixed_ ? -jet.by_count / jet.by_count_twice : 0;
            double dl = on_floor ? 0 : -by_lambda / curvature;
            if (fixed_ && !on_floor) {
                const double determinant = jet.by_count_twice * curvature - jet.by_both * jet.by_both;
                da = -(curvature * jet.by_count + jet.by_both * by_lambda) / determinant;
                dl = -(jet.by_count_twice * by_lambda + jet.by_both * jet.by_count) / determinant;
            }
            const bool near =
                std::fabs(dl) <= 0.02 * tilt_.lambda && std::fabs(da) * std::sqrt(jet.by_count_twice) <= 0.02;
            if (near) {
                break;
            }
            const double next = std::clamp(tilt_.lambda + dl, std::max(floor, 0.4 * tilt_.lambda), 2.5 * tilt_.lambda);
            const double share = dl == 0 ? 1 : std::clamp((next - tilt_.lambda) / dl, 0.0, 1.0);
            tilt_.a += da * std::max(share, 0.05);
            tilt_.lambda = next;
        }
        take_jet();
        const Jet& jet = tilt_.jet;
        tilt_.count_variance = jet.by_count_twice;
        tilt_.sum_variance =
            fixed_ ? jet.by_sum_twice - jet.by_both * jet.by_both / jet.by_count_twice : jet.by_sum_twice;
    }

    [[nodiscard]] double reach(double a, double lambda) const {
        return std::fabs(a) + std::fabs(lambda) * law_.largest_offset();
    }

    void take_jet() {
        tilt_.by_series = law_.series_serves(reach(tilt_.a, tilt_.lambda));
        tilt_.jet = law_.jet(tilt_.a, -tilt_.lambda, tilt_.by_series);
    }

    [[nodiscard]] Jet jet_at(double a, double lambda) const {
        return law_.jet(a, -lambda, law_.series_serves(reach(a, lambda)));
    }

    // Another tilt for Chernoff's inequality, and the logarithm of the bound it gives.
    struct OtherTilt {
        double a = 0;
        double lambda = 0;
        double log_bound = std::numeric_limits<double>::infinity();
    };

    // Lowers T(a, -lambda) + lambda * distance - a * count over the tilts, from a start, by damped Newton steps; `free`
    // says which of both may move. Every tilt gives a valid bound, so the best one met is kept.
    [[nodiscard]] OtherTilt best_tilt(OtherTilt at, double count, double distance, bool free_lambda) const {
        constexpr int most_steps = 12;
        OtherTilt best;
        double damping = 1;
        for (int step = 0; step < most_steps; ++step) {
            const Jet jet = jet_at(at.a, at.lambda);
            at.log_bound = jet.value + jet.error - tilt_.jet.value + tilt_.jet.error +
                           (at.lambda - tilt_.lambda) * distance - (at.a - tilt_.a) * count;
            const bool better = at.log_bound < best.log_bound;
            const double gain = best.log_bound - at.log_bound;
            if (better) {
                best = at;
            }
            if (step > 0 && better && gain < 0.5) {
                break;
            }
            damping = better ? 1 : damping / 4;
            if (!better) {
                at = best;
                if (step == 0) {
                    break;
                }
            }
            const Jet here = better ? jet : jet_at(at.a, at.lambda);
            const double by_count = here.by_count - count;
            const double by_lambda = distance - here.by_sum;
            double da = fixed_ ? -by_count / here.by_count_twice : 0;
            double dl = 0;
            if (free_lambda) {
                const double determinant =
                    fixed_ ? here.by_count_twice * here.by_sum_twice - here.by_both * here.by_both : 0;
                dl = fixed_ ? -(here.by_count_twice * by_lambda + here.by_both * by_count) / determinant
                            : -by_lambda / here.by_sum_twice;
                da = fixed_ ? -(here.by_sum_twice * by_count + here.by_both * by_lambda) / determinant : 0;
            }
            if (!std::isfinite(da) || !std::isfinite(dl)) {
                break;
            }
            at.a += damping * da;
            at.lambda += damping * dl;
        }
        return best;
    }

    // The number of arrangements at w, relative to the contour's height, is about this; it is checked at the end.
    [[nodiscard]] double expected_value() const {
        const double sum = 2 * pi * (tilt_.sum_variance + 1 / (tilt_.lambda * tilt_.lambda));
        return fixed_ ? 1 / std::sqrt(sum * 2 * pi * tilt_.count_variance) : 1 / std::sqrt(sum);
    }

    // The smallest and the largest sum that can occur, less w.
    void find_range() {
        const auto& items = law_.items();
        lowest_ = fixed_ ? 0 : -static_cast<double>(w_);
        highest_ = static_cast<double>(items.sum() - w_);
        if (!fixed_) {
            return;
        }
        const auto taken = [&](auto score, auto count, std::size_t groups) {
            double sum = 0;
            std::int64_t left = chosen_;
            for (std::size_t g = 0; g < groups && left > 0; ++g) {
                const std::int64_t of_group = std::min(left, count[static_cast<std::ptrdiff_t>(g)]);
                sum += static_cast<double>(of_group) * static_cast<double>(score[static_cast<std::ptrdiff_t>(g)]);
                left -= of_group;
            }
            return sum;
        };
        const std::size_t groups = items.scores.size();
        lowest_ = taken(items.scores.begin(), items.counts.begin(), groups) - static_cast<double>(w_);
        highest_ = taken(items.scores.rbegin(), items.counts.rbegin(), groups) - static_cast<double>(w_);
    }

    // Aliases of the sum beyond Nt points: a geometric series on either side, by Chernoff's inequality at another tilt.
    // Above, where that tilt would be negative, the aliases are nearly 1: they are subtracted (see result) and what
    // they lack of 1 is bounded in the same way.
    [[nodiscard]] double sum_aliases(double points) {
        const double below = -std::expm1(-tilt_.lambda);
        const double slope = fixed_ ? tilt_.jet.by_both / tilt_.jet.by_count_twice : 0;
        const double step = points / tilt_.sum_variance;
        const auto tilt_beyond = [&](double sign) {
            const double lambda = tilt_.lambda - sign * step;
            return best_tilt({tilt_.a + (lambda - tilt_.lambda) * slope, lambda}, 0, distance_ + sign * points, true);
        };
        const auto bound = [&](const OtherTilt& tilt) {
            return std::exp(tilt.log_bound) / -std::expm1(-std::fabs(tilt.lambda - tilt_.lambda) * points);
        };
        double up = 0;
        alias_is_one_ = points > highest_; // then exactly, and no mass lies there
        if (!alias_is_one_) {
            const OtherTilt tilt = tilt_beyond(1);
            alias_is_one_ = tilt.lambda < 0;
            up = tilt.lambda < tilt_.lambda ? bound(tilt) : std::numeric_limits<double>::infinity();
        }
        double down = 0;
        if (-lowest_ >= points) {
            const OtherTilt tilt = tilt_beyond(-1);
            down = tilt.lambda > tilt_.lambda ? bound(tilt) : std::numeric_limits<double>::infinity();
        }
        return slack * below * (up + down);
    }

    // Aliases of the count beyond Ns points.
    [[nodiscard]] double count_aliases(double points) const {
        double sum = 0;
        for (const double sign : {-1.0, 1.0}) {
            const double room = sign > 0 ? law_.size() - static_cast<double>(chosen_) : static_cast<double>(chosen_);
            if (points > room) {
                continue;
            }
            // As for a Poisson count, whose upper tail is the heavier one.
            const double step = std::log1p(points / tilt_.count_variance);
            const OtherTilt tilt = best_tilt({tilt_.a + sign * step, tilt_.lambda}, sign * points, distance_, false);
            const double away = (tilt.a - tilt_.a) * sign;
            sum += away > 0 ? std::exp(tilt.log_bound) / -std::expm1(-away * points)
                            : std::numeric_limits<double>::infinity();
        }
        return slack * sum;
    }

    template <class Aliases>
    static double enough_points(double start, double most, double target, Aliases aliases, double& bound) {
        double points = std::ceil(start);
        for (;;) {
            if (points >= most) {
                points = most;
                bound = aliases(points);
                return points;
            }
            bound = aliases(points);
            if (bound <= target) {
                return points;
            }
            points = std::ceil(points * 1.07) + 1;
        }
    }

    void choose_lattice() {
        const double target = wanted * expected_value() / 4;
        const double start = std::sqrt(2 * std::log(1 / target));
        const double span = static_cast<double>(law_.items().sum()) + 2;
        sum_points_ = static_cast<std::int64_t>(enough_points(
            start * std::sqrt(tilt_.sum_variance), span, target, [&](double points) { return sum_aliases(points); },
            alias_bound_));
        if (fixed_) {
            double bound = 0;
            count_points_ = static_cast<std::int64_t>(enough_points(
                start * std::sqrt(tilt_.count_variance) + 1, law_.size() + 1, target,
                [&](double points) { return count_aliases(points); }, bound));
            alias_bound_ += bound;
        }
        fill_turns();
        need_ = {-std::log(wanted * expected_value() / 4), tilt_.lambda};
    }

    // p_g (1 - p_g) count at the tilt.
    const std::vector<double>& weights() {
        if (weights_.empty()) {
            weights_ = law_.tilted_weights(tilt_.a, -tilt_.lambda);
        }
        return weights_;
    }

    // Adds the rows of a range; false where the work passes what is allowed. Work is counted, not clocked, so that
    // every machine decides alike.
    bool add_range(const FrequencyRange& range, double seconds_allowed) {
        const double step = 2 * pi / static_cast<double>(sum_points_);
        const auto first = static_cast<std::int64_t>(std::ceil(range.low / step - 1e-9));
        const auto last =
            std::min<std::int64_t>(sum_points_ / 2, static_cast<std::int64_t>(std::floor(range.high / step + 1e-9)));
        for (std::int64_t j = std::max(first, next_row_); j <= last;) {
            j += add_row(j);
            if (work_ > seconds_allowed) {
                return false;
            }
        }
        next_row_ = std::max(next_row_, last + 1);
        return true;
    }

    // The transform C of the weights at t, and how far beyond t it is certain that no phase s can matter: V - |C|, of
    // all groups or summed over blocks of neighbouring ones, falls no faster than the weighted distances from the
    // middle.
    struct Look {
        Complex transform;
        double proven_step = 0;
    };

    // Where t r goes beyond this, the decay is found from the Fourier transform of the weights at t.
    static constexpr double near_reach = 2;

    // A lower bound on sum of w (1 - cos(s + t r)), for t >= 0: from C(t), if looked at, as V - Re(e^(is) C(t));
    // else by 1 - cos x >= x^2/2 - x^4/24 near 0, and by the nearest that s + t r can come to 2 pi elsewhere.
    [[nodiscard]] double decay(double s, Complex turn, double t, const std::optional<Look>& look) const {
        const Jet& jet = tilt_.jet;
        if (look) {
            return total_weight_ * (1 - 1e-9) - times(look->transform, turn).real();
        }
        const double quadratic = jet.by_count_twice * s * s + 2 * s * t * jet.by_both + jet.by_sum_twice * t * t;
        const double farthest = std::fabs(s) + t * law_.largest_offset();
        const double near = quadratic * (0.5 - farthest * farthest / 24);
        const double away = std::fabs(s) - t * law_.largest_offset();
        return std::max(near, away > 0 ? jet.by_count_twice * (1 - std::cos(away)) : 0.0) * (1 - 1e-9);
    }

    [[nodiscard]] std::optional<Look> look_at(std::int64_t j, double t) {
        if (t * law_.largest_offset() <= near_reach) {
            return std::nullopt;
        }
        if (const double proven = proven_by_part(t); proven > 0) {
            return Look{0, proven};
        }
        phases().go_to(j);
        work_ += static_cast<double>(weights().size()) * seconds_per_phase();
        if (blocks_.empty()) {
            fill_blocks();
        }
        Look look;
        double block_decay = 0;
        std::size_t g = 0;
        for (const Block& block : blocks_) {
            double re = 0;
            double im = 0;
            for (; g < block.end; ++g) {
                re += weights_[g] * phases_->re()[g];
                im += weights_[g] * phases_->im()[g];
            }
            block_decay += block.weight - std::sqrt(re * re + im * im);
            look.transform += Complex(re, im);
        }
        look.transform = times(look.transform, turned_back(j));
        const double allowance = need_.at(t) + 1e-9 * total_weight_;
        const auto step = [&](double decay, double slope) {
            return slope > 0 && decay > allowance ? (decay - allowance) / slope : 0.0;
        };
        look.proven_step =
            std::max(step(total_weight_ - std::abs(look.transform), whole_slope_), step(block_decay, block_slope_));
        return look;
    }

    // Every so-manieth group, where there are very many: a part of them proves as well, if it proves enough.
    struct Part {
        std::vector<double> offsets;
        std::vector<double> weights;
        double total = 0;
        double slope = 0;
    };

    // As Look::proven_step, from a part of the groups; 0 where that proves nothing.
    [[nodiscard]] double proven_by_part(double t) {
        constexpr std::size_t many = 4096;
        if (weights().size() < many) {
            return 0;
        }
        if (part_.weights.empty()) {
            fill_part();
        }
        work_ += static_cast<double>(part_.weights.size()) * seconds_per_angle;
        Complex sum = 0;
        for (std::size_t g = 0; g < part_.weights.size(); ++g) {
            sum += part_.weights[g] * unit(t * part_.offsets[g]);
        }
        const double spare = part_.total * (1 - 1e-6) - std::sqrt(std::norm(sum)) - need_.at(t);
        return part_.slope > 0 ? std::max(0.0, spare / part_.slope) : 0;
    }

    void fill_part() {
        constexpr double ample = 20;
        const double total = std::accumulate(weights_.begin(), weights_.end(), 0.0);
        const auto stride = static_cast<std::size_t>(std::max(1.0, total / (ample * need_.base)));
        const std::vector<double>& at = law_.offsets();
        const double middle = (at.front() + at.back()) / 2;
        for (std::size_t g = 0; g < at.size(); g += stride) {
            part_.offsets.push_back(at[g]);
            part_.weights.push_back(weights_[g]);
            part_.total += weights_[g];
            part_.slope += weights_[g] * std::fabs(at[g] - middle);
        }
    }

    struct Block {
        std::size_t end = 0; // past its last group
        double weight = 0;
    };

    void fill_blocks() {
        constexpr double block_range = 64;
        const std::vector<double>& at = law_.offsets();
        const double middle = (at.front() + at.back()) / 2;
        for (std::size_t g = 0; g < at.size();) {
            const double first = at[g];
            Block block;
            for (; g < at.size() && at[g] - first <= block_range; ++g) {
                block.weight += weights_[g];
                whole_slope_ += weights_[g] * std::fabs(at[g] - middle);
            }
            block.end = g;
            block_slope_ += block.weight * (at[g - 1] - first) / 2;
            total_weight_ += block.weight;
            blocks_.push_back(block);
        }
    }

    // Adds row j and says how many rows to go on by: rows that are certain not to matter are passed over.
    std::int64_t add_row(std::int64_t j) {
        const double t = 2 * pi * static_cast<double>(j) / static_cast<double>(sum_points_);
        const std::optional<Look> look = look_at(j, t);
        if (look && look->proven_step > 0) {
            return 1 + static_cast<std::int64_t>(look->proven_step * static_cast<double>(sum_points_) / (2 * pi));
        }
        points_.clear();
        double widest = 0;
        const double need = need_.at(t);
        const std::int64_t last = fixed_ ? count_points_ / 2 : 0;
        const std::int64_t first = fixed_ ? last + 1 - count_points_ : 0;
        for (std::int64_t k = first; k <= last; ++k) {
            const double s = fixed_ ? 2 * pi * static_cast<double>(k) / static_cast<double>(count_points_) : 0;
            if (decay(s, turn_of(k), t, look) < need) {
                points_.push_back(k);
                widest = std::max(widest, std::fabs(s));
            }
        }
        work_ += static_cast<double>(last - first + 1) * seconds_per_look;
        if (points_.empty()) {
            return 1;
        }
        const double distance =
            std::hypot(std::fabs(tilt_.a), widest) + std::hypot(tilt_.lambda, t) * law_.largest_offset();
        const bool series = law_.series_serves(distance);
        const auto points = static_cast<double>(points_.size());
        work_ += series ? seconds_per_series_row + points * seconds_per_series_point : product_seconds(points);
        const Complex sum = series ? series_row(t) : product_row(j);
        const double multiple = j == 0 || 2 * j == sum_points_ ? 1 : 2;
        const Complex kernel = cumulative_kernel(tilt_.lambda, t);
        cumulative_.add(multiple * (sum.real() * kernel.real() - sum.imag() * kernel.imag()));
        mass_.add(multiple * sum.real());
        rounding_ += multiple * row_rounding_ * std::abs(kernel) + 12 * unit_roundoff * multiple * std::abs(sum);
        mass_rounding_ += multiple * row_rounding_ + 12 * unit_roundoff * multiple * std::abs(sum);
        frequencies_ += static_cast<std::int64_t>(points_.size());
        return 1;
    }

    // Sum over s of exp(T - T at the tilt) e^(-it w), T from its series.
    Complex series_row(double t) {
        const Characteristic::Row row = law_.row(Complex(-tilt_.lambda, t), fixed_);
        Complex sum = 0;
        row_rounding_ = 0;
        for (const std::int64_t k : points_) {
            const double s = fixed_ ? 2 * pi * static_cast<double>(k) / static_cast<double>(count_points_) : 0;
            const Complex exponent = row.at({tilt_.a, s}) - tilt_.jet.value;
            const double phase = exponent.imag() - t * distance_;
            const double height = std::exp(exponent.real());
            sum += height * unit(phase);
            const double off = row.error_at(std::hypot(tilt_.a, s)) + series_truncation(s, t) +
                               (4 * std::fabs(t * distance_) + std::fabs(exponent.real()) + 12) * unit_roundoff;
            row_rounding_ += height * off * slack;
        }
        return sum;
    }

    [[nodiscard]] double series_truncation(double s, double t) const {
        return law_.truncation(std::hypot(tilt_.a, s) + std::hypot(tilt_.lambda, t) * law_.largest_offset());
    }

    // Predicted: phases once, then powers of every factor, eight points at a time.
    [[nodiscard]] double product_seconds(double points) {
        if (seconds_of_factors_ == 0) {
            for (const std::int64_t count : law_.items().counts) {
                seconds_of_factors_ +=
                    seconds_per_factor + seconds_per_doubling * std::log2(static_cast<double>(count));
            }
        }
        return points * seconds_per_point + std::ceil(points / lanes) * seconds_of_factors_ +
               static_cast<double>(law_.offsets().size()) * seconds_per_phase();
    }

    [[nodiscard]] double seconds_per_phase() const {
        return law_.offsets().size() < GroupPhases::many ? seconds_per_angle : seconds_per_rotation;
    }

    // A factor q + p e^(is) e^(itr): the phase, and 20 for the rest.
    static constexpr double factor_roundings = GroupPhases::roundings + 20;

    GroupPhases& phases() {
        if (!phases_) {
            phases_.emplace(law_.items().scores, sum_points_);
        }
        return *phases_;
    }

    // The scores are taken as they are, but s belongs to scores about their mean: what turns back by t times the mean.
    [[nodiscard]] Complex turned_back(std::int64_t j) const {
        return fixed_ ? std::conj(exact_unit(j, law_.items().sum(), law_.items().size() * sum_points_)) : 1;
    }

    // The same as a product over the items, whose angles are reduced exactly.
    Complex product_row(std::int64_t j) {
        fill_factors(j);
        const Complex phase = std::conj(exact_unit(j, w_, sum_points_));
        const Complex back = turned_back(j);
        const Complex count_back =
            fixed_ ? exact_unit(j, static_cast<Wide>(law_.items().sum()) * chosen_, law_.items().size() * sum_points_)
                   : Complex(1, 0);
        Complex sum = 0;
        row_rounding_ = 0;
        for (std::size_t begin = 0; begin < points_.size(); begin += lanes) {
            const std::size_t used = std::min(lanes, points_.size() - begin);
            Lanes turns;
            for (std::size_t lane = 0; lane < lanes; ++lane) {
                turns.put(lane, lane < used ? times(turn_of(points_[begin + lane]), back) : 1);
            }
            Lanes product;
            std::array<double, lanes> smallest{};
            multiply_factors(turns, product, smallest);
            for (std::size_t lane = 0; lane < used; ++lane) {
                const Complex value = product.get(lane);
                sum += times(value, count_phase_of(points_[begin + lane]));
                row_rounding_ += std::sqrt(std::norm(value)) *
                                 (law_.size() * (factor_roundings / std::sqrt(smallest[lane]) + 3) + 40) *
                                 unit_roundoff * slack;
            }
        }
        return times(sum, times(phase, count_back));
    }

    // e^(is) and e^(-ism) at the k-th of the s, which are spread about 0.
    [[nodiscard]] Complex turn_of(std::int64_t k) const { return turns_[index_of(k)]; }
    [[nodiscard]] Complex count_phase_of(std::int64_t k) const { return count_phases_[index_of(k)]; }
    [[nodiscard]] std::size_t index_of(std::int64_t k) const {
        return static_cast<std::size_t>(k + count_points_ - 1 - count_points_ / 2);
    }

    void fill_turns() {
        for (std::int64_t k = count_points_ / 2 + 1 - count_points_; k <= count_points_ / 2; ++k) {
            turns_.push_back(exact_unit(k, 1, count_points_));
            count_phases_.push_back(std::conj(exact_unit(k, chosen_, count_points_)));
        }
    }

    // So many points at a time, so that no multiplication waits for another.
    static constexpr std::size_t lanes = 8;
    struct Lanes {
        std::array<double, lanes> re{};
        std::array<double, lanes> im{};
        void put(std::size_t lane, Complex value) {
            re[lane] = value.real();
            im[lane] = value.imag();
        }
        [[nodiscard]] Complex get(std::size_t lane) const { return {re[lane], im[lane]}; }
        void square() {
            for (std::size_t lane = 0; lane < lanes; ++lane) {
                const double x = re[lane];
                const double y = im[lane];
                re[lane] = x * x - y * y;
                im[lane] = 2 * x * y;
            }
        }
        void multiply(const Lanes& by) {
            for (std::size_t lane = 0; lane < lanes; ++lane) {
                const double x = re[lane];
                const double y = im[lane];
                re[lane] = x * by.re[lane] - y * by.im[lane];
                im[lane] = x * by.im[lane] + y * by.re[lane];
            }
        }
    };

    // p_g and e^(it r_g) of every group at the tilt.
    void fill_factors(std::int64_t j) {
        phases().go_to(j);
        if (taken_.empty()) {
            for (const double offset : law_.offsets()) {
                const double odds = law_.p() / (1 - law_.p()) * std::exp(tilt_.a - tilt_.lambda * offset);
                taken_.push_back(odds / (1 + odds));
            }
            real_.resize(taken_.size());
            imaginary_.resize(taken_.size());
        }
        for (std::size_t g = 0; g < taken_.size(); ++g) {
            real_[g] = taken_[g] * phases_->re()[g];
            imaginary_[g] = taken_[g] * phases_->im()[g];
        }
    }

    // The product of (q + p e^(is) e^(itr))^count, for each turn e^(is); `smallest` becomes the least |factor|^2.
    void multiply_factors(const Lanes& turns, Lanes& product, std::array<double, lanes>& smallest) const {
        product.re.fill(1);
        product.im.fill(0);
        smallest.fill(1);
        for (std::size_t g = 0; g < taken_.size(); ++g) {
            Lanes factor;
            for (std::size_t lane = 0; lane < lanes; ++lane) {
                factor.re[lane] = 1 - taken_[g] + real_[g] * turns.re[lane] - imaginary_[g] * turns.im[lane];
                factor.im[lane] = real_[g] * turns.im[lane] + imaginary_[g] * turns.re[lane];
                const double size = factor.re[lane] * factor.re[lane] + factor.im[lane] * factor.im[lane];
                smallest[lane] = size < smallest[lane] ? size : smallest[lane];
            }
            for (std::int64_t power = law_.items().counts[g];;) {
                if (power % 2 == 1) {
                    product.multiply(factor);
                }
                power /= 2;
                if (power == 0) {
                    break;
                }
                factor.square();
            }
        }
    }

    // What is left out is at most exp(-need) for each frequency; in the mass, without the kernel, at most that over the
    // least kernel.
    [[nodiscard]] std::optional<CertifiedTail> result() const {
        const double points = static_cast<double>(sum_points_) * static_cast<double>(count_points_);
        const double left_out = std::exp(-need_.base) * slack;
        const double least_kernel = std::abs(cumulative_kernel(tilt_.lambda, pi));
        const double span = tilt_.lambda * static_cast<double>(sum_points_);
        const double log_kernel = std::log(-std::expm1(-tilt_.lambda));
        const double log_height = tilt_.jet.value + tilt_.lambda * distance_ - log_kernel - log_count();
        const double height_error =
            tilt_.jet.error + (4 * (std::fabs(tilt_.jet.value) + std::fabs(tilt_.lambda * distance_) +
                                    std::fabs(log_kernel) + 4 * std::fabs(log_count())) +
                               40) *
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
        const double scale = std::exp(log_height + log_kernel);
        tail.mass = std::max(0.0, scale * mass_.value() / points);
        tail.relative_error = (absolute / (value - absolute) + height_error) * slack;
        tail.mass_error =
            scale * (alias_bound_ / -std::expm1(-tilt_.lambda) + left_out / least_kernel + mass_rounding_ / points) +
            tail.mass * height_error;
        tail.frequencies = frequencies_;
        if (!(tail.relative_error <= useful)) {
            return std::nullopt;
        }
        return tail;
    }

    const Characteristic& law_;
    bool fixed_;
    std::int64_t chosen_;
    std::int64_t w_;
    double distance_;
    Tilt tilt_;
    std::int64_t sum_points_ = 1;
    bool alias_is_one_ = false;
    std::int64_t count_points_ = 1;
    double lowest_ = 0;
    double highest_ = 0;
    double alias_bound_ = 0;
    Need need_;
    std::int64_t next_row_ = 0;
    std::int64_t frequencies_ = 0;
    CompensatedSum cumulative_;
    CompensatedSum mass_;
    double rounding_ = 0;
    double mass_rounding_ = 0;
    double row_rounding_ = 0;
    double work_ = 0; // seconds, counted
    double seconds_of_factors_ = 0;
    std::vector<double> weights_;
    Part part_;
    std::vector<Block> blocks_;
    double total_weight_ = 0;
    double whole_slope_ = 0;
    double block_slope_ = 0;
    std::vector<std::int64_t> points_;
    std::vector<Complex> turns_;
    std::vector<Complex> count_phases_;
    std::optional<GroupPhases> phases_;
    std::vector<double> taken_;
    std::vector<double> real_;
    std::vector<double> imaginary_;
};

} // namespace

CertifiedInversion::CertifiedInversion(ScoredItems items, double p, Count count, std::int64_t chosen)
    : characteristic_(std::move(items), p, count == Count::fixed), count_(count), chosen_(chosen) {}

CertifiedInversion CertifiedInversion::of_signs(ScoredItems items) {
    return {std::move(items), 0.5, Count::free, 0};
}

CertifiedInversion CertifiedInversion::of_choice(ScoredItems items, std::int64_t chosen) {
    const double p = static_cast<double>(chosen) / static_cast<double>(items.size());
    return {std::move(items), p, Count::fixed, chosen};
}

std::optional<CertifiedTail> CertifiedInversion::at(std::int64_t w, double seconds_allowed) const {
    return Contour(characteristic_, count_, chosen_, w).evaluate(seconds_allowed);
}

} // namespace rankstead
