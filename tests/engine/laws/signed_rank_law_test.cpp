// laws/signed_rank_law.h: against plain enumeration.
#include "laws/signed_rank_law.h"

#include "enumeration.h"

#include <gtest/gtest.h>

#include <algorithm>
#include <numeric>

namespace rankstead {
namespace {

using Scores = std::vector<std::int64_t>;

Scores ranks_to(std::int64_t n) {
    Scores ranks(static_cast<std::size_t>(n));
    std::iota(ranks.begin(), ranks.end(), std::int64_t{1});
    return ranks;
}

void expect_counts(const Tails& tails, const test::Enumerated& law, std::int64_t statistic) {
    ASSERT_TRUE(tails.counts);
    ASSERT_EQ(tails.counts->lower, law.at_most(statistic)) << statistic;
    ASSERT_EQ(tails.counts->upper, law.at_least(statistic)) << statistic;
    ASSERT_EQ(tails.counts->total, law.total);
    ASSERT_EQ(tails.lower, law.lower(statistic)) << statistic;
    ASSERT_EQ(tails.upper, law.upper(statistic)) << statistic;
}

TEST(SignedRankLaw, without_ties_agrees_with_every_sign_at_every_statistic_to_n_12) {
    for (std::int64_t n = 1; n <= 12; ++n) {
        const auto law = test::every_sign(ranks_to(n));
        for (std::int64_t t = 0; t <= n * (n + 1) / 2; ++t) {
            expect_counts(signed_rank_tails(untied_sign_scores(n, t)), law, t);
        }
    }
}

TEST(UntiedSignedRankLaw, agrees_with_every_sign_at_every_statistic_to_n_12) {
    for (std::int64_t n = 1; n <= 12; ++n) {
        const auto law = test::every_sign(ranks_to(n));
        const UntiedSignedRankLaw table(n);
        for (std::int64_t t = 0; t <= n * (n + 1) / 2; ++t) {
            expect_counts(table.at(t), law, t);
        }
    }
}

// ------------------------------------------------------------------------------------------------ ties and zeros

// The scores of `sizes` (absolute values) with `zeros` more values ranked below them.
Scores doubled_ranks_above_zeros(const Scores& sizes, std::int64_t zeros) {
    Scores all(static_cast<std::size_t>(zeros), 0);
    all.insert(all.end(), sizes.begin(), sizes.end());
    const Scores ranks = test::doubled_midranks(all);
    return {ranks.begin() + zeros, ranks.end()};
}

// The differences with these sizes and the signs that `members` says, with zeros, ascending.
Scores differences(const Scores& sizes, std::uint64_t members, std::int64_t zeros) {
    Scores result(static_cast<std::size_t>(zeros), 0);
    for (std::size_t i = 0; i < sizes.size(); ++i) {
        result.push_back((members >> i & 1U) != 0 ? sizes[i] : -sizes[i]);
    }
    std::sort(result.begin(), result.end());
    return result;
}

std::int64_t positive_sum(const Scores& scores, std::uint64_t members) {
    std::int64_t sum = 0;
    for (std::size_t i = 0; i < scores.size(); ++i) {
        sum += (members >> i & 1U) != 0 ? scores[i] : 0;
    }
    return sum;
}

// Every sign of one tie pattern, through the ranking of the engine.
void check_pattern(const Scores& pattern, std::int64_t zeros, bool rank_zeros) {
    const Scores sizes = test::values_of(pattern);
    const Scores scores = doubled_ranks_above_zeros(sizes, rank_zeros ? zeros : 0);
    const auto law = test::every_sign(scores);
    for (std::uint64_t members = 0; members < std::uint64_t{1} << sizes.size(); ++members) {
        const auto ranking = rank_signed(differences(sizes, members, zeros), std::int64_t{0}, rank_zeros);
        expect_counts(signed_rank_tails(sign_scores(ranking)), law, positive_sum(scores, members));
    }
}

class SignedRankTies : public ::testing::TestWithParam<std::int64_t> {};

TEST_P(SignedRankTies, agree_with_every_sign_for_every_tie_pattern_and_up_to_three_zeros) {
    for (const Scores& pattern : test::tie_patterns(GetParam())) {
        for (std::int64_t zeros = 0; zeros <= 3; ++zeros) {
            check_pattern(pattern, zeros, false);
            check_pattern(pattern, zeros, true);
        }
    }
}

INSTANTIATE_TEST_SUITE_P(n, SignedRankTies, ::testing::Range<std::int64_t>(1, 9));

TEST(SignScores, divide_by_the_common_divisor) {
    // Three values of one size: doubled midrank 4 each, so each counts 1.
    const SignScores scores = sign_scores(rank_signed(Scores{-5, 5, 5}, std::int64_t{0}, false));
    EXPECT_EQ(scores.scores, (Scores{1, 1, 1}));
    EXPECT_EQ(scores.statistic, 2);
    EXPECT_EQ(scores.sum, 3);
}

TEST(SignedRankLaw, of_zeros_only_has_p_one) {
    const Tails tails = signed_rank_tails(sign_scores(rank_signed(Scores{0, 0}, std::int64_t{0}, false)));
    EXPECT_EQ(tails.lower, 1.0);
    EXPECT_EQ(tails.upper, 1.0);
}

// Common practice: n = 10, the one-sided critical T is 10 at 5 % and 5 at 1 %.
TEST(UntiedSignedRankLaw, common_practice_critical_values_of_10) {
    const UntiedSignedRankLaw law(10);
    EXPECT_LE(law.at(10).lower, 0.05);
    EXPECT_GT(law.at(11).lower, 0.05);
    EXPECT_LE(law.at(5).lower, 0.01);
    EXPECT_GT(law.at(6).lower, 0.01);
}

} // namespace
} // namespace rankstead
