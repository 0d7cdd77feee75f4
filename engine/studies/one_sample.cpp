#include "one_sample.h"

#include "../laws/exact_laws.h"
#include "../laws/normal_approximation.h"
#include "../laws/sign_law.h"
#include "../laws/signed_rank_law.h"
#include "common.h"

#include <cmath>
#include <memory>

namespace rankstead {

namespace {

std::size_t as_size(std::int64_t count) {
    return static_cast<std::size_t>(count);
}

// The normal law of the number of breakpoints above a gap.
GapTails normal_gaps(std::int64_t breakpoints, const Moments& moments) {
    return one_law_gaps(breakpoints,
                        [moments](std::int64_t above) { return normal_tails(static_cast<double>(above), moments); });
}

// ------------------------------------------------------------------------------------------------ sign test

template <class Int>
void sign_test(Outcome& outcome, const OneSample<Int>& sample, const SignedRanking& ranking) {
    const std::int64_t above = ranking.positives();
    outcome.statistic = static_cast<double>(above);
    const Moments moments = sign_moments(ranking.used);
    const auto all = static_cast<std::int64_t>(sample.sorted.size());
    GapTails in_gap = one_law_gaps(all, [all](std::int64_t above_gap) { return sign_tails(all, above_gap); });
    if (outcome.settings.method == Method::approximate) {
        take_approximate(outcome, moments);
        in_gap = normal_gaps(all, sign_moments(all));
    } else {
        take_exact(outcome, sign_tails(ranking.used, above));
    }
    Inversion<Int> inversion{OrderedSums<Int>::values(sample.sorted), in_gap,
                             OrderedSums<Int>::values(negated(sample.sorted)), in_gap};
    inversion.spread = std::sqrt(static_cast<double>(all)) / 2;
    inversion.smallest_tail = std::exp2(-static_cast<double>(all));
    outcome.estimate = median_breakpoint(inversion.breakpoints, 0, sample.grid);
    take_limits(outcome, inversion, sample.grid);
}

// ------------------------------------------------------------------------------------------------ signed rank test

// Moments in any gap between Walsh averages: no difference is zero there, and ties are those among equal values.
template <class Int>
Moments gap_moments(const std::vector<Int>& sorted) {
    return signed_rank_moments(rank_signed(sorted, Int(sorted.front() - 1), false));
}

Moments untied_moments(std::int64_t n) {
    const auto size = static_cast<double>(n);
    return {size * (size + 1) / 4, size * (size + 1) * (2 * size + 1) / 24};
}

// The number of Walsh averages above the gap is T+ there, so a law that is the same in every gap needs no ranking.
template <class Int>
class SignedRankPlan {
public:
    SignedRankPlan(const Outcome& outcome, const OneSample<Int>& sample, const SignedRanking& ranking, bool exact)
        : sorted_(sample.sorted), n_(static_cast<std::int64_t>(sample.sorted.size())), walsh_(n_ * (n_ + 1) / 2),
          scores_(sign_scores(ranking)), table_(outcome.settings.interval == IntervalRule::table),
          tied_values_(has_equal_neighbours(sorted_)), exact_(exact) {
        if (exact_ && one_law()) {
            law_ = std::make_shared<const UntiedSignedRankLaw>(n_);
        }
    }

    [[nodiscard]] const SignScores& scores() const { return scores_; }

    [[nodiscard]] Inversion<Int> inversion() const {
        const std::vector<Int> mirrored = negated(sorted_);
        Inversion<Int> result{OrderedSums<Int>::walsh(sorted_), gap_tails(sorted_), OrderedSums<Int>::walsh(mirrored),
                              gap_tails(mirrored)};
        result.spread = std::sqrt(untied_moments(n_).variance);
        result.halvings = 1;
        result.smallest_tail = std::exp2(-static_cast<double>(n_));
        return result;
    }

private:
    // Without equal values, and in the classical table, the law is the untied one in every gap.
    [[nodiscard]] bool one_law() const { return table_ || !tied_values_; }

    [[nodiscard]] GapTails gap_tails(const std::vector<Int>& sorted) const {
        if (!exact_) {
            return normal_gaps(walsh_, table_ ? untied_moments(n_) : gap_moments(sorted));
        }
        if (one_law()) {
            return one_law_gaps(walsh_, [law = law_](std::int64_t above) { return law->at(above); });
        }
        // A sum of two values is twice a margin, so twice the middle of two sums is four times one.
        return [sums = std::make_shared<const OrderedSums<Int>>(OrderedSums<Int>::walsh(sorted)),
                fourfold = times(sorted, 4)](std::int64_t k) {
            const GapPlace<Int> gap = gap_above(*sums, k);
            return Gap{
                exact_signed_rank_tails(sign_scores(rank_signed(fourfold, gap.twice_middle, false)), seconds_for_a_gap),
                gap.first, gap.last};
        };
    }

