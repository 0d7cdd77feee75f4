// Where a tilt lies, and that its bound on the number of arrangements holds.
#include "tilt.h"

#include "enumeration.h"

#include <gtest/gtest.h>

#include <cmath>

namespace rankstead::accuracy {
namespace {

const Scores scores{1, 2, 4, 4, 7, 8, 11, 12, 12, 15, 16};

TEST(Tilt, bounds_the_number_of_signs_up_to_every_sum) {
    const auto truth = test::every_sign(scores);
    for (const double log_p : {-0.1, -2.0, -6.0}) {
        const Tilt tilt = TiltedLaw(scores, std::nullopt).reaching(log_p);
        for (const auto& [sum, ways] : truth.ways) {
            EXPECT_GE(tilt.log2_arrangements(0, sum), std::log2(static_cast<double>(truth.at_most(sum)))) << sum;
        }
    }
}

TEST(Tilt, bounds_the_number_of_choices_up_to_every_sum) {
    const auto truth = test::every_choice(scores, 4);
    for (const double log_p : {-0.1, -2.0, -5.0}) {
        const Tilt tilt = TiltedLaw(scores, 4).reaching(log_p);
        for (const auto& [sum, ways] : truth.ways) {
            EXPECT_GE(tilt.log2_arrangements(4, sum), std::log2(static_cast<double>(truth.at_most(sum)))) << sum;
        }
    }
}

TEST(TiltedLaw, reaches_from_the_mean_to_the_lowest_sum) {
    const TiltedLaw signs(scores, std::nullopt);
    EXPECT_NEAR(signs.reaching(0).mean, 46, 0.01); // half of 92
    EXPECT_NEAR(signs.reaching(-100).mean, 0, 0.01);
    const TiltedLaw choices(scores, 3);
    EXPECT_NEAR(choices.reaching(0).mean, 3 * 92 / 11.0, 0.1);
    EXPECT_NEAR(choices.reaching(-100).mean, 1 + 2 + 4, 0.1);
}

} // namespace
} // namespace rankstead::accuracy
