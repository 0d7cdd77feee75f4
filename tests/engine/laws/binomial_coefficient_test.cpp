// laws/binomial_coefficient.h
#include "laws/binomial_coefficient.h"

#include "big_laws.h"

#include <gtest/gtest.h>

#include <vector>

namespace rankstead {
namespace {

// Rows of Pascal's triangle; sums of 2^127 and more stay at 2^127.
std::vector<UInt128> next_row(const std::vector<UInt128>& row) {
    constexpr UInt128 limit = UInt128{1} << 127;
    std::vector<UInt128> next{1};
    for (std::size_t k = 1; k < row.size(); ++k) {
        next.push_back(row[k - 1] >= limit - row[k] ? limit : row[k - 1] + row[k]);
    }
    next.push_back(1);
    return next;
}

TEST(ExactChoose, agrees_with_pascals_triangle_below_2_to_the_127_and_is_empty_beyond) {
    constexpr UInt128 limit = UInt128{1} << 127;
    std::vector<UInt128> row{1};
    for (std::int64_t n = 0; n <= 140; ++n) {
        for (std::int64_t k = 0; k <= n; ++k) {
            const UInt128 expected = row[static_cast<std::size_t>(k)];
            const auto got = exact_choose(n, k);
            ASSERT_EQ(got.has_value(), expected < limit) << n << " " << k;
            ASSERT_TRUE(!got || *got == expected) << n << " " << k;
        }
        row = next_row(row);
    }
}

TEST(ExactChoose, of_large_sizes_that_stay_small) {
    EXPECT_TRUE(exact_choose(1'000'000'000, 1) == UInt128{1'000'000'000});
    EXPECT_TRUE(exact_choose(100'000, 99'998) == UInt128{100'000} * 99'999 / 2);
}

TEST(DoubleChoose, is_right_to_a_few_roundings) {
    for (const std::size_t n : {10U, 130U, 200U, 500U, 1000U}) {
        for (const std::size_t k : {1U, 5U, 10U}) {
            EXPECT_LT(test::relative_error(double_choose(static_cast<std::int64_t>(n), static_cast<std::int64_t>(k)),
                                           test::big_choose(n, k), 1),
                      1e-15);
        }
        EXPECT_LT(test::relative_error(double_choose(static_cast<std::int64_t>(n), static_cast<std::int64_t>(n / 2)),
                                       test::big_choose(n, n / 2), 1),
                  1e-15);
    }
}

// C(10, 5) = 252, C(1000, 500) = 2.7028824094543657e299 (from the unbounded integer).
TEST(Log2Choose, is_the_binary_logarithm) {
    EXPECT_NEAR(log2_choose(10, 5), std::log2(252.0), 1e-12);
    EXPECT_NEAR(log2_choose(1000, 500), std::log2(2.7028824094543657e299), 1e-9);
    EXPECT_NEAR(log2_choose(7, 0), 0, 1e-12);
}

} // namespace
} // namespace rankstead
