#include "characteristic.h"

#include "../compensated_sum.h"

#include <algorithm>
#include <array>
#include <cmath>

namespace rankstead {

namespace {

constexpr double many = 50'000;
constexpr double very_many = 500'000;
constexpr double farthest_reach = 0.62; // of the series' radius
constexpr double farthest_truncation = 1e-13;

double operations(std::size_t degree) {
    return 8 * static_cast<double>(degree) + 64;
}

// Scores about the mean score, or as they are.
std::vector<double> offsets_of(const ScoredItems& items, bool centred) {
    std::vector<double> offsets;
    offsets.reserve(items.scores.size());
    const std::int64_t n = items.size();
    const Wide sum = items.sum();
    for (const std::int64_t score : items.scores) {
        const auto scaled = static_cast<Wide>(score) * n - sum;
        offsets.push_back(centred ? static_cast<double>(scaled) / static_cast<double>(n) : static_cast<double>(score));
    }
    return offsets;
}

} // namespace

Characteristic::Characteristic(ScoredItems items, double p, bool centred)
    : items_(std::move(items)), size_(static_cast<double>(items_.size())), terms_(size_ > very_many ? 16
                                                                                  : size_ > many    ? 32
                                                                                                    : 72),
      series_(p, static_cast<int>(terms_)), offsets_(offsets_of(items_, centred)), moment_(terms_ + 1, 0.0),
      absolute_moment_(terms_ + 1, 0.0) {
    for (const double offset : offsets_) {
        largest_ = std::max(largest_, std::fabs(offset));
    }
    sum_powers();
    if (centred) {
        moment_[1] = 0; // by definition
    }
    for (std::size_t k = 0; k <= terms_; ++k) {
        choose_.emplace_back(k + 1, 1.0);
        for (std::size_t l = 1; l < k; ++l) {
            choose_.back()[l] = choose_[k - 1][l - 1] + choose_[k - 1][l];
        }
    }
}

void Characteristic::sum_powers() {
    constexpr std::size_t lanes = 8; // so many groups at a time, so that no multiplication waits for another
    constexpr std::size_t block = 32;
    std::vector<CompensatedSum> sums(terms_ + 1);
    std::vector<CompensatedSum> absolute(terms_ + 1);
    std::vector<double> partial(terms_ + 1);
    std::vector<double> absolute_partial(terms_ + 1);
    for (std::size_t begin = 0; begin < offsets_.size(); begin += block) {
        std::fill(partial.begin(), partial.end(), 0.0);
        std::fill(absolute_partial.begin(), absolute_partial.end(), 0.0);
        const std::size_t end = std::min(begin + block, offsets_.size());
        for (std::size_t g = begin; g < end; g += lanes) {
            std::array<double, lanes> x{};
            std::array<double, lanes> power{};
            for (std::size_t lane = 0; lane < std::min(lanes, end - g); ++lane) {
                x[lane] = offsets_[g + lane] / largest_;
                power[lane] = static_cast<double>(items_.counts[g + lane]);
            }
            for (std::size_t l = 0; l <= terms_; ++l) {
                double sum = 0;
                double size = 0;
                for (std::size_t lane = 0; lane < lanes; ++lane) {
                    sum += power[lane];
                    size += std::fabs(power[lane]);
                    power[lane] *= x[lane];
                }
                partial[l] += sum;
                absolute_partial[l] += size;
            }
        }
        for (std::size_t l = 0; l <= terms_; ++l) {
            sums[l].add(partial[l]);
            absolute[l].add(absolute_partial[l]);
        }
    }
    for (std::size_t l = 0; l <= terms_; ++l) {
        moment_[l] = sums[l].value();
        absolute_moment_[l] = absolute[l].value();
    }
}

double Characteristic::truncation(double distance) const {
    return size_ * series_.tail(distance / series_.radius);
}

bool Characteristic::series_serves(double distance) const {
    return distance <= farthest_reach * series_.radius && truncation(distance) <= farthest_truncation;
}

Jet Characteristic::jet(double a, double b, bool by_series) const {
    return by_series ? series_jet(a, b) : summed_jet(a, b);
}

Jet Characteristic::series_jet(double a, double b) const {
    Jet jet;
    const double x = b * largest_;
    std::vector<double> a_power(terms_ + 1, 1.0);
    std::vector<double> x_power(terms_ + 1, 1.0);
    for (std::size_t k = 1; k <= terms_; ++k) {
        a_power[k] = a_power[k - 1] * a;
        x_power[k] = x_power[k - 1] * x;
    }
    for (std::size_t k = 2; k <= terms_; ++k) {
        for (std::size_t l = 0; l <= k; ++l) {
            const std::size_t j = k - l;
            const double common = series_.c[k] * choose_[k][l] * moment_[l];
            const auto jj = static_cast<double>(j);
            const auto ll = static_cast<double>(l);
            jet.value += common * a_power[j] * x_power[l];
            jet.error += operations(k) * unit_roundoff * series_.size[k] * choose_[k][l] * absolute_moment_[l] *
                         std::fabs(a_power[j] * x_power[l]);
            jet.by_count += j < 1 ? 0 : common * jj * a_power[j - 1] * x_power[l];
            jet.by_sum += l < 1 ? 0 : common * ll * a_power[j] * x_power[l - 1] * largest_;
            jet.by_count_twice += j < 2 ? 0 : common * jj * (jj - 1) * a_power[j - 2] * x_power[l];
            jet.by_both += j < 1 || l < 1 ? 0 : common * jj * ll * a_power[j - 1] * x_power[l - 1] * largest_;
            jet.by_sum_twice += l < 2 ? 0 : common * ll * (ll - 1) * a_power[j] * x_power[l - 2] * largest_ * largest_;
        }
    }
    jet.error += truncation(std::fabs(a) + std::fabs(x));
    return jet;
}

Jet Characteristic::summed_jet(double a, double b) const {
    Jet jet;
    CompensatedSum value;
    const double p = series_.p;
    for (std::size_t g = 0; g < offsets_.size(); ++g) {
        const double y = a + b * offsets_[g];
        const auto count = static_cast<double>(items_.counts[g]);
        // log(q + p e^y) - p y, from the side on which e^y does not overflow.
        const double grown = y > 0 ? y + std::log1p((1 - p) * std::expm1(-y)) : std::log1p(p * std::expm1(y));
        const double taken = y > 0 ? p / (p + (1 - p) * std::exp(-y)) : p * std::exp(y) / (1 + p * std::expm1(y));
        value.add(count * (grown - p * y));
        jet.error += count * 8 * unit_roundoff * (std::fabs(grown) + (1 + p) * std::fabs(y));
        const double weight = count * taken * (1 - taken);
        jet.by_count += count * (taken - p);
        jet.by_sum += count * (taken - p) * offsets_[g];
        jet.by_count_twice += weight;
        jet.by_both += weight * offsets_[g];
        jet.by_sum_twice += weight * offsets_[g] * offsets_[g];
    }
    jet.value = value.value();
    return jet;
}

std::vector<double> Characteristic::tilted_weights(double a, double b) const {
    std::vector<double> weights;
    weights.reserve(offsets_.size());
    for (std::size_t g = 0; g < offsets_.size(); ++g) {
        const double odds = series_.p / (1 - series_.p) * std::exp(a + b * offsets_[g]);
        weights.push_back(static_cast<double>(items_.counts[g]) * (odds > 1 ? 1 / odds : odds) /
                          ((1 + (odds > 1 ? 1 / odds : odds)) * (1 + (odds > 1 ? 1 / odds : odds))));
    }
    return weights;
}

Characteristic::Row Characteristic::row(Complex b, bool count_free) const {
    const Complex x = b * largest_;
    const double size = std::abs(x);
    Row row;
    const std::size_t last = count_free ? terms_ : 0;
    row.coefficients.assign(last + 1, 0.0);
    row.errors.assign(last + 1, 0.0);
    Complex power = 1;
    double absolute_power = 1;
    for (std::size_t l = 0; l <= terms_; ++l) {
        const Complex factor = power * moment_[l];
        const double absolute_factor = absolute_power * absolute_moment_[l] * unit_roundoff;
        for (std::size_t j = 0; j <= std::min(last, terms_ - l); ++j) {
            row.coefficients[j] += series_.c[j + l] * choose_[j + l][l] * factor;
            row.errors[j] += operations(j + l) * series_.size[j + l] * choose_[j + l][l] * absolute_factor;
        }
        power *= x;
        absolute_power *= size;
    }
    return row;
}

Complex Characteristic::Row::at(Complex a) const {
    Complex value = 0;
    for (std::size_t j = coefficients.size(); j-- > 0;) {
        // Written out: the operator of std::complex also looks for infinities.
        const Complex c = coefficients[j];
        value = {value.real() * a.real() - value.imag() * a.imag() + c.real(),
                 value.real() * a.imag() + value.imag() * a.real() + c.imag()};
    }
    return value;
}

double Characteristic::Row::error_at(double a) const {
    double value = 0;
    for (std::size_t j = errors.size(); j-- > 0;) {
        value = value * a + errors[j];
    }
    return value;
}

} // namespace rankstead
