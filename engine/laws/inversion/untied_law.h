// The rank statistics without ties or zeros, whose generating functions are products over whole numbers:
//     signed rank of n:          G(z) = prod over a = 1 to n of (1 + z^a) / 2,
//     rank sum of m against n:   G(z) = prod over i = 1 to m of (1 - z^(n+i)) / (1 - z^i), over C(m + n, m)
// (Andrews 1976). On the contour z = exp(-(lambda - it)) they come from the power series of engine/laws/inversion/
// even_series.h where it converges, else factor by factor.
//
// Frequencies that need no evaluation. With r = e^(-lambda):
//   - |1 + z^a| falls in t up to pi / a. |1 - z^b| / |1 - z^a| with b > a falls while b^2 (lambda^2 + t^2) / 4 < pi^2 /
//   3:
//     its logarithmic derivative is g(b) - g(a), g(a) = Im(a coth(a (lambda - it) / 2)), and by partial fractions of
//     coth g falls in a there. So |G| falls up to `monotone_to`.
//   - Beyond, weights w = p (1 - p) of items taken with the tilted probabilities p, and  log |G| <= C - (sum of w (1 -
//   cos))
//     as for laws with ties (frequency_screen.h). The weights rise and then fall, so their Fourier transform is at most
//     w_max / sin(t / 2) (summation by parts), and less than V, their sum, for all larger t at once. For the rank sum,
//     the number of items taken is conditioned on; it has its mode at its mean m (Darroch 1964), so its probability is
//     at least (3/4) / (4 sqrt(V) + 1), by Chebyshev's inequality.
//   - Few factors prove too little that way, but can be looked at over a range of t at once: in the rank sum
//     |1 - z^b| <= 1 + r^b, and |1 - z^a|^2 = (1 - r^a)^2 + 4 r^a sin^2(at/2), where the sine is least at an end of the
//     range or 0 within it.
#pragma once

#include "even_series.h"
#include "jet.h"

#include <complex>
#include <cstdint>
#include <vector>

namespace rankstead {

class UntiedLaw {
public:
    static UntiedLaw signed_rank(std::int64_t n);
    static UntiedLaw rank_sum(std::int64_t m, std::int64_t n);

    [[nodiscard]] std::int64_t highest() const { return highest_; } // the statistic lies in 0 to this
    [[nodiscard]] double variance() const { return variance_; }
    [[nodiscard]] double factors() const { return static_cast<double>(m_); }
    [[nodiscard]] bool series_serves(double size_of_h) const { return series_.serves(size_of_h); }

    [[nodiscard]] SumJet jet(double h) const;

    // G(z) / G(e^-lambda) z^-w e^(-lambda w) at t = 2 pi j / points, and a bound on its error.
    struct Point {
        std::complex<double> value;
        double error = 0;
    };

    // The law at one tilt.
    class Tilted {
    public:
        Tilted(const UntiedLaw& law, double lambda, std::int64_t w, std::int64_t points);

        [[nodiscard]] Point at(std::int64_t j) const;
        [[nodiscard]] bool by_series(std::int64_t j) const;
        [[nodiscard]] double monotone_to() const { return monotone_to_; }
        // A lower bound on -log |G(z) / G(e^-lambda)| that holds from t to pi.
        [[nodiscard]] double decay_from(double t) const;
        // One that holds from t1 to t2; of the rank sum only, else 0.
        [[nodiscard]] double decay_within(double t1, double t2) const;

    private:
        [[nodiscard]] double angle(std::int64_t j) const;
        [[nodiscard]] Point from_series(std::int64_t j) const;
        [[nodiscard]] Point from_product(std::int64_t j) const;
        void fill_denominators() const;

        const UntiedLaw& law_;
        double lambda_;
        std::int64_t w_;
        std::int64_t points_;
        double distance_;
        SumJet jet_;
        double monotone_to_;
        double total_weight_ = 0;
        double largest_weight_ = 0;
        double log_condition_ = 0;
        mutable std::vector<double> real_; // |factor| at t = 0
    };

private:
    enum class Kind { signed_rank, rank_sum };
    UntiedLaw(Kind kind, std::int64_t m, std::int64_t n, EvenSeries series);

    [[nodiscard]] SumJet summed_jet(double h) const;

    Kind kind_;
    std::int64_t m_; // factors
    std::int64_t n_; // 0 for the signed rank
    std::int64_t highest_;
    double variance_;
    EvenSeries series_;
};

} // namespace rankstead
