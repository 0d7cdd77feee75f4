// The null law of the sign test: the number above out of n follows the binomial law with probability one half.
#pragma once

#include "tails.h"

#include <cstdint>

namespace rankstead {

// Both tails at `above`, 0 <= above <= n: counted for n <= 62, else by the incomplete beta function of Boost.Math.
[[nodiscard]] Tails sign_tails(std::int64_t n, std::int64_t above);

} // namespace rankstead
