// Midranks as doubled integers (a midrank is a multiple of one half), kept by groups of equal values. Doubled rank
// sums stay below 2^63 for a thousand million values.
#pragma once

#include <cstddef>
#include <cstdint>
#include <vector>

namespace rankstead {

// Equal absolute differences: their doubled midrank, how many there are and how many of them are positive. Without
// ties there is one of these for each value, so the counts are narrow.
struct SignedGroup {
    std::int64_t doubled_rank = 0;
    std::int32_t count = 0;
    std::int32_t positive = 0;
};

// Non-zero differences, ranked. Zeros are counted; where they were ranked too, the lowest ranks are theirs.
struct SignedRanking {
    std::vector<SignedGroup> groups; // ascending absolute value
    std::int64_t used = 0;           // non-zero differences
    std::int64_t zeros = 0;
    std::int64_t doubled_positive_sum = 0; // 2 T+
    bool zeros_ranked = false;

    [[nodiscard]] std::int64_t positives() const;
    [[nodiscard]] std::int64_t tied() const; // values that share their absolute value with another
};

// Equal values of two pooled samples: their doubled midrank and how many come from each.
struct PooledGroup {
    std::int64_t doubled_rank = 0;
    std::int32_t first = 0;
    std::int32_t second = 0;
    [[nodiscard]] std::int64_t count() const { return std::int64_t{first} + second; }
};

struct PooledRanking {
    std::vector<PooledGroup> groups; // ascending value
    std::int64_t first = 0;
    std::int64_t second = 0;
    std::int64_t doubled_first_sum = 0; // twice the rank sum of the first sample

    // Twice U of the first sample: the number of pairs in which it is higher, ties counted half.
    [[nodiscard]] std::int64_t doubled_u() const { return doubled_first_sum - first * (first + 1); }
    [[nodiscard]] std::int64_t tied() const;
};

// Ranks differences that are sorted ascending, relative to `origin`: merges the falls, read downwards, with the rises.
template <class Int>
[[nodiscard]] SignedRanking rank_signed(const std::vector<Int>& sorted, const Int& origin, bool rank_zeros);

// The same about a margin between two neighbouring sums of two values each: `floor`, the lower of them, is less than
// twice the margin. Only equal values tie there.
template <class Int>
[[nodiscard]] SignedRanking rank_signed_in_gap(const std::vector<Int>& sorted, const Int& floor);

// Ranks two samples, each sorted ascending, together; every value of the first lowered by `shift`.
template <class Int>
[[nodiscard]] PooledRanking rank_pooled(const std::vector<Int>& first, const std::vector<Int>& second,
                                        const Int& shift);

// The same with a shift between two neighbouring differences, the lower of which is `floor`: only values of the same
// sample tie there.
template <class Int>
[[nodiscard]] PooledRanking rank_pooled_in_gap(const std::vector<Int>& first, const std::vector<Int>& second,
                                               const Int& floor);

} // namespace rankstead
