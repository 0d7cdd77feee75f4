// The null laws by themselves, as the sub-commands tail and critical.
#pragma once

#include "console.h"
#include "failure.h"

#include <string>
#include <vector>

namespace rankstead::client {

// rankstead tail LAW --sizes --statistic S [--side SIDE]: the probability of a statistic at least as extreme.
Exit run_tail(const std::vector<std::string>& arguments, const Console& console);

// rankstead critical LAW --sizes --alpha A [--side SIDE]: the statistic at which that probability reaches a level.
Exit run_critical(const std::vector<std::string>& arguments, const Console& console);

} // namespace rankstead::client
