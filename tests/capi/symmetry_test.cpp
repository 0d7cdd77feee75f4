// Properties that hold whatever the data: mirror images, shifts, scales, order, monotone transforms.
#include "inquiry.h"
#include "random_data.h"

#include <gtest/gtest.h>

#include <algorithm>
#include <cmath>

namespace rks_test {
namespace {

constexpr int rounds = 150;
const std::vector<std::string> levels = {"0.95", "0.9", "0.8", "0.5"};
const std::vector<std::string> intervals = {"matching", "table"};

std::string opposite(const std::string& side) {
    return side == "higher" ? "lower" : side == "lower" ? "higher" : side;
}

void expect_same_or_both_absent(double expected, double got) {
    if (std::isnan(expected))
        EXPECT_TRUE(std::isnan(got)) << got;
    else
        EXPECT_EQ(expected, got);
}

// What swapping the two columns has to do, to the last bit.
void expect_mirrored(const Inquiry& straight, const Inquiry& swapped) {
    EXPECT_EQ(straight.number("p"), swapped.number("p"));
    EXPECT_EQ(straight.number("estimate"), -swapped.number("estimate"));
    expect_same_or_both_absent(straight.number("lower"), -swapped.number("upper"));
    expect_same_or_both_absent(straight.number("upper"), -swapped.number("lower"));
    expect_same_or_both_absent(straight.number("confidence"), swapped.number("confidence"));
    expect_same_or_both_absent(straight.number("smallest p"), swapped.number("smallest p"));
    EXPECT_EQ(straight.text("arrangements"), swapped.text("arrangements"));
}

Settings with_side(Settings settings, const std::string& side) {
    settings.emplace_back("side", side);
    return settings;
}

TEST(Symmetry, swapping_two_groups_swaps_the_tails_and_mirrors_the_limits) {
    RandomData random(1);
    for (int round = 0; round < rounds; ++round) {
        const auto first = doubles(random.tied(static_cast<std::size_t>(random.between(1, 12))));
        const auto second = doubles(random.tied(static_cast<std::size_t>(random.between(1, 12))));
        const Settings settings = {{"level", random.one_of(levels)}, {"interval", random.one_of(intervals)}};
        for (const char* side : {"two-sided", "higher", "lower"}) {
            const auto straight = groups(first, second, with_side(settings, side));
            const auto swapped = groups(second, first, with_side(settings, opposite(side)));
            expect_mirrored(straight, swapped);
            EXPECT_EQ(straight.number("statistic") + swapped.number("statistic"),
                      static_cast<double>(first.size() * second.size()));
        }
    }
}

TEST(Symmetry, swapping_two_groups_mirrors_the_chance) {
    RandomData random(2);
    for (int round = 0; round < rounds; ++round) {
        const auto first = doubles(random.tied(static_cast<std::size_t>(random.between(2, 12))));
        const auto second = doubles(random.tied(static_cast<std::size_t>(random.between(2, 12))));
        for (const char* interval : {"placement", "newcombe"}) {
            const auto straight = groups(first, second, {{"chance interval", interval}});
            const auto swapped = groups(second, first, {{"chance interval", interval}});
            EXPECT_NEAR(straight.number("chance"), 1 - swapped.number("chance"), 1e-15);
            EXPECT_NEAR(straight.number("chance lower"), 1 - swapped.number("chance upper"), 1e-12);
            EXPECT_NEAR(straight.number("chance upper"), 1 - swapped.number("chance lower"), 1e-12);
            // The logit of the placement interval cannot reach a chance of 0 or 1.
            const double inside = std::clamp(straight.number("chance"), 0.5 / 145, 1 - 0.5 / 145);
            EXPECT_LE(straight.number("chance lower"), inside);
            EXPECT_GE(straight.number("chance upper"), inside);
        }
    }
}

TEST(Symmetry, swapping_before_and_after_swaps_the_tails_and_mirrors_the_limits) {
    RandomData random(3);
    for (int round = 0; round < rounds; ++round) {
        const auto size = static_cast<std::size_t>(random.between(1, 12));
        const auto before = doubles(random.tied(size)), after = doubles(random.tied(size));
        const Settings settings = {{"level", random.one_of(levels)},
                                   {"interval", random.one_of(intervals)},
                                   {"zeros", random.one_of<std::string>({"drop", "pratt"})},
                                   {"test", random.one_of<std::string>({"signed rank", "sign"})}};
        for (const char* side : {"two-sided", "higher", "lower"})
            expect_mirrored(pairs(before, after, with_side(settings, side)),
                            pairs(after, before, with_side(settings, opposite(side))));
    }
}

TEST(Symmetry, swapping_before_and_after_mirrors_the_chance_of_a_rise) {
    RandomData random(9);
    for (int round = 0; round < rounds; ++round) {
        const auto size = static_cast<std::size_t>(random.between(1, 12));
        const auto before = doubles(random.tied(size)), after = doubles(random.tied(size));
        const auto straight = pairs(before, after), swapped = pairs(after, before);
        EXPECT_NEAR(straight.number("chance"), 1 - swapped.number("chance"), 1e-15);
        EXPECT_NEAR(straight.number("chance lower"), 1 - swapped.number("chance upper"), 1e-12);
        EXPECT_LE(straight.number("chance lower"), straight.number("chance"));
        EXPECT_GE(straight.number("chance upper"), straight.number("chance"));
    }
}

Tenths shifted(Tenths values, std::int64_t tenths) {
    for (auto& value : values)
        value += tenths;
    return values;
}

Tenths scaled(Tenths values, std::int64_t factor) {
    for (auto& value : values)
        value *= factor;
    return values;
}

// A result is a whole number of fortieths: moved by that many tenths it is again the nearest double.
double moved(double result, std::int64_t tenths) {
    return static_cast<double>(std::llround(result * 40) + 4 * tenths) / 40;
}

TEST(Symmetry, a_shift_of_one_group_moves_estimate_and_limits_exactly) {
    RandomData random(4);
    for (int round = 0; round < rounds; ++round) {
        const auto first = random.tied(static_cast<std::size_t>(random.between(4, 12)));
        const auto second = random.tied(static_cast<std::size_t>(random.between(4, 12)));
        const auto shift = random.between(-999, 999);
        const auto plain = groups(doubles(first), doubles(second));
        const auto both = groups(doubles(shifted(first, shift)), doubles(shifted(second, shift)));
        const auto one = groups(doubles(shifted(first, shift)), doubles(second), {{"margin", decimal_text(shift, 10)}});
        for (const char* answer : {"p", "statistic", "confidence"}) {
            EXPECT_EQ(plain.number(answer), both.number(answer)) << answer;
            EXPECT_EQ(plain.number(answer), one.number(answer)) << answer;
        }
        for (const char* answer : {"estimate", "lower", "upper"}) {
            EXPECT_EQ(plain.number(answer), both.number(answer)) << answer;
            EXPECT_EQ(moved(plain.number(answer), shift), one.number(answer)) << answer << ' ' << shift;
        }
    }
}

TEST(Symmetry, a_shift_of_after_moves_estimate_and_limits_exactly) {
    RandomData random(5);
    for (int round = 0; round < rounds; ++round) {
        const auto size = static_cast<std::size_t>(random.between(6, 12));
        const auto before = random.tied(size), after = random.tied(size);
        const auto shift = random.between(-999, 999);
        const std::string test = random.one_of<std::string>({"signed rank", "sign"});
        const auto plain = pairs(doubles(before), doubles(after), {{"test", test}});
        const auto later = pairs(doubles(before), doubles(shifted(after, shift)),
                                 {{"test", test}, {"margin", decimal_text(shift, 10)}});
        EXPECT_EQ(plain.number("p"), later.number("p"));
        EXPECT_EQ(plain.number("statistic"), later.number("statistic"));
        for (const char* answer : {"estimate", "lower", "upper"})
            EXPECT_EQ(moved(plain.number(answer), shift), later.number(answer)) << answer << ' ' << shift;
    }
}

TEST(Symmetry, a_scale_moves_estimate_and_limits_exactly) {
    RandomData random(6);
    for (int round = 0; round < rounds; ++round) {
        const auto first = random.tied(static_cast<std::size_t>(random.between(4, 12)));
        const auto second = random.tied(static_cast<std::size_t>(random.between(4, 12)));
        const auto factor = random.one_of<std::int64_t>({2, 3, 7, 10, 1000});
        const auto plain = groups(doubles(first), doubles(second));
        const auto larger = groups(doubles(scaled(first, factor)), doubles(scaled(second, factor)));
        const auto negated = groups(doubles(scaled(first, -factor)), doubles(scaled(second, -factor)));
        EXPECT_EQ(plain.number("p"), larger.number("p"));
        EXPECT_EQ(plain.number("p"), negated.number("p"));
        for (const auto& [answer, mirrored] :
             {std::pair{"estimate", "estimate"}, {"lower", "upper"}, {"upper", "lower"}}) {
            const double expected = static_cast<double>(std::llround(plain.number(answer) * 20) * factor) / 20;
            EXPECT_EQ(larger.number(answer), expected) << answer;
            EXPECT_EQ(negated.number(mirrored), -expected) << answer;
        }
    }
}

const std::vector<const char*> all_numbers = {"p",         "estimate",   "lower", "upper", "confidence",
                                              "statistic", "smallest p", "n",     "tied",  "median first"};

TEST(Symmetry, the_order_of_the_values_does_not_matter) {
    RandomData random(7);
    for (int round = 0; round < rounds; ++round) {
        auto first = random.tied(static_cast<std::size_t>(random.between(1, 30)));
        auto second = random.tied(static_cast<std::size_t>(random.between(1, 30)));
        const auto straight = groups(doubles(first), doubles(second));
        random.shuffle(first);
        random.shuffle(second);
        const auto shuffled = groups(doubles(first), doubles(second));
        for (const char* answer : all_numbers)
            expect_same_or_both_absent(straight.number(answer), shuffled.number(answer));
        for (const char* answer : {"chance lower", "chance upper"})
            if (straight.status(answer) == RKS_OK) {
                EXPECT_NEAR(straight.number(answer), shuffled.number(answer), 1e-12);
            }
        EXPECT_EQ(straight.text("notes"), shuffled.text("notes"));
    }
}

TEST(Symmetry, monotone_transforms_keep_p_and_chance_of_groups) {
    RandomData random(8);
    for (int round = 0; round < rounds; ++round) {
        const auto first = random.tied(static_cast<std::size_t>(random.between(1, 20)));
        const auto second = random.tied(static_cast<std::size_t>(random.between(1, 20)));
        const auto cubed = [](const Tenths& values) {
            std::vector<double> result;
            for (const auto value : values)
                result.push_back(static_cast<double>(value * value * value + value) / 1000);
            return result;
        };
        const auto plain = groups(doubles(first), doubles(second)), bent = groups(cubed(first), cubed(second));
        for (const char* answer : {"p", "statistic", "chance", "smallest p"})
            EXPECT_EQ(plain.number(answer), bent.number(answer)) << answer;
    }
}

TEST(Symmetry, an_estimate_of_zero_has_no_sign) {
    EXPECT_EQ(groups({1, 2}, {1, 2}).text("estimate"), "0");
    EXPECT_EQ(pairs({1, 2, 3}, {1, 2, 3}).text("estimate"), "0");
    EXPECT_EQ(pairs({3, 2, 1}, {2, 2, 2}).text("estimate"), "0");
}

} // namespace
} // namespace rks_test
