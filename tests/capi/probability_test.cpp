// p, its tails, the arrangements behind it, the smallest p and the chance never contradict each other.
#include "trial.h"

#include <gtest/gtest.h>

#include <algorithm>
#include <cmath>

namespace rks_test {
namespace {

// "43 of 1,024"
double share_of(std::string text) {
    text.erase(std::remove(text.begin(), text.end(), ','), text.end());
    const auto split = text.find(" of ");
    return split == std::string::npos ? NAN : std::stod(text) / std::stod(text.substr(split + 4));
}

TEST(Probability, arrangements_make_p_and_p_is_a_probability) {
    RandomData random(16);
    for (int round = 0; round < 300; ++round) {
        const auto trial = random_trial(random, round % 2 == 0 ? "groups" : "pairs");
        SCOPED_TRACE(describe(trial));
        const auto inquiry = trial.ask("0");
        const double p = inquiry.number("p");
        EXPECT_TRUE(p > 0 && p <= 1) << p;
        EXPECT_NEAR(share_of(inquiry.text("arrangements")), p, 1e-14);
    }
}

TEST(Probability, two_sided_is_twice_the_smaller_tail_and_tails_overlap) {
    RandomData random(17);
    for (int round = 0; round < 200; ++round) {
        auto trial = random_trial(random, round % 2 == 0 ? "groups" : "pairs");
        std::vector<double> p;
        for (const auto& side : sides) {
            trial.settings.emplace_back("side", side);
            p.push_back(trial.ask("0").number("p"));
        }
        EXPECT_EQ(p[0], std::min(1.0, 2 * std::min(p[1], p[2]))) << describe(trial);
        EXPECT_GE(p[1] + p[2], 1 - 1e-12) << describe(trial);
    }
}

TEST(Probability, no_two_sided_p_is_below_the_smallest) {
    RandomData random(18);
    for (int round = 0; round < 200; ++round) {
        auto trial = random_trial(random, round % 2 == 0 ? "groups" : "pairs");
        trial.settings.emplace_back("side", "two-sided");
        const auto inquiry = trial.ask("0");
        EXPECT_GE(inquiry.number("p"), inquiry.number("smallest p") * (1 - 1e-14)) << describe(trial);
    }
}

TEST(Probability, chance_is_U_over_the_number_of_pairs) {
    RandomData random(19);
    for (int round = 0; round < 100; ++round) {
        const auto trial = random_trial(random, "groups");
        const auto inquiry = trial.ask("0");
        const auto all = static_cast<double>(trial.one.size() * trial.other.size());
        EXPECT_DOUBLE_EQ(inquiry.number("chance"), inquiry.number("statistic") / all) << describe(trial);
    }
}

} // namespace
} // namespace rks_test
