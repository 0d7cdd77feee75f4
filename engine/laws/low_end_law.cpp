#include "low_end_law.h"

#include "binomial_coefficient.h"
#include "compensated_sum.h"
#include "inversion/characteristic.h"

#include <algorithm>
#include <cmath>
#include <limits>
#include <numeric>

namespace rankstead {

namespace {

constexpr double seconds_per_addition = 0.5e-9;
constexpr double most_cells = 4e6;

// What each value adds to the sum when it changes sides, ascending, up to the excess.
using Costs = std::vector<std::int64_t>;

struct Sides {
    std::int64_t excess = 0; // of the sum over the lowest one
    Costs taken;             // from above the boundary
    Costs left;              // from below it
};

Sides sides_of(const ChoiceScores& scores) {
    const auto boundary = scores.scores.begin() + scores.chosen;
    const std::int64_t at = *(boundary - 1);
    Sides sides;
    sides.excess = scores.statistic - std::accumulate(scores.scores.begin(), boundary, std::int64_t{0});
    for (auto score = boundary; score != scores.scores.end() && *score - at <= sides.excess; ++score) {
        sides.taken.push_back(*score - at);
    }
    for (auto score = boundary; score != scores.scores.begin() && at - *(score - 1) <= sides.excess; --score) {
        sides.left.push_back(at - *(score - 1));
    }
    return sides;
}

// How many values may change sides before even the cheapest cost more than the excess.
std::int64_t most_changes(const Costs& costs, std::int64_t excess) {
    std::int64_t sum = 0;
    std::int64_t count = 0;
    for (const std::int64_t cost : costs) {
        sum += cost;
        if (sum > excess) {
            break;
        }
        ++count;
    }
    return count;
}

std::int64_t most_changes(const Sides& sides) {
    return std::min(most_changes(sides.taken, sides.excess), most_changes(sides.left, sides.excess));
}

// Ways to change c of the values for a cost of e in all, row by row of c.
class Ways {
public:
    Ways(const Costs& costs, std::int64_t changes, std::int64_t excess, double start)
        : width_(excess + 1), cells_(static_cast<std::size_t>((changes + 1) * width_), 0.0) {
        cells_[0] = start;
        std::int64_t seen = 0;
        for (const std::int64_t cost : costs) {
            ++seen;
            for (std::int64_t c = std::min(seen, changes); c >= 1; --c) {
                double* __restrict to = row(c) + cost;
                const double* __restrict from = row(c - 1);
                for (std::int64_t e = 0; e + cost < width_; ++e) {
                    to[e] += from[e];
                }
            }
        }
    }

    [[nodiscard]] double* row(std::int64_t c) { return cells_.data() + c * width_; }

private:
    std::int64_t width_;
    std::vector<double> cells_;
};

} // namespace

double low_end_seconds(const ChoiceScores& scores) {
    const Sides sides = sides_of(scores);
    const auto changes = static_cast<double>(most_changes(sides));
    const double cells = (changes + 1) * (static_cast<double>(sides.excess) + 1);
    return cells > most_cells
               ? std::numeric_limits<double>::infinity()
               : seconds_per_addition * cells * static_cast<double>(sides.taken.size() + sides.left.size() + 8);
}

std::optional<Tails> low_end_tails(const ChoiceScores& scores) {
    const Sides sides = sides_of(scores);
    const auto n = static_cast<std::int64_t>(scores.scores.size());
    const double log2_total = log2_choose(n, scores.chosen);
    // Counts far beyond the range of a double start far below 1.
    const int scale = static_cast<int>(std::clamp(log2_total - 1000, 0.0, 1000.0));
    const std::int64_t changes = most_changes(sides);
    Ways taken(sides.taken, changes, sides.excess, std::ldexp(1.0, -scale));
    Ways left(sides.left, changes, sides.excess, 1);
    CompensatedSum below;
    CompensatedSum through;
    for (std::int64_t c = 0; c <= changes; ++c) {
        double* cumulative = left.row(c);
        std::partial_sum(cumulative, cumulative + sides.excess + 1, cumulative);
        const double* ways = taken.row(c);
        for (std::int64_t e = 0; e <= sides.excess; ++e) {
            through.add(ways[e] * cumulative[sides.excess - e]);
            below.add(e < sides.excess ? ways[e] * cumulative[sides.excess - e - 1] : 0.0);
        }
    }
    const double whole = std::floor(log2_total);
    const auto probability = [&](double count) {
        return std::ldexp(count * std::exp2(whole - log2_total), scale - static_cast<int>(whole));
    };
    // Additions of positive terms, and the logarithm of the number of all choices, right to a few units of n log n.
    const auto size = static_cast<double>(n);
    const double error =
        unit_roundoff * (2 * (size + static_cast<double>(sides.excess) + 20) + 16 * size * (std::log(size) + 1));
    if (!std::isfinite(through.value()) || through.value() <= 0 || error > useful_accuracy) {
        return std::nullopt;
    }
    return from_lower(LawKind::summed, probability(through.value()), 1 - probability(below.value()), error);
}

} // namespace rankstead