    const std::vector<Int>& sorted_;
    std::int64_t n_;
    std::int64_t walsh_;
    SignScores scores_;
    bool table_;
    bool tied_values_;
    bool exact_;
    std::shared_ptr<const UntiedSignedRankLaw> law_;
};

// p at a margin, with the zeros it makes dropped.
template <class Int>
double dropped_p(const OneSample<Int>& sample, const Int& margin, Side side, bool exact) {
    const SignedRanking ranking = rank_signed(sample.sorted, margin, false);
    if (exact) {
        return p_value(exact_signed_rank_tails(sign_scores(ranking), seconds_for_a_gap), side);
    }
    return normal_p(static_cast<double>(ranking.doubled_positive_sum) / 2, signed_rank_moments(ranking), side);
}

// The indices of the values to look at: all of a small sample, those next to either limit in a large one.
template <class Int>
std::vector<std::size_t> indices_near_limits(const std::vector<Int>& values, const Outcome& outcome, const Grid& grid) {
    constexpr std::size_t small = 60;
    constexpr std::size_t large = 500;
    const std::size_t near = values.size() > large ? 4 : 20; // one value weighs less among many
    std::vector<std::size_t> indices;
    const auto take = [&](std::size_t begin, std::size_t end) {
        for (std::size_t i = std::max(begin, indices.empty() ? 0 : indices.back() + 1); i < end; ++i) {
            indices.push_back(i);
        }
    };
    if (values.size() <= small) {
        take(0, values.size());
        return indices;
    }
    for (const Figure* limit : {&outcome.lower, &outcome.upper}) {
        if (limit->value) {
            const auto at = std::lower_bound(values.begin(), values.end(), *limit->value,
                                             [&](const Int& v, double x) { return off_grid(v, 0, grid) < x; });
            const auto centre = as_size(at - values.begin());
            take(centre > near ? centre - near : 0, std::min(centre + near, values.size()));
        }
    }
    return indices;
}

// Dropping a zero can turn p around at a margin equal to one of the values, and only there.
template <class Int>
std::vector<double> exceptional_margins(const Outcome& outcome, const OneSample<Int>& sample, bool exact) {
    const double rate = error_rate(outcome.settings).value();
    std::vector<Int> values = sample.sorted;
    values.erase(std::unique(values.begin(), values.end()), values.end());
    std::vector<double> found;
    for (const std::size_t i : indices_near_limits(values, outcome, sample.grid)) {
        const double at = off_grid(values[i], 0, sample.grid);
        const bool outside =
            (outcome.lower.value && at < *outcome.lower.value) || (outcome.upper.value && at > *outcome.upper.value);
        const bool on_limit =
            (outcome.lower.value && at == *outcome.lower.value) || (outcome.upper.value && at == *outcome.upper.value);
        const bool rejected = dropped_p(sample, values[i], outcome.settings.side, exact) <= rate;
        if (!on_limit && rejected != outside) {
            found.push_back(at);
        }
    }
    return found;
}

template <class Int>
void signed_rank_test(Outcome& outcome, const OneSample<Int>& sample, const SignedRanking& ranking, bool exact) {
    const Settings& settings = outcome.settings;
    const SignedRankPlan<Int> plan(outcome, sample, ranking, exact);
    outcome.statistic = static_cast<double>(ranking.doubled_positive_sum) / 2;
    if (exact) {
        take_exact(outcome, exact_signed_rank_tails(plan.scores(), seconds_for_p));
    } else {
        take_approximate(outcome, signed_rank_moments(ranking));
    }
    const Inversion<Int> inversion = plan.inversion();
    outcome.estimate = median_breakpoint(inversion.breakpoints, 1, sample.grid);
    take_limits(outcome, inversion, sample.grid);
    if (settings.zeros == Zeros::drop && settings.interval == IntervalRule::matching) {
        outcome.observations.exceptional_margins = exceptional_margins(outcome, sample, exact);
    }
}

// ------------------------------------------------------------------------------------------------ both

// Far from symmetric: quartile skewness (Bowley 1920) beyond one half, from ten values on.
template <class Int>
bool is_lopsided(const OneSample<Int>& sample) {
    constexpr std::size_t enough = 10;
    if (sample.sorted.size() < enough) {
        return false;
    }
    const Description d = describe(sample.sorted, sample.grid);
    const double spread = d.upper_quartile - d.lower_quartile;
    return spread > 0 && std::fabs(d.upper_quartile + d.lower_quartile - 2 * d.median) > spread / 2;
}

template <class Int>
void take_chance_of_rise(Outcome& outcome, const OneSample<Int>& sample) {
    const SignedRanking ranking = rank_signed(sample.sorted, sample.reference, false);
    const auto n = static_cast<double>(sample.sorted.size());
    const double successes = static_cast<double>(ranking.positives()) + static_cast<double>(ranking.zeros) / 2;
    take_chance(outcome, successes / n, clopper_pearson_interval(successes, n, tail_rate(outcome.settings).value()),
                "");
}

} // namespace

template <class Int>
void analyse_one_sample(Outcome& outcome, const OneSample<Int>& sample) {
    const bool sign = outcome.settings.test == Test::sign;
    const SignedRanking ranking =
        rank_signed(sample.sorted, sample.origin, !sign && outcome.settings.zeros == Zeros::pratt);
    outcome.n = sample.sorted.size();
    outcome.zeros = as_size(ranking.zeros);
    outcome.tied = as_size(ranking.tied());
    outcome.smallest_p =
        std::max(smallest_positive_p, std::min(1.0, std::exp2(1.0 - static_cast<double>(ranking.used))));
    if (sign) {
        sign_test(outcome, sample, ranking);
    } else {
        exact_or_approximate(outcome, [&](bool exact) { signed_rank_test(outcome, sample, ranking, exact); });
        outcome.observations.lopsided = is_lopsided(sample);
    }
    take_chance_of_rise(outcome, sample);
}

template void analyse_one_sample(Outcome&, const OneSample<std::int64_t>&);
template void analyse_one_sample(Outcome&, const OneSample<Int128>&);
template void analyse_one_sample(Outcome&, const OneSample<BigInt>&);

} // namespace rankstead
