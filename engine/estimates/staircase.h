// The staircase that parts the sums a[i] + b[j] of two sorted lists at a value: from the last column of the first row
// it goes to the next row where a sum is at most the value, and to the column before where it is above. Which way a
// step goes is as good as random, so steps are taken without a branch; and because each waits for the one before, the
// walk is cut into lanes of equal length that run side by side (cut as in the merge path of Odeh, Green, Mwassi,
// Shmueli & Birk 2012).
#pragma once

#include <array>
#include <cstdint>
#include <vector>

namespace rankstead {

template <class Int>
class Staircase {
public:
    // Both lists sorted ascending and not empty; they must outlive this. With `triangle` only i <= j counts, and both
    // are the same list.
    Staircase(const std::vector<Int>& a, const std::vector<Int>& b, bool triangle, const Int& value)
        : a_(a.data()), b_(b.data()), columns_(static_cast<std::int64_t>(b.size())), value_(value) {
        const auto all = static_cast<std::int64_t>(a.size());
        rows_ = triangle ? leading(all, [&](std::int64_t i) { return is_inside(i, i); }) : all;
        if (rows_ > 0) {
            const std::int64_t last_width = width(rows_ - 1);
            const std::int64_t passed =
                last_width > 0 ? rows_ : leading(rows_, [&](std::int64_t i) { return is_inside(i, 0); });
            steps_ = passed + columns_ - last_width;
        }
    }

    // In a triangle, the rows whose first sum is at most the value; else all.
    [[nodiscard]] std::int64_t rows() const { return rows_; }

    // For each row i, in ends[i], the end of its columns whose sums are at most the value; rows without any are left
    // alone. Gives the sum of those ends.
    std::int64_t mark(std::vector<std::uint32_t>& ends) const {
        std::array<Corner, lanes> at;
        std::array<std::int64_t, lanes> totals{};
        for (std::size_t lane = 0; lane < lanes; ++lane) {
            at[lane] = corner(start_of(lane));
        }
        std::uint32_t* const end_of = ends.data();
        for (std::int64_t step = start_of(1); step > 0; --step) {
            for (std::size_t lane = 0; lane < lanes; ++lane) {
                take_step(at[lane], totals[lane], end_of);
            }
        }
        for (std::int64_t step = start_of(lanes); step < steps_; ++step) {
            take_step(at[lanes - 1], totals[lanes - 1], end_of);
        }
        mend_seams(ends);
        return totals[0] + totals[1] + totals[2] + totals[3];
    }

private:
    static constexpr std::size_t lanes = 4;

    struct Corner {
        std::int64_t row = 0;
        std::int64_t end = 0;
    };

    [[nodiscard]] bool is_inside(std::int64_t i, std::int64_t j) const { return a_[i] + b_[j] <= value_; }

    [[nodiscard]] std::int64_t width(std::int64_t i) const {
        return leading(columns_, [&](std::int64_t j) { return is_inside(i, j); });
    }

    void take_step(Corner& at, std::int64_t& total, std::uint32_t* end_of) const {
        const std::int64_t inside = is_inside(at.row, at.end - 1) ? 1 : 0;
        total += at.end & -inside;
        const std::int64_t row = at.row;
        at.row += inside;
        at.end -= 1 - inside;
        end_of[row] = static_cast<std::uint32_t>(at.end);
    }

    [[nodiscard]] std::int64_t start_of(std::size_t lane) const {
        return steps_ / static_cast<std::int64_t>(lanes) * static_cast<std::int64_t>(lane);
    }

    // A row in which one lane hands over to the next was written by both.
    void mend_seams(std::vector<std::uint32_t>& ends) const {
        for (std::size_t lane = 1; lane < lanes; ++lane) {
            const std::int64_t row = corner(start_of(lane)).row;
            if (row < rows_) {
                ends[static_cast<std::size_t>(row)] = static_cast<std::uint32_t>(width(row));
            }
        }
    }

    // Where the staircase is after so many steps.
    [[nodiscard]] Corner corner(std::int64_t steps) const {
        const std::int64_t row = leading(rows_, [&](std::int64_t i) {
            const std::int64_t j = columns_ + i - steps;
            return j < 0 || (j < columns_ && is_inside(i, j));
        });
        return {row, columns_ - steps + row};
    }

    // How many of 0..count - 1 fulfil a condition that holds for the first of them only.
    template <class Condition>
    [[nodiscard]] static std::int64_t leading(std::int64_t count, Condition holds) {
        std::int64_t low = 0;
        while (low < count) {
            const std::int64_t middle = low + (count - low) / 2;
            if (holds(middle)) {
                low = middle + 1;
            } else {
                count = middle;
            }
        }
        return low;
    }

    const Int* a_;
    const Int* b_;
    std::int64_t columns_;
    Int value_;
    std::int64_t rows_ = 0;
    std::int64_t steps_ = 0; // until the rows or the columns are used up
};

} // namespace rankstead
