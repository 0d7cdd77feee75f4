// Estimate and classical limits of a shift, from samples in order: what the study `groups` finds with interval=table.
#pragma once

#include "sampled_data.h"

namespace rankstead::bench {

struct ShiftLimits {
    std::int64_t twice_estimate = 0;
    std::int64_t lower = 0;
    std::int64_t upper = 0;
};

// Throws LawTooLong.
[[nodiscard]] ShiftLimits shift_limits(const TwoSamples& samples);

} // namespace rankstead::bench
