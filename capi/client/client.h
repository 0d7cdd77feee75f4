// The command `rankstead`, without its process.
#pragma once

#include "console.h"
#include "failure.h"

#include <string>
#include <vector>

namespace rankstead::client {

// Does what the arguments, without the name of the program, ask for. Never throws: failures become a message on the
// error stream and an exit status.
Exit run_client(const std::vector<std::string>& arguments, const Console& console) noexcept;

} // namespace rankstead::client
