// studies/pairs.cpp
#include "data.h"
#include "studies/studies.h"

#include <gtest/gtest.h>

namespace rankstead {
namespace {

using test::blank;
using test::cells;
using test::column;
using test::number;
using test::text;

Outcome pairs(const Block& before, const Block& after, std::string_view settings = "") {
    return run_pairs({&before, &after}, test::with("pairs", settings));
}

// Hollander & Wolfe (1973, p. 29; 1999, p. 39 and 53): depression scale factor IV of 9 patients before and after a
// tranquilliser. T+ of before - after 40, two-sided p .0391, estimate -.46, limits -.786 and -.010 at 96.1 %.
TEST(Pairs, published_depression_scale) {
    const Outcome outcome = pairs(column("before", {1.83, 0.50, 1.62, 2.48, 1.68, 1.88, 1.55, 3.06, 1.30}),
                                  column("after", {0.878, 0.647, 0.598, 2.05, 1.06, 1.29, 1.06, 3.14, 1.29}));
    EXPECT_EQ(outcome.statistic, 45 - 40);
    EXPECT_EQ(outcome.p, 0.0390625);
    EXPECT_EQ(outcome.estimate, -0.46);
    EXPECT_EQ(outcome.lower.value, -0.786);
    EXPECT_EQ(outcome.upper.value, -0.01);
    EXPECT_EQ(outcome.confidence.value, 246.0 / 256);
}

TEST(Pairs, are_taken_as_after_minus_before) {
    const Outcome outcome = pairs(column("before", {1, 2, 3}), column("after", {5, 7, 9}));
    EXPECT_EQ(outcome.estimate, 5.0);
    EXPECT_EQ(outcome.chance, 1.0);
}

TEST(Pairs, are_described_by_the_complete_ones_only) {
    const Outcome outcome =
        pairs(cells("before", {number(1), number(100), number(3)}), cells("after", {number(2), blank(), number(5)}));
    EXPECT_EQ(outcome.n, 2U);
    EXPECT_EQ(outcome.first.description.median, 2.0);
    EXPECT_EQ(outcome.second->description.median, 3.5);
    EXPECT_EQ(outcome.ledgers[0].unpaired, 1U);
}

TEST(Pairs, are_named_by_setting_then_heading_then_argument) {
    const Block before = cells("before", {text("June"), number(1), number(2)});
    const Block after = cells("after", {text("July"), number(2), number(4)});
    EXPECT_EQ(pairs(before, after).first.name, "June");
    EXPECT_EQ(pairs(before, after, "second name=Summer").second->name, "Summer");
    EXPECT_EQ(pairs(column("before", {1}), column("after", {2})).first.name, "before");
}

TEST(Pairs, do_not_depend_on_the_order_of_the_rows_but_for_the_fingerprint) {
    const Outcome one = pairs(column("before", {1, 2, 3, 4}), column("after", {5, 1, 8, 4}));
    const Outcome other = pairs(column("before", {4, 3, 2, 1}), column("after", {4, 8, 1, 5}));
    EXPECT_EQ(one.p, other.p);
    EXPECT_EQ(one.estimate, other.estimate);
    EXPECT_NE(one.fingerprint, other.fingerprint);
}

TEST(Pairs, count_those_equal_only_at_fifteen_digits_as_unchanged) {
    const Outcome outcome = pairs(column("before", {0.3, 1}), column("after", {0.1 + 0.2, 2}));
    EXPECT_EQ(outcome.zeros, 1U);
    EXPECT_EQ(outcome.observations.equal_at_fifteen_digits, 1U);
}

TEST(Pairs, of_two_blocks_are_read_row_by_row) {
    const Block before{"before", {number(1), number(2), number(3), number(4)}, 2, 2};
    const Block after{"after", {number(2), number(4), number(6), number(8)}, 2, 2};
    EXPECT_EQ(pairs(before, after).statistic, 10.0);
}

} // namespace
} // namespace rankstead
