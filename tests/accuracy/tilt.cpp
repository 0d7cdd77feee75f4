#include "tilt.h"

#include <algorithm>
#include <cmath>
#include <numbers>

namespace rankstead::accuracy {

namespace {

constexpr double ln2 = std::numbers::ln2;

double log2_factorial(double n) {
    int sign = 0;
    return ::lgamma_r(n + 1, &sign) / ln2;
}

double probability(double log_odds) {
    return 1 / (1 + std::exp(-log_odds));
}

double log_one_plus_exp(double x) {
    return std::max(x, 0.0) + std::log1p(std::exp(-std::fabs(x)));
}

} // namespace

double Tilt::odds(std::int64_t score) const {
    return std::exp(by_count - by_sum * static_cast<double>(score));
}

double Tilt::log2_arrangements(std::int64_t chosen, std::int64_t sum) const {
    const double log_bound = log_product - by_count * static_cast<double>(chosen) + by_sum * static_cast<double>(sum);
    return log_bound / ln2 * (1 + 1e-9) + 1; // more than its own rounding
}

TiltedLaw::TiltedLaw(const Scores& ascending, std::optional<std::int64_t> chosen) : chosen_(chosen) {
    for (const std::int64_t score : ascending) {
        if (scores_.empty() || scores_.back() != score) {
            scores_.push_back(score);
            counts_.push_back(0);
        }
        counts_.back() += 1;
    }
    const auto n = static_cast<double>(ascending.size());
    log2_total_ = n;
    if (chosen) {
        const auto m = static_cast<double>(*chosen);
        log2_total_ = log2_factorial(n) - log2_factorial(m) - log2_factorial(n - m);
    }
}

// The `by_count` at which the expected number of scores taken is `chosen`, or near: Newton's steps inside a bracket.
double TiltedLaw::count_for(double by_sum) const {
    const auto wanted = static_cast<double>(*chosen_);
    double low = by_sum * static_cast<double>(scores_.front()) - 40;
    double high = by_sum * static_cast<double>(scores_.back()) + 40;
    double by_count = (low + high) / 2;
    constexpr int most_steps = 30;
    for (int step = 0; step < most_steps; ++step) {
        double taken = -wanted;
        double slope = 0;
        for (std::size_t g = 0; g < scores_.size(); ++g) {
            const double p = probability(by_count - by_sum * static_cast<double>(scores_[g]));
            taken += counts_[g] * p;
            slope += counts_[g] * p * (1 - p);
        }
        if (std::fabs(taken) < 1e-3) {
            break;
        }
        (taken > 0 ? high : low) = by_count;
        by_count -= taken / slope;
        if (!(by_count > low && by_count < high)) {
            by_count = (low + high) / 2;
        }
    }
    return by_count;
}

Tilt TiltedLaw::at(double by_sum, double by_count) const {
    Tilt tilt{by_count, by_sum, 0, 0};
    for (std::size_t g = 0; g < scores_.size(); ++g) {
        const auto score = static_cast<double>(scores_[g]);
        const double log_odds = by_count - by_sum * score;
        tilt.log_product += counts_[g] * log_one_plus_exp(log_odds);
        tilt.mean += counts_[g] * probability(log_odds) * score;
    }
    return tilt;
}

Tilt TiltedLaw::reaching(double log_p) const {
    const auto tilt_at = [this](double by_sum) { return at(by_sum, chosen_ ? count_for(by_sum) : 0); };
    const auto log_count = [this](const Tilt& tilt) {
        return tilt.log_product - tilt.by_count * static_cast<double>(chosen()) + tilt.by_sum * tilt.mean;
    };
    // The same overestimate as for the tail: without a tilt all arrangements are counted.
    const double log_all = log_count(tilt_at(0));
    double low = std::log(1e-9);
    double high = std::log(50.0); // scores are integers: here only the lowest ones are taken
    constexpr int halvings = 24;
    for (int i = 0; i < halvings; ++i) {
        const double middle = (low + high) / 2;
        (log_count(tilt_at(std::exp(middle))) - log_all > log_p ? low : high) = middle;
    }
    return tilt_at(std::exp(low));
}

} // namespace rankstead::accuracy
