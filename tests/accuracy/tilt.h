// Exponential tilting of a sum of scores, each taken or left: where in the law a given p lies, and Chernoff's bound
// (1952) on how many arrangements there are up to a sum. It places the random cases and says how many bits the exact
// count needs; the bound holds for every tilt, however roughly that was found.
#pragma once

#include <cstdint>
#include <optional>
#include <vector>

namespace rankstead::accuracy {

using Scores = std::vector<std::int64_t>;

// A score s is taken with the odds exp(by_count - by_sum * s).
struct Tilt {
    double by_count = 0;
    double by_sum = 0;
    double log_product = 0; // of 1 + odds over all scores
    double mean = 0;        // of the sum

    [[nodiscard]] double odds(std::int64_t score) const;
    // At least log2 of the number of arrangements (with `chosen` scores taken) whose sum is at most `sum`.
    [[nodiscard]] double log2_arrangements(std::int64_t chosen, std::int64_t sum) const;
};

class TiltedLaw {
public:
    // `chosen` scores are taken; empty: as many as one likes.
    TiltedLaw(const Scores& ascending, std::optional<std::int64_t> chosen);

    // Where P(sum <= mean of the tilt) is about exp(log_p): from the middle of the law to its very end.
    [[nodiscard]] Tilt reaching(double log_p) const;
    [[nodiscard]] std::int64_t chosen() const { return chosen_.value_or(0); }
    [[nodiscard]] double log2_total() const { return log2_total_; }

private:
    [[nodiscard]] Tilt at(double by_sum, double by_count) const;
    [[nodiscard]] double count_for(double by_sum) const;

    Scores scores_; // distinct
    std::vector<double> counts_;
    std::optional<std::int64_t> chosen_;
    double log2_total_ = 0;
};

} // namespace rankstead::accuracy
