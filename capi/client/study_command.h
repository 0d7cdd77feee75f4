// A study as a sub-command.
#pragma once

#include "catalogue.h"
#include "console.h"
#include "failure.h"

#include <string>
#include <vector>

namespace rankstead::client {

Exit run_study(const Study& study, const std::vector<std::string>& arguments, const Console& console);

} // namespace rankstead::client
