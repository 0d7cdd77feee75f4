#include "shapes.h"

#include "exact_sign_law.h"
#include "laws/exact_laws.h"
#include "laws/inversion/certified_inversion.h"
#include "laws/inversion/untied_inversion.h"
#include "random_sums.h"
#include "trial_parts.h"

#include <numeric>
#include <optional>

namespace rankstead::accuracy {

namespace {

// Half of the laws are looked at from their upper end.
SignScores question(const Scores& scores, std::int64_t sum, bool upside_down) {
    const std::int64_t all = std::accumulate(scores.begin(), scores.end(), std::int64_t{0});
    return {scores, all, upside_down ? all - sum : sum};
}

class SignTrial {
public:
    SignTrial(const SignShape& shape, const Effort& effort) : shape_(shape), effort_(effort), random_(shape.seed) {
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
        const std::int64_t n = log_whole(random_, shape_.least_n, shape_.most_n);
        const std::int64_t zeros = shape_.zeros ? log_whole(random_, 1, n) : 0;
        const Scores scores = midranks(random_group_sizes(random_, n, shape_.ties, shape_.levels), zeros);
        const auto [sums, bits] = random_sign_sums(
            random_, scores, sums_per_law,
            [&](std::int64_t sum, double log2_count) { return sign_work(scores, sum, log2_count); }, effort_.work);
        if (sums.empty()) {
            return;
        }
        std::optional<UntiedSignedRankLaw> table;
        if (shape_.ties == Ties::none && zeros == 0) {
            table.emplace(n);
        }
        const std::vector<BigTails> exact = exact_sign_tails(scores, sums, bits);
        for (std::size_t i = 0; i < sums.size(); ++i) {
            const std::string which = shape_.name + ", " + law + ": n " + std::to_string(n) + ", zeros " +
                                      std::to_string(zeros) + ", sum " + std::to_string(sums[i]);
            try_a_sum(scores, sums[i], exact[i], table, which);
        }
    }

    void try_a_sum(const Scores& scores, std::int64_t sum, const BigTails& exact,
                   const std::optional<UntiedSignedRankLaw>& table, const std::string& which) {
        const bool upside_down = random_.whole(0, 1) == 1;
        const SignScores asked = question(scores, sum, upside_down);
        const BigTails truth = upside_down ? swapped(exact) : exact;
        tally_.count_case(truth);
        try {
            tally_.compare(exact_signed_rank_tails(asked, seconds_for_a_law), truth, which);
        } catch (const LawTooLong&) {
            tally_.without_law.push_back(which);
        }
        if (table) {
            const auto n = static_cast<std::int64_t>(scores.size());
            try_inversion(tally_, UntiedInversion::of_signed_rank(n), sum, exact, which + ", closed form");
            try {
                tally_.compare(table->at(asked.statistic), truth, which + ", table");
            } catch (const LawTooLong&) {
                tally_.without_law.push_back(which + ", table");
            }
        }
        if (signed_rank_cost(asked) <= seconds_of_a_small_law) {
            try_inversion(tally_, CertifiedInversion::of_signs(ScoredItems::of(scores)), sum, exact,
                          which + ", inversion");
        }
    }

    const SignShape& shape_;
    const Effort& effort_;
    Random random_;
    Tally tally_;
};

} // namespace

Tally trial(const SignShape& shape, const Effort& effort) {
    return SignTrial(shape, effort).run();
}

} // namespace rankstead::accuracy
