#include "certified_inversion.h"

#include "../compensated_sum.h"
#include "frequency_screen.h"

#include <algorithm>
#include <array>
#include <cmath>
#include <numbers>

namespace rankstead {

namespace {

__extension__ typedef __int128 Wide;

constexpr double pi = std::numbers::pi;
constexpr double wanted = 1e-13;   // relative size of aliases and of what is left out
constexpr double useful = 1e-10;   // a larger bound is not given
constexpr double slack = 1 + 1e-9; // for the rounding of the bounds themselves
constexpr double seconds_per_factor = 3e-9;
constexpr double seconds_per_series_point = 400e-9;
constexpr double seconds_per_series_row = 15e-6;
constexpr double seconds_per_angle = 30e-9;
constexpr double seconds_per_look = 15e-9;

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

// (1 - e^-lambda) / (1 - e^-(lambda - it)): the sum over all values up to w, as a factor.
Complex cumulative_kernel(double lambda, double t) {
    const double below = -std::expm1(-lambda);
    const double decay = std::exp(-lambda);
    const double half = std::sin(t / 2);
    return below / Complex(below + decay * 2 * half * half, -decay * std::sin(t));
}

Complex unit(double angle) {
    return {std::cos(angle), std::sin(angle)};
}

// exp(2 pi i (j * k mod n) / n): the product is reduced exactly.
Complex exact_unit(std::int64_t j, Wide k, std::int64_t n) {
    auto rest = static_cast<Wide>(j) * k % n;
    rest += rest < 0 ? n : 0;
    rest -= 2 * rest > n ? n : 0;
    return unit(2 * pi * static_cast<double>(rest) / static_cast<double>(n));
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
        if (!is_sound(tilt_, fixed_)) {
            return std::nullopt; // at the very end of the range the saddlepoint runs away
        }
        choose_lattice();
        if (!(alias_bound_ <= expected_value())) {
            return std::nullopt;
        }
        const auto ranges = frequencies_that_matter(law_.items().scores, weights(), need_);
        if (!ranges) {
            return std::nullopt;
        }
        for (const FrequencyRange& range : *ranges) {
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

    // Solves d/da = 0 and, above its floor, d/dlambda = 0 of T(a, -lambda) + lambda * distance - log(1 - e^-lambda).
    void find_tilt(double spread) {
        const double z = -distance_ / spread;
        const double floor = 2 / spread;
        tilt_.lambda = std::max(floor, (z + std::sqrt(z * z + 4)) / (2 * spread));
        constexpr int most_steps = 60;
        for (int step = 0; step < most_steps; ++step) {
            take_jet();
            const Jet& jet = tilt_.jet;
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

    // T at another real tilt minus T here, never too small.
    [[nodiscard]] double growth(double a, double lambda) const {
        const Jet jet = law_.jet(a, -lambda, law_.series_serves(reach(a, lambda)));
        return jet.value + jet.error - tilt_.jet.value + tilt_.jet.error;
    }

    // The number of arrangements at w, relative to the contour's height, is about this; it is checked at the end.
    [[nodiscard]] double expected_value() const {
        const double sum = 2 * pi * (tilt_.sum_variance + 1 / (tilt_.lambda * tilt_.lambda));
        return fixed_ ? 1 / std::sqrt(sum * 2 * pi * tilt_.count_variance) : 1 / std::sqrt(sum);
    }

    // Aliases of the sum beyond Nt points: a geometric series on either side, by Chernoff's inequality at another tilt.
    // Above, where that tilt would be negative, the aliases are nearly 1: they are subtracted (see result) and what
    // they lack of 1 is bounded in the same way.
    [[nodiscard]] double sum_aliases(double points) {
        const double below = -std::expm1(-tilt_.lambda);
        const double slope = fixed_ ? tilt_.jet.by_both / tilt_.jet.by_count_twice : 0;
        const double best_step = points / tilt_.sum_variance;
        const auto bound = [&](double lambda) {
            const double a = tilt_.a + (lambda - tilt_.lambda) * slope;
            const double step = std::fabs(lambda - tilt_.lambda) * points;
            return std::exp(growth(a, lambda) + (lambda - tilt_.lambda) * distance_ - step) / -std::expm1(-step);
        };
        const auto above = static_cast<double>(law_.items().sum() - w_);
        alias_is_one_ = tilt_.lambda < best_step;
        const double up = alias_is_one_ && points >= above ? 0 : bound(tilt_.lambda - best_step);
        const double down = static_cast<double>(w_) < points ? 0 : bound(tilt_.lambda + best_step);
        return slack * below * (up + down);
    }

    // Aliases of the count beyond Ns points.
    [[nodiscard]] double count_aliases(double points) const {
        if (points > law_.size()) {
            return 0;
        }
        const double step = points / tilt_.count_variance;
        double sum = 0;
        for (const double sign : {-1.0, 1.0}) {
            sum += std::exp(growth(tilt_.a + sign * step, tilt_.lambda) - step * points) / -std::expm1(-step * points);
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
            if (bound <= target || !std::isfinite(bound)) {
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
        need_ = -std::log(wanted * expected_value() / 4);
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
    [[nodiscard]] double decay(double s, double t, const std::optional<Look>& look) const {
        const Jet& jet = tilt_.jet;
        if (look) {
            const double turned = look->transform.real() * std::cos(s) - look->transform.imag() * std::sin(s);
            return total_weight_ * (1 - 1e-9) - turned;
        }
        const double quadratic = jet.by_count_twice * s * s + 2 * s * t * jet.by_both + jet.by_sum_twice * t * t;
        const double farthest = std::fabs(s) + t * law_.largest_offset();
        const double near = quadratic * (0.5 - farthest * farthest / 24);
        const double away = std::fabs(s) - t * law_.largest_offset();
        return std::max(near, away > 0 ? jet.by_count_twice * (1 - std::cos(away)) : 0.0) * (1 - 1e-9);
    }

    [[nodiscard]] std::optional<Look> look_at(double t) {
        if (t * law_.largest_offset() <= near_reach) {
            return std::nullopt;
        }
        work_ += static_cast<double>(weights().size()) * seconds_per_angle;
        if (blocks_.empty()) {
            fill_blocks();
        }
        Look look;
        double block_decay = 0;
        std::size_t g = 0;
        for (const Block& block : blocks_) {
            Complex sum = 0;
            for (; g < block.end; ++g) {
                sum += weights_[g] * unit(t * law_.offsets()[g]);
            }
            block_decay += block.weight - std::abs(sum);
            look.transform += sum;
        }
        const double allowance = need_ + 1e-9 * total_weight_;
        const auto step = [&](double decay, double slope) {
            return slope > 0 && decay > allowance ? (decay - allowance) / slope : 0.0;
        };
        look.proven_step =
            std::max(step(total_weight_ - std::abs(look.transform), whole_slope_), step(block_decay, block_slope_));
        return look;
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
        const std::optional<Look> look = look_at(t);
        if (look && look->proven_step > 0) {
            return 1 + static_cast<std::int64_t>(look->proven_step * static_cast<double>(sum_points_) / (2 * pi));
        }
        points_.clear();
        double widest = 0;
        const std::int64_t last = fixed_ ? count_points_ / 2 : 0;
        const std::int64_t first = fixed_ ? last + 1 - count_points_ : 0;
        for (std::int64_t k = first; k <= last; ++k) {
            const double s = fixed_ ? 2 * pi * static_cast<double>(k) / static_cast<double>(count_points_) : 0;
            if (decay(s, t, look) < need_) {
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
        work_ += series
                     ? seconds_per_series_row + points * seconds_per_series_point
                     : static_cast<double>(law_.offsets().size()) * (seconds_per_angle + points * seconds_per_factor);
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

    // The same as a product over the items, whose angles are reduced exactly.
    Complex product_row(std::int64_t j) {
        fill_factors(j);
        const Complex phase = std::conj(exact_unit(j, w_, sum_points_));
        // The scores are taken as they are, but s belongs to scores about their mean: turned back by t times the mean.
        const std::int64_t fine = law_.items().size() * sum_points_;
        const Wide mean = law_.items().sum();
        const Complex back = fixed_ ? std::conj(exact_unit(j, mean, fine)) : Complex(1, 0);
        const Complex count_back = fixed_ ? exact_unit(j, mean * chosen_, fine) : Complex(1, 0);
        Complex sum = 0;
        row_rounding_ = 0;
        for (const std::int64_t k : points_) {
            const Complex turn = fixed_ ? exact_unit(k, 1, count_points_) * back : Complex(1, 0);
            const Complex count_phase =
                fixed_ ? std::conj(exact_unit(k, chosen_, count_points_)) * count_back : Complex(1, 0);
            double smallest = 1;
            const Complex product = multiplied(turn, smallest);
            sum += product * phase * count_phase;
            row_rounding_ +=
                std::abs(product) * (law_.size() * (20 / std::sqrt(smallest) + 3) + 40) * unit_roundoff * slack;
        }
        return sum;
    }

    // p_g and e^(it r_g) of every group at the tilt.
    void fill_factors(std::int64_t j) {
        const auto& items = law_.items();
        if (taken_.empty()) {
            for (const double offset : law_.offsets()) {
                const double odds = law_.p() / (1 - law_.p()) * std::exp(tilt_.a - tilt_.lambda * offset);
                taken_.push_back(odds / (1 + odds));
            }
            real_.resize(taken_.size());
            imaginary_.resize(taken_.size());
        }
        for (std::size_t g = 0; g < taken_.size(); ++g) {
            const Complex turned = taken_[g] * exact_unit(j, items.scores[g], sum_points_);
            real_[g] = turned.real();
            imaginary_[g] = turned.imag();
        }
    }

    // The product of (q + p e^(is) e^(itr))^count; `smallest` becomes the least |factor|^2.
    [[nodiscard]] Complex multiplied(Complex turn, double& smallest) const {
        double re = 1;
        double im = 0;
        for (std::size_t g = 0; g < taken_.size(); ++g) {
            double fr = 1 - taken_[g] + real_[g] * turn.real() - imaginary_[g] * turn.imag();
            double fi = real_[g] * turn.imag() + imaginary_[g] * turn.real();
            smallest = std::min(smallest, fr * fr + fi * fi);
            for (std::int64_t power = law_.items().counts[g];;) {
                if (power % 2 == 1) {
                    const double next = re * fr - im * fi;
                    im = re * fi + im * fr;
                    re = next;
                }
                power /= 2;
                if (power == 0) {
                    break;
                }
                const double square = fr * fr - fi * fi;
                fi = 2 * fr * fi;
                fr = square;
            }
        }
        return {re, im};
    }

    // Every |kernel| is at most 1, so what is left out is at most exp(-need) for each frequency.
    [[nodiscard]] std::optional<CertifiedTail> result() const {
        const double points = static_cast<double>(sum_points_) * static_cast<double>(count_points_);
        const double left_out = std::exp(-need_) * slack;
        const double span = tilt_.lambda * static_cast<double>(sum_points_);
        const double log_kernel = std::log(-std::expm1(-tilt_.lambda));
        const double log_count = fixed_ ? log_count_probability(law_.size(), static_cast<double>(chosen_)) : 0;
        const double log_height = tilt_.jet.value + tilt_.lambda * distance_ - log_kernel - log_count;
        const double height_error =
            tilt_.jet.error + (4 * (std::fabs(tilt_.jet.value) + std::fabs(tilt_.lambda * distance_) +
                                    std::fabs(log_kernel) + 4 * std::fabs(log_count)) +
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
        tail.mass_error = scale * (alias_bound_ / -std::expm1(-tilt_.lambda) + left_out + mass_rounding_ / points) +
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
    double alias_bound_ = 0;
    double need_ = 0;
    std::int64_t next_row_ = 0;
    std::int64_t frequencies_ = 0;
    CompensatedSum cumulative_;
    CompensatedSum mass_;
    double rounding_ = 0;
    double mass_rounding_ = 0;
    double row_rounding_ = 0;
    double work_ = 0; // seconds, counted
    std::vector<double> weights_;
    std::vector<Block> blocks_;
    double total_weight_ = 0;
    double whole_slope_ = 0;
    double block_slope_ = 0;
    std::vector<std::int64_t> points_;
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
