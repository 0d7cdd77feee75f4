// The sum over the frequencies of a contour, and the tail and the mass that follow, with a bound on everything.
#pragma once

#include "../compensated_sum.h"
#include "certified_inversion.h"
#include "contour_lattice.h"
#include "frequency_screen.h"

#include <cstdint>
#include <optional>

namespace rankstead {

// The height of the contour is exp(cumulant + lambda * distance) / (1 - e^-lambda) / P(count): everything else is
// relative to it.
struct ContourHeight {
    double lambda = 0;
    double distance = 0; // w less the mean
    double cumulant = 0; // T at the tilt
    double cumulant_error = 0;
    double log_count = 0; // log P(count)

    [[nodiscard]] double log_kernel() const; // log(1 - e^-lambda)
    [[nodiscard]] double log() const;
    [[nodiscard]] double error() const; // relative, of the height
};

class ContourSum {
public:
    explicit ContourSum(double lambda) : lambda_(lambda) {}

    // The value at t, or the sum of so many values there, off by at most `rounding`; `multiple` is 2 where -t is not
    // added as well.
    void add(double t, double multiple, Complex value, double rounding, std::int64_t frequencies);

    // What is left out is at most exp(-need) at each frequency. Empty where the bound would not be useful.
    [[nodiscard]] std::optional<CertifiedTail> result(const ContourHeight& height, const ContourLattice& lattice,
                                                      const Need& need) const;

private:
    double lambda_;
    CompensatedSum cumulative_;
    CompensatedSum mass_;
    double rounding_ = 0;
    double mass_rounding_ = 0;
    std::int64_t frequencies_ = 0;
};

} // namespace rankstead
