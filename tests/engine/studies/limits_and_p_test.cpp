// interval=matching: the limits never contradict p, whatever the margin.
#include "data.h"

#include <gtest/gtest.h>

#include <string>

namespace rankstead {
namespace {

// Every margin strictly outside the limits has p at most 1 - level, every one strictly inside has more: in the middle
// of the gaps and on the breakpoints themselves.
TEST(Limits, never_contradict_p_under_pratt_at_any_margin) {
    test::Random random(54);
    for (int i = 0; i < 25; ++i) {
        const auto changes = test::doubles(random.wholes(random.whole(6, 9), -4, random.whole(2, 9)));
        const Outcome outcome = test::changes(changes, "zeros=pratt; level=0.9");
        for (double margin = -6; margin <= 11; margin += 0.25) {
            const double p = test::changes(changes, "zeros=pratt; margin=" + std::to_string(margin)).p;
            const bool outside = margin < *outcome.lower.value || margin > *outcome.upper.value;
            const bool inside = margin > *outcome.lower.value && margin < *outcome.upper.value;
            EXPECT_FALSE(outside && p > 0.1 + 1e-12) << margin << " has p " << p;
            EXPECT_FALSE(inside && p <= 0.1) << margin << " has p " << p;
        }
    }
}

TEST(Limits, never_contradict_p_of_the_rank_sum_test_at_any_margin) {
    test::Random random(55);
    for (int i = 0; i < 25; ++i) {
        const auto first = test::doubles(random.wholes(random.whole(4, 7), 0, random.whole(2, 9)));
        const auto second = test::doubles(random.wholes(random.whole(4, 7), 0, 6));
        const Outcome outcome = test::groups(first, second, "level=0.9");
        for (double margin = -8; margin <= 11; margin += 0.5) {
            const double p = test::groups(first, second, "margin=" + std::to_string(margin)).p;
            const bool outside = margin < *outcome.lower.value || margin > *outcome.upper.value;
            const bool inside = margin > *outcome.lower.value && margin < *outcome.upper.value;
            EXPECT_FALSE(outside && p > 0.1 + 1e-12) << margin << " has p " << p;
            EXPECT_FALSE(inside && p <= 0.1) << margin << " has p " << p;
        }
    }
}

} // namespace
} // namespace rankstead
