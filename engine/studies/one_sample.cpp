#include "one_sample.h"

#include "../laws/exact_laws.h"
#include "../laws/normal_approximation.h"
#include "../laws/saddlepoint.h"
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
        take_tails(outcome, sign_tails(ranking.used, above));
    }
    const auto values = OrderedSums<Int>::values(sample.sorted);
    Inversion<Int> inversion{values, {in_gap, {}}, values.mirrored(), {in_gap, {}}};
    inversion.spread = std::sqrt(static_cast<double>(all)) / 2;
    inversion.smallest_tail = in_gap(0).tails.upper;
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

// Up to so many values the exact law is as quick as its approximation; beyond the others, setting up either takes
// longest.
constexpr std::int64_t exact_is_quick = 120;
constexpr std::int64_t setup_is_slow = 20'000;

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

    // The laws of the limits, as far as they have been asked for.
    [[nodiscard]] const GapLaws& laws() const { return laws_; }

    [[nodiscard]] Inversion<Int> inversion() const {
        const auto walsh = OrderedSums<Int>::walsh(sorted_);
        const auto mirrored = walsh.mirrored();
        Inversion<Int> result{walsh, gap_law(walsh, false), mirrored, gap_law(mirrored, true)};
        result.spread = std::sqrt(moments().variance);
        result.halvings = 1;
        result.smallest_tail = exact_ ? std::exp2(-static_cast<double>(n_)) : result.law.tails(0).tails.upper;
        return result;
    }

private:
    // Without equal values, and in the classical table, the law is the untied one in every gap.
    [[nodiscard]] bool one_law() const { return table_ || !tied_values_; }

    // `sums` are those of the values, or of the values mirrored.
    [[nodiscard]] GapLaw gap_law(const OrderedSums<Int>& sums, bool mirror) const {
        if (!exact_) {
            return {normal_gaps(walsh_, moments()), {}};
        }
        if (one_law()) {
            return {
                one_law_gaps(walsh_, [law = law_, laws = laws_](std::int64_t above) { return laws.at(*law, above); }),
                {}};
        }
        const auto shared = std::make_shared<const std::vector<Int>>(mirror ? negated(sorted_) : sorted_);
        const auto by = [sums, shared](auto tails) {
            return [sums, shared, tails](std::int64_t k) {
                const GapPlace<Int> gap = gap_above(sums, k);
                return Gap{tails(sign_scores(rank_signed_in_gap(*shared, gap.floor))), gap.first, gap.last};
            };
        };
        GapLaw law{by([laws = laws_](const SignScores& scores) { return laws.tails(scores, best_signed_rank_tails); }),
                   {}};
        if (n_ > exact_is_quick && n_ < setup_is_slow) {
            law.rough = by([](const SignScores& scores) { return saddlepoint_tails(scores); });
        }
        return law;
    }

    [[nodiscard]] Moments moments() const { return table_ ? untied_moments(n_) : gap_moments(sorted_); }

    const std::vector<Int>& sorted_;
    std::int64_t n_;
    std::int64_t walsh_;
    SignScores scores_;
    bool table_;
    bool tied_values_;
    bool exact_;
    std::shared_ptr<const UntiedSignedRankLaw> law_;
    GapLaws laws_;
};

// p at a margin, with the zeros it makes dropped. Among many values an approximation within a factor of two decides
// where p is not near the rate.
template <class Int>
double dropped_p(const OneSample<Int>& sample, const Int& margin, const Settings& settings, const GapLaws& laws,
                 double rate) {
    const SignedRanking ranking = rank_signed(sample.sorted, margin, false);
    const Side side = settings.side;
    if (settings.method != Method::approximate) {
        const SignScores scores = sign_scores(ranking);
        if (ranking.used > exact_is_quick) {
            const double rough = p_value(saddlepoint_tails(scores), side);
            if (rough > 2 * rate || rough < rate / 2) {
                return rough;
            }
        }
        return p_value(laws.tails(scores, best_signed_rank_tails), side);
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
std::vector<double> exceptional_margins(const Outcome& outcome, const OneSample<Int>& sample, const GapLaws& laws) {
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
        const bool rejected = dropped_p(sample, values[i], outcome.settings, laws, rate) <= rate;
        if (!on_limit && rejected != outside) {
            found.push_back(at);
        }
    }
    return found;
}

template <class Int>
void signed_rank_test(Outcome& outcome, const OneSample<Int>& sample, const SignedRanking& ranking) {
    const Settings& settings = outcome.settings;
    const bool exact = settings.method != Method::approximate;
    const SignedRankPlan<Int> plan(outcome, sample, ranking, exact);
    outcome.statistic = static_cast<double>(ranking.doubled_positive_sum) / 2;
    if (exact) {
        take_tails(outcome, best_signed_rank_tails(plan.scores(), seconds_for_p));
    } else {
        take_approximate(outcome, signed_rank_moments(ranking));
    }
    const Inversion<Int> inversion = plan.inversion();
    outcome.estimate = median_breakpoint(inversion.breakpoints, 1, sample.grid);
    take_limits(outcome, inversion, sample.grid);
    if (settings.zeros == Zeros::drop && settings.interval == IntervalRule::matching) {
        outcome.observations.exceptional_margins = exceptional_margins(outcome, sample, plan.laws());
    }
    take_laws(outcome, plan.laws());
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
    const auto [level, rises] = std::equal_range(sample.sorted.begin(), sample.sorted.end(), sample.reference);
    const auto n = static_cast<double>(sample.sorted.size());
    const double successes = static_cast<double>(sample.sorted.end() - rises) + static_cast<double>(rises - level) / 2;
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
        signed_rank_test(outcome, sample, ranking);
        outcome.observations.lopsided = is_lopsided(sample);
    }
    take_chance_of_rise(outcome, sample);
}

template void analyse_one_sample(Outcome&, const OneSample<std::int64_t>&);
template void analyse_one_sample(Outcome&, const OneSample<Int128>&);
template void analyse_one_sample(Outcome&, const OneSample<BigInt>&);

} // namespace rankstead
