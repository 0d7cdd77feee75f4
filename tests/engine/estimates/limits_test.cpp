// estimates/limits.h: the search for the first gap inside, against a scan of all gaps.
#include "estimates/limits.h"

#include "data.h"

#include <gtest/gtest.h>

#include <algorithm>
#include <array>
#include <cmath>

namespace rankstead {
namespace {

// Gaps by breakpoint as a test writes them down: equal breakpoints share one, upper tails rise from gap to gap.
struct Ladder {
    std::vector<std::int64_t> breakpoints;   // ascending
    std::vector<std::uint64_t> upper_counts; // for k = 0 to all, out of `total`
    std::uint64_t total = 1;

    [[nodiscard]] Gap at(std::int64_t k) const {
        std::int64_t first = k;
        std::int64_t last = k;
        const auto value = [&](std::int64_t i) { return breakpoints[static_cast<std::size_t>(i - 1)]; };
        while (first > 1 && value(first - 1) == value(k)) {
            --first;
        }
        while (k > 0 && last < static_cast<std::int64_t>(breakpoints.size()) && value(last + 1) == value(k)) {
            ++last;
        }
        // The gap lies above all the equal breakpoints, so its law is that of the last of them.
        return {from_counts({total, upper_counts[static_cast<std::size_t>(last)], total}), first, last};
    }
    [[nodiscard]] GapLaw gaps() const {
        return {[this](std::int64_t k) { return at(k); }, {}};
    }
};

Ladder random_ladder(test::Random& random) {
    Ladder ladder;
    const std::int64_t size = random.whole(1, 40);
    ladder.total = 1000;
    std::int64_t value = 0;
    for (std::int64_t i = 0; i < size; ++i) {
        value += random.whole(0, 2);
        ladder.breakpoints.push_back(value);
    }
    for (std::int64_t i = 0; i < size; ++i) {
        ladder.upper_counts.push_back(static_cast<std::uint64_t>(random.whole(0, 1000)));
    }
    std::sort(ladder.upper_counts.begin(), ladder.upper_counts.end());
    ladder.upper_counts.push_back(1000);
    return ladder;
}

// The lowest k whose gap exceeds the rate, gap by gap.
std::int64_t scanned(const Ladder& ladder, const Fraction& rate) {
    const auto last = static_cast<std::int64_t>(ladder.breakpoints.size());
    for (std::int64_t k = 0; k < last; ++k) {
        const Gap gap = ladder.at(k);
        if (!upper_at_most(gap.tails, rate)) {
            return gap.first;
        }
    }
    return last;
}

TEST(FirstGapInside, is_what_a_scan_of_all_gaps_finds_from_every_guess) {
    test::Random random(31);
    for (int i = 0; i < 300; ++i) {
        const Ladder ladder = random_ladder(random);
        const auto last = static_cast<std::int64_t>(ladder.breakpoints.size());
        const Fraction rate{random.whole(1, 500), 1000};
        for (std::int64_t guess = -2; guess <= last + 2; ++guess) {
            for (const double spread : {0.0, 10.0, 500.0}) {
                const std::int64_t k = first_gap_inside(ladder.gaps(), last, rate, guess, spread).k;
                ASSERT_EQ(ladder.at(k).first, ladder.at(scanned(ladder, rate)).first)
                    << "guess " << guess << ", spread " << spread;
            }
        }
    }
}

// A million gaps whose tails rise like a normal law's, the first inside being the one that is asked for.
struct NormalGaps {
    static constexpr std::int64_t last = 1'000'000;
    static constexpr double spread = 6400;
    std::int64_t first;
    int asked = 0;

