// estimates/chance.h: each interval against its own definition, worked out here in another way.
#include "estimates/chance.h"

#include "data.h"

#include <boost/math/distributions/normal.hpp>
#include <boost/math/distributions/students_t.hpp>

#include <gtest/gtest.h>

#include <algorithm>
#include <cmath>
#include <numeric>

namespace rankstead {
namespace {

using Values = std::vector<std::int64_t>;

struct Samples {
    Values first;
    Values second;
    [[nodiscard]] PooledRanking ranking() const { return rank_pooled(first, second, std::int64_t{0}); }
};

Samples drawn(test::Random& random, std::int64_t m, std::int64_t n, std::int64_t lead) {
    return {random.sorted(m, lead, 9 + lead), random.sorted(n, 0, 9)};
}

// The share of `others` below `value`, ties counted half.
double placement(std::int64_t value, const Values& others) {
    double below = 0;
    for (const std::int64_t other : others) {
        below += other < value ? 1 : other == value ? 0.5 : 0;
    }
    return below / static_cast<double>(others.size());
}

std::vector<double> placements(const Values& values, const Values& others) {
    std::vector<double> result;
    for (const std::int64_t value : values) {
        result.push_back(placement(value, others));
    }
    return result;
}

double mean(const std::vector<double>& values) {
    return std::accumulate(values.begin(), values.end(), 0.0) / static_cast<double>(values.size());
}

// Variance of the mean.
double variance_of_mean(const std::vector<double>& values) {
    double squares = 0;
    for (const double value : values) {
        squares += (value - mean(values)) * (value - mean(values));
    }
    const auto n = static_cast<double>(values.size());
    return squares / (n - 1) / n;
}

TEST(Chance, is_the_share_of_pairs_in_which_the_first_is_higher) {
    test::Random random(41);
    for (int i = 0; i < 50; ++i) {
        const Samples samples = drawn(random, random.whole(1, 9), random.whole(1, 9), random.whole(0, 3));
        EXPECT_NEAR(chance_of(samples.ranking()), mean(placements(samples.first, samples.second)), 1e-15);
    }
}

// The definition of the placement interval: logit of the chance drawn in by half a pair, plus and minus Student t times
// the standard error, floored at a quarter of the variance of Hanley & McNeil (1982).
Interval plain_placement_interval(const Samples& samples, double rate) {
    const auto m = static_cast<double>(samples.first.size());
    const auto n = static_cast<double>(samples.second.size());
    const std::vector<double> of_first = placements(samples.first, samples.second);
    const double a = variance_of_mean(of_first);
    const double b = variance_of_mean(placements(samples.second, samples.first));
    const double t = (m * n * mean(of_first) + 0.5) / (m * n + 1);
    const double s = (m + n) / 2 - 1;
    const double floor = t * (1 - t) * (1 + s * (1 - t) / (2 - t) + s * t / (1 + t)) / (m * n) / 4;
    const double freedom = a + b > 0 ? std::max(1.0, (a + b) * (a + b) / (a * a / (m - 1) + b * b / (n - 1)))
                                     : std::max(1.0, std::min(m, n) - 1);
    const boost::math::students_t_distribution<double> student(freedom);
    const double reach = quantile(student, 1 - rate) * std::sqrt(std::max(a + b, floor));
    const double centre = std::log(t) - std::log(1 - t);
    const auto back = [&](double x) { return std::exp(x) / (1 + std::exp(x)); };
    return {back(centre - reach / (t * (1 - t))), back(centre + reach / (t * (1 - t)))};
}

TEST(PlacementInterval, follows_its_definition) {
    test::Random random(42);
    for (int i = 0; i < 60; ++i) {
        const Samples samples = drawn(random, random.whole(2, 20), random.whole(2, 20), random.whole(0, 9));
        for (const double rate : {0.025, 0.05, 0.005}) {
            const auto interval = placement_interval(samples.ranking(), rate);
            ASSERT_TRUE(interval);
            const Interval expected = plain_placement_interval(samples, rate);
            EXPECT_NEAR(interval->lower, expected.lower, 1e-11);
            EXPECT_NEAR(interval->upper, expected.upper, 1e-11);
        }
    }
}

TEST(PlacementInterval, of_separated_samples_is_neither_a_point_nor_all) {
    const Samples separated{{11, 12, 13, 14, 15}, {1, 2, 3, 4, 5}};
    const auto interval = placement_interval(separated.ranking(), 0.025);
    ASSERT_TRUE(interval);
    EXPECT_GT(interval->lower, 0.5);
    EXPECT_LT(interval->lower, 0.99);
    EXPECT_GT(interval->upper, 0.99);
    EXPECT_LE(interval->upper, 1.0);
}

TEST(PlacementInterval, of_swapped_samples_is_mirrored) {
    test::Random random(43);
    for (int i = 0; i < 20; ++i) {
        const Samples samples = drawn(random, 8, 11, random.whole(0, 5));
        const auto interval = placement_interval(samples.ranking(), 0.025);
        const auto mirrored = placement_interval(Samples{samples.second, samples.first}.ranking(), 0.025);
        EXPECT_NEAR(interval->lower, 1 - mirrored->upper, 1e-13);
        EXPECT_NEAR(interval->upper, 1 - mirrored->lower, 1e-13);
    }
}

TEST(PlacementInterval, does_not_exist_for_a_group_of_one) {
    EXPECT_FALSE(placement_interval(Samples{{5}, {1, 2, 3}}.ranking(), 0.025));
    EXPECT_FALSE(placement_interval(Samples{{1, 2, 3}, {5}}.ranking(), 0.025));
}

// Newcombe (2006), method 5.
double newcombe_variance(double t, double m, double n) {
    const double s = (m + n) / 2 - 1;
    return t * (1 - t) * (1 + s * (1 - t) / (2 - t) + s * t / (1 + t)) / (m * n);
}

TEST(NewcombeInterval, solves_its_equation_at_both_ends) {
    test::Random random(44);
    for (int i = 0; i < 60; ++i) {
        const Samples samples = drawn(random, random.whole(2, 20), random.whole(2, 20), random.whole(0, 5));
        const auto m = static_cast<double>(samples.first.size());
        const auto n = static_cast<double>(samples.second.size());
        const double theta = chance_of(samples.ranking());
        if (theta == 0 || theta == 1) {
            continue; // then one end is the end of the scale
        }
        const double z = quantile(boost::math::normal_distribution<double>(), 0.975);
        const Interval interval = newcombe_interval(samples.ranking(), 0.025);
        for (const double t : {interval.lower, interval.upper}) {
            EXPECT_NEAR(std::fabs(t - theta), z * std::sqrt(newcombe_variance(t, m, n)), 1e-12);
        }
        EXPECT_LT(interval.lower, theta);
        EXPECT_GT(interval.upper, theta);
    }
}

TEST(NewcombeInterval, of_separated_samples_reaches_the_end_of_the_scale) {
    const Interval interval = newcombe_interval(Samples{{11, 12, 13}, {1, 2, 3}}.ranking(), 0.025);
    EXPECT_EQ(interval.upper, 1.0);
    EXPECT_LT(interval.lower, 1.0);
}

// Hanley & McNeil, Radiology 143 (1982) 29-36: CT ratings on a scale of five, 58 normal and 51 abnormal; W = 0.893.
// The limits are not in the paper: as recomputed for P15 in tests/reference/published.json.
TEST(NewcombeInterval, published_ct_ratings) {
    PooledRanking ranking;
    const std::vector<std::int32_t> abnormal{3, 2, 2, 11, 33};
    const std::vector<std::int32_t> normal{33, 6, 6, 11, 2};
    std::int64_t below = 0;
    for (std::size_t rating = 0; rating < 5; ++rating) {
        const std::int64_t count = abnormal[rating] + normal[rating];
        ranking.groups.push_back({2 * below + count + 1, abnormal[rating], normal[rating]});
        ranking.doubled_first_sum += (2 * below + count + 1) * abnormal[rating];
        below += count;
    }
    ranking.first = 51;
    ranking.second = 58;
    EXPECT_NEAR(chance_of(ranking), 0.893, 0.0005);
    const Interval interval = newcombe_interval(ranking, 0.025);
    EXPECT_NEAR(interval.lower, 0.8116884072884325, 1e-12);
    EXPECT_NEAR(interval.upper, 0.9400061826404602, 1e-12);
}

// P(at least k of n) with the probability of one.
double at_least(int k, int n, double share) {
    double sum = 0;
    double ways = 1;
    for (int i = 0; i <= n; ++i) {
        sum += i >= k ? ways * std::pow(share, i) * std::pow(1 - share, n - i) : 0;
        ways = ways * (n - i) / (i + 1);
    }
    return sum;
}

// Clopper & Pearson (1934): each end makes the observed number, or more, just as improbable as the rate.
TEST(ClopperPearson, solves_its_binomial_tails) {
    for (const int n : {1, 2, 5, 10, 31}) {
        for (int k = 0; k <= n; ++k) {
            const Interval interval = clopper_pearson_interval(k, n, 0.025);
            if (k > 0) {
                EXPECT_NEAR(at_least(k, n, interval.lower), 0.025, 1e-12) << k << " of " << n;
            }
            if (k < n) {
                EXPECT_NEAR(1 - at_least(k + 1, n, interval.upper), 0.025, 1e-12) << k << " of " << n;
            }
        }
    }
}

TEST(ClopperPearson, reaches_the_ends_of_the_scale) {
    EXPECT_EQ(clopper_pearson_interval(0, 8, 0.025).lower, 0.0);
    EXPECT_EQ(clopper_pearson_interval(8, 8, 0.025).upper, 1.0);
    // One-sided textbook form: 1 - rate^(1/n).
    EXPECT_NEAR(clopper_pearson_interval(0, 8, 0.025).upper, 1 - std::pow(0.025, 1.0 / 8), 1e-14);
}

TEST(ClopperPearson, with_a_half_lies_between_its_neighbours) {
    for (int k = 1; k < 9; ++k) {
        const Interval below = clopper_pearson_interval(k, 10, 0.025);
        const Interval half = clopper_pearson_interval(k + 0.5, 10, 0.025);
        const Interval above = clopper_pearson_interval(k + 1, 10, 0.025);
        EXPECT_LT(below.lower, half.lower);
        EXPECT_LT(half.lower, above.lower);
        EXPECT_LT(below.upper, half.upper);
        EXPECT_LT(half.upper, above.upper);
    }
}

} // namespace
} // namespace rankstead
