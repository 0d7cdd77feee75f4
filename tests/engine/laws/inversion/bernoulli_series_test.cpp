// laws/inversion/bernoulli_series.h against the logarithm it stands for.
#include "laws/inversion/bernoulli_series.h"

#include <gtest/gtest.h>

#include <cmath>
#include <complex>

namespace rankstead {
namespace {

using Complex = std::complex<long double>;

// log(q + p e^y) - p y in extended precision.
Complex logarithm(long double p, Complex y) {
    return std::log(1 - p + p * std::exp(y)) - p * y;
}

Complex sum_of(const BernoulliSeries& series, Complex y) {
    Complex sum = 0;
    for (std::size_t k = series.c.size(); k-- > 0;) {
        sum = sum * y + static_cast<long double>(series.c[k]);
    }
    return sum;
}

TEST(BernoulliSeries, sums_to_the_logarithm_within_its_stated_tail) {
    for (const double p : {0.5, 0.3, 0.1, 0.01}) {
        const BernoulliSeries series(p, 72);
        for (const double reach : {0.05, 0.3, 0.6}) {
            for (int direction = 0; direction < 8; ++direction) {
                const Complex y = std::polar(static_cast<long double>(reach * series.radius), direction * 0.8L);
                const long double off = std::abs(sum_of(series, y) - logarithm(p, y));
                EXPECT_LE(static_cast<double>(off), series.tail(reach) + 1e-15) << p << " " << reach;
            }
        }
    }
}

TEST(BernoulliSeries, sizes_bound_the_coefficients) {
    for (const double p : {0.5, 0.2, 0.001}) {
        const BernoulliSeries series(p, 60);
        for (std::size_t k = 0; k < series.c.size(); ++k) {
            EXPECT_LE(std::fabs(series.c[k]), series.size[k] * (1 + 1e-12)) << p << " " << k;
        }
    }
}

// Cumulants of the Bernoulli law: pq, pq(q - p), pq(1 - 6pq), over k!.
TEST(BernoulliSeries, begins_with_the_cumulants) {
    const double p = 0.3, v = p * (1 - p);
    const BernoulliSeries series(p, 10);
    EXPECT_DOUBLE_EQ(series.c[2], v / 2);
    EXPECT_DOUBLE_EQ(series.c[3], v * 0.4 / 6);
    EXPECT_DOUBLE_EQ(series.c[4], v * (1 - 6 * v) / 24);
}

} // namespace
} // namespace rankstead
