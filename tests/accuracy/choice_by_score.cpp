#include "choice_by_score.h"

#include "moduli.h"

#include <algorithm>
#include <numeric>

namespace rankstead::accuracy {

ChoiceByScore::ChoiceByScore(const Choice& choice, std::int64_t largest_sum)
    : scores_(choice.scores), chosen_(choice.chosen), largest_sum_(largest_sum), sums_(choice.scores.size() + 1, 0) {
    std::partial_sum(scores_.begin(), scores_.end(), sums_.begin() + 1);
}

std::int64_t ChoiceByScore::highest_excess(std::int64_t seen, std::int64_t count) const {
    const std::int64_t missing = chosen_ - count;
    const auto n = static_cast<std::int64_t>(scores_.size());
    if (count < 0 || count > seen || missing < 0 || seen + missing > n) {
        return -1;
    }
    const std::int64_t next_ones = least(seen + missing) - least(seen);
    const std::int64_t largest_of_seen = least(seen) - least(seen - count);
    return std::min(largest_sum_ - next_ones, largest_of_seen) - least(count);
}

// Calls step(count, shift, highest) for each row that receives a score's ways: from the row of count - 1, whose
// excesses 0 to `highest` go up by `shift`. Rows are taken from the highest count down, so that each still holds the
// ways without the score.
template <class Step>
void ChoiceByScore::for_each_step(Step step) const {
    const auto n = static_cast<std::int64_t>(scores_.size());
    for (std::int64_t j = 0; j < n; ++j) {
        for (std::int64_t count = std::min(chosen_, j + 1); count >= 1; --count) {
            const std::int64_t shift = score(j) - score(count - 1);
            const std::int64_t highest = std::min(highest_excess(j, count - 1), highest_excess(j + 1, count) - shift);
            if (highest >= 0) {
                step(static_cast<std::size_t>(count), static_cast<std::size_t>(shift),
                     static_cast<std::size_t>(highest));
            }
        }
    }
}

double ChoiceByScore::additions() const {
    double additions = 0;
    for_each_step(
        [&](std::size_t, std::size_t, std::size_t highest) { additions += static_cast<double>(highest) + 9; });
    return additions;
}

std::vector<std::uint64_t> ChoiceByScore::ways(std::uint64_t modulus) const {
    const auto width = static_cast<std::size_t>(largest_sum_ - least_sum()) + 1;
    std::vector<std::vector<std::uint64_t>> rows(static_cast<std::size_t>(chosen_) + 1,
                                                 std::vector<std::uint64_t>(width, 0));
    rows[0][0] = 1;
    for_each_step([&](std::size_t count, std::size_t shift, std::size_t highest) {
        std::uint64_t* to = rows[count].data() + shift;
        const std::uint64_t* from = rows[count - 1].data();
        for (std::size_t e = 0; e <= highest; ++e) {
            to[e] = sum_modulo(to[e], from[e], modulus);
        }
    });
    return rows.back();
}

} // namespace rankstead::accuracy
