#include "process.h"

#include <gtest/gtest.h>

#include <stdexcept>

namespace calc_tests {
namespace {

using std::chrono::seconds;

TEST(Process, EndsWithItsStatus) {
    Process process({"/bin/sh", "-c", "exit 7"}, seconds(60));
    ASSERT_TRUE(process.ended_within(seconds(30)));
    EXPECT_EQ(process.exit_status(), 7);
    EXPECT_FALSE(process.running());
}

TEST(Process, IsKilledWhenItsTimeIsOver) {
    Process process({"/bin/sh", "-c", "sleep 600; exit 7"}, seconds(1));
    EXPECT_TRUE(process.running());
    EXPECT_FALSE(process.ended_within(seconds(0)));
    ASSERT_TRUE(process.ended_within(seconds(30)));
    EXPECT_EQ(process.exit_status(), -1);
}

TEST(Process, WhatIsNotThereCannotBeStarted) {
    EXPECT_THROW(Process({"/nowhere/soffice.bin"}, seconds(60)), std::runtime_error);
}

} // namespace
} // namespace calc_tests
