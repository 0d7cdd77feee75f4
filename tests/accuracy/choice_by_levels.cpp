#include "choice_by_levels.h"

#include <algorithm>

namespace rankstead::accuracy {

namespace {

using test::Big;

struct Level {
    std::int64_t score = 0;
    std::int64_t size = 0;
    std::vector<Big> choices; // of 0, 1, 2, ... out of `size`
};

std::vector<Level> levels_of(const Scores& scores) {
    std::vector<Level> levels;
    for (const std::int64_t score : scores) {
        if (levels.empty() || levels.back().score != score) {
            levels.push_back({score, 0, {}});
        }
        ++levels.back().size;
    }
    return levels;
}

std::vector<Level> levels_with_choices(const Choice& choice) {
    std::vector<Level> levels = levels_of(choice.scores);
    for (Level& level : levels) {
        level.choices = {1};
        for (std::int64_t k = 1; k <= std::min(level.size, choice.chosen); ++k) {
            level.choices.push_back(level.choices.back() * (level.size - k + 1) / k);
        }
    }
    return levels;
}

class Divisions {
public:
    Divisions(const Choice& choice, const std::vector<std::int64_t>& sums)
        : levels_(levels_with_choices(choice)), sums_(sums), largest_(*std::max_element(sums.begin(), sums.end())),
          tails_(sums.size()) {
        take(0, choice.chosen, 0, 1);
        const Big total = test::big_choose(choice.scores.size(), static_cast<std::size_t>(choice.chosen));
        for (BigTails& tails : tails_) {
            tails.total = total;
            tails.upper += total - tails.lower; // so far the ways exactly at the sum
        }
    }

    [[nodiscard]] const std::vector<BigTails>& tails() const { return tails_; }

private:
    // Takes the `left` that are still to be chosen from level g on.
    void take(std::size_t g, std::int64_t left, std::int64_t sum, const Big& ways) {
        const Level& level = levels_[g];
        if (sum + left * level.score > largest_) {
            return; // all levels to come are at least as high
        }
        if (g + 1 == levels_.size()) {
            if (left <= level.size) {
                count(sum + left * level.score, ways * level.choices[static_cast<std::size_t>(left)]);
            }
            return;
        }
        for (std::int64_t k = 0; k <= std::min(left, level.size); ++k) {
            take(g + 1, left - k, sum + k * level.score, ways * level.choices[static_cast<std::size_t>(k)]);
        }
    }

    void count(std::int64_t sum, const Big& ways) {
        for (std::size_t i = 0; i < sums_.size(); ++i) {
            if (sum <= sums_[i]) {
                tails_[i].lower += ways;
            }
            if (sum == sums_[i]) {
                tails_[i].upper += ways;
            }
        }
    }

    std::vector<Level> levels_;
    const std::vector<std::int64_t>& sums_;
    std::int64_t largest_;
    std::vector<BigTails> tails_;
};

} // namespace

double divisions_among_levels(const Choice& choice) {
    std::vector<double> ways(static_cast<std::size_t>(choice.chosen) + 1, 0); // by the number taken
    ways[0] = 1;
    for (const Level& level : levels_of(choice.scores)) {
        std::vector<double> next(ways.size(), 0);
        double window = 0; // of ways, as wide as the level
        const auto width = static_cast<std::size_t>(level.size) + 1;
        for (std::size_t c = 0; c < ways.size(); ++c) {
            window += ways[c] - (c >= width ? ways[c - width] : 0);
            next[c] = window;
        }
        ways = next;
    }
    return ways.back();
}

std::vector<BigTails> choice_tails_by_levels(const Choice& choice, const std::vector<std::int64_t>& sums) {
    return Divisions(choice, sums).tails();
}

} // namespace rankstead::accuracy
