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
std::int64_t run_length(Iterator& at, Iterator end) {
    const Iterator begin = at;
    while (at != end && *at == *begin) {
        ++at;
    }
    return at - begin;
}

} // namespace

template <class Int>
SignedRanking rank_signed(const std::vector<Int>& sorted, const Int& origin, bool rank_zeros) {
    SignedRanking ranking;
    ranking.zeros_ranked = rank_zeros;
    const auto zero_begin = std::lower_bound(sorted.begin(), sorted.end(), origin);
    auto rise = std::upper_bound(zero_begin, sorted.end(), origin);
    auto fall = std::make_reverse_iterator(zero_begin);
    ranking.zeros = rise - zero_begin;
    std::int64_t below = rank_zeros ? ranking.zeros : 0;
    while (rise != sorted.end() || fall != sorted.rend()) {
        const bool has_rise = rise != sorted.end();
        const bool has_fall = fall != sorted.rend();
        const Int up = has_rise ? Int(*rise - origin) : Int(0);
        const Int down = has_fall ? Int(origin - *fall) : Int(0);
        SignedGroup group;
        const bool take_rise = has_rise && (!has_fall || up <= down);
        const bool take_fall = has_fall && (!has_rise || down <= up);
        if (take_rise) {
            group.positive = run_length(rise, sorted.end());
        }
        group.count = group.positive + (take_fall ? run_length(fall, sorted.rend()) : 0);
        group.doubled_rank = 2 * below + group.count + 1;
        below += group.count;
        ranking.used += group.count;
        ranking.doubled_positive_sum += group.doubled_rank * group.positive;
        ranking.groups.push_back(group);
    }
    return ranking;
}

template <class Int>
PooledRanking rank_pooled(const std::vector<Int>& first, const std::vector<Int>& second, const Int& shift) {
    PooledRanking ranking;
    ranking.first = static_cast<std::int64_t>(first.size());
    ranking.second = static_cast<std::int64_t>(second.size());
    auto x = first.begin();
    auto y = second.begin();
    std::int64_t below = 0;
    while (x != first.end() || y != second.end()) {
        const bool has_x = x != first.end();
        const bool has_y = y != second.end();
        const Int a = has_x ? Int(*x - shift) : Int(0);
        const bool take_x = has_x && (!has_y || a <= *y);
        const bool take_y = has_y && (!has_x || *y <= a);
        PooledGroup group;
        group.first = take_x ? run_length(x, first.end()) : 0;
        group.second = take_y ? run_length(y, second.end()) : 0;
        group.doubled_rank = 2 * below + group.count() + 1;
        below += group.count();
        ranking.doubled_first_sum += group.doubled_rank * group.first;
        ranking.groups.push_back(group);
    }
    return ranking;
}

template SignedRanking rank_signed(const std::vector<std::int64_t>&, const std::int64_t&, bool);
template SignedRanking rank_signed(const std::vector<Int128>&, const Int128&, bool);
template SignedRanking rank_signed(const std::vector<BigInt>&, const BigInt&, bool);
template PooledRanking rank_pooled(const std::vector<std::int64_t>&, const std::vector<std::int64_t>&,
                                   const std::int64_t&);
template PooledRanking rank_pooled(const std::vector<Int128>&, const std::vector<Int128>&, const Int128&);
template PooledRanking rank_pooled(const std::vector<BigInt>&, const std::vector<BigInt>&, const BigInt&);

} // namespace rankstead
