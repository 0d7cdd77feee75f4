#include "sign_law.h"

#include "binomial_coefficient.h"

#include <boost/math/distributions/binomial.hpp>

#include <algorithm>

namespace rankstead {

namespace {

constexpr std::int64_t most_counted = 62;

// Out-of-range results are values here, never exceptions: a tail below the range of a double is 0 and clamped later.
using Policy =
    boost::math::policies::policy<boost::math::policies::underflow_error<boost::math::policies::ignore_error>,
                                  boost::math::policies::denorm_error<boost::math::policies::ignore_error>,
                                  boost::math::policies::promote_double<true>>;

Tails counted(std::int64_t n, std::int64_t above) {
    Counts counts{0, 0, std::uint64_t{1} << n};
    for (std::int64_t k = 0; k <= n; ++k) {
        const auto ways = static_cast<std::uint64_t>(exact_choose(n, k).value());
        counts.lower += k <= above ? ways : 0;
        counts.upper += k >= above ? ways : 0;
    }
    return from_counts(counts);
}

Tails by_incomplete_beta(std::int64_t n, std::int64_t above) {
    const boost::math::binomial_distribution<double, Policy> law(static_cast<double>(n), 0.5);
    const std::int64_t low = std::min(above, n - above);
    Tails tails;
    tails.lower = cdf(law, static_cast<double>(low));
    tails.upper = low > 0 ? 1 - cdf(law, static_cast<double>(low - 1)) : 1;
    // Boost.Math documents a few hundred epsilon for ibeta with large arguments.
    tails.relative_error = 1e-12;
    tails.law = LawKind::binomial;
    if (2 * low == n) {
        tails.upper = tails.lower;
    }
    return low == above ? tails : tails.swapped();
}

} // namespace

Tails sign_tails(std::int64_t n, std::int64_t above) {
    return n <= most_counted ? counted(n, above) : by_incomplete_beta(n, above);
}

} // namespace rankstead
