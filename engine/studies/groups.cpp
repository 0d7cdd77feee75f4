#include "../laws/binomial_coefficient.h"
#include "../laws/normal_approximation.h"
#include "../laws/rank_sum_law.h"
#include "../laws/saddlepoint.h"
#include "common.h"
#include "fingerprint.h"
#include "studies.h"

#include <memory>

namespace rankstead {

namespace {

template <class Int>
struct TwoSamples {
    std::vector<Int> first;  // ascending, not empty
    std::vector<Int> second; // ascending, not empty
    Int margin;
    Grid grid;
};

// The probability of the lowest or highest rank sum: the ways to fill the last tie group that is not taken whole.
template <class Iterator>
double extreme_tail(const PooledRanking& ranking, Iterator begin, Iterator end) {
    std::int64_t wanted = ranking.first;
    for (auto at = begin; at != end; ++at) {
        const PooledGroup& group = *at;
        if (wanted <= group.count()) {
            const std::int64_t all = ranking.first + ranking.second;
            const auto ways = exact_choose(group.count(), wanted);
            const auto total = exact_choose(all, ranking.first);
            return ways && total ? static_cast<double>(*ways) / static_cast<double>(*total)
                                 : std::exp2(log2_choose(group.count(), wanted) - log2_choose(all, ranking.first));
        }
        wanted -= group.count();
    }
    return 1;
}

double smallest_two_sided_p(const PooledRanking& ranking) {
    const auto& groups = ranking.groups;
    const double tail = std::min(extreme_tail(ranking, groups.begin(), groups.end()),
                                 extreme_tail(ranking, groups.rbegin(), groups.rend()));
    return std::clamp(2 * tail, smallest_positive_p, 1.0);
}

double smallest_untied_tail(std::int64_t first, std::int64_t second) {
    const auto total = exact_choose(first + second, first);
    return total ? 1 / static_cast<double>(*total) : std::exp2(-log2_choose(first + second, first));
}

Moments untied_moments(std::int64_t first, std::int64_t second) {
    const auto m = static_cast<double>(first);
    const auto n = static_cast<double>(second);
    return {m * n / 2, m * n * (m + n + 1) / 12};
}

// Up to so many values the exact law is as quick as its approximation; beyond the others, setting up either takes
// longest.
constexpr std::int64_t exact_is_quick = 110;
constexpr std::int64_t setup_is_slow = 20'000;

// In the gaps between differences only equal values within a sample tie, and U is the number of differences above.
template <class Int>
class RankSumPlan {
public:
    RankSumPlan(const Outcome& outcome, const TwoSamples<Int>& samples, const PooledRanking& ranking, bool exact)
        : samples_(samples), first_(ranking.first), second_(ranking.second),
          table_(outcome.settings.interval == IntervalRule::table),
          tied_within_(has_equal_neighbours(samples.first) || has_equal_neighbours(samples.second)),
          untied_(ranking.tied() == 0), exact_(exact) {
        if (exact_ && (one_law() || untied_)) {
            law_ = std::make_shared<const UntiedRankSumLaw>(first_, second_);
        }
    }

    [[nodiscard]] Tails observed(const PooledRanking& ranking) const {
        return untied_ ? law_->best_at(ranking.doubled_u() / 2)
                       : best_rank_sum_tails(choice_scores(ranking), seconds_for_p);
    }

    // The laws of the limits, as far as they have been asked for.
    [[nodiscard]] const GapLaws& laws() const { return laws_; }

    [[nodiscard]] Inversion<Int> inversion() const {
        const auto sums = OrderedSums<Int>::differences(samples_.first, samples_.second);
        const auto mirrored = sums.mirrored();
        Inversion<Int> result{sums, gap_law(samples_.first, samples_.second, sums), mirrored,
                              gap_law(samples_.second, samples_.first, mirrored)};
        result.spread = std::sqrt(gap_moments().variance);
        result.smallest_tail = exact_ ? smallest_untied_tail(first_, second_) : result.law.tails(0).tails.upper;
        return result;
    }

private:
    [[nodiscard]] bool one_law() const { return table_ || !tied_within_; }

    // `sums` are the differences x - y; the samples must outlive the result.
    [[nodiscard]] GapLaw gap_law(const std::vector<Int>& x, const std::vector<Int>& y,
                                 const OrderedSums<Int>& sums) const {
        const std::int64_t pairs = first_ * second_;
        if (!exact_) {
            const Moments moments = gap_moments();
            return {
                one_law_gaps(
                    pairs, [moments](std::int64_t above) { return normal_tails(static_cast<double>(above), moments); }),
                {}};
        }
        if (one_law()) {
            return {
                one_law_gaps(pairs, [law = law_, laws = laws_](std::int64_t above) { return laws.at(*law, above); }),
                {}};
        }
        const auto by = [sums, &x, &y](auto tails) {
            return [sums, &x, &y, tails](std::int64_t k) {
                const GapPlace<Int> gap = gap_above(sums, k);
                return Gap{tails(choice_scores(rank_pooled_in_gap(x, y, gap.floor))), gap.first, gap.last};
            };
        };
        GapLaw law{by([laws = laws_](const ChoiceScores& scores) { return laws.tails(scores, best_rank_sum_tails); }),
                   {}};
        if (first_ + second_ > exact_is_quick && first_ + second_ < setup_is_slow) {
            law.rough = by([](const ChoiceScores& scores) { return saddlepoint_tails(scores); });
        }
        return law;
    }