    GapTails tails() {
        return [this](std::int64_t k) {
            ++asked;
            Gap gap{{}, k, k};
            // Phi(-1.959964) = 0.025 (Abramowitz & Stegun 1964, table 26.1), half a gap before the first inside.
            const double deviate = 1.959964 - (static_cast<double>(k - first) + 0.5) / spread;
            gap.tails.upper = std::erfc(deviate / std::sqrt(2.0)) / 2;
            return gap;
        };
    }
};

TEST(FirstGapInside, asks_for_few_of_many_gaps) {
    for (const std::int64_t guess : {400'000, 470'000, 479'000, 520'000}) {
        NormalGaps gaps{480'000};
        EXPECT_EQ(first_gap_inside({gaps.tails(), {}}, NormalGaps::last, {1, 40}, guess, NormalGaps::spread).k,
                  480'000);
        EXPECT_LE(gaps.asked, 8) << guess;
    }
}

// A law that leaps from 0 to 1 leads the search astray; halving the bracket ends it.
TEST(FirstGapInside, halves_the_bracket_where_the_law_is_nothing_like_a_normal_one) {
    int asked = 0;
    const GapTails tails = [&](std::int64_t k) {
        ++asked;
        Gap gap{{}, k, k};
        gap.tails.upper = k < 480'000 ? 0.0 : 1.0;
        return gap;
    };
    EXPECT_EQ(first_gap_inside({tails, {}}, NormalGaps::last, {1, 40}, 479'000, 6400.0).k, 480'000);
    EXPECT_LE(asked, 30);
}

// The rough law is three gaps off; the exact one corrects it.
TEST(FirstGapInside, asks_the_exact_law_only_around_what_the_rough_one_finds) {
    for (const std::int64_t off : {-3, 0, 3}) {
        NormalGaps exact{480'000};
        NormalGaps rough{480'000 + off};
        const FirstInside found =
            first_gap_inside({exact.tails(), rough.tails()}, NormalGaps::last, {1, 40}, 470'000, NormalGaps::spread);
        EXPECT_EQ(found.k, 480'000);
        EXPECT_EQ(found.outside->upper, exact.tails()(479'999).tails.upper);
        EXPECT_LE(exact.asked, 4); // one of them just above
        EXPECT_GE(rough.asked, 2);
    }
}

// Standard normal 2.5% point 1.959964 (Abramowitz & Stegun 1964): 50 - 1.959964 * 10 - 0.5 = 29.9, upwards 30.
TEST(GuessedGap, is_the_normal_approximation_to_the_critical_number) {
    EXPECT_EQ(guessed_gap(100, 10.0, {25, 1000}), 30);
}

TEST(GuessedGap, stays_within_the_breakpoints) {
    EXPECT_EQ(guessed_gap(3, 100.0, {25, 1000}), 0);
    EXPECT_EQ(guessed_gap(3, 0.0, {1, 2}), 1);
}

OrderedSums<std::int64_t> as_sums(const Ladder& ladder) {
    return OrderedSums<std::int64_t>::values(ladder.breakpoints);
}

TEST(MatchingLowerLimit, is_the_breakpoint_where_the_tail_first_exceeds_its_rate) {
    const Ladder ladder{{10, 20, 20, 30}, {1, 2, 3, 6, 20}, 20};
    // Upper tails: below 10 1/20, above 10 2/20, above both 20s 6/20.
    const auto limit = matching_lower_limit(as_sums(ladder), ladder.gaps(), {3, 20}, 1.0);
    ASSERT_TRUE(limit.value);
    EXPECT_EQ(*limit.value, 20);
    EXPECT_EQ(limit.outside, 2.0 / 20);
}

TEST(MatchingLowerLimit, at_exactly_the_rate_a_gap_is_still_outside) {
    const Ladder ladder{{10, 20, 20, 30}, {1, 2, 3, 6, 20}, 20};
    EXPECT_EQ(matching_lower_limit(as_sums(ladder), ladder.gaps(), {2, 20}, 1.0).value, 20);
    EXPECT_EQ(matching_lower_limit(as_sums(ladder), ladder.gaps(), {19, 200}, 1.0).value, 10);
}

TEST(MatchingLowerLimit, does_not_exist_where_even_the_lowest_gap_is_inside) {
    const Ladder ladder{{10, 20}, {2, 5, 20}, 20};
    EXPECT_FALSE(matching_lower_limit(as_sums(ladder), ladder.gaps(), {1, 20}, 1.0).value);
}

TEST(TableLowerLimit, is_the_order_statistic_of_the_critical_number) {
    // The law without ties, so every k stands for itself: P0(S <= 0) = 1/20, P0(S <= 1) = 2/20, P0(S <= 2) = 4/20.
    const GapLaw untied{[](std::int64_t k) {
                            constexpr std::array<std::uint64_t, 5> counts{1, 2, 4, 8, 20};
                            return Gap{from_counts({20, counts[static_cast<std::size_t>(k)], 20}), k, k};
                        },
                        {}};
    const auto sums = OrderedSums<std::int64_t>::values({10, 20, 20, 30});
    const auto limit = table_lower_limit(sums, untied, {2, 20}, 1.0);
    EXPECT_EQ(limit.value, 20); // the third would need 4/20
    EXPECT_EQ(limit.outside, 2.0 / 20);
    EXPECT_EQ(table_lower_limit(sums, untied, {4, 20}, 1.0).value, 20);
    EXPECT_EQ(table_lower_limit(sums, untied, {4, 20}, 1.0).outside, 4.0 / 20);
    EXPECT_FALSE(table_lower_limit(sums, untied, {1, 100}, 1.0).value);
}

} // namespace
} // namespace rankstead
