// estimates/ordered_sums.h: selection and counting against writing every sum down and sorting.
#include "estimates/ordered_sums.h"

#include "data.h"
#include "grid.h"

#include <gtest/gtest.h>

#include <algorithm>
#include <string>
#include <type_traits>

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

template <class Int>
void expect_order(const OrderedSums<Int>& sums, const std::vector<Int>& all, std::size_t step) {
    ASSERT_EQ(sums.size(), static_cast<std::int64_t>(all.size()));
    for (std::size_t k = 0; k < all.size(); k += step) {
        ASSERT_TRUE(sums.at(static_cast<std::int64_t>(k) + 1) == all[k]) << "k = " << k + 1 << " of " << all.size();
    }
    ASSERT_TRUE(sums.at(sums.size()) == all.back());
}

template <class Int>
void expect_counts(const OrderedSums<Int>& sums, const std::vector<Int>& all, const Int& value) {
    const auto below = std::lower_bound(all.begin(), all.end(), value);
    const auto through = std::upper_bound(all.begin(), all.end(), value);
    ASSERT_EQ(sums.count_below(value), below - all.begin());
    ASSERT_EQ(sums.count_at_most(value), through - all.begin());
    if (through != all.end()) {
        ASSERT_TRUE(sums.next_above(value) == *through);
    }
    if (below != all.begin()) {
        ASSERT_TRUE(sums.next_below(value) == *(below - 1));
    }
}

// Every value between the ends and one beyond each, present or not.
template <class Int>
void expect_all_counts(const OrderedSums<Int>& sums, const std::vector<Int>& all) {
    for (Int value = all.front() - 1; value <= all.back() + 1; ++value) {
        expect_counts(sums, all, value);
    }
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
        expect_all_counts(sums, all);
    }
}

TYPED_TEST(OrderedSumsOf, walsh_sums_of_small_samples_at_every_k) {
    test::Random random(22);
    for (int i = 0; i < 40; ++i) {
        const auto d = drawn<TypeParam>(random, random.whole(1, 15), random.whole(1, 20));
        const auto all = every_walsh_sum(d);
        const auto sums = OrderedSums<TypeParam>::walsh(d);
        expect_order(sums, all, 1);
        expect_all_counts(sums, all);
    }
}

TYPED_TEST(OrderedSumsOf, values_are_themselves) {
    test::Random random(23);
    const auto d = drawn<TypeParam>(random, 30, 9);
    const auto sums = OrderedSums<TypeParam>::values(d);
    expect_order(sums, d, 1);
    expect_all_counts(sums, d);
}

// Beyond 20,000 sums the selection narrows a bracket found from a sample.
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

// At the ends the bracket found from a sample often misses, on either side and by one.
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
    EXPECT_EQ(sums.count_below(14), 0);
    EXPECT_EQ(sums.count_at_most(14), sums.size());
}

// Neighbours of the ends of 64 bits, as far as the grid lets values go.
TEST(OrderedSums, of_seventeen_digits) {
    const std::int64_t large = 99'999'999'999'999'999;
    const std::vector<std::int64_t> d{-large, 0, large};
    EXPECT_EQ(OrderedSums<std::int64_t>::walsh(d).at(1), -2 * large);
    EXPECT_EQ(OrderedSums<std::int64_t>::differences(d, d).at(9), 2 * large);
}

} // namespace
} // namespace rankstead
