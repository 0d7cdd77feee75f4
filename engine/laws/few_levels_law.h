// Laws of scores on few levels, where an inversion has many frequencies to look at: all the ways in which the number
// taken of each level can be the statistic or less, summed up. Of each level it is binomial, tilted to where the
// statistic is (the saddlepoint), and numbers far from its mode are left out with a bound; the rank sum is conditioned
// on the number taken in all. The last level, or the last two, are summed cumulatively rather than one by one.
#pragma once

#include "compensated_sum.h"
#include "inversion/sought_tail.h"

#include <cstddef>
#include <cstdint>
#include <optional>
#include <vector>

namespace rankstead {

class FewLevelsLaw {
public:
    static constexpr std::size_t most_levels = 6;

    // Of 2 to most_levels scores, at w, not above the mean. The same arguments as CertifiedInversion's.
    static FewLevelsLaw of_signs(const ScoredItems& items, std::int64_t w);
    static FewLevelsLaw of_choice(const ScoredItems& items, std::int64_t chosen, std::int64_t w);
    FewLevelsLaw(const FewLevelsLaw&) = delete;
    FewLevelsLaw& operator=(const FewLevelsLaw&) = delete;

    // Predicted.
    [[nodiscard]] double seconds() const;

    // Both at w, with bounds. Empty where no useful bound can be given.
    [[nodiscard]] std::optional<CertifiedTail> evaluate() const;

private:
    // The numbers taken of one level that are not left out, with what they weigh in the sum.
    struct Level {
        std::int64_t score = 0;
        std::int64_t least = 0;
        std::int64_t mode = 0;
        std::vector<double> weights; // of least, least + 1, ...
        [[nodiscard]] std::int64_t most() const { return least + static_cast<std::int64_t>(weights.size()) - 1; }
    };
    struct Sums {
        CompensatedSum through; // at w and below
        CompensatedSum at;
    };

    FewLevelsLaw(const ScoredItems& items, double p, Count count, std::int64_t chosen, std::int64_t w);

    void find_tilt();
    void fill_levels();
    [[nodiscard]] Level level_of(std::size_t group);
    [[nodiscard]] bool free() const { return !tail_.count_is_fixed(); }

    // The least and the most that the last two levels can have together, given the count.
    [[nodiscard]] std::int64_t first_rest() const;
    [[nodiscard]] std::int64_t last_rest() const;

    [[nodiscard]] Sums sum_of_signs() const;
    [[nodiscard]] Sums sum_of_choice() const;

    Characteristic law_;
    SoughtTail tail_; // of law_
    double a_ = 0;
    double lambda_ = 0;
    std::vector<Level> levels_; // the widest last
    double left_out_ = 0;
    std::int64_t widest_ = 0;
    double largest_exponent_ = 0;
    double log_largest_ = 0; // of the product of each level's largest weight, or 1
};

} // namespace rankstead
