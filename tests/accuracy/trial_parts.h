// What the trials of both statistics share.
#pragma once

#include "shapes.h"

#include <cmath>

namespace rankstead::accuracy {

inline constexpr double seconds_for_a_law = 0.5;
inline constexpr double seconds_for_a_small_law = 0.05; // by inversion
// Predicted: here the chooser takes the dynamic programme, so that inversion has to be asked by itself.
inline constexpr double seconds_of_a_small_law = 0.013;

[[nodiscard]] inline int laws_of(int all, const Effort& effort) {
    return static_cast<int>(std::ceil(all * effort.share_of_laws));
}

// Inversion by itself, at a sum in the lower half. It may give nothing, but nothing beyond its bound.
template <class Inversion>
void try_inversion(Tally& tally, const Inversion& inversion, std::int64_t sum, const BigTails& exact,
                   const std::string& which) {
    ++tally.by_inversion;
    if (const auto tail = inversion.at(sum, seconds_for_a_small_law)) {
        tally.compare_lower(tail->lower, tail->relative_error, exact, which);
    } else {
        ++tally.inversion_gave_none;
    }
}

} // namespace rankstead::accuracy
