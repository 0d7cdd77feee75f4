// grid.h: decimals on one power of ten, so that arithmetic is exact.
#include "grid.h"

#include <gtest/gtest.h>

#include <type_traits>

namespace rankstead {
namespace {

Grid covering(std::vector<Decimal> values) {
    Grid grid;
    grid.cover(values);
    return grid;
}

TEST(Grid, takes_the_finest_power_of_ten_among_the_values) {
    const Grid grid = covering({{25, -1}, {3, 2}, {-7, -3}});
    EXPECT_EQ(grid.exponent, -3);
    EXPECT_EQ(grid.digits, 6); // 300 is 300000 thousandths
}

TEST(Grid, is_not_changed_by_zeros) {
    EXPECT_EQ(covering({{}, {12, 3}, {}}).exponent, 3);
}

TEST(OnGrid, scales_values_to_integers) {
    const std::vector<Decimal> values{{25, -1}, {3, 1}, {}, {-4, 0}};
    EXPECT_EQ(on_grid<std::int64_t>(values, covering(values)), (std::vector<std::int64_t>{25, 300, 0, -40}));
}

TEST(OffGrid, undoes_the_scaling) {
    const Grid grid = covering({{25, -1}});
    EXPECT_EQ(off_grid(std::int64_t{25}, 0, grid), 2.5);
    EXPECT_EQ(off_grid(std::int64_t{25}, 1, grid), 1.25);
    EXPECT_EQ(off_grid(std::int64_t{-25}, 2, grid), -0.625);
}

// (0.1 + 0.2) / 2 is 0.15 in decimal; in doubles 0.15000000000000002.
TEST(OffGrid, rounds_a_mean_once) {
    const Grid grid = covering({{1, -1}, {2, -1}});
    EXPECT_EQ(off_grid(std::int64_t{3}, 1, grid), 0.15);
}

template <class Expected>
bool chooses(const Grid& grid) {
    return with_integers(grid, []<class Int>() { return std::is_same_v<Int, Expected>; });
}

TEST(WithIntegers, takes_64_bits_to_seventeen_digits) {
    EXPECT_TRUE(chooses<std::int64_t>(covering({{123456789012345, 0}})));
    EXPECT_TRUE(chooses<std::int64_t>(covering({{1, 16}, {1, 0}})));
    EXPECT_FALSE(chooses<std::int64_t>(covering({{1, 17}, {1, 0}})));
}

TEST(WithIntegers, takes_128_bits_to_thirty_six_digits) {
    EXPECT_TRUE(chooses<Int128>(covering({{1, 17}, {1, 0}})));
    EXPECT_TRUE(chooses<Int128>(covering({{1, 35}, {1, 0}})));
    EXPECT_FALSE(chooses<Int128>(covering({{1, 36}, {1, 0}})));
}

TEST(WithIntegers, takes_unbounded_integers_for_1e308_beside_5e_324) {
    EXPECT_TRUE(chooses<BigInt>(covering({Decimal::from_double(1e308), Decimal::from_double(5e-324)})));
}

TEST(OnGrid, keeps_1e308_and_5e_324_exactly) {
    const Decimal large = Decimal::from_double(1e308);
    const Decimal small = Decimal::from_double(5e-324);
    const Grid grid = covering({large, small});
    const auto sum = BigInt(on_grid<BigInt>(large, grid) + on_grid<BigInt>(small, grid));
    EXPECT_EQ(BigInt(sum - on_grid<BigInt>(large, grid)), BigInt(494065645841247));
}

} // namespace
} // namespace rankstead
