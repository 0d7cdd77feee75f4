// estimates/description.h: median and quartiles.
#include "estimates/description.h"

#include <gtest/gtest.h>

namespace rankstead {
namespace {

Description of(std::vector<std::int64_t> sorted, std::int32_t exponent = 0) {
    Grid grid;
    grid.cover(Decimal{1, exponent});
    return describe(sorted, grid);
}

void expect(const Description& description, double lower, double median, double upper) {
    EXPECT_EQ(description.lower_quartile, lower);
    EXPECT_EQ(description.median, median);
    EXPECT_EQ(description.upper_quartile, upper);
}

// Hyndman & Fan (1996), definition 7, by hand: at (n - 1) q from the lowest.
TEST(Describe, interpolates_between_neighbours) {
    expect(of({7}), 7, 7, 7);
    expect(of({1, 2}), 1.25, 1.5, 1.75);
    expect(of({1, 2, 4}), 1.5, 2, 3);
    expect(of({1, 2, 4, 8}), 1.75, 3, 5);
    expect(of({1, 2, 4, 8, 16}), 2, 4, 8);
}

// The example of the documentation of the spreadsheet's QUARTILE, 1 2 4 7 8 9 10 12: 3.5, 7.5, 9.25.
TEST(Describe, agrees_with_the_spreadsheets_own_quartile) {
    expect(of({1, 2, 4, 7, 8, 9, 10, 12}), 3.5, 7.5, 9.25);
}

TEST(Describe, rounds_once_from_the_decimal) {
    expect(of({1, 2}, -1), 0.125, 0.15, 0.175);
}

TEST(Describe, of_values_near_the_end_of_the_range_does_not_overflow) {
    Grid grid;
    grid.cover(Decimal{1, 308});
    const Description description = describe(std::vector<BigInt>{BigInt(1), BigInt(1)}, grid);
    expect(description, 1e308, 1e308, 1e308);
}

} // namespace
} // namespace rankstead
