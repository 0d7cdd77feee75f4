// Exact tails of a rank statistic at any size, by inverting its characteristic function on a tilted contour, with a
// bound on the relative error that covers everything: aliasing, frequencies left out, and rounding.
//
// With F(v) = P(count = m, sum <= v) and z = exp(-(lambda - i t)), the sum over a lattice of Ns x Nt frequencies (s, t)
//     (1 / (Ns Nt)) sum of exp(T(a + is, -(lambda - it)) + (lambda - it) w) / (1 - z)  =
//     sum over k, l of P(count = m + k Ns, sum <= w + l Nt) exp(a k Ns - lambda l Nt)
// holds exactly for any tilt (a, lambda > 0): the term k = l = 0 is F(w), all others are positive, and Chernoff's
// inequality at other tilts bounds them. The tilt is the saddlepoint (Daniels 1954; Lugannani & Rice 1980), where the
// sum has least cancellation, with lambda at least two standard deviations' reciprocal.
// Signed rank: no condition on the count, Ns = 1.
#pragma once

#include "characteristic.h"

#include <cstdint>
#include <optional>

namespace rankstead {

struct CertifiedTail {
    double lower = 0;          // P(sum <= w)
    double mass = 0;           // P(sum = w)
    double relative_error = 0; // bound, of lower
    double mass_error = 0;     // absolute bound, of mass
    std::int64_t frequencies = 0;
};

// What is conditioned on.
enum class Count { free, fixed };

class CertifiedInversion {
public:
    // Signed rank: each score is added with probability one half.
    static CertifiedInversion of_signs(ScoredItems items);
    // Rank sum: `chosen` of the items are taken, 0 < chosen < size.
    static CertifiedInversion of_choice(ScoredItems items, std::int64_t chosen);

    // Both at w, an integer not above the mean. Empty where no useful bound can be given within the work allowed.
    [[nodiscard]] std::optional<CertifiedTail> at(std::int64_t w, double seconds_allowed) const;

private:
    CertifiedInversion(ScoredItems items, double p, Count count, std::int64_t chosen);

    Characteristic characteristic_;
    Count count_;
    std::int64_t chosen_;
};

} // namespace rankstead
