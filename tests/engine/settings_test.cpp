// settings.h: levels as the fractions they are written as.
#include "settings.h"

#include <gtest/gtest.h>

namespace rankstead {
namespace {

__extension__ typedef __int128 Int128Product;

void expect_equal(const Fraction& fraction, std::int64_t numerator, std::int64_t denominator) {
    EXPECT_EQ(static_cast<Int128Product>(fraction.numerator) * denominator,
              static_cast<Int128Product>(numerator) * fraction.denominator)
        << fraction.numerator << "/" << fraction.denominator;
}

TEST(AsFraction, is_exact) {
    expect_equal(as_fraction({5, -2}), 1, 20);
    expect_equal(as_fraction({1, 0}), 1, 1);
    expect_equal(as_fraction({}), 0, 1);
    expect_equal(as_fraction({999999999999999, -15}), 999999999999999, 1000000000000000);
}

TEST(AsFraction, cuts_off_digits_beyond_the_eighteenth_decimal) {
    expect_equal(as_fraction({123456, -20}), 1234, 1000000000000000000);
    expect_equal(as_fraction({5, -300}), 0, 1);
}

TEST(ErrorRate, of_level_0_9_is_one_tenth_exactly) {
    Settings settings;
    settings.level = {9, -1};
    expect_equal(error_rate(settings), 1, 10);
}

TEST(TailRate, is_half_the_error_rate_two_sided) {
    const Settings settings;
    expect_equal(tail_rate(settings), 1, 40);
}

TEST(TailRate, is_all_of_the_error_rate_one_sided) {
    Settings settings;
    settings.side = Side::lower;
    expect_equal(tail_rate(settings), 1, 20);
}

TEST(Settings, stand_at_their_defaults) {
    const Settings settings;
    EXPECT_EQ(settings.side, Side::two_sided);
    EXPECT_EQ(settings.level, Decimal::from_double(0.95));
    EXPECT_EQ(settings.zeros, Zeros::drop);
    EXPECT_EQ(settings.method, Method::automatic);
    EXPECT_EQ(settings.interval, IntervalRule::matching);
    EXPECT_EQ(settings.numbers, NumberTexts::refused);
}

} // namespace
} // namespace rankstead