    // The same in every gap: only equal values within a sample tie there.
    [[nodiscard]] Moments gap_moments() const {
        const auto& x = samples_.first;
        const auto& y = samples_.second;
        return table_ ? untied_moments(first_, second_)
                      : rank_sum_moments(rank_pooled(x, y, Int(x.front() - y.back() - 1)));
    }

    const TwoSamples<Int>& samples_;
    std::int64_t first_;
    std::int64_t second_;
    bool table_;
    bool tied_within_;
    bool untied_;
    bool exact_;
    std::shared_ptr<const UntiedRankSumLaw> law_;
    GapLaws laws_;
};

template <class Int>
void rank_sum_test(Outcome& outcome, const TwoSamples<Int>& samples, const PooledRanking& ranking) {
    const bool exact = outcome.settings.method != Method::approximate;
    const RankSumPlan<Int> plan(outcome, samples, ranking, exact);
    if (exact) {
        take_tails(outcome, plan.observed(ranking));
    } else {
        take_approximate(outcome, rank_sum_moments(ranking));
    }
    const Inversion<Int> inversion = plan.inversion();
    outcome.estimate = median_breakpoint(inversion.breakpoints, 0, samples.grid);
    take_limits(outcome, inversion, samples.grid);
    take_laws(outcome, plan.laws());
}

template <class Int>
void rank_sum_study(Outcome& outcome, const TwoSamples<Int>& samples) {
    const PooledRanking ranking = rank_pooled(samples.first, samples.second, samples.margin);
    outcome.statistic = static_cast<double>(ranking.doubled_u()) / 2;
    outcome.tied = static_cast<std::size_t>(ranking.tied());
    outcome.observations.all_tied = ranking.groups.size() == 1;
    outcome.smallest_p = smallest_two_sided_p(ranking);
    rank_sum_test(outcome, samples, ranking);
}

template <class Int>
void take_superiority(Outcome& outcome, const TwoSamples<Int>& samples) {
    const PooledRanking ranking = rank_pooled(samples.first, samples.second, Int(0));
    const double rate = tail_rate(outcome.settings).value();
    const auto interval = outcome.settings.chance_interval == ChanceInterval::placement
                              ? placement_interval(ranking, rate)
                              : std::optional(newcombe_interval(ranking, rate));
    take_chance(outcome, chance_of(ranking), interval,
                "a group of one value has no spread, so the placement interval does not exist. Use "
                "chance interval=newcombe, or more values.");
}

// Interquartile ranges that differ more than threefold, from five values a group on.
bool spreads_differ(const Sample& first, const Sample& second) {
    constexpr std::size_t enough = 5;
    constexpr double times_wider = 3;
    const double a = first.description.upper_quartile - first.description.lower_quartile;
    const double b = second.description.upper_quartile - second.description.lower_quartile;
    return first.n >= enough && second.n >= enough && std::max(a, b) > times_wider * std::min(a, b);
}

} // namespace

Outcome run_groups(const Arguments& arguments, const Settings& settings) {
    Column first = read_column(*arguments[0], settings);
    Column second = read_column(*arguments[1], settings);
    Outcome outcome;
    outcome.study = StudyId::groups;
    outcome.settings = settings;
    outcome.ledgers = {first.ledger, second.ledger};
    outcome.n = first.values.size() + second.values.size();
    outcome.fingerprint = Fingerprint().add(first).add(second).text();
    Grid grid;
    grid.cover(first.values);
    grid.cover(second.values);
    grid.cover(settings.margin);
    require_practicable(grid, outcome.n);
    with_integers(grid, [&]<class Int>() {
        TwoSamples<Int> samples{moved_on_grid<Int>(std::move(first.values), grid),
                                moved_on_grid<Int>(std::move(second.values), grid), on_grid<Int>(settings.margin, grid),
                                grid};
        std::sort(samples.first.begin(), samples.first.end());
        std::sort(samples.second.begin(), samples.second.end());
        outcome.first = {chosen_name(settings.first_name, first.heading, "first"), samples.first.size(),
                         describe(samples.first, grid)};
        outcome.second = {chosen_name(settings.second_name, second.heading, "second"), samples.second.size(),
                          describe(samples.second, grid)};
        rank_sum_study(outcome, samples);
        take_superiority(outcome, samples);
    });
    outcome.observations.spreads_differ = spreads_differ(outcome.first, *outcome.second);
    return outcome;
}

} // namespace rankstead
