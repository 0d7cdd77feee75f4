// ranks.h: midranks as doubled integers.
#include "ranks.h"

#include "data.h"
#include "enumeration.h"
#include "grid.h"

#include <gtest/gtest.h>

#include <cstdlib>
#include <iterator>
#include <set>

namespace rankstead {
namespace {

using Values = std::vector<std::int64_t>;

// 2 T+ from doubled midranks of the absolute values, ranked one by one.
std::int64_t plain_doubled_positive_sum(const Values& differences, bool rank_zeros) {
    Values sizes;
    Values kept;
    for (const std::int64_t d : differences) {
        if (rank_zeros || d != 0) {
            sizes.push_back(std::abs(d));
            kept.push_back(d);
        }
    }
    const Values ranks = test::doubled_midranks(sizes);
    std::int64_t sum = 0;
    for (std::size_t i = 0; i < kept.size(); ++i) {
        sum += kept[i] > 0 ? ranks[i] : 0;
    }
    return sum;
}

Values shifted(const Values& values, std::int64_t by) {
    Values result;
    for (const std::int64_t value : values) {
        result.push_back(value - by);
    }
    return result;
}

TEST(RankSigned, groups_equal_sizes_and_counts_the_rises_among_them) {
    const SignedRanking ranking = rank_signed(Values{-3, -1, 0, 1, 1, 4}, std::int64_t{0}, false);
    ASSERT_EQ(ranking.groups.size(), 3U);
    EXPECT_EQ(ranking.groups[0].doubled_rank, 4); // |1| three times: ranks 1, 2, 3
    EXPECT_EQ(ranking.groups[0].count, 3);
    EXPECT_EQ(ranking.groups[0].positive, 2);
    EXPECT_EQ(ranking.groups[1].doubled_rank, 8);
    EXPECT_EQ(ranking.groups[1].positive, 0);
    EXPECT_EQ(ranking.groups[2].doubled_rank, 10);
    EXPECT_EQ(ranking.used, 5);
    EXPECT_EQ(ranking.zeros, 1);
    EXPECT_EQ(ranking.positives(), 3);
    EXPECT_EQ(ranking.tied(), 3);
    EXPECT_EQ(ranking.doubled_positive_sum, 4 * 2 + 10);
}

TEST(RankSigned, gives_the_lowest_ranks_to_zeros_that_are_ranked) {
    const SignedRanking ranking = rank_signed(Values{-2, 0, 0, 5}, std::int64_t{0}, true);
    EXPECT_EQ(ranking.groups[0].doubled_rank, 6); // rank 3 after two zeros
    EXPECT_EQ(ranking.groups[1].doubled_rank, 8);
    EXPECT_EQ(ranking.used, 2);
    EXPECT_TRUE(ranking.zeros_ranked);
}

TEST(RankSigned, of_zeros_only_has_no_groups) {
    const SignedRanking ranking = rank_signed(Values{7, 7, 7}, std::int64_t{7}, false);
    EXPECT_TRUE(ranking.groups.empty());
    EXPECT_EQ(ranking.zeros, 3);
    EXPECT_EQ(ranking.used, 0);
}

TEST(RankSigned, agrees_with_ranking_one_by_one) {
    test::Random random(11);
    for (int i = 0; i < 500; ++i) {
        const Values sorted = random.sorted(random.whole(1, 12), -4, 6);
        const std::int64_t origin = random.whole(-2, 2);
        for (const bool rank_zeros : {false, true}) {
            EXPECT_EQ(rank_signed(sorted, origin, rank_zeros).doubled_positive_sum,
                      plain_doubled_positive_sum(shifted(sorted, origin), rank_zeros));
        }
    }
}

// A gap between sums of two values, or differences, is where everything is ranked as at its middle: here with all
// values fourfold, or twofold, so that the middle is a whole number.
TEST(RankSignedInGap, ranks_as_at_a_margin_in_the_middle_of_the_gap) {
    test::Random random(44);
    for (int i = 0; i < 200; ++i) {
        const Values sorted = random.sorted(random.whole(1, 9), -6, 6);
        Values fourfold;
        std::set<std::int64_t> sums{2 * sorted.front() - 2, 2 * sorted.back() + 2};
        for (const std::int64_t d : sorted) {
            fourfold.push_back(4 * d);
            for (const std::int64_t e : sorted) {
                sums.insert(d + e);
            }
        }
        for (auto floor = sums.begin(); std::next(floor) != sums.end(); ++floor) {
            const auto ranking = rank_signed_in_gap(sorted, *floor);
            const auto middle = rank_signed(fourfold, *floor + *std::next(floor), false);
            ASSERT_EQ(ranking.doubled_positive_sum, middle.doubled_positive_sum) << "above " << *floor;
            ASSERT_EQ(ranking.groups.size(), middle.groups.size());
            ASSERT_EQ(ranking.tied(), middle.tied());
            ASSERT_EQ(ranking.zeros, 0);
        }
    }
}

TEST(RankPooledInGap, ranks_as_at_a_shift_in_the_middle_of_the_gap) {
    test::Random random(45);
    for (int i = 0; i < 200; ++i) {
        const Values x = random.sorted(random.whole(1, 9), -6, 6);
        const Values y = random.sorted(random.whole(1, 9), -6, 6);
        Values twofold_x;
        Values twofold_y;
        std::set<std::int64_t> differences{x.front() - y.back() - 1, x.back() - y.front() + 1};
        for (const std::int64_t b : y) {
            twofold_y.push_back(2 * b);
        }
        for (const std::int64_t a : x) {
            twofold_x.push_back(2 * a);
            for (const std::int64_t b : y) {
                differences.insert(a - b);
            }
        }
        for (auto floor = differences.begin(); std::next(floor) != differences.end(); ++floor) {
            const auto ranking = rank_pooled_in_gap(x, y, *floor);
            const auto middle = rank_pooled(twofold_x, twofold_y, *floor + *std::next(floor));
            ASSERT_EQ(ranking.doubled_u(), middle.doubled_u()) << "above " << *floor;
            ASSERT_EQ(ranking.groups.size(), middle.groups.size());
            ASSERT_EQ(ranking.tied(), middle.tied());
        }
    }
}

TEST(RankPooled, keeps_groups_by_value_with_the_share_of_each_sample) {
    const PooledRanking ranking = rank_pooled(Values{1, 2, 2}, Values{2, 3}, std::int64_t{0});
    ASSERT_EQ(ranking.groups.size(), 3U);
    EXPECT_EQ(ranking.groups[1].doubled_rank, 6); // ranks 2, 3, 4
    EXPECT_EQ(ranking.groups[1].first, 2);
    EXPECT_EQ(ranking.groups[1].second, 1);
    EXPECT_EQ(ranking.tied(), 3);
    EXPECT_EQ(ranking.doubled_first_sum, 2 + 6 + 6);
}

// U counted pair by pair: one for each pair in which the first is higher, one half for each tie.
TEST(RankPooled, agrees_with_counting_pairs) {
    test::Random random(12);
    for (int i = 0; i < 500; ++i) {
        const Values x = random.sorted(random.whole(1, 9), 0, 7);
        const Values y = random.sorted(random.whole(1, 9), 0, 7);
        const std::int64_t shift = random.whole(-3, 3);
        std::int64_t doubled_u = 0;
        for (const std::int64_t a : x) {
            for (const std::int64_t b : y) {
                doubled_u += a - shift > b ? 2 : a - shift == b ? 1 : 0;
            }
        }
        EXPECT_EQ(rank_pooled(x, y, shift).doubled_u(), doubled_u);
    }
}

TEST(Ranks, are_the_same_in_wider_integers) {
    const Values d{-9, -2, 0, 2, 2, 5};
    const std::vector<Int128> wide(d.begin(), d.end());
    const std::vector<BigInt> unbounded(d.begin(), d.end());
    const auto narrow = rank_signed(d, std::int64_t{0}, true).doubled_positive_sum;
    EXPECT_EQ(rank_signed(wide, Int128(0), true).doubled_positive_sum, narrow);
    EXPECT_EQ(rank_signed(unbounded, BigInt(0), true).doubled_positive_sum, narrow);
    const auto pooled = rank_pooled(d, d, std::int64_t{2}).doubled_u();
    EXPECT_EQ(rank_pooled(wide, wide, Int128(2)).doubled_u(), pooled);
    EXPECT_EQ(rank_pooled(unbounded, unbounded, BigInt(2)).doubled_u(), pooled);
}

} // namespace
} // namespace rankstead
