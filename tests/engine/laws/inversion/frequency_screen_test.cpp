// laws/inversion/frequency_screen.h: what it leaves out is negligible, by the defining sum at many frequencies.
#include "laws/inversion/frequency_screen.h"

#include "data.h"

#include <gtest/gtest.h>

#include <algorithm>
#include <cmath>
#include <complex>
#include <numbers>

namespace rankstead {
namespace {

double decay(const std::vector<std::int64_t>& scores, const std::vector<double>& weights, double t) {
    double total = 0;
    std::complex<double> sum = 0;
    for (std::size_t g = 0; g < scores.size(); ++g) {
        total += weights[g];
        sum += weights[g] * std::polar(1.0, t * static_cast<double>(scores[g]));
    }
    return total - std::abs(sum);
}

void expect_screen_is_right(const std::vector<std::int64_t>& scores, double weight, double need) {
    const std::vector<double> weights(scores.size(), weight);
    const auto ranges = frequencies_that_matter(scores, weights, Need{need}, 1).ranges;
    constexpr int looks = 20000;
    for (int i = 0; i <= looks; ++i) {
        const double t = std::numbers::pi * i / looks;
        const bool matters = std::any_of(ranges.begin(), ranges.end(), [&](const FrequencyRange& range) {
            return range.low <= t && t <= range.high;
        });
        EXPECT_TRUE(matters || decay(scores, weights, t) >= need) << t;
    }
}

TEST(FrequencyScreen, leaves_out_only_what_is_negligible) {
    test::Random random(5);
    for (const std::int64_t levels : {400, 4000}) {
        std::vector<std::int64_t> scores = random.sorted(400, 0, levels);
        scores.erase(std::unique(scores.begin(), scores.end()), scores.end());
        expect_screen_is_right(scores, 1.0, 40);
    }
}

// Nearly all scores even: a second peak near pi, which ties cause, must not be missed.
TEST(FrequencyScreen, keeps_the_peak_of_scores_that_are_nearly_all_even) {
    std::vector<std::int64_t> scores;
    for (std::int64_t i = 0; i < 500; ++i) {
        scores.push_back(2 * i);
    }
    scores.push_back(1001);
    const auto ranges = frequencies_that_matter(scores, std::vector<double>(scores.size(), 0.25), Need{40}, 1).ranges;
    EXPECT_GE(ranges.back().high, std::numbers::pi - 1e-9);
    expect_screen_is_right(scores, 0.25, 40);
}

TEST(FrequencyScreen, proves_everything_beyond_the_first_peak_for_many_consecutive_scores) {
    std::vector<std::int64_t> scores(20000);
    for (std::size_t i = 0; i < scores.size(); ++i) {
        scores[i] = static_cast<std::int64_t>(i);
    }
    const auto ranges = frequencies_that_matter(scores, std::vector<double>(scores.size(), 0.25), Need{45}, 1).ranges;
    ASSERT_EQ(ranges.size(), 1U);
    EXPECT_LT(ranges.front().high, 0.001);
}

} // namespace
} // namespace rankstead
