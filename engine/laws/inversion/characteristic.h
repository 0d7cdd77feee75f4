// The joint law of how many of the items are taken and of the sum of their scores, every item independently with
// probability p: T(a, b) = log E exp(a (count - Np) + b (sum - mean)), at real and complex arguments, with bounds on
// the rounding. Two ways: as power series in a and b, whose coefficients are power sums of the scores computed once,
// where the arguments are within reach; else item by item.
//
// Rounding. u is half the machine epsilon. In the series a term of degree k passes through at most 8k + 64 roundings of
// its own size (offsets and their powers 4l, complex powers 3l, Horner 4j, binomial k, blocks of 32 and the rest 64),
// so its error is at most (8k + 64) u times the sum of the absolute terms (Higham 2002, section 3.1). In a product a
// factor q + p e^y is off by at most 80u absolutely (60 of them for its phase, see group_phases.h), 80u/|factor|
// relatively, and each complex multiplication by 3u more (Brent, Percival & Zimmermann 2007: sqrt(5) u).
#pragma once

#include "bernoulli_series.h"
#include "contour_parts.h"
#include "scored_items.h"

#include <complex>
#include <cstdint>
#include <optional>
#include <vector>

namespace rankstead {

// T and its derivatives at a real point, with a bound on the error of the value.
struct Jet {
    double value = 0;
    double by_count = 0;
    double by_sum = 0;
    double by_count_twice = 0;
    double by_both = 0;
    double by_sum_twice = 0;
    double error = 0;
};

class Characteristic {
public:
    // `centred`: the sum is taken about its mean given the count (free count); else about its mean alone.
    Characteristic(ScoredItems items, double p, bool centred);

    [[nodiscard]] const ScoredItems& items() const { return items_; }
    [[nodiscard]] double size() const { return size_; }
    [[nodiscard]] double p() const { return series_.p; }
    [[nodiscard]] const std::vector<double>& offsets() const { return offsets_; } // scores about their centre
    [[nodiscard]] double largest_offset() const { return largest_; }
    [[nodiscard]] double sum_of_squares() const { return moment_[2] * largest_ * largest_; }

    // Whether the series serves for |a| + |b| * largest_offset up to `distance`, and with what relative truncation.
    [[nodiscard]] bool series_serves(double distance) const;
    [[nodiscard]] double truncation(double distance) const;

    [[nodiscard]] Jet jet(double a, double b, bool by_series) const;

    // p_g (1 - p_g) * count at the tilt, for each group.
    [[nodiscard]] std::vector<double> tilted_weights(double a, double b) const;

    // For one b, T as a polynomial in a. `count_free` false keeps only a = 0.
    struct Row {
        std::vector<Complex> coefficients;
        std::vector<double> errors; // coefficients of the error bound, a polynomial in |a|
        [[nodiscard]] Complex at(Complex a) const;
        [[nodiscard]] double error_at(double a) const;
    };
    [[nodiscard]] Row row(Complex b, bool count_free) const;

private:
    void sum_powers();
    [[nodiscard]] Jet series_jet(double a, double b) const;
    [[nodiscard]] Jet summed_jet(double a, double b) const;

    ScoredItems items_;
    double size_;
    std::size_t terms_; // the arguments that matter are the smaller, the more items there are
    BernoulliSeries series_;
    std::vector<double> offsets_;
    double largest_ = 0;
    std::vector<double> moment_;          // sum of count * (offset / largest)^l
    std::vector<double> absolute_moment_; // the same of absolute values
    std::vector<std::vector<double>> choose_;
};

inline constexpr double unit_roundoff = 1.1102230246251565e-16;

} // namespace rankstead
