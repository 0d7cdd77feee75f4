#include "few_levels_law.h"

#include "inversion/contour_tilt.h"
#include "tails.h"

#include <algorithm>
#include <cmath>
#include <numeric>

namespace rankstead {

namespace {

constexpr double seconds_per_product = 0.7e-9; // of the cumulative sums
constexpr double seconds_per_sum = 5e-9;
constexpr double negligible = 1e-25; // of the weight at the mode
constexpr double most_sums = 1e12;   // far more than any time allows

double product_of_widths(std::size_t levels, const auto& width) {
    double product = 1;
    for (std::size_t i = 0; i < levels; ++i) {
        product *= width(i);
    }
    return product;
}

// The quotient rounded up, of a positive divisor.
std::int64_t divided_up(std::int64_t value, std::int64_t divisor) {
    return value > 0 ? (value + divisor - 1) / divisor : -(-value / divisor);
}

} // namespace

FewLevelsLaw FewLevelsLaw::of_signs(const ScoredItems& items, std::int64_t w) {
    return {items, 0.5, Count::free, 0, w};
}

FewLevelsLaw FewLevelsLaw::of_choice(const ScoredItems& items, std::int64_t chosen, std::int64_t w) {
    return {items, static_cast<double>(chosen) / static_cast<double>(items.size()), Count::fixed, chosen, w};
}

FewLevelsLaw::FewLevelsLaw(const ScoredItems& items, double p, Count count, std::int64_t chosen, std::int64_t w)
    : law_(items, p, count == Count::fixed), tail_(law_, count, chosen, w) {
    find_tilt();
    fill_levels();
}

// The tilt at which the mean is w; any tilt will do, so that a few steps of Newton's method are enough.
void FewLevelsLaw::find_tilt() {
    constexpr int most_steps = 40;
    const double spread = std::sqrt(tail_.variance());
    for (int step = 0; step < most_steps; ++step) {
        const Jet jet = jet_at(law_, a_, lambda_);
        const TiltStep wanted =
            newton_step(jet, {jet.by_count, tail_.distance() - jet.by_sum, jet.by_sum_twice}, !free(), true);
        if (!std::isfinite(wanted.lambda) || std::fabs(wanted.lambda) <= 1e-3 / std::sqrt(jet.by_sum_twice)) {
            return;
        }
        const double most = std::fabs(lambda_) + 2 / spread;
        const double taken = std::clamp(wanted.lambda, -most, most);
        a_ += wanted.a * (taken / wanted.lambda);
        lambda_ = std::max(0.0, lambda_ + taken);
    }
}

FewLevelsLaw::Level FewLevelsLaw::level_of(std::size_t group) {
    const ScoredItems& items = law_.items();
    const double odds =
        law_.p() / (1 - law_.p()) * std::exp(a_ - lambda_ * law_.offsets()[group]); // of an item being taken
    const std::int64_t size = items.counts[group];
    Level level;
    level.score = items.scores[group];
    const double mean = static_cast<double>(size) * odds / (1 + odds);
    level.mode = std::clamp<std::int64_t>(static_cast<std::int64_t>(mean), 0, size);
    // b(c + 1) / b(c) = (size - c) / (c + 1) odds, from the mode outwards: until negligible, which what follows stays.
    std::vector<double> below;
    std::vector<double> above{1};
    double ratio = 0;
    double total = 1;
    for (std::int64_t c = level.mode; c < size; ++c) {
        ratio = static_cast<double>(size - c) / static_cast<double>(c + 1) * odds;
        if (above.back() * ratio < negligible && ratio < 0.999) {
            left_out_ += above.back() * ratio / (1 - ratio);
            break;
        }
        above.push_back(above.back() * ratio);
        total += above.back();
    }
    double last = 1;
    for (std::int64_t c = level.mode; c > 0; --c) {
        ratio = static_cast<double>(c) / (static_cast<double>(size - c + 1) * odds);
        if (last * ratio < negligible && ratio < 0.999) {
            left_out_ += last * ratio / (1 - ratio);
            break;
        }
        last *= ratio;
        below.push_back(last);
        total += last;
    }
    level.least = level.mode - static_cast<std::int64_t>(below.size());
    level.weights.assign(below.rbegin(), below.rend());
    level.weights.insert(level.weights.end(), above.begin(), above.end());
    // More of a level than add up to w by themselves are in no sum.
    if (level.score > 0 && level.most() > tail_.w() / level.score) {
        const std::int64_t most = std::max(level.least, tail_.w() / level.score);
        level.weights.resize(static_cast<std::size_t>(most - level.least + 1));
    }
    for (std::size_t i = 0; i < level.weights.size(); ++i) {
        const auto from_mode = static_cast<double>(level.least + static_cast<std::int64_t>(i) - level.mode);
        const double exponent = lambda_ * static_cast<double>(level.score) * from_mode;
        largest_exponent_ = std::max(largest_exponent_, std::fabs(exponent));
        level.weights[i] *= std::exp(exponent) / total;
    }
    log_largest_ += std::max(0.0, std::log(*std::max_element(level.weights.begin(), level.weights.end())));
    return level;
}

void FewLevelsLaw::fill_levels() {
    for (std::size_t g = 0; g < law_.items().scores.size(); ++g) {
        levels_.push_back(level_of(g));
        widest_ = std::max(widest_, static_cast<std::int64_t>(levels_.back().weights.size()));
    }
    std::sort(levels_.begin(), levels_.end(),
              [](const Level& a, const Level& b) { return a.weights.size() < b.weights.size(); });
    if (!free() && levels_.size() > 1 && levels_.back().score < levels_[levels_.size() - 2].score) {
        std::swap(levels_.back(), levels_[levels_.size() - 2]);
    }
}

double FewLevelsLaw::seconds() const {
    const auto width = [&](std::size_t i) { return static_cast<double>(levels_[i].weights.size()); };
    const std::size_t n = levels_.size();
    if (free()) {
        return seconds_per_sum * (product_of_widths(n - 1, width) + width(n - 1));
    }
    const double rests = static_cast<double>(last_rest() - first_rest() + 1);
    return rests *
           (seconds_per_product * width(n - 2) + seconds_per_sum * product_of_widths(n >= 3 ? n - 3 : 0, width));
}

std::int64_t FewLevelsLaw::first_rest() const {
    const auto before = levels_.end() - 2;
    return tail_.chosen() - std::accumulate(levels_.begin(), before, std::int64_t{0},
                                            [](std::int64_t sum, const Level& level) { return sum + level.most(); });
}

std::int64_t FewLevelsLaw::last_rest() const {
    const auto before = levels_.end() - 2;
    return tail_.chosen() - std::accumulate(levels_.begin(), before, std::int64_t{0},
                                            [](std::int64_t sum, const Level& level) { return sum + level.least; });
}

// Goes through all numbers taken of levels first to last - 1, with the product of their weights and the sum of their
// scores; `visit(weight, count, sum)`.
template <class Levels, class Visit>
static void for_all(const Levels& levels, std::size_t first, std::size_t last, double weight, std::int64_t count,
                    std::int64_t sum, const Visit& visit) {
    if (first == last) {
        visit(weight, count, sum);
        return;
    }
    const auto& level = levels[first];
    for (std::size_t i = 0; i < level.weights.size(); ++i) {
        const std::int64_t taken = level.least + static_cast<std::int64_t>(i);
        for_all(levels, first + 1, last, weight * level.weights[i], count + taken, sum + taken * level.score, visit);
    }
}

FewLevelsLaw::Sums FewLevelsLaw::sum_of_signs() const {
    const Level& last = levels_.back();
    std::vector<double> cumulative(last.weights);
    std::partial_sum(cumulative.begin(), cumulative.end(), cumulative.begin());
    Sums sums;
    for_all(levels_, 0, levels_.size() - 1, 1, 0, 0, [&](double weight, std::int64_t, std::int64_t sum) {
        const std::int64_t rest = tail_.w() - sum;
        if (rest < last.least * last.score) {
            return;
        }
        const std::int64_t most = std::min(rest / last.score, last.most());
        const auto i = static_cast<std::size_t>(most - last.least);
        sums.through.add(weight * cumulative[i]);
        sums.at.add(most * last.score == rest ? weight * last.weights[i] : 0);
    });
    return sums;
}

FewLevelsLaw::Sums FewLevelsLaw::sum_of_choice() const {
    const std::size_t before = levels_.size() - 2;
    const Level& low = levels_[before];
    const Level& high = levels_[before + 1];
    const std::int64_t gap = high.score - low.score;
    std::vector<double> terms;
    std::vector<double> cumulative; // over the number taken of the lower level, from the largest down
    Sums sums;
    for (std::int64_t rest = first_rest(); rest <= last_rest(); ++rest) {
        const std::int64_t least = std::max(low.least, rest - high.most());
        const std::int64_t most = std::min(low.most(), rest - high.least);
        if (least > most) {
            continue;
        }
        terms.assign(static_cast<std::size_t>(most - least + 1), 0.0);
        for (std::int64_t x = least; x <= most; ++x) {
            terms[static_cast<std::size_t>(most - x)] = low.weights[static_cast<std::size_t>(x - low.least)] *
                                                        high.weights[static_cast<std::size_t>(rest - x - high.least)];
        }
        cumulative.resize(terms.size());
        std::partial_sum(terms.begin(), terms.end(), cumulative.begin());
        // x of the lower level and rest - x of the higher one: rest * high - x * gap is at most what is left.
        const auto take = [&](double weight, std::int64_t sum) {
            const std::int64_t wanted = divided_up(sum + rest * high.score - tail_.w(), gap);
            if (wanted > most) {
                return;
            }
            const std::int64_t x = std::max(wanted, least);
            const auto i = static_cast<std::size_t>(most - x);
            sums.through.add(weight * cumulative[i]);
            sums.at.add(sum + rest * high.score - x * gap == tail_.w() ? weight * terms[i] : 0);
        };
        if (before == 0) {
            take(1, 0);
            continue;
        }
        // The last level before them takes what is left of the count.
        const Level& closing = levels_[before - 1];
        for_all(levels_, 0, before - 1, 1, 0, 0, [&](double weight, std::int64_t count, std::int64_t sum) {
            const std::int64_t taken = tail_.chosen() - rest - count;
            if (taken >= closing.least && taken <= closing.most()) {
                take(weight * closing.weights[static_cast<std::size_t>(taken - closing.least)],
                     sum + taken * closing.score);
            }
        });
    }
    return sums;
}

std::optional<CertifiedTail> FewLevelsLaw::evaluate() const {
    const Sums sums = free() ? sum_of_signs() : sum_of_choice();
    const double through = sums.through.value();
    const Jet jet = jet_at(law_, a_, lambda_);
    double at_modes = -static_cast<double>(tail_.w());
    for (const Level& level : levels_) {
        at_modes += static_cast<double>(level.mode) * static_cast<double>(level.score);
    }
    const double log_height = jet.value + lambda_ * tail_.distance() + lambda_ * at_modes - tail_.log_count();
    CertifiedTail tail;
    tail.lower = std::exp(log_height) * through;
    tail.mass = std::exp(log_height) * sums.at.value();
    // Each weight passes through a few roundings a step from the mode, and its exponential; the sums are of positive
    // terms. What is left out is relative to sums that weigh at most 1, e^(lambda (w - at_modes)) in these units.
    const double levels = static_cast<double>(levels_.size());
    const double weight_error =
        levels * (6 * static_cast<double>(widest_) + 3 * largest_exponent_ + 20) + 4 * static_cast<double>(widest_);
    const double log_error = jet.error + 8 * unit_roundoff *
                                             (std::fabs(jet.value) + std::fabs(lambda_ * tail_.distance()) +
                                              std::fabs(lambda_ * at_modes) + 4 * std::fabs(tail_.log_count()) + 8);
    // A product below the range of a double has lost at most that much, times the largest of the other weights.
    const double lost = most_sums * smallest_positive_p * std::exp(log_largest_);
    const double omitted = (2 * left_out_ * std::exp(-lambda_ * at_modes) + lost) / through;
    tail.relative_error = weight_error * unit_roundoff + log_error + omitted;
    tail.mass_error = (weight_error * unit_roundoff + log_error) * tail.mass + omitted * tail.lower;
    const bool useful = through > 0 && std::isfinite(tail.lower) && tail.relative_error <= useful_accuracy;
    return useful ? std::optional(tail) : std::nullopt;
}

} // namespace rankstead
