#include "signed_rank_law.h"

#include "compensated_sum.h"
#include "exact_laws.h"
#include "inversion/untied_inversion.h"
#include "saddlepoint.h"

#include <algorithm>
#include <cmath>
#include <limits>
#include <numeric>

namespace rankstead {

namespace {

constexpr std::int64_t most_counted = 62;  // 2^62 and its sums fit 63 bits
constexpr std::int64_t most_summed = 2000; // 2^-1000 as start value neither underflows nor overflows up to here
constexpr double seconds_per_addition = 0.2e-9;

// Adds each score to every partial sum up to `top`. Runs of length `score` do not overlap, so they vectorise.
template <class Count>
std::vector<Count> distribution(const std::vector<std::int64_t>& scores, std::int64_t top, Count start) {
    std::vector<Count> count(static_cast<std::size_t>(top + 1), Count(0));
    count[0] = start;
    std::int64_t reach = 0;
    for (const std::int64_t score : scores) {
        if (score > top) {
            break; // scores ascend
        }
        reach = std::min(reach + score, top);
        for (std::int64_t high = reach; high >= score;) {
            const std::int64_t low = std::max(score, high - score + 1);
            Count* __restrict to = count.data() + low;
            const Count* __restrict from = count.data() + low - score;
            const std::int64_t length = high - low + 1;
            for (std::int64_t i = 0; i < length; ++i) {
                to[i] += from[i];
            }
            high = low - 1;
        }
    }
    return count;
}

// The start value and what is still to be multiplied so that the sums are probabilities.
int start_exponent(std::size_t n) {
    return -static_cast<int>(std::min<std::size_t>(n, 1000));
}
int rest_exponent(std::size_t n) {
    return -static_cast<int>(n) - start_exponent(n);
}

// Additions of positive terms only: each adds half a unit in the last place at most (Higham 2002, section 4.2).
double addition_error(std::size_t n) {
    return (static_cast<double>(n) + 6) * 0.5 * std::numeric_limits<double>::epsilon();
}

Tails counted_tails(const SignScores& scores, std::int64_t k) {
    const auto count = distribution<std::uint64_t>(scores.scores, k, 1);
    Counts counts{0, 0, std::uint64_t{1} << scores.scores.size()};
    counts.lower = std::accumulate(count.begin(), count.end(), std::uint64_t{0});
    counts.upper = counts.total - counts.lower + count.back();
    return from_counts(counts);
}

Tails summed_tails(const SignScores& scores, std::int64_t k) {
    const std::size_t n = scores.scores.size();
    const auto mass = distribution<double>(scores.scores, k, std::ldexp(1.0, start_exponent(n)));
    CompensatedSum below;
    for (std::size_t i = 0; i + 1 < mass.size(); ++i) {
        below.add(mass[i]);
    }
    CompensatedSum lower = below;
    lower.add(mass.back());
    return from_lower(LawKind::summed, std::ldexp(lower.value(), rest_exponent(n)),
                      1 - std::ldexp(below.value(), rest_exponent(n)), addition_error(n));
}

} // namespace

SignScores sign_scores(const SignedRanking& ranking) {
    SignScores result;
    std::int64_t divisor = 0;
    for (const SignedGroup& group : ranking.groups) {
        divisor = std::gcd(divisor, group.doubled_rank);
    }
    result.scores.reserve(static_cast<std::size_t>(ranking.used));
    for (const SignedGroup& group : ranking.groups) {
        const std::int64_t score = group.doubled_rank / divisor;
        result.scores.insert(result.scores.end(), static_cast<std::size_t>(group.count), score);
        result.sum += score * group.count;
        result.statistic += score * group.positive;
    }
    return result;
}

SignScores untied_sign_scores(std::int64_t n, std::int64_t statistic) {
    SignScores result;
    result.scores.resize(static_cast<std::size_t>(n));
    std::iota(result.scores.begin(), result.scores.end(), std::int64_t{1});
    result.sum = n * (n + 1) / 2;
    result.statistic = statistic;
    return result;
}

double signed_rank_cost(const SignScores& scores) {
    const std::int64_t top = std::min(scores.statistic, scores.sum - scores.statistic);
    // Larger scores than the statistic take no part in the lower tail.
    const auto n = std::upper_bound(scores.scores.begin(), scores.scores.end(), top) - scores.scores.begin();
    if (n > most_summed) {
        return std::numeric_limits<double>::infinity();
    }
    return seconds_per_addition * static_cast<double>(n) * static_cast<double>(top);
}

Tails signed_rank_tails(const SignScores& scores) {
    // The law is symmetric: the tail below k is the tail above sum - k.
    const bool above = 2 * scores.statistic > scores.sum;
    const std::int64_t k = above ? scores.sum - scores.statistic : scores.statistic;
    Tails tails = static_cast<std::int64_t>(scores.scores.size()) <= most_counted ? counted_tails(scores, k)
                                                                                  : summed_tails(scores, k);
    if (2 * k == scores.sum) {
        tails.upper = tails.lower;
    }
    return above ? tails.swapped() : tails;
}

UntiedSignedRankLaw::UntiedSignedRankLaw(std::int64_t n) : n_(n), sum_(n * (n + 1) / 2) {
    constexpr std::int64_t most_tabled = 180;
    if (n <= most_counted) {
        counted_ = distribution<std::uint64_t>(untied_sign_scores(n, 0).scores, sum_ / 2, 1);
        std::partial_sum(counted_.begin(), counted_.end(), counted_.begin());
    } else if (n <= most_tabled) {
        const auto size = static_cast<std::size_t>(n);
        summed_ =
            distribution<double>(untied_sign_scores(n, 0).scores, sum_ / 2, std::ldexp(1.0, start_exponent(size)));
        CompensatedSum sum;
        for (double& mass : summed_) {
            sum.add(mass);
            mass = std::ldexp(sum.value(), rest_exponent(size));
        }
    } else {
        inversion_ = std::make_unique<const UntiedInversion>(UntiedInversion::of_signed_rank(n));
    }
}

UntiedSignedRankLaw::~UntiedSignedRankLaw() = default;

Tails UntiedSignedRankLaw::at(std::int64_t k) const {
    const bool above = k > sum_ - k;
    const std::int64_t low = above ? sum_ - k : k;
    const Tails tails =
        levelled(inversion_ ? untied_signed_rank_tails(n_, low, *inversion_) : tabled(static_cast<std::size_t>(low)),
                 low == sum_ - low);
    return above ? tails.swapped() : tails;
}

Tails UntiedSignedRankLaw::tabled(std::size_t low) const {
    if (!counted_.empty()) {
        const std::uint64_t total = std::uint64_t{1} << n_;
        return from_counts({counted_[low], total - (low > 0 ? counted_[low - 1] : 0), total});
    }
    return from_lower(LawKind::summed, summed_[low], 1 - (low > 0 ? summed_[low - 1] : 0),
                      addition_error(static_cast<std::size_t>(n_)));
}

Tails UntiedSignedRankLaw::best_at(std::int64_t k) const {
    try {
        return at(k);
    } catch (const LawTooLong&) {
        return saddlepoint_tails(UntiedLaw::signed_rank(n_), k);
    }
}

} // namespace rankstead
