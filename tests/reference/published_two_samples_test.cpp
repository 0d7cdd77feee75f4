// Published examples of the rank sum test and the chance of superiority; sources in published.json.
#include "inquiry.h"
#include "published.h"

#include <gtest/gtest.h>

#include <cmath>
#include <cstdio>
#include <map>

namespace rks_test {
namespace {

double all_ranks(double n) {
    return n * (n + 1) / 2;
}

// The deviation of U from its mean, before the continuity step, from z and the standard deviation behind it.
double deviation(double z, double sd) {
    return std::fabs(z) * sd + 0.5;
}

double tie_sum(const std::vector<double>& first, const std::vector<double>& second) {
    std::map<double, double> times;
    for (const auto* group : {&first, &second})
        for (double value : *group)
            times[value] += 1;
    double sum = 0;
    for (const auto& [value, t] : times)
        sum += t * t * t - t;
    return sum;
}

double tied_sd(const std::vector<double>& first, const std::vector<double>& second) {
    const auto m = static_cast<double>(first.size()), n = static_cast<double>(second.size());
    return std::sqrt(m * n / 12 * (m + n + 1 - tie_sum(first, second) / ((m + n) * (m + n - 1))));
}

double untied_sd(double m, double n) {
    return std::sqrt(m * n * (m + n + 1) / 12);
}

TEST(Published, P10_flies_killed_by_two_sprays) {
    Example example("P10");
    const auto sprays = groups(example.data("A"), example.data("B"));
    example.expect("rank total A", sprays.number("statistic") + all_ranks(8), 0);
    example.expect("rank total B", 64 - sprays.number("statistic") + all_ranks(8), 0);
    const double p = sprays.number("p");
    example.expect("exact conditional two-sided p", p);
    example.expect_statement("exact two-sided p inside (0.0104, 0.021)", 0.0104 < p && p < 0.021);
}

// The source prints a normal probability as if it were a p value.
TEST(Published, P11_particles_on_cleaned_wafers) {
    Example example("P11");
    const auto a = example.data("A"), b = example.data("B");
    const auto exact = groups(a, b), approximate = groups(a, b, {{"method", "approximate"}});
    example.expect("T_A", exact.number("statistic") + all_ranks(11), 0);
    example.expect("T_B", 121 - exact.number("statistic") + all_ranks(11), 0);
    example.expect("exact conditional two-sided p", exact.number("p"));
    const double off = deviation(approximate.number("z"), tied_sd(a, b));
    example.expect("E(U)", exact.number("statistic") + off, 1e-10);
    const double untied = off / untied_sd(11, 11);
    example.expect("|z| (no tie, no continuity correction)", untied, 1e-10);
    example.expect("Phi(z) printed as probability", 1 - two_sided_normal(untied) / 2, 1e-10);
    example.expect("two-sided p without tie correction", two_sided_normal(untied), 1e-10);
    example.expect("two-sided p, tie corrected, no cc", two_sided_normal(off / tied_sd(a, b)), 1e-10);
}

TEST(Published, P12_age_at_diagnosis_of_men_and_women) {
    Example example("P12");
    const auto men = example.data("males"), women = example.data("females");
    const auto exact = groups(men, women), approximate = groups(men, women, {{"method", "approximate"}});
    example.expect("U males", exact.number("statistic"), 0);
    example.expect("U females", groups(women, men).number("statistic"), 0);
    example.expect("exact two-sided p", exact.number("p"));
    example.expect("asymptotic with cc", approximate.number("p"));
    const double off = deviation(approximate.number("z"), tied_sd(men, women));
    example.expect("asymptotic without cc (Shier: 0.09)", two_sided_normal(off / tied_sd(men, women)), 1e-10);
}

TEST(Published, P13_five_point_scale_of_two_hundred_patients) {
    Example example("P13");
    const auto levels = example.data("levels");
    const auto fresh = example.expanded("new", levels), active = example.expanded("active", levels);
    example.expect("P(new<active)+.5P(=) (statsmodels rank_compare_2indep test)",
                   groups(active, fresh).number("chance"));
    example.expect("exact two-sided rank-sum p", groups(active, fresh, {{"method", "exact"}}).number("p"));
    const auto approximate = groups(active, fresh, {{"method", "approximate"}});
    example.expect("asymptotic tie corrected, cc", approximate.number("p"), 1e-10);
    const double sd = tied_sd(active, fresh);
    example.expect("asymptotic, no cc", two_sided_normal(deviation(approximate.number("z"), sd) / sd), 1e-10);
}

TEST(Published, P15_ratings_of_normal_and_abnormal_scans) {
    Example example("P15");
    const std::vector<double> levels = {1, 2, 3, 4, 5};
    const auto abnormal = example.expanded("abnormal_1to5", levels), normal = example.expanded("normal_1to5", levels);
    const auto scans = groups(abnormal, normal, {{"chance interval", "newcombe"}});
    example.expect("W = AUC", scans.number("chance"));
    const auto limits = example.recomputed_numbers("95% CI, Newcombe 2006 method 5");
    EXPECT_NEAR(scans.number("chance lower"), limits.at(0), 1e-10);
    EXPECT_NEAR(scans.number("chance upper"), limits.at(1), 1e-10);
    for (const char* error :
         {"SE(W), distribution-free Q1,Q2", "SE, exponential-model Q1,Q2", "SE from placement values (DeLong 1988)"})
        example.not_an_answer(error);
}

TEST(Published, P17_globulin_fraction_of_two_groups) {
    Example example("P17");
    const auto one = example.data("group1"), two = example.data("group2");
    const auto table = groups(one, two, {{"interval", "table"}});
    example.expect("difference estimate", table.number("estimate"), 0);
    example.expect("95% CI lower", table.number("lower"), 0);
    example.expect("95% CI upper", table.number("upper"), 0);
    example.expect("achieved (untied null)", table.number("confidence"));
    example.expect("exact conditional two-sided p", table.number("p"));
    double critical = 0;
    ASSERT_EQ(rks_rank_sum_critical(10, 10, 0.05, 0, &critical), RKS_OK);
    example.expect("K (order number of the limit)", critical + 1, 0);
}

std::vector<double> from(double start, unsigned count) {
    std::vector<double> values;
    for (unsigned i = 0; i < count; ++i)
        values.push_back(start + i);
    return values;
}

double smallest(unsigned m, unsigned n) {
    return groups(from(0, m), from(100, n)).number("smallest p");
}

TEST(Published, P36_the_smallest_p_of_small_samples) {
    Example example("P36");
    bool none = true;
    for (unsigned m = 1; m < 4; ++m)
        for (unsigned n = 1; n < 4; ++n)
            none = none && smallest(m, n) > 0.05;
    example.expect_statement("two samples of <4: every two-sided exact p > .05", none);
    example.expect("3 v 3 smallest p", smallest(3, 3));
    example.expect("4 v 4 smallest p", smallest(4, 4));
    for (const char* test : {"signed rank", "sign"}) {
        example.expect("signed rank / sign test n=5 smallest p",
                       single(from(1, 5), 0, {{"test", test}}).number("smallest p"));
        example.expect("n=6", single(from(1, 6), 0, {{"test", test}}).number("smallest p"));
    }
}

TEST(Published, P44_table_of_the_law_of_U) {
    Example example("P44");
    for (const auto& quantity : example.quantities()) {
        unsigned m = 0, n = 0, u = 0;
        ASSERT_EQ(std::sscanf(quantity.c_str(), "m=%u n=%u P(U<=%u)", &m, &n, &u), 3) << quantity;
        double p = 0;
        ASSERT_EQ(rks_rank_sum_tail(m, n, u, -1, &p), RKS_OK);
        example.expect(quantity, p);
    }
}

} // namespace
} // namespace rks_test
