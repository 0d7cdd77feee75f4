#include "ordered_sums.h"

#include "../grid.h"
#include "staircase.h"

#include <algorithm>
#include <cmath>

namespace rankstead {

namespace {

// A small generator for pivots (splitmix64, Steele et al. 2014): the result of a selection does not depend on it.
std::uint64_t scrambled(std::uint64_t state) {
    std::uint64_t z = state * 0x9E3779B97F4A7C15U;
    z = (z ^ (z >> 30U)) * 0xBF58476D1CE4E5B9U;
    z = (z ^ (z >> 27U)) * 0x94D049BB133111EBU;
    return z ^ (z >> 31U);
}

// Every c-th member serves as the guess for all, with c near the fifth root of the length, and odd, so that each is the
// middle of the c around it.
std::int64_t thinning(std::size_t length) {
    constexpr std::size_t short_list = 9;
    const auto root = static_cast<std::int64_t>(std::pow(static_cast<double>(length), 0.2));
    return length < short_list ? 1 : std::max<std::int64_t>(3, root + 1 - root % 2);
}

// The middles of stretches of about c members each.
template <class Int>
std::vector<Int> every(std::int64_t c, const std::vector<Int>& list) {
    const std::size_t length = list.size() / static_cast<std::size_t>(c);
    std::vector<Int> thinned;
    thinned.reserve(length);
    for (std::size_t i = 0; i < length; ++i) {
        thinned.push_back(list[(2 * i + 1) * list.size() / (2 * length)]);
    }
    return thinned;
}

template <class Int>
std::vector<Int> reversed_negated(const std::vector<Int>& sorted) {
    std::vector<Int> result(sorted.rbegin(), sorted.rend());
    for (Int& value : result) {
        value = -value;
    }
    return result;
}

template <class Int>
std::shared_ptr<const std::vector<Int>> shared(std::vector<Int> list) {
    return std::make_shared<const std::vector<Int>>(std::move(list));
}

} // namespace

template <class Int>
OrderedSums<Int>::OrderedSums(List a, List b, bool triangle) : a_(std::move(a)), b_(std::move(b)), triangle_(triangle) {
    constexpr std::int64_t always_few = 400;
    const auto m = static_cast<std::int64_t>(a_->size());
    const auto n = static_cast<std::int64_t>(b_->size());
    size_ = triangle_ ? n * (n + 1) / 2 : m * n;
    few_ = std::max(always_few, m + n);
}

template <class Int>
OrderedSums<Int>::OrderedSums(std::vector<Int> a, std::vector<Int> b, bool triangle)
    : OrderedSums(shared(std::move(a)), shared(std::move(b)), triangle) {}

template <class Int>
OrderedSums<Int> OrderedSums<Int>::differences(const std::vector<Int>& x, const std::vector<Int>& y) {
    return {x, reversed_negated(y), false};
}

template <class Int>
OrderedSums<Int> OrderedSums<Int>::walsh(const std::vector<Int>& d) {
    const List list = shared(d);
    return {list, list, true};
}

template <class Int>
OrderedSums<Int> OrderedSums<Int>::values(const std::vector<Int>& d) {
    return {{Int(0)}, d, false};
}

template <class Int>
OrderedSums<Int> OrderedSums<Int>::mirrored() const {
    OrderedSums other(*this);
    other.mirrored_ = !mirrored_;
    return other;
}

template <class Int>
typename OrderedSums<Int>::Place OrderedSums<Int>::place(std::int64_t k) const {
    if (!mirrored_) {
        return select(k, k).first;
    }
    const Place place = select(size_ + 1 - k, size_ + 1 - k).first;
    return {Int(-place.value), size_ - place.through, size_ - place.below};
}

template <class Int>
std::pair<Int, Int> OrderedSums<Int>::pair_at(std::int64_t k) const {
    const std::int64_t lower = mirrored_ ? size_ - k : k;
    const auto [one, other] = select(lower, lower + 1);
    return mirrored_ ? std::pair(Int(-other.value), Int(-one.value)) : std::pair(one.value, other.value);
}

template <class Int>
typename OrderedSums<Int>::Level OrderedSums<Int>::lowest() const {
    Level level{Int(sum(0, 0) - 1), std::vector<std::uint32_t>(a_->size()), 0};
    for (std::size_t i = 0; triangle_ && i < level.ends.size(); ++i) {
        level.ends[i] = static_cast<std::uint32_t>(i);
    }
    return level;
}

template <class Int>
typename OrderedSums<Int>::Level OrderedSums<Int>::highest() const {
    const std::vector<std::uint32_t> ends(a_->size(), static_cast<std::uint32_t>(b_->size()));
    return {sum(a_->size() - 1, b_->size() - 1), ends, size_};
}

template <class Int>
typename OrderedSums<Int>::Level OrderedSums<Int>::level(const Int& value) const {
    Level level = lowest();
    const Staircase<Int> staircase(*a_, *b_, triangle_, value);
    level.value = value;
    level.through = staircase.mark(level.ends);
    if (triangle_) {
        level.through -= staircase.rows() * (staircase.rows() - 1) / 2; // what lies before the diagonal
    }
    return level;
}

// Two values with the k-th and the next-th smallest probably between them. Each sum of the thinned lists stands for
// c times d of all. The staircase cuts through about as many of these blocks as the lists have members, each by chance,
// which throws the count off by 0.3 times the square root of their number; that is allowed for three times over.
template <class Int>
std::pair<Int, Int> OrderedSums<Int>::guess(std::int64_t k, std::int64_t next) const {
    const List rows = shared(every(thinning(a_->size()), *a_));
    const List columns = triangle_ ? rows : shared(every(thinning(b_->size()), *b_));
    const OrderedSums thinned(rows, columns, triangle_);
    const double share = static_cast<double>(thinned.size_) / static_cast<double>(size_);
    const double reach = std::sqrt(static_cast<double>(rows->size() + columns->size())) + 1;
    const auto low = static_cast<std::int64_t>(static_cast<double>(k) * share - reach);
    const auto high = static_cast<std::int64_t>(static_cast<double>(next) * share + reach) + 1;
    const auto found = thinned.select(std::max<std::int64_t>(low, 1), std::min(high, thinned.size_));
    return {low < 1 ? Int(sum(0, 0) - 1) : found.first.value,
            high > thinned.size_ ? sum(a_->size() - 1, b_->size() - 1) : found.second.value};
}

// Two of the sums between the levels, around the k-th smallest of all, from a random sample.
template <class Int>
std::pair<Int, Int> OrderedSums<Int>::sampled_guess(const Level& low, const Level& high, std::int64_t k) const {
    constexpr std::size_t sample_size = 600;
    const auto candidates = static_cast<std::uint64_t>(high.through - low.through);
    std::vector<std::int64_t> picks;
    for (std::uint64_t s = 1; s <= sample_size; ++s) {
        picks.push_back(static_cast<std::int64_t>(scrambled(candidates + s) % candidates));
    }
    std::sort(picks.begin(), picks.end());
    std::vector<Int> sums;
    std::int64_t before = 0;
    for (std::size_t i = 0; i < low.ends.size() && sums.size() < sample_size; ++i) {
        const std::int64_t width = std::max(high.ends[i], low.ends[i]) - low.ends[i];
        for (; sums.size() < sample_size && picks[sums.size()] < before + width;) {
            sums.push_back(sum(i, static_cast<std::size_t>(low.ends[i] + picks[sums.size()] - before)));
        }
        before += width;
    }
    std::sort(sums.begin(), sums.end());
    const double share = static_cast<double>(k - low.through) / static_cast<double>(candidates);
    const double centre = share * sample_size;
    const double reach = 2.5 * std::sqrt(centre * (1 - share)) + 2;
    const auto pick = [&](double place) {
        return sums[static_cast<std::size_t>(std::clamp(place, 0.0, sample_size - 1.0))];
    };
    return {pick(centre - reach), pick(centre + reach)};
}

template <class Int>
std::pair<typename OrderedSums<Int>::Place, typename OrderedSums<Int>::Place>
OrderedSums<Int>::select_between(const Level& low, const Level& high, std::int64_t k, std::int64_t next) const {
    std::vector<Int> sums;
    sums.reserve(static_cast<std::size_t>(high.through - low.through));
    for (std::size_t i = 0; i < low.ends.size(); ++i) {
        for (std::size_t j = low.ends[i]; j < high.ends[i]; ++j) {
            sums.push_back(sum(i, j));
        }
    }
    const auto kth = sums.begin() + (k - low.through - 1);
    const auto nth = sums.begin() + (next - low.through - 1);
    std::nth_element(sums.begin(), kth, sums.end());
    if (nth != kth) {
        std::nth_element(kth + 1, nth, sums.end());
    }
    const auto place_of = [&](const Int& value) {
        const auto below = std::count_if(sums.begin(), sums.end(), [&](const Int& s) { return s < value; });
        const auto equal = std::count(sums.begin(), sums.end(), value);
        return Place{value, low.through + below, low.through + below + equal};
    };
    return {place_of(*kth), place_of(*nth)};
}

// Narrows the bracket until what is left is one value many times or few enough to be written down.
template <class Int>
typename OrderedSums<Int>::Place OrderedSums<Int>::settle(Level low, Level high, std::int64_t k) const {
    while (high.through - low.through > few_) {
        Level under = level(Int(high.value - 1));
        if (under.through < k) {
            return {high.value, under.through, high.through};
        }
        high = std::move(under);
        const auto [one, other] = sampled_guess(low, high, k);
        for (const Int& pivot : {one, other}) {
            Level at = level(pivot);
            if (at.through < k) {
                low = std::move(at);
            } else if (at.value < high.value) {
                high = std::move(at);
            }
        }
    }
    return select_between(low, high, k, k).first;
}

template <class Int>
std::pair<typename OrderedSums<Int>::Place, typename OrderedSums<Int>::Place>
OrderedSums<Int>::select(std::int64_t k, std::int64_t next) const {
    if (size_ <= few_) {
        return select_between(lowest(), highest(), k, next);
    }
    const auto [below, above] = guess(k, next);
    Level low = level(below);
    Level high = level(above);
    if (low.through < k && next <= high.through && high.through - low.through <= few_) {
        return select_between(low, high, k, next);
    }
    const auto settled = [&](std::int64_t one) {
        Level bottom = low.through < one ? low : lowest();
        Level top = low.through >= one ? low : high.through >= one ? high : highest();
        return settle(std::move(bottom), std::move(top), one);
    };
    const Place place = settled(k);
    return {place, next <= place.through ? place : settled(next)};
}

template class OrderedSums<std::int64_t>;
template class OrderedSums<Int128>;
template class OrderedSums<BigInt>;

} // namespace rankstead
