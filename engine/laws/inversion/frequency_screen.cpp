#include "frequency_screen.h"

#include "fourier.h"

#include <algorithm>
#include <bit>
#include <cmath>
#include <numbers>

namespace rankstead {

namespace {

constexpr double pi = std::numbers::pi;
constexpr std::int64_t largest_transform = std::int64_t{1} << 21;
constexpr double seconds_per_angle = 25e-9;
constexpr double seconds_per_turn = 1.6e-9;
constexpr double seconds_per_transformed = 150e-9;
constexpr double seconds_per_group = 4e-9;
constexpr double rounding_slack = 1e-6; // of the weights: far above the rounding of sums and transform

// The weighted sum of squares about the mean of each block of neighbouring groups whose scores span at most `range`.
double variance_within_blocks(const std::vector<std::int64_t>& scores, const std::vector<double>& weights,
                              double range) {
    double total = 0;
    for (std::size_t begin = 0; begin < scores.size();) {
        double weight = 0;
        double mean = 0;
        double squares = 0;
        std::size_t end = begin;
        for (; end < scores.size() && static_cast<double>(scores[end] - scores[begin]) <= range; ++end) {
            // Updating formula of West (1979).
            const double x = static_cast<double>(scores[end] - scores[begin]);
            weight += weights[end];
            const double away = x - mean;
            mean += weight > 0 ? away * weights[end] / weight : 0;
            squares += weights[end] * away * (x - mean);
        }
        total += squares;
        begin = end;
    }
    return total * (1 - rounding_slack);
}

// Whether blocks of range pi / high prove all of [low, high].
bool blocks_prove(const std::vector<std::int64_t>& scores, const std::vector<double>& weights, double low, double high,
                  double need) {
    return 2 / (pi * pi) * low * low * variance_within_blocks(scores, weights, pi / high) >= need;
}

// Every so-manieth group, where there are very many: a part of the groups proves as well, if it proves enough.
struct Thinned {
    Thinned(const std::vector<std::int64_t>& all_scores, const std::vector<double>& all_weights) {
        constexpr std::size_t enough = 16384;
        const std::size_t stride = std::max<std::size_t>(1, all_scores.size() / enough);
        is_less = stride > 1;
        for (std::size_t g = 0; g < all_scores.size(); g += stride) {
            scores.push_back(all_scores[g]);
            weights.push_back(all_weights[g]);
        }
    }

    std::vector<std::int64_t> scores;
    std::vector<double> weights;
    bool is_less = false;
};

struct Window {
    std::size_t begin = 0;
    std::size_t end = 0; // past the last group
    double weight = 0;
    std::int64_t range = 0;
};

// The window of at least so many groups with at least the weight `wanted` that spans the fewest scores; all groups if
// there is none. Of few groups the transform has many peaks.
Window narrowest_window(const std::vector<std::int64_t>& scores, const std::vector<double>& weights, double wanted,
                        std::size_t groups) {
    double total = 0;
    for (const double weight : weights) {
        total += weight;
    }
    Window best{0, scores.size(), total, scores.back() - scores.front()};
    double weight = 0;
    std::size_t begin = 0;
    for (std::size_t end = 0; end < scores.size(); ++end) {
        weight += weights[end];
        while (weight - weights[begin] >= wanted && end - begin >= groups) {
            weight -= weights[begin];
            ++begin;
        }
        const std::int64_t range = scores[end] - scores[begin];
        if (weight >= wanted && end + 1 - begin >= groups && range < best.range) {
            best = {begin, end + 1, weight, range};
        }
    }
    return best;
}

void add_range(std::vector<FrequencyRange>& ranges, const FrequencyRange& range) {
    if (!ranges.empty() && ranges.back().high >= range.low) {
        ranges.back().high = std::max(ranges.back().high, range.high);
    } else {
        ranges.push_back(range);
    }
}

// Sum of the weights times the distances of their scores from the middle of the window: |C| changes no faster.
double steepest(const std::vector<std::int64_t>& scores, const std::vector<double>& weights, const Window& window) {
    const double middle = static_cast<double>(window.range) / 2;
    double slope = 0;
    for (std::size_t g = window.begin; g < window.end; ++g) {
        slope += weights[g] * std::fabs(static_cast<double>(scores[g] - scores[window.begin]) - middle);
    }
    return slope;
}

// Phases and weights of a window's groups, turned on step by step.
class TurningWindow {
public:
    TurningWindow(const std::vector<std::int64_t>& scores, const std::vector<double>& weights, const Window& window) {
        for (std::size_t g = window.begin; g < window.end; ++g) {
            distance_.push_back(static_cast<double>(scores[g] - scores[window.begin]));
            weight_.push_back(weights[g]);
        }
        re_.resize(weight_.size());
        im_.resize(weight_.size());
        step_re_.resize(weight_.size());
        step_im_.resize(weight_.size());
    }

