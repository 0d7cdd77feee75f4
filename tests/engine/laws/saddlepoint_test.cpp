// laws/saddlepoint.h: how far it is from exact laws, which is what its stated error says.
#include "laws/saddlepoint.h"

#include "data.h"
#include "laws/exact_laws.h"
#include "laws/inversion/untied_law.h"

#include <gtest/gtest.h>

#include <algorithm>
#include <cmath>

namespace rankstead {
namespace {

double smaller_tail(const Tails& tails) {
    return std::min(tails.lower, tails.upper);
}

void expect_close(const Tails& found, const Tails& exact) {
    ASSERT_EQ(found.law, LawKind::saddlepoint);
    if (smaller_tail(exact) >= 1e-4) {
        EXPECT_LE(std::fabs(smaller_tail(found) / smaller_tail(exact) - 1), found.relative_error);
    }
    EXPECT_GE(found.lower + found.upper, 1 - 1e-12);
}

struct Shape {
    std::int64_t first;
    std::int64_t second;
    std::int64_t levels;
};

TEST(Saddlepoint, of_the_rank_sum_is_within_its_stated_error_of_the_exact_law) {
    test::Random random(41);
    for (const auto& [first, second, levels] :
         {Shape{20, 20, 40}, Shape{30, 300, 100}, Shape{100, 100, 3}, Shape{100, 100, 13}, Shape{300, 300, 5},
          Shape{300, 300, 60}, Shape{1000, 1000, 4}, Shape{1000, 1000, 60}}) {
        for (const std::int64_t lead : {std::int64_t{0}, levels / 8}) {
            const ChoiceScores scores = choice_scores(rank_pooled(random.sorted(first, lead, levels + lead),
                                                                  random.sorted(second, 0, levels), std::int64_t{0}));
            SCOPED_TRACE(std::to_string(first) + " v " + std::to_string(second) + " on " + std::to_string(levels));
            expect_close(saddlepoint_tails(scores), exact_rank_sum_tails(scores, 0.5));
        }
    }
}

TEST(Saddlepoint, of_the_signed_rank_is_within_its_stated_error_of_the_exact_law) {
    test::Random random(42);
    for (const std::int64_t levels : {3, 15, 1000}) {
        for (const std::int64_t n : {100, 400, 1500}) {
            const SignScores scores =
                sign_scores(rank_signed(random.sorted(n, -levels, levels + levels / 10), std::int64_t{0}, true));
            SCOPED_TRACE(std::to_string(n) + " on " + std::to_string(levels));
            expect_close(saddlepoint_tails(scores), exact_signed_rank_tails(scores, 0.5));
        }
    }
}

TEST(Saddlepoint, without_ties_is_within_a_millionth_at_a_thousand_a_side) {
    const UntiedLaw law = UntiedLaw::rank_sum(1000, 1000);
    const UntiedRankSumLaw exact(1000, 1000);
    for (const double deviate : {0.0, 1.0, 3.0, 8.0}) {
        const auto u = static_cast<std::int64_t>(5e5 - deviate * std::sqrt(law.variance()));
        EXPECT_NEAR(saddlepoint_tails(law, u).lower / exact.at(u).lower, 1, 1e-5) << deviate;
    }
}

TEST(Saddlepoint, at_the_mean_lies_between_its_neighbours) {
    const UntiedLaw law = UntiedLaw::rank_sum(51, 50);
    const double below = saddlepoint_tails(law, 1274).lower;
    const double centre = saddlepoint_tails(law, 1275).lower;
    EXPECT_LT(below, centre);
    EXPECT_GT(saddlepoint_tails(law, 1276).lower, centre);
    EXPECT_NEAR(centre, UntiedRankSumLaw(51, 50).at(1275).lower, 1e-6);
}

TEST(SaddlepointError, is_larger_in_smaller_samples_and_on_fewer_ranks) {
    EXPECT_GT(saddlepoint_error(30, 50), saddlepoint_error(300, 50));
    EXPECT_GT(saddlepoint_error(300, 3), saddlepoint_error(300, 50));
}

} // namespace
} // namespace rankstead
