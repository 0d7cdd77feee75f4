// The law calls of the C interface: null laws without ties and zeros, for a published statistic.
#include "rankstead.h"

#include "decimal.h"
#include "guard.h"
#include "laws/exact_laws.h"
#include "laws/rank_sum_law.h"
#include "laws/signed_rank_law.h"

#include <cmath>
#include <limits>

using namespace rankstead;

namespace {

constexpr std::int64_t largest_sample = 1'000'000'000; // keeps products within 62 bits

[[noreturn]] void refuse(Status status) {
    throw Refusal(status, "");
}

Side side_of(std::int32_t side) {
    if (side < -1 || side > 1) {
        refuse(Status::bad_call);
    }
    return side == 0 ? Side::two_sided : side > 0 ? Side::higher : Side::lower;
}

std::int64_t sample_size(std::size_t n) {
    if (n == 0) {
        refuse(Status::no_data);
    }
    if (n > static_cast<std::size_t>(largest_sample)) {
        refuse(Status::too_large);
    }
    return static_cast<std::int64_t>(n);
}

std::int64_t whole_statistic(double statistic, std::int64_t largest) {
    if (!(statistic >= 0 && statistic <= static_cast<double>(largest)) || statistic != std::floor(statistic)) {
        refuse(Status::bad_call);
    }
    return static_cast<std::int64_t>(statistic);
}

Fraction alpha_fraction(double alpha) {
    if (!(alpha > 0 && alpha < 1)) {
        refuse(Status::bad_call);
    }
    return as_fraction(Decimal::from_double(alpha));
}

template <class Work>
rks_status law_call(double* out, Work&& work) noexcept {
    if (out == nullptr) {
        return RKS_BAD_CALL;
    }
    *out = std::numeric_limits<double>::quiet_NaN();
    return guarded(
        [&] {
            try {
                *out = work();
                return Status::ok;
            } catch (const LawTooLong&) {
                return Status::too_large;
            }
        },
        [](const Refusal*, const std::string&) {});
}

// The largest statistic whose lower tail is at most the rate, by bisection; NaN if there is none. The laws are
// symmetric, so the upper critical value mirrors it.
template <class Law>
double critical(const Law& law, std::int64_t largest, double alpha, Side side) {
    Fraction rate = alpha_fraction(alpha);
    if (side == Side::two_sided) {
        rate.denominator *= 2;
    }
    std::int64_t within = -1;
    std::int64_t beyond = largest;
    while (within + 1 < beyond) {
        const std::int64_t middle = within + (beyond - within) / 2;
        (lower_at_most(law.at(middle), rate) ? within : beyond) = middle;
    }
    if (within < 0) {
        return std::numeric_limits<double>::quiet_NaN();
    }
    return static_cast<double>(side == Side::higher ? largest - within : within);
}

} // namespace

rks_status rks_signed_rank_tail(size_t n, double statistic, int32_t side, double* p) {
    return law_call(p, [&] {
        const Side asked = side_of(side);
        const std::int64_t size = sample_size(n);
        const std::int64_t sum = whole_statistic(statistic, size * (size + 1) / 2);
        return p_value(UntiedSignedRankLaw(size).at(sum), asked);
    });
}

rks_status rks_rank_sum_tail(size_t first, size_t second, double u, int32_t side, double* p) {
    return law_call(p, [&] {
        const Side asked = side_of(side);
        const std::int64_t m = sample_size(first);
        const std::int64_t n = sample_size(second);
        return p_value(UntiedRankSumLaw(m, n).at(whole_statistic(u, m * n)), asked);
    });
}

rks_status rks_signed_rank_critical(size_t n, double alpha, int32_t side, double* value) {
    return law_call(value, [&] {
        const Side asked = side_of(side);
        const std::int64_t size = sample_size(n);
        return critical(UntiedSignedRankLaw(size), size * (size + 1) / 2, alpha, asked);
    });
}

rks_status rks_rank_sum_critical(size_t first, size_t second, double alpha, int32_t side, double* value) {
    return law_call(value, [&] {
        const Side asked = side_of(side);
        const std::int64_t m = sample_size(first);
        const std::int64_t n = sample_size(second);
        return critical(UntiedRankSumLaw(m, n), m * n, alpha, asked);
    });
}
