#include "rank_sum_law.h"

#include "binomial_coefficient.h"
#include "compensated_sum.h"
#include "exact_laws.h"
#include "inversion/untied_inversion.h"
#include "saddlepoint.h"
#include "split_up.h"

#include <algorithm>
#include <limits>
#include <numeric>
#include <optional>
#include <variant>

namespace rankstead {

namespace {

constexpr double largest_log2 = 1000; // of an arrangement count held in a double

std::int64_t sum_of(const std::vector<std::int64_t>& scores) {
    return std::accumulate(scores.begin(), scores.end(), std::int64_t{0});
}

// The same law seen from the other sample, whose sum is what is left over.
ChoiceScores complement(const ChoiceScores& scores) {
    const auto n = static_cast<std::int64_t>(scores.scores.size());
    return {scores.scores, n - scores.chosen, sum_of(scores.scores) - scores.statistic};
}

// The same law upside down.
ChoiceScores reflected(const ChoiceScores& scores) {
    ChoiceScores result{scores.scores, scores.chosen, scores.chosen * scores.scores.back() - scores.statistic};
    std::transform(scores.scores.rbegin(), scores.scores.rend(), result.scores.begin(),
                   [top = scores.scores.back()](std::int64_t score) { return top - score; });
    return result;
}

} // namespace

CanonicalChoice canonical(const ChoiceScores& scores) {
    const auto n = static_cast<std::int64_t>(scores.scores.size());
    const std::int64_t sum = sum_of(scores.scores);
    CanonicalChoice result{scores, false, false};
    if (2 * scores.chosen == n) {
        result.centred = 2 * scores.statistic == sum;
        if (2 * scores.statistic > sum) {
            result = {complement(scores), true, false};
        }
        return result;
    }
    if (2 * scores.chosen > n) {
        result = {complement(scores), true, false};
    }
    // Mean chosen * sum / n.
    if (static_cast<UInt128>(result.scores.statistic) * static_cast<UInt128>(n) >
        static_cast<UInt128>(result.scores.chosen) * static_cast<UInt128>(sum)) {
        result = {reflected(result.scores), !result.swaps, false};
    }
    return result;
}

namespace {

Tails counted(const ChoiceScores& scores, std::uint64_t total) {
    const auto mass = split_up_tail<std::uint64_t>(scores);
    return from_counts({mass.below + mass.at, total - mass.below, total});
}

Tails summed(const ChoiceScores& scores) {
    const auto n = static_cast<std::int64_t>(scores.scores.size());
    const double total = double_choose(n, scores.chosen);
    const auto mass = split_up_tail<double>(scores);
    // An addition for each score, and for each group a product and a rounded binomial coefficient.
    return from_lower(LawKind::summed, (mass.below + mass.at) / total, 1 - mass.below / total,
                      (3 * static_cast<double>(n) + 12) * 0.5 * std::numeric_limits<double>::epsilon());
}

} // namespace

ChoiceScores choice_scores(const PooledRanking& ranking) {
    ChoiceScores result;
    result.chosen = ranking.first;
    const std::int64_t lowest = ranking.groups.front().doubled_rank;
    std::int64_t divisor = 0;
    for (const PooledGroup& group : ranking.groups) {
        divisor = std::gcd(divisor, group.doubled_rank - lowest);
    }
    divisor = std::max<std::int64_t>(divisor, 1);
    for (const PooledGroup& group : ranking.groups) {
        const std::int64_t score = (group.doubled_rank - lowest) / divisor;
        result.scores.insert(result.scores.end(), static_cast<std::size_t>(group.count()), score);
        result.statistic += score * group.first;
    }
    return result;
}

ChoiceScores untied_choice_scores(std::int64_t first, std::int64_t second, std::int64_t u) {
    ChoiceScores result;
    result.chosen = first;
    result.scores.resize(static_cast<std::size_t>(first + second));
    std::iota(result.scores.begin(), result.scores.end(), std::int64_t{0});
    result.statistic = u + first * (first - 1) / 2;
    return result;
}

double rank_sum_cost(const ChoiceScores& scores) {
    const auto n = static_cast<std::int64_t>(scores.scores.size());
    if (log2_choose(n, scores.chosen) > largest_log2) {
        return std::numeric_limits<double>::infinity();
    }
    return split_up_seconds(canonical(scores).scores);
}

Tails rank_sum_tails(const ChoiceScores& scores) {
    const CanonicalChoice law = canonical(scores);
    const auto n = static_cast<std::int64_t>(scores.scores.size());
    const auto total = exact_choose(n, scores.chosen);
    constexpr UInt128 most_counted = UInt128{1} << 63;
    Tails tails =
        total && *total < most_counted ? counted(law.scores, static_cast<std::uint64_t>(*total)) : summed(law.scores);
    if (law.centred) {
        tails.upper = tails.lower;
    }
    return law.swaps ? tails.swapped() : tails;
}

// ------------------------------------------------------------------------------------------------ without ties

namespace {

// Coefficients of the Gaussian binomial [m+n choose m] up to q^top: multiply by (1 - q^(n+i)), divide by (1 - q^i).
// Unsigned arithmetic wraps, and what is left at the end is exact because it is below the modulus.
template <class Count>
std::vector<Count> gaussian_binomial(std::int64_t m, std::int64_t n, std::int64_t top) {
    std::vector<Count> count(static_cast<std::size_t>(top + 1), Count(0));
    count[0] = 1;
    for (std::int64_t i = 1; i <= m; ++i) {
        const std::int64_t reach = std::min(top, n * i);
        for (std::int64_t k = reach; k >= n + i; --k) {
            count[static_cast<std::size_t>(k)] -= count[static_cast<std::size_t>(k - n - i)];
        }
        for (std::int64_t k = i; k <= reach; ++k) {
            count[static_cast<std::size_t>(k)] += count[static_cast<std::size_t>(k - i)];
        }
    }
    return count;
}

// The table costs two additions for each value of U in the lower half and each of the smaller sample.
constexpr double most_additions = 4e6;
constexpr std::int64_t most_low_additions = 500'000;

bool integers_suffice(std::int64_t first, std::int64_t second) {
    const double pairs = static_cast<double>(first) * static_cast<double>(second);
    return pairs * static_cast<double>(std::min(first, second)) <= most_additions &&
           log2_choose(first + second, first) < 126;
}

// Near the low end few arrangements have U at most u, so few that they fit 126 bits however many there are in all: then
// the counts modulo 2^128 are the counts. Chernoff's inequality says whether they do.
bool few_enough(const UntiedLaw& law, double log2_total, std::int64_t u) {
    constexpr double most_log2 = 126;
    const double distance = static_cast<double>(law.highest()) / 2 - static_cast<double>(u);
    // Nearer the middle the inversion is quicker than this question.
    constexpr double far = 5;
    if (distance * distance < far * far * law.variance()) {
        return false;
    }
    double least = 0;
    for (double tilt = distance / law.variance(); tilt < 4; tilt *= 2) {
        least = std::min(least, law.jet(tilt).value - tilt * distance);
    }
    return log2_total + least / std::log(2.0) < most_log2;
}

std::optional<Tails> low_tails(const UntiedLaw& law, std::int64_t m, std::int64_t n, std::int64_t u) {
    constexpr double largest_total = 1000; // binary digits that a double holds
    const double log2_total = log2_choose(m + n, m);
    if (u > most_low_additions / m || log2_total > largest_total || !few_enough(law, log2_total, u)) {
        return std::nullopt;
    }
    const std::vector<UInt128> count = gaussian_binomial<UInt128>(m, n, u);
    const UInt128 through = std::accumulate(count.begin(), count.end(), UInt128{0});
    const double total = double_choose(m + n, m);
    return from_lower(LawKind::summed, static_cast<double>(through) / total,
                      1 - static_cast<double>(through - count.back()) / total,
                      (static_cast<double>(m) + 12) * 0.5 * std::numeric_limits<double>::epsilon());
}

} // namespace

class UntiedRankSumLaw::Cumulative {
public:
    Cumulative(std::int64_t first, std::int64_t second, UInt128 total) : total_(total) {
        const std::int64_t m = std::min(first, second);
        const std::int64_t n = std::max(first, second);
        constexpr UInt128 most_counted = UInt128{1} << 63;
        if (total < most_counted) {
            counts_ = gaussian_binomial<std::uint64_t>(m, n, m * n / 2);
        } else {
            counts_ = gaussian_binomial<UInt128>(m, n, m * n / 2);
        }
        std::visit([](auto& counts) { std::partial_sum(counts.begin(), counts.end(), counts.begin()); }, counts_);
    }

