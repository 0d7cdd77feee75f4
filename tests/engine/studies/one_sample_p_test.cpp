// studies/one_sample.h: p of the tests of one list of values, against plain enumeration of the same definition.
#include "studies/one_sample.h"

#include "data.h"
#include "enumeration.h"
#include "studies/studies.h"

#include <gtest/gtest.h>

#include <algorithm>
#include <cstdlib>

namespace rankstead {
namespace {

using Values = std::vector<std::int64_t>;

struct PlainTest {
    double statistic = 0;
    double higher = 1;
    double lower = 1;
    [[nodiscard]] double two_sided() const { return std::min(1.0, 2 * std::min(higher, lower)); }
};

// T+ and both tails: zeros dropped before ranking, or ranked and then set aside.
PlainTest plain_signed_rank(const Values& changes, bool pratt) {
    Values kept;
    Values sizes;
    for (const std::int64_t change : changes) {
        if (pratt || change != 0) {
            kept.push_back(change);
            sizes.push_back(std::abs(change));
        }
    }
    const Values ranks = test::doubled_midranks(sizes);
    Values scores;
    std::int64_t observed = 0;
    for (std::size_t i = 0; i < kept.size(); ++i) {
        if (kept[i] != 0) {
            scores.push_back(ranks[i]);
            observed += kept[i] > 0 ? ranks[i] : 0;
        }
    }
    const auto law = test::every_sign(scores);
    return {static_cast<double>(observed) / 2, law.upper(observed), law.lower(observed)};
}

void expect_p(const Values& changes, const PlainTest& expected, const std::string& settings) {
    const Outcome outcome = test::changes(test::doubles(changes), settings);
    EXPECT_EQ(outcome.statistic, expected.statistic);
    EXPECT_EQ(outcome.p, expected.two_sided());
    EXPECT_EQ(test::changes(test::doubles(changes), settings + "; side=higher").p, expected.higher);
    EXPECT_EQ(test::changes(test::doubles(changes), settings + "; side=lower").p, expected.lower);
}

TEST(SignedRankTest, has_the_p_of_every_sign_under_both_rules_for_zeros) {
    test::Random random(61);
    for (int i = 0; i < 150; ++i) {
        const Values changes = random.wholes(random.whole(1, 10), -4, random.whole(1, 8));
        expect_p(changes, plain_signed_rank(changes, false), "zeros=drop");
        expect_p(changes, plain_signed_rank(changes, true), "zeros=pratt");
    }
}

TEST(SignTest, has_the_p_of_every_sign_of_the_changes_that_are_not_zero) {
    test::Random random(62);
    for (int i = 0; i < 100; ++i) {
        const Values changes = random.wholes(random.whole(1, 12), -3, random.whole(1, 6));
        const auto above = std::count_if(changes.begin(), changes.end(), [](auto c) { return c > 0; });
        const auto zeros = std::count(changes.begin(), changes.end(), 0);
        const auto law = test::every_sign(Values(changes.size() - static_cast<std::size_t>(zeros), 1));
        expect_p(changes, {static_cast<double>(above), law.upper(above), law.lower(above)}, "test=sign");
    }
}

} // namespace
} // namespace rankstead
