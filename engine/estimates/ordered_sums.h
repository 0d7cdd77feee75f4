// Order statistics of all sums a[i] + b[j] of two sorted lists without writing the sums down (Johnson & Mizoguchi 1978;
// Monahan 1984): counting is a walk along a staircase, selection narrows a bracket. The bracket comes from the same
// question about every c-th member of both lists, which is so close that two walks are usually enough.
// With a = x and b = -y these are the mn differences of two samples; with `triangle` only i <= j counts, and with
// a = b = d they are the n(n+1)/2 sums whose halves are the Walsh averages.
#pragma once

#include <cstdint>
#include <memory>
#include <utility>
#include <vector>

namespace rankstead {

template <class Int>
class OrderedSums {
public:
    // An order statistic, and how many sums are below it and at most it.
    struct Place {
        Int value;
        std::int64_t below = 0;
        std::int64_t through = 0;
    };

    // Both sorted ascending, not empty; `triangle` needs equal lists.
    OrderedSums(std::vector<Int> a, std::vector<Int> b, bool triangle);

    // The differences x - y, from samples sorted ascending.
    [[nodiscard]] static OrderedSums differences(const std::vector<Int>& x, const std::vector<Int>& y);
    // The sums d[i] + d[j], i <= j: twice the Walsh averages.
    [[nodiscard]] static OrderedSums walsh(const std::vector<Int>& d);
    // The values themselves.
    [[nodiscard]] static OrderedSums values(const std::vector<Int>& d);
    // The same sums with their signs turned; shares the lists.
    [[nodiscard]] OrderedSums mirrored() const;

    [[nodiscard]] std::int64_t size() const { return size_; }
    [[nodiscard]] Place place(std::int64_t k) const; // of the k-th smallest, k = 1 to size()
    [[nodiscard]] Int at(std::int64_t k) const { return place(k).value; }
    [[nodiscard]] std::pair<Int, Int> pair_at(std::int64_t k) const; // the k-th and the next

private:
    using List = std::shared_ptr<const std::vector<Int>>;

    // The sums at most a value: in row i those of the columns before ends[i].
    struct Level {
        Int value;
        std::vector<std::uint32_t> ends;
        std::int64_t through = 0;
    };

    OrderedSums(List a, List b, bool triangle);
    [[nodiscard]] std::int64_t first_column(std::int64_t i) const { return triangle_ ? i : 0; }
    [[nodiscard]] Int sum(std::size_t i, std::size_t j) const { return Int((*a_)[i] + (*b_)[j]); }
    [[nodiscard]] Level level(const Int& value) const;
    [[nodiscard]] Level lowest() const;
    [[nodiscard]] Level highest() const;
    [[nodiscard]] std::pair<Int, Int> guess(std::int64_t k, std::int64_t next) const;
    [[nodiscard]] std::pair<Int, Int> sampled_guess(const Level& low, const Level& high, std::int64_t k) const;
    [[nodiscard]] std::pair<Place, Place> select(std::int64_t k, std::int64_t next) const;
    [[nodiscard]] Place settle(Level low, Level high, std::int64_t k) const;
    [[nodiscard]] std::pair<Place, Place> select_between(const Level& low, const Level& high, std::int64_t k,
                                                         std::int64_t next) const;

    List a_;
    List b_;
    bool triangle_;
    bool mirrored_ = false;
    std::int64_t size_;
    std::int64_t few_; // as many sums may be written down
};

} // namespace rankstead