    [[nodiscard]] double size() const { return static_cast<double>(weight_.size()); }

    // |C| at t.
    [[nodiscard]] double transform_at(double t) const {
        double re = 0;
        double im = 0;
        for (std::size_t g = 0; g < weight_.size(); ++g) {
            re += weight_[g] * std::cos(t * distance_[g]);
            im += weight_[g] * std::sin(t * distance_[g]);
        }
        return std::sqrt(re * re + im * im);
    }

    void start(double t, double step) {
        for (std::size_t g = 0; g < weight_.size(); ++g) {
            re_[g] = weight_[g] * std::cos(t * distance_[g]);
            im_[g] = weight_[g] * std::sin(t * distance_[g]);
            step_re_[g] = std::cos(step * distance_[g]);
            step_im_[g] = std::sin(step * distance_[g]);
        }
    }

    // |C| where it has been turned to; then one step on.
    double turn() {
        double re = 0;
        double im = 0;
        for (std::size_t g = 0; g < weight_.size(); ++g) {
            re += re_[g];
            im += im_[g];
            const double turned = re_[g] * step_re_[g] - im_[g] * step_im_[g];
            im_[g] = re_[g] * step_im_[g] + im_[g] * step_re_[g];
            re_[g] = turned;
        }
        return std::sqrt(re * re + im * im);
    }

private:
    std::vector<double> distance_;
    std::vector<double> weight_;
    std::vector<double> re_;
    std::vector<double> im_;
    std::vector<double> step_re_;
    std::vector<double> step_im_;
};

// For a window of few groups over many scores: in equal steps, and where one of those does not prove enough, in steps
// as long as each look proves.
class Sweep {
public:
    Sweep(const std::vector<std::int64_t>& scores, const std::vector<double>& weights, const Window& window,
          const Need& need, double seconds_allowed)
        : turning_(scores, weights, window), need_(need), seconds_allowed_(seconds_allowed),
          slope_(steepest(scores, weights, window)), provable_(window.weight * (1 - rounding_slack)),
          step_(1 / static_cast<double>(window.range + 1)) {}

    Screened from(double first) {
        constexpr int renewal = 64;
        int turns = 0;
        for (double t = first; t < pi; t += step_) {
            if (turns++ % renewal == 0) {
                turning_.start(t, step_);
                result_.seconds += seconds_per_angle * turning_.size();
            }
            result_.seconds += seconds_per_turn * turning_.size();
            if (result_.seconds > seconds_allowed_) {
                add_range(result_.ranges, {t, pi});
                break;
            }
            if (provable_ - turning_.turn() - need_.at(t) < slope_ * step_) {
                look_closely(t, std::min(pi, t + step_));
            }
        }
        return result_;
    }

private:
    void look_closely(double first, double last) {
        for (double t = first; t < last;) {
            result_.seconds += seconds_per_angle * turning_.size();
            const double spare = provable_ - turning_.transform_at(t) - need_.at(t);
            const double proven = slope_ > 0 ? spare / slope_ : spare > 0 ? pi : 0;
            const double shortest = step_ / 4;
            if (proven < shortest) {
                add_range(result_.ranges, {t, std::min(last, t + shortest)});
            }
            t += std::max(proven, shortest);
        }
    }

