// laws/inversion/even_series.h: against the sums of logarithms it stands for, in extended precision.
#include "laws/inversion/even_series.h"

#include <gtest/gtest.h>

#include <cmath>
#include <complex>

namespace rankstead {
namespace {

using Long = long double;
using LongComplex = std::complex<Long>;

LongComplex log_sinhc(LongComplex x) {
    return std::log(std::sinh(x) / x);
}

// K(h) of the rank sum, factor by factor.
LongComplex rank_sum_sum(std::int64_t m, std::int64_t n, LongComplex h) {
    LongComplex sum = 0;
    for (std::int64_t i = 1; i <= m; ++i) {
        sum += log_sinhc(static_cast<Long>(n + i) * h / Long(2)) - log_sinhc(static_cast<Long>(i) * h / Long(2));
    }
    return sum;
}

LongComplex signed_rank_sum(std::int64_t n, LongComplex h) {
    LongComplex sum = 0;
    for (std::int64_t i = 1; i <= n; ++i) {
        sum += std::log(std::cosh(static_cast<Long>(i) * h / Long(2)));
    }
    return sum;
}

void expect_within_its_error(const EvenSeries& series, std::complex<double> h, LongComplex expected) {
    ASSERT_TRUE(series.serves(std::abs(h)));
    const EvenSeries::Value found = series.at(h);
    EXPECT_LE(std::abs(LongComplex(found.value) - expected), static_cast<Long>(found.error));
    EXPECT_LE(found.error, 1e-13 * (1 + static_cast<double>(std::abs(expected))));
}

TEST(EvenSeries, of_the_rank_sum_is_within_its_stated_error) {
    const std::pair<std::int64_t, std::int64_t> sizes[] = {{5, 9}, {60, 70}, {1000, 1000}, {50, 100'000}};
    for (const auto& [m, n] : sizes) {
        const EvenSeries series = EvenSeries::of_rank_sum(m, n);
        const double all = static_cast<double>(m + n) / 2;
        for (const double size : {0.05, 0.7, 1.9}) {
            const std::complex<double> h(0.4 * size / all, -size / all);
            expect_within_its_error(series, h, rank_sum_sum(m, n, LongComplex(h)));
        }
    }
}

TEST(EvenSeries, of_the_signed_rank_is_within_its_stated_error) {
    for (const std::int64_t n : {7, 100, 5000}) {
        const EvenSeries series = EvenSeries::of_signed_rank(n);
        for (const double size : {0.05, 0.4, 0.9}) {
            const std::complex<double> h(0.4 * size * 2 / static_cast<double>(n), -size * 2 / static_cast<double>(n));
            expect_within_its_error(series, h, signed_rank_sum(n, LongComplex(h)));
        }
    }
}

// Second derivatives at 0: mn(N+1)/12 and n(n+1)(2n+1)/24 (Lehmann 1975).
TEST(EvenSeries, has_the_variance_as_second_derivative_at_any_size) {
    EXPECT_NEAR(EvenSeries::of_rank_sum(30, 40).jet(0).second / (30 * 40 * 71 / 12.0), 1, 1e-14);
    EXPECT_NEAR(EvenSeries::of_rank_sum(1'000'000'000, 1'000'000'000).jet(0).second / (1e18 * (2e9 + 1) / 12), 1,
                1e-14);
    EXPECT_NEAR(EvenSeries::of_signed_rank(2'000'000'000).jet(0).second / (2e9 * (2e9 + 1) * (4e9 + 1) / 24), 1, 1e-14);
}

TEST(EvenSeries, has_the_derivatives_of_its_value) {
    const EvenSeries series = EvenSeries::of_rank_sum(20, 30);
    const double step = 1e-6;
    const SumJet below = series.jet(0.03 - step);
    const SumJet here = series.jet(0.03);
    const SumJet above = series.jet(0.03 + step);
    EXPECT_NEAR((above.value - below.value) / (2 * step) / here.first, 1, 1e-7);
    EXPECT_NEAR((above.first - below.first) / (2 * step) / here.second, 1, 1e-7);
    EXPECT_EQ(series.jet(-0.03).first, -here.first);
}

TEST(EvenSeries, does_not_serve_near_its_radius) {
    EXPECT_FALSE(EvenSeries::of_rank_sum(10, 10).serves(3.1 / 10));
    EXPECT_FALSE(EvenSeries::of_signed_rank(10).serves(1.5 / 5));
}

} // namespace
} // namespace rankstead
