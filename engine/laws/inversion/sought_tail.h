// The tail that an inversion is asked for: P(sum <= w), where the count is fixed given that `chosen` items are taken.
#pragma once

#include "certified_inversion.h"

namespace rankstead {

class SoughtTail {
public:
    // The law must outlive this.
    SoughtTail(const Characteristic& law, Count count, std::int64_t chosen, std::int64_t w);

    [[nodiscard]] const Characteristic& law() const { return law_; }
    [[nodiscard]] bool count_is_fixed() const { return fixed_; }
    [[nodiscard]] std::int64_t chosen() const { return chosen_; }
    [[nodiscard]] std::int64_t w() const { return w_; }

    // w minus the mean of the sum; exact but for one rounding.
    [[nodiscard]] double distance() const { return distance_; }
    // log P(count = chosen) where each item is taken with the law's probability; 0 where the count is free.
    [[nodiscard]] double log_count() const { return log_count_; }
    // Variance of the sum, given the count if that is fixed.
    [[nodiscard]] double variance() const;

    // The smallest and the largest sum that can occur, less w.
    [[nodiscard]] double lowest() const;
    [[nodiscard]] double highest() const;

private:
    [[nodiscard]] double distance_from_mean() const;

    const Characteristic& law_;
    bool fixed_;
    std::int64_t chosen_;
    std::int64_t w_;
    double distance_;
    double log_count_;
};

} // namespace rankstead