    // Both tails at the k-th value from below, in the lower half.
    [[nodiscard]] Tails at(std::size_t k) const {
        const UInt128 lower = count_up_to(k);
        const UInt128 upper = total_ - (k > 0 ? count_up_to(k - 1) : 0);
        if (std::holds_alternative<std::vector<std::uint64_t>>(counts_)) {
            return from_counts({static_cast<std::uint64_t>(lower), static_cast<std::uint64_t>(upper),
                                static_cast<std::uint64_t>(total_)});
        }
        Tails tails;
        tails.lower = static_cast<double>(lower) / static_cast<double>(total_);
        tails.upper = static_cast<double>(upper) / static_cast<double>(total_);
        tails.relative_error = 1.5 * std::numeric_limits<double>::epsilon();
        return tails;
    }

private:
    [[nodiscard]] UInt128 count_up_to(std::size_t k) const {
        return std::visit([k](const auto& counts) { return static_cast<UInt128>(counts[k]); }, counts_);
    }

    UInt128 total_;
    std::variant<std::vector<std::uint64_t>, std::vector<UInt128>> counts_;
};

UntiedRankSumLaw::UntiedRankSumLaw(std::int64_t first, std::int64_t second) : first_(first), second_(second) {
    if (integers_suffice(first, second)) {
        cumulative_ = std::make_unique<Cumulative>(first, second, exact_choose(first + second, first).value());
    } else {
        inversion_ = std::make_unique<const UntiedInversion>(UntiedInversion::of_rank_sum(first, second));
    }
}

UntiedRankSumLaw::~UntiedRankSumLaw() = default;

Tails UntiedRankSumLaw::at(std::int64_t k) const {
    const std::int64_t pairs = first_ * second_;
    const bool above = k > pairs - k;
    const std::int64_t low = above ? pairs - k : k;
    const Tails tails = levelled(lower_half_at(low), low == pairs - low);
    return above ? tails.swapped() : tails;
}

Tails UntiedRankSumLaw::lower_half_at(std::int64_t low) const {
    if (cumulative_) {
        return cumulative_->at(static_cast<std::size_t>(low));
    }
    const auto few = low_tails(inversion_->law(), std::min(first_, second_), std::max(first_, second_), low);
    return few ? *few : untied_rank_sum_tails(first_, second_, low, *inversion_);
}

Tails UntiedRankSumLaw::best_at(std::int64_t k) const {
    try {
        return at(k);
    } catch (const LawTooLong&) {
        return saddlepoint_tails(UntiedLaw::rank_sum(first_, second_), k);
    }
}

} // namespace rankstead
