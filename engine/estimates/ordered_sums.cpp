#include "ordered_sums.h"

#include "../grid.h"

#include <algorithm>
#include <cmath>

namespace rankstead {

namespace {

// A small generator for pivots (splitmix64, Steele et al. 2014): the result of a selection does not depend on it.
std::uint64_t scrambled(std::uint64_t& state) {
    state += 0x9E3779B97F4A7C15U;
    std::uint64_t z = state;
    z = (z ^ (z >> 30U)) * 0xBF58476D1CE4E5B9U;
    z = (z ^ (z >> 27U)) * 0x94D049BB133111EBU;
    return z ^ (z >> 31U);
}

constexpr std::int64_t sample_size = 600;

} // namespace

template <class Int>
OrderedSums<Int>::OrderedSums(std::vector<Int> a, std::vector<Int> b, bool triangle)
    : a_(std::move(a)), b_(std::move(b)), triangle_(triangle) {
    const auto m = static_cast<std::int64_t>(a_.size());
    const auto n = static_cast<std::int64_t>(b_.size());
    size_ = triangle_ ? n * (n + 1) / 2 : m * n;
}

template <class Int>
OrderedSums<Int> OrderedSums<Int>::differences(const std::vector<Int>& x, const std::vector<Int>& y) {
    std::vector<Int> minus_y(y.rbegin(), y.rend());
    for (Int& value : minus_y) {
        value = -value;
    }
    return {x, std::move(minus_y), false};
}

template <class Int>
OrderedSums<Int> OrderedSums<Int>::walsh(const std::vector<Int>& d) {
    return {d, d, true};
}

template <class Int>
OrderedSums<Int> OrderedSums<Int>::values(const std::vector<Int>& d) {
    return {{Int(0)}, d, false};
}

template <class Int>
template <class Inside, class Visit>
void OrderedSums<Int>::walk(Inside inside, Visit visit) const {
    auto end = static_cast<std::int64_t>(b_.size());
    for (std::int64_t i = 0; i < static_cast<std::int64_t>(a_.size()); ++i) {
        const std::int64_t first = first_column(i);
        while (end > 0 && !inside(sum(i, end - 1))) {
            --end;
        }
        visit(i, std::max(end, first));
    }
}

template <class Int>
std::int64_t OrderedSums<Int>::count_at_most(const Int& value) const {
    std::int64_t count = 0;
    walk([&](const Int& s) { return s <= value; },
         [&](std::int64_t i, std::int64_t end) { count += end - first_column(i); });
    return count;
}

template <class Int>
std::int64_t OrderedSums<Int>::count_below(const Int& value) const {
    std::int64_t count = 0;
    walk([&](const Int& s) { return s < value; },
         [&](std::int64_t i, std::int64_t end) { count += end - first_column(i); });
    return count;
}

template <class Int>
Int OrderedSums<Int>::next_above(const Int& value) const {
    bool found = false;
    Int best(0);
    walk([&](const Int& s) { return s <= value; },
         [&](std::int64_t i, std::int64_t end) {
             if (end < static_cast<std::int64_t>(b_.size())) {
                 const Int candidate = sum(i, end);
                 best = found ? std::min(best, candidate) : candidate;
                 found = true;
             }
         });
    return best;
}

template <class Int>
Int OrderedSums<Int>::next_below(const Int& value) const {
    bool found = false;
    Int best(0);
    walk([&](const Int& s) { return s < value; },
         [&](std::int64_t i, std::int64_t end) {
             if (end > first_column(i)) {
                 const Int candidate = sum(i, end - 1);
                 best = found ? std::max(best, candidate) : candidate;
                 found = true;
             }
         });
    return best;
}

template <class Int>
void OrderedSums<Int>::keep_above(std::vector<Row>& rows, const Int& value) const {
    walk([&](const Int& s) { return s <= value; },
         [&](std::int64_t i, std::int64_t end) {
             Row& row = rows[static_cast<std::size_t>(i)];
             row.low = std::max(row.low, static_cast<std::uint32_t>(end));
         });
}

template <class Int>
void OrderedSums<Int>::keep_at_most(std::vector<Row>& rows, const Int& value) const {
    walk([&](const Int& s) { return s <= value; },
         [&](std::int64_t i, std::int64_t end) {
             Row& row = rows[static_cast<std::size_t>(i)];
             row.high = std::min(row.high, static_cast<std::uint32_t>(end));
         });
}

// Candidates drawn evenly, as sums, sorted.
template <class Int>
std::vector<Int> OrderedSums<Int>::sample(const std::vector<Row>& rows, std::int64_t candidates,
                                          std::uint64_t seed) const {
    std::vector<std::int64_t> picks;
    for (std::int64_t s = 0; s < sample_size; ++s) {
        picks.push_back(static_cast<std::int64_t>(scrambled(seed) % static_cast<std::uint64_t>(candidates)));
    }
    std::sort(picks.begin(), picks.end());
    std::vector<Int> sums;
    std::int64_t before = 0;
    auto pick = picks.begin();
    for (std::size_t i = 0; i < rows.size() && pick != picks.end(); ++i) {
        const std::int64_t width = rows[i].high > rows[i].low ? rows[i].high - rows[i].low : 0;
        for (; pick != picks.end() && *pick < before + width; ++pick) {
            sums.push_back(sum(static_cast<std::int64_t>(i), rows[i].low + (*pick - before)));
        }
        before += width;
    }
    std::sort(sums.begin(), sums.end());
    return sums;
}

template <class Int>
Int OrderedSums<Int>::select_among(const std::vector<Row>& rows, std::int64_t candidates, std::int64_t k) const {
    std::vector<Int> sums;
    sums.reserve(static_cast<std::size_t>(candidates));
    for (std::size_t i = 0; i < rows.size(); ++i) {
        for (std::int64_t j = rows[i].low; j < rows[i].high; ++j) {
            sums.push_back(sum(static_cast<std::int64_t>(i), j));
        }
    }
    const auto nth = sums.begin() + (k - 1);
    std::nth_element(sums.begin(), nth, sums.end());
    return *nth;
}

template <class Int>
Int OrderedSums<Int>::at(std::int64_t k) const {
    const auto lists = static_cast<std::int64_t>(a_.size() + b_.size());
    const std::int64_t few = std::max<std::int64_t>(20000, 2 * lists);
    std::vector<Row> rows(a_.size());
    for (std::size_t i = 0; i < rows.size(); ++i) {
        rows[i] = {static_cast<std::uint32_t>(first_column(static_cast<std::int64_t>(i))),
                   static_cast<std::uint32_t>(b_.size())};
    }
    // Invariant: the k-th smallest is among the candidates, `below` sums lie below all of them.
    std::int64_t candidates = size_;
    std::int64_t below = 0;
    std::uint64_t seed = 1;
    while (candidates > few) {
        const std::vector<Int> sums = sample(rows, candidates, ++seed);
        const double share = static_cast<double>(k - below) / static_cast<double>(candidates);
        const auto centre = static_cast<std::int64_t>(share * sample_size);
        const auto reach = static_cast<std::int64_t>(2.5 * std::sqrt(sample_size * share * (1 - share))) + 2;
        const auto last = static_cast<std::int64_t>(sums.size()) - 1;
        const Int low = sums[static_cast<std::size_t>(std::clamp<std::int64_t>(centre - reach, 0, last))];
        const Int high = sums[static_cast<std::size_t>(std::clamp<std::int64_t>(centre + reach, 0, last))];
        const std::int64_t below_low = count_below(low);
        const std::int64_t through_low = count_at_most(low);
        if (k > below_low && k <= through_low) {
            return low;
        }
        if (k <= below_low) {
            keep_at_most(rows, next_below(low));
            candidates = below_low - below;
            continue;
        }
        const std::int64_t through_high = count_at_most(high);
        keep_above(rows, low);
        if (k <= through_high) {
            keep_at_most(rows, high);
            candidates = through_high - through_low;
        } else {
            keep_above(rows, high);
            candidates -= through_high - below;
            below = through_high;
            continue;
        }
        below = through_low;
        // A bracket whose ends are neighbours holds one value many times.
        if (next_above(low) == high) {
            return high;
        }
    }
    return select_among(rows, candidates, k - below);
}

template class OrderedSums<std::int64_t>;
template class OrderedSums<Int128>;
template class OrderedSums<BigInt>;

} // namespace rankstead
