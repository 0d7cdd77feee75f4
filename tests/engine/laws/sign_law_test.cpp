// laws/sign_law.h
#include "laws/sign_law.h"

#include "big_laws.h"
#include "enumeration.h"

#include <gtest/gtest.h>

#include <cmath>
#include <vector>

namespace rankstead {
namespace {

using test::Big;

// C(n, 0) to C(n, n).
std::vector<Big> every_choose(std::size_t n) {
    std::vector<Big> ways{1};
    for (std::size_t k = 1; k <= n; ++k) {
        ways.push_back(ways.back() * (n - k + 1) / k);
    }
    return ways;
}

// Numbers of subsets of n with at most, and at least, k members.
test::BigTails big_binomial(const std::vector<Big>& ways, std::size_t k) {
    test::BigTails tails;
    for (std::size_t i = 0; i < ways.size(); ++i) {
        tails.total += ways[i];
        tails.lower += i <= k ? ways[i] : Big(0);
        tails.upper += i >= k ? ways[i] : Big(0);
    }
    return tails;
}

TEST(SignLaw, agrees_with_enumerating_every_sign) {
    for (std::int64_t n = 0; n <= 12; ++n) {
        const auto law = test::every_sign(std::vector<std::int64_t>(static_cast<std::size_t>(n), 1));
        for (std::int64_t above = 0; above <= n; ++above) {
            const Tails tails = sign_tails(n, above);
            ASSERT_TRUE(tails.counts);
            EXPECT_EQ(tails.counts->lower, law.at_most(above)) << n << " " << above;
            EXPECT_EQ(tails.counts->upper, law.at_least(above)) << n << " " << above;
            EXPECT_EQ(tails.counts->total, law.total);
            EXPECT_EQ(tails.lower, law.lower(above));
            EXPECT_EQ(tails.upper, law.upper(above));
        }
    }
}

TEST(SignLaw, agrees_with_unbounded_integers_to_1e_13_in_the_smaller_tail) {
    for (const std::size_t n : {40U, 62U, 63U, 100U, 333U, 1000U}) {
        const std::vector<Big> ways = every_choose(n);
        for (std::size_t k = 0; k <= n; k += 1 + n / 37) {
            const auto exact = big_binomial(ways, k);
            const Tails tails = sign_tails(static_cast<std::int64_t>(n), static_cast<std::int64_t>(k));
            if (2 * k <= n) {
                EXPECT_LT(test::relative_error(tails.lower, exact.lower, exact.total), 1e-13) << n << " " << k;
            }
            if (2 * k >= n) {
                EXPECT_LT(test::relative_error(tails.upper, exact.upper, exact.total), 1e-13) << n << " " << k;
            }
        }
    }
}

TEST(SignLaw, mirrors_exactly) {
    for (const std::int64_t n : {7, 62, 63, 200}) {
        for (std::int64_t k = 0; k <= n; ++k) {
            EXPECT_EQ(sign_tails(n, k).lower, sign_tails(n, n - k).upper) << n << " " << k;
        }
    }
}

TEST(SignLaw, of_sixty_above_out_of_sixty_is_two_to_the_minus_sixty) {
    EXPECT_EQ(sign_tails(60, 60).upper, std::ldexp(1.0, -60));
    EXPECT_EQ(sign_tails(60, 60).lower, 1.0);
}

// Common practice in the teaching of the sign test: 7 of 10 below has one-sided p 0.172, 8 of 10 has 0.055.
TEST(SignLaw, common_practice_seven_and_eight_of_ten) {
    EXPECT_NEAR(sign_tails(10, 3).lower, 0.172, 0.0005);
    EXPECT_NEAR(sign_tails(10, 2).lower, 0.055, 0.0005);
}

} // namespace
} // namespace rankstead
