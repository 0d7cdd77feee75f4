// decimal.h: a double is the decimal that it prints to at 15 significant digits.
#include "decimal.h"

#include <gtest/gtest.h>

#include <cmath>
#include <limits>

namespace rankstead {
namespace {

TEST(DecimalFromDouble, is_what_the_number_prints_to_at_fifteen_digits) {
    EXPECT_EQ(Decimal::from_double(0.1), (Decimal{1, -1}));
    EXPECT_EQ(Decimal::from_double(12.5), (Decimal{125, -1}));
    EXPECT_EQ(Decimal::from_double(-0.000123), (Decimal{-123, -6}));
    EXPECT_EQ(Decimal::from_double(6.02214076e23), (Decimal{602214076, 15}));
}

// 0.1 + 0.2 is 0.3000000000000000444 in binary (IEEE 754).
TEST(DecimalFromDouble, forgets_the_binary_rounding_of_a_sum) {
    ASSERT_NE(0.1 + 0.2, 0.3);
    EXPECT_EQ(Decimal::from_double(0.1 + 0.2), Decimal::from_double(0.3));
    EXPECT_EQ(Decimal::from_double(0.3 - 0.1), Decimal::from_double(0.9 - 0.7));
}

TEST(DecimalFromDouble, keeps_what_differs_in_the_fifteenth_digit) {
    EXPECT_NE(Decimal::from_double(1.00000000000001), Decimal::from_double(1.00000000000002));
    EXPECT_EQ(Decimal::from_double(1.0000000000000002), Decimal::from_double(1.0));
}

TEST(DecimalFromDouble, takes_minus_zero_for_zero) {
    EXPECT_EQ(Decimal::from_double(-0.0), Decimal{});
    EXPECT_FALSE(std::signbit(Decimal::from_double(-0.0).to_double()));
}

TEST(DecimalFromDouble, has_no_trailing_zeros) {
    EXPECT_EQ(Decimal::from_double(1000), (Decimal{1, 3}));
    EXPECT_EQ(Decimal::from_double(0.50), (Decimal{5, -1}));
}

TEST(DecimalFromDouble, holds_the_ends_of_the_range) {
    const double largest = std::numeric_limits<double>::max(); // 1.7976931348623157e308
    EXPECT_EQ(Decimal::from_double(1e308), (Decimal{1, 308}));
    EXPECT_EQ(Decimal::from_double(largest), (Decimal{179769313486232, 294}));
    // The smallest double is 4.94065645841246544e-324.
    EXPECT_EQ(Decimal::from_double(5e-324), (Decimal{494065645841247, -338}));
}

// Whole tenths, hundredths ... of every size: the short cut and the printed digits must agree.
TEST(DecimalFromDouble, agrees_with_the_decimal_a_number_was_written_as) {
    for (std::int64_t coefficient = 1; coefficient < 1'000'000; coefficient += 977) {
        for (std::int32_t exponent = -12; exponent <= 2; ++exponent) {
            const double written = nearest_double(std::to_string(coefficient), exponent);
            const Decimal read = Decimal::from_double(written);
            Decimal expected{coefficient, exponent};
            while (expected.coefficient % 10 == 0) {
                expected = {expected.coefficient / 10, expected.exponent + 1};
            }
            ASSERT_EQ(read, expected) << coefficient << "e" << exponent;
        }
    }
}

TEST(DecimalToDouble, gives_back_every_double_of_fifteen_digits) {
    for (const double value : {0.1, -2.5, 1e-300, 1e300, 123456789012345.0, 0.000271828182845905, 5e-324}) {
        EXPECT_EQ(Decimal::from_double(value).to_double(), value);
    }
}

TEST(DecimalFromText, reads_plain_and_scientific_numbers) {
    EXPECT_EQ(Decimal::from_text("12"), (Decimal{12, 0}));
    EXPECT_EQ(Decimal::from_text("-3.5"), (Decimal{-35, -1}));
    EXPECT_EQ(Decimal::from_text("+1e-3"), (Decimal{1, -3}));
    EXPECT_EQ(Decimal::from_text(".5"), (Decimal{5, -1}));
    EXPECT_EQ(Decimal::from_text("5."), (Decimal{5, 0}));
}

TEST(DecimalFromText, ignores_spaces_around) {
    EXPECT_EQ(Decimal::from_text("\t 7 \xC2\xA0"), (Decimal{7, 0}));
}

TEST(DecimalFromText, takes_the_decimal_sign_it_is_given_and_no_other) {
    EXPECT_EQ(Decimal::from_text("3,5", ','), (Decimal{35, -1}));
    EXPECT_FALSE(Decimal::from_text("3.5", ','));
    EXPECT_FALSE(Decimal::from_text("3,5", '.'));
    EXPECT_FALSE(Decimal::from_text("1,024", '.'));
}

TEST(DecimalFromText, refuses_everything_else) {
    for (const char* words :
         {"", " ", ".", "-", "e5", "1e", "1e+", "1.2.3", "1 2", "0x10", "inf", "nan", "1e999", "--1", "<0.5", "5 mg"}) {
        EXPECT_FALSE(Decimal::from_text(words)) << words;
    }
}

TEST(DecimalToText, is_the_shortest_with_a_point) {
    EXPECT_EQ((Decimal{95, -2}).to_text(), "0.95");
    EXPECT_EQ((Decimal{-12, 0}).to_text(), "-12");
    EXPECT_EQ((Decimal{}).to_text(), "0");
    EXPECT_EQ((Decimal{1, 300}).to_text(), "1e+300");
}

TEST(DigitCount, counts_decimal_digits) {
    EXPECT_EQ(digit_count(0), 1);
    EXPECT_EQ(digit_count(9), 1);
    EXPECT_EQ(digit_count(-10), 2);
    EXPECT_EQ(digit_count(999999999999999), 15);
}

TEST(NearestDouble, rounds_once) {
    EXPECT_EQ(nearest_double("3", -1), 0.3);
    // 2^53 + 1 lies midway between two doubles; ties go to the even one (IEEE 754).
    EXPECT_EQ(nearest_double("9007199254740993", 0), 9007199254740992.0);
    EXPECT_EQ(nearest_double("90071992547409930000001", -7), 9007199254740994.0);
}

TEST(NearestDouble, beyond_the_range_is_infinite_and_never_zero) {
    EXPECT_EQ(nearest_double("2", 308), std::numeric_limits<double>::infinity());
    EXPECT_EQ(nearest_double("-2", 308), -std::numeric_limits<double>::infinity());
}

TEST(NearestDouble, below_the_range_is_zero) {
    EXPECT_EQ(nearest_double("1", -400), 0.0);
}

TEST(ShortestText, reads_back_as_the_same_double) {
    EXPECT_EQ(shortest_text(0.1), "0.1");
    EXPECT_EQ(shortest_text(-0.0), "0");
    EXPECT_EQ(shortest_text(0.1 + 0.2), "0.30000000000000004");
}

TEST(Trimmed, takes_off_every_kind_of_space_at_both_ends) {
    EXPECT_EQ(trimmed(" \t\r\na b\xC2\xA0 \xC2\xA0"), "a b");
    EXPECT_EQ(trimmed(" \xC2\xA0\t"), "");
    EXPECT_EQ(trimmed(""), "");
}

} // namespace
} // namespace rankstead
