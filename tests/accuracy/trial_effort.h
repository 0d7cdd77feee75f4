// How much of the trial a build runs: all of it, or what sanitizers leave time for.
#pragma once

#include "shapes.h"

namespace rankstead::accuracy {

[[nodiscard]] inline Effort trial_effort() {
#ifdef RANKSTEAD_SMALL_TRIAL
    return {0.1, 3e7};
#else
    return {};
#endif
}

} // namespace rankstead::accuracy
