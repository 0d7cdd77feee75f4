// Published examples of the signed rank test, the sign test and limits of a median; sources in published.json.
#include "inquiry.h"
#include "published.h"

#include <gtest/gtest.h>

#include <cmath>
#include <cstdio>

namespace rks_test {
namespace {

double all_ranks(double n) {
    return n * (n + 1) / 2;
}

// Puts the continuity step of one half back: |deviation| / sd.
double uncorrected(double z, double sd) {
    return std::fabs(z) + 0.5 / sd;
}

void expect_limits(const Inquiry& inquiry, double lower, double upper) {
    EXPECT_EQ(inquiry.number("lower"), lower);
    EXPECT_EQ(inquiry.number("upper"), upper);
}

TEST(Published, P01_depression_scale_before_and_after_a_tranquilliser) {
    Example example("P01");
    const auto before = example.data("x_before"), after = example.data("y_after");
    const auto drop = pairs(after, before);
    example.expect("T+ of before-after", drop.number("statistic"), 0);
    example.expect("two-sided exact p", drop.number("p"));
    example.expect("one-sided exact p (improvement)", pairs(before, after, {{"side", "lower"}}).number("p"));
    example.expect("HL estimate of after-before", pairs(before, after).number("estimate"), 0);
    for (const char* interval : {"matching", "table"}) {
        const auto change = pairs(before, after, {{"interval", interval}});
        example.expect("CI lower (after-before)", change.number("lower"), 0);
        example.expect("CI upper", change.number("upper"), 0);
        example.expect("CI achieved confidence (book: 96%)", change.number("confidence"));
    }
}

TEST(Published, P02_darwins_maize) {
    Example example("P02");
    const auto d = example.data("d");
    const auto exact = single(d, 0);
    example.expect("rank total of negative differences", all_ranks(15) - exact.number("statistic"), 0);
    example.expect("exact two-sided p (SciPy docs)", exact.number("p"));
    example.expect("exact one-sided p (SciPy docs)", single(d, 0, {{"side", "higher"}}).number("p"));
    const double z = uncorrected(single(d, 0, {{"method", "approximate"}}).number("z"), std::sqrt(15.0 * 16 * 31 / 24));
    example.expect("normal approx two-sided, no cc (SciPy docs)", two_sided_normal(z));
}

TEST(Published, P03_hours_of_sleep_with_a_zero_and_a_tie) {
    Example example("P03");
    const auto one = example.data("drug1"), two = example.data("drug2");
    const auto drop = pairs(one, two), pratt = pairs(one, two, {{"zeros", "pratt"}});
    example.expect("T- (zero dropped, n=9)", all_ranks(9) - drop.number("statistic"), 0);
    example.expect("exact two-sided, zero dropped (2/2^9)", drop.number("p"));
    example.expect("exact two-sided, zero ranked then dropped (Pratt)", pratt.number("p"));
    example.expect("T+ Pratt", pratt.number("statistic"), 0);
    example.expect("HL all 10", drop.number("estimate"), 0);
    example.expect("normal approx, tie + continuity corrected, two-sided",
                   pairs(one, two, {{"method", "approximate"}}).number("p"));
    const auto limits = example.recomputed_numbers("95% CI");
    const auto table = pairs(one, two, {{"interval", "table"}});
    expect_limits(table, limits.at(0), limits.at(1));
    EXPECT_DOUBLE_EQ(table.number("confidence"), limits.at(2));
}

TEST(Published, P04_oxygen_saturation_of_ten_patients) {
    Example example("P04");
    const auto admission = example.data("admission"), later = example.data("six_hours");
    const auto ranked = pairs(admission, later), signs = pairs(admission, later, {{"test", "sign"}});
    example.expect("smaller rank sum R-", all_ranks(10) - ranked.number("statistic"), 0);
    example.expect("signed rank two-sided p", ranked.number("p"));
    example.expect("sign test S", 10 - signs.number("statistic"), 0);
    example.expect("sign test two-sided p", signs.number("p"));
}

// Contradicted: the old tables list the T nearest to the level.
TEST(Published, P06_nursery_school_twins_are_not_significant) {
    Example example("P06");
    const auto twins = single(example.data("d"), 0);
    example.expect("T", all_ranks(8) - twins.number("statistic"), 0);
    example.expect("exact two-sided p", twins.number("p"));
    example.expect_statement("T=4 significant at .05 two-sided (book, its Table G)", twins.number("p") <= 0.05);
    double critical = 0;
    ASSERT_EQ(rks_signed_rank_critical(8, 0.05, 0, &critical), RKS_OK);
    EXPECT_EQ(critical, 3);
}

std::vector<double> signs(std::size_t above, std::size_t below) {
    std::vector<double> values(above, 1.0);
    values.insert(values.end(), below, -1.0);
    return values;
}

TEST(Published, P07_three_of_fourteen_signs) {
    Example example("P07");
    const auto inquiry = single(signs(3, 11), 0, {{"test", "sign"}, {"side", "lower"}});
    example.expect("one-tailed p", inquiry.number("p"));
}

TEST(Published, P08_beak_clapping_of_twenty_five_embryos) {
    Example example("P08");
    const auto counts = pairs(example.data("dark"), example.data("light"), {{"test", "sign"}, {"side", "higher"}});
    example.expect("B", counts.number("statistic"), 0);
    example.expect("one-sided P(B>=21)", counts.number("p"));
}

struct OrderStatistics {
    unsigned n = 0, lower = 0, upper = 0;
    double percent = 0;
};

// "n=9 [x(2),x(8)] confidence %"
OrderStatistics parse(const std::string& quantity) {
    OrderStatistics row;
    EXPECT_EQ(std::sscanf(quantity.c_str(), "n=%u [x(%u),x(%u)]", &row.n, &row.lower, &row.upper), 3) << quantity;
    return row;
}

std::vector<double> one_to(unsigned n) {
    std::vector<double> values;
    for (unsigned i = 1; i <= n; ++i)
        values.push_back(i);
    return values;
}

// A decimal just below the confidence of x(lower), x(upper).
std::string level_below(unsigned n, unsigned lower) {
    double tail = 0, term = std::pow(0.5, n);
    for (unsigned k = 0; k < lower; ++k) {
        tail += term;
        term *= static_cast<double>(n - k) / (k + 1);
    }
    char text[32];
    std::snprintf(text, sizeof text, "%.6f", std::floor((1 - 2 * tail) * 1e6) / 1e6);
    return text;
}

TEST(Published, P37_table_of_confidence_intervals_of_a_median) {
    Example example("P37");
    for (const auto& quantity : example.quantities()) {
        const auto row = parse(quantity);
        for (const char* interval : {"matching", "table"}) {
            const auto median = single(
                one_to(row.n), 0, {{"test", "sign"}, {"interval", interval}, {"level", level_below(row.n, row.lower)}});
            expect_limits(median, row.lower, row.upper);
            example.expect(quantity, 100 * median.number("confidence"));
        }
    }
}

TEST(Published, P38_hours_of_twelve_flexed_cords) {
    Example example("P38");
    auto values = example.data("values");
    for (const char* interval : {"matching", "table"}) {
        const auto cords = single(values, 0, {{"test", "sign"}, {"interval", interval}});
        example.expect("median", cords.number("estimate"), 0);
        example.expect("95% lower", cords.number("lower"), 0);
        example.expect("95% upper", cords.number("upper"), 0);
        example.expect("achieved", cords.number("confidence"));
        example.expect("k", cords.number("lower") == values.at(2) ? 3 : 0, 0);
    }
}

} // namespace
} // namespace rks_test
