// interval=table: classical order statistics of the law without ties.
#include "data.h"
#include "enumeration.h"
#include "gap_scan.h"

#include <gtest/gtest.h>

#include <algorithm>

namespace rankstead {
namespace {

using Values = std::vector<std::int64_t>;

// V(k) with k the largest for which 2 P0(S <= k - 1) <= 1 - level, in the law without ties.
std::size_t table_position(const test::Enumerated& untied, std::int64_t least, const Fraction& rate) {
    std::size_t k = 0;
    while (!test::exceeds(untied.at_most(least + static_cast<std::int64_t>(k)), untied.total, rate)) {
        ++k;
    }
    return k;
}

TEST(TableLimits, of_the_signed_rank_test_are_classical_order_statistics_also_with_ties) {
    test::Random random(57);
    for (int i = 0; i < 60; ++i) {
        const Values changes = random.wholes(random.whole(2, 9), -5, 9);
        Values walsh;
        Values ranks;
        for (std::size_t a = 0; a < changes.size(); ++a) {
            ranks.push_back(static_cast<std::int64_t>(a) + 1);
            for (std::size_t b = a; b < changes.size(); ++b) {
                walsh.push_back(changes[a] + changes[b]);
            }
        }
        std::sort(walsh.begin(), walsh.end());
        const Outcome outcome = test::changes(test::doubles(changes), "interval=table; level=0.9");
        const std::size_t k = table_position(test::every_sign(ranks), 0, tail_rate(outcome.settings));
        ASSERT_EQ(outcome.lower.value.has_value(), k > 0);
        if (k > 0) {
            EXPECT_EQ(*outcome.lower.value, static_cast<double>(walsh[k - 1]) / 2);
            EXPECT_EQ(*outcome.upper.value, static_cast<double>(walsh[walsh.size() - k]) / 2);
        }
    }
}

TEST(TableLimits, of_the_rank_sum_test_are_classical_order_statistics_also_with_ties) {
    test::Random random(58);
    for (int i = 0; i < 60; ++i) {
        const Values first = random.wholes(random.whole(2, 6), 0, 8);
        const Values second = random.wholes(random.whole(2, 6), 0, 8);
        Values differences;
        for (const std::int64_t x : first) {
            for (const std::int64_t y : second) {
                differences.push_back(x - y);
            }
        }
        std::sort(differences.begin(), differences.end());
        Values ranks(first.size() + second.size());
        for (std::size_t r = 0; r < ranks.size(); ++r) {
            ranks[r] = static_cast<std::int64_t>(r) + 1;
        }
        const auto m = static_cast<std::int64_t>(first.size());
        const Outcome outcome = test::groups(test::doubles(first), test::doubles(second), "interval=table; level=0.9");
        const std::size_t k =
            table_position(test::every_choice(ranks, first.size()), m * (m + 1) / 2, tail_rate(outcome.settings));
        ASSERT_EQ(outcome.lower.value.has_value(), k > 0);
        if (k > 0) {
            EXPECT_EQ(*outcome.lower.value, static_cast<double>(differences[k - 1]));
            EXPECT_EQ(*outcome.upper.value, static_cast<double>(differences[differences.size() - k]));
        }
    }
}

} // namespace
} // namespace rankstead
