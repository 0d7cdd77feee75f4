// laws/compensated_sum.h
#include "laws/compensated_sum.h"

#include <gtest/gtest.h>

namespace rankstead {
namespace {

double sum_of(std::initializer_list<double> terms) {
    CompensatedSum sum;
    for (const double term : terms) {
        sum.add(term);
    }
    return sum.value();
}

TEST(CompensatedSum, keeps_a_small_term_between_large_ones) {
    EXPECT_EQ(sum_of({1e100, 1.0, -1e100}), 1.0);
    EXPECT_EQ(sum_of({1.0, 1e100, 1.0, -1e100}), 2.0); // the example of Neumaier (1974)
}

// The mean of a million tenths: plain summation is off by 1.3e-6 of a tenth.
TEST(CompensatedSum, does_not_drift) {
    CompensatedSum sum;
    for (int i = 0; i < 1'000'000; ++i) {
        sum.add(0.1);
    }
    EXPECT_EQ(sum.value(), 100000.0);
}

TEST(CompensatedSum, of_nothing_is_zero) {
    EXPECT_EQ(sum_of({}), 0.0);
}

} // namespace
} // namespace rankstead
