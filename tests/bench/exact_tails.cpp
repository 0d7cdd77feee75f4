#include "exact_tails.h"

#include "exact_choice_law.h"
#include "exact_sign_law.h"

#include "laws/binomial_coefficient.h"

#include <algorithm>

namespace rankstead::bench {

namespace {

test::BigTails swapped_if(bool swaps, const test::BigTails& tails) {
    return swaps ? test::BigTails{tails.upper, tails.lower, tails.total} : tails;
}

} // namespace

ExactTails exact_tails(const SignScores& scores) {
    const auto bits = static_cast<double>(scores.scores.size());
    const std::int64_t low = std::min(scores.statistic, scores.sum - scores.statistic);
    const bool above = low != scores.statistic;
    return {accuracy::sign_work(scores.scores, low, bits),
            [=] { return swapped_if(above, accuracy::exact_sign_tails(scores.scores, {low}, bits).front()); }};
}

ExactTails exact_tails(const ChoiceScores& scores) {
    const CanonicalChoice law = canonical(scores);
    const accuracy::Choice choice{law.scores.scores, law.scores.chosen};
    const std::int64_t sum = law.scores.statistic;
    const double bits = log2_choose(static_cast<std::int64_t>(choice.scores.size()), choice.chosen) + 1;
    const accuracy::CountingPlan plan = accuracy::plan_of(choice, sum, bits);
    return {plan.work, [=, swaps = law.swaps] {
                return swapped_if(swaps, accuracy::exact_choice_tails(choice, {sum}, bits, plan.way).front());
            }};
}

} // namespace rankstead::bench
