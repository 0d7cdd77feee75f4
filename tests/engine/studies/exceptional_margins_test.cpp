// zeros=drop: the margins at which p and the limits disagree, as the notes list them.
#include "data.h"

#include <gtest/gtest.h>

#include <algorithm>
#include <string>

namespace rankstead {
namespace {

// Dropping a zero can turn p around exactly there: the margins are listed, and no other breakpoint disagrees.
TEST(ExceptionalMargins, are_all_the_values_at_which_p_and_limits_disagree) {
    test::Random random(66);
    std::size_t found = 0;
    for (int i = 0; i < 300; ++i) {
        const auto changes = test::doubles(random.wholes(random.whole(6, 9), -3, 6));
        const Outcome outcome = test::changes(changes, "level=0.9");
        std::vector<double> expected;
        for (double margin = -3; margin <= 6; ++margin) {
            const double p = test::changes(changes, "level=0.9; margin=" + std::to_string(margin)).p;
            const bool outside = margin < *outcome.lower.value || margin > *outcome.upper.value;
            const bool on_limit = margin == *outcome.lower.value || margin == *outcome.upper.value;
            const bool is_value = std::find(changes.begin(), changes.end(), margin) != changes.end();
            if (!on_limit && outside != (p <= 0.1)) {
                EXPECT_TRUE(is_value) << margin << " is none of the values, yet p and the limits disagree there";
                expected.push_back(margin);
            }
        }
        EXPECT_EQ(outcome.observations.exceptional_margins, expected);
        found += expected.size();
    }
    EXPECT_GT(found, 0U) << "no case was drawn, so nothing was tested";
}

} // namespace
} // namespace rankstead
