// The three streams of the command.
#pragma once

#include <istream>
#include <ostream>

namespace rankstead::client {

struct Console {
    std::istream& in;
    std::ostream& out;
    std::ostream& err;
};

} // namespace rankstead::client
