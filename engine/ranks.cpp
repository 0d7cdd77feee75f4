#include "ranks.h"

#include "grid.h"

#include <algorithm>
#include <iterator>

namespace rankstead {

std::int64_t SignedRanking::positives() const {
    std::int64_t sum = 0;
    for (const SignedGroup& group : groups) {
        sum += group.positive;
    }
    return sum;
}

std::int64_t SignedRanking::tied() const {
    std::int64_t sum = 0;
    for (const SignedGroup& group : groups) {
        sum += group.count > 1 ? group.count : 0;
    }
    return sum;
}

std::int64_t PooledRanking::tied() const {
    std::int64_t sum = 0;
    for (const PooledGroup& group : groups) {
        sum += group.count() > 1 ? group.count() : 0;
    }
    return sum;
}

namespace {

// Moves `at` past the values equal to *at and counts them.
template <class Iterator>
std::int32_t run_length(Iterator& at, Iterator end) {
    const Iterator begin = at;
    while (at != end && *at == *begin) {
        ++at;
    }
    return static_cast<std::int32_t>(at - begin);
}

enum class Lower { one, both, other };

// Ranks the rises from `rise` on with the falls, read downwards, from before it: `lower` says which of a rise and a
// fall is the smaller.
template <class Int, class Order>
void rank_rises_and_falls(SignedRanking& ranking, const std::vector<Int>& sorted,
                          typename std::vector<Int>::const_iterator rise,
                          typename std::vector<Int>::const_iterator fall_end, Order lower) {
    auto fall = std::make_reverse_iterator(fall_end);
    std::int64_t below = ranking.zeros_ranked ? ranking.zeros : 0;
    while (rise != sorted.end() || fall != sorted.rend()) {
        const Lower next = fall == sorted.rend()  ? Lower::one
                           : rise == sorted.end() ? Lower::other
                                                  : lower(*rise, *fall);
        SignedGroup group;
        if (next != Lower::other) {
            group.positive = run_length(rise, sorted.end());
        }
        group.count = group.positive + (next != Lower::one ? run_length(fall, sorted.rend()) : 0);
        group.doubled_rank = 2 * below + group.count + 1;
        below += group.count;
        ranking.used += group.count;
        ranking.doubled_positive_sum += group.doubled_rank * group.positive;
        ranking.groups.push_back(group);
    }
}

// Ranks two samples together: `lower` says which of a value of the first and one of the second is the lower.
template <class Int, class Order>
PooledRanking rank_two(const std::vector<Int>& first, const std::vector<Int>& second, Order lower) {
    PooledRanking ranking;
    ranking.first = static_cast<std::int64_t>(first.size());
    ranking.second = static_cast<std::int64_t>(second.size());
    ranking.groups.reserve(first.size() + second.size()); // growing would take the memory twice over
    auto x = first.begin();
    auto y = second.begin();
    std::int64_t below = 0;
    while (x != first.end() || y != second.end()) {
        const Lower next = y == second.end() ? Lower::one : x == first.end() ? Lower::other : lower(*x, *y);
        PooledGroup group;
        group.first = next != Lower::other ? run_length(x, first.end()) : 0;
        group.second = next != Lower::one ? run_length(y, second.end()) : 0;
        group.doubled_rank = 2 * below + group.count() + 1;
        below += group.count();
        ranking.doubled_first_sum += group.doubled_rank * group.first;
        ranking.groups.push_back(group);
    }
    return ranking;
}

template <class Int>
Lower lower_of(const Int& one, const Int& other) {
    return one < other ? Lower::one : one == other ? Lower::both : Lower::other;
}

} // namespace

template <class Int>
SignedRanking rank_signed(const std::vector<Int>& sorted, const Int& origin, bool rank_zeros) {
    SignedRanking ranking;
    ranking.zeros_ranked = rank_zeros;
    const auto [zero_begin, rise] = std::equal_range(sorted.begin(), sorted.end(), origin);
    ranking.zeros = rise - zero_begin;
    ranking.groups.reserve(sorted.size());
    rank_rises_and_falls(ranking, sorted, rise, zero_begin, [&](const Int& up, const Int& down) {
        return lower_of(Int(up - origin), Int(origin - down));
    });
    return ranking;
}

template <class Int>
SignedRanking rank_signed_in_gap(const std::vector<Int>& sorted, const Int& floor) {
    SignedRanking ranking;
    const auto rise = std::partition_point(sorted.begin(), sorted.end(), [&](const Int& d) { return d + d <= floor; });
    ranking.groups.reserve(sorted.size());
    // up - m < m - down where their sum is below 2m, so where it is at most `floor`.
    rank_rises_and_falls(ranking, sorted, rise, rise, [&](const Int& up, const Int& down) {
        return up + down <= floor ? Lower::one : Lower::other;
    });
    return ranking;
}

template <class Int>
PooledRanking rank_pooled(const std::vector<Int>& first, const std::vector<Int>& second, const Int& shift) {
    return rank_two(first, second, [&](const Int& x, const Int& y) { return lower_of(Int(x - shift), y); });
}

template <class Int>
PooledRanking rank_pooled_in_gap(const std::vector<Int>& first, const std::vector<Int>& second, const Int& floor) {
    return rank_two(first, second,
                    [&](const Int& x, const Int& y) { return x - y <= floor ? Lower::one : Lower::other; });
}

template SignedRanking rank_signed(const std::vector<std::int64_t>&, const std::int64_t&, bool);
template SignedRanking rank_signed_in_gap(const std::vector<std::int64_t>&, const std::int64_t&);
template PooledRanking rank_pooled(const std::vector<std::int64_t>&, const std::vector<std::int64_t>&,
                                   const std::int64_t&);
template PooledRanking rank_pooled_in_gap(const std::vector<std::int64_t>&, const std::vector<std::int64_t>&,
                                          const std::int64_t&);
template SignedRanking rank_signed(const std::vector<Int128>&, const Int128&, bool);
template SignedRanking rank_signed_in_gap(const std::vector<Int128>&, const Int128&);
template PooledRanking rank_pooled(const std::vector<Int128>&, const std::vector<Int128>&, const Int128&);
template PooledRanking rank_pooled_in_gap(const std::vector<Int128>&, const std::vector<Int128>&, const Int128&);
template SignedRanking rank_signed(const std::vector<BigInt>&, const BigInt&, bool);
template SignedRanking rank_signed_in_gap(const std::vector<BigInt>&, const BigInt&);
template PooledRanking rank_pooled(const std::vector<BigInt>&, const std::vector<BigInt>&, const BigInt&);
template PooledRanking rank_pooled_in_gap(const std::vector<BigInt>&, const std::vector<BigInt>&, const BigInt&);

} // namespace rankstead