    TurningWindow turning_;
    const Need& need_;
    double seconds_allowed_;
    double slope_;
    double provable_;
    double step_;
    Screened result_;
};

// From one Fourier transform: for a window of many groups. The cells that are not proven, as ranges of t.
Screened transformed_ranges(const std::vector<std::int64_t>& scores, const std::vector<double>& weights,
                            const Window& window, const Need& need, double from) {
    const auto size = std::bit_ceil(static_cast<std::uint64_t>(std::max<std::int64_t>(512, 8 * (window.range + 1))));
    std::vector<std::complex<double>> transform(size, 0.0);
    for (std::size_t g = window.begin; g < window.end; ++g) {
        transform[static_cast<std::size_t>(scores[g] - scores[window.begin])] += weights[g];
    }
    fourier_transform(transform);
    const double half_cell = pi / static_cast<double>(size);
    const double provable = window.weight * (1 - rounding_slack) - half_cell * steepest(scores, weights, window);
    Screened result{{}, seconds_per_transformed * static_cast<double>(size)};
    for (std::size_t k = 0; k <= size / 2; ++k) {
        const double t = 2 * half_cell * static_cast<double>(k);
        const FrequencyRange cell{std::max(from, t - half_cell), std::min(pi, t + half_cell)};
        if (cell.high < from || std::abs(transform[k]) <= provable - need.at(cell.low)) {
            continue;
        }
        add_range(result.ranges, cell);
    }
    return result;
}

Screened unproven_ranges(const std::vector<std::int64_t>& scores, const std::vector<double>& weights,
                         const Window& window, const Need& need, double from, double seconds_allowed) {
    constexpr std::size_t few = 24;
    if (window.weight * (1 - rounding_slack) <= need.at(pi)) {
        return {{{from, pi}}, 0}; // too little weight to prove anything
    }
    const bool sweep = window.end - window.begin <= few || 8 * window.range > largest_transform;
    return sweep ? Sweep(scores, weights, window, need, seconds_allowed).from(from)
                 : transformed_ranges(scores, weights, window, need, from);
}

} // namespace

double Need::at(double t) const {
    const double below = -std::expm1(-lambda);
    const double rise = 2 * std::sin(t / 2) / below;
    return base - 0.5 * std::log1p(std::exp(-lambda) * rise * rise);
}

Screened frequencies_that_matter(const std::vector<std::int64_t>& scores, const std::vector<double>& weights,
                                 const Need& need, double seconds_allowed) {
    const double range = static_cast<double>(scores.back() - scores.front());
    if (range <= 0) {
        return {{{0, pi}}, 0};
    }
    // From here on blocks serve, step by step, until they no longer do.
    const double variance = variance_within_blocks(scores, weights, range);
    const double first = std::sqrt(need.base / variance) * pi / std::sqrt(2.0);
    Screened result{{{0, std::min(first, pi)}}, 0};
    const Thinned thinned(scores, weights);
    double proven_to = first < pi / range ? pi / range : first;
    constexpr double step = 1.3;
    while (proven_to < pi) {
        const double next = std::min(pi, proven_to * step);
        const double needed = need.at(proven_to);
        result.seconds += seconds_per_group * static_cast<double>(thinned.scores.size());
        if (!blocks_prove(thinned.scores, thinned.weights, proven_to, next, needed)) {
            result.seconds += seconds_per_group * static_cast<double>(scores.size());
            if (!thinned.is_less || !blocks_prove(scores, weights, proven_to, next, needed)) {
                break;
            }
        }
        proven_to = next;
    }
    if (proven_to >= pi) {
        return result;
    }
    constexpr double ample = 5;
    constexpr std::size_t enough = 8;
    const Window window = narrowest_window(scores, weights, ample * need.at(proven_to), enough);
    const Screened rest = unproven_ranges(scores, weights, window, need, proven_to, seconds_allowed - result.seconds);
    for (const FrequencyRange& cell : rest.ranges) {
        add_range(result.ranges, cell);
    }
    result.seconds += rest.seconds;
    return result;
}

} // namespace rankstead
