// Integers from their remainders.
#include "moduli.h"

#include <gtest/gtest.h>

#include <numeric>

namespace rankstead::accuracy {
namespace {

TEST(CoprimeModuli, have_no_common_divisor_and_exceed_the_bits_asked_for) {
    for (const double bits : {0.0, 62.0, 63.0, 500.0, 2000.0}) {
        const auto moduli = coprime_moduli(bits);
        Big product = 1;
        for (std::size_t i = 0; i < moduli.size(); ++i) {
            product *= moduli[i];
            for (std::size_t j = 0; j < i; ++j) {
                EXPECT_EQ(std::gcd(moduli[i], moduli[j]), 1U);
            }
        }
        EXPECT_GT(product >> static_cast<unsigned>(bits), 0) << bits;
    }
}

TEST(IntegerWith, gives_back_the_integer) {
    const auto moduli = coprime_moduli(700);
    for (const Big& integer : {Big(0), Big(1), Big(Big(1) << 63), test::big_choose(650, 300), Big(Big(1) << 699)}) {
        std::vector<std::uint64_t> remainders;
        for (const std::uint64_t modulus : moduli) {
            remainders.push_back(static_cast<std::uint64_t>(integer % modulus));
        }
        EXPECT_EQ(integer_with(remainders, moduli), integer);
    }
}

TEST(ArithmeticModulo, stays_below_the_modulus) {
    const std::uint64_t modulus = coprime_moduli(0).front();
    EXPECT_EQ(sum_modulo(modulus - 1, 1, modulus), 0U);
    EXPECT_EQ(sum_modulo(modulus - 1, modulus - 1, modulus), modulus - 2);
    EXPECT_EQ(sum_modulo(3, 4, modulus), 7U);
    EXPECT_EQ(difference_modulo(3, 4, modulus), modulus - 1);
    EXPECT_EQ(difference_modulo(4, 4, modulus), 0U);
}

} // namespace
} // namespace rankstead::accuracy
