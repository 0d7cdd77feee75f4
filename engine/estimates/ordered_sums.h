// Order statistics of all sums a[i] + b[j] of two sorted lists without writing the sums down (Johnson & Mizoguchi 1978;
// Monahan 1984): counting is a walk along a staircase, selection narrows a bracket found from a sample.
// With a = x and b = -y these are the mn differences of two samples; with `triangle` only i <= j counts, and with
// a = b = d they are the n(n+1)/2 sums whose halves are the Walsh averages.
#pragma once

#include <cstdint>
#include <vector>

namespace rankstead {

template <class Int>
class OrderedSums {
public:
    // Both sorted ascending, not empty; `triangle` needs lists of equal length.
    OrderedSums(std::vector<Int> a, std::vector<Int> b, bool triangle);

    // The differences x - y, from samples sorted ascending.
    [[nodiscard]] static OrderedSums differences(const std::vector<Int>& x, const std::vector<Int>& y);
    // The sums d[i] + d[j], i <= j: twice the Walsh averages.
    [[nodiscard]] static OrderedSums walsh(const std::vector<Int>& d);
    // The values themselves.
    [[nodiscard]] static OrderedSums values(const std::vector<Int>& d);

    [[nodiscard]] std::int64_t size() const { return size_; }
    [[nodiscard]] Int at(std::int64_t k) const; // the k-th smallest, k = 1 to size()
    [[nodiscard]] std::int64_t count_at_most(const Int& value) const;
    [[nodiscard]] std::int64_t count_below(const Int& value) const;
    [[nodiscard]] Int next_above(const Int& value) const; // the smallest sum above; needs one to exist
    [[nodiscard]] Int next_below(const Int& value) const; // the largest sum below; needs one to exist

private:
    // For each i the candidates left are b[low..high).
    struct Row {
        std::uint32_t low = 0;
        std::uint32_t high = 0;
    };

    [[nodiscard]] std::int64_t first_column(std::int64_t i) const { return triangle_ ? i : 0; }
    [[nodiscard]] Int sum(std::int64_t i, std::int64_t j) const {
        return a_[static_cast<std::size_t>(i)] + b_[static_cast<std::size_t>(j)];
    }
    // Walks the staircase: visit(i, end) with b[first_column(i)..end) the entries of row i that are "inside".
    template <class Inside, class Visit>
    void walk(Inside inside, Visit visit) const;
    [[nodiscard]] std::vector<Int> sample(const std::vector<Row>& rows, std::int64_t candidates,
                                          std::uint64_t seed) const;
    [[nodiscard]] Int select_among(const std::vector<Row>& rows, std::int64_t candidates, std::int64_t k) const;
    void keep_above(std::vector<Row>& rows, const Int& value) const;
    void keep_at_most(std::vector<Row>& rows, const Int& value) const;

    std::vector<Int> a_;
    std::vector<Int> b_;
    bool triangle_;
    std::int64_t size_;
};

} // namespace rankstead
