// Runs the command `rankstead` as a user does: as a process of its own, in the folder of the invented data.
#pragma once

#include <gtest/gtest.h>

#include <string>
#include <vector>

namespace rankstead::client_tests {

struct Outcome {
    int status; // -1 if it did not exit by itself
    std::string out, err;
};

Outcome rankstead(const std::vector<std::string>& arguments, const std::string& input = "");

// The only line of a text, as a number.
double as_number(const std::string& text);

testing::AssertionResult contains(const std::string& text, const std::string& part);

// The run ended with this status, printed nothing on standard output, and one message that contains every part.
testing::AssertionResult refused(const Outcome& outcome, int status, const std::vector<std::string>& parts);

} // namespace rankstead::client_tests
