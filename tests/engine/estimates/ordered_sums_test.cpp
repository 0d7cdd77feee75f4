// estimates/ordered_sums.h: selection and counting against writing every sum down and sorting.
#include "estimates/ordered_sums.h"

#include "data.h"
#include "grid.h"

#include <gtest/gtest.h>

#include <algorithm>
#include <numeric>
#include <string>
#include <type_traits>
#include <utility>

namespace rankstead {
namespace {

template <class Int>
std::vector<Int> drawn(test::Random& random, std::int64_t count, std::int64_t highest) {
    std::vector<Int> values;
    for (std::int64_t i = 0; i < count; ++i) {
        values.push_back(Int(random.whole(-highest, highest)));
    }
    std::sort(values.begin(), values.end());
    return values;
}

template <class Int>
std::vector<Int> every_difference(const std::vector<Int>& x, const std::vector<Int>& y) {
    std::vector<Int> sums;
    for (const Int& a : x) {
        for (const Int& b : y) {
            sums.push_back(Int(a - b));
        }
    }
    std::sort(sums.begin(), sums.end());
    return sums;
}

template <class Int>
std::vector<Int> every_walsh_sum(const std::vector<Int>& d) {
    std::vector<Int> sums;
    for (std::size_t i = 0; i < d.size(); ++i) {
        for (std::size_t j = i; j < d.size(); ++j) {
            sums.push_back(Int(d[i] + d[j]));
        }
    }
    std::sort(sums.begin(), sums.end());
    return sums;
}

// The k-th smallest with what is below it and at most it, the next one, and the same of the mirrored sums.
template <class Int>
void expect_place(const OrderedSums<Int>& sums, const std::vector<Int>& all, std::int64_t k) {
    const Int& value = all[static_cast<std::size_t>(k) - 1];
    const auto [first, last] = std::equal_range(all.begin(), all.end(), value);
    const std::int64_t below = first - all.begin();
    const std::int64_t through = last - all.begin();
    const auto place = sums.place(k);
    ASSERT_TRUE(place.value == value) << "k = " << k << " of " << all.size();
    ASSERT_EQ(place.below, below) << "k = " << k;
    ASSERT_EQ(place.through, through) << "k = " << k;
    const auto other = sums.mirrored().place(sums.size() + 1 - k);
    ASSERT_TRUE(other.value == Int(-value)) << "k = " << k << " from above";
    ASSERT_EQ(other.below, sums.size() - through);
    ASSERT_EQ(other.through, sums.size() - below);
    if (k < sums.size()) {
        const Int& next = all[static_cast<std::size_t>(k)];
        ASSERT_TRUE(sums.pair_at(k) == std::pair(value, next)) << "k = " << k;
        ASSERT_TRUE(sums.mirrored().pair_at(sums.size() - k) == std::pair(Int(-next), Int(-value))) << "k = " << k;
    }
}

template <class Int>
void expect_order(const OrderedSums<Int>& sums, const std::vector<Int>& all, std::size_t step) {
    ASSERT_EQ(sums.size(), static_cast<std::int64_t>(all.size()));
    for (std::size_t k = 0; k < all.size(); k += step) {
        ASSERT_NO_FATAL_FAILURE(expect_place(sums, all, static_cast<std::int64_t>(k) + 1));
    }
    ASSERT_NO_FATAL_FAILURE(expect_place(sums, all, sums.size()));
}

template <class Int>
class OrderedSumsOf : public ::testing::Test {};

struct NameOf {
    template <class Int>
    static std::string GetName(int) {
        return std::is_same_v<Int, std::int64_t> ? "64_bits" : std::is_same_v<Int, Int128> ? "128_bits" : "any_size";
    }
};

using Integers = ::testing::Types<std::int64_t, Int128, BigInt>;
TYPED_TEST_SUITE(OrderedSumsOf, Integers, NameOf);

TYPED_TEST(OrderedSumsOf, differences_of_small_samples_at_every_k) {
    test::Random random(21);
    for (int i = 0; i < 40; ++i) {
        const auto x = drawn<TypeParam>(random, random.whole(1, 12), random.whole(1, 20));
        const auto y = drawn<TypeParam>(random, random.whole(1, 12), random.whole(1, 20));
        const auto all = every_difference(x, y);
        const auto sums = OrderedSums<TypeParam>::differences(x, y);
        expect_order(sums, all, 1);
    }
}

TYPED_TEST(OrderedSumsOf, walsh_sums_of_small_samples_at_every_k) {
    test::Random random(22);
    for (int i = 0; i < 40; ++i) {
        const auto d = drawn<TypeParam>(random, random.whole(1, 15), random.whole(1, 20));
        const auto all = every_walsh_sum(d);
        const auto sums = OrderedSums<TypeParam>::walsh(d);
        expect_order(sums, all, 1);
    }
}

TYPED_TEST(OrderedSumsOf, values_are_themselves) {
    test::Random random(23);
    const auto d = drawn<TypeParam>(random, 30, 9);
    const auto sums = OrderedSums<TypeParam>::values(d);
    expect_order(sums, d, 1);
}

// Beyond 400 sums, and more than both lists have members, the selection narrows a bracket.
TYPED_TEST(OrderedSumsOf, more_differences_than_are_ever_written_down) {
    test::Random random(24);
    for (const std::int64_t highest : {1'000'000, 300, 4, 1}) {
        const auto x = drawn<TypeParam>(random, 170, highest);
        const auto y = drawn<TypeParam>(random, 150, highest);
        expect_order(OrderedSums<TypeParam>::differences(x, y), every_difference(x, y), 997);
    }
}

TYPED_TEST(OrderedSumsOf, more_walsh_sums_than_are_ever_written_down) {
    test::Random random(25);
    for (const std::int64_t highest : {1'000'000, 300, 4, 1}) {
        const auto d = drawn<TypeParam>(random, 230, highest);
        expect_order(OrderedSums<TypeParam>::walsh(d), every_walsh_sum(d), 1009);
    }
}

TEST(OrderedSums, beyond_the_written_ones_at_every_k) {
    test::Random random(26);
    const auto x = drawn<std::int64_t>(random, 145, 400);
    const auto y = drawn<std::int64_t>(random, 140, 40);
    expect_order(OrderedSums<std::int64_t>::differences(x, y), every_difference(x, y), 7);
}

// At the ends the bracket often misses, on either side and by one.
TEST(OrderedSums, beyond_the_written_ones_at_every_k_near_the_ends) {
    test::Random random(29);
    for (const std::int64_t highest : {100'000, 60}) {
        const auto d = drawn<std::int64_t>(random, 240, highest);
        const auto all = every_walsh_sum(d);
        const auto sums = OrderedSums<std::int64_t>::walsh(d);
        for (std::int64_t k = 1; k <= 400; ++k) {
            const auto from_above = static_cast<std::size_t>(sums.size() - k);
            ASSERT_EQ(sums.at(k), all[static_cast<std::size_t>(k - 1)]) << k;
            ASSERT_EQ(sums.at(sums.size() - k + 1), all[from_above]) << k << " from above";
        }
    }
}

// The last of each tie and the first of the next.
TEST(OrderedSums, beyond_the_written_ones_at_every_edge_of_a_tie) {
    test::Random random(30);
    const auto x = drawn<std::int64_t>(random, 160, 90);
    const auto y = drawn<std::int64_t>(random, 150, 90);
    const auto all = every_difference(x, y);
    const auto sums = OrderedSums<std::int64_t>::differences(x, y);
    for (std::size_t k = 1; k < all.size(); ++k) {
        if (all[k] != all[k - 1]) {
            ASSERT_EQ(sums.at(static_cast<std::int64_t>(k)), all[k - 1]);
            ASSERT_EQ(sums.at(static_cast<std::int64_t>(k) + 1), all[k]);
        }
    }
}

TEST(OrderedSums, of_very_unequal_samples) {
    test::Random random(27);
    const auto x = drawn<std::int64_t>(random, 3, 1000);
    const auto y = drawn<std::int64_t>(random, 9000, 1000);
    const auto all = every_difference(x, y);
    expect_order(OrderedSums<std::int64_t>::differences(x, y), all, 501);
    std::vector<std::int64_t> mirrored;
    for (auto sum = all.rbegin(); sum != all.rend(); ++sum) {
        mirrored.push_back(-*sum);
    }
    expect_order(OrderedSums<std::int64_t>::differences(y, x), mirrored, 501);
}

TEST(OrderedSums, half_a_million_in_two_clusters) {
    test::Random random(28);
    std::vector<std::int64_t> x = drawn<std::int64_t>(random, 350, 5);
    for (std::int64_t i = 0; i < 350; ++i) {
        x.push_back(1'000'000 + random.whole(0, 5));
    }
    std::sort(x.begin(), x.end());
    const auto y = drawn<std::int64_t>(random, 700, 3);
    expect_order(OrderedSums<std::int64_t>::differences(x, y), every_difference(x, y), 24'001);
}

TEST(OrderedSums, all_equal) {
    const std::vector<std::int64_t> d(300, 7);
    const auto sums = OrderedSums<std::int64_t>::walsh(d);
    EXPECT_EQ(sums.at(1), 14);
    EXPECT_EQ(sums.at(sums.size() / 2), 14);
    EXPECT_EQ(sums.at(sums.size()), 14);
    EXPECT_EQ(sums.place(45'000).below, 0);
    EXPECT_EQ(sums.place(45'000).through, sums.size());
}

// Neighbours of the ends of 64 bits, as far as the grid lets values go.
TEST(OrderedSums, of_seventeen_digits) {
    const std::int64_t large = 99'999'999'999'999'999;
    const std::vector<std::int64_t> d{-large, 0, large};
    EXPECT_EQ(OrderedSums<std::int64_t>::walsh(d).at(1), -2 * large);
    EXPECT_EQ(OrderedSums<std::int64_t>::differences(d, d).at(9), 2 * large);
}

// Shapes of every kind, each with ties from none to all, at random k: sizes alike and not, values evenly spread, in
// clusters, doubling from one to the next, and all the same but one.
std::vector<std::int64_t> of_some_shape(test::Random& random, std::int64_t count) {
    const std::int64_t shape = random.whole(0, 4);
    const std::int64_t highest = std::int64_t{1} << random.whole(0, 40);
    std::vector<std::int64_t> values;
    for (std::int64_t i = 0; i < count; ++i) {
        const std::int64_t drawn = random.whole(-highest, highest);
        const std::int64_t cluster = random.whole(0, 2) * (std::int64_t{1} << 45);
        values.push_back(shape == 0   ? drawn
                         : shape == 1 ? drawn + cluster
                         : shape == 2 ? std::int64_t{1} << random.whole(0, 50)
                         : shape == 3 ? (i == 0 ? highest : 7)
                                      : drawn / (1 + random.whole(0, 9)));
    }
    std::sort(values.begin(), values.end());
    return values;
}

TEST(OrderedSums, of_random_shapes_at_random_places) {
    test::Random random(31);
    for (int i = 0; i < 150; ++i) {
        const auto x = of_some_shape(random, random.whole(1, 300));
        const auto y = of_some_shape(random, random.whole(1, 300));
        const auto differences = OrderedSums<std::int64_t>::differences(x, y);
        const auto walsh = OrderedSums<std::int64_t>::walsh(x);
        const auto every_one = every_difference(x, y);
        const auto every_sum = every_walsh_sum(x);
        for (int j = 0; j < 12; ++j) {
            ASSERT_NO_FATAL_FAILURE(expect_place(differences, every_one, random.whole(1, differences.size())));
            ASSERT_NO_FATAL_FAILURE(expect_place(walsh, every_sum, random.whole(1, walsh.size())));
        }
    }
}

// Beyond what can be written down: of 0 to n - 1 with themselves, the difference d occurs n - |d| times, so as many as
// (n + d + 1)(n + d) / 2 are at most d <= 0.
TEST(OrderedSums, a_million_whole_numbers_against_themselves) {
    constexpr std::int64_t n = 1'000'000;
    std::vector<std::int64_t> x(n);
    std::iota(x.begin(), x.end(), 0);
    const auto differences = OrderedSums<std::int64_t>::differences(x, x);
    for (const std::int64_t d : {-n + 1, -n + 2, -700'000L, -1L, 0L}) {
        const std::int64_t through = (n + d + 1) * (n + d) / 2;
        for (const std::int64_t k : {through - n - d + 1, through}) {
            const auto place = differences.place(k);
            EXPECT_EQ(place.value, d);
            EXPECT_EQ(place.below, through - n - d);
            EXPECT_EQ(place.through, through);
        }
    }
    EXPECT_EQ(differences.pair_at(n * n / 2), std::pair(std::int64_t{0}, std::int64_t{0}));
}

// n values at 0 and n at 1: the sums are 0, 1 and 2, with n(n+1)/2, n^2 and n(n+1)/2 Walsh averages.
TEST(OrderedSums, a_million_values_on_two_levels) {
    constexpr std::int64_t n = 500'000;
    std::vector<std::int64_t> d(n, 0);
    d.insert(d.end(), n, 1);
    const auto walsh = OrderedSums<std::int64_t>::walsh(d);
    constexpr std::int64_t zeros = n * (n + 1) / 2;
    EXPECT_EQ(walsh.pair_at(zeros), std::pair(std::int64_t{0}, std::int64_t{1}));
    EXPECT_EQ(walsh.pair_at(zeros + n * n), std::pair(std::int64_t{1}, std::int64_t{2}));
    EXPECT_EQ(walsh.place(zeros + 1).below, zeros);
    EXPECT_EQ(walsh.place(zeros + 1).through, zeros + n * n);
}

} // namespace
} // namespace rankstead
