// How the client ends when it cannot do what was asked.
#pragma once

#include "rankstead.h"

#include <stdexcept>
#include <string>

namespace rankstead::client {

// Exit statuses. `usage`: the command has to be changed. `data`: the file has to be changed, or a number that was
// asked for does not exist. `fault`: neither would help.
enum class Exit : int { done = 0, fault = 1, usage = 2, data = 3 };

class Failure : public std::runtime_error {
public:
    Failure(Exit exit, const std::string& message) : std::runtime_error(message), exit_(exit) {}
    Exit exit() const noexcept { return exit_; }

private:
    Exit exit_;
};

inline Failure usage_failure(const std::string& message) {
    return {Exit::usage, message};
}
inline Failure data_failure(const std::string& message) {
    return {Exit::data, message};
}

// The exit status that a status of the library leads to.
Exit exit_for(rks_status status) noexcept;

} // namespace rankstead::client
