// laws/inversion/certified_inversion.h against integers of any size: the stated bound is never exceeded.
#include "laws/inversion/certified_inversion.h"

#include "big_laws.h"
#include "data.h"

#include <gtest/gtest.h>

#include <numeric>

namespace rankstead {
namespace {

constexpr double plenty = 10; // seconds of work allowed

// Doubled midranks of random values with so many levels, lowest 0 if `from_zero`, divided by their common divisor.
std::vector<std::int64_t> random_scores(test::Random& random, std::int64_t n, std::int64_t levels, bool from_zero) {
    const std::vector<std::int64_t> values = random.sorted(n, 0, levels - 1);
    std::vector<std::int64_t> scores;
    for (std::size_t i = 0; i < values.size();) {
        std::size_t end = i;
        while (end < values.size() && values[end] == values[i]) {
            ++end;
        }
        scores.insert(scores.end(), end - i, static_cast<std::int64_t>(i + end + 1));
        i = end;
    }
    const std::int64_t lowest = from_zero ? scores.front() : 0;
    std::int64_t divisor = 0;
    for (std::int64_t& score : scores) {
        score -= lowest;
        divisor = std::gcd(divisor, score);
    }
    for (std::int64_t& score : scores) {
        score /= std::max<std::int64_t>(divisor, 1);
    }
    return scores;
}

void expect_within_bound(const std::optional<CertifiedTail>& tail, const test::BigTails& truth) {
    ASSERT_TRUE(tail);
    EXPECT_LE(test::relative_error(tail->lower, truth.lower, truth.total), tail->relative_error);
    EXPECT_LE(tail->relative_error, 1e-10);
    const test::Big mass = truth.lower + truth.upper - truth.total;
    if (mass > 0) {
        EXPECT_LE(test::relative_error(tail->mass, mass, truth.total) * tail->mass, tail->mass_error * 1.001);
    }
}

TEST(CertifiedInversion, of_signs_stays_within_its_bound) {
    test::Random random(11);
    for (int round = 0; round < 24; ++round) {
        const std::int64_t n = random.whole(20, 160);
        const std::int64_t levels = round % 3 == 0 ? random.whole(2, 6) : round % 3 == 1 ? n : 20 * n;
        const auto scores = random_scores(random, n, levels, false);
        const std::int64_t sum = std::accumulate(scores.begin(), scores.end(), std::int64_t{0});
        const auto inversion = CertifiedInversion::of_signs(ScoredItems::of(scores));
        for (const std::int64_t w : {sum / 2, 9 * sum / 20, sum / 3, sum / 5}) {
            SCOPED_TRACE("n " + std::to_string(n) + ", levels " + std::to_string(levels) + ", w " + std::to_string(w));
            const test::BigTails truth = test::big_sign_tails(scores, w);
            if (truth.lower > 0) {
                expect_within_bound(inversion.at(w, plenty), truth);
            }
        }
    }
}

TEST(CertifiedInversion, of_choice_stays_within_its_bound) {
    test::Random random(12);
    for (int round = 0; round < 12; ++round) {
        const std::int64_t n = random.whole(20, 44);
        const std::int64_t m = round % 4 == 0 ? random.whole(2, 4) : random.whole(2, n / 2);
        const std::int64_t levels = round % 3 == 0 ? random.whole(2, 6) : round % 3 == 1 ? n : 20 * n;
        const auto scores = random_scores(random, n, levels, true);
        const std::int64_t mean = m * std::accumulate(scores.begin(), scores.end(), std::int64_t{0}) / n;
        const auto inversion = CertifiedInversion::of_choice(ScoredItems::of(scores), m);
        for (const std::int64_t w : {mean, 3 * mean / 5}) {
            SCOPED_TRACE("n " + std::to_string(n) + ", m " + std::to_string(m) + ", levels " + std::to_string(levels) +
                         ", w " + std::to_string(w));
            const test::BigTails truth = test::big_choice_tails(scores, static_cast<std::size_t>(m), w);
            if (truth.lower > 0 && scores.back() > 0) {
                expect_within_bound(inversion.at(w, plenty), truth);
            }
        }
    }
}

// 10,000 values without ties: the law is nearly normal, and z = 2.5 has 0.00621 below it; the sum of F(w) and of the
// mass at w is F(w) - F(w - 1) + F(w), so two neighbouring inversions must agree with the mass of the upper one.
TEST(CertifiedInversion, neighbouring_tails_differ_by_the_mass) {
    std::vector<std::int64_t> scores(10000);
    std::iota(scores.begin(), scores.end(), 1);
    const auto inversion = CertifiedInversion::of_signs(ScoredItems::of(scores));
    const std::int64_t w = 24280700;
    const auto at = inversion.at(w, plenty);
    const auto below = inversion.at(w - 1, plenty);
    ASSERT_TRUE(at && below);
    EXPECT_NEAR(at->lower - below->lower, at->mass, at->mass_error + 1e-12 * at->lower);
    EXPECT_GT(at->lower, 0.006);
    EXPECT_LT(at->lower, 0.0064);
}

TEST(CertifiedInversion, gives_nothing_rather_than_exceed_the_work_allowed) {
    std::vector<std::int64_t> scores(10000);
    std::iota(scores.begin(), scores.end(), 1);
    EXPECT_FALSE(CertifiedInversion::of_signs(ScoredItems::of(scores)).at(24280700, 0));
}

} // namespace
} // namespace rankstead
