#include "shapes.h"

#include "exact_choice_law.h"
#include "laws/exact_laws.h"
#include "laws/inversion/certified_inversion.h"
#include "laws/inversion/untied_inversion.h"
#include "random_sums.h"
#include "trial_parts.h"

#include <algorithm>
#include <numeric>
#include <optional>

namespace rankstead::accuracy {

namespace {

// One question put in four ways: of either sample, with high values called low or not.
struct Seen {
    ChoiceScores scores;
    bool swaps = false; // whether the tails have changed places
};

Seen by_the_other_sample(Seen seen) {
    const std::int64_t all = std::accumulate(seen.scores.scores.begin(), seen.scores.scores.end(), std::int64_t{0});
    seen.scores.chosen = static_cast<std::int64_t>(seen.scores.scores.size()) - seen.scores.chosen;
    seen.scores.statistic = all - seen.scores.statistic;
    seen.swaps = !seen.swaps;
    return seen;
}

Seen upside_down(Seen seen) {
    Scores& scores = seen.scores.scores;
    const std::int64_t top = scores.back();
    std::reverse(scores.begin(), scores.end());
    for (std::int64_t& score : scores) {
        score = top - score;
    }
    seen.scores.statistic = seen.scores.chosen * top - seen.scores.statistic;
    seen.swaps = !seen.swaps;
    return seen;
}

class ChoiceTrial {
public:
    ChoiceTrial(const ChoiceShape& shape, const Effort& effort) : shape_(shape), effort_(effort), random_(shape.seed) {
        tally_.shape = shape.name;
    }

    Tally run() {
        for (int law = 0; law < laws_of(shape_.laws, effort_); ++law) {
            try_a_law("law " + std::to_string(law));
        }
        return tally_;
    }

private:
    void try_a_law(const std::string& law) {
        const std::int64_t first = log_whole(random_, shape_.least_first, shape_.most_first);
        const std::int64_t second = first * log_whole(random_, shape_.least_ratio, shape_.most_ratio);
        const Choice choice{midranks_from_zero(random_group_sizes(random_, first + second, shape_.ties, shape_.levels)),
                            first};
        if (choice.scores.back() == 0) {
            return; // all equal: there is nothing to tell apart
        }
        const auto [sums, bits] = random_choice_sums(
            random_, choice.scores, first, sums_per_law,
            [&](std::int64_t sum, double log2_count) { return plan_of(choice, sum, log2_count).work; },
            effort_.work * shape_.work);
        if (sums.empty()) {
            return;
        }
        std::optional<UntiedRankSumLaw> table;
        if (shape_.ties == Ties::none) {
            table.emplace(first, second);
        }
        const std::int64_t largest = *std::max_element(sums.begin(), sums.end());
        const std::vector<BigTails> exact = exact_choice_tails(choice, sums, bits, plan_of(choice, largest, bits).way);
        for (std::size_t i = 0; i < sums.size(); ++i) {
            const std::string which = shape_.name + ", " + law + ": " + std::to_string(first) + " v " +
                                      std::to_string(second) + ", sum " + std::to_string(sums[i]);
            try_a_sum(choice, sums[i], exact[i], which);
            if (table) {
                const std::int64_t u = sums[i] - first * (first - 1) / 2;
                try_table(*table, u, exact[i], which);
                try_inversion(tally_, UntiedInversion::of_rank_sum(first, second), u, exact[i],
                              which + ", closed form");
            }
        }
    }

    void try_a_sum(const Choice& choice, std::int64_t sum, const BigTails& exact, const std::string& which) {
        Seen seen{{choice.scores, choice.chosen, sum}, false};
        seen = random_.whole(0, 1) == 1 ? by_the_other_sample(seen) : seen;
        seen = random_.whole(0, 1) == 1 ? upside_down(seen) : seen;
        tally_.count_case(exact);
        try {
            tally_.compare(exact_rank_sum_tails(seen.scores, seconds_for_a_law), seen.swaps ? swapped(exact) : exact,
                           which);
        } catch (const LawTooLong&) {
            tally_.without_law.push_back(which);
        }
        if (rank_sum_cost(seen.scores) <= seconds_of_a_small_law) {
            try_inversion(tally_, CertifiedInversion::of_choice(ScoredItems::of(choice.scores), choice.chosen), sum,
                          exact, which + ", inversion");
        }
    }

    void try_table(const UntiedRankSumLaw& table, std::int64_t u, const BigTails& exact, const std::string& which) {
        try {
            tally_.compare(table.at(u), exact, which + ", table");
        } catch (const LawTooLong&) {
            tally_.without_law.push_back(which + ", table");
        }
    }

    const ChoiceShape& shape_;
    const Effort& effort_;
    Random random_;
    Tally tally_;
};

} // namespace

Tally trial(const ChoiceShape& shape, const Effort& effort) {
    return ChoiceTrial(shape, effort).run();
}

} // namespace rankstead::accuracy
